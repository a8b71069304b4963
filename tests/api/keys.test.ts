import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { activityOfSubject } from "@/db/queries/activity";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import { call, expectProblem, places, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
let keyId: string;
beforeAll(async () => {
  server = await startServer();
  ({ key, id: keyId } = server.issue({ team: "keys-team", scopes: [...SCOPE_NAMES], name: "Automation" }));
});
afterAll(() => server.stop());

const issue = (body: unknown, by = key) => call(server, "post", "/keys", { key: by, body });
const compute = (by: string) => call(server, "post", "/resistance", { key: by, body: SLEEVE });

describe("POST /keys", () => {
  test("201 shows the key once; it works at once", async () => {
    const response = await issue({
      name: "CAD scripts",
      scopes: ["compute", "materials:read", "compute"],
      quotas: { minute: 50, month: 100 },
      origins: ["https://intranet.merrow-pike.example"],
      expiresAt: "2099-01-01T00:00:00+02:00",
    });
    expect(response.status).toBe(201);
    const { key: text, ...view } = response.body;
    expect(text).toMatch(new RegExp(`^rho_${view.id}_[0-9A-Za-z]{43}$`));
    expect(view).toEqual({
      id: expect.stringMatching(/^k[0-9A-Za-z]{15}$/),
      name: "CAD scripts",
      team: "keys-team",
      scopes: ["compute", "materials:read"],
      quotas: { minute: 50, month: 100 },
      origins: ["https://intranet.merrow-pike.example"],
      allowedInUrl: false,
      state: "active",
      createdAt: expect.any(String),
      createdBy: "Automation",
      expiresAt: "2098-12-31T22:00:00.000Z",
      revokedAt: null,
      lastUsedAt: null,
      lastClient: null,
    });
    expect(response.headers.location).toBe(`/api/v1/keys/${view.id}`);
    const used = await compute(text);
    expect(used.headers["ratelimit-policy"]).toBe('"minute";q=50;w=60, "month";q=100');
    expect(used.headers["ratelimit"]).toMatch(/^"minute";r=49;t=\d+, "month";r=99;t=\d+$/);
    const read = await call(server, "get", `/keys/${view.id}`, { key });
    expect(read.body).toEqual({ ...view, lastUsedAt: expect.any(String), lastClient: expect.any(String) });
    expect(read.text).not.toContain(text.slice(-43));
  });

  test("403 for a scope that the key lacks, 422 for a quota beyond its own", async () => {
    const narrow = server.issue({
      team: "keys-team",
      scopes: ["compute", "keys:manage"],
      quotas: { minute: 100, month: 1000 },
    }).key;
    const scope = await issue({ name: "x", scopes: ["compute", "records:read"] }, narrow);
    expectProblem(scope, 403, "insufficient-scope");
    expect(scope.headers["www-authenticate"]).toContain('scope="records:read"');
    const quota = await issue(
      { name: "x", scopes: ["compute"], quotas: { minute: 101, month: 1001 } },
      narrow,
    );
    expectProblem(quota, 422, "invalid-input");
    expect(places(quota)).toEqual(["#/quotas/minute", "#/quotas/month"]);
    const standard = await issue({ name: "x", scopes: ["compute"] }, narrow);
    expect(standard.body.quotas).toEqual({ minute: 100, month: 1000 });
  });

  test("422 with a pointer for every wrong member", async () => {
    const response = await issue({
      name: " ",
      scopes: ["compute", "everything"],
      origins: ["https://host/path"],
      quotas: { minute: 0, month: 1.5, day: 1 },
      expiresAt: "tomorrow",
      team: "busbar",
    });
    expectProblem(response, 422, "invalid-input");
    expect(places(response).sort()).toEqual([
      "#/expiresAt",
      "#/name",
      "#/origins/0",
      "#/quotas/day",
      "#/quotas/minute",
      "#/quotas/month",
      "#/scopes/1",
      "#/team",
    ]);
    const past = await issue({ name: "x", scopes: ["compute"], expiresAt: "2000-01-01T00:00:00Z" });
    expect(places(past)).toEqual(["#/expiresAt"]);
    expect(places(await issue({}))).toEqual(["#/name", "#/scopes"]);
  });
});

describe("POST /keys/{id}/rotate", () => {
  test("200 a second secret; the first counts until the overlap is over", async () => {
    const issued = (await issue({ name: "Rotating", scopes: ["compute"] })).body;
    const response = await call(server, "post", `/keys/${issued.id}/rotate`, {
      key,
      body: { overlap: "7d" },
    });
    expect(response.status).toBe(200);
    expect(response.body.key).not.toBe(issued.key);
    const until = Date.parse(response.body.previousUntil) - Date.now();
    expect(until).toBeGreaterThan(6.99 * 86_400_000);
    expect(until).toBeLessThan(7.01 * 86_400_000);
    expect((await compute(issued.key)).status).toBe(200);
    expect((await compute(response.body.key)).status).toBe(200);
    const now = await call(server, "post", `/keys/${issued.id}/rotate`, { key });
    expect(now.status).toBe(200);
    expectProblem(await compute(issued.key), 401, "expired-key");
    expectProblem(await compute(response.body.key), 401, "expired-key");
    expect((await compute(now.body.key)).status).toBe(200);
  });

  test("403 for a key that can do more than the caller, 422 for an overlap that is none", async () => {
    const strong = (await issue({ name: "Strong", scopes: ["compute", "records:read"] })).body;
    const narrow = server.issue({ team: "keys-team", scopes: ["compute", "keys:manage"] }).key;
    const response = await call(server, "post", `/keys/${strong.id}/rotate`, { key: narrow, body: {} });
    expectProblem(response, 403, "insufficient-scope");
    for (const overlap of ["a week", "91d", "-1d", ""]) {
      const wrong = await call(server, "post", `/keys/${strong.id}/rotate`, { key, body: { overlap } });
      expectProblem(wrong, 422, "invalid-input");
      expect(places(wrong)).toEqual(["#/overlap"]);
    }
  });
});

describe("DELETE /keys/{id}", () => {
  test("204 revokes for the next request, and says so in the list and the activity", async () => {
    const issued = (await issue({ name: "Short-lived", scopes: ["compute"] })).body;
    expect((await call(server, "delete", `/keys/${issued.id}`, { key })).status).toBe(204);
    expectProblem(await compute(issued.key), 401, "revoked-key");
    expect((await call(server, "delete", `/keys/${issued.id}`, { key })).status).toBe(204);
    const rotated = await call(server, "post", `/keys/${issued.id}/rotate`, { key, body: {} });
    expectProblem(rotated, 422, "invalid-input");
    const read = await call(server, "get", `/keys/${issued.id}`, { key });
    expect(read.body).toMatchObject({ state: "revoked", revokedAt: expect.any(String) });
    const acts = activityOfSubject(server.service.db, issued.id);
    expect(acts.map(({ action, actorId }) => [action, actorId])).toEqual([
      ["key.revoke", keyId],
      ["key.issue", keyId],
    ]);
    expect(acts[0].requestId).toMatch(/^req_/);
    expect(JSON.stringify(acts)).not.toContain(issued.key.slice(-43));
  });
});

describe("GET /keys", () => {
  test("200 page by page, newest first, never a secret", async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const query: string = cursor === null ? "" : `&cursor=${cursor}`;
      const { body, text } = await call(server, "get", `/keys?limit=3${query}`, { key });
      expect(text).not.toMatch(/rho_|hash|secret/);
      seen.push(...body.items.map(({ id }: { id: string }) => id));
      cursor = body.next;
    } while (cursor !== null);
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen).toContain(keyId);
    expect(seen.length).toBeGreaterThan(6);
  });
});
