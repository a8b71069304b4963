import { and, desc, eq, gt, isNull, lt, ne, or, type SQL, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { sessions } from "../schema/sign-in";

export type SessionRow = typeof sessions.$inferSelect;

export function insertSession(db: Database, session: SessionRow): void {
  db.insert(sessions).values(session).run();
}

export function sessionById(db: Database, id: string): SessionRow | undefined {
  return prepared(db, "sessions.byId", (db) =>
    db
      .select()
      .from(sessions)
      .where(eq(sessions.id, sql.placeholder("id")))
      .prepare(),
  ).get({ id });
}

/** The sessions of a person that are open at `now` and were used after `idleSince`, the latest first. */
export function openSessions(db: Database, personId: string, now: number, idleSince: number): SessionRow[] {
  return db
    .select()
    .from(sessions)
    .where(
      and(
        eq(sessions.personId, personId),
        isNull(sessions.endedAt),
        gt(sessions.expiresAt, now),
        gt(sessions.lastSeenAt, idleSince),
      ),
    )
    .orderBy(desc(sessions.lastSeenAt))
    .all();
}

export function touchSession(db: Database, id: string, lastSeenAt: number, address: string): void {
  db.update(sessions).set({ lastSeenAt, address }).where(eq(sessions.id, id)).run();
}

export function chooseSessionTeam(db: Database, id: string, teamId: string | null): void {
  db.update(sessions).set({ teamId }).where(eq(sessions.id, id)).run();
}

/** Ends one session; false where it had ended before. */
export function endSessionRow(db: Database, id: string, endedAt: number): boolean {
  const ended = db
    .update(sessions)
    .set({ endedAt })
    .where(and(eq(sessions.id, id), isNull(sessions.endedAt)))
    .run();
  return ended.changes > 0;
}

/** Ends all sessions of a person, but perhaps one; tells how many. */
export function endSessionsOf(db: Database, personId: string, endedAt: number, except?: string): number {
  return db
    .update(sessions)
    .set({ endedAt })
    .where(
      and(
        eq(sessions.personId, personId),
        isNull(sessions.endedAt),
        except === undefined ? undefined : ne(sessions.id, except),
      ),
    )
    .run().changes;
}

/** Whether a person was signed in before, at all and with that device. */
export function knownDevice(
  db: Database,
  personId: string,
  device: string,
): { readonly any: boolean; readonly same: boolean } {
  const own = eq(sessions.personId, personId);
  const find = (condition: SQL | undefined) =>
    db.select({ id: sessions.id }).from(sessions).where(condition).limit(1).get() !== undefined;
  return { any: find(own), same: find(and(own, eq(sessions.device, device))) };
}

/** Forgets sessions that were over before `at`. */
export function forgetSessions(db: Database, at: number): number {
  return db
    .delete(sessions)
    .where(or(lt(sessions.expiresAt, at), lt(sessions.endedAt, at)))
    .run().changes;
}
