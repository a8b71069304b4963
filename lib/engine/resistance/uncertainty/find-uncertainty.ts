/** From a solved resistance and its uncertain inputs to the range in which it lies, with a budget by input. */
import { InputError } from "../../failure";
import { formatQuantity } from "../../quantity/format-quantity";
import { Evaluator, type EvaluatorSource } from "../evaluator";
import type { ComputeContext } from "../compute-context";
import type { Solution } from "../solution";
import type { UncertainInput } from "./input";
import { COVERAGE, monteCarlo } from "./monte-carlo";
import { checkEnds, type UncertainResistance } from "./problem-box";
import { propagate, type Contribution, type Propagated } from "./propagation";
import type { Uncertainty } from "./result-schema";
import { DEFAULT_TRIALS, MOST_TRIALS, type UncertaintyRequest } from "./tolerance-schema";
import { worstCase } from "./worst-case";

/** Two-sided 95 % of a normal distribution (JCGM 100, table G.1). */
export const COVERAGE_FACTOR = 1.959963984540054;
/** Work of an integral over a closed form's. */
const INTEGRAL_WORK = 10;

/** Cautions. */
export const NO_TOLERANCE = "No input has a tolerance, so the uncertainty is zero.";
export const ROUGH_PROPAGATION =
  "The resistance is not straight over the tolerances, so first-order propagation is rough here; its range is widened to the values at their ends. monte-carlo takes the bend into account.";

export interface FoundUncertainty {
  readonly uncertainty: Uncertainty;
  readonly cautions: readonly string[];
}

/**
 * Evaluates the uncertainty that a request asks for.
 * @throws InputError where a tolerance reaches beyond what the request may be, or the work takes too long.
 */
export function findUncertainty(
  request: UncertaintyRequest,
  source: EvaluatorSource,
  inputs: readonly UncertainInput[],
  solution: Solution,
  context: ComputeContext,
): FoundUncertainty {
  const sites = inputs.map(({ site }) => site);
  const evaluator = new Evaluator(source, sites, context);
  const nominal = Float64Array.from(inputs, (input) => input.nominal);
  const integral = solution.method === "quadrature" && solution.integral !== undefined;
  const resistance: UncertainResistance = {
    inputs,
    nominal,
    at: (values) => evaluator.at(values),
    value: solution.value,
    noise: integral ? 1e-9 : 1e-12,
    cost: integral ? evaluator.costAt(nominal) : 0,
    evaluator,
    overdue: context.overdue ?? (() => false),
  };
  checkEnds(resistance);
  const propagated = propagate(resistance);
  const { answer } = source.shape;
  const work = integral ? INTEGRAL_WORK : answer.kind === "flow" ? 1 : (answer.work ?? 1);
  const { uncertainty, cautions } = byMethod(request, resistance, propagated, work);
  if (inputs.length === 0) cautions.push(NO_TOLERANCE);
  if (solution.method === "field") {
    cautions.push(
      "The sensitivities are those of the formula; the value is that of the field solution on the nominal plan.",
    );
  }
  return { uncertainty, cautions };
}

interface ByMethod {
  readonly uncertainty: Uncertainty;
  readonly cautions: string[];
}

function byMethod(
  request: UncertaintyRequest,
  resistance: UncertainResistance,
  propagated: Propagated,
  work: number,
): ByMethod {
  const { value } = resistance;
  const { standard, shift, contributions, bent } = propagated;
  const cautions: string[] = [];
  if (request.method === "worst-case") {
    const { low, high, spans, basis } = worstCase(resistance);
    return {
      uncertainty: {
        method: "worst-case",
        standard,
        ...rangeOf(low, high),
        coverage: 1,
        basis,
        contributions: budget(contributions, spans),
      },
      cautions,
    };
  }
  if (request.method === "monte-carlo") {
    const most = MOST_TRIALS / work;
    const trials = request.trials ?? DEFAULT_TRIALS / work;
    if (trials > most) throw tooManyTrials(most);
    const seed = request.seed ?? 1;
    const { mean, low, high, variances, ...found } = monteCarlo(resistance, trials, seed);
    return {
      uncertainty: {
        method: "monte-carlo",
        standard: found.standard,
        ...rangeOf(low, high),
        coverage: COVERAGE,
        basis: `${trials.toLocaleString("en")} trials with seed ${seed}; the range leaves 2.5 % of them on either side (JCGM 101, 7.7). Shares are the variances that the inputs give one at a time (annex B).`,
        mean,
        trials,
        seed,
        contributions: budget(contributions, variances),
      },
      cautions,
    };
  }
  let low = value + shift - COVERAGE_FACTOR * standard;
  let high = value + shift + COVERAGE_FACTOR * standard;
  if (bent) {
    // No verdict may rest on a range that the tolerances' own ends leave.
    low = Math.min(low, propagated.low);
    high = Math.max(high, propagated.high);
    cautions.push(ROUGH_PROPAGATION);
  }
  return {
    uncertainty: {
      method: "propagation",
      standard,
      ...rangeOf(low, high),
      coverage: COVERAGE,
      basis: `First order (JCGM 100, 5.1.2), the inputs taken as independent; the range is ±1.96 standard uncertainties${shift === 0 ? "" : " about the expectation, which tolerances of unequal sides move"}.`,
      contributions: budget(
        contributions,
        contributions.map((entry) => (entry.sensitivity * entry.standard) ** 2),
      ),
    },
    cautions,
  };
}

/** What would never fit is refused before any work, whatever else the machine has to do. */
function tooManyTrials(most: number): InputError {
  return new InputError([
    {
      pointer: "#/uncertainty/trials",
      detail: `must be at most ${most.toLocaleString("en")} here, where one value takes more work than a plain formula.`,
    },
  ]);
}

/** The range with its text: both ends to the second significant digit of half the width (JCGM 100, 7.2.6). */
export function rangeOf(low: number, high: number): { low: number; high: number; text: string } {
  const half = (high - low) / 2;
  const end = (value: number): string =>
    formatQuantity(value, "ohm", { lower: value - half, upper: value + half });
  return { low, high, text: `${end(low)} … ${end(high)}` };
}

function budget(
  contributions: readonly Contribution[],
  parts: readonly number[],
): Uncertainty["contributions"] {
  const whole = parts.reduce((sum, part) => sum + part, 0);
  return contributions
    .map(({ input, sensitivity, standard }, i) => ({
      input: input.name,
      sensitivity,
      standard,
      share: whole > 0 ? parts[i] / whole : 0,
    }))
    .sort((a, b) => b.share - a.share);
}
