/** Every way to be wrong has its own pointer and sentence. */
import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { catalogue, CheckFailure, computeResistance, InputError, libraryMaterial } from "@/lib/engine";
import { complaints } from "../../support/compute";

const good = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
};
const bar = { shape: "bar", dimensions: { length: 1, width: 0.01, thickness: 0.001 } };
const inBar = (graded: Record<string, unknown>): Record<string, unknown> => ({ ...bar, medium: { graded } });
const expression = (value: unknown, coordinate = "length"): Record<string, unknown> =>
  inBar({ coordinate, quantity: "conductivity", profile: { kind: "expression", value } });

function expectComplaint(request: unknown, pointer: string, pattern: RegExp): void {
  // Texts for people have thin spaces before their units.
  const found = complaints(request).map(({ pointer: at, detail }) => ({
    pointer: at,
    detail: detail.replaceAll("\u2009", " "),
  }));
  const match = found.find((problem) => problem.pointer === pointer && pattern.test(problem.detail));
  expect(match, JSON.stringify(found)).toBeDefined();
}

describe("the body", () => {
  it.each<[string, unknown, string, RegExp]>([
    ["an array", [], "#", /must be an object/],
    ["null", null, "#", /must be an object/],
    ["a text", "bar", "#", /must be an object/],
    ["no shape", { ...good, shape: undefined }, "#/shape", /required/],
    ["a shape that is a number", { ...good, shape: 7 }, "#/shape", /must be a string/],
    ["an unknown shape", { ...good, shape: "cylinder-shell" }, "#/shape", /"cylindrical-shell"/],
    ["an unknown member", { ...good, colour: "red" }, "#/colour", /not a member/],
    [
      "uncertainty before it is computed",
      { ...good, uncertainty: { method: "propagation" } },
      "#/uncertainty",
      /not a member/,
    ],
    ["no dimensions", { ...good, dimensions: undefined }, "#/dimensions", /required/],
    ["dimensions that are a list", { ...good, dimensions: [1] }, "#/dimensions", /must be an object/],
    [
      "an unknown include",
      { ...good, include: ["steps", "field"] },
      "#/include/1",
      /one of "steps", "profile"/,
    ],
    ["an empty requirement", { ...good, requirement: {} }, "#/requirement", /min, max or both/],
    [
      "a requirement upside down",
      { ...good, requirement: { min: 5, max: 2 } },
      "#/requirement/min",
      /greater than max/,
    ],
    [
      "a requirement of another kind",
      { ...good, requirement: { max: "5 V" } },
      "#/requirement/max",
      /must be a resistance/,
    ],
    ["a record without a label", { ...good, record: {} }, "#/record/label", /required/],
  ])("%s", (_, request, pointer, pattern) => expectComplaint(request, pointer, pattern));
});

