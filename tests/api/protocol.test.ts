import { Agent, request as httpRequest } from "node:http";
import { connect } from "node:net";
import request from "supertest";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { registry } from "@/api/registry";
import { call, expectProblem, places, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue({ origins: ["https://intranet.merrow-pike.example"] }).key;
});
afterAll(() => server.stop());

const post = (body: string, headers: Record<string, string> = {}) =>
  call(server, "post", "/resistance", { key, body, headers });

describe("400", () => {
  test.each([
    ["broken JSON", '{"shape":'],
    ["two JSON texts", "{}{}"],
    ["single quotes", "{'shape':'bar'}"],
    ["NaN", '{"length":NaN}'],
  ])("%s", async (_, body) => expectProblem(await post(body), 400, "malformed-json"));

  test("an empty body", async () => {
    const response = await call(server, "post", "/resistance", {
      key,
      headers: { "Content-Type": "application/json" },
    });
    expectProblem(response, 400, "malformed-json");
  });

  test("bytes that are not UTF-8", async () => {
    const response = await request(server.base)
      .post("/api/v1/resistance")
      .set("Authorization", `Bearer ${key}`)
      .set("Content-Type", "application/json")
      .serialize((body) => body)
      .send(Buffer.from([0x22, 0xff, 0xfe, 0x22]));
    expectProblem(response, 400, "malformed-json");
  });
});

describe("a member that schemas pass over", () => {
  const deep = "[".repeat(5000) + "]".repeat(5000);

  test.each([
    ["as it is", `"__proto__":${deep}`],
    ["in escapes", String.raw`"__\u0070roto\u005F_":1`],
  ])("422 for __proto__ %s, at its place", async (_, member) => {
    const element = { name: "a", between: ["in", "out"], resistance: 1 };
    const body = { elements: [element], ports: ["in", "out"], record: { label: "kept" } };
    const text = JSON.stringify(body).replace('"resistance":1', `"resistance":1,${member}`);
    const response = await call(server, "post", "/networks", { key, body: text });
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toEqual(["#/elements/0/__proto__"]);
  });
});

describe("404", () => {
  test.each([
    "/nothing",
    "/shapes/bar/more",
    "/",
    "/resistance/",
    "/%zz",
    "/%ff%fe",
    "/records/rec_1/nothing",
    "/Shapes",
  ])("the unknown path %s", async (path) => {
    const response = await call(server, "get", path, { key });
    expect(response.status).toBe(404);
    expect(response.headers["content-type"]).toMatch(/^application\/problem\+json/);
  });

  test("without a key as well", async () => {
    expectProblem(await call(server, "get", "/nothing"), 404, "unknown-path");
    expectProblem(await call(server, "post", "/nothing", { body: {} }), 404, "unknown-path");
  });

  test("an unknown shape by its address, with the nearest", async () => {
    const response = await call(server, "get", "/shapes/cylindrical-shel");
    expectProblem(response, 404, "not-found");
    expect(response.body.detail).toContain("cylindrical-shell");
    expectProblem(await call(server, "get", "/shapes/__proto__"), 404, "not-found");
    expectProblem(await call(server, "get", "/resistance/nothing", { key }), 404, "not-found");
  });
});

describe("405", () => {
  const paths = [...new Set(registry.operations.map(({ path }) => path))];
  test.each(paths)("PUT %s, with Allow", async (path) => {
    const response = await call(server, "put", path.replace(/\{\w+\}/, "x"), { key, body: {} });
    expectProblem(response, 405, "method-not-allowed");
    const methods = registry.operations
      .filter((operation) => operation.path === path)
      .map(({ method }) => method);
    const allow = response.headers.allow.split(", ");
    expect(allow).toEqual(expect.arrayContaining([...methods, "OPTIONS"]));
    expect(allow).not.toContain("PUT");
    expect(allow.includes("HEAD")).toBe(methods.includes("GET"));
  });

  test("without a key as well", async () => {
    const response = await call(server, "get", "/resistance");
    expectProblem(response, 405, "method-not-allowed");
    expect(response.headers.allow).toBe("POST, OPTIONS");
  });
});

describe("406", () => {
  test("nothing acceptable", async () => {
    const response = await call(server, "get", "/shapes", { headers: { Accept: "application/xml" } });
    expectProblem(response, 406, "not-acceptable");
    const refused = await call(server, "get", "/shapes", {
      headers: { Accept: "application/json;q=0, text/html" },
    });
    expectProblem(refused, 406, "not-acceptable");
  });

  test.each(["*/*", "application/*", "application/json; q=0.1", "text/html, */*;q=0.1", "APPLICATION/JSON"])(
    "not for %s",
    async (accept) => {
      const response = await call(server, "get", "/health", { headers: { Accept: accept } });
      expect(response.status).toBe(200);
      expect(response.type).toBe("application/json");
    },
  );
});

