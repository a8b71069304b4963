import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

describe("GET /usage 200", () => {
  test("counts requests, computations and refusals of this key", async () => {
    const { key, id } = server.issue({ quotas: { minute: 100, month: 50 }, scopes: ["compute"] });
    server.issue();
    for (let i = 0; i < 3; i++) await call(server, "post", "/resistance", { key, body: SLEEVE });
    await call(server, "post", "/resistance", { key, body: {} });
    await call(server, "post", "/resistance", { key, body: "{" });
    await call(server, "get", "/records", { key });
    await call(server, "get", "/shapes", { key });
    const { status, body } = await call(server, "get", "/usage", { key });
    expect(status).toBe(200);
    const now = new Date();
    expect(body).toEqual({
      key: id,
      scopes: ["compute"],
      minute: { quota: 100, remaining: 92, resetsAt: expect.any(String) },
      month: {
        quota: 50,
        remaining: 47,
        resetsAt: new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth() + 1, 1)).toISOString(),
      },
      byDay: [{ day: now.toISOString().slice(0, 10), requests: 7, computations: 3, refused: 3 }],
    });
    const resets = Date.parse(body.minute.resetsAt) - Date.now();
    expect(resets).toBeGreaterThan(0);
    expect(resets).toBeLessThanOrEqual(61_000);
  });

  test("an event a call, with what a console needs", async () => {
    const { key, id } = server.issue();
    const response = await call(server, "post", "/resistance", {
      key,
      body: SLEEVE,
      headers: { "User-Agent": "python-requests/2.32" },
    });
    await call(server, "get", "/nothing", { key });
    const events = server.service.db.$client
      .prepare("select * from usage_events where key_id = ? order by id")
      .all(id) as Record<string, unknown>[];
    expect(events).toHaveLength(2);
    expect(events[0]).toMatchObject({
      request_id: response.headers["request-id"],
      operation: "computeResistance",
      shape: "cylindrical-shell",
      status: 200,
      computations: 1,
      client: "python",
    });
    expect(Number(events[0].latency_us)).toBeGreaterThan(0);
    expect(events[1]).toMatchObject({ operation: "none", shape: null, status: 404, computations: 0 });
  });

  test("401 without a key", async () => {
    expectProblem(await call(server, "get", "/usage"), 401, "missing-credentials");
  });
});
