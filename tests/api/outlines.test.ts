import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { BEND, solve, STRIP } from "../support/field";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  ({ key } = server.issue({ team: "thin-film" }));
});
afterAll(() => server.stop());

const post = (body: unknown, headers: Record<string, string> = {}) =>
  call(server, "post", "/outlines", { key, body, headers });
const get = (id: string, as = key) => call(server, "get", `/outlines/${id}`, { key: as });

describe("POST /outlines 201", () => {
  test("stored, with where it is, and read again", async () => {
    const { outline, terminals } = BEND;
    const { status, body, headers } = await post({ name: " Track, rev B ", outline, terminals });
    expect([status, headers.location]).toEqual([201, `/api/v1/outlines/${body.id}`]);
    expect(body).toEqual({
      id: expect.stringMatching(/^out_/),
      name: "Track, rev B",
      createdAt: expect.stringMatching(/^\d{4}-/),
      outline: { ...outline, holes: [], symmetry: "plan" },
      terminals,
      regions: [],
      repairs: [],
    });
    expect((await get(body.id)).body).toEqual(body);
  });

  test("the members of an outline by themselves", async () => {
    const { body } = await post({ ...STRIP.outline, name: "Strip" });
    expect(body.name).toBe("Strip");
    expect((await post(STRIP.outline)).body.name).toBe("");
    expect(places(await post({ ...STRIP.outline, name: "two\nlines" }))).toEqual(["#/name"]);
    expect(body.outline.outer).toEqual(STRIP.outline.outer);
    expect(body.terminals).toEqual([]);
  });

  test("cleaned: repeated and collinear vertices go, and it says so; parts keep their place", async () => {
    const outer = [
      [0, 0],
      [5, 0],
      [10, 0],
      [10, 0],
      [10, 2],
      [0, 2],
    ];
    const terminals = [
      { name: "left", parts: [{ ring: 0, edge: 5 }] },
      { name: "right", parts: [{ ring: 0, edge: 3 }] },
    ];
    const { body } = await post({ outline: { unit: "mm", outer }, terminals });
    expect(body.outline.outer).toHaveLength(4);
    expect(body.repairs.length).toBeGreaterThan(0);
    const solution = await solve(server, key, { outlineId: body.id, medium: { sheetResistance: 1 } });
    expect(solution.body.result.squares.value).toBeCloseTo(5, 12);
    expect((await solve(server, key, { outlineId: body.id, medium: { sheetResistance: 2 } })).status).toBe(
      200,
    );
  });

  test("arcs stay arcs", async () => {
    const outer = [[0, 0], [2, 0], { arcTo: [0, 2], center: [0, 0], clockwise: false }];
    const { body } = await post({ outline: { outer } });
    expect(body.outline.outer).toEqual(outer);
  });

  test("Idempotency-Key: a repeat gives the same outline", async () => {
    const headers = { "Idempotency-Key": "outline-1" };
    const [a, b] = [await post(STRIP.outline, headers), await post(STRIP.outline, headers)];
    expect(b.body).toEqual(a.body);
    expectProblem(await post(BEND.outline, headers), 422, "idempotency-key-reused");
  });

  test("a stored outline without terminals needs them in the request", async () => {
    const { body } = await post(STRIP.outline);
    const { medium, terminals } = STRIP;
    const without = await call(server, "post", "/fields", { key, body: { outlineId: body.id, medium } });
    expect([without.status, places(without)]).toEqual([422, ["#/terminals"]]);
    const none = await call(server, "post", "/fields", {
      key,
      body: { outlineId: body.id, terminals: [], medium },
    });
    expect([none.status, places(none)]).toEqual([422, ["#/terminals"]]);
    await solve(server, key, { outlineId: body.id, terminals, medium });
  });
});

describe("POST /outlines refused", () => {
  test("422 with pointers, in the shape that was sent", async () => {
    const bowtie = [
      [0, 0],
      [4, 4],
      [4, 0],
      [0, 4],
    ];
    expect(places(await post({ outline: { outer: bowtie } }))).toEqual(["#/outline/outer/2"]);
    expect(places(await post({ outer: bowtie }))).toEqual(["#/outer/2"]);
    expect(places(await post({ ...STRIP.outline, unit: "ell" }))).toEqual(["#/unit"]);
    expect(places(await post({}))).toEqual(["#/outline"]);
    expect(places(await post([]))).toEqual(["#"]);
    const off = [
      {
        name: "a",
        segments: [
          [
            [0, 3],
            [0, 2],
          ],
        ],
      },
    ];
    const response = await post({ outline: STRIP.outline, terminals: off });
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toEqual(["#/terminals/0/segments/0/0"]);
  });

  test("415 for a file, 413 for more than 10 MB, 400 for no JSON", async () => {
    const type = { "Content-Type": "multipart/form-data; boundary=x" };
    expectProblem(await post("--x--", type), 415, "unsupported-media-type");
    expectProblem(await post(`"${"x".repeat(10_000_001)}"`), 413, "body-too-large");
    expectProblem(await post("{"), 400, "malformed-json");
  });

  test("401 without a key, 404 for another team and for none", async () => {
    expectProblem(
      await call(server, "post", "/outlines", { body: STRIP.outline }),
      401,
      "missing-credentials",
    );
    const { body } = await post(STRIP.outline);
    const { key: other } = server.issue({ team: "earthing" });
    expectProblem(await get(body.id, other), 404, "not-found");
    expectProblem(await get("out_0"), 404, "not-found");
  });
});
