import { transact } from "@/db/client";
import { keepersOfTeam, keysEnding, keysNearQuota, type NoticedKey } from "@/db/queries/key-notices";
import { claimNotice } from "@/db/queries/mails";
import { SOON_MS } from "../auth/key-expiry";
import { monthBucket } from "../limits/quota";
import type { Service } from "../service/service";
import type { Letter } from "./letter";
import { keyExpiryLetter, quotaLetter } from "./letters";
import { post } from "./outbox";

const DAY_MS = 86_400_000;

/** Days before its end at which the keepers of a key are told; 0 is when it is over. */
export const EXPIRY_STAGES = [14, 3, 0] as const;

/** How long after its end a key is still worth a notice, ms: a service that stood still for a weekend tells it late. */
const LATE_MS = 3 * DAY_MS;

/** The notice that is due for a key: none before the first stage, and none that was over when the key was issued. */
function expiryStage(expiresAt: number, createdAt: number, now: number): number | undefined {
  const left = expiresAt - now;
  const stage = [...EXPIRY_STAGES].reverse().find((days) => left <= days * DAY_MS);
  if (stage === undefined || (stage > 0 && createdAt > expiresAt - stage * DAY_MS)) return undefined;
  return stage;
}

function tellKeepers(
  service: Service,
  key: NoticedKey,
  kind: string,
  letter: (to: { name: string }) => Letter,
  now: number,
): number {
  const keepers = keepersOfTeam(service.db, key.teamId);
  for (const keeper of keepers) post(service, { kind, recipient: keeper.email, letter: letter(keeper) }, now);
  return keepers.length;
}

/** Tells of keys that are about to end or have just ended, each stage once. Answers how many mails were written. */
export function tellOfExpiry(service: Service): number {
  const { db, config } = service;
  const now = service.now();
  let mails = 0;
  for (const key of keysEnding(db, now - LATE_MS, now + SOON_MS)) {
    const stage = expiryStage(key.expiresAt, key.createdAt, now);
    if (stage === undefined) continue;
    transact(db, () => {
      if (!claimNotice(db, `key-expiry:${key.id}:${stage}:${key.expiresAt}`, now)) return;
      const about = {
        key: key.name,
        team: key.team,
        url: `${config.origin}/console/keys/${key.id}`,
        leftMs: key.expiresAt - now,
        expiresAt: key.expiresAt,
      };
      mails += tellKeepers(service, key, "key-expiry", (to) => keyExpiryLetter(to, about), now);
    });
  }
  return mails;
}

/** Tells of keys that have used 80 % or all of their month, each once a month and quota. */
export function tellOfQuotas(service: Service): number {
  const { db, config } = service;
  const now = service.now();
  const month = new Date(now).toISOString().slice(0, 7);
  const resetsAt = monthBucket("", 0, now).endsAt ?? now;
  let mails = 0;
  for (const key of keysNearQuota(db, { month, share: 0.8, now })) {
    const percent = key.used >= key.quota ? 100 : 80;
    transact(db, () => {
      const name = (share: number) => `quota:${key.id}:${month}:${share}:${key.quota}`;
      if (!claimNotice(db, name(percent), now)) return;
      // Who is told that all is used up need not hear of 80 % afterwards.
      if (percent === 100) claimNotice(db, name(80), now);
      const about = {
        key: key.name,
        team: key.team,
        url: `${config.origin}/console/keys/${key.id}`,
        percent,
        used: Math.min(key.used, key.quota),
        quota: key.quota,
        resetsAt,
      } as const;
      mails += tellKeepers(service, key, "quota", (to) => quotaLetter(to, about), now);
    });
  }
  return mails;
}
