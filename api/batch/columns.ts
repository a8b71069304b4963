import {
  catalogue,
  nearestNames,
  type QuantityKindName,
  readQuantity,
  type ShapeEntry,
  shapeEntry,
} from "@/lib/engine";

/** Columns that an answer adds, in their order. A file that has them already gets them anew. */
export const RESULT_COLUMNS = [
  "resistance/ohm",
  "lower/ohm",
  "upper/ohm",
  "text",
  "status",
  "problem",
] as const;

/** Members of a medium that a cell can carry, with what a unit of theirs must fit. */
export const MEDIUM_COLUMNS: Readonly<Record<string, QuantityKindName | null>> = {
  material: null,
  resistivity: "resistivity",
  conductivity: "conductivity",
  sheetResistance: "sheetResistance",
  thickness: "length",
  temperatureCoefficient: "temperatureCoefficient",
  referenceTemperature: "temperature",
  extrapolate: null,
};

export const OPERATING_COLUMNS: Readonly<Record<string, QuantityKindName>> = {
  temperature: "temperature",
  voltage: "voltage",
  current: "current",
  power: "power",
};

/** Columns without a unit that say what the row is. */
export const ROW_COLUMNS = ["shape", "label"] as const;

const KIND_OF_UNIT: Readonly<Record<string, QuantityKindName>> = {
  m: "length",
  "m^2": "area",
  deg: "angle",
  "1": "number",
};

interface Vocabulary {
  /** Every name a column may have, with the kinds of quantity it stands for in one shape or another. */
  readonly names: ReadonlyMap<string, ReadonlySet<QuantityKindName>>;
  readonly entries: ReadonlyMap<string, ShapeEntry>;
}

let vocabulary: Vocabulary | undefined;

/** The names of all columns, from the catalogue; made when first asked for. */
export function columnVocabulary(): Vocabulary {
  if (vocabulary) return vocabulary;
  const entries = catalogue.map(shapeEntry);
  const names = new Map<string, Set<QuantityKindName>>();
  const add = (name: string, kind: QuantityKindName | null | undefined) => {
    const kinds = names.get(name) ?? new Set();
    if (kind) kinds.add(kind);
    names.set(name, kinds);
  };
  for (const name of ROW_COLUMNS) add(name, null);
  for (const [name, kind] of Object.entries(MEDIUM_COLUMNS)) add(name, kind);
  for (const [name, kind] of Object.entries(OPERATING_COLUMNS)) add(name, kind);
  for (const { dimensions, media } of entries) {
    for (const { name, unit } of dimensions) add(name, KIND_OF_UNIT[unit ?? ""]);
    for (const { name: medium } of media.names) {
      for (const [member, kind] of Object.entries(MEDIUM_COLUMNS)) {
        if (member !== "thickness") add(`${medium}.${member}`, kind);
      }
    }
  }
  vocabulary = { names, entries: new Map(entries.map((entry) => [entry.id, entry])) };
  return vocabulary;
}

/** A column of an uploaded table. */
export type Column =
  | { readonly role: "row"; readonly name: (typeof ROW_COLUMNS)[number] }
  | { readonly role: "input"; readonly name: string; readonly unit: string | null }
  /** Without a name, or a result of an earlier answer: nothing is read from it. */
  | { readonly role: "blank" | "result" };

/** What a header cell stands for, or what is wrong with it. `width/mm` is a name with the unit of its bare numbers. */
export function readHeaderCell(cell: string): Column | { readonly complaint: string } {
  const text = cell.trim();
  if (text === "") return { role: "blank" };
  if (RESULT_COLUMNS.some((name) => name === text)) return { role: "result" };
  const slash = text.indexOf("/");
  const name = slash < 0 ? text : text.slice(0, slash).trim();
  const unit = slash < 0 ? null : text.slice(slash + 1).trim();
  const { names } = columnVocabulary();
  const kinds = names.get(name);
  if (!kinds) return { complaint: unknownColumn(name) };
  for (const row of ROW_COLUMNS) {
    if (row !== name) continue;
    return unit === null ? { role: "row", name: row } : { complaint: `"${row}" has no unit.` };
  }
  if (unit === null) return { role: "input", name, unit };
  if (kinds.size === 0) return { complaint: `"${name}" has no unit.` };
  const readings = [...kinds].map((kind) => readQuantity(`1 ${unit}`, kind));
  if (readings.some(({ ok }) => ok)) return { role: "input", name, unit };
  const reading = readings[0];
  return { complaint: `"${text}": its unit ${reading.ok ? "cannot be used." : reading.detail}` };
}

function unknownColumn(name: string): string {
  const { names } = columnVocabulary();
  const shown = name.length > 60 ? `${name.slice(0, 60)}…` : name;
  const near = nearest(name, [...names.keys()]);
  return `"${shown}" is no column known here.${near}`;
}

/** A name that differs in case, spaces or underlines only. */
function nearest(name: string, names: readonly string[]): string {
  const plain = (text: string) => text.toLowerCase().replace(/[\s_-]/g, "");
  const same = names.find((candidate) => plain(candidate) === plain(name));
  return same ? ` Did you mean "${same}"?` : suggested(name, names);
}

function suggested(name: string, names: readonly string[]): string {
  const near = nearestNames(name.slice(0, 64), names);
  return near.length > 0 ? ` Did you mean ${near.map((entry) => `"${entry}"`).join(" or ")}?` : "";
}
