import { and, asc, eq, gte, inArray, lte, type SQL, sql } from "drizzle-orm";
import type { SQLiteColumn } from "drizzle-orm/sqlite-core";
import type { Database } from "../client";
import { keys } from "../schema/keys";
import { teams } from "../schema/organisation";
import {
  usageDayClients,
  usageDayDetails,
  usageDayLatencies,
  usageDays,
  usageHourLatencies,
  usageHours,
} from "../schema/usage";

/** Whose usage is asked for: of some teams, or of everybody, signed-out pages included; perhaps of one key. */
export interface UsageScope {
  readonly teamIds: readonly string[] | "all";
  readonly keyId?: string;
}

/** Days since 1970 (UTC), both ends included. */
export interface Days {
  readonly from: number;
  readonly to: number;
}

export interface Counters {
  readonly requests: number;
  readonly computations: number;
  /** Answers of 400 and above. */
  readonly refused: number;
  /** Answers of 500 and above. */
  readonly failed: number;
  /** Sum over the requests, µs. */
  readonly latencyUs: number;
}

const counters = {
  requests: sql<number>`coalesce(sum(requests), 0)`,
  computations: sql<number>`coalesce(sum(computations), 0)`,
  refused: sql<number>`coalesce(sum(refused), 0)`,
  failed: sql<number>`coalesce(sum(failed), 0)`,
  latencyUs: sql<number>`coalesce(sum(latency_us), 0)`,
};

function within(scope: UsageScope, teamId: SQLiteColumn, keyId?: SQLiteColumn): SQL | undefined {
  return and(
    scope.teamIds === "all" ? undefined : inArray(teamId, [...scope.teamIds]),
    keyId && scope.keyId !== undefined ? eq(keyId, scope.keyId) : undefined,
  );
}

const between = (column: SQLiteColumn, { from, to }: Days) => and(gte(column, from), lte(column, to));

/** Sums over some days. */
export function usageTotal(db: Database, scope: UsageScope, days: Days): Counters {
  const row = db
    .select(counters)
    .from(usageDays)
    .where(and(within(scope, usageDays.teamId, usageDays.keyId), between(usageDays.day, days)))
    .get();
  return row ?? { requests: 0, computations: 0, refused: 0, failed: 0, latencyUs: 0 };
}

/** Sums day by day, oldest first; days without a call are left out. `at` counts days since 1970 (UTC). */
export function usageByDay(db: Database, scope: UsageScope, days: Days): (Counters & { at: number })[] {
  return db
    .select({ at: usageDays.day, ...counters })
    .from(usageDays)
    .where(and(within(scope, usageDays.teamId, usageDays.keyId), between(usageDays.day, days)))
    .groupBy(usageDays.day)
    .orderBy(asc(usageDays.day))
    .all();
}

/** Sums hour by hour, oldest first; hours without a call are left out. `at` counts hours since 1970 (UTC). */
export function usageByHour(db: Database, scope: UsageScope, days: Days): (Counters & { at: number })[] {
  const hours = { from: days.from * 24, to: days.to * 24 + 23 };
  return db
    .select({ at: usageHours.hour, ...counters })
    .from(usageHours)
    .where(and(within(scope, usageHours.teamId, usageHours.keyId), between(usageHours.hour, hours)))
    .groupBy(usageHours.hour)
    .orderBy(asc(usageHours.hour))
    .all();
}

export interface KeyUsage extends Counters {
  readonly keyId: string;
  readonly teamId: string;
  /** Null for pages and embeds, which have no key. */
  readonly name: string | null;
  readonly lastUsedAt: number | null;
}

export interface Page {
  readonly order: { readonly by: string; readonly descending: boolean };
  readonly limit: number;
  readonly offset: number;
}

const KEY_ORDERS: Readonly<Record<string, SQL>> = {
  name: sql`name collate nocase`,
  requests: sql`requests`,
  computations: sql`computations`,
  refused: sql`refused`,
  failed: sql`failed`,
  latency: sql`latency_us * 1.0 / max(1, requests)`,
};