describe("dimensions", () => {
  const dims = (change: Record<string, unknown>): Record<string, unknown> => ({
    ...good,
    dimensions: { ...good.dimensions, ...change },
  });

  it.each<[string, Record<string, unknown>, string, RegExp]>([
    ["an unknown one", dims({ lenght: 1 }), "#/dimensions/lenght", /Did you mean "length"/],
    [
      "a missing one",
      { ...good, dimensions: { innerRadius: 1, wall: 1 } },
      "#/dimensions/length",
      /required/,
    ],
    [
      "both of an alternative",
      dims({ wall: "3 mm" }),
      "#/dimensions/wall",
      /together with outerRadius; give exactly one/,
    ],
    [
      "a radius and its diameter",
      dims({ innerDiameter: "4 mm" }),
      "#/dimensions/innerDiameter",
      /together with innerRadius/,
    ],
    [
      "none of an alternative",
      { ...good, dimensions: { innerRadius: 1, length: 1 } },
      "#/dimensions/outerRadius",
      /exactly one of outerRadius, outerDiameter or wall/,
    ],
    ["the wrong kind of unit", dims({ length: "5 kg" }), "#/dimensions/length", /"kg" measures a mass/],
    ["zero", dims({ length: 0 }), "#/dimensions/length", /greater than 0/],
    ["a negative one", dims({ length: "-1 m" }), "#/dimensions/length", /greater than 0/],
    ["NaN", dims({ length: NaN }), "#/dimensions/length", /not a number/],
    ["NaN as a text", dims({ length: "NaN" }), "#/dimensions/length", /finite/],
    ["infinity", dims({ length: Infinity }), "#/dimensions/length", /infinite/],
    ["1e400", dims({ length: JSON.parse("1e400") as number }), "#/dimensions/length", /infinite/],
    ["1e400 as a text", dims({ length: "1e400 m" }), "#/dimensions/length", /too large/],
    ["a size beyond all use", dims({ length: 1e200 }), "#/dimensions/length", /between 1e-100 and 1e\+?100/],
    [
      "inner not below outer",
      dims({ outerRadius: "2 mm" }),
      "#/dimensions/outerRadius",
      /outer radius greater than inner radius/,
    ],
    [
      "the same by diameters",
      { ...good, dimensions: { innerDiameter: 2, outerDiameter: 1, length: 1 } },
      "#/dimensions/outerDiameter",
      /outer radius greater/,
    ],
    ["an angle over the full circle", dims({ angle: 361 }), "#/dimensions/angle", /at most 360 deg/],
    ["a list", dims({ length: [1] }), "#/dimensions/length", /not an array/],
    ["null", dims({ length: null }), "#/dimensions/length", /null/],
    ["a tolerance", dims({ length: { value: 1, tolerance: "1 %" } }), "#/dimensions/length", /tolerance/],
    ["a decimal comma", dims({ length: "1,5 m" }), "#/dimensions/length", /decimal comma/],
    ["a prototype's name", dims({ constructor: 1 }), "#/dimensions/constructor", /is no dimension/],
    ["a name with a slash", dims({ "a/b": 1 }), "#/dimensions/a~1b", /is no dimension/],
  ])("%s", (_, request, pointer, pattern) => expectComplaint(request, pointer, pattern));

  it("a wall as thick as the tube", () => {
    expectComplaint(
      {
        shape: "tube",
        dimensions: { length: 1, outerDiameter: 0.02, wall: 0.01 },
        medium: { resistivity: 1 },
      },
      "#/dimensions/wall",
      /less than half/,
    );
  });

  it("all complaints come at once", () => {
    const found = complaints({
      shape: "cylindrical-shell",
      dimensions: { innerRadius: "2 kg", wall: -1, colour: 2 },
      medium: { material: "unobtainium" },
      operating: { temperature: "-300 degC", voltage: 0 },
      requirement: { max: -1 },
    });
    expect(found.map(({ pointer }) => pointer).sort()).toEqual([
      "#/dimensions/colour",
      "#/dimensions/innerRadius",
      "#/dimensions/length",
      "#/dimensions/wall",
      "#/medium/material",
      "#/operating/temperature",
      "#/operating/voltage",
      "#/requirement/max",
    ]);
  });

  it("a bad member and a bad dimension come at once", () => {
    const found = complaints({ ...good, colour: 1, dimensions: { ...good.dimensions, length: "5 kg" } });
    expect(found.map(({ pointer }) => pointer).sort()).toEqual(["#/colour", "#/dimensions/length"]);
  });
});

