import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

const compute = (key: string, body: unknown = SLEEVE) => call(server, "post", "/resistance", { key, body });
const counts = (statuses: number[]) => ({
  allowed: statuses.filter((status) => status === 200).length,
  refused: statuses.filter((status) => status === 429).length,
});

describe("429 a minute", () => {
  test("exactly the quota passes of fifty calls at once", async () => {
    const { key } = server.issue({ quotas: { minute: 20, month: 1000 } });
    const answers = await Promise.all(Array.from({ length: 50 }, () => compute(key)));
    expect(counts(answers.map(({ status }) => status))).toEqual({ allowed: 20, refused: 30 });
    const refused = answers.find(({ status }) => status === 429);
    if (!refused) throw new Error("None was refused.");
    expectProblem(refused, 429, "too-many-requests");
    const after = Number(refused.headers["retry-after"]);
    expect(after).toBeGreaterThan(0);
    expect(after).toBeLessThanOrEqual(60);
    // Calls of the same moment may not have reserved their computation yet.
    expect(refused.headers["ratelimit"]).toMatch(/^"minute";r=0;t=\d+, "month";r=(9[89]\d|1000);t=\d+$/);
  });

  test("counts down to nought, answer by answer", async () => {
    const { key } = server.issue({ quotas: { minute: 3, month: 1000 } });
    const left = [];
    for (let i = 0; i < 4; i++) {
      const { status, headers } = await call(server, "get", "/usage", { key });
      left.push([status, /r=(\d+)/.exec(headers["ratelimit"])?.[1]]);
    }
    expect(left).toEqual([
      [200, "2"],
      [200, "1"],
      [200, "0"],
      [429, "0"],
    ]);
  });

  test("every kind of answer counts, OPTIONS does not", async () => {
    const { key } = server.issue({ quotas: { minute: 4, month: 1000 } });
    expect((await compute(key, {})).status).toBe(422);
    expect((await call(server, "get", "/nothing", { key })).status).toBe(404);
    expect((await call(server, "options", "/resistance", { key })).status).toBe(204);
    expect((await call(server, "head", "/shapes", { key })).status).toBe(200);
    expect((await compute(key)).status).toBe(200);
    expect((await compute(key)).status).toBe(429);
  });
});

describe("429 a month", () => {
  test("exactly the quota passes of fifty calls at once, and nothing is stored beyond it", async () => {
    const { key, id } = server.issue({ quotas: { minute: 1000, month: 17 } });
    const body = { ...SLEEVE, record: { label: "Race" } };
    const answers = await Promise.all(Array.from({ length: 50 }, () => compute(key, body)));
    expect(counts(answers.map(({ status }) => status))).toEqual({ allowed: 17, refused: 33 });
    const stored = server.service.db.$client
      .prepare("select count(*) from records where by_id = ?")
      .pluck()
      .get(id);
    expect(stored).toBe(17);
    const refused = answers.find(({ status }) => status === 429);
    if (!refused) throw new Error("None was refused.");
    expectProblem(refused, 429, "quota-exhausted");
    const now = new Date();
    const end = Date.UTC(now.getUTCFullYear(), now.getUTCMonth() + 1, 1);
    expect(Math.abs(Number(refused.headers["retry-after"]) - (end - now.getTime()) / 1000)).toBeLessThan(5);
    expect(refused.headers["ratelimit"]).toContain('"month";r=0;t=');
  });

  test("refused computations cost nothing, also with valid ones among them", async () => {
    const { key } = server.issue({ quotas: { minute: 1000, month: 100 } });
    const bodies = Array.from({ length: 40 }, (_, i) => (i % 2 ? SLEEVE : { ...SLEEVE, medium: {} }));
    await Promise.all(bodies.map((body) => compute(key, body)));
    const { body } = await call(server, "get", "/usage", { key });
    expect(body.month.remaining).toBe(80);
    expect(body.byDay[0]).toMatchObject({ requests: 40, computations: 20, refused: 20 });
  });

  test("calls that compute nothing pass when the month is used up", async () => {
    const { key } = server.issue({ quotas: { minute: 100, month: 0 } });
    expectProblem(await compute(key), 429, "quota-exhausted");
    expect((await call(server, "get", "/materials", { key })).status).toBe(200);
    expect((await call(server, "get", "/usage", { key })).body.month.remaining).toBe(0);
  });

  test("a record is stored and repeated without a second computation", async () => {
    const { key } = server.issue({ quotas: { minute: 100, month: 1 } });
    const store = () =>
      call(server, "post", "/resistance", {
        key,
        body: { ...SLEEVE, record: { label: "Once" } },
        headers: { "Idempotency-Key": "once" },
      });
    expect((await store()).status).toBe(200);
    expect((await store()).status).toBe(200);
    expectProblem(await compute(key), 429, "quota-exhausted");
  });
});

describe("429 an address", () => {
  test("calls without a key and refused keys share the address's minute", async () => {
    const narrow = await startServer({ RHOFORM_ADDRESS_QUOTA: "5" });
    try {
      const get = (path: string, key?: string) => call(narrow, "get", path, { key });
      const first = await get("/shapes");
      expect(first.headers["ratelimit-policy"]).toBe('"address";q=5;w=60');
      expect(first.headers["ratelimit"]).toMatch(/^"address";r=4;t=\d+$/);
      expect((await get("/usage")).status).toBe(401);
      expect((await get("/usage", "rho_wrong")).status).toBe(401);
      expect((await get("/nothing")).status).toBe(404);
      expect((await get("/health")).status).toBe(200);
      expectProblem(await get("/shapes"), 429, "too-many-requests");
      expectProblem(await get("/usage", "rho_wrong"), 429, "too-many-requests");
      const { key } = narrow.issue();
      expect((await get("/shapes", key)).status).toBe(200);
    } finally {
      await narrow.stop();
    }
  });

  test("X-Forwarded-For counts behind a trusted proxy, and only there", async () => {
    const from = (address: string) => ({
      headers: { "X-Forwarded-For": address, "X-Rhoform-Peer": "203.0.113.77" },
    });
    const open = await startServer({ RHOFORM_ADDRESS_QUOTA: "2" });
    try {
      for (const [i, status] of [200, 200, 429].entries()) {
        expect((await call(open, "get", "/health", from(`198.51.100.${i}`))).status).toBe(status);
      }
    } finally {
      await open.stop();
    }
    const proxied = await startServer({ RHOFORM_ADDRESS_QUOTA: "2", RHOFORM_TRUSTED_PROXIES: "127.0.0.0/8" });
    try {
      for (const [i, status] of [200, 200, 200].entries()) {
        expect((await call(proxied, "get", "/health", from(`198.51.100.${i}`))).status).toBe(status);
      }
      // The client's own claim stands left of what the proxy saw.
      for (const [i, status] of [200, 200, 429].entries()) {
        expect((await call(proxied, "get", "/health", from(`10.0.0.${i}, 198.51.100.9`))).status).toBe(
          status,
        );
      }
    } finally {
      await proxied.stop();
    }
  });
});

describe("the counters", () => {
  test("survive a restart: they are in the database", async () => {
    const { key, id } = server.issue({ quotas: { minute: 10, month: 100 } });
    await compute(key);
    const rows = server.service.db.$client
      .prepare("select key, points from rate_limits where key like ? order by key")
      .all(`%${id}%`) as { key: string; points: number }[];
    expect(rows).toEqual([
      { key: `minute:key:${id}`, points: 1 },
      { key: `month:key:${id}:${new Date().toISOString().slice(0, 7)}`, points: 1 },
    ]);
  });
});
