import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";
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

/** Which records used a material, in which version: the same as `materials` there, to be looked up from the other side. */
export const recordMaterials = sqliteTable(
  "record_materials",
  {
    materialId: text("material_id").notNull(),
    recordId: text("record_id")
      .notNull()
      .references(() => records.id, { onDelete: "cascade" }),
    version: integer().notNull(),
    teamId: text("team_id").notNull(),
    createdAt: integer("created_at").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.materialId, table.recordId] }),
    index("record_materials_record").on(table.recordId),
    index("record_materials_used").on(table.materialId, table.teamId, table.createdAt),
  ],
);
