import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { BEND, finished, solve, STRIP } from "../support/field";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
let keyId: string;
beforeAll(async () => {
  server = await startServer();
  ({ key, id: keyId } = server.issue({ team: "thin-film" }));
});
afterAll(() => server.stop());

const get = (path: string) => call(server, "get", path, { key });
const replay = (id: string, headers = {}, as = key) =>
  call(server, "post", `/records/${id}/replay`, { key: as, headers });
const WAIT = { Prefer: "wait=30" };

describe("a record of a field solution", () => {
  test("is stored when the solution is finished, with what was asked and answered", async () => {
    const { body } = await solve(server, key, { ...BEND, record: { label: "Track, rev B" } });
    expect(body.record).toEqual({
      id: expect.stringMatching(/^rec_/),
      url: `/api/v1/records/${body.record.id}`,
    });
    const record = (await get(`/records/${body.record.id}`)).body;
    expect(record).toMatchObject({
      operation: "field",
      label: "Track, rev B",
      by: { kind: "key", id: keyId },
      materials: [],
      result: body.result,
    });
    expect(record.request).toMatchObject({ terminals: BEND.terminals, medium: BEND.medium });
    expect(record.request.record).toBeUndefined();
    const listed = (await get("/records?operation=field&limit=1")).body.items;
    expect(listed).toEqual([record]);
  });

  test("is none where the solution was cancelled or refused", async () => {
    const count = () => server.service.db.$client.prepare("select count(*) from records").pluck().get();
    const before = count();
    const refused = await call(server, "post", "/fields", { key, body: { ...BEND, record: { label: "" } } });
    expect([refused.status, places(refused)]).toEqual([422, ["#/record/label"]]);
    await solve(server, key, BEND);
    expect(count()).toBe(before);
  });

  test("keeps a stored outline's shape, so that it can be replayed without it", async () => {
    const { outline, terminals, medium } = BEND;
    const stored = await call(server, "post", "/outlines", { key, body: { outline, terminals } });
    const record = { label: "By id" };
    const { body } = await solve(server, key, { outlineId: stored.body.id, medium, record });
    const { request } = (await get(`/records/${body.record.id}`)).body;
    expect(request.outlineId).toBeUndefined();
    expect(request.outline.outer).toEqual(outline.outer);
    expect((await replay(body.record.id, WAIT)).body.replay.identical).toBe(true);
  });
});

describe("POST /records/{id}/replay of a field solution", () => {
  test("200 the same engine gives the same number", async () => {
    const { body } = await solve(server, key, { ...BEND, record: { label: "Replayed" } });
    const again = await replay(body.record.id, WAIT);
    expect([again.status, again.headers.location]).toEqual([200, `/api/v1/fields/${again.body.id}`]);
    expect(again.body.id).not.toBe(body.id);
    expect(again.body.result.resistance).toEqual(body.result.resistance);
    expect(again.body.record).toBeUndefined();
    expect(again.body.replay).toEqual({
      record: body.record,
      before: body.result,
      drift: 0,
      identical: true,
    });
  });

  test("202 without a wait; drift and identity come with the end", async () => {
    const { body } = await solve(server, key, { ...BEND, record: { label: "Replayed" } });
    const started = await replay(body.record.id);
    expect([started.status, started.headers.location]).toEqual([202, `/api/v1/fields/${started.body.id}`]);
    expect(started.body.replay).toMatchObject({ drift: null, identical: null });
    const end = await finished(server, key, started.body.id);
    expect(end.body.replay).toMatchObject({ drift: 0, identical: true });
  });

  test("with the material version that it pinned", async () => {
    const bronze = {
      name: "Contact bronze, lot 7",
      kind: "alloy",
      resistivity: { model: "linear", resistivity: 1e-7, coefficient: 0.001, reference: 20 },
      range: { from: -40, to: 150 },
      uncertainty: { lower: 0.98, upper: 1.02, note: "Four-wire measurement." },
      source: "Incoming inspection, lot 7",
      provenance: "measured",
    };
    const made = await call(server, "post", "/materials", { key, body: bronze });
    expect(made.status).toBe(201);
    const medium = { material: made.body.id, thickness: "1 mm" };
    const { body } = await solve(server, key, { ...STRIP, medium, record: { label: "Bronze" } });
    expect(body.result.materials).toEqual([expect.objectContaining({ id: made.body.id, version: 1 })]);
    const patched = await call(server, "patch", `/materials/${made.body.id}`, {
      key,
      body: { resistivity: { ...bronze.resistivity, resistivity: 2e-7 } },
      headers: { "If-Match": made.headers.etag },
    });
    expect(patched.status).toBe(200);
    expect((await replay(body.record.id, WAIT)).body.replay).toMatchObject({ drift: 0, identical: true });
    const today = await solve(server, key, { ...STRIP, medium });
    expect(today.body.result.resistance.value / body.result.resistance.value).toBeCloseTo(2, 9);
  });

  test("three terminals drift by their pairs", async () => {
    const terminals = [
      ...STRIP.terminals,
      {
        name: "tap",
        segments: [
          [
            [4, 2],
            [6, 2],
          ],
        ],
      },
    ];
    const { body } = await solve(server, key, { ...STRIP, terminals, record: { label: "Tap" } });
    const again = (await replay(body.record.id, WAIT)).body;
    expect(again.replay).toMatchObject({ drift: 0, identical: true });
    expect(again.result.pairs).toEqual(body.result.pairs);
  });

  test("it costs what a field solution costs; 429 where that is not left", async () => {
    const { body } = await solve(server, key, { ...BEND, record: { label: "Replayed" } });
    const rights = (month: number) =>
      server.issue({ team: "thin-film", scopes: ["compute"], quotas: { minute: 100, month } });
    const { key: rich } = rights(21);
    expect((await replay(body.record.id, WAIT, rich)).status).toBe(200);
    expect((await call(server, "get", "/usage", { key: rich })).body.month.remaining).toBe(20);
    const { key: poor } = rights(19);
    expectProblem(await replay(body.record.id, WAIT, poor), 429, "quota-exhausted");
    expect((await call(server, "get", "/usage", { key: poor })).body.month.remaining).toBe(19);
  });
});
