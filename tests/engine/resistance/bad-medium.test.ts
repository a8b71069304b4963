/** Graded media and expressions: every way to be wrong has its own pointer and sentence. */
import { describe, expect, it } from "vitest";
import { catalogue, computeResistance, libraryMaterial } from "@/lib/engine";
import { expectComplaint } from "../../support/complaint";

const bar = { shape: "bar", dimensions: { length: 1, width: 0.01, thickness: 0.001 } };
const inBar = (graded: Record<string, unknown>): Record<string, unknown> => ({ ...bar, medium: { graded } });
const expression = (value: unknown, coordinate = "length"): Record<string, unknown> =>
  inBar({ coordinate, quantity: "conductivity", profile: { kind: "expression", value } });

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
    [
      "an unknown member",
      profile({ kind: "constant", value: 1, colour: 1 }),
      at("/colour"),
      /is not known here/,
    ],
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
    ["no layers", profile({ kind: "layers", layers: [] }), at("/layers"), /must not be empty/],
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

  it("a value that is no text", () => expectComplaint(expression(5), pointer, /must be a text/));

  it("is allowed to be zero in a part of the section", () => {
    const request = expression("max(0, u-0.5)", "thickness");
    const { resistance } = computeResistance(request, { material: libraryMaterial });
    // ∫(u − ½)₊ du = 1/8 over a section of 1e-5 m² and a length of 1 m.
    expect(resistance.value).toBeCloseTo(8e5, 4);
  });
});
