/** The scales of a drawing that give a resistance, by field solutions that somebody else makes. */
import { InputError } from "../../failure";
import { formatQuantity } from "../../quantity/format-quantity";
import type { SizingResult, SizingSolution } from "../../resistance/sizing/sizing-schema";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "../../version";
import type { FieldResult } from "../request/field-result-schema";
import type { FieldSizing } from "./read-field-sizing";
import { scaledBody, type FieldBody } from "./scale-body";

/** Solves one body; null where the drawing cannot be solved at that scale. */
export type SolveBody = (body: FieldBody) => Promise<FieldResult | null>;

/** Accuracy of the first look, and how many places it has. */
const LOOK = 1e-2;
const PLACES = 13;
const MOST_STEPS = 12;
const TURN_STEPS = 8;

/** Most solutions that a sizing on an outline makes. */
export const MOST_FIELD_SOLUTIONS = 60;

interface Place {
  /** ln(scale) */
  readonly x: number;
  /** ln(R/target) */
  readonly value: number;
}

interface Solved extends Place {
  readonly result: FieldResult | null;
}

/** @throws InputError where no scale in the range gives the target. */
export async function findScale(sizing: FieldSizing, solve: SolveBody): Promise<SizingResult> {
  const { prepared, solveFor, target, from, to } = sizing;
  let made = 0;
  const solveAt = async (scale: number, accuracy: number): Promise<FieldResult | null> => {
    if (++made > MOST_FIELD_SOLUTIONS) {
      throw new InputError([
        {
          pointer: "#/within",
          detail: `needs more than ${MOST_FIELD_SOLUTIONS} field solutions: give a narrower range.`,
        },
      ]);
    }
    return solve({ ...scaledBody(prepared.body, solveFor, scale), accuracy });
  };
  const { accuracy } = prepared.request;
  const solutions: SizingSolution[] = [];
  let last: FieldResult | null = null;

  if (sizing.inverse) {
    const whole = await solveAt(1, accuracy);
    const resistance = whole?.resistance;
    if (!resistance) throw unsolvable();
    const scale = resistance.value / target;
    if (scale < from || scale > to)
      throw refused(
        sizing,
        { x: Math.log(from), value: Math.log(scale / from) },
        { x: Math.log(to), value: Math.log(scale / to) },
      );
    // Solved again at that scale, so that the operating point and the verdict are those of the scaled drawing.
    const scaled = await solveAt(scale, accuracy);
    if (!scaled) throw unsolvable();
    last = scaled;
    const answered = { ...scaled, resistance: exactly(whole, scale).resistance };
    solutions.push(solution(scale, target, answered, -1));
  } else {
    let [low, high] = [Infinity, -Infinity].map((value): Place => ({ x: 0, value }));
    const at = async (x: number, wanted: number): Promise<Solved> => {
      const result = await solveAt(Math.exp(x), wanted);
      const value = result?.resistance ? Math.log(result.resistance.value / target) : Number.NaN;
      if (value < low.value) low = { x, value };
      if (value > high.value) high = { x, value };
      return { x, value, result };
    };
    const [start, end] = [Math.log(from), Math.log(to)];
    const grid = Array.from({ length: PLACES }, (_, k) => start + ((end - start) * k) / (PLACES - 1));
    const places: Place[] = (await Promise.all(grid.map((x) => at(x, LOOK)))).filter(
      ({ value }) => !Number.isNaN(value),
    );
    if (places.length === 0) throw unsolvable();
    for (const [left, right] of await brackets(places, (x) => at(x, LOOK))) {
      const found = await root(left, right, (x) => at(x, accuracy), accuracy);
      if (!found.result) continue;
      last = found.result;
      solutions.push(solution(Math.exp(found.x), target, found.result, found.slope));
    }
    if (solutions.length === 0) throw refused(sizing, places[0], places[places.length - 1], [low, high]);
  }
  if (!last) throw unsolvable();
  return {
    solveFor,
    target: { value: target, unit: "ohm", text: formatQuantity(target, "ohm") },
    within: [from, to].map(shown),
    solutions,
    assumptions: [
      ...last.assumptions,
      solveFor === "scale"
        ? "The drawing is scaled evenly, and with it the thickness."
        : `The drawing is stretched in ${solveFor === "scaleX" ? "x" : "y"} only; a thickness stays as it is.`,
    ],
    sources: [],
    materials: last.materials,
    engine: ENGINE_VERSION,
    catalogue: CATALOGUE_VERSION,
  };
}

