import { describe, expect, it } from "vitest";
import { acosh1p, sinhOfAcosh1p } from "@/lib/engine/numeric/acosh1p";

/** Recomputed with 40-digit arithmetic (mpmath). */
const values: readonly (readonly [number, number])[] = [
  [1e-30, 1.4142135623730951077e-15],
  [1e-12, 1.4142135623729771834e-6],
  [1e-3, 0.044717633608309310037],
  [1, 1.3169578969248167086],
  [50, 4.6248766825455052405],
  [1e17, 39.837093761458721948],
  [1e305, 702.98160054374387887],
];

describe("acosh1p", () => {
  it.each(values)("acosh(1 + %d)", (x, value) => {
    expect(Math.abs(acosh1p(x) / value - 1)).toBeLessThan(1e-15);
  });

  it("agrees with sinh of itself", () => {
    for (const x of [1e-12, 1e-3, 1, 30]) {
      expect(Math.abs(Math.sinh(acosh1p(x)) / sinhOfAcosh1p(x) - 1)).toBeLessThan(1e-14);
    }
  });
});
