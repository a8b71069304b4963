import { describe, expect, it } from "vitest";
import fc from "fast-check";
import Decimal from "decimal.js";
import { InputError, parseQuantity, readQuantity, type QuantityKindName } from "@/lib/engine";

const detail = (input: unknown, kind: QuantityKindName, options = {}): string => {
  const reading = readQuantity(input, kind, options);
  if (reading.ok) throw new Error(`read as ${reading.value}`);
  return reading.detail;
};

describe("a quantity", () => {
  // Exact by the definitions of the units, so compared with ===.
  it.each<[string, QuantityKindName, number]>([
    ["0.25 mm", "length", 0.00025],
    ["0.25mm", "length", 0.00025],
    ["35 um", "length", 35e-6],
    ["35 µm", "length", 35e-6],
    ["35 μm", "length", 35e-6],
    ["10 mil", "length", 0.000254],
    ["0.1 in", "length", 0.00254],
    ["3 ft", "length", 0.9144],
    ["1.7 km", "length", 1700],
    ["2 qm", "length", 2e-30],
    ["2 Qm", "length", 2e30],
    ["1.5e2 nm", "length", 150e-9],
    [".5 m", "length", 0.5],
    ["5. m", "length", 5],
    ["  7 cm ", "length", 0.07],
    ["1 mm^2", "area", 1e-6],
    ["1 mm²", "area", 1e-6],
    ["1 mm2", "area", 1e-6],
    ["2 in^2", "area", 0.00129032],
    ["360 deg", "angle", 2 * Math.PI],
    ["90°", "angle", Math.PI / 2],
    ["1e-9 rad", "angle", 1e-9],
    ["5 mrad", "angle", 0.005],
    ["120 degC", "temperature", 120],
    ["120 °C", "temperature", 120],
    ["348.15 K", "temperature", 75],
    ["212 degF", "temperature", 100],
    ["-40 °F", "temperature", -40],
    ["5 K", "temperatureDifference", 5],
    ["9 degF", "temperatureDifference", 5],
    ["0.00393 1/K", "temperatureCoefficient", 0.00393],
    ["0.00393/K", "temperatureCoefficient", 0.00393],
    ["0.00393 K^-1", "temperatureCoefficient", 0.00393],
    ["0.393 %/K", "temperatureCoefficient", 0.00393],
    ["50 ppm/degC", "temperatureCoefficient", 50e-6],
    ["1.72e-8 ohm m", "resistivity", 1.72e-8],
    ["1.72×10⁻⁸ Ω·m", "resistivity", 1.72e-8],
    ["1.72*10^-8 ohm*m", "resistivity", 1.72e-8],
    ["0.0172 ohm mm^2/m", "resistivity", 1.72e-8],
    ["1.72 µΩ cm", "resistivity", 1.72e-8],
    ["1.72 uohm-cm", "resistivity", 1.72e-8],
    ["2000 ohm cm", "resistivity", 20],
    ["58 MS/m", "conductivity", 58e6],
    ["5 S/cm", "conductivity", 500],
    ["5 S cm^-1", "conductivity", 500],
    ["100 %IACS", "conductivity", 58e6],
    ["61% IACS", "conductivity", 35380000],
    ["5 1/(ohm m)", "conductivity", 5],
    ["50 ohm/sq", "sheetResistance", 50],
    ["50 Ω/□", "sheetResistance", 50],
    ["0.5 mohm/sq", "sheetResistance", 0.0005],
    ["5 mohm", "resistance", 0.005],
    ["2.2 kΩ", "resistance", 2200],
    ["12 mV", "voltage", 0.012],
    ["630 A", "current", 630],
    ["1.5 kW", "power", 1500],
    ["1e18 1/cm^3", "density", 1e18],
    ["1e24 1/m^3", "density", 1e18],
    ["1e18 cm^-3", "density", 1e18],
    ["1.02", "number", 1.02],
    ["0 m", "length", 0],
  ])("reads %s as %s", (text, kind, value) => {
    expect(parseQuantity(text, kind)).toBe(value);
  });

  it("takes bare numbers in SI, but temperatures in °C and angles in degrees", () => {
    expect(parseQuantity(0.00025, "length")).toBe(0.00025);
    expect(parseQuantity(75, "temperature")).toBe(75);
    expect(parseQuantity(360, "angle")).toBe(2 * Math.PI);
    expect(parseQuantity("360", "angle")).toBe(2 * Math.PI);
  });

  it("knows wire gauges by ASTM B258 (formula from memory) where a diameter is wanted", () => {
    const awg = (text: string): number => parseQuantity(text, "length", { gauge: "wire" });
    expect(awg("AWG 36")).toBeCloseTo(0.000127, 12); // 5 mil by definition
    expect(awg("AWG 4/0")).toBeCloseTo(0.011684, 12); // 460 mil by definition
    expect(awg("10 AWG")).toBeCloseTo(0.0025882, 6); // 101.9 mil in the tables
    expect(detail("AWG 24", "length")).toContain("diameter of a wire");
    expect(detail("AWG 99", "length", { gauge: "wire" })).toContain("beyond");
  });

  it("knows foil weights (IPC-6012 nominal: 34.3 µm an ounce) where a thickness is wanted", () => {
    expect(parseQuantity("1 oz/ft^2", "length", { gauge: "foil" })).toBe(34.3e-6);
    expect(parseQuantity("0.5 oz/ft²", "length", { gauge: "foil" })).toBe(17.15e-6);
    expect(detail("1 oz/ft^2", "length")).toContain("foil");
  });

  it.each<[unknown, QuantityKindName, RegExp]>([
    ["5 kg", "length", /"kg" measures a mass/],
    ["5 S/m", "resistivity", /must be a resistivity/],
    ["5 ohm/sq", "resistance", /must be a resistance/],
    ["5 mmm", "length", /not known \(did you mean .*"mm"/],
    ["5 MM", "length", /did you mean "mm"/],
    ["1,000 m", "length", /thousands separator/],
    ["1,5 mm", "length", /decimal comma/],
    ["1 000 m", "length", /thousands separator/],
    ["1'000 m", "length", /thousands separator/],
    ["", "length", /empty/],
    ["   ", "length", /empty/],
    ["mm", "length", /no number/],
    ["abc", "length", /no number/],
    ["NaN", "length", /finite/],
    ["Infinity m", "length", /finite/],
    ["-inf", "length", /finite/],
    ["1e400 m", "length", /too large/],
    ["1e308 km", "length", /too large/],
    ["1e-400 m", "length", /too small/],
    ["1.5.2 mm", "length", /number/],
    ["5 m/", "length", /incomplete/],
    ["5 (m", "length", /incomplete/],
    ["5 m^99", "length", /power/],
    ["5 m/s", "length", /m s\^-1/],
    ["-300 degC", "temperature", /absolute zero/],
    ["5 degC m", "temperature", /must be a temperature/],
    [`${"9".repeat(200)} m`, "length", /longer/],
    [NaN, "length", /not a number/],
    [Infinity, "length", /infinite/],
    [null, "length", /null/],
    [[1], "length", /array/],
    [true, "length", /boolean/],
    [{ value: "10 mm", tolerance: "0.1 mm" }, "length", /tolerance/],
  ])("refuses %s", (input, kind, pattern) => {
    expect(detail(input, kind)).toMatch(pattern);
  });

  it("reads 1e400 of a JSON body as infinite and says so", () => {
    expect(detail(JSON.parse("1e400"), "length")).toContain("infinite");
  });

  it("throws an InputError with the pointer", () => {
    try {
      parseQuantity("5 kg", "length", { pointer: "#/dimensions/width" });
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(InputError);
      expect((error as InputError).errors[0].pointer).toBe("#/dimensions/width");
    }
  });

  it("converts without a second rounding", () => {
    const ratios: readonly (readonly [string, string])[] = [
      ["mm", "1e-3"],
      ["mil", "2.54e-5"],
      ["in", "0.0254"],
      ["ft", "0.3048"],
      ["um", "1e-6"],
      ["km", "1e3"],
    ];
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 999_999_999 }),
        fc.integer({ min: -20, max: 20 }),
        fc.constantFrom(...ratios),
        (digits, exponent, [unit, ratio]) => {
          const exact = new Decimal(`${digits}e${exponent}`).times(ratio);
          expect(parseQuantity(`${digits}e${exponent} ${unit}`, "length")).toBe(exact.toNumber());
        },
      ),
      { seed: 1, numRuns: 500 },
    );
  });

  it("converts temperatures exactly to the nearest double", () => {
    Decimal.set({ precision: 60 });
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1_000_000 }), (n) => {
        const text = `${n}e-3`;
        const kelvin = new Decimal(text).minus("273.15");
        expect(parseQuantity(`${text} K`, "temperature")).toBe(kelvin.toNumber());
        const fahrenheit = new Decimal(text).minus(32).times(5).div(9);
        expect(parseQuantity(`${text} degF`, "temperature")).toBe(fahrenheit.toNumber());
      }),
      { seed: 2, numRuns: 300 },
    );
  });

  it("never throws and never gives a number that is not finite, whatever the text", () => {
    fc.assert(
      fc.property(
        fc.string({ maxLength: 60, unit: fc.constantFrom(..."0123456789.eE+-/^()µΩ°% ohmSVAKrdgcinft²⁻⁸") }),
        fc.constantFrom<QuantityKindName>("length", "angle", "temperature", "resistivity", "conductivity"),
        (text, kind) => {
          const reading = readQuantity(text, kind);
          if (reading.ok) expect(Number.isFinite(reading.value)).toBe(true);
          else expect(reading.detail.length).toBeGreaterThan(5);
        },
      ),
      { seed: 3, numRuns: 3000 },
    );
  });

  it("does not grow without bound over many unknown units", () => {
    for (let i = 0; i < 5000; i++) expect(readQuantity(`1 unit${i}`, "length").ok).toBe(false);
  });
});

