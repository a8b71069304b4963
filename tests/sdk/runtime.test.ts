import { type IncomingMessage, type Server, type ServerResponse, createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { inspect } from "node:util";
import { afterEach, describe, expect, it } from "vitest";
import { RhoformProblem, computeResistance, issueKey, readHealth, rhoform } from "@/sdk/typescript/src/index";
import { retryAfterSeconds } from "@/sdk/typescript/src/failure";

const KEY = "rho_abc123_secretsecretsecret";
const BODY = {
  shape: "bar" as const,
  dimensions: { length: 1, width: 1, thickness: 1 },
  medium: { resistivity: 1 },
};

type Handler = (request: IncomingMessage, response: ServerResponse, call: number) => void;

let server: Server | undefined;

afterEach(() => {
  server?.closeAllConnections();
  server?.close();
});

/** A service that answers as told, to see what the client makes of it. */
async function service(handler: Handler) {
  const calls: { method: string; url: string; authorization: string | undefined; at: number }[] = [];
  server = createServer((request, response) => {
    calls.push({
      method: request.method ?? "",
      url: request.url ?? "",
      authorization: request.headers.authorization,
      at: performance.now(),
    });
    handler(request, response, calls.length);
  });
  await new Promise<void>((resolve) => server?.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  return { calls, baseUrl: `http://127.0.0.1:${port}` };
}

function json(response: ServerResponse, status: number, body: unknown, headers: Record<string, string> = {}) {
  const type = status < 400 ? "application/json" : "application/problem+json";
  response.writeHead(status, { "Content-Type": type, ...headers });
  response.end(JSON.stringify(body));
}

function problem(code: string, status: number, more: object = {}) {
  return {
    type: `https://rhoform.example/docs/problems/${code}`,
    title: "A title",
    status,
    detail: "What happened.",
    instance: "req_1",
    ...more,
  };
}

async function failure(work: Promise<unknown>): Promise<unknown> {
  return work.then(
    () => expect.fail("the call should have failed"),
    (error: unknown) => error,
  );
}

describe("calls", () => {
  it("send the key and the body, and answer with the body of the answer", async () => {
    const { calls, baseUrl } = await service((_request, response) => json(response, 200, { status: "ok" }));
    const client = rhoform({ baseUrl, key: KEY });
    expect(await computeResistance({ client, body: BODY })).toEqual({ status: "ok" });
    expect(calls[0]).toMatchObject({
      method: "POST",
      url: "/api/v1/resistance",
      authorization: `Bearer ${KEY}`,
    });
  });

  it.each(["/", "/api/v1", "/api/v1/"])("take a base address that ends in %s", async (end) => {
    const { calls, baseUrl } = await service((_request, response) => json(response, 200, {}));
    await readHealth({ client: rhoform({ baseUrl: baseUrl + end }) });
    expect(calls[0].url).toBe("/api/v1/health");
  });
});

describe("refusals", () => {
  it("422 is a problem with its complaints", async () => {
    const errors = [{ pointer: "#/dimensions/width", detail: "must be greater than 0." }];
    const { baseUrl } = await service((_request, response) =>
      json(response, 422, problem("invalid-input", 422, { errors })),
    );
    const error = await failure(computeResistance({ client: rhoform({ baseUrl, key: KEY }), body: BODY }));
    expect(error).toBeInstanceOf(RhoformProblem);
    expect(error).toMatchObject({ status: 422, code: "invalid-input", requestId: "req_1", errors });
    expect(String(error)).toContain("#/dimensions/width must be greater than 0.");
  });

  it("an answer that is no problem document is told by its status", async () => {
    const { baseUrl } = await service((_request, response) => {
      response.writeHead(418, { "Content-Type": "text/html" });
      response.end("<p>no</p>");
    });
    const error = await failure(readHealth({ client: rhoform({ baseUrl }) }));
    expect(error).toMatchObject({ name: "RhoformProblem", status: 418, code: "unknown" });
  });
});

describe("the way there", () => {
  it("is tried again for a call with an idempotency key of the caller", async () => {
    const { calls, baseUrl } = await service((request, response, call) =>
      call === 1 ? request.socket.destroy() : json(response, 201, {}),
    );
    const client = rhoform({ baseUrl, key: KEY });
    await issueKey({
      client,
      body: { name: "x", scopes: ["compute"] },
      headers: { "Idempotency-Key": "7f3c" },
    });
    expect(calls).toHaveLength(2);
  });

  it("the caller's abort ends the call with the caller's reason", async () => {
    const stop = new AbortController();
    const { calls, baseUrl } = await service(() => stop.abort(new Error("changed my mind")));
    const error = await failure(readHealth({ client: rhoform({ baseUrl }), signal: stop.signal }));
    expect(error).toMatchObject({ message: "changed my mind" });
    expect(calls).toHaveLength(1);
  });

  it("the caller's abort ends a wait between tries", async () => {
    const { baseUrl } = await service((_request, response) =>
      json(response, 429, problem("too-many-requests", 429), { "Retry-After": "30" }),
    );
    const started = performance.now();
    const error = await failure(
      readHealth({ client: rhoform({ baseUrl }), signal: AbortSignal.timeout(100) }),
    );
    expect(error).toMatchObject({ name: "TimeoutError" });
    expect(performance.now() - started).toBeLessThan(5_000);
  });
});

describe("the key", () => {
  it("is in no error and in no print of the client", async () => {
    const { baseUrl } = await service((_request, response) =>
      json(response, 401, problem("invalid-key", 401)),
    );
    const client = rhoform({ baseUrl, key: KEY, retries: 0 });
    const closed = rhoform({ baseUrl: "http://127.0.0.1:9", key: KEY, retries: 0 });
    const errors = [
      await failure(computeResistance({ client, body: BODY })),
      await failure(computeResistance({ client: closed, body: BODY })),
    ];
    const shown = [client, client.getConfig(), ...errors].map((value) => inspect(value, { depth: 12 }));
    for (const text of shown) expect(text).not.toContain("secretsecret");
  });

  it("is refused with a message that does not hold it", () => {
    expect(() => rhoform({ baseUrl: "http://127.0.0.1", key: "hunter2\n" })).toThrow(TypeError);
    try {
      rhoform({ baseUrl: "http://127.0.0.1", key: "hunter2\n" });
    } catch (error) {
      expect(String(error)).not.toContain("hunter2");
    }
  });
});

it("reads Retry-After as seconds and as a date", () => {
  const after = (value: string) => new Response(null, { headers: { "Retry-After": value } });
  const now = Date.parse("2026-01-01T00:00:00Z");
  expect(retryAfterSeconds(after("17"), now)).toBe(17);
  expect(retryAfterSeconds(after("Thu, 01 Jan 2026 00:00:30 GMT"), now)).toBe(30);
  expect(retryAfterSeconds(after("soon"), now)).toBeNull();
  expect(retryAfterSeconds(new Response(null), now)).toBeNull();
});
