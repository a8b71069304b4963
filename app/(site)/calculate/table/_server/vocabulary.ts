import "server-only";
import { MEDIUM_COLUMNS, OPERATING_COLUMNS } from "@/api/batch/columns";
import { templateCells } from "@/api/batch/csv-template";
import { catalogue, libraryMaterials, type QuantityKindName, shapeEntry } from "@/lib/engine";
import type { UnitKind } from "../../../../_ui/quantity/units";
import type { ColumnChoice, ShapeChoice, Vocabulary } from "../_model/vocabulary";

const KINDS: Readonly<Record<string, UnitKind>> = { m: "length", "m^2": "area", deg: "angle" };

/** What a table may hold, for the page: shapes with their columns, and every column with what it measures. */
export function tableVocabulary(): Vocabulary {
  const columns = new Map<string, ColumnChoice>([
    ["shape", { name: "shape", label: "Shape", group: "row", kind: null }],
  ]);
  const shapes: ShapeChoice[] = [];
  for (const shape of catalogue) {
    const entry = shapeEntry(shape);
    const { header, row } = templateCells(shape);
    for (const { name, label, unit } of entry.dimensions) {
      if (columns.has(name)) continue;
      columns.set(name, { name, label, group: "dimension", kind: KINDS[unit ?? ""] ?? null });
    }
    const media = entry.media.names.flatMap(({ name: medium }) =>
      ["material", "resistivity", "conductivity"].map((member) => `${medium}.${member}`),
    );
    shapes.push({
      id: shape.id,
      title: shape.title,
      columns: [...entry.dimensions.map(({ name }) => name), ...media],
      header,
      row,
    });
    for (const name of media) {
      columns.set(name, {
        name,
        label: name,
        group: "medium",
        kind: kindOf(MEDIUM_COLUMNS[name.split(".")[1]]),
      });
    }
  }
  for (const [name, kind] of Object.entries(MEDIUM_COLUMNS)) {
    if (!columns.has(name)) columns.set(name, { name, label: name, group: "medium", kind: kindOf(kind) });
  }
  for (const [name, kind] of Object.entries(OPERATING_COLUMNS)) {
    columns.set(name, { name, label: name, group: "operating", kind: kindOf(kind) });
  }
  columns.set("label", { name: "label", label: "Label", group: "row", kind: null });
  return {
    shapes,
    columns: [...columns.values()],
    materials: libraryMaterials.map(({ id }) => id),
  };
}

function kindOf(kind: QuantityKindName | null | undefined): UnitKind | null {
  return kind && kind !== "temperatureDifference" ? kind : null;
}
