/** Where a dimension is looked for: its range, in SI, and the places to look at first. */
import { pointerTo, type Problems } from "../../failure";
import { radiansToDegrees, readQuantity } from "../../quantity/parse-quantity";
import type { QuantityKindName } from "../../quantity/quantity-kind";
import type { Dimension, Shape } from "../../shape/define-shape";
import {
  readDimensionValue,
  type DimensionInput,
  type DimensionReader,
} from "../../shape/resolve-dimensions";

/** A dimension that can be found: everything but a choice. */
export type FindableDimension = Exclude<Dimension, { type: "choice" }>;

export interface SearchRange {
  readonly from: number;
  readonly to: number;
}

/** Ranges where the request gives none: from an atom to the size of a country. */
const WHOLE = { length: [1e-12, 1e6], area: [1e-24, 1e12], angle: [1e-9, 2 * Math.PI] } as const;
const A_DECADE = 24;
const FEWEST = 384;
/** Distances from the sizes that the request gives, near which a shape often begins or ends. */
const NEAR = [0, 1e-9, 1e-6, 1e-4, 1e-2];

/** Unit in which the dimension is answered, as `GET /shapes` lists it. */
export function unitOf(dimension: FindableDimension): "m" | "m^2" | "deg" | "1" {
  if (dimension.type !== "quantity") return "1";
  return dimension.kind === "angle" ? "deg" : dimension.kind === "area" ? "m^2" : "m";
}

/** How `formatQuantity` is told each of these units. */
export const TEXT_UNITS = { m: "metre", "m^2": "m^2", deg: "degree", "1": "1" } as const;

/** The bare number that means this value (SI, radians) in a request. */
export function bare(x: number, dimension: FindableDimension): number {
  return unitOf(dimension) === "deg" ? radiansToDegrees(x) : x;
}

/** The range of the request, or the whole one; null after complaints. */
export function readRange(
  within: readonly unknown[] | undefined,
  dimension: FindableDimension,
  input: DimensionInput,
  problems: Problems,
): SearchRange | null {
  const { factor, options } = input;
  const whole = wholeRange(dimension, factor);
  if (!within) return whole;
  const kind: QuantityKindName = dimension.type === "quantity" ? dimension.kind : "number";
  const ends = within.map((given, i): number | null => {
    const reading = readQuantity(given, kind, options);
    const pointer = pointerTo("#/within", i);
    if (!reading.ok) problems.add(pointer, reading.detail);
    else if (dimension.type === "quantity" && !(reading.value > 0))
      problems.add(pointer, "must be greater than 0.");
    else if (dimension.type === "integer" && !Number.isInteger(reading.value))
      problems.add(pointer, "must be a whole number.");
    else return reading.value;
    return null;
  });
  const [from, to] = ends;
  if (from === null || to === null) return null;
  if (!(from < to)) {
    problems.add("#/within/1", "must be greater than the first value.");
    return null;
  }
  const least = dimension.type === "quantity" ? 0 : dimension.min;
  const most = dimension.type === "quantity" ? (dimension.max ?? Infinity) / factor : dimension.max;
  if (from > most || to < least) {
    problems.add(
      "#/within",
      `holds no value that the dimension may have${Number.isFinite(most) ? ` (at most ${dimension.type === "quantity" && dimension.kind === "angle" ? `${(most / Math.PI) * 180} deg` : most})` : ""}.`,
    );
    return null;
  }
  return { from: Math.max(from, least), to: Math.min(to, most) };
}

function wholeRange(dimension: FindableDimension, factor: number): SearchRange {
  if (dimension.type !== "quantity") return { from: dimension.min, to: dimension.max };
  const [from, to] = WHOLE[dimension.kind];
  return { from, to: Math.min(to, (dimension.max ?? Infinity) / factor) };
}

/** Places to look at first, increasing: spread through the range, and close to what the other dimensions suggest. */
export function searchGrid(
  { from, to }: SearchRange,
  shape: Shape,
  reader: DimensionReader,
  given: Readonly<Record<string, unknown>>,
): number[] {
  const places = new Set<number>([from, to]);
  const wide = from > 0 && to > 4 * from;
  if (wide) {
    const decades = Math.log10(to / from);
    const count = Math.max(FEWEST, Math.ceil(decades * A_DECADE));
    for (let k = 1; k < count; k++) places.add(from * 10 ** ((decades * k) / count));
  } else {
    // An end that may not be taken itself (greater than 0, say) is approached.
    for (let k = 1; k < FEWEST; k++) places.add(from + ((to - from) * k) / FEWEST);
    for (let k = 10; k < 50; k += 2) places.add(from + (to - from) * 2 ** -k);
  }
  for (const size of suggestions(shape, reader, given)) {
    for (const part of NEAR) for (const x of [size * (1 - part), size * (1 + part)]) places.add(x);
  }
  return [...places].filter((x) => x >= from && x <= to).sort((a, b) => a - b);
}

/** Sizes, their halves, doubles, sums and differences: where most constraints have their ends. */
function suggestions(
  shape: Shape,
  reader: DimensionReader,
  given: Readonly<Record<string, unknown>>,
): Set<number> {
  const sizes: number[] = [];
  for (const [name, value] of Object.entries(given)) {
    const input = reader.inputs.get(name);
    if (!input || shape.dimensions[input.dimension].type !== "quantity") continue;
    const reading = readDimensionValue(shape.dimensions[input.dimension], input, value);
    if ("value" in reading && typeof reading.value === "number") sizes.push(reading.value);
  }
  const found = new Set<number>();
  for (const a of sizes) {
    for (const f of [0.5, 1, 2]) found.add(f * a);
    for (const b of sizes) {
      if (a === b) continue;
      for (const f of [0.5, 1, 2]) {
        found.add(f * (a + b));
        found.add(f * Math.abs(a - b));
        found.add(Math.abs(a - f * b));
      }
    }
  }
  return found;
}
