import { and, desc, eq, inArray, like, lt, or, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { recordMaterials, records } from "../schema/records";
import type { Mark } from "./keys";

export interface RecordRow {
  readonly id: string;
  readonly teamId: string;
  readonly operation: string;
  readonly label: string;
  readonly shape: string | null;
  readonly createdAt: number;
  readonly byKind: string;
  readonly byId: string;
  readonly byName: string;
  /** JSON text, as it came and as it was answered. */
  readonly request: string;
  readonly result: string;
  readonly materials: { id: string; version: number }[];
  readonly engine: string;
  readonly catalogue: string;
}

export function insertRecord(db: Database, record: RecordRow): void {
  prepared(db, "records.insert", (db) =>
    db
      .insert(records)
      .values({
        id: sql.placeholder("id"),
        teamId: sql.placeholder("teamId"),
        operation: sql.placeholder("operation"),
        label: sql.placeholder("label"),
        shape: sql.placeholder("shape"),
        createdAt: sql.placeholder("createdAt"),
        byKind: sql.placeholder("byKind"),
        byId: sql.placeholder("byId"),
        byName: sql.placeholder("byName"),
        request: sql.placeholder("request"),
        result: sql.placeholder("result"),
        materials: sql.placeholder("materials"),
        engine: sql.placeholder("engine"),
        catalogue: sql.placeholder("catalogue"),
      })
      .prepare(),
  ).run({ ...record });
  const { id: recordId, teamId, createdAt } = record;
  for (const { id: materialId, version } of record.materials) {
    db.insert(recordMaterials)
      .values({ materialId, recordId, version, teamId, createdAt })
      .onConflictDoNothing()
      .run();
  }
}

export function recordOfTeam(db: Database, teamId: string, id: string): RecordRow | undefined {
  return db
    .select()
    .from(records)
    .where(and(eq(records.id, id), eq(records.teamId, teamId)))
    .get();
}

/** A record of any team; whether the reader may see it is the caller's question. */
export function recordById(db: Database, id: string): RecordRow | undefined {
  return db.select().from(records).where(eq(records.id, id)).get();
}

/** Ids of all records of some teams, newest first. */
export function recordIdsOfTeams(db: Database, teamIds: readonly string[]): string[] {
  return db
    .select({ id: records.id })
    .from(records)
    .where(inArray(records.teamId, [...teamIds]))
    .orderBy(desc(records.createdAt))
    .all()
    .map(({ id }) => id);
}

export interface RecordFilter {
  readonly limit: number;
  readonly after?: Mark;
  readonly operation?: string;
  readonly shape?: string;
  /** Part of the label, any case (ASCII). */
  readonly search?: string;
  /** Requests and results of a page together stay under this many characters (one record always fits). */
  readonly maxChars: number;
}

/** Records of a team, newest first; `more` says whether others follow. */
export function listRecords(
  db: Database,
  teamId: string,
  filter: RecordFilter,
): { rows: RecordRow[]; more: boolean } {
  const { limit, after, operation, shape, search, maxChars } = filter;
  const pattern = search === undefined ? undefined : `%${search.replace(/[\\%_]/g, "\\$&")}%`;
  const sizes = db
    .select({ id: records.id, chars: sql<number>`length(${records.request}) + length(${records.result})` })
    .from(records)
    .where(
      and(
        eq(records.teamId, teamId),
        operation === undefined ? undefined : eq(records.operation, operation),
        shape === undefined ? undefined : eq(records.shape, shape),
        pattern === undefined ? undefined : sql`${like(records.label, pattern)} escape '\\'`,
        after &&
          or(lt(records.createdAt, after.at), and(eq(records.createdAt, after.at), lt(records.id, after.id))),
      ),
    )
    .orderBy(desc(records.createdAt), desc(records.id))
    .limit(limit + 1)
    .all();
  const ids: string[] = [];
  let chars = 0;
  for (const row of sizes) {
    chars += row.chars;
    if (ids.length === limit || (ids.length > 0 && chars > maxChars)) break;
    ids.push(row.id);
  }
  const rows = db
    .select()
    .from(records)
    .where(inArray(records.id, ids))
    .orderBy(desc(records.createdAt), desc(records.id))
    .all();
  return { rows, more: sizes.length > ids.length };
}

export function relabelRecord(db: Database, id: string, label: string): void {
  db.update(records).set({ label }).where(eq(records.id, id)).run();
}

export function deleteRecord(db: Database, id: string): boolean {
  return db.delete(records).where(eq(records.id, id)).run().changes > 0;
}
