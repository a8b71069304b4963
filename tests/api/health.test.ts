import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "@/lib/engine";
import { call } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

describe("GET /health", () => {
  test("200 without a key, with the versions", async () => {
    const response = await call(server, "get", "/health");
    expect(response.status).toBe(200);
    expect(response.body).toEqual({ status: "ok", engine: ENGINE_VERSION, catalogue: CATALOGUE_VERSION });
    expect(response.headers["cache-control"]).toBe("no-store");
  });
});
