/** A sheet pattern whose legs are too short for its formula, by the field solution on the plan that it draws. */
import { checkOutline } from "../field/outline/check-outline";
import type { Point as OutlinePoint } from "../field/outline/schema";
import { solveField } from "../field/solve-field";
import type { Dimensions, Factor, FactorAnswer, Resolved, Shape } from "../shape/define-shape";
import type { DrawingPath } from "../shape/drawing";

/** Bounds wider than this share of the value: the formula has lost its accuracy. */
const FORMULA_REACH = 1e-4;
/** What the field solution is asked for, and its cap: it answers within the call. */
const ACCURACY = 1e-5;
const MOST_UNKNOWNS = 6_000;
const MOST_REFINEMENTS = 10;
/** Proportions of the plan and corners beyond which a solution takes longer than a call may. */
const MOST_PROPORTION = 30;
const MOST_CORNERS = 12;

/** The law's factor, or a field solution's where that is closer. Deterministic: no clock ends it. */
export function sharpenedFactor(
  shape: Shape,
  answer: FactorAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  law: Factor,
): Factor {
  const { value, lower = value, upper = value } = law;
  if (!answer.planIsWhole?.(dimensions) || upper - lower <= FORMULA_REACH * value) return law;
  const [plan] = shape.drawing(dimensions).views;
  if (!isPlain(points(plan.conductor[0]))) return law;
  const check = checkOutline({
    outline: {
      unit: "m",
      outer: points(plan.conductor[0]),
      holes: [],
      symmetry: "plan",
    },
    terminals: [
      { name: "high", segments: segments(plan.high) },
      { name: "low", segments: segments(plan.low) },
    ],
  });
  if (!check.ok) return law;
  const { squares } = solveField(
    { outline: check.outline, conductance: [1] },
    { accuracy: ACCURACY, maximumUnknowns: MOST_UNKNOWNS, maximumRefinements: MOST_REFINEMENTS },
  );
  if (!squares || squares.upper - squares.lower >= upper - lower) return law;
  return {
    value: squares.value,
    relativeError: law.relativeError,
    lower: squares.lower,
    upper: squares.upper,
    boundsBasis: "energy",
    proved: true,
    method: "field",
    accuracy:
      "The legs are short against their width, so the value is that of a field solution on the plan, between two proved bounds.",
  };
}

/** Few corners, and no edge much shorter than the whole: such a plan is solved in some tens of milliseconds. */
function isPlain(ring: readonly OutlinePoint[]): boolean {
  if (ring.length > MOST_CORNERS) return false;
  const lengths = ring.map(([x, y], k) => {
    const [nextX, nextY] = ring[(k + 1) % ring.length];
    return Math.hypot(nextX - x, nextY - y);
  });
  // A plan may name a corner twice, where two of its edges lie in line.
  const edges = lengths.filter((length) => length > 0);
  return Math.max(...edges) <= MOST_PROPORTION * Math.min(...edges);
}

function points({ from, steps }: DrawingPath): OutlinePoint[] {
  return [from, ...steps.map(({ to }) => to)].map(([x, y]): OutlinePoint => [x, y]);
}

function segments(paths: readonly DrawingPath[]): [OutlinePoint, OutlinePoint][] {
  return paths.map((path) => {
    const [a, b] = points(path);
    return [a, b];
  });
}
