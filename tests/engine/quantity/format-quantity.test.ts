import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { formatQuantity } from "@/lib/engine";
import { siText, texNumber } from "@/lib/engine/quantity/format-quantity";

/** With plain spaces, as the expectations are typed. */
const text = (...args: Parameters<typeof formatQuantity>): string =>
  formatQuantity(...args).replace("\u2009", " ");

describe("a quantity for people", () => {
  it.each<[number, Parameters<typeof formatQuantity>[1], string]>([
    [0.0012345, "ohm", "1.2345 mΩ"],
    [145832199287, "ohm", "145.83 GΩ"],
    [6.857196e-12, "siemens", "6.8572 pS"],
    [50, "ohm", "50 Ω"],
    [1e18, "ohm", "1 EΩ"],
    [1e-12, "ohm", "1 pΩ"],
    [1e22, "ohm", "1×10²² Ω"],
    [3.4e-16, "ohm", "3.4×10⁻¹⁶ Ω"],
    [999.9999, "ohm", "1 kΩ"],
    [0, "ohm", "0 Ω"],
    [-2.5, "volt", "−2.5 V"],
    [75, "degC", "75 °C"],
    [90, "degree", "90°"],
    [2.32e9, "A/m^2", "2.32×10⁹ A/m²"],
    [1234, "A/m^2", "1234 A/m²"],
  ])("%d %s reads %s", (value, unit, expected) => {
    expect(text(value, unit)).toBe(expected);
  });

  it("puts a thin space before the unit", () => {
    expect(formatQuantity(1, "ohm")).toBe("1\u2009Ω");
  });

  it("ends with the second significant digit of the bounds' half-width (JCGM 100, 7.2.6)", () => {
    expect(text(1.3373183, "ohm", { lower: 1.2523, upper: 1.4223 })).toBe("1.337 Ω");
    expect(text(1.3373183, "ohm", { lower: 1.3373, upper: 1.3374 })).toBe("1.3373 Ω");
    expect(text(99.96, "ohm", { lower: 90, upper: 110 })).toBe("100 Ω");
    expect(text(1.5, "ohm", { lower: 1.49, upper: 1.51 })).toBe("1.500 Ω");
  });

  it("keeps the value within half a unit of its last digit", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-12, max: 9e17, noNaN: true }), (value) => {
        const shown = text(value, "ohm");
        const prefixes: Record<string, number> = {
          p: -12,
          n: -9,
          µ: -6,
          m: -3,
          k: 3,
          M: 6,
          G: 9,
          T: 12,
          P: 15,
          E: 18,
        };
        const [digits, unit] = shown.split(" ");
        const power = unit === "Ω" ? 0 : prefixes[unit[0]];
        expect(Math.abs(Number(digits) * 10 ** power - value)).toBeLessThanOrEqual(0.5001e-4 * value);
      }),
      { seed: 4, numRuns: 1000 },
    );
  });

  it("writes coordinates and TeX", () => {
    expect(siText(0.0031, "m").replace("\u2009", " ")).toBe("3.1 mm");
    expect(siText(Math.PI / 2, "rad")).toBe("90°");
    expect(texNumber(1.72e-8)).toBe("1.72\\cdot 10^{-8}");
    expect(texNumber(1e-8)).toBe("10^{-8}");
    expect(texNumber(-12.5)).toBe("-12.5");
    expect(texNumber(58e6)).toBe("5.8\\cdot 10^{7}");
  });
});
