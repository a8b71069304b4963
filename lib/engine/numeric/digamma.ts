/**
 * Digamma function ψ(x) = Γ'(x)/Γ(x) for x > 0: recurrence ψ(x) = ψ(x+1) − 1/x up to 12, then Stirling's series
 * ψ(x) = ln x − 1/(2x) − Σ B₂ₖ/(2k·x^(2k)) (DLMF 5.11.2), whose first term left out is below 1e-17 there.
 */
import { bernoulliNumber } from "./bernoulli";

/** Euler's constant. */
export const EULER_GAMMA = 0.5772156649015329;

const FROM = 12;
const TERMS = 8;

/** ψ(x) for finite x > 0; absolute error about 2e-16·max(1, |ψ|). */
export function digamma(x: number): number {
  let shifted = x;
  let sum = 0;
  while (shifted < FROM) {
    sum -= 1 / shifted;
    shifted += 1;
  }
  const inverse = 1 / (shifted * shifted);
  let series = 0;
  for (let k = TERMS; k >= 1; k--) series = (series + bernoulliNumber(k) / (2 * k)) * inverse;
  return sum + Math.log(shifted) - 0.5 / shifted - series;
}
