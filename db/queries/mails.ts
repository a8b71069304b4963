import { and, asc, count, desc, eq, inArray, lt, lte, sql } from "drizzle-orm";
import type { Database } from "../client";
import { mails, type MailState, notices } from "../schema/mail";

export type MailRow = typeof mails.$inferSelect;

export function insertMail(db: Database, mail: MailRow): void {
  db.insert(mails).values(mail).run();
}

export function mailById(db: Database, id: string): MailRow | undefined {
  return db.select().from(mails).where(eq(mails.id, id)).get();
}

/** The latest mails, without their bodies. */
export function latestMails(
  db: Database,
  limit: number,
): Omit<MailRow, "text" | "html" | "dueAt" | "attempts">[] {
  return db
    .select({
      id: mails.id,
      kind: mails.kind,
      recipient: mails.recipient,
      subject: mails.subject,
      state: mails.state,
      error: mails.error,
      createdAt: mails.createdAt,
      sentAt: mails.sentAt,
    })
    .from(mails)
    .orderBy(desc(mails.createdAt), desc(sql`rowid`))
    .limit(limit)
    .all();
}

/** How many mails are in each state. */
export function countMails(db: Database): Readonly<Partial<Record<MailState, number>>> {
  const rows = db.select({ state: mails.state, mails: count() }).from(mails).groupBy(mails.state).all();
  return Object.fromEntries(rows.map((row) => [row.state, row.mails]));
}

/** Takes the mails that are due and puts the next attempt off until `again`: no other process tries them now. */
export function claimMails(db: Database, now: number, again: number, limit: number): MailRow[] {
  const due = db
    .select({ id: mails.id })
    .from(mails)
    .where(and(eq(mails.state, "queued"), lte(mails.dueAt, now)))
    .orderBy(asc(mails.createdAt))
    .limit(limit)
    .all();
  if (due.length === 0) return [];
  return db
    .update(mails)
    .set({ dueAt: again, attempts: sql`${mails.attempts} + 1` })
    .where(
      and(
        inArray(
          mails.id,
          due.map(({ id }) => id),
        ),
        eq(mails.state, "queued"),
        lte(mails.dueAt, now),
      ),
    )
    .returning()
    .all();
}

/** Notes a mail as sent and forgets its parts: links in them would stay readable. */
export function markMailSent(db: Database, id: string, at: number): void {
  db.update(mails)
    .set({ state: "sent", sentAt: at, text: "", html: "", error: null })
    .where(eq(mails.id, id))
    .run();
}

/** Notes why a mail could not be sent, and when it is tried again; never again where `dueAt` is null. */
export function markMailRefused(db: Database, id: string, error: string, dueAt: number | null): void {
  const rest = dueAt === null ? ({ state: "failed", text: "", html: "" } as const) : { dueAt };
  db.update(mails)
    .set({ error, ...rest })
    .where(eq(mails.id, id))
    .run();
}

/** Removes mails that were written before `at` and need no attempt any more. */
export function forgetMails(db: Database, at: number): number {
  return db
    .delete(mails)
    .where(and(lt(mails.createdAt, at), inArray(mails.state, ["sent", "captured", "failed"])))
    .run().changes;
}

/** Notes that a notice is given; false where it was given before. */
export function claimNotice(db: Database, name: string, at: number): boolean {
  return db.insert(notices).values({ name, at }).onConflictDoNothing().run().changes > 0;
}
