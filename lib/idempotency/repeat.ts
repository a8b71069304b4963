import { createHash } from "node:crypto";
import { transact, type Database } from "@/db/client";
import { claimKey, type IdempotencyKey, keepAnswer, keptAnswer, releaseKey } from "@/db/queries/idempotency";
import { Refusal } from "../service/refusal";

/** How long an answer is given again, ms. */
export const KEPT_MS = 24 * 3_600_000;

/** After this a call that never finished (the process was killed) no longer blocks its key, ms. */
const ABANDONED_MS = 5 * 60_000;

export interface StoredAnswer {
  readonly status: number;
  readonly headers: Record<string, string>;
  readonly body: string;
}

/** Reads the header: 1 to 255 printable ASCII characters, with or without the quotes of a structured field. */
export function readIdempotencyKey(header: string | null): string | undefined {
  if (header === null) return undefined;
  const text = /^"(.*)"$/.exec(header)?.[1] ?? header;
  if (/^[\x21-\x7e]{1,255}$/.test(text)) return text;
  throw new Refusal(
    "invalid-header",
    "Idempotency-Key must be 1 to 255 printable ASCII characters without spaces.",
  );
}

/** What makes two calls the same call. */
export function fingerprintOf(method: string, path: string, body: Uint8Array | undefined): string {
  return createHash("sha256")
    .update(`${method} ${path}\n`)
    .update(body ?? "")
    .digest("hex");
}

/**
 * Starts a call under its key: the answer of the first one if it was made before, else undefined and the key is
 * claimed. Throws a Refusal if the key belongs to another call or the first one is still running.
 */
export function startOrRepeat(
  db: Database,
  key: IdempotencyKey,
  fingerprint: string,
  now: number,
): StoredAnswer | undefined {
  return transact(db, () => {
    if (claimKey(db, key, { fingerprint, startedAt: now, expiresAt: now + ABANDONED_MS })) return undefined;
    const kept = keptAnswer(db, key);
    if (!kept) throw new Error("An idempotency key was neither free nor taken.");
    if (kept.fingerprint !== fingerprint) {
      throw new Refusal("idempotency-key-reused", "This Idempotency-Key was used for another call.");
    }
    if (kept.status === null) {
      throw new Refusal("request-in-progress", "The first call with this Idempotency-Key is still running.", {
        headers: { "Retry-After": "1" },
      });
    }
    return { status: kept.status, headers: kept.headers ?? {}, body: kept.body ?? "" };
  });
}

/** Keeps the answer for repeats. Call it in the transaction that stores what the call makes. */
export function finish(db: Database, key: IdempotencyKey, answer: StoredAnswer, now: number): void {
  keepAnswer(db, key, { ...answer, expiresAt: now + KEPT_MS });
}

/** Frees the key of a call that stored nothing. */
export function abandon(db: Database, key: IdempotencyKey): void {
  releaseKey(db, key);
}
