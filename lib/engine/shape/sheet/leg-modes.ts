/**
 * How a junction of strips differs from its long-leg formula when its legs are short.
 *
 * In a leg of width w the flow of the junction with endless legs is the uniform flow plus modes
 * bₙ·exp(−nπx/w)·cos(nπy/w), x measured from the inner corner, at unit current and unit sheet resistance. Ending the leg
 * at x = L by a terminal (a conducting sheet laid across the flow) lowers R, by Rayleigh's theorem; ending a floating
 * leg by an edge raises it. Making the endless flow vanish on the end by the admissible trial functions
 * sinh(nπx/w)/sinh(nπL/w) shows by Dirichlet's (Thomson's) principle that the change is at most
 *
 *   Δ = Σₙ nπ·bₙ²·qⁿ/(1−qⁿ),   q = exp(−2πL/w),
 *
 * whose first term is also its asymptotic value. The bₙ come from the conformal map: near the leg's end of the half
 * plane, with u the local coordinate, the leg's −u·dZ/du = 1 + Σpₖuᵏ (Z = πx/w) and the potential's u·dV/du are power
 * series, and Lagrange's inversion gives n·bₙ = [uⁿ] (u·dV/du)·φⁿ, φ = u/exp(−Z). Modes beyond those summed are covered
 * by the energy that is left: Σ nπbₙ² over all legs is at most twice the excess squares of the junction.
 *
 * Derived here; tests compare with the field solver.
 */
import { exponentialSeries } from "../../numeric/power-series";

/** Modes that are summed one by one. */
export const MODES = 16;

/** Length of the power series that the modes need. */
export const SERIES_LENGTH = MODES + 1;

export interface LegMap {
  /** Z + ln u at the end of the leg, Z = 0 at the inner corner. */
  readonly offset: number;
  /** Coefficients of −u·dZ/du; the first is 1. */
  readonly stretch: readonly number[];
  /** Coefficients of u·dV/du at unit current through the junction. */
  readonly potential: readonly number[];
}

/** b₁ … b_MODES of a leg. */
export function legModes({ offset, stretch, potential }: LegMap): number[] {
  const exponent = stretch.map((p, k) => (k === 0 ? 0 : -p / k));
  const modes: number[] = [];
  for (let n = 1; n <= MODES; n++) {
    const power = exponentialSeries(exponent.slice(0, n + 1).map((e) => n * e));
    let coefficient = 0;
    for (let k = 0; k <= n; k++) coefficient += power[k] * potential[n - k];
    modes.push((coefficient * Math.exp(n * offset)) / n);
  }
  return modes;
}

export interface Leg {
  readonly modes: readonly number[];
  /** Length from the inner corner over width. */
  readonly aspect: number;
}

/**
 * Δ in squares for legs of one junction that end as stated; `excess` are the squares of the whole junction beyond its
 * legs, `others` the legs of the same junction that are endless or ended otherwise.
 */
export function endingChange(legs: readonly Leg[], excess: number, others: readonly Leg[] = []): number {
  let change = 0;
  let left = 2 * excess;
  let slowest = 0;
  for (const { modes, aspect } of legs) {
    const q = Math.exp(-2 * Math.PI * aspect);
    slowest = Math.max(slowest, share(q, MODES + 1));
    modes.forEach((b, i) => {
      const weight = (i + 1) * Math.PI * b * b;
      left -= weight;
      change += weight * share(q, i + 1);
    });
  }
  for (const { modes } of others) modes.forEach((b, i) => (left -= (i + 1) * Math.PI * b * b));
  return change + Math.max(0, left) * slowest;
}

/** qⁿ/(1−qⁿ). */
function share(q: number, n: number): number {
  const power = q ** n;
  return power / (1 - power);
}