describe("413", () => {
  test("a body of 3 MB, drained before the answer", async () => {
    const response = await post(JSON.stringify({ ...SLEEVE, padding: "x".repeat(3_000_000) }));
    expectProblem(response, 413, "body-too-large");
    expect(response.body.detail).toContain("1,000,000");
  });

  test("in pieces, without a length told in advance", async () => {
    const { hostname, port } = new URL(server.base);
    const answer = await new Promise<string>((resolve, reject) => {
      const socket = connect(Number(port), hostname);
      let text = "";
      socket.on("data", (data) => {
        text += data.toString("latin1");
        if (text.includes("\r\n\r\n")) socket.end();
      });
      socket.on("close", () => resolve(text));
      socket.on("error", reject);
      socket.write(
        `POST /api/v1/resistance HTTP/1.1\r\nHost: ${hostname}:${port}\r\nAuthorization: Bearer ${key}\r\nContent-Type: application/json\r\nTransfer-Encoding: chunked\r\n\r\n`,
      );
      const chunk = `10000\r\n${"x".repeat(0x10000)}\r\n`;
      for (let i = 0; i < 40; i++) socket.write(chunk);
      socket.write("0\r\n\r\n");
    });
    expect(answer).toMatch(/^HTTP\/1\.1 413/);
  });

  test("a refused body of any kind leaves the connection usable", async () => {
    const agent = new Agent({ keepAlive: true, maxSockets: 1 });
    const send = (path: string, body: string, headers: Record<string, string>) =>
      new Promise<number | undefined>((resolve, reject) => {
        const options = {
          method: "POST",
          agent,
          headers: { "Content-Type": "application/json", ...headers },
        };
        const sent = httpRequest(`${server.base}/api/v1${path}`, options, (answer) => {
          answer.resume();
          answer.once("end", () => resolve(answer.statusCode));
        });
        sent.once("error", reject);
        sent.end(body);
      });
    const large = JSON.stringify({ padding: "x".repeat(900_000) });
    const huge = "x".repeat(5_000_000);
    const known = { Authorization: `Bearer ${key}` };
    const statuses = [
      await send("/resistance", large, {}),
      await send("/resistance", large, { Authorization: "Bearer rho_wrong" }),
      await send("/nothing", large, known),
      await send("/shapes", large, known),
      await send("/resistance", large, { ...known, "Content-Type": "text/xml" }),
      await send("/resistance", huge, known),
      await send("/resistance", JSON.stringify(SLEEVE), known),
    ];
    agent.destroy();
    expect(statuses).toEqual([401, 401, 404, 405, 415, 413, 200]);
  });

  test("one just below the limit is read", async () => {
    const padded = JSON.stringify(SLEEVE).padEnd(999_999, " ");
    expect((await post(padded)).status).toBe(200);
  });
});

describe("415", () => {
  test.each([
    ["another type", { "Content-Type": "text/xml" }],
    ["a form", { "Content-Type": "application/x-www-form-urlencoded" }],
    ["another character set", { "Content-Type": "application/json; charset=latin1" }],
    ["a content encoding", { "Content-Type": "application/json", "Content-Encoding": "gzip" }],
    ["CSV where only JSON is read", { "Content-Type": "text/csv" }],
  ])("%s", async (_, headers) => {
    const response = await post(JSON.stringify(SLEEVE), headers);
    expectProblem(response, 415, "unsupported-media-type");
    expect(response.body.detail).toContain("application/json");
  });

  test("not for the type's parameters and case", async () => {
    for (const type of [
      "application/json; charset=UTF-8",
      "Application/JSON",
      'application/json;charset="utf-8"',
    ]) {
      expect((await post(JSON.stringify(SLEEVE), { "Content-Type": type })).status).toBe(200);
    }
  });
});

describe("422 for a query", () => {
  test.each([
    ["/materials?limit=0", "limit"],
    ["/materials?limit=many", "limit"],
    ["/materials?limit=1.5", "limit"],
    ["/materials?cursor=abc", "cursor"],
    ["/materials?owner=nobody", "owner"],
    ["/materials?ownr=team", "ownr"],
    ["/materials?limit=1&limit=2", "limit"],
    ["/usage?day=1", "day"],
    ["/usage?format=text", "format"],
  ])("%s", async (path, parameter) => {
    const response = await call(server, "get", path, { key });
    expectProblem(response, 422, "invalid-input");
    expect(response.body.errors.map((entry: { parameter: string }) => entry.parameter)).toEqual([parameter]);
  });
});

describe("HEAD and OPTIONS", () => {
  test("HEAD answers the headers of GET without a body", async () => {
    const [head, get] = [await call(server, "head", "/shapes"), await call(server, "get", "/shapes")];
    expect(head.status).toBe(200);
    expect(head.text ?? "").toBe("");
    for (const name of ["content-type", "etag", "cache-control", "content-length"]) {
      expect(head.headers[name]).toBe(get.headers[name]);
    }
    expect((await call(server, "head", "/shapes/nothing")).status).toBe(404);
    expect((await call(server, "head", "/resistance")).status).toBe(405);
  });

  test("OPTIONS tells the methods without a key and costs nothing", async () => {
    const response = await call(server, "options", "/materials/x");
    expect(response.status).toBe(204);
    expect(response.headers.allow).toBe("GET, PATCH, DELETE, HEAD, OPTIONS");
    expect(response.headers["ratelimit"]).toBeTruthy();
    expectProblem(await call(server, "options", "/nothing"), 404, "unknown-path");
  });
});

