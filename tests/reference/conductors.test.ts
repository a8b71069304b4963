/** Tables and standards of conductors (6-checks): each value with its source and whether it was seen or recalled. */
import { describe, expect, it } from "vitest";
import { compute, deviation } from "../support/compute";

const ohms = (request: Record<string, unknown>): number => compute(request).resistance.value;

describe("IEC 60028 (1/58 Ω·mm²/m, 0.00393 1/K at 20 °C)", () => {
  it("a square millimetre of annealed copper, one metre long", () => {
    const wire = {
      shape: "prism",
      dimensions: { length: "1 m", area: "1 mm^2" },
      medium: { material: "copper-annealed" },
    };
    expect(deviation(ohms(wire), 1 / 58)).toBeLessThan(1e-15);
    expect(deviation(ohms({ ...wire, medium: { conductivity: "100 %IACS" } }), 1 / 58)).toBeLessThan(1e-15);
  });
});

describe("IEC 60228, maxima at 20 °C in Ω/km (seen): the nominal section must stay under them", () => {
  it.each([
    ["1.5 mm^2", 12.1],
    ["2.5 mm^2", 7.41],
    ["4 mm^2", 4.61],
    ["6 mm^2", 3.08],
    ["10 mm^2", 1.83],
    ["16 mm^2", 1.15],
    ["25 mm^2", 0.727],
    ["50 mm^2", 0.387],
    ["120 mm^2", 0.153],
  ])("%s under %d", (area, most) => {
    const value = ohms({
      shape: "prism",
      dimensions: { length: "1 km", area },
      medium: { material: "copper-annealed" },
    });
    expect(value).toBeLessThan(most);
    expect(value).toBeGreaterThan(0.88 * most);
  });
});

describe("ASTM B258 wire gauges (memory): annealed copper per 1000 ft at 20 °C", () => {
  it.each([
    ["AWG 10", 0.9989],
    ["AWG 36", 414.8],
  ])("%s %d Ω", (diameter, printed) => {
    const dimensions = { length: "1000 ft", diameter };
    const value = ohms({ shape: "round-wire", dimensions, medium: { material: "copper-annealed" } });
    // Two units of the last digit: the tables rest on diameters rounded to a tenth of a mil.
    expect(Math.abs(value / printed - 1)).toBeLessThan(2e-4);
  });
});

describe("CRC Handbook wire tables (seen), diameter 8.252 mm", () => {
  it.each([
    ["copper", "1.678e-8 ohm m", 0.000314],
    ["constantan", "45.38e-8 ohm m", 0.00848],
    ["nichrome", "107.5e-8 ohm m", 0.0201],
  ])("%s: %s gives %d Ω/m", (_, resistivity, printed) => {
    const value = ohms({
      shape: "round-wire",
      dimensions: { length: 1, diameter: "8.252 mm" },
      medium: { resistivity },
    });
    // Three digits are printed.
    expect(Math.abs(value / printed - 1)).toBeLessThan(2e-3);
  });
});

describe("common practice, no source", () => {
  it("one-ounce copper foil has about half a milliohm a square", () => {
    const square = { length: "10 mm", width: "10 mm", thickness: "1 oz/ft^2" };
    expect(ohms({ shape: "bar", dimensions: square, medium: { material: "copper-annealed" } })).toBeCloseTo(
      0.0005,
      5,
    );
  });

  it("between parallel plates R = d/(σS)", () => {
    const plates = {
      shape: "parallel-plates",
      dimensions: { gap: "2 mm", area: "3 cm^2" },
      medium: { conductivity: 0.5 },
    };
    expect(deviation(ohms(plates), 0.002 / (0.5 * 3e-4))).toBeLessThan(1e-15);
  });

  it("the assumed drive cancels from every resistance", () => {
    const bar = {
      shape: "bar",
      dimensions: { length: 1, width: 0.1, thickness: 0.01 },
      medium: { material: "copper-annealed" },
    };
    const { value } = compute(bar).resistance;
    for (const operating of [{ voltage: 1e-9 }, { voltage: 1e9 }, { current: 1e5 }, { power: 1 }]) {
      expect(ohms({ ...bar, operating })).toBe(value);
    }
  });
});
