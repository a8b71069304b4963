import request, { type Response } from "supertest";
import { expect } from "vitest";
import type { TestServer } from "./server";

/** A body that is computed without complaint. */
export const SLEEVE = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
} as const;

type Method = "get" | "post" | "patch" | "delete" | "put" | "options" | "head";

interface CallOptions {
  readonly key?: string;
  readonly body?: unknown;
  readonly headers?: Readonly<Record<string, string>>;
}

/** One call below `/api/v1`, over HTTP. A text body is sent as it is, anything else as JSON. */
export async function call(
  server: TestServer,
  method: Method,
  path: string,
  { key, body, headers = {} }: CallOptions = {},
): Promise<Response> {
  let test = request(server.base)[method](`/api/v1${path}`);
  if (key !== undefined) test = test.set("Authorization", `Bearer ${key}`);
  if (body !== undefined && headers["Content-Type"] === undefined)
    test = test.set("Content-Type", "application/json");
  for (const [name, value] of Object.entries(headers)) test = test.set(name, value);
  if (body === undefined) return await test;
  return await test.send(typeof body === "string" ? body : JSON.stringify(body));
}

/** Expects a problem document of that status and code, and what every problem has. */
export function expectProblem(response: Response, status: number, code: string): void {
  expect([response.status, response.body.type?.split("/").pop()]).toEqual([status, code]);
  expect(response.headers["content-type"]).toMatch(/^application\/problem\+json/);
  expect(response.body.status).toBe(status);
  expect(response.body.title).toBeTruthy();
  expect(response.body.detail).toBeTruthy();
  expect(response.body.type).toMatch(new RegExp(`/docs/problems/${code}$`));
  expect(response.body.instance).toBe(response.headers["request-id"]);
  expect(response.headers["request-id"]).toMatch(/^req_[0-9A-Za-z]{16}$/);
  expect(response.headers["ratelimit-policy"]).toBeTruthy();
  expect(response.headers["ratelimit"]).toBeTruthy();
}

/** Where the complaints of a 422 point. */
export function places(response: Response): string[] {
  const errors: { pointer?: string; parameter?: string; detail: string }[] = response.body.errors ?? [];
  for (const { detail } of errors) expect(detail.length).toBeGreaterThan(5);
  return errors.map(({ pointer, parameter }) => pointer ?? parameter ?? "");
}
