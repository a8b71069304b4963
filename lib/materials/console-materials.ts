import type { Database } from "@/db/client";
import { materialsOfTeams, recordsByMaterial, versionsOfMaterial } from "@/db/queries/material-versions";
import { usesOfMaterial } from "@/db/queries/record-list";
import { libraryMaterial, libraryMaterials, type Material, resistivityAt } from "@/lib/engine";
import type { MaterialView } from "./input";
import { libraryView, viewOf } from "./team-materials";

/** A material as lists of the console show it. */
export interface ListedMaterial {
  readonly id: string;
  readonly version: number;
  readonly name: string;
  readonly kind: string;
  /** Team that owns it; null: the library. */
  readonly teamId: string | null;
  readonly teamName: string | null;
  /** ohm m at `atC` (°C): 20 °C, or the end of the range nearest to it. */
  readonly resistivityOhmM: number;
  readonly atC: number;
  readonly provenance: string;
  readonly retiredAt: string | null;
  /** Records of the reader's teams that used it. */
  readonly records: number;
}

/** Library and materials of some teams, unordered. */
export function listedMaterials(db: Database, teamIds: readonly string[]): ListedMaterial[] {
  const records = recordsByMaterial(db, teamIds);
  const listed = (view: MaterialView, teamId: string | null, teamName: string | null): ListedMaterial => {
    const atC = Math.min(view.range.to, Math.max(view.range.from, 20));
    const { id, version, name, kind, provenance, retiredAt } = view;
    return {
      ...{ id, version, name, kind, teamId, teamName, provenance, retiredAt, atC },
      resistivityOhmM: resistivityAt(view, atC),
      records: records.get(id) ?? 0,
    };
  };
  return [
    ...libraryMaterials.map((material) => listed(libraryView(material), null, null)),
    ...materialsOfTeams(db, teamIds).map((row) => listed(viewOf(row), row.teamId, row.teamName)),
  ];
}

export interface MaterialVersionView extends MaterialView {
  readonly madeAt: string | null;
  readonly madeBy: string | null;
  /** Resistivity (ohm m) over the range, at `temperaturesC`. */
  readonly curve: { readonly temperaturesC: readonly number[]; readonly resistivityOhmM: readonly number[] };
}

export interface MaterialHistory {
  readonly id: string;
  /** Null: the library. */
  readonly teamId: string | null;
  /** The newest one last. */
  readonly versions: readonly MaterialVersionView[];
  readonly uses: readonly { readonly version: number; readonly records: number }[];
}

/** A material with all its versions; undefined where there is none of that id. `teamIds` are those whose records count. */
export function materialHistory(
  db: Database,
  id: string,
  teamIds: readonly string[],
): MaterialHistory | undefined {
  const uses = usesOfMaterial(db, id, teamIds);
  const fromLibrary = libraryMaterial(id);
  if (fromLibrary) {
    const only = { ...libraryView(fromLibrary), madeAt: null, madeBy: null, curve: curveOf(fromLibrary) };
    return { id, teamId: null, versions: [only], uses };
  }
  const rows = versionsOfMaterial(db, id);
  if (rows.length === 0) return undefined;
  const versions = rows.map((row) => {
    const view = viewOf(row);
    return {
      ...view,
      madeAt: new Date(row.madeAt).toISOString(),
      madeBy: row.createdBy,
      curve: curveOf(view),
    };
  });
  return { id, teamId: rows[0].teamId, versions, uses };
}

const PLACES = 60;

function curveOf(material: Material): MaterialVersionView["curve"] {
  const { from, to } = material.range;
  const count = to > from ? PLACES : 0;
  const temperaturesC = Array.from({ length: count + 1 }, (_, i) => from + ((to - from) * i) / (count || 1));
  return { temperaturesC, resistivityOhmM: temperaturesC.map((t) => resistivityAt(material, t)) };
}
