import type { Database } from "@/db/client";
import { endsOfSecrets, type ListedKey, monthUsed } from "@/db/queries/key-list";
import type { KeyRow } from "@/db/queries/keys";
import { clientsOfKey } from "@/db/queries/usage-sums";
import { keyView, type KeyView } from "./manage-keys";

const DAY_MS = 86_400_000;
/** How far back clients are named before a key is rotated or revoked, days. */
export const CLIENT_DAYS = 30;

/** A key as lists of the console show it. */
export interface ListedKeyView extends KeyView {
  readonly teamId: string;
  readonly teamName: string;
  /** Computations of this month (UTC), reserved ones included. */
  readonly monthUsed: number;
}

export function listedKeyView(row: ListedKey, now: number): ListedKeyView {
  return { ...keyView(row, now), teamId: row.teamId, teamName: row.teamName, monthUsed: row.monthUsed };
}

export interface KeyDetail extends ListedKeyView {
  /** Kinds of client of the last thirty days: whom a change would reach. */
  readonly clients: readonly {
    readonly client: string;
    readonly requests: number;
    readonly lastAt: string;
  }[];
  /** When the secret before a rotation ends; null where only one counts. */
  readonly previousUntil: string | null;
}

export function keyDetail(db: Database, row: KeyRow, teamName: string, now: number): KeyDetail {
  const month = new Date(now).toISOString().slice(0, 7);
  const ends = endsOfSecrets(db, row.id, now).filter((end) => end !== null);
  const clients = clientsOfKey(db, row.id, Math.floor(now / DAY_MS) - CLIENT_DAYS + 1);
  return {
    ...listedKeyView({ ...row, teamName, monthUsed: monthUsed(db, row.id, month) }, now),
    clients: clients.map(({ lastAt, ...client }) => ({ ...client, lastAt: new Date(lastAt).toISOString() })),
    previousUntil: ends.length === 0 ? null : new Date(Math.max(...ends)).toISOString(),
  };
}
