import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { activityOfSubject } from "@/db/queries/activity";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "@/lib/engine";
import { call, expectProblem, places, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
let keyId: string;
beforeAll(async () => {
  // A data folder of its own: it counts and lists everything stored.
  server = await startServer({});
  ({ key, id: keyId } = server.issue({ team: "earthing" }));
});
afterAll(() => server.stop());

const store = async (label: string, over: object = {}) => {
  const response = await call(server, "post", "/resistance", {
    key,
    body: { ...SLEEVE, ...over, record: { label } },
  });
  expect(response.status).toBe(200);
  return response.body.record.id as string;
};
const read = (id: string) => call(server, "get", `/records/${id}`, { key });

describe("records", () => {
  test("200 what was stored is what was answered", async () => {
    const request = { ...SLEEVE, include: ["steps", "profile"], operating: { voltage: 5 } };
    const answer = await call(server, "post", "/resistance", {
      key,
      body: { ...request, record: { label: "Rev C" } },
    });
    const { record, ...result } = answer.body;
    expect(record).toEqual({ id: expect.stringMatching(/^rec_/), url: `/api/v1/records/${record.id}` });
    expect(answer.headers.location).toBe(record.url);
    const { body } = await read(record.id);
    expect(body).toEqual({
      id: record.id,
      operation: "resistance",
      label: "Rev C",
      createdAt: expect.stringMatching(/^\d{4}-\d\d-\d\dT/),
      by: { kind: "key", id: keyId, name: "Test" },
      request,
      result,
      materials: [],
      engine: ENGINE_VERSION,
      catalogue: CATALOGUE_VERSION,
    });
  });

  test("nothing is stored without `record`, nor with a request that is refused", async () => {
    const count = () => server.service.db.$client.prepare("select count(*) from records").pluck().get();
    const before = count();
    await call(server, "post", "/resistance", { key, body: SLEEVE });
    await call(server, "post", "/resistance", {
      key,
      body: { ...SLEEVE, medium: {}, record: { label: "x" } },
    });
    expect(count()).toBe(before);
  });

  test("200 listed newest first, searched, paged", async () => {
    const ids = [];
    for (let i = 0; i < 5; i++) ids.unshift(await store(`Series Q ${i}`));
    const bar = await store("Series Q bar", {
      shape: "bar",
      dimensions: { length: 1, width: 1, thickness: 1 },
    });
    const list = async (query: string) => {
      const { body, headers } = await call(server, "get", `/records?${query}`, { key });
      return { ids: body.items.map(({ id }: { id: string }) => id), next: body.next, link: headers.link };
    };
    expect((await list("search=series%20q")).ids).toEqual([bar, ...ids]);
    expect((await list("search=Series%20Q&shape=bar")).ids).toEqual([bar]);
    expect((await list("search=Series%20Q&operation=sizing")).ids).toEqual([]);
    const first = await list("search=Series%20Q&limit=4");
    expect(first.ids).toEqual([bar, ...ids.slice(0, 3)]);
    expect(first.link).toContain("search=Series+Q");
    expect((await list(`search=Series%20Q&limit=4&cursor=${first.next}`)).ids).toEqual(ids.slice(3));
  });

  test("200 relabelled, nothing else changes", async () => {
    const id = await store("Old");
    const before = (await read(id)).body;
    const response = await call(server, "patch", `/records/${id}`, { key, body: { label: "  New " } });
    expect(response.status).toBe(200);
    expect(response.body).toEqual({ ...before, label: "New" });
    expect((await read(id)).body).toEqual(response.body);
    const wrong = await call(server, "patch", `/records/${id}`, { key, body: { lable: "x", result: {} } });
    expectProblem(wrong, 422, "invalid-input");
    expect(places(wrong).sort()).toEqual(["#/label", "#/lable", "#/result"]);
    expect(activityOfSubject(server.service.db, id)[0]).toMatchObject({
      action: "record.relabel",
      before: { label: "Old" },
      after: { label: "New" },
    });
  });

  test("204 deleted, 404 after", async () => {
    const id = await store("Gone");
    expect((await call(server, "delete", `/records/${id}`, { key })).status).toBe(204);
    expectProblem(await read(id), 404, "not-found");
    expectProblem(await call(server, "delete", `/records/${id}`, { key }), 404, "not-found");
    expectProblem(await call(server, "post", `/records/${id}/replay`, { key }), 404, "not-found");
  });

  test("200 replayed: the same engine, the same bits", async () => {
    const id = await store("Replay", {
      medium: { material: "copper-annealed" },
      operating: { temperature: 75 },
    });
    const response = await call(server, "post", `/records/${id}/replay`, { key });
    expect(response.status).toBe(200);
    expect(response.body).toMatchObject({ drift: 0, identical: true });
    expect(response.body.now).toEqual(response.body.before);
  });

  test("a replay uses the material version that the record pinned", async () => {
    const material = await call(server, "post", "/materials", {
      key,
      body: {
        name: "Pinned",
        kind: "alloy",
        resistivity: { model: "constant", resistivity: 1e-7 },
        range: { from: 0, to: 100 },
        uncertainty: { lower: 0.9, upper: 1.1, note: "Guess of a test." },
        source: "Test",
        provenance: "measured",
      },
    });
    const { id } = material.body;
    const record = await store("Pinned", { medium: { material: id } });
    expect((await read(record)).body.materials).toEqual([{ id, version: 1 }]);
    await call(server, "patch", `/materials/${id}`, {
      key,
      body: { resistivity: { model: "constant", resistivity: 2e-7 } },
      headers: { "If-Match": '"1"' },
    });
    await call(server, "delete", `/materials/${id}`, { key });
    const replay = await call(server, "post", `/records/${record}/replay`, { key });
    expect(replay.body).toMatchObject({ drift: 0, identical: true });
  });

  test("a drift is told where the stored number is another", async () => {
    const id = await store("Drift");
    const { db } = server.service;
    const text = db.$client.prepare("select result from records where id = ?").pluck().get(id);
    const result = JSON.parse(String(text));
    const now = result.resistance.value;
    Object.assign(result.resistance, { value: now / 2, lower: now / 2.1, upper: now / 1.9 });
    result.engine = "0.9.0";
    db.$client
      .prepare("update records set result = ?, engine = '0.9.0' where id = ?")
      .run(JSON.stringify(result), id);
    const replay = await call(server, "post", `/records/${id}/replay`, { key });
    expect(replay.body).toMatchObject({ drift: 1, identical: false });
    expect(replay.body.before.engine).toBe("0.9.0");
    expect(replay.body.now.engine).toBe(ENGINE_VERSION);
  });
});
