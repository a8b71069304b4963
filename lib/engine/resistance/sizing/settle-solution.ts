/**
 * What a found dimension is worth as a double: whether the answer at that very value meets the target, and how many
 * digits its text needs. A thin wall given by two radii is the case in point: the outer one resolves it no further than
 * its own last bit.
 */
import { formatQuantity } from "../../quantity/format-quantity";
import { readDimensionValue } from "../../shape/resolve-dimensions";
import type { Evaluator } from "../evaluator";
import type { ReadSizing } from "./read-sizing";
import { TEXT_UNITS, unitOf } from "./search-range";

/** An answer without a field solution meets its target no worse than this, however wide its bounds are. */
const MEETS = 1e-9;
/** Doubles on either side of a root among which the best one is looked for: where a search ends. */
const REACH = 3;
/** Largest relative change of the resistance when a dimension's text is used in its place. */
const TEXT_AGREES = 1e-5;
const TEXT_DIGITS = 6;
/** Digits that tell any double from its neighbours. */
const ALL_DIGITS = 17;

/** The double nearest to `x` at which |f| is least. */
export function nearestDouble(f: (x: number) => number, x: number, { range }: ReadSizing): number {
  let best = { x, distance: Math.abs(f(x)) };
  if (best.distance === 0) return x;
  for (const step of [-1, 1]) {
    for (let k = 1, at = next(x, step); k <= REACH; k++, at = next(at, step)) {
      if (at < range.from || at > range.to) break;
      const distance = Math.abs(f(at));
      if (distance < best.distance) best = { x: at, distance };
    }
  }
  return best.x;
}

/** Whether the answer at `x` meets the target within its own bounds; if not, why not and what would. */
export function exactness(
  { value, lower, upper }: { readonly value: number; readonly lower: number; readonly upper: number },
  field: boolean,
  f: (x: number) => number,
  x: number,
  read: ReadSizing,
): { readonly exact: boolean; readonly cautions: readonly string[] } {
  const { solveFor, target } = read;
  const off = Math.abs(value / target - 1);
  if (lower <= target && target <= upper && (field || off <= MEETS)) return { exact: true, cautions: [] };
  const beside = [next(x, -1), next(x, 1)].map(f).filter((other) => other * f(x) < 0);
  if (beside.length === 0) {
    return {
      exact: false,
      cautions: [`The resistance found differs from the target by ${shareText(off)}.`],
    };
  }
  const instead = finerInput(read);
  return {
    exact: false,
    cautions: [
      `A double cannot hold ${solveFor} finely enough to meet the target here: the resistance differs from it by ${shareText(off)}, and that of the next value lies on its other side.${instead === null ? "" : ` Solve for ${instead}, which keeps its digits.`}`,
    ],
  };
}

/**
 * The value for people, with as many digits as a request needs for the same resistance to 1e-5 when it is given this
 * text; with all of them where fewer do not do.
 */
export function roundTripText(
  value: number,
  x: number,
  evaluator: Evaluator,
  { dimension, reader, solveFor }: ReadSizing,
): string {
  const unit = TEXT_UNITS[unitOf(dimension)];
  const input = reader.inputs.get(solveFor);
  if (!input || dimension.type === "integer") return formatQuantity(value, unit, { digits: ALL_DIGITS });
  const whole = evaluator.at([x]);
  for (let digits = TEXT_DIGITS; digits < ALL_DIGITS; digits++) {
    const text = formatQuantity(value, unit, { digits });
    const reading = readDimensionValue(dimension, input, text);
    if (!("value" in reading) || typeof reading.value !== "number") continue;
    // The evaluator takes the input itself, of which the dimension is a multiple.
    const off = Math.abs(evaluator.at([reading.value / input.factor]) / whole - 1);
    if (off <= TEXT_AGREES) return text;
  }
  return formatQuantity(value, unit, { digits: ALL_DIGITS });
}

/**
 * A sentence on the end of what the shape admits: where the resistance still moves from one double to the next, another
 * input goes further. Empty where it does not.
 */
export function endsByResolution(f: (x: number) => number, x: number, read: ReadSizing): string {
  const instead = finerInput(read);
  if (instead === null) return "";
  const [below, above] = [f(next(x, -1)), f(next(x, 1))];
  const moves = Number.isNaN(below) ? above - f(x) : Number.isNaN(above) ? below - f(x) : 0;
  if (!(Math.abs(moves) > MEETS)) return "";
  return ` A double cannot hold ${read.solveFor} any closer to its limit: solve for ${instead}.`;
}

/** Another name for what is looked for that is an input of its own: a wall beside an outer radius. */
function finerInput({ reader, solveFor }: ReadSizing): string | null {
  const input = reader.inputs.get(solveFor);
  const other = input?.group.names.find((name) => reader.inputs.get(name)?.dimension !== input.dimension);
  return other ?? null;
}

function shareText(part: number): string {
  return part >= 1e-3 ? `${Number((100 * part).toPrecision(2))} %` : `${part.toExponential(1)} of it`;
}

/** The next double above (1) or below (−1) a positive one. */
function next(x: number, step: number): number {
  const view = new DataView(new ArrayBuffer(8));
  view.setFloat64(0, x);
  view.setBigInt64(0, view.getBigInt64(0) + BigInt(step));
  return view.getFloat64(0);
}
