/**
 * What the rounding of the inputs to doubles costs. "5.000001 mm" less "5 mm", or the difference of two angles given in
 * degrees, has lost digits before any formula sees it; bounds that are called proved have to hold for what was typed.
 */
import type { Dimensions, Resolved, Shape } from "../shape/define-shape";
import { readDimensionValue, readerOf } from "../shape/resolve-dimensions";
import { VaryingDimensions } from "../shape/vary-dimensions";
import type { Media } from "./read-media";
import { solve } from "./solve";
import type { Solution } from "./solution";

/** Reading a quantity rounds twice at most: its unit's factor and the product. */
const READING = 2 * Number.EPSILON;

/** Below this the inputs' rounding is covered by the closed form's own error. */
const COVERED = 2e-14;

/** A change this large says that the other direction may differ. */
const STEEP = 1e-10;

/** Two sizes, one of which could be a small difference of the other with a third, are this near in their ratio. */
const NEAR = 0.05;

/**
 * The solution with its proved bounds widened by what one rounding of each given length and angle changes, where that
 * is more than a closed form's own error.
 * @param given the request's dimensions as they arrived, already read without complaint.
 */
export function coverInputRounding(
  solution: Solution,
  shape: Shape,
  given: Readonly<Record<string, unknown>>,
  media: Media,
): Solution {
  if (solution.boundsBasis !== "rounding" || solution.method !== "closed-form") return solution;
  if (!mayCancel(shape, solution.dimensions)) return solution;
  const { names, values } = quantitiesOf(shape, given);
  const varying = new VaryingDimensions(shape, given, names);
  const changeAt = (k: number, factor: number): number => {
    const moved = values.map((value, index) => (index === k ? value * factor : value));
    const dimensions = varying.at(moved);
    return dimensions ? changeOf(solution.value, shape, dimensions, media) : 0;
  };
  let total = 0;
  for (const k of values.keys()) {
    const more = changeAt(k, 1 + READING);
    total += more > 0 && more < STEEP ? more : Math.max(more, changeAt(k, 1 - READING));
  }
  if (!(total > COVERED)) return solution;
  return {
    ...solution,
    lower: solution.lower * Math.exp(-total),
    upper: solution.upper * Math.exp(total),
  };
}

/**
 * Whether the dimensions leave room for a cancellation: a difference that is small beside its alternative (a wall beside
 * the outer radius), two sizes nearly equal or nearly one half of the other (a bend's radius and a tube's diameter), or
 * angles that nearly fill the circle. Nothing else is worth the evaluations.
 */
function mayCancel(shape: Shape, dimensions: Resolved<Dimensions>): boolean {
  const sizes: number[] = [];
  const angles: number[] = [];
  for (const name of Object.keys(shape.dimensions)) {
    const dimension = shape.dimensions[name];
    const value = dimensions[name];
    if (dimension.type !== "quantity" || typeof value !== "number") continue;
    (dimension.kind === "angle" ? angles : sizes).push(value);
  }
  return (
    shape.alternatives.some(({ names: [one, other] }) => {
      const ratio = Number(dimensions[one]) / Number(dimensions[other]);
      return !(ratio > NEAR && ratio < 1 / NEAR);
    }) ||
    anyPair(sizes, (ratio) => ratio > 1 - NEAR || Math.abs(ratio - 0.5) < NEAR) ||
    anyPair(angles, (ratio, sum) => ratio > 1 - NEAR || sum > (1 - NEAR) * 2 * Math.PI)
  );
}

function anyPair(values: readonly number[], near: (ratio: number, sum: number) => boolean): boolean {
  for (let i = 1; i < values.length; i++) {
    for (let k = 0; k < i; k++) {
      const [a, b] = [values[i], values[k]];
      if (near(Math.min(a, b) / Math.max(a, b), a + b)) return true;
    }
  }
  return false;
}

function quantitiesOf(
  shape: Shape,
  given: Readonly<Record<string, unknown>>,
): { readonly names: string[]; readonly values: number[] } {
  const { inputs } = readerOf(shape);
  const names: string[] = [];
  const values: number[] = [];
  for (const [name, raw] of Object.entries(given)) {
    const input = inputs.get(name);
    const dimension = input && shape.dimensions[input.dimension];
    if (!dimension || dimension.type !== "quantity" || raw === undefined) continue;
    const reading = readDimensionValue(dimension, input, raw);
    if (!("value" in reading) || typeof reading.value !== "number" || reading.value === 0) continue;
    names.push(name);
    values.push(reading.value / input.factor);
  }
  return { names, values };
}

/** |ln| of the ratio of resistances; 0 where there is none to compare with. */
function changeOf(value: number, shape: Shape, dimensions: Resolved<Dimensions>, media: Media): number {
  const change = Math.abs(Math.log(solve(shape, dimensions, media, false).value / value));
  return Number.isFinite(change) ? change : 0;
}