describe("the medium", () => {
  const medium = (value: unknown): Record<string, unknown> => ({ ...good, medium: value });

  it.each<[string, Record<string, unknown>, string, RegExp]>([
    ["none", { ...good, medium: undefined }, "#/medium", /required/],
    ["an empty one", medium({}), "#/medium", /exactly one of/],
    ["two", medium({ conductivity: 1, resistivity: 1 }), "#/medium/conductivity", /exactly one of/],
    [
      "media for a shape of one",
      { ...good, medium: undefined, media: { core: { resistivity: 1 } } },
      "#/media",
      /takes one medium/,
    ],
    ["an unknown member", medium({ conductivity: 1, colour: 2 }), "#/medium/colour", /not a member/],
    ["an unknown material", medium({ material: "unobtainium" }), "#/medium/material", /no material/],
    [
      "the wrong unit",
      medium({ conductivity: "5 ohm m" }),
      "#/medium/conductivity",
      /must be a conductivity/,
    ],
    ["zero", medium({ conductivity: 0 }), "#/medium/conductivity", /greater than 0/],
    ["negative", medium({ resistivity: -1 }), "#/medium/resistivity", /greater than 0/],
    ["beyond all use", medium({ resistivity: 1e200 }), "#/medium/resistivity", /between/],
    [
      "a sheet resistance for a body",
      medium({ sheetResistance: 50 }),
      "#/medium/sheetResistance",
      /for sheets/,
    ],
    [
      "a thickness for a body",
      medium({ resistivity: 1, thickness: "1 mm" }),
      "#/medium/thickness",
      /sheets only/,
    ],
    [
      "a coefficient beside a material",
      medium({ material: "copper-annealed", temperatureCoefficient: 1 }),
      "#/medium/temperatureCoefficient",
      /goes only with/,
    ],
    [
      "a coefficient that makes it negative",
      { ...medium({ resistivity: 1, temperatureCoefficient: -0.1 }), operating: { temperature: 120 } },
      "#/medium/temperatureCoefficient",
      /negative/,
    ],
    [
      "a temperature out of range",
      { ...medium({ material: "copper-annealed" }), operating: { temperature: 5000 } },
      "#/operating/temperature",
      /extrapolate/,
    ],
    ["a boolean", medium(true), "#/medium", /must be an object/],
  ])("%s", (_, request, pointer, pattern) => expectComplaint(request, pointer, pattern));
});

describe("the operating point", () => {
  it.each<[string, Record<string, unknown>, string, RegExp]>([
    ["two drives", { voltage: 1, current: 1 }, "#/operating/current", /at most one/],
    ["three drives", { voltage: 1, current: 1, power: 2 }, "#/operating/current", /at most one/],
    ["a wrong unit", { voltage: "1 A" }, "#/operating/voltage", /must be a voltage/],
    ["a negative one", { power: -1 }, "#/operating/power", /greater than 0/],
    ["an unknown member", { volts: 1 }, "#/operating/volts", /not a member/],
    ["a current that overflows the power", { current: 1e200 }, "#/operating/current", /cannot hold/],
  ])("%s", (_, operating, pointer, pattern) => expectComplaint({ ...good, operating }, pointer, pattern));
});

