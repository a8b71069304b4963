/** Reading a request's dimensions against a shape that has every kind of them. */
import { describe, expect, it } from "vitest";
import { InputError, resolveDimensions, shapeEntry } from "@/lib/engine";
import { defineShape } from "@/lib/engine/shape/define-shape";

const sample = defineShape({
  id: "sample",
  title: "Sample",
  family: "axial",
  summary: "A shape for this test only.",
  dimensions: {
    radius: {
      type: "quantity",
      kind: "length",
      label: "Radius",
      symbol: "r",
      help: "Radius of it.",
      diameter: "diameter",
    },
    spotDiameter: {
      type: "quantity",
      kind: "length",
      label: "Spot diameter",
      symbol: "d",
      help: "Diameter of the spot.",
      radius: "spotRadius",
      default: 0.01,
      max: 2,
    },
    depth: {
      type: "quantity",
      kind: "length",
      label: "Depth",
      symbol: "h",
      help: "Depth of it.",
      zero: true,
      default: 0,
    },
    cover: { type: "quantity", kind: "length", label: "Cover", symbol: "c", help: "Depth less radius." },
    angle: {
      type: "quantity",
      kind: "angle",
      label: "Angle",
      symbol: "φ",
      help: "Angle.",
      default: Math.PI,
      max: Math.PI,
    },
    count: { type: "integer", label: "Count", symbol: "n", help: "How many.", default: 1, min: 1, max: 10 },
    factor: {
      type: "number",
      label: "Factor",
      symbol: "k",
      help: "A factor.",
      default: 1.02,
      min: 1,
      max: 2,
      exclusiveMin: true,
    },
    side: {
      type: "choice",
      label: "Side",
      symbol: "",
      help: "Which side.",
      default: "left",
      choices: [
        { value: "left", label: "Left" },
        { value: "right", label: "Right" },
      ],
    },
    length: { type: "quantity", kind: "length", label: "Length", symbol: "L", help: "Length." },
    gap: {
      type: "quantity",
      kind: "length",
      label: "Gap",
      symbol: "g",
      help: "Length less twice the radius.",
    },
  },
  alternatives: [
    {
      names: ["length", "gap"],
      derive: { length: (d) => d.gap + 2 * d.radius, gap: (d) => d.length - 2 * d.radius },
    },
    { names: ["cover"], derive: {} },
  ],
  constraints: [
    { names: ["length", "radius"], text: "length at least twice the radius", holds: (d) => d.gap >= 0 },
  ],
  coordinates: [],
  terminals: { high: "here", low: "there" },
  answer: {
    kind: "factor",
    factor: () => ({
      value: 1,
      relativeError: 1e-15,
      boundsBasis: "rounding",
      proved: true,
      method: "closed-form",
    }),
  },
  formula: "R = \\rho",
  boundsBasis: "rounding",
  validity: [],
  cautions: [],
  assumptions: [],
  sources: [],
  example: { dimensions: {} },
  drawing: () => ({ views: [], description: "" }),
});

const resolve = (given: Record<string, unknown>) => resolveDimensions(sample, { cover: 1, ...given });

function refusal(given: Record<string, unknown>): readonly { pointer: string; detail: string }[] {
  try {
    resolve(given);
  } catch (error) {
    if (error instanceof InputError) return error.errors;
  }
  throw new Error("it was resolved");
}

describe("dimensions", () => {
  it("fill in defaults and alternatives", () => {
    expect(resolve({ radius: "2 mm", length: "10 mm" })).toMatchObject({
      radius: 0.002,
      spotDiameter: 0.01,
      depth: 0,
      angle: Math.PI,
      count: 1,
      factor: 1.02,
      side: "left",
      length: 0.01,
      gap: 0.01 - 0.004,
    });
    expect(resolve({ radius: "2 mm", gap: "6 mm" }).length).toBeCloseTo(0.01, 15);
  });

  it("take twins", () => {
    expect(resolve({ diameter: "4 mm", gap: 1 }).radius).toBe(0.002);
    expect(resolve({ radius: 1, gap: 1, spotRadius: "1 mm" }).spotDiameter).toBe(0.002);
  });

  it("take texts for whole numbers and factors, as a query string brings them", () => {
    expect(resolve({ radius: 1, gap: 1, count: "3", factor: "1.5" })).toMatchObject({
      count: 3,
      factor: 1.5,
    });
  });

  it.each<[string, Record<string, unknown>, string, RegExp]>([
    ["a broken count", { count: 2.5 }, "#/dimensions/count", /whole number/],
    ["too many", { count: 11 }, "#/dimensions/count", /at least 1 and at most 10/],
    ["none", { count: 0 }, "#/dimensions/count", /at least 1/],
    ["a count with a unit", { count: "3 mm" }, "#/dimensions/count", /plain number/],
    ["a factor at its open end", { factor: 1 }, "#/dimensions/factor", /greater than 1/],
    ["an unknown choice", { side: "top" }, "#/dimensions/side", /"left" or "right"/],
    ["a choice that is a number", { side: 1 }, "#/dimensions/side", /"left" or "right"/],
    ["a negative depth", { depth: -1 }, "#/dimensions/depth", /0 or greater/],
    ["a diameter over its limit", { spotDiameter: 3 }, "#/dimensions/spotDiameter", /at most 2 m/],
    ["its twin over half of that", { spotRadius: 1.5 }, "#/dimensions/spotRadius", /at most 1 m/],
    ["an angle over its limit", { angle: 200 }, "#/dimensions/angle", /at most 180 deg/],
  ])("refuse %s", (_, given, pointer, pattern) => {
    const found = refusal({ radius: 1, gap: 1, ...given });
    expect(found[0].pointer).toBe(pointer);
    expect(found[0].detail).toMatch(pattern);
  });

  it("blame the dimension that was given for a broken constraint", () => {
    expect(refusal({ radius: 1, length: 1 })).toEqual([
      { pointer: "#/dimensions/length", detail: "must satisfy: length at least twice the radius." },
    ]);
  });

  it("show in the wire entry with their twins, in the units of a bare number", () => {
    const entry = shapeEntry(sample);
    const byName = Object.fromEntries(entry.dimensions.map((dimension) => [dimension.name, dimension]));
    expect(byName.diameter).toMatchObject({ label: "Diameter", symbol: "2r", unit: "m", required: true });
    expect(byName.spotRadius).toMatchObject({ label: "Spot radius", default: 0.005, range: { max: 1 } });
    expect(byName.angle).toMatchObject({
      unit: "deg",
      default: 180,
      range: { min: 0, exclusiveMin: true, max: 180 },
    });
    expect(byName.depth).toMatchObject({ range: { exclusiveMin: false } });
    expect(byName.count).toMatchObject({ type: "integer", unit: "1", range: { min: 1, max: 10 } });
    expect(byName.factor).toMatchObject({ type: "quantity", unit: "1", default: 1.02 });
    expect(byName.side).toMatchObject({ type: "choice", unit: null, default: "left" });
    expect(entry.alternatives).toEqual([
      ["radius", "diameter"],
      ["spotDiameter", "spotRadius"],
      ["length", "gap"],
    ]);
  });
});

describe("very many unknown names", () => {
  it("are told up to fifty", () => {
    const given = Object.fromEntries(Array.from({ length: 40_000 }, (_, i) => [`d${i}`, 1]));
    try {
      resolveDimensions(sample, given);
      expect.unreachable();
    } catch (error) {
      const told = (error as InputError).errors.filter(({ detail }) => detail.includes("is no dimension"));
      expect(told).toHaveLength(50);
    }
  });
});
