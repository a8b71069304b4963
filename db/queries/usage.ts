import { and, asc, eq, gte, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import {
  usageDayClients,
  usageDayDetails,
  usageDayLatencies,
  usageDays,
  usageEvents,
  usageHourLatencies,
  usageHours,
} from "../schema/usage";
import { markUsed } from "./keys";

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;

export interface UsageEvent {
  /** Unix time, ms. */
  readonly at: number;
  readonly requestId: string;
  readonly keyId: string;
  readonly teamId: string;
  readonly operation: string;
  readonly shape: string | null;
  readonly status: number;
  readonly latencyUs: number;
  readonly computations: number;
  readonly client: string;
}

/** Bucket of a latency: four an octave, from 1 µs; a bucket spans 19 %. */
export function latencyBucket(latencyUs: number): number {
  return Math.floor(4 * Math.log2(Math.max(1, latencyUs)));
}

/** Middle (geometric) of a bucket, µs. */
export function latencyOfBucket(bucket: number): number {
  return 2 ** ((bucket + 0.5) / 4);
}

const place = (name: string) => sql`${sql.placeholder(name)}`;

function statements(db: Database) {
  const counters = {
    requests: sql`1`,
    computations: place("computations"),
    refused: place("refused"),
    failed: place("failed"),
    latencyUs: place("latencyUs"),
  };
  return {
    event: db
      .insert(usageEvents)
      .values({
        at: place("at"),
        requestId: place("requestId"),
        keyId: place("keyId"),
        teamId: place("teamId"),
        operation: place("operation"),
        shape: place("shape"),
        status: place("status"),
        latencyUs: place("latencyUs"),
        computations: place("computations"),
        client: place("client"),
      })
      .prepare(),
    hour: db
      .insert(usageHours)
      .values({ hour: place("hour"), keyId: place("keyId"), teamId: place("teamId"), ...counters })
      .onConflictDoUpdate({
        target: [usageHours.keyId, usageHours.hour],
        set: {
          requests: sql`requests + 1`,
          computations: sql`computations + excluded.computations`,
          refused: sql`refused + excluded.refused`,
          failed: sql`failed + excluded.failed`,
          latencyUs: sql`latency_us + excluded.latency_us`,
        },
      })
      .prepare(),
    day: db
      .insert(usageDays)
      .values({ day: place("day"), keyId: place("keyId"), teamId: place("teamId"), ...counters })
      .onConflictDoUpdate({
        target: [usageDays.keyId, usageDays.day],
        set: {
          requests: sql`requests + 1`,
          computations: sql`computations + excluded.computations`,
          refused: sql`refused + excluded.refused`,
          failed: sql`failed + excluded.failed`,
          latencyUs: sql`latency_us + excluded.latency_us`,
        },
      })
      .prepare(),
    detail: db
      .insert(usageDayDetails)
      .values({
        day: place("day"),
        teamId: place("teamId"),
        operation: place("operation"),
        shape: place("shapeOrEmpty"),
        status: place("status"),
        requests: sql`1`,
        computations: place("computations"),
      })
      .onConflictDoUpdate({
        target: [
          usageDayDetails.teamId,
          usageDayDetails.day,
          usageDayDetails.operation,
          usageDayDetails.shape,
          usageDayDetails.status,
        ],
        set: { requests: sql`requests + 1`, computations: sql`computations + excluded.computations` },
      })
      .prepare(),
    latency: db
      .insert(usageHourLatencies)
      .values({ hour: place("hour"), teamId: place("teamId"), bucket: place("bucket"), requests: sql`1` })
      .onConflictDoUpdate({
        target: [usageHourLatencies.teamId, usageHourLatencies.hour, usageHourLatencies.bucket],
        set: { requests: sql`requests + 1` },
      })
      .prepare(),
    dayLatency: db
      .insert(usageDayLatencies)
      .values({ day: place("day"), teamId: place("teamId"), bucket: place("bucket"), requests: sql`1` })
      .onConflictDoUpdate({
        target: [usageDayLatencies.teamId, usageDayLatencies.day, usageDayLatencies.bucket],
        set: { requests: sql`requests + 1` },
      })
      .prepare(),
    client: db
      .insert(usageDayClients)
      .values({
        day: place("day"),
        keyId: place("keyId"),
        teamId: place("teamId"),
        client: place("client"),
        requests: sql`1`,
        computations: place("computations"),
        lastAt: place("at"),
      })
      .onConflictDoUpdate({
        target: [usageDayClients.keyId, usageDayClients.day, usageDayClients.client],
        set: {
          requests: sql`requests + 1`,
          computations: sql`computations + excluded.computations`,
          lastAt: sql`max(last_at, excluded.last_at)`,
        },
      })
      .prepare(),
  };
}

/** Writes a call and every sum it belongs to. Call it inside a transaction: they stand or fall together. */
export function insertUsage(db: Database, event: UsageEvent): void {
  const run = prepared(db, "usage.event-and-sums", statements);
  const row = {
    ...event,
    hour: Math.floor(event.at / HOUR_MS),
    day: Math.floor(event.at / DAY_MS),
    shapeOrEmpty: event.shape ?? "",
    refused: event.status >= 400 ? 1 : 0,
    failed: event.status >= 500 ? 1 : 0,
    bucket: latencyBucket(event.latencyUs),
  };
  run.event.run(row);
  run.hour.run(row);
  run.day.run(row);
  run.detail.run(row);
  run.latency.run(row);
  run.dayLatency.run(row);
  run.client.run(row);
  markUsed(db, event.keyId, event.at, event.client);
}

export interface DaySum {
  /** `2025-03-01`, UTC. */
  readonly day: string;
  readonly requests: number;
  readonly computations: number;
  readonly refused: number;
}

/** The days of one key since a moment (Unix ms), oldest first; days without a call are left out. */
export function daysOfKey(db: Database, keyId: string, since: number): DaySum[] {
  return db
    .select({
      day: usageDays.day,
      requests: usageDays.requests,
      computations: usageDays.computations,
      refused: usageDays.refused,
    })
    .from(usageDays)
    .where(and(eq(usageDays.keyId, keyId), gte(usageDays.day, Math.floor(since / DAY_MS))))
    .orderBy(asc(usageDays.day))
    .all()
    .map((row) => ({ ...row, day: new Date(row.day * DAY_MS).toISOString().slice(0, 10) }));
}

/** Adds computations that end after their call was counted: to the sums, and to the call where it is named. */
export function addComputations(
  db: Database,
  at: number,
  { keyId, teamId, operation, status, computations, call }: LateComputations,
): void {
  const hour = Math.floor(at / HOUR_MS);
  const day = Math.floor(at / DAY_MS);
  const more = { computations: sql`computations + ${computations}` };
  const none = { requests: 0, refused: 0, failed: 0, latencyUs: 0, computations };
  if (call) {
    db.update(usageEvents)
      .set(more)
      .where(
        and(
          eq(usageEvents.keyId, keyId),
          gte(usageEvents.at, call.since),
          eq(usageEvents.requestId, call.requestId),
        ),
      )
      .run();
  }
  db.insert(usageHours)
    .values({ hour, keyId, teamId, ...none })
    .onConflictDoUpdate({ target: [usageHours.keyId, usageHours.hour], set: more })
    .run();
  db.insert(usageDays)
    .values({ day, keyId, teamId, ...none })
    .onConflictDoUpdate({ target: [usageDays.keyId, usageDays.day], set: more })
    .run();
  db.insert(usageDayDetails)
    .values({ day, teamId, operation, shape: "", status, requests: 0, computations })
    .onConflictDoUpdate({
      target: [
        usageDayDetails.teamId,
        usageDayDetails.day,
        usageDayDetails.operation,
        usageDayDetails.shape,
        usageDayDetails.status,
      ],
      set: more,
    })
    .run();
}

/** Computations of a job or of a batch, at the moment it ended. */
export interface LateComputations {
  readonly keyId: string;
  readonly teamId: string;
  readonly operation: string;
  readonly status: number;
  readonly computations: number;
  /** The call that they belong to, which came no earlier than `since` (Unix ms); a job outlives its call. */
  readonly call?: { readonly requestId: string; readonly since: number };
}