describe("graded media", () => {
  const profile = (value: Record<string, unknown>, coordinate = "length"): Record<string, unknown> =>
    inBar({ coordinate, quantity: "conductivity", profile: value });
  const at = (path: string): string => `#/medium/graded/profile${path}`;

  it.each<[string, Record<string, unknown>, string, RegExp]>([
    [
      "a coordinate that the shape lacks",
      inBar({ coordinate: "radius", quantity: "conductivity", profile: { kind: "constant", value: 1 } }),
      "#/medium/graded/coordinate",
      /length, width, thickness/,
    ],
    [
      "no quantity",
      inBar({ coordinate: "length", profile: { kind: "constant", value: 1 } }),
      "#/medium/graded/quantity",
      /required/,
    ],
    ["an unknown kind", profile({ kind: "parabolic" }), at("/kind"), /"constant", "linear"/],
    [
      "no profile",
      inBar({ coordinate: "length", quantity: "conductivity" }),
      at(""),
      /required|must be an object/,
    ],
    ["an unknown member", profile({ kind: "constant", value: 1, colour: 1 }), at("/colour"), /not a member/],
    [
      "zero along the flow",
      profile({ kind: "linear", from: 0, to: 1 }),
      at("/from"),
      /interrupt the current/,
    ],
    ["negative along the flow", profile({ kind: "constant", value: -1 }), at("/value"), /greater than 0/],
    [
      "negative across it",
      profile({ kind: "linear", from: -1, to: 1 }, "thickness"),
      at("/from"),
      /0 or greater/,
    ],
    [
      "zero everywhere across it",
      profile({ kind: "constant", value: 0 }, "thickness"),
      at(""),
      /zero everywhere/,
    ],
    [
      "a resistivity of zero",
      inBar({ coordinate: "thickness", quantity: "resistivity", profile: { kind: "constant", value: 0 } }),
      at("/value"),
      /greater than 0/,
    ],
    [
      "layers that do not add up",
      profile({
        kind: "layers",
        layers: [
          { thickness: "0.5 m", value: 1 },
          { thickness: "0.4 m", value: 2 },
        ],
      }),
      at("/layers"),
      /adds up to 900 mm, but the range of length is 1 m/,
    ],
    [
      "a layer without thickness",
      profile({
        kind: "layers",
        layers: [
          { thickness: 0, value: 1 },
          { thickness: 1, value: 2 },
        ],
      }),
      at("/layers/0/thickness"),
      /greater than 0/,
    ],
    [
      "a layer of zero along",
      profile({
        kind: "layers",
        layers: [
          { thickness: 0.5, value: 1 },
          { thickness: 0.5, value: 0 },
        ],
      }),
      at("/layers/1/value"),
      /interrupt/,
    ],
    ["no layers", profile({ kind: "layers", layers: [] }), at("/layers"), /at least 1/],
    [
      "a table that does not cover the range",
      profile({ kind: "table", positions: [0, 0.9], values: [1, 2] }),
      at("/positions"),
      /must cover the range of length, 0 m to 1 m; it runs from 0 m to 900 mm/,
    ],
    [
      "a table that does not increase",
      profile({ kind: "table", positions: [0, 0.5, 0.5, 1], values: [1, 2, 3, 4] }),
      at("/positions/2"),
      /greater than the position before/,
    ],
    [
      "a table of unequal lists",
      profile({ kind: "table", positions: [0, 1], values: [1] }),
      at("/values"),
      /at least 2/,
    ],
    [
      "a table of unequal longer lists",
      profile({ kind: "table", positions: [0, 1], values: [1, 2, 3] }),
      at("/values"),
      /3 entries, but there are 2 positions/,
    ],
    [
      "a table with a hole",
      profile({ kind: "table", positions: [0, "half"], values: [1, 2] }),
      at("/positions/1"),
      /no number/,
    ],
    [
      "a table with a zero for a logarithm",
      profile({ kind: "table", positions: [0, 0.001], values: [1, 0], interpolation: "log" }, "thickness"),
      at("/values/1"),
      /logarithm/,
    ],
    [
      "a table with a negative value",
      profile({ kind: "table", positions: [0, 1], values: [1, -2] }),
      at("/values/1"),
      /greater than 0/,
    ],
    [
      "a power law from zero",
      profile({ kind: "power", reference: 1, at: 1, exponent: 1 }),
      at(""),
      /is 0 at s = 0 m/,
    ],
    [
      "a power law that diverges",
      profile({ kind: "power", reference: 1, at: 1, exponent: -1 }),
      at(""),
      /infinite at s = 0 m/,
    ],
    [
      "a power law at zero",
      profile({ kind: "power", reference: 1, at: 0, exponent: 1 }),
      at("/at"),
      /greater than 0/,
    ],
    [
      "a mad exponent",
      profile({ kind: "power", reference: 1, at: 1, exponent: 1000 }),
      at("/exponent"),
      /between -100 and 100/,
    ],
    [
      "a bell without spread",
      profile({ kind: "gaussian", peak: 1, center: 0, spread: 0 }),
      at("/spread"),
      /greater than 0/,
    ],
    [
      "a bell that dies out along the flow",
      profile({ kind: "gaussian", peak: 1, center: 0, spread: "1 mm" }),
      at(""),
      /is 0 at s = 1 m/,
    ],
    [
      "a diffusion from nowhere",
      profile({ kind: "complementary-error", surface: 1, length: 1, from: "left" }),
      at("/from"),
      /one of "start", "end"/,
    ],
    [
      "a temperature out of range",
      inBar({
        coordinate: "length",
        profile: { kind: "temperature", material: "copper-annealed", from: 20, to: 4000 },
      }),
      at("/to"),
      /extrapolate/,
    ],
    [
      "an unknown material",
      inBar({
        coordinate: "length",
        profile: { kind: "temperature", material: "unobtainium", from: 20, to: 40 },
      }),
      at("/material"),
      /no material/,
    ],
    [
      "a dopant of a dopant",
      inBar({
        coordinate: "length",
        profile: { kind: "dopant", type: "p", profile: { kind: "dopant", type: "n" } },
      }),
      at("/profile/kind"),
      /"constant", "linear"/,
    ],
    [
      "too much dopant",
      inBar({
        coordinate: "length",
        profile: { kind: "dopant", type: "p", profile: { kind: "constant", value: 1e23 } },
      }),
      at("/profile"),
      /at most 1e\+?21/,
    ],
    [
      "a background for the one-dopant fit",
      inBar({
        coordinate: "thickness",
        profile: { kind: "dopant", type: "p", background: 1e15, profile: { kind: "constant", value: 1e17 } },
      }),
      at("/background"),
      /masetti/,
    ],
  ])("%s", (_, request, pointer, pattern) => expectComplaint(request, pointer, pattern));

  it("a shape known for uniform media only", () => {
    const shape = catalogue.find(({ answer, family }) => answer.kind === "factor" && family !== "sheet");
    if (!shape) return;
    const graded = {
      coordinate: "radius",
      quantity: "conductivity",
      profile: { kind: "constant", value: 1 },
    };
    expectComplaint(
      { shape: shape.id, dimensions: shape.example.dimensions, medium: { graded } },
      "#/medium/graded",
      /uniform medium only/,
    );
  });
});

