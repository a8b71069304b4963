import { and, asc, eq, inArray, sql } from "drizzle-orm";
import type { Database } from "../client";
import { materials, materialVersions } from "../schema/materials";
import { teams } from "../schema/organisation";
import { recordMaterials } from "../schema/records";
import { type MaterialRow, materialColumns } from "./materials";

/** One version with the moment it was made. */
export interface MaterialVersionRow extends MaterialRow {
  readonly madeAt: number;
}

/** The newest versions of all materials of some teams, retired ones included. */
export function materialsOfTeams(
  db: Database,
  teamIds: readonly string[],
): (MaterialRow & { teamName: string })[] {
  return db
    .select({ ...materialColumns, teamName: teams.name })
    .from(materials)
    .innerJoin(teams, eq(teams.id, materials.teamId))
    .innerJoin(
      materialVersions,
      and(eq(materialVersions.materialId, materials.id), eq(materialVersions.version, materials.version)),
    )
    .where(inArray(materials.teamId, [...teamIds]))
    .all();
}

/** Every version of a material, the first one first; whether the reader may see it is the caller's question. */
export function versionsOfMaterial(db: Database, id: string): MaterialVersionRow[] {
  return db
    .select({ ...materialColumns, madeAt: materialVersions.createdAt })
    .from(materials)
    .innerJoin(teams, eq(teams.id, materials.teamId))
    .innerJoin(materialVersions, eq(materialVersions.materialId, materials.id))
    .where(eq(materials.id, id))
    .orderBy(asc(materialVersions.version))
    .all();
}

/** In how many records of some teams each material stands. */
export function recordsByMaterial(db: Database, teamIds: readonly string[]): Map<string, number> {
  const rows = db
    .select({ id: recordMaterials.materialId, records: sql<number>`count(*)` })
    .from(recordMaterials)
    .where(inArray(recordMaterials.teamId, [...teamIds]))
    .groupBy(recordMaterials.materialId)
    .all();
  return new Map(rows.map(({ id, records }) => [id, records]));
}
