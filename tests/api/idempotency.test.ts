import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
let keyId: string;
beforeAll(async () => {
  server = await startServer();
  ({ key, id: keyId } = server.issue({ scopes: [...SCOPE_NAMES] }));
});
afterAll(() => server.stop());

/** Named by the run, since other files store records on the same service meanwhile. */
const label = `Idempotent ${Date.now()} ${process.pid}`;
const STORED = { ...SLEEVE, record: { label } };
const post = (path: string, body: unknown, idempotencyKey: string, by = key) =>
  call(server, "post", path, { key: by, body, headers: { "Idempotency-Key": idempotencyKey } });
const stored = () =>
  server.service.db.$client.prepare("select count(*) from records where label = ?").pluck().get(label);

describe("Idempotency-Key", () => {
  test("a repeat gets the same status, headers and body, and stores nothing", async () => {
    const first = await post("/resistance", STORED, "abc-1");
    const before = stored();
    const again = await post("/resistance", STORED, "abc-1");
    expect([again.status, again.text]).toEqual([first.status, first.text]);
    for (const name of ["location", "content-type"]) expect(again.headers[name]).toBe(first.headers[name]);
    expect(again.headers["request-id"]).not.toBe(first.headers["request-id"]);
    expect(stored()).toBe(before);
    const material = {
      name: "Once",
      kind: "alloy",
      resistivity: { model: "constant", resistivity: 1e-7 },
      range: { from: 0, to: 100 },
      uncertainty: { lower: 0.9, upper: 1.1, note: "Guess of a test." },
      source: "Test",
      provenance: "measured",
    };
    const created = await post("/materials", material, "abc-2");
    const repeated = await post("/materials", material, "abc-2");
    expect([repeated.status, repeated.body]).toEqual([201, created.body]);
    expect(repeated.headers.etag).toBe(created.headers.etag);
  });

  test("422 for another body or another path", async () => {
    await post("/resistance", STORED, "abc-3");
    const other = await post("/resistance", { ...STORED, record: { label: "Other" } }, "abc-3");
    expectProblem(other, 422, "idempotency-key-reused");
    expectProblem(
      await post("/keys", { name: "x", scopes: ["compute"] }, "abc-3"),
      422,
      "idempotency-key-reused",
    );
  });

  test("the same text of another key is another key", async () => {
    const other = server.issue().key;
    const [a, b] = [
      await post("/resistance", STORED, "abc-4"),
      await post("/resistance", STORED, "abc-4", other),
    ];
    expect(a.body.record.id).not.toBe(b.body.record.id);
  });

  test("of twenty calls at once one is done; the others are told to wait or get its answer", async () => {
    const before = Number(stored());
    const answers = await Promise.all(Array.from({ length: 20 }, () => post("/resistance", STORED, "abc-5")));
    expect(Number(stored())).toBe(before + 1);
    const ids = new Set(answers.filter(({ status }) => status === 200).map(({ body }) => body.record.id));
    expect(ids.size).toBe(1);
    for (const answer of answers)
      if (answer.status !== 200) expectProblem(answer, 409, "request-in-progress");
  });

  test("409 while the first is running, and not for ever after a crash", async () => {
    const { db } = server.service;
    await post("/resistance", STORED, "abc-6");
    const set = db.$client.prepare(
      "update idempotency set status = null, expires_at = ? where owner = ? and key = ?",
    );
    set.run(Date.now() + 60_000, keyId, "abc-6");
    const running = await post("/resistance", STORED, "abc-6");
    expectProblem(running, 409, "request-in-progress");
    expect(running.headers["retry-after"]).toBe("1");
    set.run(Date.now() - 1, keyId, "abc-6");
    expect((await post("/resistance", STORED, "abc-6")).status).toBe(200);
  });

  test("a refused call leaves the key free", async () => {
    expect((await post("/resistance", { ...STORED, medium: {} }, "abc-7")).status).toBe(422);
    expect((await post("/resistance", STORED, "abc-7")).status).toBe(200);
  });

  test("a call that stores nothing ignores it", async () => {
    const [a, b] = [await post("/resistance", SLEEVE, "abc-8"), await post("/resistance", STORED, "abc-8")];
    expect([a.status, b.status]).toEqual([200, 200]);
    expect(b.body).toHaveProperty("record");
  });

  test("a repeat of issuing or rotating a key answers without the secret", async () => {
    const settings = { name: "Repeated", scopes: ["compute"] };
    const issued = await post("/keys", settings, "abc-9");
    const { key: secret, ...rest } = issued.body;
    expect(secret).toMatch(/^rho_/);
    const again = await post("/keys", settings, "abc-9");
    expect([again.status, again.body]).toEqual([201, rest]);
    const rotation = await post(`/keys/${rest.id}/rotate`, { overlap: "1h" }, "abc-10");
    const { key: second, ...rotated } = rotation.body;
    const repeated = await post(`/keys/${rest.id}/rotate`, { overlap: "1h" }, "abc-10");
    expect([repeated.status, repeated.body]).toEqual([200, rotated]);
    const kept = JSON.stringify(server.service.db.$client.prepare("select * from idempotency").all());
    for (const text of [secret, second]) expect(kept).not.toContain(text.slice(-43));
    expect((await call(server, "post", "/resistance", { key: second, body: SLEEVE })).status).toBe(200);
  });

  test("quoted as a structured field it is the same key", async () => {
    const first = await post("/resistance", STORED, "abc-11");
    const quoted = await post("/resistance", STORED, '"abc-11"');
    expect(quoted.body.record.id).toBe(first.body.record.id);
  });

  test("400 for a key that is too long or has spaces", async () => {
    expectProblem(await post("/resistance", STORED, "x".repeat(256)), 400, "invalid-header");
    expectProblem(await post("/resistance", STORED, "a b"), 400, "invalid-header");
  });
});
