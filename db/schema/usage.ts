import { sql } from "drizzle-orm";
import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";

/** One call. Sums below are written in the same transaction, so nothing ever has to be counted from here. */
export const usageEvents = sqliteTable(
  "usage_events",
  {
    /** In the order of time. */
    id: integer().primaryKey(),
    at: integer().notNull(),
    requestId: text("request_id").notNull(),
    /** A key's id, or `signed-out` for the pages' own calls. */
    keyId: text("key_id").notNull(),
    /** Empty for signed-out calls. */
    teamId: text("team_id").notNull(),
    operation: text().notNull(),
    /** Shape computed, where there was one. */
    shape: text(),
    status: integer().notNull(),
    latencyUs: integer("latency_us").notNull(),
    computations: integer().notNull(),
    client: text().notNull(),
  },
  (table) => [
    index("usage_events_key").on(table.keyId, table.at),
    index("usage_events_team").on(table.teamId, table.at),
    index("usage_events_at").on(table.at),
    index("usage_events_refused")
      .on(table.at)
      .where(sql`status >= 400`),
  ],
);

const counters = {
  requests: integer().notNull(),
  computations: integer().notNull(),
  /** Answers of 400 and above. */
  refused: integer().notNull(),
  /** Among them answers of 500 and above. */
  failed: integer().notNull(),
  latencyUs: integer("latency_us").notNull(),
};

/** By hour (hours since 1970, UTC) and key. */
export const usageHours = sqliteTable(
  "usage_hours",
  {
    hour: integer().notNull(),
    keyId: text("key_id").notNull(),
    teamId: text("team_id").notNull(),
    ...counters,
  },
  (table) => [
    primaryKey({ columns: [table.keyId, table.hour] }),
    index("usage_hours_team").on(table.teamId, table.hour),
    index("usage_hours_hour").on(table.hour),
  ],
);

/** By day (days since 1970, UTC) and key. */
export const usageDays = sqliteTable(
  "usage_days",
  {
    day: integer().notNull(),
    keyId: text("key_id").notNull(),
    teamId: text("team_id").notNull(),
    ...counters,
  },
  (table) => [
    primaryKey({ columns: [table.keyId, table.day] }),
    index("usage_days_team").on(table.teamId, table.day),
    index("usage_days_day").on(table.day),
  ],
);

/** What a team did in a day, by operation, shape (empty: none) and status. */
export const usageDayDetails = sqliteTable(
  "usage_day_details",
  {
    day: integer().notNull(),
    teamId: text("team_id").notNull(),
    operation: text().notNull(),
    shape: text().notNull(),
    status: integer().notNull(),
    requests: integer().notNull(),
    computations: integer().notNull(),
  },
  (table) => [primaryKey({ columns: [table.teamId, table.day, table.operation, table.shape, table.status] })],
);

/** Histogram of latencies by hour and team, four buckets an octave (`latencyBucket`), for percentiles. */
export const usageHourLatencies = sqliteTable(
  "usage_hour_latencies",
  {
    hour: integer().notNull(),
    teamId: text("team_id").notNull(),
    bucket: integer().notNull(),
    requests: integer().notNull(),
  },
  (table) => [primaryKey({ columns: [table.teamId, table.hour, table.bucket] })],
);

/** Which kinds of client a key was called by in a day: whom a revoked key would hurt. */
export const usageDayClients = sqliteTable(
  "usage_day_clients",
  {
    day: integer().notNull(),
    keyId: text("key_id").notNull(),
    teamId: text("team_id").notNull(),
    client: text().notNull(),
    requests: integer().notNull(),
    computations: integer().notNull(),
    /** The last call of that day. */
    lastAt: integer("last_at").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.keyId, table.day, table.client] }),
    index("usage_day_clients_day").on(table.day),
  ],
);

/** The same histogram by day, for months: an hour's is too many rows there. */
export const usageDayLatencies = sqliteTable(
  "usage_day_latencies",
  {
    day: integer().notNull(),
    teamId: text("team_id").notNull(),
    bucket: integer().notNull(),
    requests: integer().notNull(),
  },
  (table) => [primaryKey({ columns: [table.teamId, table.day, table.bucket] })],
);
