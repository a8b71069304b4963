import { describe, expect, it } from "vitest";
import { agm } from "@/lib/engine/numeric/agm";

/** Recomputed with 40-digit arithmetic (mpmath). */
const values: readonly (readonly [number, number, number])[] = [
  [1, 1e-300, 0.0022694061941578213058],
  [1, 1e-8, 0.079305210334345310882],
  [3, 2, 2.4746804362363044626],
  [1e200, 1e-200, 1.7029073113994679143e197],
  [1, 0.999999999, 0.99999999950000001408],
];

describe("agm", () => {
  it.each(values)("agm(%d, %d)", (a, b, mean) => {
    expect(Math.abs(agm(a, b) / mean - 1)).toBeLessThan(2e-15);
    expect(agm(b, a)).toBe(agm(a, b));
  });

  it("is Gauss's constant's reciprocal for 1 and √2", () => {
    // 1/agm(1, √2) = 0.83462684167407318628… (Gauss 1799; from memory).
    expect(1 / agm(1, Math.SQRT2)).toBeCloseTo(0.8346268416740732, 15);
  });

  it("is 0 where one argument is 0", () => expect(agm(0, 3)).toBe(0));
});
