/** Propagation of distributions by Monte Carlo: JCGM 101 (GUM Supplement 1), clause 7; the same answer for a seed. */
import { Random } from "../../numeric/random";
import { samplerOf, varianceOf } from "./distribution";
import { refusePoint, refuseTrials, type UncertainResistance } from "./problem-box";
import { calibration } from "./propagation";

export interface MonteCarlo {
  readonly mean: number;
  readonly standard: number;
  readonly low: number;
  readonly high: number;
  /** Variance that each input gives alone, the others at their nominal values (JCGM 101, annex B). */
  readonly variances: readonly number[];
}

export const COVERAGE = 0.95;
const BETWEEN_LOOKS = 1024;

/** @throws InputError where a trial meets a point at which the request is refused, or the trials take too long. */
export function monteCarlo(resistance: UncertainResistance, trials: number, seed: number): MonteCarlo {
  const { inputs, nominal, at, cost, overdue } = resistance;
  const scale = calibration(resistance);
  const random = new Random(seed);
  const samplers = inputs.map((input) => samplerOf(input, random));
  const values = nominal.slice();
  const found = new Float64Array(trials);
  for (let trial = 0; trial < trials; trial++) {
    if (trial % BETWEEN_LOOKS === 0 && overdue()) refuseTrials(trial, trials, cost);
    for (let i = 0; i < samplers.length; i++) values[i] = samplers[i]();
    const value = at(values);
    if (Number.isNaN(value)) refusePoint(resistance, values, "#/uncertainty", `trial ${trial + 1} met`);
    found[trial] = scale * value;
  }
  // Deviations from the first value: nothing is lost where the spread is small against the mean.
  const origin = found[0];
  let sum = 0;
  for (const value of found) sum += value - origin;
  const mean = origin + sum / trials;
  let squares = 0;
  for (const value of found) squares += (value - mean) ** 2;
  found.sort();
  const [low, high] = coverageInterval(found);
  const variances = inputs.map((input, i) => {
    values.set(nominal);
    return varianceOf(input, (x) => {
      values[i] = x;
      return scale * at(values);
    });
  });
  return { mean, standard: Math.sqrt(squares / (trials - 1)), low, high, variances };
}

/** The probabilistically symmetric coverage interval of a sorted sample (JCGM 101, 7.7). */
export function coverageInterval(sorted: Float64Array): readonly [number, number] {
  const trials = sorted.length;
  const covered = Math.floor(COVERAGE * trials + 0.5);
  const below = Math.max(1, Math.floor((trials - covered + 1) / 2));
  return [sorted[below - 1], sorted[Math.min(trials, below + covered) - 1]];
}
