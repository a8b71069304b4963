/**
 * Arithmetic–geometric mean. agm(a, b) is the common limit of a → (a+b)/2, b → √(ab); it gives the complete elliptic
 * integral K(k) = π / (2·agm(1, √(1−k²))) (Gauss; DLMF 19.8.5) without the cancellation of a modulus near 1, as long
 * as the complementary modulus is what is passed.
 */

/** The mean converges quadratically once a/b is near 1; from 1e-300 it takes 16 steps. */
const MOST_STEPS = 40;

/**
 * agm(a, b) for a, b ≥ 0 in either order, to a few units in the last place; 0 where one of them is 0.
 * The arguments must be finite; their product may underflow, the roots are taken apart.
 */
export function agm(a: number, b: number): number {
  let larger = Math.max(a, b);
  let smaller = Math.min(a, b);
  if (smaller <= 0) return 0;
  for (let step = 0; step < MOST_STEPS; step++) {
    if (larger - smaller <= 1e-9 * larger) break;
    const mean = larger / 2 + smaller / 2;
    smaller = Math.sqrt(larger) * Math.sqrt(smaller);
    larger = mean;
  }
  // One more arithmetic step: the relative error is then below the square of 1e-9 over 16.
  return larger / 2 + smaller / 2;
}
