import type { Database } from "@/db/client";
import { latestEvents, type UsageEventRow } from "@/db/queries/usage-events";
import {
  type Breakdown,
  type Counters,
  type Days,
  latencyBuckets,
  type Share,
  usageByDay,
  usageByHour,
  type UsageScope,
  usageShares,
  usageTotal,
} from "@/db/queries/usage-sums";
import type { Caller } from "./caller-names";
import { exactPercentiles, type Percentiles, percentilesOf } from "./percentiles";

export const HOUR_MS = 3_600_000;
export const DAY_MS = 24 * HOUR_MS;

/** Longest time that is shown at once, days. */
export const MOST_DAYS = 366;
/** Longest time that is shown hour by hour, days. */
export const MOST_HOURLY_DAYS = 7;
/** Calls of one caller from which its shares and percentiles are made: sums are kept by team. */
export const SAMPLED_CALLS = 5_000;

export interface Period extends Percentiles {
  /** Start, ISO 8601 (UTC). */
  readonly at: string;
  readonly requests: number;
  readonly computations: number;
  readonly refused: number;
  readonly failed: number;
  readonly meanMs: number | null;
}

export type Total = Omit<Period, "at">;

const NONE: Counters = { requests: 0, computations: 0, refused: 0, failed: 0, latencyUs: 0 };
const UNKNOWN: Percentiles = { p50Ms: null, p95Ms: null, p99Ms: null };

function period(sums: Counters, percentiles: Percentiles): Total {
  const { requests, computations, refused, failed, latencyUs } = sums;
  const meanMs = requests === 0 ? null : latencyUs / requests / 1000;
  return { requests, computations, refused, failed, meanMs, ...percentiles };
}

/** Sums and percentiles of some days. One caller's percentiles are those of its latest calls in these days. */
export function totalOf(db: Database, scope: UsageScope, days: Days): Total {
  return period(usageTotal(db, scope, days), percentilesIn(db, scope, days));
}

function percentilesIn(db: Database, scope: UsageScope, days: Days): Percentiles {
  return scope.keyId === undefined
    ? percentilesOf(latencyBuckets(db, scope, days, "all"))
    : exactPercentiles(sampleOf(db, scope, days).map(({ latencyUs }) => latencyUs));
}

/** Some days whole and one by one (or hour by hour): the sums are read once, the whole is their sum. */
export function usageOf(
  db: Database,
  scope: UsageScope,
  days: Days,
  by: "day" | "hour",
  now: number,
): { total: Total; periods: Period[] } {
  const periods = periodsOf(db, scope, days, by, now);
  const sum = (of: (each: Period) => number) => periods.reduce((total, each) => total + of(each), 0);
  const sums: Counters = {
    requests: sum(({ requests }) => requests),
    computations: sum(({ computations }) => computations),
    refused: sum(({ refused }) => refused),
    failed: sum(({ failed }) => failed),
    latencyUs: sum(({ requests, meanMs }) => 1000 * requests * (meanMs ?? 0)),
  };
  return { total: period(sums, percentilesIn(db, scope, days)), periods };
}

/** The days or hours of a time one by one, quiet ones included; those of the future are left out. */
export function periodsOf(
  db: Database,
  scope: UsageScope,
  days: Days,
  by: "day" | "hour",
  now: number,
): Period[] {
  const stepMs = by === "day" ? DAY_MS : HOUR_MS;
  const sums = new Map(
    (by === "day" ? usageByDay(db, scope, days) : usageByHour(db, scope, days)).map((row) => [row.at, row]),
  );
  const histograms = new Map<number, { bucket: number; requests: number }[]>();
  if (scope.keyId === undefined) {
    for (const { at, ...bucket } of latencyBuckets(db, scope, days, by)) {
      const one = histograms.get(at);
      if (one) one.push(bucket);
      else histograms.set(at, [bucket]);
    }
  }
  const first = (days.from * DAY_MS) / stepMs;
  const last = Math.min(((days.to + 1) * DAY_MS) / stepMs - 1, Math.floor(now / stepMs));
  const found: Period[] = [];
  for (let at = first; at <= last; at++) {
    const buckets = histograms.get(at);
    found.push({
      at: new Date(at * stepMs).toISOString(),
      ...period(sums.get(at) ?? NONE, buckets ? percentilesOf(buckets) : UNKNOWN),
    });
  }
  return found;
}

export interface Shares {
  readonly rows: readonly Share[];
  /** Calls that were looked through, where they are not all of the time. */
  readonly sampled: number | null;
}

/** What the calls divide into. Of one caller's, what its latest calls divide into, but for clients. */
export function sharesOf(db: Database, scope: UsageScope, days: Days, by: Breakdown): Shares {
  if (scope.keyId === undefined || by === "client")
    return { rows: usageShares(db, scope, days, by), sampled: null };
  const events = sampleOf(db, scope, days);
  const sums = new Map<string, { requests: number; computations: number }>();
  for (const event of events) {
    const name = {
      operation: event.operation,
      shape: event.shape ?? "",
      status: String(event.status),
      team: event.teamId,
    }[by];
    const sum = sums.get(name) ?? { requests: 0, computations: 0 };
    sums.set(name, {
      requests: sum.requests + 1,
      computations: sum.computations + event.computations,
    });
  }
  const rows = [...sums].map(([name, sum]) => ({ name, ...sum })).sort((a, b) => b.requests - a.requests);
  return { rows, sampled: events.length === SAMPLED_CALLS ? SAMPLED_CALLS : null };
}

function sampleOf(db: Database, scope: UsageScope, days: Days): UsageEventRow[] {
  return latestEvents(db, { scope, from: days.from * DAY_MS, to: (days.to + 1) * DAY_MS }, SAMPLED_CALLS);
}

/** A single request as pages show it. */
export interface RequestView {
  readonly requestId: string;
  readonly at: string;
  readonly caller: Caller;
  readonly teamId: string;
  readonly operation: string;
  readonly shape: string | null;
  readonly status: number;
  readonly latencyMs: number;
  readonly computations: number;
  readonly client: string;
}

export function requestView(row: UsageEventRow, nameOf: (id: string) => Caller): RequestView {
  return {
    requestId: row.requestId,
    at: new Date(row.at).toISOString(),
    caller: nameOf(row.keyId),
    teamId: row.teamId,
    operation: row.operation,
    shape: row.shape,
    status: row.status,
    latencyMs: row.latencyUs / 1000,
    computations: row.computations,
    client: row.client,
  };
}