describe("expressions", () => {
  const pointer = "#/medium/graded/profile/value";

  it.each<[string, string, RegExp]>([
    ["empty", " ", /empty/],
    ["broken", "1+*2", /cannot be read at character 3/],
    ["unclosed", "(1+u", /parenthesis/],
    ["an unknown name", "1+v", /unknown name "v" at character 3/],
    ["an unknown function", "sine(u)+2", /unknown function "sine".*Did you mean "sin"/],
    ["a property", "u.constructor", /property access/],
    ["a property in disguise", "u . x", /property access/],
    ["an index", "u[0]", /indices/],
    ["a function definition", "f(x)=x", /function definitions/],
    ["an assignment", "u=2", /assignments/],
    ["a text", '"a"', /texts/],
    ["a matrix", "[1,2]", /matrices/],
    ["an object", "{a:1}", /objects/],
    ["two expressions", "1;2", /one expression/],
    ["a complex value", "sqrt(-1-u)", /not a real number at s = 0 m/],
    ["a value that is not finite", "1/u", /infinite at s = 0 m/],
    ["a value that is not finite inside", "1/(u-0.5)^2", /infinite at s = 500 mm/],
    ["a negative value", "u-0.25", /is -0.25 at s = 0 m/],
    ["a zero along the flow", "(u-0.5)^2", /is 0 at s = 500 mm/],
    ["a condition outside if", "u<0.5", /outside the first argument of if/],
    ["an implied product", "2u", /multiplication sign/],
    ["a unit", "2 m", /multiplication sign/],
    ["too many characters", `1+${"0".repeat(1000)}1`, /at most 1000/],
    ["too many nodes", Array(150).fill("u").join("+"), /more than 200/],
    ["too deep", `${"sin(".repeat(40)}u${")".repeat(40)}`, /32 levels/],
    ["too deep by signs", `${"-".repeat(800)}u`, /32 levels/],
    ["too fast", "2+sin(1e6*u)", /too fast/],
    ["the evaluator's own names", "import(u)", /unknown function "import"/],
    ["a global name", "globalThis", /unknown name/],
  ])("%s", (_, value, pattern) => expectComplaint(expression(value), pointer, pattern));

  it("a value that is no text", () => expectComplaint(expression(5), pointer, /must be a string/));

  it("is allowed to be zero in a part of the section", () => {
    const request = expression("max(0, u-0.5)", "thickness");
    const { resistance } = computeResistance(request, { material: libraryMaterial });
    // ∫(u − ½)₊ du = 1/8 over a section of 1e-5 m² and a length of 1 m.
    expect(resistance.value).toBeCloseTo(8e5, 4);
  });
});

