import { transact, type Database } from "@/db/client";
import {
  currentMaterial,
  insertMaterial,
  insertNextVersion,
  listMaterials,
  markRetired,
  type MaterialRow,
  materialVersion,
} from "@/db/queries/materials";
import { type Material, libraryMaterial } from "@/lib/engine";
import { type Actor, appendActivity } from "../activity/append";
import { randomText } from "../service/identifier";
import { Refusal } from "../service/refusal";
import { type MaterialChange, type MaterialView, type NewMaterial, newMaterialSchema } from "./input";
import { requireSoundLaw } from "./sound-law";

const MOST_LISTED = 1000;

/** A row with what was checked when it was written. */
export function materialOf(row: MaterialRow): Material {
  return { id: row.id, version: row.version, owner: row.team, ...newMaterialSchema.parse(row.data) };
}

export function viewOf(row: MaterialRow): MaterialView {
  const retiredAt = row.retiredAt === null ? null : new Date(row.retiredAt).toISOString();
  return { ...materialOf(row), retiredAt };
}

export function libraryView(material: Material): MaterialView {
  return { ...material, retiredAt: null };
}

/** A material of the library or the team; of the team's also an older version. */
export function readMaterial(
  db: Database,
  teamId: string | undefined,
  id: string,
  version?: number,
): MaterialView | undefined {
  const fromLibrary = libraryMaterial(id);
  if (fromLibrary) {
    return version === undefined || version === fromLibrary.version ? libraryView(fromLibrary) : undefined;
  }
  if (teamId === undefined) return undefined;
  const row =
    version === undefined ? currentMaterial(db, teamId, id) : materialVersion(db, teamId, id, version);
  return row && viewOf(row);
}

/** What a computation may use: the library, and the newest version of what the team has in use. */
export function usableMaterial(db: Database, teamId: string | undefined, id: string): Material | undefined {
  const fromLibrary = libraryMaterial(id);
  if (fromLibrary || teamId === undefined) return fromLibrary;
  const row = currentMaterial(db, teamId, id);
  return row && row.retiredAt === null ? materialOf(row) : undefined;
}

/** The newest versions of what the team has in use; a team has dozens. */
export function teamMaterialsInUse(db: Database, teamId: string): readonly Material[] {
  return listMaterials(db, teamId, MOST_LISTED)
    .filter(({ retiredAt }) => retiredAt === null)
    .map(materialOf);
}

/** What a replay uses: the version that the record pinned. The library has one version of each, its current one. */
export function pinnedMaterial(
  db: Database,
  teamId: string,
  id: string,
  version: number | undefined,
): Material | undefined {
  const fromLibrary = libraryMaterial(id);
  if (fromLibrary || version === undefined) return fromLibrary;
  const row = materialVersion(db, teamId, id, version);
  return row && materialOf(row);
}

interface Write {
  readonly teamId: string;
  readonly actor: Actor;
  /** Unix ms. */
  readonly now: number;
}

/** Version 1 of a new material of the team. */
export function createMaterial(
  db: Database,
  { teamId, actor, now }: Write,
  input: NewMaterial,
): MaterialView {
  requireSoundLaw(input);
  // Lower case, as ids of the library are: they travel in spreadsheet formulas and addresses.
  const id = `mat-${randomText(20).toLowerCase()}`;
  return transact(db, () => {
    insertMaterial(db, id, teamId, { data: input, createdAt: now, createdBy: actor.name });
    const view = mustRead(db, teamId, id);
    appendActivity(
      db,
      actor,
      { action: "material.create", teamId, subject: { kind: "material", id }, after: view },
      now,
    );
    return view;
  });
}

/** The next version, made from version `from`. Refuses where that is no longer the newest. */
export function changeMaterial(
  db: Database,
  { teamId, actor, now }: Write,
  id: string,
  from: number | "any",
  change: MaterialChange,
): MaterialView {
  return transact(db, () => {
    const row = ownRow(db, teamId, id);
    const before = viewOf(row);
    if (before.retiredAt !== null) throw retired(before.retiredAt);
    requireVersion(before, from);
    const { id: _id, version: _version, owner: _owner, retiredAt: _retiredAt, ...facts } = before;
    const data = { ...facts, ...change };
    requireSoundLaw(data);
    if (!insertNextVersion(db, id, before.version, { data, createdAt: now, createdBy: actor.name })) {
      throw conflict(before.version);
    }
    const after = mustRead(db, teamId, id);
    appendActivity(
      db,
      actor,
      { action: "material.change", teamId, subject: { kind: "material", id }, before, after },
      now,
    );
    return after;
  });
}

/** Withdraws a material from use. Retiring twice changes nothing. */
export function retireMaterial(
  db: Database,
  { teamId, actor, now }: Write,
  id: string,
  from: number | "any",
): void {
  transact(db, () => {
    const before = viewOf(ownRow(db, teamId, id));
    requireVersion(before, from);
    if (!markRetired(db, id, now)) return;
    const after = mustRead(db, teamId, id);
    appendActivity(
      db,
      actor,
      { action: "material.retire", teamId, subject: { kind: "material", id }, before, after },
      now,
    );
  });
}

function ownRow(db: Database, teamId: string, id: string): MaterialRow {
  const row = currentMaterial(db, teamId, id);
  if (row) return row;
  if (libraryMaterial(id)) {
    throw new Refusal("library-read-only", "This material belongs to the library, which no team can change.");
  }
  throw new Refusal("not-found", "The team has no material of this id.");
}

function requireVersion(current: MaterialView, from: number | "any"): void {
  if (from !== "any" && from !== current.version) throw conflict(current.version);
}

function conflict(version: number): Refusal {
  return new Refusal("version-conflict", `The material is at version ${version} now.`, {
    headers: { ETag: `"${version}"` },
  });
}

function retired(at: string): Refusal {
  return new Refusal("invalid-input", `The material was retired on ${at} and has no further versions.`, {
    errors: [{ pointer: "#", detail: "the material is retired." }],
  });
}

function mustRead(db: Database, teamId: string, id: string): MaterialView {
  const row = currentMaterial(db, teamId, id);
  if (!row) throw new Error(`Material ${id} vanished inside its own transaction.`);
  return viewOf(row);
}
