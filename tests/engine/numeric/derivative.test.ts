import { describe, expect, it } from "vitest";
import { derivative } from "@/lib/engine/numeric/derivative";

describe("a derivative by extrapolated differences", () => {
  it.each([
    ["exp", Math.exp, 1, 0.1, Math.E],
    ["1/x", (x: number) => 1 / x, 1e-6, 2e-8, -1e12],
    ["a cubic at 0", (x: number) => x * x * x - 5 * x, 0, 0.5, -5],
    ["a constant", () => 4, 3, 0.1, 0],
    ["a step far too large", (x: number) => Math.exp(-1e6 * (x - 1) ** 2), 1.001, 0.02, -2000 * Math.exp(-1)],
  ])("of %s", (_, f, x, step, expected) => {
    const { value } = derivative(f, x, step);
    expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-8 * Math.max(1, Math.abs(expected)));
  });

  it("is one-sided at the end of the domain", () => {
    const f = (x: number): number => (x < 1 ? Number.NaN : x * x);
    expect(derivative(f, 1, 0.1).value).toBeCloseTo(2, 8);
    expect(derivative((x) => (x > 1 ? Number.NaN : x * x), 1, 0.1).value).toBeCloseTo(2, 8);
    expect(derivative(() => Number.NaN, 1, 0.1).value).toBeNaN();
  });
});
