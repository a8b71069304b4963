/** Body, dimensions, medium and operating point: every way to be wrong has its own pointer and sentence. */
import { describe, expect, it } from "vitest";
import { expectComplaint } from "../../support/complaint";
import { complaints } from "../../support/compute";

const good = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
};
describe("the body", () => {
  it.each<[string, unknown, string, RegExp]>([
    ["an array", [], "#", /must be an object/],
    ["null", null, "#", /must be an object/],
    ["a text", "bar", "#", /must be an object/],
    ["no shape", { ...good, shape: undefined }, "#/shape", /required/],
    ["a shape that is a number", { ...good, shape: 7 }, "#/shape", /must be a text/],
    ["an unknown shape", { ...good, shape: "cylinder-shell" }, "#/shape", /"cylindrical-shell"/],
    ["an unknown member", { ...good, colour: "red" }, "#/colour", /known are shape, dimensions, medium/],
    ["a member misspelt", { ...good, operatin: {} }, "#/operatin", /Did you mean "operating"/],
    [
      "an unknown method of uncertainty",
      { ...good, uncertainty: { method: "guess" } },
      "#/uncertainty/method",
      /propagation.*worst-case.*monte-carlo/,
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
    [
      "a tolerance without a value",
      dims({ length: { tolerance: "1 %" } }),
      "#/dimensions/length",
      /tolerance/,
    ],
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
    [
      "an unknown member",
      medium({ conductivity: 1, colour: 2 }),
      "#/medium/colour",
      /known are material, extrapolate/,
    ],
    ["an unknown material", medium({ material: "unobtainium" }), "#/medium/material", /no material/],
    [
      "a material without its state",
      medium({ material: "copper" }),
      "#/medium/material",
      /Did you mean .*"copper-annealed"/,
    ],
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
    ["an unknown member", { volts: 1 }, "#/operating/volts", /known are temperature, voltage/],
    ["a current that overflows the power", { current: 1e200 }, "#/operating/current", /cannot hold/],
  ])("%s", (_, operating, pointer, pattern) => expectComplaint({ ...good, operating }, pointer, pattern));
});
