import { and, asc, eq, gt, isNull, or, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { materials, materialVersions } from "../schema/materials";
import { teams } from "../schema/organisation";
import type { Mark } from "./keys";

/** One version of a team's material; `data` is validated by the service that wrote it. */
export interface MaterialRow {
  readonly id: string;
  readonly teamId: string;
  /** The owning team's short name. */
  readonly team: string;
  readonly version: number;
  readonly data: unknown;
  readonly createdAt: number;
  readonly createdBy: string;
  readonly retiredAt: number | null;
}

/** What is read of a version, joined with its material and team. */
export const materialColumns = {
  id: materials.id,
  teamId: materials.teamId,
  team: teams.slug,
  version: materialVersions.version,
  data: materialVersions.data,
  createdAt: materials.createdAt,
  createdBy: materialVersions.createdBy,
  retiredAt: materials.retiredAt,
};

/** The newest version of a material of that team. */
export function currentMaterial(db: Database, teamId: string, id: string): MaterialRow | undefined {
  return prepared(db, "materials.current", (db) =>
    db
      .select(materialColumns)
      .from(materials)
      .innerJoin(teams, eq(teams.id, materials.teamId))
      .innerJoin(
        materialVersions,
        and(eq(materialVersions.materialId, materials.id), eq(materialVersions.version, materials.version)),
      )
      .where(and(eq(materials.id, sql.placeholder("id")), eq(materials.teamId, sql.placeholder("teamId"))))
      .prepare(),
  ).get({ id, teamId });
}

/** A certain version of a material of that team, retired or not. */
export function materialVersion(
  db: Database,
  teamId: string,
  id: string,
  version: number,
): MaterialRow | undefined {
  return db
    .select(materialColumns)
    .from(materials)
    .innerJoin(teams, eq(teams.id, materials.teamId))
    .innerJoin(materialVersions, eq(materialVersions.materialId, materials.id))
    .where(and(eq(materials.id, id), eq(materials.teamId, teamId), eq(materialVersions.version, version)))
    .get();
}

/** Materials of a team that are in use, oldest first. */
export function listMaterials(db: Database, teamId: string, limit: number, after?: Mark): MaterialRow[] {
  return db
    .select(materialColumns)
    .from(materials)
    .innerJoin(teams, eq(teams.id, materials.teamId))
    .innerJoin(
      materialVersions,
      and(eq(materialVersions.materialId, materials.id), eq(materialVersions.version, materials.version)),
    )
    .where(
      and(
        eq(materials.teamId, teamId),
        isNull(materials.retiredAt),
        after &&
          or(
            gt(materials.createdAt, after.at),
            and(eq(materials.createdAt, after.at), gt(materials.id, after.id)),
          ),
      ),
    )
    .orderBy(asc(materials.createdAt), asc(materials.id))
    .limit(limit)
    .all();
}

export interface NewVersion {
  readonly data: unknown;
  readonly createdAt: number;
  readonly createdBy: string;
}

/** Version 1 of a new material. */
export function insertMaterial(db: Database, id: string, teamId: string, first: NewVersion): void {
  db.insert(materials).values({ id, teamId, version: 1, createdAt: first.createdAt }).run();
  db.insert(materialVersions)
    .values({ materialId: id, version: 1, ...first })
    .run();
}

/** The version after `from`; false if somebody else made one since, or the material is retired. */
export function insertNextVersion(db: Database, id: string, from: number, next: NewVersion): boolean {
  const moved = db
    .update(materials)
    .set({ version: from + 1 })
    .where(and(eq(materials.id, id), eq(materials.version, from), isNull(materials.retiredAt)))
    .run();
  if (moved.changes === 0) return false;
  db.insert(materialVersions)
    .values({ materialId: id, version: from + 1, ...next })
    .run();
  return true;
}

/** Retires a material; false if it was retired before. */
export function markRetired(db: Database, id: string, at: number): boolean {
  return (
    db
      .update(materials)
      .set({ retiredAt: at })
      .where(and(eq(materials.id, id), isNull(materials.retiredAt)))
      .run().changes > 0
  );
}
