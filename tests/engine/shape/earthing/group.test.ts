/** Groups of rods: check values, the whole system without symmetry, limits, BS 7430. */
import { describe, expect, it } from "vitest";
import { solveInPlace } from "@/lib/engine/numeric/lu-solve";
import { parallelMean } from "@/lib/engine/shape/earthing/line-potential";
import { groupPlaces, type Arrangement } from "@/lib/engine/shape/earthing/rod-group";
import { law } from "../../../support/shape-law";

const off = (found: number, expected: number) => Math.abs(found / expected - 1);

describe("check values of the group (L = 3 m, a = 8 mm, s = 6 m, ρ = 1 Ω·m; recomputed, no publication)", () => {
  const rod = { length: 3, diameter: 0.016, spacing: 6 };
  it.each([
    ["line", 2, 0.17989053],
    ["line", 3, 0.12553727],
    ["square", 4, 0.10065907],
  ] as const)("%s of %d", (arrangement, count, value) => {
    expect(off(law("earth-rod-group", { ...rod, arrangement, count }), value)).toBeLessThan(3e-8);
  });

  it("of one is the single rod, of two the pair, whatever the arrangement", () => {
    for (const arrangement of ["line", "ring", "square"]) {
      const one = law("earth-rod-group", { ...rod, arrangement, count: 1 });
      expect(off(one, law("earth-rod", { length: 3, diameter: 0.016 }))).toBeLessThan(1e-15);
    }
    for (const arrangement of ["line", "ring"]) {
      const two = law("earth-rod-group", { ...rod, arrangement, count: 2 });
      expect(off(two, law("earth-rod-pair", rod))).toBeLessThan(1e-15);
    }
    const square = law("earth-rod-group", { ...rod, arrangement: "square", count: 4 });
    expect(off(law("earth-rod-group", { ...rod, arrangement: "ring", count: 4 }), square)).toBeLessThan(
      1e-14,
    );
  });

  it("far apart is a rod over their number", () => {
    for (const [arrangement, count] of [
      ["line", 5],
      ["ring", 8],
      ["square", 16],
    ] as const) {
      const many = law("earth-rod-group", { ...rod, spacing: 1e7, arrangement, count });
      expect(off(many * count, law("earth-rod", { length: 3, diameter: 0.016 }))).toBeLessThan(1e-6);
    }
  });

  /** BS 7430, factor λ of rods in a line (from memory): R = (R₁/n)(1 + λρ/(2πR₁s)). */
  it.each([
    [2, 1],
    [3, 1.66],
    [4, 2.15],
    [5, 2.54],
    [6, 2.87],
    [8, 3.39],
    [10, 3.81],
  ])("of %d agrees with BS 7430's factor where the rods are far apart", (count, lambda) => {
    const spacing = 60;
    const one = law("earth-rod", { length: 3, diameter: 0.016 });
    const found = law("earth-rod-group", { ...rod, spacing, count, arrangement: "line" });
    const factor = (found / (one / count) - 1) * 2 * Math.PI * one * spacing;
    expect(Math.abs(factor - lambda)).toBeLessThan(0.02 * lambda + 0.005);
  });
});

describe("the whole system, one unknown a rod, by elimination", () => {
  const cases: readonly (readonly [Arrangement, number, number])[] = [
    ["line", 7, 0.4],
    ["line", 40, 3],
    ["ring", 9, 0.4],
    ["ring", 24, 6],
    ["square", 25, 0.4],
    ["square", 64, 3],
  ];
  it.each(cases)("%s of %d, %d m apart", (arrangement, count, spacing) => {
    const [length, radius] = [3, 0.008];
    const places = groupPlaces(arrangement, count);
    const matrix = new Float64Array(count * count);
    places.forEach(([x, y], i) =>
      places.forEach(([u, v], j) => {
        const distance = i === j ? radius : spacing * Math.hypot(x - u, y - v);
        matrix[i * count + j] = parallelMean(2 * length, distance) / (2 * Math.PI);
      }),
    );
    const currents = solveInPlace(matrix, new Float64Array(count).fill(1));
    const expected = 1 / currents.reduce((sum, current) => sum + current, 0);
    const found = law("earth-rod-group", { length, radius, spacing, count, arrangement });
    expect(off(found, expected)).toBeLessThan(1e-12);
  });

  it("neighbours stand a spacing apart in every arrangement", () => {
    for (const [arrangement, count] of cases) {
      const [[x, y], [u, v]] = groupPlaces(arrangement, count);
      expect(Math.hypot(x - u, y - v)).toBeCloseTo(1, 14);
    }
  });
});
