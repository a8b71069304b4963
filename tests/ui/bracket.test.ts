import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { bracketText } from "@/app/_ui/bracket";

describe("bracketText", () => {
  it("writes both bounds in the unit of the value", () => {
    expect(bracketText(0.0012345, 0.0012344, 0.0012346, "Ω")).toEqual({
      lower: "1.23440",
      upper: "1.23460",
      unit: "mΩ",
    });
  });

  it("rounds outwards", () => {
    const { lower, upper } = bracketText(1.5, 1.444449, 1.555551, "Ω");
    expect(lower).toBe("1.444");
    expect(upper).toBe("1.556");
  });

  it("tells rounding-sized bounds apart", () => {
    const value = 145832205112.4;
    const { lower, upper, unit } = bracketText(value, value * (1 - 2e-16), value * (1 + 3e-16), "Ω");
    expect(unit).toBe("GΩ");
    expect(lower).not.toBe(upper);
    expect(Number(lower)).toBeLessThan(Number(upper));
  });

  it("falls back to a power of ten beyond the prefixes", () => {
    expect(bracketText(3e-15, 2e-15, 4e-15, "Ω").unit).toBe("×10⁻¹⁵\u2009Ω");
  });

  it("gives a bare number no prefix", () => {
    expect(bracketText(0.2208, 0.2195, 0.2221, "")).toEqual({ lower: "0.2195", upper: "0.2221", unit: "" });
    expect(bracketText(12345, 12344, 12346, "")).toEqual({ lower: "12344.0", upper: "12346.0", unit: "" });
    expect(bracketText(3e-9, 2e-9, 4e-9, "").unit).toBe("×10⁻⁹");
  });

  it("never excludes the value", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-12, max: 1e20, noNaN: true }),
        fc.double({ min: 1e-15, max: 0.5, noNaN: true }),
        (value, half) => {
          const { lower, upper, unit } = bracketText(value, value * (1 - half), value * (1 + half), "Ω");
          const power = { p: -12, n: -9, µ: -6, m: -3, "": 0, k: 3, M: 6, G: 9, T: 12, P: 15, E: 18 }[
            unit.replace("Ω", "")
          ];
          expect(power).toBeDefined();
          expect(Number(`${lower}e${power}`)).toBeLessThanOrEqual(value);
          expect(Number(`${upper}e${power}`)).toBeGreaterThanOrEqual(value);
        },
      ),
      { seed: 20, numRuns: 500 },
    );
  });
});
