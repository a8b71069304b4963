import { transact, type Database } from "@/db/client";
import {
  endSecrets,
  insertKey,
  insertSecret,
  keyById,
  type KeyRow,
  markRevoked,
  updateKey,
} from "@/db/queries/keys";
import { type Actor, appendActivity } from "../activity/append";
import {
  DEFAULT_MINUTE_QUOTA,
  DEFAULT_MONTH_QUOTA,
  URL_MINUTE_QUOTA,
  URL_MONTH_QUOTA,
} from "../limits/quota";
import { newId, newKeyId } from "../service/identifier";
import { Refusal } from "../service/refusal";
import type { KeyChangeInput, KeySettings } from "./key-settings";
import { formatKey, hashSecret, newSecret } from "./key-text";

/** A key as the API, the console and the shell show it; its secret is not among this. */
export interface KeyView {
  readonly id: string;
  readonly name: string;
  readonly team: string;
  readonly scopes: readonly string[];
  readonly quotas: { readonly minute: number; readonly month: number };
  readonly origins: readonly string[];
  readonly allowedInUrl: boolean;
  readonly state: "active" | "expired" | "revoked";
  readonly createdAt: string;
  readonly createdBy: string;
  readonly expiresAt: string | null;
  readonly revokedAt: string | null;
  readonly lastUsedAt: string | null;
  readonly lastClient: string | null;
}

/** A key with its whole text, which is shown this once. */
export interface ShownKey {
  readonly view: KeyView;
  readonly text: string;
}

const iso = (at: number | null) => (at === null ? null : new Date(at).toISOString());

export function keyView(row: KeyRow, now: number): KeyView {
  const expired = row.expiresAt !== null && row.expiresAt <= now;
  return {
    id: row.id,
    name: row.name,
    team: row.team,
    scopes: row.scopes,
    quotas: { minute: row.minuteQuota, month: row.monthQuota },
    origins: row.origins,
    allowedInUrl: row.allowedInUrl,
    state: row.revokedAt !== null ? "revoked" : expired ? "expired" : "active",
    createdAt: new Date(row.createdAt).toISOString(),
    createdBy: row.createdBy,
    expiresAt: iso(row.expiresAt),
    revokedAt: iso(row.revokedAt),
    lastUsedAt: iso(row.lastUsedAt),
    lastClient: row.lastClient,
  };
}

interface Issue {
  readonly teamId: string;
  readonly settings: KeySettings;
  readonly actor: Actor;
  readonly now: number;
  /** Quotas that are left out are never above these. */
  readonly largest?: { readonly minute: number; readonly month: number };
  /** For the demo, whose ids and secrets are derived; random otherwise. */
  readonly fixed?: { readonly id: string; readonly secret: string };
}

/** Issues a key. Refuses an expiry that has passed. */
export function issueKey(db: Database, { teamId, settings, actor, now, largest, fixed }: Issue): ShownKey {
  const expiresAt = settings.expiresAt === undefined ? null : Date.parse(settings.expiresAt);
  if (expiresAt !== null && expiresAt <= now) {
    throw new Refusal("invalid-input", "The key would be over before it is issued.", {
      errors: [{ pointer: "#/expiresAt", detail: "must lie in the future." }],
    });
  }
  const id = fixed?.id ?? newKeyId();
  const secret = fixed?.secret ?? newSecret();
  const minute = settings.allowedInUrl ? URL_MINUTE_QUOTA : DEFAULT_MINUTE_QUOTA;
  const month = settings.allowedInUrl ? URL_MONTH_QUOTA : DEFAULT_MONTH_QUOTA;
  return transact(db, () => {
    insertKey(db, {
      id,
      teamId,
      name: settings.name,
      scopes: [...new Set(settings.scopes)],
      origins: [...new Set(settings.origins ?? [])],
      allowedInUrl: settings.allowedInUrl ?? false,
      minuteQuota: settings.quotas?.minute ?? Math.min(minute, largest?.minute ?? Infinity),
      monthQuota: settings.quotas?.month ?? Math.min(month, largest?.month ?? Infinity),
      createdAt: now,
      createdBy: actor.name,
      expiresAt,
    });
    insertSecret(db, { id: newId("sec"), keyId: id, hash: hashSecret(secret), createdAt: now });
    const view = mustView(db, id, now);
    appendActivity(
      db,
      actor,
      { action: "key.issue", teamId, subject: { kind: "key", id }, after: view },
      now,
    );
    return { view, text: formatKey({ id, secret }) };
  });
}

