import { and, desc, eq, gte, inArray, lt, type SQL, sql } from "drizzle-orm";
import type { Database } from "../client";
import { usageEvents, usageHourLatencies } from "../schema/usage";
import { eachTeam, type UsageScope } from "./usage-sums";

export type UsageEventRow = typeof usageEvents.$inferSelect;

/** Which single requests are asked for. */
export interface EventFilter {
  readonly scope: UsageScope;
  /** Unix ms, the end not included. */
  readonly from: number;
  readonly to: number;
  /** `2xx`: answered, `4xx`: refused, `5xx`: failed, `error`: both. */
  readonly statuses?: "2xx" | "4xx" | "5xx" | "error";
  readonly operation?: string;
  readonly shape?: string;
  readonly requestId?: string;
}

const STATUSES: Readonly<Record<NonNullable<EventFilter["statuses"]>, SQL>> = {
  "2xx": sql`status < 400`,
  "4xx": sql`status >= 400 and status < 500`,
  "5xx": sql`status >= 400 and status >= 500`,
  error: sql`status >= 400`,
};

function matches({ scope, from, to, statuses, operation, shape, requestId }: EventFilter): SQL | undefined {
  return and(
    gte(usageEvents.at, from),
    lt(usageEvents.at, to),
    // A unary plus keeps the teams from choosing the index where the time or the key narrows it down more.
    scope.teamIds === "all"
      ? undefined
      : scope.teamIds.length === 1 && scope.keyId === undefined && statuses === undefined
        ? eq(usageEvents.teamId, scope.teamIds[0])
        : sql`+${inArray(usageEvents.teamId, [...scope.teamIds])}`,
    scope.keyId === undefined ? undefined : eq(usageEvents.keyId, scope.keyId),
    statuses && STATUSES[statuses],
    operation === undefined ? undefined : eq(usageEvents.operation, operation),
    shape === undefined ? undefined : eq(usageEvents.shape, shape),
    requestId === undefined ? undefined : eq(usageEvents.requestId, requestId),
  );
}

/** Single requests, newest first, and how many there are; they are counted up to `countUpTo`. */
export function listEvents(
  db: Database,
  filter: EventFilter,
  {
    limit,
    offset,
    countUpTo,
  }: { readonly limit: number; readonly offset: number; readonly countUpTo: number },
): { rows: UsageEventRow[]; total: number; more: boolean } {
  const where = matches(filter);
  const rows = db
    .select()
    .from(usageEvents)
    .where(where)
    .orderBy(desc(usageEvents.at))
    .limit(limit)
    .offset(offset)
    .all();
  const some = db
    .select({ one: sql`1`.as("one") })
    .from(usageEvents)
    .where(where)
    .limit(countUpTo + 1)
    .as("some");
  const counted =
    db
      .select({ total: sql<number>`count(*)` })
      .from(some)
      .get()?.total ?? 0;
  return { rows, total: Math.min(counted, countUpTo), more: counted > countUpTo };
}

/** The latest requests, for numbers that are kept by no sum. */
export function latestEvents(db: Database, filter: EventFilter, most: number): UsageEventRow[] {
  return db.select().from(usageEvents).where(matches(filter)).orderBy(desc(usageEvents.at)).limit(most).all();
}

/**
 * The slowest requests of some hours (since 1970, UTC; both included). The histograms tell from which latency on there
 * are enough, and in which hours those lie: only these hours are read.
 */
export function slowestEvents(
  db: Database,
  scope: UsageScope,
  hours: { readonly from: number; readonly to: number },
  most: number,
): UsageEventRow[] {
  const table = usageHourLatencies;
  const counted = db
    .select({ hour: table.hour, bucket: table.bucket, requests: sql<number>`sum(${table.requests})` })
    .from(table)
    .where(and(eachTeam(scope, table.teamId), gte(table.hour, hours.from), lt(table.hour, hours.to + 1)))
    .groupBy(table.hour, table.bucket)
    .orderBy(desc(table.bucket))
    .all();
  let enough = 0;
  const lowest = counted.find(({ requests }) => (enough += requests) >= most)?.bucket ?? 0;
  const slow = new Set(counted.filter(({ bucket }) => bucket >= lowest).map(({ hour }) => hour));
  const found = [...slow].flatMap((hour) =>
    db
      .select()
      .from(usageEvents)
      .where(
        and(
          matches({ scope, from: hour * 3_600_000, to: (hour + 1) * 3_600_000 }),
          // A hair below the bucket's edge, whose logarithm may round either way.
          gte(usageEvents.latencyUs, Math.floor(2 ** (lowest / 4)) - 1),
        ),
      )
      .orderBy(desc(usageEvents.latencyUs))
      .limit(most)
      .all(),
  );
  return found.sort((a, b) => b.latencyUs - a.latencyUs).slice(0, most);
}
