import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { registry } from "@/api/registry";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

describe("403 without the scope", () => {
  const scoped = registry.operations.filter(({ scope }) => scope !== "none" && scope !== "any");

  test.each(scoped.map((operation) => [operation.method, operation.path, operation.scope] as const))(
    "%s %s needs %s",
    async (method, path, scope) => {
      const { key } = server.issue({ scopes: SCOPE_NAMES.filter((name) => name !== scope) });
      const verb = method.toLowerCase() as "get" | "post" | "patch" | "delete";
      const body = verb === "post" || verb === "patch" ? {} : undefined;
      const response = await call(server, verb, path.replace(/\{\w+\}/, "x"), { key, body });
      expectProblem(response, 403, "insufficient-scope");
      expect(response.headers["www-authenticate"]).toBe(
        `Bearer realm="rhoform", error="insufficient_scope", scope="${scope}"`,
      );
    },
  );

  test("GET /usage is open to any key", async () => {
    const { key } = server.issue({ scopes: ["field"] });
    expect((await call(server, "get", "/usage", { key })).status).toBe(200);
  });
});

describe("404 for what another team owns, the same as for what does not exist", () => {
  test("records, materials and keys", async () => {
    const scopes = [...SCOPE_NAMES];
    const ours = server.issue({ scopes }).key;
    const theirs = server.issue({ scopes, team: "earthing" });
    const record = await call(server, "post", "/resistance", {
      key: ours,
      body: { ...SLEEVE, record: { label: "Ours" } },
    });
    const material = await call(server, "post", "/materials", {
      key: ours,
      body: {
        name: "Ours",
        kind: "alloy",
        resistivity: { model: "constant", resistivity: 1e-7 },
        range: { from: 0, to: 100 },
        uncertainty: { lower: 0.9, upper: 1.1, note: "Guess of a test." },
        source: "Test",
        provenance: "measured",
      },
    });
    const owned = await call(server, "post", "/keys", {
      key: ours,
      body: { name: "Ours", scopes: ["compute"] },
    });
    const [recordId, materialId, keyId] = [record.body.record.id, material.body.id, owned.body.id];
    for (const id of [recordId, materialId, keyId]) expect(id).toBeTruthy();
    const attempts: [Parameters<typeof call>[1], string, unknown?][] = [
      ["get", `/records/${recordId}`],
      ["patch", `/records/${recordId}`, { label: "Theirs" }],
      ["post", `/records/${recordId}/replay`],
      ["delete", `/records/${recordId}`],
      ["get", `/materials/${materialId}`],
      ["patch", `/materials/${materialId}`, { note: "Theirs" }],
      ["delete", `/materials/${materialId}`],
      ["get", `/keys/${keyId}`],
      ["post", `/keys/${keyId}/rotate`, {}],
      ["delete", `/keys/${keyId}`],
    ];
    for (const [method, path, body] of attempts) {
      const headers = { "If-Match": "*" };
      const real = await call(server, method, path, { key: theirs.key, body, headers });
      const absent = await call(server, method, path.replace(/(rec_|mat-|k)[0-9A-Za-z]{10,}/, "$10000"), {
        key: theirs.key,
        body,
        headers,
      });
      expectProblem(real, 404, "not-found");
      expect({ ...real.body, instance: "" }).toEqual({ ...absent.body, instance: "" });
    }
    expect((await call(server, "get", `/records/${recordId}`, { key: ours })).body.label).toBe("Ours");
    const use = await call(server, "post", "/resistance", {
      key: theirs.key,
      body: { ...SLEEVE, medium: { material: materialId } },
    });
    expectProblem(use, 422, "invalid-input");
    for (const path of ["/records", "/materials?owner=team", "/keys"]) {
      const text = (await call(server, "get", path, { key: theirs.key })).text;
      for (const id of [recordId, materialId, keyId]) expect(text).not.toContain(id);
    }
  });
});
