import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { teams } from "./organisation";

/** A widget of a team. What its visitors see and may change lies in its versions; the rest counts at once. */
export const embeds = sqliteTable(
  "embeds",
  {
    id: text().primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    name: text().notNull(),
    /** Origins of pages that may frame it. */
    origins: text({ mode: "json" }).$type<string[]>().notNull(),
    /** Computations a calendar month (UTC), all pages together. */
    monthQuota: integer("month_quota").notNull(),
    /** Number of the version that pages show; null before the first one is published. */
    publishedVersion: integer("published_version"),
    createdAt: integer("created_at").notNull(),
    createdBy: text("created_by").notNull(),
    withdrawnAt: integer("withdrawn_at"),
  },
  (table) => [index("embeds_team").on(table.teamId, table.createdAt)],
);

/** What a widget is, version by version. A published one never changes; there is at most one draft, the newest. */
export const embedVersions = sqliteTable(
  "embed_versions",
  {
    embedId: text("embed_id")
      .notNull()
      .references(() => embeds.id),
    number: integer().notNull(),
    definition: text({ mode: "json" }).$type<unknown>().notNull(),
    createdAt: integer("created_at").notNull(),
    createdBy: text("created_by").notNull(),
    /** When a draft was saved last; a person's save names the one it was made from. */
    savedAt: integer("saved_at").notNull(),
    /** Null: a draft. */
    publishedAt: integer("published_at"),
    publishedBy: text("published_by"),
    /** Version that a roll-back brought back in this one. */
    restores: integer(),
  },
  (table) => [primaryKey({ columns: [table.embedId, table.number] })],
);

/** What a widget's visitors asked for, by day (days since 1970, UTC) and the origin of the page around it. */
export const embedUsage = sqliteTable(
  "embed_usage",
  {
    embedId: text("embed_id").notNull(),
    day: integer().notNull(),
    /** Empty where the browser did not tell it. */
    host: text().notNull(),
    requests: integer().notNull(),
    computations: integer().notNull(),
    refused: integer().notNull(),
  },
  (table) => [primaryKey({ columns: [table.embedId, table.day, table.host] })],
);
