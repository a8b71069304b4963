import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { BEND, type Point, polygon, rectangle, STRIP } from "../support/field";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  ({ key } = server.issue({ team: "thin-film" }));
});
afterAll(() => server.stop());

const { outline, terminals, medium } = BEND;
const [input, output] = terminals;
const on = (...segments: Point[][]) => ({ name: "out", segments });
const outer = (...points: unknown[]) => ({ ...BEND, outline: { ...outline, outer: points } });
const holes = (...rings: Point[][]) => ({
  ...STRIP,
  outline: { ...STRIP.outline, holes: rings },
});
const regions = (...rings: Point[][]) => ({
  ...STRIP,
  medium: { sheetResistance: 1, regions: rings.map((ring) => ({ ring, medium: { sheetResistance: 2 } })) },
});

/** What is wrong, the body, where one of the complaints points, and what it says. */
const REFUSED: [string, object, string, RegExp][] = [
  ["crossing edges", outer([0, 0], [4, 4], [4, 0], [0, 4]), "#/outline/outer/2", /cross at \(2, 2\)/],
  ["two points", outer([0, 0], [4, 0]), "#/outline/outer", /2 points; a ring needs at least three/],
  ["no points", outer(), "#/outline/outer", /0 points/],
  ["no area", outer([0, 0], [1, 1], [3, 3]), "#/outline/outer", /encloses no area/],
  [
    "a spike",
    outer([0, 0], [4, 0], [4, 4], [7, 4], [4, 4], [0, 4]),
    "#/outline/outer/3",
    /goes to \(7, 4\) and comes back/,
  ],
  ["a hole outside", holes(rectangle(20, 0, 21, 1)), "#/outline/holes/0", /lies outside the outer ring/],
  [
    "a hole that touches",
    holes(rectangle(4, 0, 5, 1)),
    "#/outline/holes/0",
    /touches edge 0 of the outer ring/,
  ],
  ["a hole across the edge", holes(rectangle(4, -1, 5, 1)), "#/outline/holes/0", /crosses edge 0/],
  [
    "holes that overlap",
    holes(rectangle(3, 0.5, 5, 1.5), rectangle(4, 0.6, 6, 1.4)),
    "#/outline/holes/1",
    /of hole 1 crosses edge \d of hole 0/,
  ],
  [
    "a hole in a hole",
    holes(rectangle(3, 0.5, 6, 1.5), rectangle(4, 0.8, 5, 1.2)),
    "#/outline/holes/1",
    /inside hole 0/,
  ],
  [
    "a terminal off the boundary",
    {
      ...BEND,
      terminals: [
        input,
        on([
          [1.1, 4.2],
          [0, 4],
        ]),
      ],
    },
    "#/terminals/1/segments/0/0",
    /nearest point of the boundary is \(1, 4\)/,
  ],
  [
    "a terminal inside",
    {
      ...BEND,
      terminals: [
        input,
        on([
          [0.5, 3.5],
          [0, 4],
        ]),
      ],
    },
    "#/terminals/1/segments/0/0",
    /lies inside the conductor/,
  ],
  [
    "terminals that overlap",
    {
      ...BEND,
      terminals: [
        input,
        on([
          [4, 0.5],
          [4, 1],
        ]),
      ],
    },
    "#/terminals/1",
    /overlap.*resistance.*zero/is,
  ],
  [
    "terminals that touch",
    {
      ...BEND,
      terminals: [
        input,
        on([
          [4, 1],
          [1, 1],
        ]),
      ],
    },
    "#/terminals/1",
    /(touch|meet|share).*zero/is,
  ],
  ["one terminal", { ...BEND, terminals: [input] }, "#/terminals", /at least two/],
  ["no terminal", { ...BEND, terminals: [] }, "#/terminals", /at least two/],
  ["terminals left out", { outline, medium }, "#/terminals", /required/],
  [
    "repeated names",
    { ...BEND, terminals: [input, { ...output, name: "in" }] },
    "#/terminals/1/name",
    /must differ/,
  ],
  ["an empty name", { ...BEND, terminals: [input, { ...output, name: " " }] }, "#/terminals/1/name", /./],
  ["no segments", { ...BEND, terminals: [input, on()] }, "#/terminals/1/segments", /names no piece/],
  [
    "an empty segment",
    {
      ...BEND,
      terminals: [
        input,
        on([
          [1, 4],
          [1, 4],
        ]),
      ],
    },
    "#/terminals/1/segments/0",
    /no length/,
  ],
  [
    "an edge that is not there",
    { ...BEND, terminals: [input, { name: "out", parts: [{ ring: 0, edge: 6 }] }] },
    "#/terminals/1/parts/0/edge",
    /its edges are 0 to 5/,
  ],
  [
    "a ring that is not there",
    { ...BEND, terminals: [input, { name: "out", parts: [{ ring: 1, edge: 0 }] }] },
    "#/terminals/1/parts/0/ring",
    /no ring 1/,
  ],
  [
    "more than 50,000 vertices",
    { ...BEND, outline: { outer: polygon(0, 0, 1, 50_001) } },
    "#/outline",
    /50001 vertices/,
  ],
  ["a coordinate out of range", outer([0, 0], [4, 0], [4, 1e16]), "#/outline/outer/2", /too far out/],
  [
    "an outline too small",
    { ...BEND, outline: { unit: "nm", outer: rectangle(0, 0, 1e-4, 1e-4) } },
    "#/outline/outer",
    /1e-12 m/,
  ],
  ["a coordinate that is a text", outer([0, 0], [4, "0"], [4, 4]), "#/outline/outer/1", /./],
  ["an unknown unit", { ...BEND, outline: { ...outline, unit: "furlong" } }, "#/outline/unit", /mm/],
  ["an unknown member", { ...BEND, outline: { ...outline, colour: "red" } }, "#/outline/colour", /./],
  ["an unknown member of the body", { ...BEND, accurcy: 1e-3 }, "#/accurcy", /./],
  [
    "no sheet resistance",
    { ...BEND, medium: { sheetResistance: 0 } },
    "#/medium/sheetResistance",
    /greater than 0|positive/,
  ],
  [
    "a negative one",
    { ...BEND, medium: { sheetResistance: -5 } },
    "#/medium/sheetResistance",
    /greater than 0|positive/,
  ],
  ["a wrong dimension", { ...BEND, medium: { sheetResistance: "5 kg" } }, "#/medium/sheetResistance", /./],
  [
    "a resistivity without a thickness",
    { ...BEND, medium: { resistivity: 1e-8 } },
    "#/medium/thickness",
    /required/,
  ],
  [
    "an unknown material",
    { ...BEND, medium: { material: "unobtainium", thickness: "1 mm" } },
    "#/medium/material",
    /unobtainium/,
  ],
  ["no medium", { outline, terminals }, "#/medium", /required/],
  ["an empty medium", { ...BEND, medium: {} }, "#/medium", /./],
  ["two media", { ...BEND, medium: { sheetResistance: 1, resistivity: 1 } }, "#/medium", /exactly one/],
  ["neither outline nor outlineId", { terminals, medium }, "#/outline", /neither/],
  ["both", { ...BEND, outlineId: "out_1" }, "#/outlineId", /both/],
  ["an unknown outlineId", { outlineId: "out_0", terminals, medium }, "#/outlineId", /no stored outline/],
  ["an accuracy too fine", { ...BEND, accuracy: 1e-9 }, "#/accuracy", /1e-8/],
  ["an accuracy too coarse", { ...BEND, accuracy: 0.1 }, "#/accuracy", /0\.01|1e-2/],
  ["an accuracy that is a text", { ...BEND, accuracy: "fine" }, "#/accuracy", /number/],
  ["two operating points", { ...BEND, operating: { voltage: 1, current: 1 } }, "#/operating", /one of/],
  [
    "an expression that is none",
    { ...BEND, medium: { expression: "5e7*", quantity: "conductivity", thickness: 1 } },
    "#/medium/expression",
    /./,
  ],
  [
    "an expression with another variable",
    { ...BEND, medium: { expression: "5e7*z", quantity: "conductivity", thickness: 1 } },
    "#/medium/expression",
    /z/,
  ],
  [
    "an expression that is negative somewhere",
    { ...BEND, medium: { expression: "x-0.002", quantity: "conductivity", thickness: 1 } },
    "#/medium/expression",
    /at x = .* m, y = .* m/,
  ],
  [
    "an expression of no quantity",
    { ...BEND, medium: { expression: "1", thickness: 1 } },
    "#/medium/quantity",
    /required/,
  ],
  [
    "an expression without a thickness",
    { ...BEND, medium: { expression: "1", quantity: "conductivity" } },
    "#/medium/thickness",
    /required/,
  ],
  [
    "regions that overlap",
    regions(rectangle(1, 0, 3, 2), rectangle(2, 0, 4, 2)),
    "#/medium/regions/1/ring",
    /overlap/,
  ],
  ["a region outside", regions(rectangle(9, 0, 11, 2)), "#/medium/regions/0/ring", /./],
  [
    "a region of no area",
    regions([
      [1, 1],
      [2, 1],
      [3, 1],
    ]),
    "#/medium/regions/0/ring",
    /no area/,
  ],
  [
    "a region of no medium",
    { ...STRIP, medium: { sheetResistance: 1, regions: [{ ring: rectangle(1, 0, 2, 2), medium: {} }] } },
    "#/medium/regions/0/medium",
    /./,
  ],
  [
    "a region that is no conductor",
    {
      ...STRIP,
      medium: {
        sheetResistance: 1,
        regions: [{ ring: rectangle(1, 0, 2, 2), medium: { sheetResistance: 0 } }],
      },
    },
    "#/medium/regions/0/medium/sheetResistance",
    /./,
  ],
  [
    "a negative radius",
    {
      ...STRIP,
      outline: { outer: rectangle(-1, 0, 1, 2), symmetry: "axisymmetric" },
      medium: { resistivity: 1 },
    },
    "#/outline/outer/0",
    /radius/,
  ],
  [
    "a thickness of an axisymmetric body",
    {
      outline: { unit: "mm", outer: rectangle(0, 0, 1, 2), symmetry: "axisymmetric" },
      terminals: [
        { name: "a", parts: [{ ring: 0, edge: 0 }] },
        { name: "b", parts: [{ ring: 0, edge: 2 }] },
      ],
      medium: { resistivity: 1, thickness: "1 mm" },
    },
    "#/medium/thickness",
    /./,
  ],
  ["a record without a label", { ...BEND, record: {} }, "#/record/label", /required/],
  ["a list", [], "#", /./],
];

