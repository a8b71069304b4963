import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { erf, erfc } from "@/lib/engine/numeric/error-function";
import { integrate } from "@/lib/engine/numeric/gauss-kronrod";

describe("erf and erfc", () => {
  // Computed with 40-digit arithmetic (mpmath).
  it.each([
    [0.1, 0.11246291601828489, 0.8875370839817151],
    [0.5, 0.5204998778130465, 0.4795001221869535],
    [1, 0.8427007929497149, 0.15729920705028513],
    [2, 0.9953222650189527, 0.004677734981047266],
    [3, 0.9999779095030014, 2.209049699858544e-5],
    [5, 0.9999999999984626, 1.5374597944280349e-12],
    [10, 1, 2.088487583762545e-45],
    [26, 1, 5.663192408856143e-296],
  ])("at %d", (x, error, complement) => {
    expect(Math.abs(erf(x) / error - 1)).toBeLessThan(5e-16);
    expect(Math.abs(erfc(x) / complement - 1)).toBeLessThan(5e-16);
    expect(erf(-x)).toBe(-erf(x));
    expect(erfc(-x)).toBeCloseTo(2 - complement, 15);
  });

  it("add up to 1 and agree with the integral", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 5, noNaN: true }), (x) => {
        expect(erf(x) + erfc(x)).toBeCloseTo(1, 15);
        const direct = integrate((t) => Math.exp(-t * t), 0, x).value * (2 / Math.sqrt(Math.PI));
        expect(Math.abs(erf(x) / direct - 1)).toBeLessThan(1e-13);
      }),
      { seed: 7 },
    );
  });

  it("hold at the ends", () => {
    expect(erf(0)).toBe(0);
    expect(erfc(0)).toBe(1);
    expect(erfc(40)).toBe(0);
    expect(erfc(-40)).toBe(2);
    expect(erf(NaN)).toBeNaN();
    expect(erfc(NaN)).toBeNaN();
  });
});
