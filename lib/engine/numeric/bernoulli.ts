/** Bernoulli numbers and polynomials of even order, for Euler–Maclaurin expansions. */

/** B₀, B₂, B₄, … B₂₈ as exact fractions (numerator, denominator). */
const FRACTIONS: readonly (readonly [number, number])[] = [
  [1, 1],
  [1, 6],
  [-1, 30],
  [1, 42],
  [-1, 30],
  [5, 66],
  [-691, 2730],
  [7, 6],
  [-3617, 510],
  [43867, 798],
  [-174611, 330],
  [854513, 138],
  [-236364091, 2730],
  [8553103, 6],
  [-23749461029, 870],
];

/** Largest k for which B₂ₖ is held. */
export const LARGEST_BERNOULLI = FRACTIONS.length - 1;

/** The Bernoulli number B₂ₖ, 0 ≤ k ≤ LARGEST_BERNOULLI. */
export function bernoulliNumber(k: number): number {
  const [numerator, denominator] = FRACTIONS[k];
  return numerator / denominator;
}

/** B₂ₖ(½) = (2^(1−2k) − 1)·B₂ₖ. */
export function bernoulliAtHalf(k: number): number {
  return (2 ** (1 - 2 * k) - 1) * bernoulliNumber(k);
}

/**
 * The Bernoulli polynomial B₂ₖ(t) for 0 ≤ t ≤ 1, expanded about the middle, where it is even:
 * B₂ₖ(½+s) = Σⱼ C(2k, 2j)·B₂ⱼ(½)·s^(2k−2j) (DLMF 24.4.12). The error is a few units in the last place of max|B₂ₖ|.
 */
export function bernoulliPolynomial(k: number, t: number): number {
  const s2 = (t - 0.5) * (t - 0.5);
  let sum = 0;
  let binomial = 1;
  for (let j = 0; j <= k; j++) {
    sum = sum * s2 + binomial * bernoulliAtHalf(j);
    binomial *= ((2 * k - 2 * j) * (2 * k - 2 * j - 1)) / ((2 * j + 1) * (2 * j + 2));
  }
  return sum;
}