describe("POST /fields 422", () => {
  test.each(REFUSED)("%s", async (_, body, pointer, pattern) => {
    const response = await call(server, "post", "/fields", { key, body });
    expectProblem(response, 422, "invalid-input");
    const found: { pointer: string; detail: string }[] = response.body.errors;
    const match = found.find(
      (complaint) =>
        (complaint.pointer === pointer || complaint.pointer.startsWith(`${pointer}/`)) &&
        pattern.test(complaint.detail.replaceAll("\u2009", " ")),
    );
    expect(match, JSON.stringify(found)).toBeDefined();
    for (const { detail } of found) expect(detail).not.toMatch(/NaN|undefined|\[object/);
  });

  test("every complaint at once, nothing stored and nothing charged", async () => {
    const { key: fresh } = server.issue({ quotas: { minute: 100, month: 100 } });
    const body = { outline: { ...outline, unit: "ell" }, terminals: [input], medium: {}, accuracy: 7 };
    const response = await call(server, "post", "/fields", { key: fresh, body });
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toEqual(expect.arrayContaining(["#/outline/unit", "#/accuracy", "#/medium"]));
    const { body: usage } = await call(server, "get", "/usage", { key: fresh });
    expect(usage.month.remaining).toBe(100);
  });
});

describe("what is no body", () => {
  const post = (body: unknown, headers: Record<string, string> = {}) =>
    call(server, "post", "/fields", { key, body, headers });

  test("400 unparsable, 413 too large, 415 another type, 405 another method", async () => {
    expectProblem(await post("{"), 400, "malformed-json");
    expectProblem(await post(`"${"x".repeat(10_000_001)}"`), 413, "body-too-large");
    expectProblem(await post("x", { "Content-Type": "text/plain" }), 415, "unsupported-media-type");
    const multipart = await post("--x--", { "Content-Type": "multipart/form-data; boundary=x" });
    expectProblem(multipart, 415, "unsupported-media-type");
    expectProblem(await call(server, "patch", "/fields", { key, body: {} }), 405, "method-not-allowed");
  });

  test("a body of some megabytes is taken", async () => {
    const response = await post({ ...BEND, outline: { outer: polygon(0, 0, 1, 49_999) }, terminals: [] });
    expect([response.status, places(response)]).toEqual([422, ["#/terminals"]]);
  });
});

describe("who may", () => {
  test("401 without a key, 403 without the scope", async () => {
    expectProblem(await call(server, "post", "/fields", { body: BEND }), 401, "missing-credentials");
    const { key: other } = server.issue({ scopes: ["compute"] });
    for (const [method, path] of [
      ["post", "/fields"],
      ["get", "/fields/fld_0"],
      ["delete", "/fields/fld_0"],
      ["get", "/fields/fld_0/map.json"],
      ["get", "/fields/fld_0/plot.svg"],
      ["get", "/fields/fld_0/line?from=0,0&to=1,1"],
      ["get", "/fields/fld_0/events"],
      ["post", "/outlines"],
      ["get", "/outlines/out_0"],
    ] as const) {
      const body = method === "post" ? BEND : undefined;
      const refused = await call(server, method, path, { key: other, body });
      expectProblem(refused, 403, "insufficient-scope");
      expect(refused.headers["www-authenticate"]).toContain('scope="field"');
    }
  });
});
