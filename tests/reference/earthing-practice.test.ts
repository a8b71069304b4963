/** Earth electrodes in published worked examples; the tolerance follows the digits that the source prints. */
import { describe, expect, it } from "vitest";
import { compute, deviation } from "../support/compute";

const ohms = (shape: string, dimensions: Record<string, number | string>, resistivity: string) =>
  compute({ shape, dimensions, medium: { resistivity } }).resistance;

describe("rods", () => {
  it("MIL-HDBK-419A vol. II 1.2.2.2 (seen): 3/4 in × 10 ft in 10,000 Ω·cm, 32 Ω by nomogram", () => {
    const { value } = ohms("earth-rod", { length: "10 ft", diameter: "0.75 in" }, "10000 ohm cm");
    expect(deviation(value, 32)).toBeLessThan(0.02);
    // The rod formula gives 32.14; the average potential keeps the terms in a/L besides.
    expect(value).toBeCloseTo(32.14, 1);
  });

  it("MIL-HDBK-1004/10 (seen): 2,000 Ω·cm, backfill column 7 ft × 10 in, 4.77 Ω read from a chart", () => {
    const { value, lower } = ohms("earth-rod", { length: "7 ft", diameter: "10 in" }, "2000 ohm cm");
    // The published formula gives 4.7855; so stout a column lies 0.9 % above it by the terms in a/L.
    expect(deviation(value, 4.77)).toBeLessThan(0.015);
    expect(lower).toBeLessThan(4.77);
  });

  it("BS 7430 method in an engineer's report (seen): 55 Ω·m, 3 m, 25 mm, 17.12 Ω", () => {
    const { value, lower, upper } = ohms("earth-rod", { length: "3 m", diameter: "25 mm" }, "55 ohm m");
    expect(deviation(value, 17.12)).toBeLessThan(6e-4);
    expect(lower).toBeLessThan(17.12);
    expect(upper).toBeGreaterThan(17.12);
  });
});

describe("earth-grid", () => {
  /** IEEE Std 80, annex B (from memory): A = 4900 m², ρ = 400 Ω·m, h = 0.5 m, by Sverak's formula. */
  it.each([
    [1540, 2.78],
    [1690, 2.75],
  ])("IEEE 80 annex B, %d m of conductor: %d Ω", (conductorLength, expected) => {
    const { value } = ohms("earth-grid", { area: 4900, conductorLength, depth: 0.5 }, "400 ohm m");
    expect(value).toBeCloseTo(expected, 2);
  });

  it("has bounds that hold the grid of annex B solved with many segments, 2.64 Ω (comparison in the project)", () => {
    const { lower, upper } = ohms(
      "earth-grid",
      { area: 4900, conductorLength: 1540, depth: 0.5 },
      "400 ohm m",
    );
    expect(lower).toBeLessThan(2.64);
    expect(upper).toBeGreaterThan(2.64);
  });
});

describe("what an answer says", () => {
  it.each([
    "earth-hemisphere",
    "earth-rod",
    "earth-rod-pair",
    "earth-rod-group",
    "earth-wire",
    "earth-ring",
    "earth-plate",
    "earth-star",
    "earth-grid",
  ])("%s carries the caution of safety and answers with a material that is a range", (shape) => {
    const dimensions: Record<string, Record<string, number | string>> = {
      "earth-hemisphere": { diameter: 1 },
      "earth-rod": { length: 2.4, diameter: "16 mm" },
      "earth-rod-pair": { length: 2.4, diameter: "16 mm", spacing: 5 },
      "earth-rod-group": { length: 2.4, radius: "8 mm", spacing: 5, count: 4, arrangement: "square" },
      "earth-wire": { length: 30, diameter: "9 mm", depth: 0.6 },
      "earth-ring": { ringDiameter: 12, wireDiameter: "9 mm", depth: 0.6 },
      "earth-plate": { diameter: 1, depth: 1 },
      "earth-star": { arms: 4, armLength: 10, wireDiameter: "9 mm", depth: 0.6 },
      "earth-grid": { area: "900 m^2", conductorLength: 360, depth: 0.5 },
    };
    const { cautions } = compute({ shape, dimensions: dimensions[shape], medium: { material: "soil-clay" } });
    expect(cautions.join(" ")).toMatch(/touch and step voltage/);
    expect(cautions.join(" ")).toMatch(/no proof of compliance/);
    expect(cautions.join(" ")).toMatch(/Clay/);
  });

  it.each([
    ["earth-rod", { length: 0.1, diameter: 0.02 }, /diameters long/],
    ["earth-rod-pair", { length: 2.4, diameter: 0.016, spacing: 1 }, /closer together than they are long/],
    ["earth-rod-pair", { length: 2.4, diameter: 0.016, spacing: 0.03 }, /diameters apart/],
    ["earth-wire", { length: 10, diameter: 0.01, depth: 4 }, /depth is more than half/],
    ["earth-wire", { length: 10, diameter: 0.01, depth: 0.012 }, /wire diameters/],
    ["earth-ring", { ringDiameter: 1, wireDiameter: 0.2, depth: 0.5 }, /thicker than a tenth/],
    ["earth-star", { arms: 3, armLength: 2, wireDiameter: 0.01, depth: 1.5 }, /length of an arm/],
    ["earth-grid", { area: 900, conductorLength: 90, depth: 0.5 }, /cannot enclose/],
    ["earth-grid", { area: 900, conductorLength: 360, depth: 5 }, /0\.25 m to 2\.5 m/],
  ] as const)("%s warns where its formula leaves its range: %o", (shape, dimensions, words) => {
    const { cautions } = compute({ shape, dimensions, medium: { resistivity: 100 } });
    expect(cautions.join(" ")).toMatch(words);
  });

  it("the layered rod takes two media by name", () => {
    const { resistance, cautions } = compute({
      shape: "earth-rod-layered",
      dimensions: { length: 3, diameter: "16 mm", upperDepth: 1 },
      media: { upper: { resistivity: 100 }, lower: { resistivity: "300 ohm m" } },
    });
    expect(deviation(resistance.value, 64.8540720548)).toBeLessThan(1e-11);
    expect(resistance.boundsBasis).toBe("formula-accuracy");
    expect(cautions.join(" ")).toMatch(/touch and step voltage/);
  });
});
