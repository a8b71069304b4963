import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "@/lib/engine";
import { call, expectProblem, places, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue().key;
});
afterAll(() => server.stop());

const compute = (body: unknown) => call(server, "post", "/resistance", { key, body });

describe("POST /resistance 200", () => {
  test("a uniform sleeve, with bounds around the logarithmic law", async () => {
    const response = await compute({ ...SLEEVE, operating: { temperature: "75 degC", voltage: "500 V" } });
    expect(response.status).toBe(200);
    const { resistance, conductance, operating } = response.body;
    // ρ·ln(b/a)/(2πL), common practice
    const exact = (1e12 * Math.log(2.5)) / (2 * Math.PI);
    expect(Math.abs(resistance.value / exact - 1)).toBeLessThan(1e-13);
    expect(resistance.lower).toBeLessThan(resistance.value);
    expect(resistance.upper).toBeGreaterThan(resistance.value);
    expect(resistance).toMatchObject({ unit: "ohm", boundsBasis: "rounding", proved: true });
    expect(resistance.text).toMatch(/GΩ$/);
    expect(conductance).toMatchObject({ unit: "siemens" });
    expect(conductance.value * resistance.value).toBeCloseTo(1, 12);
    expect(operating).toMatchObject({ temperature: 75, voltage: 500 });
    expect(operating.current / (500 / resistance.value)).toBeCloseTo(1, 12);
    expect(response.body).toMatchObject({
      method: "closed-form",
      engine: ENGINE_VERSION,
      catalogue: CATALOGUE_VERSION,
    });
    expect(response.headers["cache-control"]).toBe("no-store");
    expect(response.body).not.toHaveProperty("record");
  });

  test("checks come by default, and what `include` names instead", async () => {
    const standard = await compute(SLEEVE);
    expect(standard.body.checks.map(({ name }: { name: string }) => name)).toEqual(
      expect.arrayContaining(["voltage-independence", "current-continuity", "second-route"]),
    );
    expect(standard.body).not.toHaveProperty("steps");
    const more = await compute({ ...SLEEVE, include: ["steps", "profile", "peak"] });
    expect(more.body.steps.length).toBeGreaterThan(3);
    expect(more.body.profile.position).toHaveLength(101);
    expect(more.body.peak.field.value).toBeGreaterThan(0);
    expect(more.body).not.toHaveProperty("checks");
  });

  test("a conductivity that falls exponentially along the radius", async () => {
    const profile = { kind: "exponential", from: 1e-12, to: 1e-13 };
    const medium = { graded: { coordinate: "radius", quantity: "conductivity", profile } };
    const response = await compute({ ...SLEEVE, medium });
    expect(response.status).toBe(200);
    expect(response.body.resistance.value).toBeGreaterThan((1e12 * Math.log(2.5)) / (2 * Math.PI));
  });

  test("a team's material and one of the library", async () => {
    const copper = await compute({ ...SLEEVE, medium: { material: "copper-annealed" } });
    expect(copper.status).toBe(200);
    expect(copper.body.materials).toEqual([expect.objectContaining({ id: "copper-annealed", version: 1 })]);
  });
});