describe("whatever arrives", () => {
  const anything = fc.anything({ maxDepth: 3, withBigInt: true, withDate: true, withNullPrototype: true });
  const context = { material: libraryMaterial };

  function mustRefuseOrAnswer(request: unknown): void {
    try {
      const { resistance } = computeResistance(request, context);
      expect(resistance.lower).toBeLessThan(resistance.upper);
      expect(Number.isFinite(resistance.value)).toBe(true);
    } catch (error) {
      expect(error).toBeInstanceOf(InputError);
      expect(error).not.toBeInstanceOf(CheckFailure);
      for (const { pointer, detail } of (error as InputError).errors) {
        expect(pointer.startsWith("#")).toBe(true);
        expect(detail.length).toBeGreaterThan(5);
      }
    }
  }

  it("random bodies are refused", () => {
    fc.assert(fc.property(anything, mustRefuseOrAnswer), { seed: 11, numRuns: 500 });
  });

  it("random members in a good body are refused or answered", () => {
    const path = fc.constantFrom(
      "shape",
      "dimensions",
      "medium",
      "operating",
      "include",
      "requirement",
      "record",
      "media",
    );
    fc.assert(
      fc.property(path, anything, (name, value) => mustRefuseOrAnswer({ ...good, [name]: value })),
      { seed: 12, numRuns: 500 },
    );
  });

  it("random profiles are refused or answered", () => {
    const number = fc.oneof(
      fc.double({ noNaN: false }),
      fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
      fc.constantFrom<unknown>(0, -1, "1 mm", "5 kg", null, 1e300),
    );
    const kind = fc.constantFrom(
      "constant",
      "linear",
      "exponential",
      "power",
      "gaussian",
      "complementary-error",
      "table",
      "dopant",
    );
    const profile = fc.record(
      {
        kind,
        value: number,
        from: fc.oneof(number, fc.constantFrom("start", "end")),
        to: number,
        reference: number,
        at: number,
        exponent: number,
        peak: number,
        center: number,
        spread: number,
        surface: number,
        length: number,
        background: number,
        positions: fc.array(number, { maxLength: 5 }),
        values: fc.array(number, { maxLength: 5 }),
        type: fc.constantFrom("n", "p"),
        profile: fc.record({ kind: fc.constant("constant"), value: number }),
      },
      { requiredKeys: ["kind"] },
    );
    const members: Record<string, readonly string[]> = {
      constant: ["value"],
      linear: ["from", "to"],
      exponential: ["from", "to"],
      power: ["reference", "at", "exponent"],
      gaussian: ["peak", "center", "spread", "background"],
      "complementary-error": ["surface", "length", "background", "from"],
      table: ["positions", "values"],
      dopant: ["type", "profile"],
    };
    fc.assert(
      fc.property(profile, fc.constantFrom("length", "thickness"), (raw, coordinate) => {
        const source = raw as Record<string, unknown>;
        const kept = Object.fromEntries(["kind", ...members[raw.kind]].map((name) => [name, source[name]]));
        mustRefuseOrAnswer(inBar({ coordinate, quantity: "conductivity", profile: kept }));
      }),
      { seed: 13, numRuns: 600 },
    );
  });
});
