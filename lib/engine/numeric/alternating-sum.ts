/**
 * Sum of an alternating series whose terms are smooth in their index, accelerated by Chebyshev weights:
 * H. Cohen, F. Rodriguez Villegas, D. Zagier, "Convergence acceleration of alternating series", Experimental
 * Mathematics 9 (2000) 3–12, algorithm 1 (from memory). For totally monotonic terms the relative error of n terms is
 * below 2·5.83^(−n).
 */

/** Σ_{k≥0} (−1)ᵏ·term(k) from the first `terms` terms; 24 reach rounding for totally monotonic terms. */
export function alternatingSum(term: (k: number) => number, terms = 24): number {
  const growth = (3 + Math.sqrt(8)) ** terms;
  const scale = (growth + 1 / growth) / 2;
  let b = -1;
  let c = -scale;
  let sum = 0;
  for (let k = 0; k < terms; k++) {
    c = b - c;
    sum += c * term(k);
    b *= ((k + terms) * (k - terms)) / ((k + 0.5) * (k + 1));
  }
  return sum / scale;
}