/** Sums by caller over some days: keys, pages and embeds that called at all. */
export function usageByKey(
  db: Database,
  scope: UsageScope,
  days: Days,
  { order, limit, offset, search }: Page & { readonly search: string },
): { rows: KeyUsage[]; total: number } {
  const pattern = `%${search.replace(/[\\%_]/g, "\\$&")}%`;
  const sums = db.$with("sums").as(
    db
      .select({
        keyId: usageDays.keyId,
        teamId: sql<string>`max(${usageDays.teamId})`.as("sum_team"),
        requests: sql<number>`sum(requests)`.as("requests"),
        computations: sql<number>`sum(computations)`.as("computations"),
        refused: sql<number>`sum(refused)`.as("refused"),
        failed: sql<number>`sum(failed)`.as("failed"),
        latencyUs: sql<number>`sum(latency_us)`.as("latency_us"),
      })
      .from(usageDays)
      .where(and(within(scope, usageDays.teamId, usageDays.keyId), between(usageDays.day, days)))
      .groupBy(usageDays.keyId),
  );
  const rows = db
    .with(sums)
    .select({
      keyId: sums.keyId,
      teamId: sums.teamId,
      requests: sums.requests,
      computations: sums.computations,
      refused: sums.refused,
      failed: sums.failed,
      latencyUs: sums.latencyUs,
      name: keys.name,
      lastUsedAt: keys.lastUsedAt,
      total: sql<number>`count(*) over ()`,
    })
    .from(sums)
    .leftJoin(keys, eq(keys.id, sums.keyId))
    .where(
      search === ""
        ? undefined
        : sql`(${keys.name} like ${pattern} escape '\\' or ${sums.keyId} like ${pattern} escape '\\')`,
    )
    .orderBy(
      sql`${KEY_ORDERS[order.by] ?? KEY_ORDERS.requests} ${sql.raw(order.descending ? "desc" : "asc")}`,
      asc(sums.keyId),
    )
    .limit(limit)
    .offset(offset)
    .all();
  return { rows: rows.map(({ total: _total, ...row }) => row), total: rows[0]?.total ?? 0 };
}

export interface Share {
  /** Operation, shape, status, team or client; empty: none. */
  readonly name: string;
  readonly requests: number;
  readonly computations: number;
}

export const BREAKDOWNS = ["operation", "shape", "status", "team", "client"] as const;
export type Breakdown = (typeof BREAKDOWNS)[number];

const most = (rows: Share[]) => rows.sort((a, b) => b.requests - a.requests);

/** What the calls of some days divide into. For one key only by client: the other sums are kept by team. */
export function usageShares(db: Database, scope: UsageScope, days: Days, by: Breakdown): Share[] {
  const sums = {
    requests: sql<number>`sum(requests)`,
    computations: sql<number>`sum(computations)`,
  };
  if (by === "client") {
    const table = usageDayClients;
    return most(
      db
        .select({ name: table.client, ...sums })
        .from(table)
        .where(and(within(scope, table.teamId, table.keyId), between(table.day, days)))
        .groupBy(table.client)
        .all(),
    );
  }
  const table = usageDayDetails;
  const column = {
    operation: table.operation,
    shape: table.shape,
    status: sql<string>`cast(${table.status} as text)`,
    team: table.teamId,
  }[by];
  return most(
    db
      .select({ name: column, ...sums })
      .from(table)
      .where(and(eachTeam(scope, table.teamId), between(table.day, days)))
      .groupBy(column)
      .all(),
  );
}

/** Requests by bucket of latency over some days, whole or day by day or hour by hour (`at`), lowest bucket first. */
export function latencyBuckets(
  db: Database,
  scope: UsageScope,
  days: Days,
  by: "all" | "day" | "hour",
): { at: number; bucket: number; requests: number }[] {
  if (by === "hour") {
    const table = usageHourLatencies;
    const hours = { from: days.from * 24, to: days.to * 24 + 23 };
    return db
      .select({ at: table.hour, bucket: table.bucket, requests: sql<number>`sum(${table.requests})` })
      .from(table)
      .where(and(eachTeam(scope, table.teamId), between(table.hour, hours)))
      .groupBy(table.hour, table.bucket)
      .orderBy(asc(table.hour), asc(table.bucket))
      .all();
  }
  const table = usageDayLatencies;
  // Not a bare 0: ORDER BY would take it for a column's number.
  const at = by === "day" ? sql<number>`${table.day}` : sql<number>`${table.day} * 0`;
  return db
    .select({ at, bucket: table.bucket, requests: sql<number>`sum(${table.requests})` })
    .from(table)
    .where(and(eachTeam(scope, table.teamId), between(table.day, days)))
    .groupBy(at, table.bucket)
    .orderBy(asc(at), asc(table.bucket))
    .all();
}

/** The teams of a scope one by one, so that an index that begins with the team serves everybody's usage as well. */
export function eachTeam({ teamIds }: UsageScope, column: SQLiteColumn): SQL {
  return teamIds === "all"
    ? sql`${column} in (select ${teams.id} from ${teams} union all select '')`
    : inArray(column, [...teamIds]);
}

/** Kinds of client that called with a key since a day, the latest first. */
export function clientsOfKey(
  db: Database,
  keyId: string,
  sinceDay: number,
): { client: string; requests: number; lastAt: number }[] {
  const table = usageDayClients;
  return db
    .select({
      client: table.client,
      requests: sql<number>`sum(${table.requests})`,
      lastAt: sql<number>`max(${table.lastAt})`,
    })
    .from(table)
    .where(and(eq(table.keyId, keyId), gte(table.day, sinceDay)))
    .groupBy(table.client)
    .orderBy(sql`max(${table.lastAt}) desc`)
    .all();
}
