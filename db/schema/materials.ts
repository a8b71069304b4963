import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { teams } from "./organisation";

/** A team's own material; the library lives in the engine. */
export const materials = sqliteTable(
  "materials",
  {
    id: text().primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    /** Number of the newest version. */
    version: integer().notNull(),
    createdAt: integer("created_at").notNull(),
    retiredAt: integer("retired_at"),
  },
  (table) => [index("materials_team").on(table.teamId, table.createdAt, table.id)],
);

/** Every version ever made: a record pins one and can be replayed with it. */
export const materialVersions = sqliteTable(
  "material_versions",
  {
    materialId: text("material_id")
      .notNull()
      .references(() => materials.id),
    version: integer().notNull(),
    /** Name, kind, law, range, uncertainty, source and provenance. */
    data: text({ mode: "json" }).$type<unknown>().notNull(),
    createdAt: integer("created_at").notNull(),
    createdBy: text("created_by").notNull(),
  },
  (table) => [primaryKey({ columns: [table.materialId, table.version] })],
);
