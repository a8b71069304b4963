import { describe, expect, it } from "vitest";
import { besselJ0 } from "@/lib/engine/numeric/bessel-j0";

describe("besselJ0", () => {
  /** Recomputed with 25-digit arithmetic (mpmath). */
  it.each([
    [0, 1.0],
    [1e-8, 0.999999999999999975],
    [0.5, 0.93846980724081290423],
    [2.404825557695773, -1.201195007280456811e-16],
    [10, -0.2459357644513483352],
    [24.999, 0.096141382406168679647],
    [25.001, 0.096392082864963108912],
    [40, 0.0073668905842372895535],
    [1000, 0.024786686152420174561],
  ])("of %d", (x, value) => {
    expect(Math.abs(besselJ0(x) - value)).toBeLessThan(2e-15 * Math.max(1, x / 10));
  });

  it("does not jump where the method changes", () => {
    expect(Math.abs(besselJ0(25) - besselJ0(25 + 4e-15))).toBeLessThan(1e-14);
  });
});
