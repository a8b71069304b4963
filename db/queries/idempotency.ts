import { and, eq, lt } from "drizzle-orm";
import type { Database } from "../client";
import { idempotency } from "../schema/journal";

export interface KeptAnswer {
  readonly fingerprint: string;
  /** Null while the first call is still running. */
  readonly status: number | null;
  readonly headers: Record<string, string> | null;
  readonly body: string | null;
}

export interface IdempotencyKey {
  readonly owner: string;
  readonly key: string;
}

const is = ({ owner, key }: IdempotencyKey) => and(eq(idempotency.owner, owner), eq(idempotency.key, key));

/** Claims a key for a call that starts now; false if it is taken. Forgets what has expired. */
export function claimKey(
  db: Database,
  key: IdempotencyKey,
  claim: { readonly fingerprint: string; readonly startedAt: number; readonly expiresAt: number },
): boolean {
  db.delete(idempotency).where(lt(idempotency.expiresAt, claim.startedAt)).run();
  return (
    db
      .insert(idempotency)
      .values({ ...key, ...claim })
      .onConflictDoNothing()
      .run().changes > 0
  );
}

export function keptAnswer(db: Database, key: IdempotencyKey): KeptAnswer | undefined {
  return db
    .select({
      fingerprint: idempotency.fingerprint,
      status: idempotency.status,
      headers: idempotency.headers,
      body: idempotency.body,
    })
    .from(idempotency)
    .where(is(key))
    .get();
}

export function keepAnswer(
  db: Database,
  key: IdempotencyKey,
  answer: {
    readonly status: number;
    readonly headers: Record<string, string>;
    readonly body: string;
    readonly expiresAt: number;
  },
): void {
  db.update(idempotency).set(answer).where(is(key)).run();
}

/** Gives a key back after a call that stored nothing, so that it can be tried again. */
export function releaseKey(db: Database, key: IdempotencyKey): void {
  db.delete(idempotency).where(is(key)).run();
}
