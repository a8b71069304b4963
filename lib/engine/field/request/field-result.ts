/** A finished field solution as it is answered. */
import { CheckFailure, Problems } from "../../failure";
import { formatQuantity } from "../../quantity/format-quantity";
import { operatingPoint } from "../../resistance/operating-point";
import { verdictOf } from "../../resistance/requirement";
import { ENGINE_VERSION } from "../../version";
import { down, up } from "../bounds/interval";
import { densityPeak } from "../picture/peak";
import type { BoundedValue, FieldProgress, FieldSolution } from "../solve-field";
import type { FieldResult } from "./field-result-schema";
import type { PreparedField } from "./prepare-field";

const ASSUMPTIONS = [
  "Direct current, steady, in a medium at rest; the terminals are equipotentials and no current leaves anywhere else.",
];
const PLAN = "The conductor is a sheet: the current density does not vary across its thickness.";
const AXISYMMETRIC = "The conductor is the body swept by the outline around the axis x = 0.";
const ESTIMATED =
  "The conductivity varies inside the elements, so the integrals behind the bounds are estimated and the bracket is not proved.";
/** Stands with every field solution. */
export const FIELD_CAUTION =
  "The result is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise, insulation and protection are for the local code and a licensed or otherwise competent engineer.";

/** Names of what may end the work early, for people. */
const LIMITS: Readonly<Record<string, string>> = {
  unknowns: "the cap on unknowns",
  refinements: "the cap on refinements",
  stopped: "the time it may take",
  rounding: "the rounding of the arithmetic",
};

/**
 * Makes the answer.
 * @param seconds how long the solution took.
 * @throws CheckFailure where one of the engine's checks failed, InputError where the operating point leaves a double.
 */
export function presentField(prepared: PreparedField, solution: FieldSolution, seconds: number): FieldResult {
  for (const { name, passed, deviation, tolerance } of solution.checks) {
    if (!passed) throw new CheckFailure(name, deviation, tolerance);
  }
  const { problem, mediumError, collected, requirement } = prepared;
  const { outline } = problem;
  const resistance = solution.resistance && widened(solution.resistance, mediumError);
  const problems = new Problems();
  const operating = resistance
    ? operatingPoint(prepared.operating, resistance.value, problems)
    : { temperature: prepared.operating.temperatureC };
  problems.throwIfAny();
  const result: FieldResult = {
    method: "field",
    operating,
    mesh: {
      triangles: solution.triangles,
      unknowns: solution.unknowns,
      refinements: solution.refinements,
    },
    seconds,
    checks: solution.checks.map((check) => ({ ...check, applies: true })),
    repairs: [...outline.repairs],
    cautions: [FIELD_CAUTION, ...(solution.proved ? [] : [ESTIMATED]), ...collected.cautions],
    assumptions: [...ASSUMPTIONS, outline.axisymmetric ? AXISYMMETRIC : PLAN, ...collected.assumptions],
    materials: collected.used,
    engine: ENGINE_VERSION,
  };
  if (solution.status === "limited") result.limit = LIMITS[solution.limit ?? ""] ?? "a cap on the work";
  if (resistance) {
    const { value, lower, upper } = resistance;
    result.resistance = {
      value,
      unit: "ohm",
      text: formatQuantity(value, "ohm", { lower, upper }),
      lower,
      upper,
      boundsBasis: solution.boundsBasis,
      proved: solution.proved,
    };
    if (requirement) result.verdict = verdictOf(requirement, resistance);
    const voltage = operating.voltage ?? 1;
    result.peak = peakOf(
      prepared,
      solution,
      voltage,
      operating.voltage === undefined ? "volt" : "operating-point",
    );
  }
  if (solution.squares) {
    const { value, lower, upper } = widened(solution.squares, 0);
    const text = `${formatQuantity(value, "1", { lower, upper }).trim()} squares`;
    result.squares = { value, unit: "square", text, lower, upper };
  }
  if (solution.conductance && solution.pairs) addMatrix(result, prepared, solution);
  return result;
}