describe("wire gauges and far exponents", () => {
  // ASTM B258: 1/0 is 0.3249 in, 2/0 0.3648 in, 4/0 0.46 in.
  it.each([
    ["AWG 0", 0.3249],
    ["AWG 1/0", 0.3249],
    ["AWG 00", 0.3648],
    ["2/0 AWG", 0.3648],
    ["AWG 0000", 0.46],
    ["AWG 4/0", 0.46],
    ["#10 AWG", 0.1019],
  ])("reads %s", (text, inches) => {
    const reading = readQuantity(text, "length", { gauge: "wire" });
    expect(reading.ok && reading.value / 0.0254).toBeCloseTo(inches, 4);
  });

  it.each(["AWG 5/0", "AWG -1", "AWG 1.5", "AWG"])("says that %s is no gauge", (text) => {
    expect(detail(text, "length", { gauge: "wire" })).toContain("is no wire gauge");
  });

  it("tells too small from too large whatever the exponent", () => {
    expect(detail("1e-999999999999999999999 m", "length")).toContain("too small");
    expect(detail("1e999999999999999999999 m", "length")).toContain("too large");
    expect(readQuantity("0e999999999999999999999 V", "voltage")).toEqual({ ok: true, value: 0 });
    expect(detail("1e-999999999999999999999 degF/ppm", "length")).toContain("must be a length");
  });

  it("blames the unit, not the number, for a quotation mark", () => {
    expect(detail("1 '", "length")).toContain("unit");
  });
});
