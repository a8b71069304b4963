import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue({ team: "thin-film" }).key;
});
afterAll(() => server.stop());

/** A strip 40 long and 10 wide between its short ends: R = R□·4·scaleX/scaleY. */
const strip = {
  outline: {
    unit: "mm",
    outer: [
      [0, 0],
      [40, 0],
      [40, 10],
      [0, 10],
    ],
  },
  terminals: [
    {
      name: "in",
      segments: [
        [
          [0, 0],
          [0, 10],
        ],
      ],
    },
    {
      name: "out",
      segments: [
        [
          [40, 0],
          [40, 10],
        ],
      ],
    },
  ],
  medium: { sheetResistance: 50 },
  solveFor: "scaleX",
  target: 300,
} as const;
const size = (over: object, as = key) =>
  call(server, "post", "/sizing", { key: as, body: { ...strip, ...over } });

describe("POST /sizing on an outline", () => {
  test("200 stretched along and across the flow of a strip", async () => {
    for (const [solveFor, expected] of [
      ["scaleX", 1.5],
      ["scaleY", 2 / 3],
    ] as const) {
      const { status, body } = await size({ solveFor });
      expect(status).toBe(200);
      const [{ dimension, resistance, sensitivity }] = body.solutions;
      expect(Math.abs(dimension.value / expected - 1)).toBeLessThan(1e-4);
      expect(resistance.lower).toBeLessThanOrEqual(300 * (1 + 1e-5));
      expect(resistance.upper).toBeGreaterThanOrEqual(300 * (1 - 1e-5));
      const slope = solveFor === "scaleX" ? 300 / expected : -300 / expected;
      expect(Math.abs(sensitivity / slope - 1)).toBeLessThan(0.05);
      expect(body).not.toHaveProperty("shape");
    }
  });

  test("200 scaled evenly: with a thickness, and about an axis", async () => {
    const thick = await size({
      medium: { resistivity: 1e-6, thickness: "1 um" },
      solveFor: "scale",
      target: 2,
      record: { label: "Even" },
    });
    // 4 Ω at scale 1
    expect(thick.body.solutions[0].dimension).toMatchObject({ unit: "1" });
    expect(Math.abs(thick.body.solutions[0].dimension.value / 2 - 1)).toBeLessThan(1e-9);
    const stored = await call(server, "get", `/records/${thick.body.record.id}`, { key });
    expect(stored.body).toMatchObject({ operation: "sizing", label: "Even" });
    const replay = await call(server, "post", `/records/${thick.body.record.id}/replay`, { key });
    expect([replay.status, replay.body.identical]).toEqual([200, true]);

    // A solid cylinder of radius 10 and height 40 mm, end to end: R = ρ·L/(πr²).
    const cylinder = await size({
      outline: {
        ...strip.outline,
        symmetry: "axisymmetric",
        outer: [
          [0, 0],
          [10, 0],
          [10, 40],
          [0, 40],
        ],
      },
      terminals: [
        {
          name: "top",
          segments: [
            [
              [0, 40],
              [10, 40],
            ],
          ],
        },
        {
          name: "foot",
          segments: [
            [
              [0, 0],
              [10, 0],
            ],
          ],
        },
      ],
      medium: { resistivity: 1 },
      solveFor: "scale",
      target: 0.04 / (Math.PI * 1e-4) / 3,
    });
    expect(cylinder.status).toBe(200);
    expect(Math.abs(cylinder.body.solutions[0].dimension.value / 3 - 1)).toBeLessThan(1e-4);
  });

  test("422 with the minimum between the ends of a bend, which stretched in x is longer and wider", async () => {
    // Arms 3 squares long either way: R = R□·(3x + 3/x + corner), least near x = 1.
    const bend = [
      [0, 0],
      [40, 0],
      [40, 10],
      [10, 10],
      [10, 40],
      [0, 40],
    ];
    const ends = [
      [bend[1], bend[2]],
      [bend[4], bend[5]],
    ];
    const response = await size({
      outline: { unit: "mm", outer: bend },
      terminals: ends.map((segment, k) => ({ name: ["in", "out"][k], segments: [segment] })),
      target: 200,
      within: [0.25, 4],
    });
    expectProblem(response, 422, "invalid-input");
    const detail = response.body.errors[0].detail.replaceAll("\u2009", " ");
    const found =
      /at scaleX = 0\.25 and .* at scaleX = 4, and between them a minimum of about ([\d.]+) Ω at scaleX = ([\d.]+)\.$/.exec(
        detail,
      );
    expect(found).not.toBeNull();
    // The corner of equal arms has 1 - (2/π)·ln 2 = 0.5587 squares.
    expect(Math.abs(Number(found?.[1]) / (50 * 6.5587) - 1)).toBeLessThan(0.01);
    expect(Math.abs(Number(found?.[2]) - 1)).toBeLessThan(0.1);
  });

  test.each<[string, object, string, RegExp]>([
    ["a plan sheet under an even scale", { solveFor: "scale" }, "#/solveFor", /scaleX or scaleY/],
    ["an unknown scale", { solveFor: "width" }, "#/solveFor", /scaleX/],
    ["no target", { target: undefined }, "#/target", /required/],
    ["a target out of reach", { within: [1, 1.2] }, "#/target", /at scaleX = 1 and .* at scaleX = 1\.2/],
    ["a range the wrong way round", { within: [2, 1] }, "#/within/1", /greater/],
    ["a range from 0", { within: [0, 1] }, "#/within/0", /between/],
    [
      "arcs stretched one way",
      {
        outline: {
          ...strip.outline,
          outer: [[0, 0], [40, 0], { arcTo: [40, 10], center: [40, 5] }, [0, 10]],
        },
        terminals: [strip.terminals[0], { name: "out", parts: [{ ring: 0, edge: 1 }] }],
      },
      "#/outline",
      /arcs/,
    ],
    [
      "a terminal off the outline",
      {
        terminals: [
          strip.terminals[0],
          {
            name: "out",
            segments: [
              [
                [41, 0],
                [41, 10],
              ],
            ],
          },
        ],
      },
      "#/terminals/1/segments/0",
      /./,
    ],
  ])("422 %s", async (_, over, pointer, pattern) => {
    const response = await size(over);
    expectProblem(response, 422, "invalid-input");
    expect(places(response).some((place) => place.startsWith(pointer))).toBe(true);
    const details = response.body.errors.map(({ detail }: { detail: string }) =>
      detail.replaceAll("\u2009", " "),
    );
    expect(details.join(" ")).toMatch(pattern);
  });

  test("403 by the scope that the body takes", async () => {
    const computes = server.issue({ scopes: ["compute"] }).key;
    const refused = await size({}, computes);
    expectProblem(refused, 403, "insufficient-scope");
    expect(refused.headers["www-authenticate"]).toMatch(/scope="field"/);
  });
});
