import { readFileSync, statSync } from "node:fs";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import { call, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer({});
});
afterAll(() => server.stop());

const logged = () => readFileSync(server.logFile, "utf8");

describe("secrets", () => {
  test("are in no log, no answer but the one that shows them, and not in the database", async () => {
    const main = server.issue({ scopes: [...SCOPE_NAMES], allowedInUrl: true });
    const issued = await call(server, "post", "/keys", {
      key: main.key,
      body: { name: "Second", scopes: ["compute"] },
      headers: { "Idempotency-Key": "second" },
    });
    const secrets = [main.key, issued.body.key].map((key: string) => key.slice(-43));
    const answers = [
      await call(server, "get", `/usage?key=${main.key}`),
      await call(server, "get", `/keys?key=${main.key}&limit=1`),
      await call(server, "get", `/nothing?key=${main.key}`),
      await call(server, "get", "/keys", { key: main.key }),
      await call(server, "post", "/resistance", { key: main.key, body: { shape: main.key } }),
      await call(server, "post", "/resistance", { key: `${issued.body.key}x`, body: SLEEVE }),
      await call(server, "post", "/keys", {
        key: main.key,
        body: { name: "Second", scopes: ["compute"] },
        headers: { "Idempotency-Key": "second" },
      }),
    ];
    const text = logged();
    expect(text.split("\n").length).toBeGreaterThan(answers.length);
    const { db } = server.service;
    db.$client.pragma("wal_checkpoint(TRUNCATE)");
    const file = readFileSync(server.service.config.databasePath, "latin1");
    for (const secret of secrets) {
      expect(text).not.toContain(secret);
      expect(file).not.toContain(secret);
      for (const { body, headers } of answers) {
        // The echo of what a client put into the body itself is its own affair.
        if (body?.errors) continue;
        expect(JSON.stringify([body, headers])).not.toContain(secret);
      }
    }
  });

  test("the service's own is kept readable by its owner only", () => {
    const path = join(server.service.config.dataFolder, "secret");
    expect(statSync(path).mode & 0o777).toBe(0o600);
    expect(readFileSync(path, "utf8").trim()).toBe(server.service.config.secret);
  });

  test("no log line has a query or a header of the client in it", async () => {
    await call(server, "get", "/shapes?mark=in-the-query", { headers: { "X-Mark": "in-a-header" } });
    const text = logged();
    expect(text).not.toContain("in-the-query");
    expect(text).not.toContain("in-a-header");
    const lines = text
      .trim()
      .split("\n")
      .map((line) => JSON.parse(line) as Record<string, unknown>);
    const last = lines[lines.length - 1];
    expect(last).toMatchObject({
      path: "/api/v1/shapes",
      status: 422,
      method: "GET",
      operation: "listShapes",
    });
    expect(last.requestId).toMatch(/^req_/);
  });
});

describe("500", () => {
  test("tells nothing of the defect, stores nothing, costs nothing, and is logged", async () => {
    const { key } = server.issue({ quotas: { minute: 100, month: 10 } });
    const { db } = server.service;
    db.$client.exec("alter table records rename to hidden_records");
    const body = { ...SLEEVE, record: { label: "x" } };
    const response = await call(server, "post", "/resistance", { key, body });
    db.$client.exec("alter table hidden_records rename to records");
    expect(response.status).toBe(500);
    expect(response.body.type).toMatch(/\/internal$/);
    expect(JSON.stringify(response.body)).not.toMatch(/sqlite|table|records|\.ts|node_modules/i);
    expect(logged()).toMatch(/no such table/);
    const usage = await call(server, "get", "/usage", { key });
    expect(usage.body.month.remaining).toBe(10);
    expect(usage.body.byDay[0]).toMatchObject({ requests: 1, computations: 0, refused: 1 });
  });

  test("503 with Retry-After while another process holds the database too long", async () => {
    const { key } = server.issue();
    const { db } = server.service;
    const path = server.service.config.databasePath;
    const { openDatabase } = await import("@/db/client");
    const other = openDatabase(path);
    db.$client.pragma("busy_timeout = 50");
    other.$client.exec("begin immediate");
    const response = await call(server, "post", "/resistance", { key, body: SLEEVE });
    other.$client.exec("rollback");
    other.$client.close();
    db.$client.pragma("busy_timeout = 5000");
    expect(response.status).toBe(503);
    expect(response.body.type).toMatch(/\/busy$/);
    expect(response.headers["retry-after"]).toBe("1");
    expect((await call(server, "post", "/resistance", { key, body: SLEEVE })).status).toBe(200);
  });
});
