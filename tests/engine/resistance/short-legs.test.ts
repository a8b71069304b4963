import { describe, expect, it } from "vitest";
import { computeResistance } from "@/lib/engine";

function squares(shape: string, dimensions: Record<string, number | string>) {
  const request = { shape, dimensions, medium: { sheetResistance: 1 } };
  return computeResistance(request, { material: () => undefined });
}

/**
 * Sheet patterns with short legs: the long-leg formula has lost its accuracy, so the answer must be a field solution.
 * The corner counts as published, and what the ends change is bounded as 3-engine states it (derived here).
 */
describe("short legs", () => {
  it.each([
    ["sheet-bend", { legLength1: 0.3, legLength2: 0.2, width1: 1, width2: 1 }],
    ["sheet-step", { length1: 0.2, width1: 1, length2: 0.3, width2: 2, alignment: "edge" }],
    [
      "sheet-tee",
      { barWidth: 1, stubWidth: 1, leftLength: 0.3, rightLength: 0.3, stubLength: 0.2, path: "both" },
    ],
    ["sheet-meander", { legs: 3, legLength: 2, width: 1, gap: 0.3 }],
  ] as const)("%s is answered by a proved field solution", (shape, dimensions) => {
    const { method, resistance, checks } = squares(shape, dimensions);
    expect(method).toBe("field");
    expect(resistance).toMatchObject({ boundsBasis: "energy", proved: true });
    expect((resistance.upper - resistance.lower) / resistance.value).toBeLessThan(2e-5);
    expect(checks?.every(({ passed = true }) => passed)).toBe(true);
  });

  it("keeps the formula where the legs are long", () => {
    const { method, resistance } = squares("sheet-bend", {
      legLength1: 3,
      legLength2: 2,
      width1: 1,
      width2: 1,
    });
    expect(method).toBe("closed-form");
    // 1 − (2/π)·ln 2 = 0.55873 for the corner: P. M. Hall, Thin Solid Films 1 (1968) 277, from memory.
    expect(resistance.value).toBeCloseTo(5.5587287996947, 10);
  });

  it("joins the formula's bracket at the change-over", () => {
    // The bounds of the formula hold the field solution's value on both sides of the change.
    for (const leg of [0.85, 0.9, 0.95, 1.0]) {
      const { resistance } = squares("sheet-bend", {
        legLength1: leg,
        legLength2: leg,
        width1: 1,
        width2: 1,
      });
      const formula = 2 * leg + 1 - (2 / Math.PI) * Math.log(2);
      expect(resistance.lower).toBeLessThanOrEqual(formula);
      // Conducting sheets across the ends can only lower it, by about 0.11·e^(−2π·leg) squares (3-engine).
      expect(resistance.upper).toBeGreaterThan(formula - 0.13 * Math.exp(-2 * Math.PI * leg));
    }
  });

  it("gives the same digits each time", () => {
    const ask = () =>
      squares("sheet-tee", {
        barWidth: 1,
        stubWidth: 0.5,
        leftLength: 0.1,
        rightLength: 0.2,
        stubLength: 0.1,
        path: "through",
      });
    expect(ask().resistance).toEqual(ask().resistance);
  });
});
