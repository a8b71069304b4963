import { and, desc, eq, isNull, lt, or, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { keySecrets, keys } from "../schema/keys";
import { teams } from "../schema/organisation";

export interface KeyRow {
  readonly id: string;
  readonly teamId: string;
  /** The team's short name. */
  readonly team: string;
  readonly name: string;
  readonly scopes: string[];
  readonly origins: string[];
  readonly allowedInUrl: boolean;
  readonly minuteQuota: number;
  readonly monthQuota: number;
  readonly createdAt: number;
  readonly createdBy: string;
  readonly expiresAt: number | null;
  readonly revokedAt: number | null;
  readonly lastUsedAt: number | null;
  readonly lastClient: string | null;
}

export interface SecretRow {
  readonly hash: string;
  readonly validUntil: number | null;
}

/** What is read of a key, joined with its team. */
export const keyColumns = {
  id: keys.id,
  teamId: keys.teamId,
  team: teams.slug,
  name: keys.name,
  scopes: keys.scopes,
  origins: keys.origins,
  allowedInUrl: keys.allowedInUrl,
  minuteQuota: keys.minuteQuota,
  monthQuota: keys.monthQuota,
  createdAt: keys.createdAt,
  createdBy: keys.createdBy,
  expiresAt: keys.expiresAt,
  revokedAt: keys.revokedAt,
  lastUsedAt: keys.lastUsedAt,
  lastClient: keys.lastClient,
};

/** A key with every secret it has, for authentication: a look-up a call, never cached. */
export function keyWithSecrets(db: Database, id: string): { key: KeyRow; secrets: SecretRow[] } | undefined {
  const rows = prepared(db, "keys.withSecrets", (db) =>
    db
      .select({ ...keyColumns, hash: keySecrets.hash, validUntil: keySecrets.validUntil })
      .from(keys)
      .innerJoin(teams, eq(teams.id, keys.teamId))
      .innerJoin(keySecrets, eq(keySecrets.keyId, keys.id))
      .where(eq(keys.id, sql.placeholder("id")))
      .prepare(),
  ).all({ id });
  const [first] = rows;
  if (!first) return undefined;
  const { hash: _hash, validUntil: _validUntil, ...key } = first;
  return { key, secrets: rows.map(({ hash, validUntil }) => ({ hash, validUntil })) };
}

export function keyById(db: Database, id: string): KeyRow | undefined {
  return db
    .select(keyColumns)
    .from(keys)
    .innerJoin(teams, eq(teams.id, keys.teamId))
    .where(eq(keys.id, id))
    .get();
}

/** Where a page of a list ended. */
export interface Mark {
  readonly at: number;
  readonly id: string;
}

/** Keys of a team, or of all teams where none is named, newest first. */
export function listKeys(
  db: Database,
  options: { readonly teamId?: string; readonly limit?: number; readonly after?: Mark },
): KeyRow[] {
  const { teamId, limit, after } = options;
  return db
    .select(keyColumns)
    .from(keys)
    .innerJoin(teams, eq(teams.id, keys.teamId))
    .where(
      and(
        teamId === undefined ? undefined : eq(keys.teamId, teamId),
        after && or(lt(keys.createdAt, after.at), and(eq(keys.createdAt, after.at), lt(keys.id, after.id))),
      ),
    )
    .orderBy(desc(keys.createdAt), desc(keys.id))
    .limit(limit ?? -1)
    .all();
}

export type NewKey = Omit<KeyRow, "team" | "revokedAt" | "lastUsedAt" | "lastClient">;

export function insertKey(db: Database, key: NewKey): void {
  db.insert(keys)
    .values({ ...key, scopes: [...key.scopes], origins: [...key.origins] })
    .run();
}

export function insertSecret(
  db: Database,
  secret: { readonly id: string; readonly keyId: string; readonly hash: string; readonly createdAt: number },
): void {
  db.insert(keySecrets).values(secret).run();
}

/** Gives every secret without an earlier end this end. */
export function endSecrets(db: Database, keyId: string, validUntil: number): void {
  db.update(keySecrets)
    .set({ validUntil })
    .where(
      and(
        eq(keySecrets.keyId, keyId),
        or(isNull(keySecrets.validUntil), sql`${keySecrets.validUntil} > ${validUntil}`),
      ),
    )
    .run();
}

/** Revokes a key; false if it was revoked before. */
export function markRevoked(db: Database, id: string, at: number): boolean {
  return (
    db
      .update(keys)
      .set({ revokedAt: at })
      .where(and(eq(keys.id, id), isNull(keys.revokedAt)))
      .run().changes > 0
  );
}

export function markUsed(db: Database, id: string, at: number, client: string): void {
  prepared(db, "keys.markUsed", (db) =>
    db
      .update(keys)
      .set({ lastUsedAt: sql`${sql.placeholder("at")}`, lastClient: sql`${sql.placeholder("client")}` })
      .where(eq(keys.id, sql.placeholder("id")))
      .prepare(),
  ).run({ id, at, client });
}

/** What may change about a key after it was issued. */
export type KeyChange = Partial<
  Pick<KeyRow, "name" | "scopes" | "origins" | "allowedInUrl" | "minuteQuota" | "monthQuota" | "expiresAt">
>;

export function updateKey(db: Database, id: string, change: KeyChange): void {
  db.update(keys).set(change).where(eq(keys.id, id)).run();
}