/** Where the value changes its sign between places, turns that hide two changes included. */
async function brackets(
  places: readonly Place[],
  at: (x: number) => Promise<Place>,
): Promise<(readonly [Place, Place])[]> {
  const found: (readonly [Place, Place])[] = [];
  for (let i = 1; i < places.length; i++) {
    if (places[i - 1].value * places[i].value <= 0) found.push([places[i - 1], places[i]]);
  }
  for (let i = 1; i + 1 < places.length; i++) {
    const [left, middle, right] = [places[i - 1], places[i], places[i + 1]];
    const side = Math.sign(middle.value);
    const turns = side * (left.value - middle.value) > LOOK && side * (right.value - middle.value) > LOOK;
    if (!turns || left.value * middle.value <= 0 || right.value * middle.value <= 0) continue;
    let [a, best, b]: Place[] = [left, middle, right];
    for (let k = 0; k < TURN_STEPS && side * best.value > 0; k++) {
      const wide = best.x - a.x > b.x - best.x;
      const next = await at(wide ? (a.x + best.x) / 2 : (best.x + b.x) / 2);
      if (Number.isNaN(next.value)) break;
      if (side * next.value < side * best.value) [a, best, b] = wide ? [a, next, best] : [best, next, b];
      else if (wide) a = next;
      else b = next;
    }
    if (side * best.value <= 0) found.push([left, best], [best, right]);
  }
  return found.sort((one, other) => one[0].x - other[0].x);
}

interface Found extends Solved {
  /** d ln R / d ln scale */
  readonly slope: number;
}

/** False position in logarithms (the Illinois rule): a power law is met in one step. */
async function root(
  left: Place,
  right: Place,
  at: (x: number) => Promise<Solved>,
  accuracy: number,
): Promise<Found> {
  let [a, b] = [left, right];
  let [fa, fb] = [a.value, b.value];
  let best: Found = { ...a, result: null, slope: (fb - fa) / (b.x - a.x) };
  for (let k = 0; k < MOST_STEPS; k++) {
    const slope = (b.value - a.value) / (b.x - a.x);
    const x = fb === fa ? (a.x + b.x) / 2 : b.x - (fb * (b.x - a.x)) / (fb - fa);
    const next = await at(Math.min(Math.max(x, Math.min(a.x, b.x)), Math.max(a.x, b.x)));
    if (Number.isNaN(next.value)) break;
    if (!best.result || Math.abs(next.value) < Math.abs(best.value)) best = { ...next, slope };
    if (Math.abs(next.value) <= accuracy / 10) break;
    if (next.value * fb < 0) {
      [a, fa] = [b, fb];
    } else fa /= 2;
    [b, fb] = [next, next.value];
  }
  return best;
}

/** The solution at scale 1 as that at another scale: every resistance over the scale, nothing else changes. */
function exactly(whole: FieldResult, scale: number): FieldResult {
  const { resistance } = whole;
  if (!resistance) return whole;
  const [value, lower, upper] = [resistance.value, resistance.lower, resistance.upper].map(
    (ohms) => ohms / scale,
  );
  const widened = { value, lower: lower * (1 - Number.EPSILON), upper: upper * (1 + Number.EPSILON) };
  return { ...whole, resistance: { ...resistance, ...widened, text: formatQuantity(value, "ohm", widened) } };
}

function solution(scale: number, target: number, result: FieldResult, slope: number): SizingSolution {
  const { resistance, method, operating, verdict, checks, cautions } = result;
  if (!resistance) throw unsolvable();
  const { value, lower, upper } = resistance;
  const exact = lower <= target && target <= upper;
  const off = Number((100 * Math.abs(value / target - 1)).toPrecision(2));
  return {
    dimension: shown(scale),
    resistance,
    sensitivity: (slope * value) / scale,
    exact,
    conductance: {
      value: 1 / value,
      unit: "siemens",
      text: formatQuantity(1 / value, "siemens", { lower: 1 / upper, upper: 1 / lower }),
    },
    method,
    operating,
    verdict,
    checks,
    cautions: exact
      ? cautions
      : [
          ...cautions,
          `The search ended ${off} % from the target, which lies outside the bounds there: give a narrower range.`,
        ],
  };
}

function shown(scale: number): SizingResult["within"][number] {
  return { value: scale, unit: "1", text: formatQuantity(scale, "1", { digits: 6 }) };
}

function refused(
  { solveFor, target }: FieldSizing,
  from: Place,
  to: Place,
  extremes?: readonly [Place, Place],
): InputError {
  const at = ({ x, value }: Place): string =>
    `${formatQuantity(target * Math.exp(value), "ohm", { digits: 4 })} at ${solveFor} = ${formatQuantity(Math.exp(x), "1", { digits: 4 })}`;
  // The extreme towards the target, where it is not at an end; a step below the look's accuracy is none.
  const below = from.value > 0;
  const extreme = extremes?.[below ? 0 : 1];
  const inner = extreme && [from, to].every(({ value }) => Math.abs(value - extreme.value) > LOOK);
  const between = inner
    ? `, and between them a ${below ? "minimum" : "maximum"} of about ${at(extreme)}`
    : "";
  return new InputError([
    { pointer: "#/target", detail: `is not reached: the resistance is ${at(from)} and ${at(to)}${between}.` },
  ]);
}

function unsolvable(): InputError {
  return new InputError([{ pointer: "#/outline", detail: "cannot be solved at any scale of the range." }]);
}
