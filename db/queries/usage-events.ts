import { and, desc, eq, gte, inArray, lt, type SQL, sql } from "drizzle-orm";
import type { Database } from "../client";
import { usageEvents, usageHourLatencies } from "../schema/usage";
import { latencyBucket } from "./usage";
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
 * The slowest requests of some hours (since 1970, UTC; both included). The histograms tell in which hours they lie, so
 * that only those are read and never the whole time.
 */
export function slowestEvents(
  db: Database,
  scope: UsageScope,
  hours: { readonly from: number; readonly to: number },
  most: number,
): UsageEventRow[] {
  const table = usageHourLatencies;
  const buckets = db
    .select({ hour: table.hour, teamId: table.teamId, bucket: table.bucket, requests: table.requests })
    .from(table)
    .where(and(gte(table.hour, hours.from), lt(table.hour, hours.to + 1), eachTeam(scope, table.teamId)))
    .orderBy(desc(table.bucket))
    .limit(most)
    .all();
  // Every bucket holds a request at least, so the slowest ones lie in the first buckets.
  const places = new Map(buckets.map(({ hour, teamId }) => [`${hour} ${teamId}`, { hour, teamId }]));
  const lowest = buckets.at(-1)?.bucket ?? 0;
  const found = [...places.values()].flatMap(({ hour, teamId }) =>
    db
      .select()
      .from(usageEvents)
      .where(
        and(
          eq(usageEvents.teamId, teamId),
          gte(usageEvents.at, hour * 3_600_000),
          lt(usageEvents.at, (hour + 1) * 3_600_000),
          gte(usageEvents.latencyUs, Math.floor(2 ** (lowest / 4)) - 1),
        ),
      )
      .orderBy(desc(usageEvents.latencyUs))
      .limit(most)
      .all(),
  );
  return found
    .filter(({ latencyUs }) => latencyBucket(latencyUs) >= lowest)
    .sort((a, b) => b.latencyUs - a.latencyUs)
    .slice(0, most);
}
