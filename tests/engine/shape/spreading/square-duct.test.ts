/** The cylinder in a square duct: series, near-touching strips, collocation and limits. */
import { describe, expect, it } from "vitest";
import { acosh1p } from "@/lib/engine/numeric/acosh1p";
import { solveInPlace } from "@/lib/engine/numeric/lu-solve";
import { squareDuctCollocation, squareDuctSpan } from "@/lib/engine/shape/spreading/square-duct";

/** Recomputed with the multipole system of up to 390 terms in 33-digit arithmetic. */
const values: readonly (readonly [number, string])[] = [
  [0.3, "1.2797328079320265281949363834224"],
  [0.5, "0.76882321445438652859597200419327"],
  [0.8, "0.29489874372477964579180119675128"],
  [0.9, "0.16897535905331815641688693899758"],
  [0.99, "0.039616920213250256962522998963249"],
];

/** Eisenstein sum of the Gaussian integers of order 4, Γ(¼)⁸/(960π²); that of order 8 is 3/7 of its square. */
const G4 = 3.6256099082219083119 ** 8 / 960 / Math.PI ** 2;

/** Rayleigh's system in doubles; lattice sums from Eisenstein's, those of high order taken directly. */
function multipoles(delta: number, count: number): number {
  const a = delta / 2;
  const sums = new Map<number, number>();
  const latticeSum = (m: number): number => {
    const known = sums.get(m);
    if (known !== undefined) return known;
    // Even sites are the lattice (1+i)·Z[i], so Σ± = 2·G/(1+i)^m − G.
    if (m === 4) return -1.5 * G4;
    if (m === 8) return -0.875 * (3 / 7) * G4 * G4;
    let sum = 0;
    for (let x = -40; x <= 40; x++) {
      for (let y = -40; y <= 40; y++) {
        const squared = x * x + y * y;
        if (squared === 0) continue;
        sum += ((x + y) % 2 === 0 ? 1 : -1) * Math.cos(m * Math.atan2(y, x)) * squared ** (-m / 2);
      }
    }
    sums.set(m, sum);
    return sum;
  };
  const orders = Array.from({ length: count }, (_, i) => 4 * (i + 1));
  const choose = (n: number, k: number): number => {
    let product = 1;
    for (let i = 1; i <= k; i++) product *= (n - k + i) / i;
    return product;
  };
  const rows = orders.map((m) =>
    orders.map((n) => choose(n + m - 1, m) * latticeSum(n + m) * a ** (n + m) + (n === m ? 1 : 0)),
  );
  const right = orders.map((m) => (-(a ** m) * latticeSum(m)) / m);
  const x = solveInPlace(Float64Array.from(rows.flat()), Float64Array.from(right));
  const thin = 1.0787052023767587;
  return (
    Math.log(thin / delta) +
    x.reduce((sum, value, i) => sum + a ** orders[i] * value * latticeSum(orders[i]), 0)
  );
}

const span = (delta: number) => squareDuctSpan({ diameter: delta, side: 1 });

describe("cylinder in a square duct", () => {
  it.each(values)("δ=%d", (delta, value) => {
    // d ln R/d ln δ is about 1/(2(1−δ)), by which the decimal δ is not the double.
    const tolerance = 1e-15 + 2e-16 / (1 - delta);
    expect(Math.abs(span(delta) / Number(value) - 1)).toBeLessThan(tolerance);
  });

  it("agrees with Rayleigh's multipole system in doubles", () => {
    for (const delta of [0.2, 0.5, 0.7, 0.84, 0.86, 0.9]) {
      expect(Math.abs(span(delta) / multipoles(delta, 24) - 1)).toBeLessThan(1e-11);
    }
  });

  it("agrees with collocation on the side of the square", () => {
    for (const delta of [0.01, 0.3, 0.5, 0.7, 0.8]) {
      expect(Math.abs(span(delta) / squareDuctCollocation(delta).span - 1)).toBeLessThan(1e-11);
    }
    expect(Math.abs(span(0.9) / squareDuctCollocation(0.9).span - 1)).toBeLessThan(1e-8);
  });

  it("joins its two expansions without a jump", () => {
    expect(Math.abs(span(0.85 * (1 + 1e-15)) / span(0.85) - 1)).toBeLessThan(1e-13);
  });

  it("lies between concentric round ducts of the side and of the diagonal", () => {
    for (const delta of [1e-6, 0.1, 0.5, 0.9, 0.999]) {
      expect(span(delta)).toBeGreaterThan(-Math.log(delta));
      expect(span(delta)).toBeLessThan(Math.log(Math.SQRT2 / delta));
    }
  });

  it("tends to four gaps of a cylinder and a plane side by side when it nearly touches", () => {
    for (const gap of [1e-4, 1e-8, 1e-12]) {
      const delta = 1 - gap;
      const mu = acosh1p((1 - delta) / delta);
      // 4·(2π/μ) less what the four gaps do not have: 8·2.3238.
      const expected = (2 * Math.PI) / (8 * (Math.PI / mu - 2.323813600915909));
      expect(Math.abs(span(delta) / expected - 1)).toBeLessThan(2 * mu * mu * mu + 1e-15);
    }
  });
});