describe("304", () => {
  test.each(["/shapes", "/shapes/bar", "/openapi.json"])("%s unchanged", async (path) => {
    const first = await call(server, "get", path);
    expect(first.status).toBe(200);
    expect(first.headers["cache-control"]).toBe("no-cache");
    for (const tag of [
      first.headers.etag,
      `"x", ${first.headers.etag}`,
      "*",
      first.headers.etag.replace("W/", ""),
    ]) {
      const again = await call(server, "get", path, { headers: { "If-None-Match": tag } });
      expect(again.status).toBe(304);
      expect(again.text).toBe("");
      expect(again.headers.etag).toBe(first.headers.etag);
    }
    expect((await call(server, "get", path, { headers: { "If-None-Match": '"x"' } })).status).toBe(200);
  });
});

describe("headers of every answer", () => {
  test("security, request id, limits", async () => {
    const answers = [
      await call(server, "get", "/health"),
      await post(JSON.stringify(SLEEVE)),
      await call(server, "get", "/nothing"),
      await call(server, "post", "/resistance", { body: {} }),
      await call(server, "options", "/shapes"),
    ];
    for (const { headers } of answers) {
      expect(headers["x-content-type-options"]).toBe("nosniff");
      expect(headers["content-security-policy"]).toContain("default-src 'none'");
      expect(headers["content-security-policy"]).toContain("frame-ancestors 'none'");
      expect(headers["referrer-policy"]).toBe("no-referrer");
      expect(headers["permissions-policy"]).toContain("camera=()");
      expect(headers["request-id"]).toMatch(/^req_/);
      expect(headers["ratelimit-policy"]).toMatch(/^"(minute|address)";q=\d+;w=60/);
      expect(headers["ratelimit"]).toMatch(/^"(minute|address)";r=\d+;t=\d+/);
      expect(headers["x-powered-by"]).toBeUndefined();
    }
    expect(new Set(answers.map(({ headers }) => headers["request-id"])).size).toBe(answers.length);
  });
});

describe("CORS", () => {
  const allowed = "https://intranet.merrow-pike.example";
  const exposed = [
    "RateLimit",
    "RateLimit-Policy",
    "Retry-After",
    "Request-Id",
    "Location",
    "Link",
    "ETag",
    "Deprecation",
    "Sunset",
  ];
  const from = (origin: string) =>
    call(server, "post", "/resistance", { key, body: SLEEVE, headers: { Origin: origin } });

  test("an allowed origin may call and read the named headers", async () => {
    const response = await from(allowed);
    expect(response.status).toBe(200);
    expect(response.headers["access-control-allow-origin"]).toBe(allowed);
    expect(response.headers["access-control-expose-headers"].split(", ").sort()).toEqual([...exposed].sort());
    expect(response.headers.vary).toContain("Origin");
    expect(response.headers["access-control-allow-credentials"]).toBeUndefined();
  });

  test("403 from any other origin, without leave to read", async () => {
    for (const origin of [
      "https://elsewhere.example",
      "http://intranet.merrow-pike.example",
      `${allowed}:8443`,
      "null",
    ]) {
      const response = await from(origin);
      expectProblem(response, 403, "origin-not-allowed");
      expect(response.headers["access-control-allow-origin"]).toBeUndefined();
    }
  });

  test("our own pages are always allowed", async () => {
    const response = await from(server.base);
    expect(response.status).toBe(200);
  });

  test("a preflight needs no key and spends nothing", async () => {
    const response = await call(server, "options", "/resistance", {
      headers: {
        Origin: "https://elsewhere.example",
        "Access-Control-Request-Method": "POST",
        "Access-Control-Request-Headers": "authorization,content-type",
      },
    });
    expect(response.status).toBe(204);
    expect(response.headers["access-control-allow-origin"]).toBe("https://elsewhere.example");
    expect(response.headers["access-control-allow-methods"]).toContain("POST");
    const headers = response.headers["access-control-allow-headers"].toLowerCase();
    for (const name of ["authorization", "content-type", "idempotency-key", "if-match", "prefer"]) {
      expect(headers).toContain(name);
    }
    expect(Number(response.headers["access-control-max-age"])).toBeGreaterThan(0);
  });

  test("what needs no key is open to every origin, a refusal of credentials can be read", async () => {
    const headers = { Origin: "https://elsewhere.example" };
    const open = await call(server, "get", "/shapes/bar", { headers });
    expect(open.headers["access-control-allow-origin"]).toBe("https://elsewhere.example");
    const refused = await call(server, "post", "/resistance", { key: "rho_wrong", body: SLEEVE, headers });
    expectProblem(refused, 401, "invalid-key");
    expect(refused.headers["access-control-allow-origin"]).toBe("https://elsewhere.example");
  });
});
