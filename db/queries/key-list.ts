import { and, asc, eq, inArray, isNotNull, isNull, like, or, type SQL, sql } from "drizzle-orm";
import type { Database } from "../client";
import { rateLimits } from "../schema/journal";
import { keys } from "../schema/keys";
import { teams } from "../schema/organisation";
import { keyColumns, type KeyRow } from "./keys";
import type { Page } from "./usage-sums";

export const KEY_STATES = ["active", "expiring", "expired", "revoked"] as const;
export type KeyListState = (typeof KEY_STATES)[number];

export interface ListedKey extends KeyRow {
  readonly teamName: string;
  /** Computations of the month, reserved ones included. */
  readonly monthUsed: number;
}

interface KeyFilter extends Page {
  readonly teamIds: readonly string[];
  readonly search: string;
  readonly state?: KeyListState;
  /** Unix ms. */
  readonly now: number;
  /** How far ahead an end is soon, ms. */
  readonly soonMs: number;
  /** `2025-03`: the month of the counters. */
  readonly month: string;
}

const ORDERS: Readonly<Record<string, SQL>> = {
  name: sql`${keys.name} collate nocase`,
  team: sql`${teams.slug}`,
  createdAt: sql`${keys.createdAt}`,
  expiresAt: sql`coalesce(${keys.expiresAt}, 9e15)`,
  lastUsedAt: sql`coalesce(${keys.lastUsedAt}, 0)`,
  month: sql`coalesce(${rateLimits.points}, 0) * 1.0 / max(1, ${keys.monthQuota})`,
};

/** Keys of some teams, a page of them, with what they have used of their month. */
export function pageOfKeys(db: Database, filter: KeyFilter): { rows: ListedKey[]; total: number } {
  const { teamIds, search, state, now, soonMs, month, order, limit, offset } = filter;
  const pattern = `%${search.replace(/[\\%_]/g, "\\$&")}%`;
  const over = sql`${keys.expiresAt} <= ${now}`;
  const soon = sql`${keys.expiresAt} <= ${now + soonMs}`;
  const states: Readonly<Record<KeyListState, SQL | undefined>> = {
    active: and(isNull(keys.revokedAt), or(isNull(keys.expiresAt), sql`not ${over}`)),
    expiring: and(isNull(keys.revokedAt), isNotNull(keys.expiresAt), sql`not ${over}`, soon),
    expired: and(isNull(keys.revokedAt), isNotNull(keys.expiresAt), over),
    revoked: isNotNull(keys.revokedAt),
  };
  const rows = db
    .select({
      ...keyColumns,
      teamName: teams.name,
      monthUsed: sql<number>`coalesce(${rateLimits.points}, 0)`,
      total: sql<number>`count(*) over ()`,
    })
    .from(keys)
    .innerJoin(teams, eq(teams.id, keys.teamId))
    .leftJoin(rateLimits, eq(rateLimits.key, sql`'month:key:' || ${keys.id} || ':' || ${month}`))
    .where(
      and(
        inArray(keys.teamId, [...teamIds]),
        state && states[state],
        search === ""
          ? undefined
          : or(
              sql`${like(keys.name, pattern)} escape '\\'`,
              sql`${like(keys.id, pattern)} escape '\\'`,
              sql`${like(keys.createdBy, pattern)} escape '\\'`,
            ),
      ),
    )
    .orderBy(
      sql`${ORDERS[order.by] ?? ORDERS.createdAt} ${sql.raw(order.descending ? "desc" : "asc")}`,
      asc(keys.id),
    )
    .limit(limit)
    .offset(offset)
    .all();
  // A page past the end has no row to tell the total.
  const total =
    rows.at(0)?.total ?? (offset > 0 ? pageOfKeys(db, { ...filter, limit: 1, offset: 0 }).total : 0);
  return { rows: rows.map(({ total: _total, ...row }) => row), total };
}

/** Keys of some teams that want attention: end within `soonMs`, or have used four fifths of their month and more. */
export function keysInNeed(
  db: Database,
  {
    teamIds,
    now,
    soonMs,
    month,
    most,
  }: Pick<KeyFilter, "teamIds" | "now" | "soonMs" | "month"> & { readonly most: number },
): ListedKey[] {
  const used = sql`coalesce(${rateLimits.points}, 0)`;
  return db
    .select({ ...keyColumns, teamName: teams.name, monthUsed: sql<number>`${used}` })
    .from(keys)
    .innerJoin(teams, eq(teams.id, keys.teamId))
    .leftJoin(rateLimits, eq(rateLimits.key, sql`'month:key:' || ${keys.id} || ':' || ${month}`))
    .where(
      and(
        inArray(keys.teamId, [...teamIds]),
        isNull(keys.revokedAt),
        or(isNull(keys.expiresAt), sql`${keys.expiresAt} > ${now}`),
        or(
          sql`${keys.expiresAt} <= ${now + soonMs}`,
          sql`${keys.monthQuota} > 0 and ${used} >= 0.8 * ${keys.monthQuota}`,
        ),
      ),
    )
    .orderBy(sql`${used} * 1.0 / max(1, ${keys.monthQuota}) desc`)
    .limit(most)
    .all();
}

/** What a key has used of a month, reserved computations included. */
export function monthUsed(db: Database, keyId: string, month: string): number {
  return (
    db
      .select({ points: rateLimits.points })
      .from(rateLimits)
      .where(eq(rateLimits.key, `month:key:${keyId}:${month}`))
      .get()?.points ?? 0
  );
}

/** Secrets of a key that still count, and the end of each where it has one (Unix ms). */
export function endsOfSecrets(db: Database, keyId: string, now: number): (number | null)[] {
  return db.$client
    .prepare<[string, number]>(
      "select valid_until from key_secrets where key_id = ? and (valid_until is null or valid_until > ?) order by created_at",
    )
    .pluck()
    .all(keyId, now) as (number | null)[];
}
