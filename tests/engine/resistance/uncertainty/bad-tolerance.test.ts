import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { computeResistance, computeSizing, InputError, libraryMaterial } from "@/lib/engine";
import { expectComplaint } from "../../../support/complaint";

const bar = {
  shape: "bar",
  dimensions: { length: "1 m", width: "50 mm", thickness: "10 mm" },
  medium: { material: "copper-annealed" },
};
const width = (given: unknown) => ({ ...bar, dimensions: { ...bar.dimensions, width: given } });
const offset = (given: unknown) => ({
  shape: "eccentric-cylinders",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: 1, offset: given },
  medium: { resistivity: 1 },
});
const propagation = { method: "propagation" };

describe("tolerances that cannot be", () => {
  it.each<[string, unknown, string, RegExp]>([
    ["negative", width({ value: 1, tolerance: -0.1 }), "#/dimensions/width/tolerance", /0 or greater/],
    [
      "larger than the value",
      width({ value: "1 mm", tolerance: "2 mm" }),
      "#/dimensions/width/tolerance",
      /smaller than the value/,
    ],
    [
      "100 %",
      width({ value: "1 mm", tolerance: "100 %" }),
      "#/dimensions/width/tolerance",
      /smaller than the value/,
    ],
    [
      "a minus as large",
      width({ value: "1 mm", plus: "1 mm", minus: "1 mm" }),
      "#/dimensions/width/minus",
      /smaller/,
    ],
    [
      "a share of an offset of 0",
      offset({ value: 0, tolerance: "1 %" }),
      "#/dimensions/offset/tolerance",
      /a share of a value that is 0.*plus or minus/,
    ],
    [
      "below an offset of 0",
      offset({ value: 0, tolerance: "0.1 mm" }),
      "#/dimensions/offset/tolerance",
      /below 0.*plus alone/,
    ],
    [
      "of another kind",
      width({ value: "1 mm", tolerance: "1 ohm" }),
      "#/dimensions/width/tolerance",
      /length/,
    ],
    ["given twice", width({ value: 1, tolerance: 0.1, plus: 0.1 }), "#/dimensions/width/plus", /together/],
    ["missing", width({ value: 1, distribution: "normal" }), "#/dimensions/width/tolerance", /required/],
    ["without a value", width({ tolerance: 0.1 }), "#/dimensions/width", /no value/],
    [
      "with an unknown member",
      width({ value: 1, tolerance: 0.1, sigma: 2 }),
      "#/dimensions/width/sigma",
      /not known/,
    ],
    [
      "of an unknown distribution",
      width({ value: 1, tolerance: 0.1, distribution: "flat" }),
      "#/dimensions/width/distribution",
      /uniform/,
    ],
    [
      "normal and lopsided",
      width({ value: 1, plus: 0.1, minus: 0.2, distribution: "normal" }),
      "#/dimensions/width/distribution",
      /symmetric/,
    ],
    [
      "on a temperature, as a share",
      { ...bar, operating: { temperature: { value: 20, tolerance: "1 %" } } },
      "#/operating/temperature/tolerance",
      /difference/,
    ],
    [
      "on a temperature, below absolute zero",
      { ...bar, operating: { temperature: { value: 20, tolerance: 400 } } },
      "#/operating/temperature/tolerance",
      /absolute zero/,
    ],
    [
      "on a voltage",
      { ...bar, operating: { voltage: { value: 1, tolerance: 0.1 } } },
      "#/operating/voltage",
      /no tolerance/,
    ],
    [
      "on a choice",
      {
        shape: "sheet-step",
        dimensions: {
          length1: 1,
          width1: 1,
          length2: 1,
          width2: 0.5,
          alignment: { value: "edge", tolerance: 1 },
        },
        medium: { sheetResistance: 1 },
      },
      "#/dimensions/alignment",
      /choice/,
    ],
    [
      "on a whole number",
      {
        shape: "stranded-conductor",
        dimensions: { length: 1, strands: { value: 7, tolerance: 1 }, strandDiameter: "1 mm" },
        medium: { resistivity: 1 },
      },
      "#/dimensions/strands",
      /whole number/,
    ],
    [
      "on a layer's thickness",
      {
        ...bar,
        medium: {
          graded: {
            coordinate: "length",
            quantity: "conductivity",
            profile: { kind: "layers", layers: [{ thickness: { value: 1, tolerance: 0.1 }, value: 1 }] },
          },
        },
      },
      "#/medium/graded/profile/layers/0/thickness",
      /no tolerance/,
    ],
    [
      "a wall that its radius leaves no room for",
      {
        shape: "cylindrical-shell",
        dimensions: { innerRadius: { value: "2 mm", tolerance: "1 mm" }, outerRadius: "2.5 mm", length: 1 },
        medium: { resistivity: 1 },
        uncertainty: propagation,
      },
      "#/dimensions/innerRadius",
      /reaches 3 mm.*outer radius greater/,
    ],
    [
      "two that contradict each other only together",
      {
        shape: "cylindrical-shell",
        dimensions: {
          innerRadius: { value: "2 mm", tolerance: "0.3 mm" },
          outerRadius: { value: "2.5 mm", tolerance: "0.3 mm" },
          length: 1,
        },
        medium: { resistivity: 1 },
        uncertainty: { method: "worst-case" },
      },
      "#/uncertainty",
      /innerRadius = 2\.3 mm, dimensions\.outerRadius = 2\.2 mm/,
    ],
    [
      "a temperature that leaves the material's range",
      { ...bar, operating: { temperature: { value: 20, tolerance: 290 } }, uncertainty: propagation },
      "#/operating/temperature",
      /reaches/,
    ],
    [
      "a range that a table no longer covers",
      {
        shape: "bar",
        dimensions: { length: { value: 1, tolerance: 0.1 }, width: 1, thickness: 1 },
        medium: {
          graded: {
            coordinate: "length",
            quantity: "conductivity",
            profile: { kind: "table", positions: [0, 1], values: [1, 2] },
          },
        },
        uncertainty: propagation,
      },
      "#/dimensions/length",
      /reaches 1\.1 m/,
    ],
  ])("%s", (_, request, pointer, pattern) => expectComplaint(request, pointer, pattern));
});

