import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { teams } from "./organisation";

/** A stored calculation: what was asked, what came out, with which versions. */
export const records = sqliteTable(
  "records",
  {
    id: text().primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    /** Operation that computed it: `resistance`. */
    operation: text().notNull(),
    label: text().notNull(),
    /** Shape of the catalogue, where there is one. */
    shape: text(),
    createdAt: integer("created_at").notNull(),
    byKind: text("by_kind").notNull(),
    byId: text("by_id").notNull(),
    byName: text("by_name").notNull(),
    request: text().notNull(),
    result: text().notNull(),
    materials: text({ mode: "json" }).$type<{ id: string; version: number }[]>().notNull(),
    engine: text().notNull(),
    catalogue: text().notNull(),
  },
  (table) => [
    index("records_team").on(table.teamId, table.createdAt, table.id),
    index("records_shape").on(table.teamId, table.shape, table.createdAt),
  ],
);
