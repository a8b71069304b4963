/**
 * Bessel function J₀ of a real argument ≥ 0, absolute error below 1e-14.
 *
 * Up to 25: J₀(x) = (1/N)·Σ cos(x·cos θⱼ) at N equally spaced θⱼ = (j+½)π/N, the midpoint rule on Bessel's integral (DLMF
 * 10.9.1), whose error is 2·J₂ₙ(x) and vanishes for 2N = 64. Above: Hankel's asymptotic series (DLMF 10.17.3), cut at
 * its smallest term.
 */

const HALF_POINTS = 16;
const COSINES = Float64Array.from({ length: HALF_POINTS }, (_, j) =>
  Math.cos(((j + 0.5) * Math.PI) / (2 * HALF_POINTS)),
);

/** J₀(x) for x ≥ 0. */
export function besselJ0(x: number): number {
  if (x <= 25) {
    let sum = 0;
    for (let j = 0; j < HALF_POINTS; j++) sum += Math.cos(x * COSINES[j]);
    return sum / HALF_POINTS;
  }
  // a_k = ((1·3·…·(2k−1))²)/(k!·8ᵏ), signs alternating in pairs between the cosine and the sine part.
  let term = 1;
  let even = 0;
  let odd = 0;
  for (let k = 0; k < 60; k++) {
    const signed = k % 4 < 2 ? term : -term;
    if (k % 2 === 0) even += signed;
    else odd += signed;
    const next = (term * (2 * k + 1) ** 2) / ((k + 1) * 8 * x);
    if (next > term || next < 1e-18) break;
    term = next;
  }
  const phase = x - Math.PI / 4;
  return Math.sqrt(2 / (Math.PI * x)) * (even * Math.cos(phase) + odd * Math.sin(phase));
}
