import { desc, eq } from "drizzle-orm";
import type { Database } from "../client";
import { activity } from "../schema/journal";

export type NewActivity = Omit<typeof activity.$inferInsert, "seq">;
export type ActivityRow = typeof activity.$inferSelect;

/** Appends one act; there is no way to change or remove it. */
export function insertActivity(db: Database, act: NewActivity): void {
  db.insert(activity).values(act).run();
}

/** Acts on one subject, newest first. */
export function activityOfSubject(db: Database, subjectId: string): ActivityRow[] {
  return db
    .select()
    .from(activity)
    .where(eq(activity.subjectId, subjectId))
    .orderBy(desc(activity.seq))
    .all();
}
