import { describe, expect, it } from "vitest";
import Decimal from "decimal.js";
import { gaussLegendre } from "@/lib/engine/numeric/gauss-legendre";
import { gaussPoints, integratePieces, type Smoothness } from "@/lib/engine/numeric/piecewise-integral";

describe("Gauss–Legendre rules", () => {
  it.each([1, 2, 3, 5, 8, 16, 40, 200])("of %i points integrate polynomials exactly", (n) => {
    const { nodes, weights } = gaussLegendre(n);
    for (const degree of [0, 1, Math.max(0, 2 * n - 2), 2 * n - 1]) {
      let sum = 0;
      for (let i = 0; i < n; i++) sum += weights[i] * nodes[i] ** degree;
      expect(Math.abs(sum * (degree + 1) - 1)).toBeLessThan(3e-14);
    }
  });

  it("refuse a senseless number of points", () => {
    expect(() => gaussLegendre(0)).toThrow(RangeError);
    expect(() => gaussLegendre(2.5)).toThrow(RangeError);
  });
});

describe("the number of Gauss points for a ratio", () => {
  const cubic =
    (q: number, a: number, b: number) =>
    (u: number): number =>
      1 / (1 + (q - 1) * (a * u + (3 - 2 * a - b) * u * u + (a + b - 2) * u * u * u));

  it.each<[Smoothness, string, (q: number) => (u: number) => number]>([
    ["reciprocal", "1/v of a linear v", (q) => (u) => 1 / (1 + (q - 1) * u)],
    ["reciprocal", "1/v² of a linear v", (q) => (u) => 1 / (1 + (q - 1) * u) ** 2],
    ["reciprocal", "1/v of an exponential v", (q) => (u) => q ** -u],
    ["cubic", "1/v of a flat-ended cubic", (q) => cubic(q, 0, 0)],
    ["cubic", "1/v of a cubic steep at its start", (q) => cubic(q, 3, 0)],
    ["cubic", "1/v of a cubic steep at its end", (q) => cubic(q, 0, 3)],
    ["cubic", "1/v of a cubic steep at both", (q) => cubic(q, 2.1213, 2.1213)],
  ])("is enough (%s: %s)", (smoothness, _, family) => {
    const fine = gaussLegendre(200);
    for (const ratio of [1.0003, 1.0036, 1.012, 1.05, 1.12, 1.23, 1.4, 1.9, 2.6, 3.5, 5.5, 8.8, 12.9, 19.8]) {
      const points = gaussPoints(ratio, smoothness);
      if (points === 0) continue;
      const f = family(ratio);
      const apply = ({ nodes, weights }: ReturnType<typeof gaussLegendre>): Decimal => {
        let sum = new Decimal(0);
        for (let i = 0; i < nodes.length; i++) sum = sum.plus(new Decimal(weights[i]).times(f(nodes[i])));
        return sum;
      };
      const exact = apply(fine);
      // Both rules' own rounding is allowed for on top of the 2e-14 that the integral claims.
      expect(apply(gaussLegendre(points)).div(exact).minus(1).abs().toNumber()).toBeLessThan(2e-14);
    }
  });
});

describe("integrals over many pieces", () => {
  it("agree with the exact value, mild and wild pieces together", () => {
    const n = 1000;
    const piece = Array.from({ length: n }, (_, i) => i);
    const width = piece.map(() => 1 / n);
    const start = piece.map(() => 0);
    // Every fiftieth interval jumps by a factor of 100, linear in between.
    const from = piece.map((i) => (i % 50 === 0 ? 1 : 1 + 0.1 * Math.sin(i)));
    const to = piece.map((i) => (i % 50 === 0 ? 100 : 1 + 0.1 * Math.sin(i + 1)));
    const exact = piece.reduce((sum, i) => {
      const u = to[i] / from[i] - 1;
      return sum + (u === 0 ? 1 : Math.log1p(u) / u) / from[i] / n;
    }, 0);
    const f = (i: number, t: number): number => 1 / (from[i] + (to[i] - from[i]) * t * n);
    const spread = (i: number): number => Math.max(from[i] / to[i], to[i] / from[i]);
    const result = integratePieces(f, { piece, start, width }, { spread });
    expect(result.status).toBe("converged");
    expect(Math.abs(result.value - exact)).toBeLessThanOrEqual(result.error + 1e-14 * exact);
    const twin = integratePieces(f, { piece, start, width }, { spread, extraPoints: 2 });
    expect(Math.abs(twin.value / exact - 1)).toBeLessThan(1e-12);
  });
});