function addMatrix(result: FieldResult, prepared: PreparedField, solution: FieldSolution): void {
  const { problem, mediumError } = prepared;
  const names = problem.outline.terminalNames;
  const matrix = (solution.conductance ?? []).map((row) =>
    row.map((entry) => widenedSigned(entry, mediumError)),
  );
  result.conductance = matrix.map((row) => row.map(({ value }) => value));
  result.conductanceBounds = {
    lower: matrix.map((row) => row.map(({ lower }) => lower)),
    upper: matrix.map((row) => row.map(({ upper }) => upper)),
  };
  result.pairs = (solution.pairs ?? []).map(({ between, floating, grounded }) => ({
    between: [names[between[0]], names[between[1]]],
    floating: pairResistance(widened(floating, mediumError), solution),
    grounded: pairResistance(widened(grounded, mediumError), solution),
  }));
}

function pairResistance(
  { value, lower, upper }: BoundedValue,
  { boundsBasis, proved }: FieldSolution,
): NonNullable<FieldResult["pairs"]>[number]["floating"] {
  const unit = "ohm";
  if (Number.isFinite(upper)) {
    const text = formatQuantity(value, unit, { lower, upper });
    return { value, unit, text, lower, upper, boundsBasis, proved };
  }
  const text = `above ${formatQuantity(lower, unit)}`;
  return { value: null, unit, text, lower, upper: null, boundsBasis, proved };
}

/** The bracket on the way to the answer, widened as the answer is, so that it never lies inside a later one. */
export function presentProgress({ mediumError }: PreparedField, progress: FieldProgress): FieldProgress {
  const { lower, upper } = widened({ ...progress, value: progress.lower }, mediumError);
  return { ...progress, lower, upper };
}

/** Bounds of a positive value, widened by a relative error and never of zero width. */
function widened({ value, lower, upper }: BoundedValue, error: number): BoundedValue {
  return { value, lower: down(down(lower * (1 - error))), upper: up(up(upper * (1 + error))) };
}

/** The same for a value of any sign. */
function widenedSigned({ value, lower, upper }: BoundedValue, error: number): BoundedValue {
  return {
    value,
    lower: down(down(lower - Math.abs(lower) * error)),
    upper: up(up(upper + Math.abs(upper) * error)),
  };
}

/** Digits of a density or a field that only one of the two solutions tells. */
const DIGITS_OF_ONE_SOLUTION = 3;

function peakOf(
  { problem, request }: PreparedField,
  { map }: FieldSolution,
  voltage: number,
  per: "operating-point" | "volt",
): FieldResult["peak"] {
  const [only] = problem.conductance;
  const linked = problem.conductance.length === 1 && typeof only === "number" ? only : null;
  const { unbounded, position, density, fieldVperM, distanceM, spread } = densityPeak(map, linked);
  const { axisymmetric, frame } = problem.outline;
  const unit = axisymmetric ? "A/m^2" : "A/m";
  const [x, y] = position.map((coordinate) => Number(coordinate.toPrecision(9)));
  const place = `(${x}, ${y}) ${request.outline?.unit ?? frame.unit}`;
  // The field comes from the potential, the density from the stream function. Where one conductance links them, both
  // tell the middle of the two, to the digits in which they agree.
  const middle = linked === null ? null : (fieldVperM + density / linked) / 2;
  const apart =
    linked === null || middle === null ? null : Math.max(spread, Math.abs(density / linked / middle - 1));
  const quantity = <Unit extends "A/m" | "A/m^2" | "V/m">(atOneVolt: number, of: Unit) => {
    const value = atOneVolt * voltage;
    const digits =
      apart === null
        ? { digits: DIGITS_OF_ONE_SOLUTION }
        : { lower: value - Math.abs(value) * apart, upper: value + Math.abs(value) * apart };
    return { value, unit: of, text: formatQuantity(value, of, digits) };
  };
  const currentDensity = quantity(linked === null || middle === null ? density : middle * linked, unit);
  const field = quantity(middle ?? fieldVperM, "V/m");
  const distance = unbounded
    ? ({ value: distanceM, unit: "m", text: formatQuantity(distanceM, "metre") } as const)
    : null;
  return {
    unbounded,
    position: { x, y, unit: frame.unit, text: place },
    distance,
    field,
    currentDensity,
    per,
    text: distance
      ? `Unbounded at ${place}; ${currentDensity.text} at ${distance.text} from it.`
      : `Largest at ${place}: ${currentDensity.text}.`,
  };
}
