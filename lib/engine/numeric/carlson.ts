/**
 * Carlson's symmetric elliptic integrals R_F and R_C by duplication.
 *
 *   R_F(x, y, z) = ½ ∫₀^∞ dt / √((t+x)(t+y)(t+z)),   R_C(x, y) = R_F(x, y, y).
 *
 * B. C. Carlson, "Numerical computation of real or complex elliptic integrals", Numer. Algorithms 10 (1995) 13–26
 * (algorithm from memory; DLMF 19.36). Each duplication divides the spread of the arguments by 4, the series that is
 * left has an error of the order of spread⁶ (R_F) and spread⁸ (R_C).
 */

const MOST_STEPS = 600;
const SPREAD_RF = 2.5e-3;
const SPREAD_RC = 6e-3;

/** R_F(x, y, z) for finite x, y, z ≥ 0 of which at most one is 0; relative error a few units in the last place. */
export function carlsonRF(x: number, y: number, z: number): number {
  let [a, b, c] = [x, y, z];
  for (let step = 0; step < MOST_STEPS; step++) {
    const mean = a / 3 + b / 3 + c / 3;
    const [u, v] = [1 - a / mean, 1 - b / mean];
    const w = -u - v;
    if (Math.max(Math.abs(u), Math.abs(v), Math.abs(w)) < SPREAD_RF) {
      const e2 = u * v - w * w;
      const e3 = u * v * w;
      return (1 - e2 / 10 + e3 / 14 + (e2 * e2) / 24 - (3 * e2 * e3) / 44) / Math.sqrt(mean);
    }
    const [p, q, r] = [Math.sqrt(a), Math.sqrt(b), Math.sqrt(c)];
    const shift = p * q + q * r + r * p;
    a = (a + shift) / 4;
    b = (b + shift) / 4;
    c = (c + shift) / 4;
  }
  return Number.NaN;
}

/** R_C(x, y) for finite x ≥ 0, y > 0; relative error a few units in the last place. */
export function carlsonRC(x: number, y: number): number {
  let [a, b] = [x, y];
  for (let step = 0; step < MOST_STEPS; step++) {
    const mean = a / 3 + (2 * b) / 3;
    const s = (b - a) / (3 * mean);
    if (Math.abs(s) < SPREAD_RC) {
      const series =
        s * s * (3 / 10 + s * (1 / 7 + s * (3 / 8 + s * (9 / 22 + s * (159 / 208 + (s * 9) / 8)))));
      return (1 + series) / Math.sqrt(mean);
    }
    const shift = 2 * Math.sqrt(a) * Math.sqrt(b) + b;
    a = (a + shift) / 4;
    b = (b + shift) / 4;
  }
  return Number.NaN;
}
