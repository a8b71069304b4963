import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue({ team: "busbar" }).key;
});
afterAll(() => server.stop());

const width = {
  shape: "bar",
  dimensions: { length: "1 m", thickness: "10 mm" },
  medium: { resistivity: 1.7e-8 },
  solveFor: "width",
  target: "34 uohm",
} as const;
const size = (over: object, as = key) =>
  call(server, "post", "/sizing", { key: as, body: { ...width, ...over } });

describe("POST /sizing", () => {
  test("200 the width that gives the target", async () => {
    const { status, body } = await size({ within: ["1 mm", "200 mm"] });
    expect(status).toBe(200);
    expect(body.solutions).toHaveLength(1);
    const [{ dimension, resistance, sensitivity, exact }] = body.solutions;
    expect(Math.abs(dimension.value / 0.05 - 1)).toBeLessThan(1e-12);
    expect(dimension).toMatchObject({ unit: "m", text: "50\u2009mm" });
    expect(Math.abs(resistance.value / 34e-6 - 1)).toBeLessThan(1e-12);
    expect(resistance.lower).toBeLessThan(resistance.upper);
    expect(sensitivity / (-34e-6 / 0.05)).toBeCloseTo(1, 8);
    expect(exact).toBe(true);
    expect(body.within.map(({ value }: { value: number }) => value)).toEqual([0.001, 0.2]);
  });

  test("200 by a twin, a default and an alternative, in their own units", async () => {
    const shell = {
      shape: "cylindrical-shell",
      dimensions: { innerRadius: "2 mm", length: "1 m" },
      medium: { conductivity: 1 },
    };
    for (const [solveFor, given, target, expected] of [
      ["outerDiameter", {}, Math.log(2.5) / (2 * Math.PI), 0.01],
      ["wall", {}, Math.log(2.5) / (2 * Math.PI), 0.003],
      ["angle", { outerRadius: "5 mm" }, Math.log(2.5) / (Math.PI / 2), 90],
    ] as const) {
      const dimensions = { ...shell.dimensions, ...given };
      const { body } = await size({ ...shell, dimensions, solveFor, target });
      expect(Math.abs(body.solutions[0].dimension.value / expected - 1)).toBeLessThan(1e-11);
    }
  });

  test("200 whole numbers on either side", async () => {
    const { body } = await size({
      shape: "stranded-conductor",
      dimensions: { length: "1 km", strandDiameter: "0.4 mm" },
      medium: { resistivity: 1.7e-8 },
      solveFor: "strands",
      target: "3 ohm",
    });
    const found = body.solutions.map((entry: { dimension: { value: number }; exact: boolean }) => [
      entry.dimension.value,
      entry.exact,
    ]);
    expect(found).toHaveLength(2);
    expect(found[1][0] - found[0][0]).toBe(1);
    expect(found.every(([, exact]: [number, boolean]) => !exact)).toBe(true);
    expect(body.solutions[0].resistance.value).toBeGreaterThan(3);
    expect(body.solutions[1].resistance.value).toBeLessThan(3);
  });

  test("200 at the most whole number that is admitted, the sensitivity is what the last one changed", async () => {
    const resistanceOf = async (strands: number) =>
      (
        await call(server, "post", "/resistance", {
          key,
          body: {
            shape: "stranded-conductor",
            dimensions: { length: "1 km", strandDiameter: "0.4 mm", strands },
            medium: { resistivity: 1.7e-8 },
          },
        })
      ).body.resistance.value as number;
    const [last, before] = [await resistanceOf(1_000_000), await resistanceOf(999_999)];
    const { body } = await size({
      shape: "stranded-conductor",
      dimensions: { length: "1 km", strandDiameter: "0.4 mm" },
      medium: { resistivity: 1.7e-8 },
      solveFor: "strands",
      target: last,
    });
    expect(body.solutions[0].dimension.value).toBe(1_000_000);
    expect(body.solutions[0].sensitivity / (last - before)).toBeCloseTo(1, 6);
  });

  test("200 with tolerances, requirement and steps as any request", async () => {
    const { body } = await size({
      dimensions: { length: { value: "1 m", tolerance: "1 %" }, thickness: "10 mm" },
      requirement: { max: "40 uohm" },
      uncertainty: { method: "worst-case" },
      include: ["steps"],
    });
    const [solution] = body.solutions;
    expect(solution).toMatchObject({ verdict: "met", uncertainty: { method: "worst-case" } });
    expect(solution.steps.length).toBeGreaterThan(3);
  });

  test("200 stored and replayed to the last bit", async () => {
    const { body, headers } = await size({ record: { label: "Width" } });
    expect(headers.location).toBe(body.record.url);
    const stored = await call(server, "get", `/records/${body.record.id}`, { key });
    expect(stored.body).toMatchObject({ operation: "sizing", label: "Width", request: width });
    const replay = await call(server, "post", `/records/${body.record.id}/replay`, { key });
    expect(replay.status).toBe(200);
    expect(replay.body).toMatchObject({ drift: 0, identical: true });
  });

  test.each<[string, object, string, RegExp]>([
    [
      "no solution: the resistances at both ends",
      { within: ["1 mm", "2 mm"] },
      "#/target",
      /1.7 mΩ at width = 1 mm and 850 µΩ at width = 2 mm/,
    ],
    ["no target", { target: undefined }, "#/target", /required|must be/],
    ["a target of the wrong kind", { target: "5 kg" }, "#/target", /resistance/],
    ["a target of 0", { target: 0 }, "#/target", /greater than 0/],
    ["an unknown dimension", { solveFor: "widht" }, "#/solveFor", /width/],
    [
      "the dimension given as well",
      { dimensions: { ...width.dimensions, width: 1 } },
      "#/dimensions/width",
      /left out/,
    ],
    ["another one missing", { dimensions: { length: 1 } }, "#/dimensions/thickness", /required/],
    ["a range the wrong way round", { within: ["2 mm", "1 mm"] }, "#/within/1", /greater/],
    ["a range from 0", { within: [0, "1 mm"] }, "#/within/0", /greater than 0/],
    ["a range of three", { within: [1, 2, 3] }, "#/within", /2/],
    ["an unknown member", { sovleFor: "width" }, "#/sovleFor", /not/],
    ["no medium", { medium: undefined }, "#/medium", /required/],
    [
      "a choice",
      {
        shape: "sheet-step",
        dimensions: { length1: 1, width1: 1, length2: 1, width2: 0.5 },
        medium: { sheetResistance: 1 },
        solveFor: "alignment",
      },
      "#/solveFor",
      /choice/,
    ],
    [
      "a range that the shape does not admit",
      {
        shape: "cylindrical-shell",
        dimensions: { innerRadius: "5 mm", length: 1 },
        solveFor: "outerRadius",
        within: ["1 mm", "4 mm"],
      },
      "#/within",
      /greater than inner/,
    ],
  ])("422 %s", async (_, over, pointer, pattern) => {
    const response = await size(over);
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toContain(pointer);
    const details = response.body.errors.map(({ detail }: { detail: string }) =>
      detail.replaceAll("\u2009", " "),
    );
    expect(details.join(" ")).toMatch(pattern);
  });

  test("401, 403 and 422 of a body that is no object", async () => {
    expectProblem(await call(server, "post", "/sizing", { body: width }), 401, "missing-credentials");
    const reader = server.issue({ scopes: ["records:read"] }).key;
    expectProblem(await size({}, reader), 403, "insufficient-scope");
    expectProblem(await call(server, "post", "/sizing", { key, body: [1] }), 422, "invalid-input");
  });
});
