/** Factors that are exact to rounding. */
import type { Factor } from "./define-shape";

/** Relative error that every closed form and converged series of the catalogue stays below. */
export const ROUNDING = 1e-13;

/** A closed form or a converged series whose only error is rounding. */
export function exactFactor(value: number): Factor {
  return { value, relativeError: ROUNDING, boundsBasis: "rounding", proved: true, method: "closed-form" };
}
