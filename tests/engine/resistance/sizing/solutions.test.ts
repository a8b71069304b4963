import { describe, expect, it } from "vitest";
import { computeSizing, InputError, libraryMaterial, type SizingResult } from "@/lib/engine";
import { findWholeNumbers } from "@/lib/engine/resistance/sizing/whole-numbers";
import { compute } from "../../../support/compute";

const context = { material: libraryMaterial };
const size = (request: unknown): SizingResult => computeSizing(request, context);

/** The complaint about a sizing, as "pointer: detail". */
function refused(request: unknown): string {
  try {
    size(request);
  } catch (error) {
    if (error instanceof InputError) return error.message.replaceAll("\u2009", " ");
    throw error;
  }
  throw new Error("the request was answered");
}

describe("several solutions, one and none", () => {
  const arc = (inner: number) => ({
    shape: "arc-bar",
    dimensions: { innerRadius: inner, thickness: 1, angle: 90 },
    medium: { resistivity: 1 },
  });

  it("tells one from none by the ends", () => {
    const { solutions } = size({ ...arc(1), solveFor: "outerRadius", target: 1, within: [1.5, 10] });
    // R = (π/2)/ln b, b = e^(π/2)
    expect(solutions.map(({ dimension }) => Number(dimension.value.toFixed(10)))).toEqual([
      Number(Math.exp(Math.PI / 2).toFixed(10)),
    ]);
    expect(refused({ ...arc(1), solveFor: "outerRadius", target: 1e-3, within: [1.5, 10] })).toMatch(
      /#\/target: is not reached: the resistance is 3\.8741 Ω at outerRadius = 1\.5 m and 682\.19 mΩ at outerRadius = 10 m\./,
    );
  });

  // The opening angle β of a neck: cot(β/2)·atan(z·sin β/a) is not monotone for a long neck.
  const neck = {
    shape: "hyperbolic-neck",
    dimensions: { throatRadius: "1 mm", length: "0.5 mm", sides: 1 },
    medium: { resistivity: 1 },
    solveFor: "openingAngle",
    include: [],
  };

  it("finds every opening angle that gives a resistance", () => {
    const values = Array.from({ length: 899 }, (_, k) => {
      const angle = (k + 1) / 10;
      const dimensions = { ...neck.dimensions, openingAngle: angle };
      return compute({ shape: neck.shape, dimensions, medium: neck.medium, include: [] }).resistance.value;
    });
    for (const target of [values[50], values[300], values[800], (values[400] + values[401]) / 2]) {
      const crossings = values
        .slice(1)
        .filter((value, k) => (value - target) * (values[k] - target) < 0).length;
      const touched = values.filter((value) => value === target).length;
      const { solutions } = size({ ...neck, target, within: [0.1, 89.9] });
      expect(solutions.length).toBeGreaterThanOrEqual(Math.max(1, Math.ceil((crossings + touched) / 2)));
      for (const { resistance } of solutions)
        expect(Math.abs(resistance.value / target - 1)).toBeLessThan(1e-11);
    }
  });

  // Wide ends of a steep taper: the bracket's middle rises again, since the walls bound does.
  it.each([
    ["tapered-strip", "startWidth", { length: "80 mm", endWidth: "10 mm", thickness: "2 mm" }],
    ["tapered-strip", "endWidth", { length: "80 mm", startWidth: "30 mm", thickness: "2 mm" }],
    ["cone-frustum", "startDiameter", { length: "80 mm", endDiameter: "20 mm" }],
  ])("finds both of %s: %s", (shape, solveFor, dimensions) => {
    const medium = { resistivity: 1.7e-8 };
    const at = (size: number): number =>
      compute({ shape, dimensions: { ...dimensions, [solveFor]: size }, medium, include: [] }).resistance
        .value;
    const sizes = Array.from({ length: 2000 }, (_, k) => 1e-3 * 1.005 ** k);
    const least = Math.min(...sizes.map(at));
    for (const target of [least * 1.01, least * 1.2]) {
      const found = size({ shape, dimensions, medium, include: [], solveFor, target }).solutions;
      expect(found).toHaveLength(2);
      for (const { resistance } of found) expect(Math.abs(resistance.value / target - 1)).toBeLessThan(1e-12);
    }
    expect(
      refused({ shape, dimensions, medium, solveFor, target: least * 0.9, within: ["1 mm", "20 m"] }),
    ).toMatch(/at \w+ = 1 mm and .* at \w+ = 20 m, and between them a minimum of /);
  });

  it("states a maximum between the ends where the target lies above it", () => {
    const within = [0.1, 89.9];
    const at = (angle: number): number =>
      compute({
        shape: neck.shape,
        dimensions: { ...neck.dimensions, openingAngle: angle },
        medium: neck.medium,
        include: [],
      }).resistance.value;
    const values = Array.from({ length: 899 }, (_, k) => at((k + 1) / 10));
    const most = Math.max(...values);
    const inner = most > Math.max(at(0.1), at(89.9)) * (1 + 1e-6);
    const told = refused({ ...neck, target: most * 2, within });
    expect(/and between them a maximum of /.test(told)).toBe(inner);
    expect(told).not.toMatch(/minimum/);
  });

  describe("a thin wall by two radii", () => {
    const shell = (solveFor: string, target: number) => ({
      shape: "cylindrical-shell",
      dimensions: { innerRadius: "10 mm", length: 1 },
      medium: { resistivity: 1 },
      include: [],
      solveFor,
      target,
    });

    it.each([1e-4, 1e-6, 1e-9, 1e-12, 1e-15])("claims no more than outerRadius resolves: %d Ω", (target) => {
      const [solution] = size(shell("outerRadius", target)).solutions;
      const { resistance, exact, cautions, dimension } = solution;
      expect(exact).toBe(Math.abs(resistance.value / target - 1) <= 1e-9);
      // The bounds cover what one bit of the radius changes.
      expect(resistance.lower <= target && target <= resistance.upper).toBe(true);
      if (exact) return;
      // The neighbours of that double are on the other side or further off.
      const wall = target * 2 * Math.PI * 0.01;
      expect(Math.abs(resistance.value / target - 1)).toBeLessThan((2 * 0.01 * Number.EPSILON) / wall);
      expect(cautions.at(-1)).toMatch(/A double cannot hold outerRadius .* Solve for wall/);
      expect(dimension.text.length).toBeGreaterThan(8);
    });

    it("names the input that goes further where the target is below the last double", () => {
      expect(refused(shell("outerRadius", 1e-18))).toMatch(
        /outerRadius = 10\.000000000000002 mm .* cannot hold outerRadius any closer to its limit: solve for wall\.$/,
      );
      const [solution] = size(shell("wall", 1e-10)).solutions;
      expect(solution.exact).toBe(true);
      expect(refused(shell("wall", 1e-18))).not.toMatch(/solve for/);
    });
  });

  it("works on a graded medium and at a temperature", () => {
    const request = {
      shape: "bar",
      dimensions: { width: "50 mm", thickness: "10 mm" },
      medium: {
        graded: {
          coordinate: "length",
          profile: { kind: "temperature", material: "copper-annealed", from: 20, to: 120 },
        },
      },
      solveFor: "length",
      target: "40 uohm",
    };
    const [solution] = size(request).solutions;
    expect(Math.abs(solution.resistance.value / 40e-6 - 1)).toBeLessThan(1e-9);
    expect(solution.method).toBe("quadrature");
  });

  it("says why nothing in the range is admitted", () => {
    expect(
      refused({
        shape: "bar",
        dimensions: { length: 1, thickness: 1 },
        medium: { material: "copper-annealed" },
        operating: { temperature: 5000 },
        solveFor: "width",
        target: 1,
      }),
    ).toMatch(/#\/operating\/temperature/);
  });
});

describe("whole numbers", () => {
  it("are found where they meet, on either side where they do not, and far out", () => {
    const meets = (_: number, value: number): boolean => value === 0;
    expect(findWholeNumbers((n) => n - 7, 1, 100, meets).found).toEqual([{ n: 7, exact: true }]);
    expect(findWholeNumbers((n) => n - 7.5, 1, 100, meets).found).toEqual([
      { n: 7, exact: false },
      { n: 8, exact: false },
    ]);
    expect(findWholeNumbers((n) => n - 123_456.5, 1, 1_000_000, meets).found.map(({ n }) => n)).toEqual([
      123_456, 123_457,
    ]);
    expect(findWholeNumbers((n) => n + 1, 1, 100, meets).found).toEqual([]);
  });
});