describe("trials", () => {
  const trials = (count: number, over: object = {}) => ({
    ...width({ value: "1 mm", tolerance: "1 %" }),
    ...over,
    include: [],
    uncertainty: { method: "monte-carlo", trials: count },
  });
  const graded = {
    coordinate: "length",
    quantity: "conductivity",
    profile: { kind: "expression", value: "1e6*(1+u^2)" },
  };

  it("that take too long are told with a number that fits", () => {
    let looks = 0;
    const overdue = () => ++looks > 50;
    expect(() => computeResistance(trials(1_000_000), { material: libraryMaterial, overdue })).toThrow(
      "51,200 of 1,000,000 were made. Ask for 40,000 at most.",
    );
  });

  it("that never fit are refused before any work", () => {
    expectComplaint(trials(100_001, { medium: { graded } }), "#/uncertainty/trials", /at most 100,000 here/);
    expect(computeResistance(offset({ value: 0, plus: "0.1 mm" }), { material: libraryMaterial }).shape).toBe(
      "eccentric-cylinders",
    );
  });
});

describe("anything for a tolerance or a sizing", () => {
  const odd = fc.oneof(
    fc.anything(),
    fc.record({
      value: fc.oneof(fc.double(), fc.string(), fc.constantFrom("1 mm", 0.01, "1 kg")),
      tolerance: fc.option(fc.oneof(fc.double(), fc.string(), fc.constantFrom("1 %", "0.1 mm", 0)), {
        nil: undefined,
      }),
      plus: fc.option(fc.double(), { nil: undefined }),
      distribution: fc.option(fc.constantFrom("uniform", "normal", "triangular", "flat"), { nil: undefined }),
    }),
  );
  const context = { material: libraryMaterial };
  const answeredOrRefused = (run: () => unknown): void => {
    try {
      const text = JSON.stringify(run());
      // JSON writes NaN and infinities as null; the parts that may be null are left out of these requests.
      expect(text).not.toMatch(/:null/);
    } catch (error) {
      expect(error).toBeInstanceOf(InputError);
    }
  };

  it("is answered with numbers or refused with complaints", () => {
    fc.assert(
      fc.property(odd, odd, fc.constantFrom("propagation", "worst-case", "monte-carlo"), (a, b, method) => {
        const request = {
          ...width(a),
          operating: { temperature: b },
          include: [],
          uncertainty: { method, ...(method === "monte-carlo" ? { trials: 1000 } : {}) },
        };
        answeredOrRefused(() => computeResistance(request, context));
      }),
      { seed: 20_261_201, numRuns: 400 },
    );
  });

  it("so is a sizing", () => {
    fc.assert(
      fc.property(
        odd,
        fc.oneof(fc.anything(), fc.constantFrom("width", "length")),
        fc.oneof(fc.anything(), fc.double(), fc.constant("1 mohm")),
        (a, solveFor, target) => {
          const { width: _, ...rest } = bar.dimensions;
          const request = { ...bar, dimensions: { ...rest, thickness: a }, include: [], solveFor, target };
          answeredOrRefused(() => computeSizing(request, context));
        },
      ),
      { seed: 20_261_202, numRuns: 300 },
    );
  });
});
