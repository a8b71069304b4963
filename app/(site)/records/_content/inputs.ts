/** Dimensions, operating point and requirement of a request, as typed and in SI. */
import { findShape, type QuantityKindName, type ShapeEntry, shapeEntry } from "@/lib/engine";
import { readGeometry } from "../../calculate/_server/geometry";
import type { Block, Picture } from "./content";
import { INPUT_COLUMNS, type InputRow } from "./medium";
import { nominal, siNumber, siText, typedText } from "./typed";

type Given = Readonly<Record<string, unknown>>;

const KIND_OF_UNIT: Readonly<Record<string, QuantityKindName>> = {
  m: "length",
  "m^2": "area",
  deg: "angle",
};

/** The dimensions that were given, then those that the shape took by default. */
export function dimensionsTable(entry: ShapeEntry, given: Given): Block {
  const rows = entry.dimensions.flatMap((dimension): (readonly string[])[] => {
    const value = given[dimension.name];
    const kind = KIND_OF_UNIT[dimension.unit ?? ""];
    if (value === undefined) {
      const other = entry.alternatives.some(
        (names) => names.includes(dimension.name) && names.some((name) => given[name] !== undefined),
      );
      if (dimension.default === null || other) return [];
      const value = dimension.default;
      const si = kind && typeof value === "number" ? siNumber(value, kind) : choiceLabel(dimension, value);
      return [[dimension.label, dimension.symbol, "not given", `${si} (default)`]];
    }
    const typed = kind ? typedText(value, kind) : choiceLabel(dimension, value);
    return [[dimension.label, dimension.symbol, typed, kind ? siText(value, kind) : ""]];
  });
  return {
    kind: "table",
    label: "Dimensions",
    columns: [
      { title: "Dimension", weight: 1.3 },
      { title: "Symbol", weight: 0.5 },
      { title: "As typed", numeric: true, weight: 1.1 },
      { title: "In SI", numeric: true, weight: 1.1 },
    ],
    rows,
  };
}

function choiceLabel(dimension: ShapeEntry["dimensions"][number], value: unknown): string {
  return dimension.choices?.find((choice) => choice.value === value)?.label ?? typedText(value);
}

const OPERATING: Readonly<Record<string, { readonly label: string; readonly kind: QuantityKindName }>> = {
  temperature: { label: "Temperature", kind: "temperature" },
  voltage: { label: "Voltage", kind: "voltage" },
  current: { label: "Current", kind: "current" },
  power: { label: "Power", kind: "power" },
};

/** Operating point and requirement as they were asked for; none where neither was. */
export function askedTable(operating: Given = {}, requirement: Given = {}): Block[] {
  const rows: InputRow[] = [];
  for (const [name, { label, kind }] of Object.entries(OPERATING)) {
    const value = operating[name];
    if (value !== undefined) rows.push([label, typedText(value, kind), siText(value, kind)]);
  }
  const limits = [
    ["min", "Required, at least"],
    ["max", "Required, at most"],
  ] as const;
  for (const [name, label] of limits) {
    const value = requirement[name];
    if (value !== undefined) {
      rows.push([label, typedText(value, "resistance"), siText(value, "resistance")]);
    }
  }
  return rows.length === 0
    ? []
    : [{ kind: "table", label: "Operating point and requirement", columns: INPUT_COLUMNS, rows }];
}

/** The drawing of a shape with these dimensions; null where today's catalogue no longer draws it. */
export function shapePicture(shapeId: string, given: Given): Picture | null {
  const shape = findShape(shapeId);
  if (!shape) return null;
  const dimensions = Object.fromEntries(Object.entries(given).map(([name, value]) => [name, nominal(value)]));
  const reading = readGeometry(shape, dimensions);
  if (!reading.ok) return null;
  const { drawing, toScale, labels } = reading.geometry;
  return { kind: "shape", drawing, toScale, labels, terminals: shapeEntry(shape).terminals };
}
