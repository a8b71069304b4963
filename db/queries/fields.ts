import { and, desc, eq, inArray, lt, ne, or, sql } from "drizzle-orm";
import type { Database } from "../client";
import { fields, outlines } from "../schema/fields";

export type FieldRow = typeof fields.$inferSelect;
export type NewField = typeof fields.$inferInsert;
export type FieldStatus = FieldRow["status"];
export type FieldProgress = NonNullable<FieldRow["progress"]>;

const OPEN: FieldStatus[] = ["queued", "running"];

export function insertField(db: Database, row: NewField): void {
  db.insert(fields).values(row).run();
}

export function fieldOfOwner(db: Database, owner: string, id: string): FieldRow | undefined {
  return db
    .select()
    .from(fields)
    .where(and(eq(fields.id, id), eq(fields.owner, owner)))
    .get();
}

export function fieldById(db: Database, id: string): FieldRow | undefined {
  return db.select().from(fields).where(eq(fields.id, id)).get();
}

/** The solution that stored a record, while it is kept. */
export function fieldOfRecord(db: Database, recordId: string): FieldRow | undefined {
  return db.select().from(fields).where(eq(fields.recordId, recordId)).get();
}

/** How many solutions of an owner wait or run. */
export function countOpenFields(db: Database, owner?: string): number {
  const row = db
    .select({ count: sql<number>`count(*)` })
    .from(fields)
    .where(and(inArray(fields.status, OPEN), owner === undefined ? undefined : eq(fields.owner, owner)))
    .get();
  return row?.count ?? 0;
}

/** Takes open solutions whose claim has run out, or is this process's own from before; the smallest first. */
export function claimOpenFields(db: Database, process: string, now: number, until: number): FieldRow[] {
  return db
    .update(fields)
    .set({ claimedBy: process, claimedUntil: until, status: "queued" })
    .where(
      and(
        inArray(fields.status, OPEN),
        lt(fields.claimedUntil, now),
        or(ne(fields.claimedBy, process), sql`${fields.claimedBy} is null`),
      ),
    )
    .returning()
    .all()
    .sort((a, b) => a.size - b.size || a.createdAt - b.createdAt);
}

/** Keeps the claims of a process alive. */
export function extendClaims(db: Database, process: string, until: number): void {
  db.update(fields)
    .set({ claimedUntil: until })
    .where(and(inArray(fields.status, OPEN), eq(fields.claimedBy, process)))
    .run();
}

/** Hands everything that is not finished back, for the next process. */
export function releaseClaims(db: Database, process: string): void {
  db.update(fields)
    .set({ claimedBy: null, claimedUntil: 0, status: "queued" })
    .where(and(inArray(fields.status, OPEN), eq(fields.claimedBy, process)))
    .run();
}

/** Changes an open solution; false where it is finished or cancelled already. */
export function updateOpenField(
  db: Database,
  id: string,
  change: Partial<
    Pick<NewField, "status" | "progress" | "result" | "failure" | "finishedAt" | "recordId" | "claimedUntil">
  >,
): boolean {
  return (
    db
      .update(fields)
      .set(change)
      .where(and(eq(fields.id, id), inArray(fields.status, OPEN)))
      .run().changes > 0
  );
}

export function deleteField(db: Database, id: string): void {
  db.delete(fields).where(eq(fields.id, id)).run();
}

export interface OutlineRow {
  readonly id: string;
  readonly owner: string;
  readonly createdAt: number;
  readonly content: string;
}

export function insertOutline(db: Database, row: OutlineRow): void {
  db.insert(outlines).values(row).run();
}

export function outlineOfOwner(db: Database, owner: string, id: string): OutlineRow | undefined {
  return db
    .select()
    .from(outlines)
    .where(and(eq(outlines.id, id), eq(outlines.owner, owner)))
    .get();
}

/** Outlines of an owner, newest first. */
export function outlinesOfOwner(db: Database, owner: string, limit: number): OutlineRow[] {
  return db
    .select()
    .from(outlines)
    .where(eq(outlines.owner, owner))
    .orderBy(desc(outlines.createdAt), desc(outlines.id))
    .limit(limit)
    .all();
}
