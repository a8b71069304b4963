/** The constriction of a spot in a cylinder against the integral equation solved anew, and against published fits. */
import { describe, expect, it } from "vitest";
import { EULER_GAMMA } from "@/lib/engine/numeric/digamma";
import { gaussLegendre } from "@/lib/engine/numeric/gauss-legendre";
import { solveInPlace } from "@/lib/engine/numeric/lu-solve";
import { spotConstriction } from "@/lib/engine/shape/spreading/spot-in-cylinder-law";
import { factor } from "../../../support/shape-law";

const psi = (ratio: number) => spotConstriction({ spotDiameter: ratio, cylinderDiameter: 1 });

/** K₁(y)·e^y = ∫₀^∞ exp(y(1 − cosh t))·cosh t dt, trapezoidal rule (converges beyond any power). */
function scaledK1(y: number): number {
  const top = Math.acosh(1 + 45 / y);
  const steps = 400;
  const h = top / steps;
  let sum = 0.5;
  for (let k = 1; k <= steps; k++) sum += Math.exp(y * (1 - Math.cosh(k * h))) * Math.cosh(k * h);
  return sum * h;
}

/** I₁(y)·e^(−y) = (1/π)∫₀^π exp(y(cos t − 1))·cos t dt. */
function scaledI1(y: number): number {
  if (y < 0.5) {
    let term = y / 2;
    let sum = term;
    for (let k = 1; k < 12; k++) {
      term *= (y * y) / 4 / (k * (k + 1));
      sum += term;
    }
    return sum * Math.exp(-y);
  }
  const steps = 300;
  let sum = (1 - Math.exp(-2 * y)) / 2;
  for (let k = 1; k < steps; k++) {
    const cosine = Math.cos((Math.PI * k) / steps);
    sum += Math.exp(y * (cosine - 1)) * cosine;
  }
  return sum / steps;
}

/** Places and weights of the y integral: dyadic panels from 2⁻¹⁴ to 1, then panels of 1 up to 120. */
const rule = gaussLegendre(16);
const panels: { y: number; weight: number; ratio: number; near: boolean }[] = [];
function addPanel(from: number, to: number): void {
  for (let i = 0; i < 16; i++) {
    const y = from + (to - from) * rule.nodes[i];
    const ratio = (scaledK1(y) / scaledI1(y)) * Math.exp(-2 * y);
    panels.push({ y, weight: (to - from) * rule.weights[i], ratio, near: y < 1 });
  }
}
for (let k = 14; k >= 1; k--) addPanel(2 ** -k, 2 ** (1 - k));
for (let y = 1; y < 120; y += 1) addPanel(y, y + 1);

/** Finite part of ∫₀^∞ K₁/I₁·cosh(xy) dy; near 0 the integrand is 2/y² + ln(y/2) + γ − 3/4 + x². */
function kernel(x: number): number {
  const start = 2 ** -14;
  let sum = -2 + start * (Math.log(start / 2) - 1 + EULER_GAMMA - 0.75 + x * x);
  for (const { y, weight, ratio, near } of panels) {
    sum += weight * (ratio * Math.cosh(x * y) - (near ? 2 / (y * y) : 0));
  }
  return sum;
}

/** ψ from the Fredholm equation by Nyström's method on the even extension. */
function solved(ratio: number, nodes: number): number {
  const { nodes: places, weights } = gaussLegendre(nodes);
  const t = Array.from(places);
  const rows = t.map((s, i) =>
    t.map((u, j) => {
      const values = kernel(ratio * (s + u)) + kernel(ratio * (s - u));
      return ((2 * ratio) / Math.PI ** 2) * weights[j] * values + (i === j ? 1 : 0);
    }),
  );
  const h = solveInPlace(
    Float64Array.from(rows.flat()),
    Float64Array.from(t, () => 1),
  );
  return 1 / h.reduce((sum, value, i) => sum + weights[i] * value, 0);
}

describe("spot in a cylinder", () => {
  it.each([0.01, 0.1, 0.3, 0.5, 0.7])("ε=%d agrees with the integral equation", (ratio) => {
    expect(Math.abs(psi(ratio) / solved(ratio, 24) - 1)).toBeLessThan(5e-11);
  });

  it("ε=0.85 and 0.93 agree with it as far as this solution goes", () => {
    expect(Math.abs(psi(0.85) / solved(0.85, 40) - 1)).toBeLessThan(1e-10);
    expect(Math.abs(psi(0.93) / solved(0.93, 64) - 1)).toBeLessThan(1e-9);
  });

  it("has the value E-tubespot-1 and the converged values of 8-formulas", () => {
    expect(psi(0.013)).toBeCloseTo(0.981680461637991109, 15);
    expect(psi(0.1)).toBeCloseTo(0.8594136006605, 13);
    expect(psi(0.3)).toBeCloseTo(0.5865094103626, 13);
    expect(psi(0.5)).toBeCloseTo(0.3396093901356, 13);
    expect(psi(0.7)).toBeCloseTo(0.1402867829588, 13);
    expect(psi(0.9)).toBeCloseTo(0.0182416962978, 13);
  });

  it("agrees with Rosenfeld and Timsit 1981 as far as that goes (from memory)", () => {
    const fit = (e: number) => 1 - 1.41581 * e + 0.06322 * e ** 2 + 0.15261 * e ** 3 + 0.19998 * e ** 4;
    for (const e of [0.05, 0.2, 0.35, 0.5]) expect(Math.abs(fit(e) - psi(e))).toBeLessThan(4e-4);
    expect(Math.abs(fit(0.7) - psi(0.7))).toBeLessThan(1.1e-3);
  });

  it("agrees with Roess's series at small ε, and not at 0.5 (from memory, by way of Holm)", () => {
    const series = (e: number) =>
      1 -
      1.40925 * e +
      0.29591 * e ** 3 +
      0.05254 * e ** 5 +
      0.02105 * e ** 7 +
      0.01107 * e ** 9 +
      0.00631 * e ** 11;
    expect(Math.abs(series(0.1) / psi(0.1) - 1)).toBeLessThan(1e-4);
    expect(Math.abs(series(0.5) / psi(0.5) - 1)).toBeGreaterThan(0.01);
  });

  it("has its limits: 1 − 1.40925241342ε + 0.3381805ε³, and 2ε(1−ε)²", () => {
    const small = 1e-3;
    expect(psi(small)).toBeCloseTo(1 - 1.40925241342 * small + 0.3381805 * small ** 3, 13);
    for (const ring of [1e-3, 1e-6, 1e-9]) {
      // The next term is −(3/8)·D²·ln D against 2.
      const expected = 2 * (1 - ring) * ring * ring;
      const given = { spotDiameter: 1 - ring, cylinderDiameter: 1 };
      const found = spotConstriction(given) / expected / ((1 - given.spotDiameter) / ring) ** 2;
      expect(Math.abs(found - 1)).toBeLessThan(3 * ring * ring * Math.abs(Math.log(ring)) + 1e-14);
    }
  });

  it("joins its expansions without a jump", () => {
    for (const border of [0.7, 0.92]) {
      const [below, above] = [psi(border * (1 - 1e-15)), psi(border * (1 + 1e-15))];
      expect(Math.abs(above / below - 1)).toBeLessThan(1e-13);
    }
  });

  it("states its accuracy", () => {
    const found = factor("spot-in-cylinder", { spotDiameter: 1, cylinderDiameter: 3 });
    expect(found).toMatchObject({ boundsBasis: "formula-accuracy", proved: false, relativeError: 1e-13 });
    expect(found.accuracy).toContain("integral equation");
  });
});
