/** The models of materials and what the schema of a material refuses; the library's data have tests of their own. */
import { describe, expect, it } from "vitest";
import {
  coversTemperature,
  libraryMaterials,
  materialSchema,
  resistivityAt,
  type Material,
} from "@/lib/engine";
import { compensatedConductivity, masettiMobility, siliconConductivity } from "@/lib/engine/medium/dopant";
import { tableInterpolator } from "@/lib/engine/medium/interpolation";

function material(resistivity: Material["resistivity"]): Material {
  return {
    id: "sample",
    version: 1,
    name: "Sample",
    kind: "other",
    resistivity,
    range: { from: 0, to: 100 },
    uncertainty: { lower: 1, upper: 1, note: "a test" },
    source: "a test",
    provenance: "measured",
    owner: "library",
  };
}

describe("models", () => {
  it("linear, polynomial, table and constant", () => {
    expect(
      resistivityAt(material({ model: "linear", resistivity: 2, coefficient: 0.01, reference: 20 }), 70),
    ).toBe(3);
    const polynomial = { model: "polynomial" as const, reference: 10, coefficients: [1, 2, 3] };
    expect(resistivityAt(material({ ...polynomial, quantity: "resistivity" }), 12)).toBe(17);
    expect(resistivityAt(material({ ...polynomial, quantity: "conductivity" }), 12)).toBe(1 / 17);
    const at = (interpolation: "linear" | "log" | "monotone-cubic", t: number): number => {
      const knots = { temperatures: [0, 50, 100], values: [1, 2, 4] };
      return resistivityAt(material({ model: "table", quantity: "resistivity", ...knots, interpolation }), t);
    };
    expect(at("linear", 75)).toBe(3);
    expect(at("log", 75)).toBeCloseTo(Math.sqrt(8), 14);
    for (const t of [0, 50, 100]) expect(at("monotone-cubic", t)).toBeCloseTo(at("linear", t), 14);
    expect(resistivityAt(material({ model: "constant", resistivity: 7 }), -200)).toBe(7);
  });

  it("know their range to within rounding", () => {
    const sample = material({ model: "constant", resistivity: 1 });
    expect(coversTemperature(sample, 0)).toBe(true);
    expect(coversTemperature(sample, 100 + 1e-9)).toBe(true);
    expect(coversTemperature(sample, 100.1)).toBe(false);
  });

  it("give a positive resistivity over the whole range of every library material", () => {
    for (const entry of libraryMaterials) {
      expect(materialSchema.parse(entry)).toEqual(entry);
      for (let i = 0; i <= 20; i++) {
        const t = entry.range.from + ((entry.range.to - entry.range.from) * i) / 20;
        const resistivity = resistivityAt(entry, t);
        expect(resistivity > 0 && Number.isFinite(resistivity), `${entry.id} at ${t}`).toBe(true);
      }
    }
    expect(new Set(libraryMaterials.map(({ id }) => id)).size).toBe(libraryMaterials.length);
  });

  it("refuse what is none", () => {
    const good = material({ model: "constant", resistivity: 1 });
    for (const bad of [
      { ...good, id: "Has Spaces" },
      { ...good, version: 0 },
      { ...good, range: { from: 10, to: 0 } },
      { ...good, resistivity: { model: "constant", resistivity: -1 } },
      {
        ...good,
        resistivity: {
          model: "table",
          quantity: "resistivity",
          temperatures: [1, 0],
          values: [1, 1],
          interpolation: "linear",
        },
      },
      {
        ...good,
        resistivity: {
          model: "table",
          quantity: "resistivity",
          temperatures: [0, 1],
          values: [1],
          interpolation: "linear",
        },
      },
      { ...good, colour: "red" },
      { ...good, uncertainty: { lower: 1.1, upper: 1.2, note: "" } },
    ]) {
      expect(materialSchema.safeParse(bad).success).toBe(false);
    }
  });
});

describe("monotone cubic interpolation (Fritsch and Carlson)", () => {
  it("never overshoots and keeps the order of its data", () => {
    const x = [0, 1, 2, 3, 4, 6, 7];
    const y = [0, 0, 0.1, 5, 5.01, 9, 9];
    const f = tableInterpolator(x, y, "monotone-cubic");
    let before = f(0);
    for (let i = 1; i <= 700; i++) {
      const now = f(i / 100);
      expect(now).toBeGreaterThanOrEqual(before - 1e-12);
      before = now;
    }
    x.forEach((position, i) => expect(f(position)).toBeCloseTo(y[i], 12));
  });

  it("reproduces a straight line", () => {
    const f = tableInterpolator([0, 1, 4], [1, 3, 9], "monotone-cubic");
    for (const x of [0.3, 1, 2.5, 3.9]) expect(f(x)).toBeCloseTo(1 + 2 * x, 13);
  });
});

describe("silicon by dopant density", () => {
  it("has no carriers without dopant, and conducts more with more of it", () => {
    for (const type of ["n", "p"] as const) {
      expect(siliconConductivity(type, 0)).toBe(0);
      let before = 0;
      for (let exponent = 8; exponent <= 21; exponent += 0.25) {
        const now = siliconConductivity(type, 10 ** exponent);
        expect(now).toBeGreaterThan(before);
        before = now;
      }
    }
  });

  it("Masetti 1983: limits of the mobility at light doping (cm²/Vs)", () => {
    expect(masettiMobility("phosphorus", 1e9)).toBeCloseTo(1414, 1);
    expect(masettiMobility("arsenic", 1e9)).toBeCloseTo(1417, 1);
    expect(masettiMobility("boron", 1e9)).toBeCloseTo(470.5, 1);
    expect(compensatedConductivity("boron", 1e15, 2e15)).toBe(0);
    expect(compensatedConductivity("boron", 1e15, 1e15)).toBe(0);
  });

  it("Masetti and the ASTM fits agree to a few per cent at light doping", () => {
    for (const density of [1e14, 1e15, 1e16]) {
      expect(compensatedConductivity("boron", density, 0) / siliconConductivity("p", density)).toBeCloseTo(
        1,
        1,
      );
      expect(
        compensatedConductivity("phosphorus", density, 0) / siliconConductivity("n", density),
      ).toBeCloseTo(1, 1);
    }
  });
});