describe("POST /resistance 422", () => {
  const refused = async (body: unknown, ...pointers: string[]) => {
    const response = await compute(body);
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toEqual(pointers);
    return response.body.errors.map(({ detail }: { detail: string }) => detail).join(" | ");
  };
  const dimensions = (over: object) => ({ ...SLEEVE, dimensions: { ...SLEEVE.dimensions, ...over } });
  const graded = (profile: unknown, over: object = {}) => ({
    ...SLEEVE,
    medium: { graded: { coordinate: "radius", quantity: "conductivity", profile, ...over } },
  });

  test("an unknown shape, with the nearest names", async () => {
    expect(await refused({ ...SLEEVE, shape: "cylindrical-shel" }, "#/shape")).toContain("cylindrical-shell");
  });
  test("an unknown dimension, with the nearest names", async () => {
    expect(await refused(dimensions({ lenght: 1 }), "#/dimensions/lenght")).toContain("length");
  });
  test("a missing dimension at its would-be place", async () => {
    const { length: _, ...rest } = SLEEVE.dimensions;
    await refused({ ...SLEEVE, dimensions: rest }, "#/dimensions/length");
  });
  test("both of an alternative", async () => {
    const response = await compute(dimensions({ wall: "3 mm" }));
    expectProblem(response, 422, "invalid-input");
    expect(places(response).some((place) => /wall|outerRadius/.test(place))).toBe(true);
  });
  test("none of an alternative", async () => {
    const response = await compute({ ...SLEEVE, dimensions: { innerRadius: 1, length: 1 } });
    expectProblem(response, 422, "invalid-input");
    expect(places(response).some((place) => /outerRadius|wall/.test(place))).toBe(true);
  });
  test("a unit of the wrong dimension", async () => {
    expect(await refused(dimensions({ length: "5 kg" }), "#/dimensions/length")).toMatch(/length/);
  });
  test.each([
    ["zero", 0],
    ["negative", -1],
    ["NaN", "NaN"],
    ["Infinity", "Infinity"],
    ["1e400 as text", "1e400 m"],
    ["a thousands separator", "1,000 mm"],
    ["a decimal comma", "2,5 mm"],
    ["null", null],
    ["true", true],
    ["an array", [1]],
    ["an empty text", ""],
    ["a text of 10,000 characters", "1".repeat(10_000)],
  ])("%s", async (_, length) => {
    await refused(dimensions({ length }), "#/dimensions/length");
  });
  test("1e400 as a number", async () => {
    const body = JSON.stringify(SLEEVE).replace('"1 m"', "1e400");
    await refused(body, "#/dimensions/length");
  });
  test("inner ≥ outer", async () => {
    const response = await compute(dimensions({ innerRadius: "5 mm" }));
    expectProblem(response, 422, "invalid-input");
    expect(places(response)[0]).toMatch(/^#\/dimensions\/(innerRadius|outerRadius)$/);
  });
  test("two media", async () => {
    const response = await compute({ ...SLEEVE, medium: { conductivity: 1, resistivity: 1 } });
    expectProblem(response, 422, "invalid-input");
    expect(places(response)[0]).toMatch(/^#\/medium/);
  });
  test("no medium", async () => {
    await refused({ ...SLEEVE, medium: undefined }, "#/medium");
    await refused({ ...SLEEVE, medium: {} }, "#/medium");
  });
  test("a material that is not known", async () => {
    await refused({ ...SLEEVE, medium: { material: "unobtainium" } }, "#/medium/material");
  });
  test("a coordinate that the shape lacks", async () => {
    const profile = { kind: "linear", from: 1, to: 2 };
    await refused(graded(profile, { coordinate: "thickness" }), "#/medium/graded/coordinate");
  });
  test("layers that do not add up", async () => {
    const layers = [
      { thickness: "1 mm", value: 1 },
      { thickness: "1 mm", value: 2 },
    ];
    const response = await compute(graded({ kind: "layers", layers }));
    expectProblem(response, 422, "invalid-input");
    expect(places(response)[0]).toMatch(/^#\/medium\/graded\/profile\/layers/);
  });
  test("a table that does not cover the range", async () => {
    const response = await compute(
      graded({ kind: "table", positions: ["2 mm", "4 mm"], values: [1, 2], interpolation: "linear" }),
    );
    expectProblem(response, 422, "invalid-input");
    expect(places(response)[0]).toMatch(/^#\/medium\/graded\/profile\/positions/);
  });
  test("a table that is not increasing", async () => {
    const positions = ["2 mm", "4 mm", "3 mm", "5 mm"];
    const response = await compute(
      graded({ kind: "table", positions, values: [1, 2, 3, 4], interpolation: "linear" }),
    );
    expectProblem(response, 422, "invalid-input");
    expect(places(response)[0]).toMatch(/^#\/medium\/graded\/profile\/positions/);
  });
  test.each([
    ["syntax", "1 +"],
    ["an unknown name", "1 + foo"],
    ["property access", "s.constructor"],
    ["property access by index", 's["constructor"]'],
    ["a function definition", "f(x) = x"],
    ["an assignment", "s = 1"],
    ["a string", '"abc"'],
    ["a matrix", "[1, 2]"],
    ["a complex value", "sqrt(-1)"],
    ["an imaginary unit", "1 + i"],
    ["a non-finite value", "1/0"],
    ["a negative value", "-1"],
    ["too many characters", `1${"+1".repeat(600)}`],
    ["too many nodes", `1${"+1".repeat(300)}`],
    ["too deep", `${"(".repeat(60)}1${")".repeat(60)}+abs(${"abs(".repeat(40)}1${")".repeat(41)}`],
    ["an import", "import(1)"],
    ["a call of a call", "exp(1)(2)"],
    ["implicit multiplication", "2 s"],
    ["a block", "1; 2"],
    ["a unit", "5 mm"],
    ["a factorial", "1000000!"],
  ])("an expression: %s", async (_, value) => {
    const response = await compute(graded({ kind: "expression", value }));
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toEqual(["#/medium/graded/profile/value"]);
  });
  test("σ zero along the flow", async () => {
    const response = await compute(graded({ kind: "linear", from: 0, to: 1 }));
    expectProblem(response, 422, "invalid-input");
    expect(places(response)[0]).toMatch(/^#\/medium\/graded\/profile/);
  });
  test("unknown members, wherever they stand", async () => {
    await refused({ ...SLEEVE, colour: "red" }, "#/colour");
    await refused({ ...SLEEVE, operating: { volts: 5 } }, "#/operating/volts");
    await refused({ ...SLEEVE, medium: { conductivity: 1, colour: 2 } }, "#/medium/colour");
    await refused(`{"__proto__":1,${JSON.stringify(SLEEVE).slice(1)}`, "#/__proto__");
  });
  test.each([
    ["an array", []],
    ["a text", '"abc"'],
    ["a number", "5"],
    ["null", "null"],
  ])("%s for an object", async (_, body) => {
    const response = await compute(body);
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toEqual(["#"]);
  });
  test("several mistakes at once", async () => {
    const response = await compute({
      ...SLEEVE,
      dimensions: { innerRadius: "5 kg", outerRadius: -1, length: "x" },
    });
    expect(places(response).sort()).toEqual([
      "#/dimensions/innerRadius",
      "#/dimensions/length",
      "#/dimensions/outerRadius",
    ]);
  });
  test("two drives, a wrong include, an empty label", async () => {
    const response = await compute({ ...SLEEVE, operating: { voltage: 1, current: 1 } });
    expectProblem(response, 422, "invalid-input");
    expect(places(response)[0]).toMatch(/^#\/operating/);
    await refused({ ...SLEEVE, include: ["stepz"] }, "#/include/0");
    await refused({ ...SLEEVE, record: { label: "" } }, "#/record/label");
    await refused({ ...SLEEVE, record: {} }, "#/record/label");
  });
  test("a result that a double cannot hold", async () => {
    const response = await compute({ ...dimensions({ length: 1e-300 }), medium: { conductivity: 1e-300 } });
    expectProblem(response, 422, "invalid-input");
  });
  test("no answer is NaN, none takes long", async () => {
    const ugly = [
      {},
      { shape: {} },
      { shape: "bar", dimensions: [] },
      { shape: "bar", dimensions: {}, medium: [] },
    ];
    for (const body of ugly) expectProblem(await compute(body), 422, "invalid-input");
  });
});
