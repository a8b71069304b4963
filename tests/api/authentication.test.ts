import request from "supertest";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { SHELL } from "@/lib/activity/append";
import { revokeKey, rotateKey } from "@/lib/auth/manage-keys";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

const compute = (key?: string) => call(server, "post", "/resistance", { key, body: SLEEVE });
const authorization = (value: string) =>
  call(server, "post", "/resistance", { body: SLEEVE, headers: { Authorization: value } });

describe("401", () => {
  test("no credentials, challenged without an error code", async () => {
    const response = await compute();
    expectProblem(response, 401, "missing-credentials");
    expect(response.headers["www-authenticate"]).toBe('Bearer realm="rhoform"');
  });

  test("a key that was never issued, a wrong secret, and what is no key at all", async () => {
    const { key } = server.issue();
    const wrong = key.slice(0, -1) + (key.endsWith("A") ? "B" : "A");
    for (const text of [
      `rho_kZZZZZZZZZZZZZZZ_${"a".repeat(43)}`,
      wrong,
      "rho_x",
      "abc",
      key.slice(0, -1),
      `${key}x`,
    ]) {
      const response = await compute(text);
      expectProblem(response, 401, "invalid-key");
      expect(response.headers["www-authenticate"]).toBe('Bearer realm="rhoform", error="invalid_token"');
    }
  });

  test("another scheme, an empty one, and a token that is none of ours", async () => {
    for (const value of ["Basic YTpi", "Bearer", "Bearer a b"]) {
      expectProblem(await authorization(value), 401, "invalid-key");
    }
    for (const token of ["eyJhbGciOiJub25lIn0.eyJzdWIiOiJzaWduZWQtb3V0In0.", "eyJ.eyJ.x"]) {
      expectProblem(await authorization(`Bearer ${token}`), 401, "invalid-token");
    }
  });

  test("a revoked key, from the next request on", async () => {
    const { key, id } = server.issue();
    expect((await compute(key)).status).toBe(200);
    revokeKey(server.service.db, { id, actor: SHELL, now: Date.now() });
    const response = await compute(key);
    expectProblem(response, 401, "revoked-key");
    expect(response.headers["www-authenticate"]).toContain("invalid_token");
  });

  test("an expired key says so, to whoever has the secret only", async () => {
    const { key, id } = server.issue({ expiresAt: new Date(Date.now() + 3_600_000).toISOString() });
    expect((await compute(key)).status).toBe(200);
    server.service.db.$client.prepare("update keys set expires_at = ? where id = ?").run(Date.now() - 1, id);
    expectProblem(await compute(key), 401, "expired-key");
    expectProblem(await compute(`rho_${id}_${"a".repeat(43)}`), 401, "invalid-key");
  });

  test("a rotated secret counts until the overlap is over", async () => {
    const { key, id } = server.issue();
    const rotated = rotateKey(server.service.db, { id, actor: SHELL, now: Date.now(), overlapMs: 60_000 });
    expect((await compute(key)).status).toBe(200);
    expect((await compute(rotated.text)).status).toBe(200);
    rotateKey(server.service.db, { id, actor: SHELL, now: Date.now(), overlapMs: 0 });
    expectProblem(await compute(key), 401, "expired-key");
    expectProblem(await compute(rotated.text), 401, "expired-key");
  });

  test("a key in the address that was not issued for it", async () => {
    const { key } = server.issue();
    const response = await call(server, "get", `/usage?key=${key}`);
    expectProblem(response, 401, "key-not-allowed-in-url");
    expect(JSON.stringify(response.body)).not.toContain(key);
  });
});

describe("credentials that count", () => {
  test("200 with a key in the address where it may travel", async () => {
    const { key } = server.issue({ allowedInUrl: true });
    const path = `/resistance/bar?length=1&width=0.01&thickness=0.001&resistivity=1&format=text&key=${key}`;
    const response = await call(server, "get", path);
    expect(response.status).toBe(200);
    expect(Number(response.text)).toBeCloseTo(1e5, 6);
  });

  test("which has small quotas where nothing else is said", async () => {
    const { key } = server.issue({ allowedInUrl: true, quotas: undefined });
    const { body } = await call(server, "get", "/usage", { key });
    expect([body.minute.quota, body.month.quota]).toEqual([120, 5_000]);
  });

  test("400 with a key in both places, or twice", async () => {
    const { key } = server.issue({ allowedInUrl: true });
    expectProblem(await call(server, "get", `/usage?key=${key}`, { key }), 400, "ambiguous-credentials");
    expectProblem(await call(server, "get", `/usage?key=${key}&key=${key}`), 400, "ambiguous-credentials");
  });

  test("the scheme's name in any case", async () => {
    const { key } = server.issue();
    expect((await authorization(`bearer ${key}`)).status).toBe(200);
    expect((await authorization(`BEARER  ${key}`)).status).toBe(200);
  });

  test("a wrong key is refused where none is needed, too", async () => {
    expectProblem(await call(server, "get", "/shapes", { key: "rho_wrong" }), 401, "invalid-key");
    const { key } = server.issue();
    expect((await call(server, "get", "/shapes", { key })).status).toBe(200);
  });

  test("401 comes before the body is looked at", async () => {
    const response = await request(server.base)
      .post("/api/v1/resistance")
      .set("Content-Type", "text/xml")
      .send("<a/>");
    expectProblem(response, 401, "missing-credentials");
  });
});
