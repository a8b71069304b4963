import { and, asc, desc, eq, gte, isNull, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { embeds, embedUsage, embedVersions } from "../schema/embeds";
import { teams } from "../schema/organisation";

const DAY_MS = 86_400_000;

export interface EmbedRow {
  readonly id: string;
  readonly teamId: string;
  /** The team's short name. */
  readonly team: string;
  readonly teamName: string;
  readonly name: string;
  readonly origins: string[];
  readonly monthQuota: number;
  readonly publishedVersion: number | null;
  readonly createdAt: number;
  readonly createdBy: string;
  readonly withdrawnAt: number | null;
}

export interface EmbedVersionRow {
  readonly embedId: string;
  readonly number: number;
  readonly definition: unknown;
  readonly createdAt: number;
  readonly createdBy: string;
  readonly savedAt: number;
  readonly publishedAt: number | null;
  readonly publishedBy: string | null;
  readonly restores: number | null;
}

const columns = {
  id: embeds.id,
  teamId: embeds.teamId,
  team: teams.slug,
  teamName: teams.name,
  name: embeds.name,
  origins: embeds.origins,
  monthQuota: embeds.monthQuota,
  publishedVersion: embeds.publishedVersion,
  createdAt: embeds.createdAt,
  createdBy: embeds.createdBy,
  withdrawnAt: embeds.withdrawnAt,
};

export function insertEmbed(db: Database, row: Omit<EmbedRow, "team" | "teamName">): void {
  db.insert(embeds)
    .values({ ...row })
    .run();
}

/** One widget, whoever owns it: asked for by every page that shows one, and by every call of one. */
export function embedById(db: Database, id: string): EmbedRow | undefined {
  return prepared(db, "embeds.byId", (db) =>
    db
      .select(columns)
      .from(embeds)
      .innerJoin(teams, eq(teams.id, embeds.teamId))
      .where(eq(embeds.id, sql.placeholder("id")))
      .prepare(),
  ).get({ id });
}

/** Widgets of some teams, newest first; of all teams where none are named. */
export function listEmbeds(db: Database, teamIds?: readonly string[]): EmbedRow[] {
  return db
    .select(columns)
    .from(embeds)
    .innerJoin(teams, eq(teams.id, embeds.teamId))
    .orderBy(desc(embeds.createdAt), desc(embeds.id))
    .all()
    .filter(({ teamId }) => teamIds === undefined || teamIds.includes(teamId));
}

export interface EmbedSettings {
  readonly name: string;
  readonly origins: string[];
  readonly monthQuota: number;
}

export function changeEmbed(db: Database, id: string, settings: EmbedSettings): void {
  db.update(embeds)
    .set({ ...settings })
    .where(eq(embeds.id, id))
    .run();
}

/** Which version pages show from now on; withdrawn widgets are back with it. */
export function showVersion(db: Database, id: string, publishedVersion: number): void {
  db.update(embeds).set({ publishedVersion, withdrawnAt: null }).where(eq(embeds.id, id)).run();
}

/** @returns whether it was not withdrawn before. */
export function markWithdrawn(db: Database, id: string, at: number): boolean {
  const { changes } = db
    .update(embeds)
    .set({ withdrawnAt: at })
    .where(and(eq(embeds.id, id), isNull(embeds.withdrawnAt)))
    .run();
  return changes > 0;
}

export function insertVersion(db: Database, row: EmbedVersionRow): void {
  db.insert(embedVersions)
    .values({ ...row })
    .run();
}

export function embedVersion(db: Database, embedId: string, number: number): EmbedVersionRow | undefined {
  return prepared(db, "embeds.version", (db) =>
    db
      .select()
      .from(embedVersions)
      .where(
        and(
          eq(embedVersions.embedId, sql.placeholder("embedId")),
          eq(embedVersions.number, sql.placeholder("number")),
        ),
      )
      .prepare(),
  ).get({ embedId, number });
}

/** The versions of a widget, newest first. */
export function embedHistory(db: Database, embedId: string): EmbedVersionRow[] {
  return db
    .select()
    .from(embedVersions)
    .where(eq(embedVersions.embedId, embedId))
    .orderBy(desc(embedVersions.number))
    .all();
}

export function saveDraft(
  db: Database,
  embedId: string,
  number: number,
  draft: { readonly definition: unknown; readonly savedAt: number },
): void {
  db.update(embedVersions)
    .set({ ...draft })
    .where(and(eq(embedVersions.embedId, embedId), eq(embedVersions.number, number)))
    .run();
}

export function markPublished(
  db: Database,
  embedId: string,
  number: number,
  published: { readonly publishedAt: number; readonly publishedBy: string },
): void {
  db.update(embedVersions)
    .set({ ...published })
    .where(and(eq(embedVersions.embedId, embedId), eq(embedVersions.number, number)))
    .run();
}

export function deleteDraft(db: Database, embedId: string, number: number): void {
  db.delete(embedVersions)
    .where(
      and(
        eq(embedVersions.embedId, embedId),
        eq(embedVersions.number, number),
        isNull(embedVersions.publishedAt),
      ),
    )
    .run();
}

/** Counts one call of a widget. Call it in the transaction that counts the call itself. */
export function countEmbedCall(
  db: Database,
  call: {
    readonly embedId: string;
    readonly at: number;
    readonly host: string;
    readonly computations: number;
    readonly status: number;
  },
): void {
  prepared(db, "embeds.count", (db) =>
    db
      .insert(embedUsage)
      .values({
        embedId: sql.placeholder("embedId"),
        day: sql`${sql.placeholder("day")}`,
        host: sql.placeholder("host"),
        requests: sql`1`,
        computations: sql`${sql.placeholder("computations")}`,
        refused: sql`${sql.placeholder("refused")}`,
      })
      .onConflictDoUpdate({
        target: [embedUsage.embedId, embedUsage.day, embedUsage.host],
        set: {
          requests: sql`requests + 1`,
          computations: sql`computations + excluded.computations`,
          refused: sql`refused + excluded.refused`,
        },
      })
      .prepare(),
  ).run({
    embedId: call.embedId,
    day: Math.floor(call.at / DAY_MS),
    host: call.host,
    computations: call.computations,
    refused: call.status >= 400 ? 1 : 0,
  });
}

/** Adds what a call cost that was counted before: a field solution knows at its end. */
export function addEmbedComputations(
  db: Database,
  {
    embedId,
    host,
    at,
    computations,
  }: {
    readonly embedId: string;
    readonly host: string;
    readonly at: number;
    readonly computations: number;
  },
): void {
  db.insert(embedUsage)
    .values({ embedId, day: Math.floor(at / DAY_MS), host, requests: 0, computations, refused: 0 })
    .onConflictDoUpdate({
      target: [embedUsage.embedId, embedUsage.day, embedUsage.host],
      set: { computations: sql`computations + ${computations}` },
    })
    .run();
}

export interface EmbedUsageRow {
  readonly embedId: string;
  /** `2025-03-01`, UTC. */
  readonly day: string;
  readonly host: string;
  readonly requests: number;
  readonly computations: number;
  readonly refused: number;
}

/** Usage of one widget, or of all, since a moment (Unix ms), oldest day first. */
export function embedUsageSince(db: Database, since: number, embedId?: string): EmbedUsageRow[] {
  return db
    .select()
    .from(embedUsage)
    .where(
      and(
        gte(embedUsage.day, Math.floor(since / DAY_MS)),
        embedId === undefined ? undefined : eq(embedUsage.embedId, embedId),
      ),
    )
    .orderBy(asc(embedUsage.day), asc(embedUsage.host))
    .all()
    .map((row) => ({ ...row, day: new Date(row.day * DAY_MS).toISOString().slice(0, 10) }));
}
