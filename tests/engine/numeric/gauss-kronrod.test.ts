import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { integrate, integrateSegments } from "@/lib/engine/numeric/gauss-kronrod";

describe("adaptive Gauss–Kronrod quadrature", () => {
  it.each<[string, (x: number) => number, number, number, number]>([
    ["exp", Math.exp, 0, 1, Math.E - 1],
    ["1/x over six decades", (x) => 1 / x, 1, 1e6, Math.log(1e6)],
    ["a kink", (x) => Math.abs(x - 1 / 3), 0, 1, 5 / 18],
    ["a jump", (x) => (x < 1 / 3 ? 1 : 1e-6), 0, 1, 1 / 3 + (2 / 3) * 1e-6],
    ["a square root", Math.sqrt, 0, 1, 2 / 3],
    ["a logarithm at 0", (x) => -Math.log(x), 0, 1, 1],
    ["a narrow bell", (x) => Math.exp(-((x - 0.3) ** 2) * 1e4), 0, 1, Math.sqrt(Math.PI) / 100],
    ["a hundred waves", (x) => 2 + Math.sin(2 * Math.PI * 100 * x), 0, 1, 2],
  ])("holds its promise for %s", (_, f, a, b, exact) => {
    const { value, error, status } = integrate(f, a, b);
    expect(status).toBe("converged");
    expect(error).toBeLessThanOrEqual(1e-12 * Math.abs(value));
    expect(Math.abs(value - exact)).toBeLessThanOrEqual(Math.max(error, 1e-15 * exact));
  });

  it("is exact for polynomials up to degree 31, which both rules see alike", () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 1, maxLength: 20 }),
        (c) => {
          const f = (x: number): number => c.reduceRight((sum, k) => sum * x + k, 0);
          const exact = c.reduce((sum, k, i) => sum + k / (i + 1), 0);
          const { value, evaluations } = integrate(f, 0, 1, { absolute: 1e-12 });
          expect(evaluations).toBe(21);
          expect(Math.abs(value - exact)).toBeLessThan(1e-14);
        },
      ),
      { seed: 5 },
    );
  });

  it("says so when it runs into its cap", () => {
    const result = integrate((x) => 2 + Math.sin(1e7 * x), 0, 1, { evaluations: 2000 });
    expect(result.status).toBe("limit");
    expect(result.evaluations).toBeLessThanOrEqual(2021);
    expect(result.error).toBeGreaterThan(1e-12);
  });

  it("says so when the integrand overflows", () => {
    expect(integrate((x) => 1 / (x - x), 0, 1).status).toBe("limit");
    expect(integrate(() => 1e308, 0, 10).status).toBe("limit");
  });

  it("takes breaks: a jump on a break costs nothing", () => {
    const f = (x: number): number => (x < 0.25 ? 1 : 3);
    const { value, evaluations } = integrate(f, 0, 1, { breaks: [0.25, 0.25, -1, 2] });
    expect(value).toBeCloseTo(2.5, 14);
    expect(evaluations).toBe(42);
  });

  it("is the same at any scale", () => {
    for (const scale of [1e-9, 1, 1e9]) {
      const { value } = integrate((x) => Math.exp(x / scale) / scale, 0, scale);
      expect(Math.abs(value / (Math.E - 1) - 1)).toBeLessThan(1e-14);
    }
  });

  it("keeps the digits of a thin piece far from the origin", () => {
    const { value } = integrateSegments((piece) => (piece === 0 ? 1 : 1e9), {
      piece: [0, 1],
      start: [0, 0],
      width: [1, 1e-9],
    });
    expect(value).toBeCloseTo(2, 14);
  });

  it("may be nested", () => {
    const inner = (x: number): number => integrate((y) => Math.exp(x * y), 0, 1).value;
    // ∫∫exp(xy) over the unit square = Ei(1) − γ (40-digit arithmetic).
    expect(integrate(inner, 0, 1).value).toBeCloseTo(1.3179021514544038949, 14);
  });

  it("passes on what the integrand throws", () => {
    expect(() =>
      integrate(
        () => {
          throw new RangeError("no value");
        },
        0,
        1,
      ),
    ).toThrow(RangeError);
  });

  it("never claims convergence on a wrong value: random steps whose borders are given", () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.tuple(
            fc.double({ min: 0.01, max: 1, noNaN: true }),
            fc.double({ min: 1e-3, max: 1e3, noNaN: true }),
          ),
          { minLength: 1, maxLength: 6 },
        ),
        (steps) => {
          const borders: number[] = [0];
          for (const [width] of steps) borders.push(borders[borders.length - 1] + width);
          const exact = steps.reduce((sum, [, value], i) => sum + (borders[i + 1] - borders[i]) * value, 0);
          const f = (x: number): number => steps[borders.findIndex((b) => b > x) - 1]?.[1] ?? 0;
          const { value, error, status } = integrate(f, 0, borders[borders.length - 1], { breaks: borders });
          expect(status).toBe("converged");
          expect(Math.abs(value - exact)).toBeLessThanOrEqual(error + 1e-14 * exact);
        },
      ),
      { seed: 6, numRuns: 60 },
    );
  });

  it("never claims convergence on a wrong value: random kinks that nobody mentions", () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.01, max: 10, noNaN: true }), { minLength: 2, maxLength: 8 }),
        (knots) => {
          const n = knots.length - 1;
          const f = (x: number): number => {
            const i = Math.min(n - 1, Math.floor(x * n));
            return knots[i] + (knots[i + 1] - knots[i]) * (x * n - i);
          };
          const exact = knots.slice(1).reduce((sum, v, i) => sum + (v + knots[i]) / 2 / n, 0);
          const { value, status } = integrate(f, 0, 1);
          expect(status).toBe("converged");
          expect(Math.abs(value - exact)).toBeLessThanOrEqual(2e-12 * exact);
        },
      ),
      { seed: 8, numRuns: 60 },
    );
  });
});
