/**
 * Jacobi's theta functions of a real argument v and a nome 0 ≤ q < 1 (Whittaker–Watson notation, DLMF 20.2):
 *
 *   θ₁ = 2Σ(−1)ⁿ q^((n+½)²) sin((2n+1)v),  θ₂ = 2Σ q^((n+½)²) cos((2n+1)v),
 *   θ₃ = 1 + 2Σ q^(n²) cos 2nv,            θ₄ = 1 + 2Σ(−1)ⁿ q^(n²) cos 2nv.
 *
 * Summed as they stand; for q ≤ e^(−π) four terms reach rounding. Nearer to q = 1 Jacobi's imaginary transformation is
 * the caller's business, since it leaves exponentials that only the caller can cancel.
 */

const MOST_TERMS = 200;

/** θ₁(v, q)/(2q^(1/4)), θ₂(v, q)/(2q^(1/4)), θ₃(v, q), θ₄(v, q): the factor 2q^(1/4) is left out so that it cannot underflow. */
export function theta(
  v: number,
  q: number,
): { first: number; second: number; third: number; fourth: number } {
  let [first, second, third, fourth] = [Math.sin(v), Math.cos(v), 1, 1];
  for (let n = 1; n < MOST_TERMS; n++) {
    const odd = q ** (n * (n + 1));
    const even = 2 * q ** (n * n);
    if (even < 1e-18) break;
    const sign = n % 2 === 0 ? 1 : -1;
    first += sign * odd * Math.sin((2 * n + 1) * v);
    second += odd * Math.cos((2 * n + 1) * v);
    third += even * Math.cos(2 * n * v);
    fourth += sign * even * Math.cos(2 * n * v);
  }
  return { first, second, third, fourth };
}
