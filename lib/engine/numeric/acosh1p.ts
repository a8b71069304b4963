/** Inverse hyperbolic cosine near 1, where the textbook form loses every digit. */

/**
 * acosh(1 + x) for x ≥ 0, as log1p(x + √(x(x+2))): full relative accuracy from x = 0 (where it goes like √(2x)) up to
 * the largest doubles.
 */
export function acosh1p(x: number): number {
  const root = Math.sqrt(x) * Math.sqrt(x + 2);
  // Beyond 1e300 the sum could overflow; there acosh(1+x) = ln(2x) to the last digit.
  return x > 1e300 ? Math.log(x) + Math.LN2 : Math.log1p(x + root);
}

/** sinh(acosh(1 + x)) = √(x(x+2)), for x ≥ 0. */
export function sinhOfAcosh1p(x: number): number {
  return Math.sqrt(x) * Math.sqrt(x + 2);
}
