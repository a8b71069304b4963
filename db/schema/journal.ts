import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";

/** Who did what. Append-only: triggers refuse changes and deletions. */
export const activity = sqliteTable(
  "activity",
  {
    seq: integer().primaryKey({ autoIncrement: true }),
    id: text().notNull(),
    at: integer().notNull(),
    actorKind: text("actor_kind", { enum: ["key", "person", "shell", "service"] }).notNull(),
    actorId: text("actor_id").notNull(),
    actorName: text("actor_name").notNull(),
    teamId: text("team_id"),
    /** `key.issue`, `material.retire` … */
    action: text().notNull(),
    subjectKind: text("subject_kind").notNull(),
    subjectId: text("subject_id").notNull(),
    before: text({ mode: "json" }).$type<unknown>(),
    after: text({ mode: "json" }).$type<unknown>(),
    /** Address the call came from; null on the shell. */
    address: text(),
    requestId: text("request_id"),
  },
  (table) => [
    index("activity_team").on(table.teamId, table.seq),
    index("activity_subject").on(table.subjectId),
  ],
);

/** Answers kept for repeats of a call with the same `Idempotency-Key`. */
export const idempotency = sqliteTable(
  "idempotency",
  {
    /** Key or person the header belongs to: two callers may choose the same value. */
    owner: text().notNull(),
    key: text().notNull(),
    /** SHA-256 of method, path and body. */
    fingerprint: text().notNull(),
    /** Null while the first call is running. */
    status: integer(),
    headers: text({ mode: "json" }).$type<Record<string, string>>(),
    body: text(),
    startedAt: integer("started_at").notNull(),
    expiresAt: integer("expires_at").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.owner, table.key] }),
    index("idempotency_expires").on(table.expiresAt),
  ],
);

/** Counters of rate-limiter-flexible, in the layout it expects. */
export const rateLimits = sqliteTable("rate_limits", {
  key: text().primaryKey(),
  points: integer().notNull().default(0),
  expire: integer(),
});

/** What administrators set while the service runs. */
export const settings = sqliteTable("settings", {
  name: text().primaryKey(),
  value: text({ mode: "json" }).$type<unknown>().notNull(),
  updatedAt: integer("updated_at").notNull(),
});
