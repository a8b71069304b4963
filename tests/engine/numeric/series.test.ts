import { describe, expect, it } from "vitest";
import { alternatingSum } from "@/lib/engine/numeric/alternating-sum";
import { sumChebyshev } from "@/lib/engine/numeric/chebyshev";
import { binomialSeries, exponentialSeries, multiplySeries } from "@/lib/engine/numeric/power-series";

describe("alternatingSum", () => {
  it("sums slowly convergent alternating series to rounding", () => {
    expect(alternatingSum((k) => 1 / (k + 1))).toBeCloseTo(Math.LN2, 15);
    expect(alternatingSum((k) => 1 / (2 * k + 1))).toBeCloseTo(Math.PI / 4, 15);
  });
});

describe("sumChebyshev", () => {
  it("sums T₀, T₁ and T₂ on an interval", () => {
    const series = { from: 1, to: 3, coefficients: [0.5, -2, 3] };
    for (const x of [1, 1.4, 2, 3]) {
      const t = x - 2;
      expect(sumChebyshev(series, x)).toBeCloseTo(0.5 - 2 * t + 3 * (2 * t * t - 1), 14);
    }
  });
});

describe("power series", () => {
  it("multiplies (1+u)^½ by itself to 1+u", () => {
    const root = binomialSeries(1, 0.5, 8);
    multiplySeries(root, root).forEach((c, k) => expect(c).toBeCloseTo(k < 2 ? 1 : 0, 14));
  });

  it("exponentiates ln(1+u) to 1+u", () => {
    const logarithm = Array.from({ length: 9 }, (_, k) => (k === 0 ? 0 : -((-1) ** k) / k));
    exponentialSeries(logarithm).forEach((c, k) => expect(c).toBeCloseTo(k < 2 ? 1 : 0, 14));
  });
});
