/** Strands, foils, holes and the library's materials against printed tables of the trade. */
import { describe, expect, it } from "vitest";
import { compute, deviation } from "../support/compute";

const ohms = (
  shape: string,
  dimensions: Record<string, number | string>,
  material = "copper-annealed",
  temperature = "20 degC",
) => compute({ shape, dimensions, medium: { material }, operating: { temperature } }).resistance.value;

describe("CRC Handbook wire tables (seen), diameter 8.252 mm, Ω/m", () => {
  it.each([
    ["copper-pure", 0.000314],
    ["constantan", 0.00848],
    ["nichrome", 0.0201],
  ])("%s", (material, expected) => {
    expect(
      deviation(ohms("round-wire", { length: 1, diameter: "8.252 mm" }, material), expected),
    ).toBeLessThan(2e-3);
  });
});

describe("IEC 60228 maxima at 20 °C in Ω/km (seen): limits that the nominal section stays under", () => {
  it.each([
    [1.5, 12.1],
    [2.5, 7.41],
    [4, 4.61],
    [6, 3.08],
    [10, 1.83],
    [16, 1.15],
    [25, 0.727],
    [50, 0.387],
    [120, 0.153],
  ])("%d mm², seven strands", (section, limit) => {
    const strandDiameter = Math.sqrt((4 * section * 1e-6) / (7 * Math.PI));
    const plain = ohms("stranded-conductor", { length: 1000, strands: 7, strandDiameter, layFactor: 1 });
    const laid = ohms("stranded-conductor", { length: 1000, strands: 7, strandDiameter });
    expect(plain).toBeLessThan(laid);
    expect(laid).toBeLessThan(limit);
    expect(laid).toBeGreaterThan(0.88 * limit);
  });
});

describe("IEC 60228 annex, correction to 20 °C", () => {
  /** 254.5/(234.5+t) for copper, 248/(228+t) for aluminium (seen in a national edition). */
  it.each([5, 10, 50, 90])("at %d °C", (t) => {
    const wire = { length: 1, diameter: 0.001 };
    const ratio = (material: string) =>
      ohms("round-wire", wire, material) / ohms("round-wire", wire, material, `${t} degC`);
    expect(deviation(ratio("copper-annealed"), 254.5 / (234.5 + t))).toBeLessThan(2e-4);
    expect(deviation(ratio("aluminium-electrical"), 248 / (228 + t))).toBeLessThan(5e-4);
  });

  /** The annex's printed table follows 250/(230+t) (seen): within half a per cent of the copper law. */
  it.each([
    [5, 1.064],
    [50, 0.893],
    [100, 0.758],
  ])("the printed factor at %d °C", (t, factor) => {
    const wire = { length: 1, diameter: 0.001 };
    const found = ohms("round-wire", wire) / ohms("round-wire", wire, "copper-annealed", `${t} degC`);
    expect(deviation(found, factor)).toBeLessThan(5e-3);
  });
});

describe("printed boards", () => {
  it("one-ounce copper is 34.3 µm and about 0.5 mΩ a square (common practice, no source)", () => {
    const square = ohms("etched-trace", { length: 1, baseWidth: 1, topWidth: 1, thickness: "1 oz/ft^2" });
    expect(deviation(square, 0.5e-3)).toBeLessThan(0.01);
  });

  /** A published via example (6-checks): 1.6/0.3/0.025 mm, thin-wall form 1.17 mΩ, exact barrel with 0.3 mm drill 1.28. */
  it("a hole: finished and drilled diameter are two things", () => {
    const hole = { height: "1.6 mm", plating: "25 um" };
    const drilled = ohms("via-barrel", { ...hole, holeDiameter: "0.25 mm" });
    expect(drilled * 1e3).toBeCloseTo(1.28, 2);
    const finished = ohms("via-barrel", { ...hole, holeDiameter: "0.3 mm" });
    const thinWall = ((1e-6 / 58) * 1.6e-3) / (Math.PI * 0.3e-3 * 25e-6);
    expect(thinWall * 1e3).toBeCloseTo(1.17, 2);
    expect(finished).toBeLessThan(thinWall);
    expect(drilled).toBeGreaterThan(thinWall);
    expect(deviation(ohms("via-barrel", { ...hole, holeRadius: "0.15 mm" }), finished)).toBe(0);
    expect(
      deviation(ohms("via-barrel", { ...hole, holeDiameter: "0.3 mm", count: 4 }), finished / 4),
    ).toBeLessThan(1e-15);
  });
});