interface Change {
  readonly id: string;
  readonly actor: Actor;
  readonly now: number;
}

/** A second secret for a key; the ones before end after `overlapMs`. Refuses a key that is over. */
export function rotateKey(
  db: Database,
  { id, actor, now, overlapMs }: Change & { readonly overlapMs: number },
): ShownKey & { readonly previousUntil: string } {
  const secret = newSecret();
  const until = now + overlapMs;
  return transact(db, () => {
    const row = keyById(db, id);
    if (!row) throw new Refusal("not-found", "There is no such key.");
    const view = keyView(row, now);
    if (view.state !== "active") {
      throw new Refusal("invalid-input", `The key is ${view.state}: issue a new one.`, {
        errors: [{ pointer: "#", detail: `is for keys in use; this one is ${view.state}.` }],
      });
    }
    endSecrets(db, id, until);
    insertSecret(db, { id: newId("sec"), keyId: id, hash: hashSecret(secret), createdAt: now });
    const previousUntil = new Date(until).toISOString();
    appendActivity(
      db,
      actor,
      { action: "key.rotate", teamId: row.teamId, subject: { kind: "key", id }, after: { previousUntil } },
      now,
    );
    return { view, text: formatKey({ id, secret }), previousUntil };
  });
}

/** Changes what a key may do, from the next request on; its secret stays. Refuses a revoked key and an end that has passed. */
export function changeKey(
  db: Database,
  { id, actor, now, change }: Change & { readonly change: KeyChangeInput },
): KeyView {
  return transact(db, () => {
    const row = keyById(db, id);
    if (!row) throw new Refusal("not-found", "There is no such key.");
    if (row.revokedAt !== null) {
      throw new Refusal("invalid-input", "The key is revoked: issue a new one.", {
        errors: [{ pointer: "#", detail: "is for keys that are not revoked." }],
      });
    }
    const { name, scopes, origins, allowedInUrl, quotas, expiresAt } = change;
    if (typeof expiresAt === "string" && Date.parse(expiresAt) <= now) {
      throw new Refusal("invalid-input", "The key's end has passed already; revoke it to end it now.", {
        errors: [{ pointer: "#/expiresAt", detail: "must lie in the future." }],
      });
    }
    const before = keyView(row, now);
    updateKey(db, id, {
      name: name ?? row.name,
      scopes: scopes ? [...new Set(scopes)] : row.scopes,
      origins: origins ? [...new Set(origins)] : row.origins,
      allowedInUrl: allowedInUrl ?? row.allowedInUrl,
      minuteQuota: quotas?.minute ?? row.minuteQuota,
      monthQuota: quotas?.month ?? row.monthQuota,
      expiresAt: expiresAt === undefined ? row.expiresAt : expiresAt === null ? null : Date.parse(expiresAt),
    });
    const after = mustView(db, id, now);
    if (JSON.stringify(after) !== JSON.stringify(before)) {
      appendActivity(
        db,
        actor,
        { action: "key.change", teamId: row.teamId, subject: { kind: "key", id }, before, after },
        now,
      );
    }
    return after;
  });
}

/** Ends a key for the next request. Revoking twice changes nothing. */
export function revokeKey(db: Database, { id, actor, now }: Change): KeyView {
  return transact(db, () => {
    const row = keyById(db, id);
    if (!row) throw new Refusal("not-found", "There is no such key.");
    if (!markRevoked(db, id, now)) return keyView(row, now);
    const view = mustView(db, id, now);
    appendActivity(
      db,
      actor,
      {
        action: "key.revoke",
        teamId: row.teamId,
        subject: { kind: "key", id },
        before: keyView(row, now),
        after: view,
      },
      now,
    );
    return view;
  });
}

function mustView(db: Database, id: string, now: number): KeyView {
  const row = keyById(db, id);
  if (!row) throw new Error(`Key ${id} vanished inside its own transaction.`);
  return keyView(row, now);
}
