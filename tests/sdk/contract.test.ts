/**
 * What both clients must make of the same answers: each case is one service that answers as told, called once by the
 * TypeScript client and once by the Python client.
 */
import { afterEach, describe, expect, it } from "vitest";
import { computeResistance, issueKey, readHealth, rhoform } from "@/sdk/typescript/src/index";
import {
  type AnsweringService,
  answer,
  answeringService,
  type Handler,
  problem,
} from "./support/answering-service";
import { python } from "./support/python";

const KEY = "rho_abc123_secretsecretsecret";

/** A call that carries an idempotency key by itself, one that never does, and a read. */
type Call = "compute" | "issue" | "read";

interface Told {
  readonly kind: string;
  readonly status?: number;
  readonly code?: string;
  readonly retryAfter?: number | null;
  readonly text: string;
}

let running: AnsweringService | undefined;
afterEach(() => running?.stop());

async function byTypescript(baseUrl: string, call: Call, timeoutMs: number, retries: number): Promise<Told> {
  const client = rhoform({ baseUrl, key: KEY, timeoutMs, retries });
  const work: Record<Call, () => Promise<unknown>> = {
    compute: () =>
      computeResistance({
        client,
        body: {
          shape: "bar",
          dimensions: { length: 1, width: 1, thickness: 1 },
          medium: { resistivity: 1 },
        },
      }),
    issue: () => issueKey({ client, body: { name: "x", scopes: ["compute"] } }),
    read: () => readHealth({ client }),
  };
  try {
    await work[call]();
    return { kind: "answered", text: "" };
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    return { ...error, kind: error.name, text: `${String(error)} ${JSON.stringify(error)}` };
  }
}

const PYTHON = `
import json, os, rhoform
client = rhoform.Client(os.environ["BASE"], key=os.environ["KEY"], timeout=float(os.environ["SECONDS"]),
    retries=int(os.environ["RETRIES"]))
work = {"compute": lambda: client.resistance(rhoform.Bar(length=1, width=1, thickness=1), {"resistivity": 1}),
    "issue": lambda: client.issue_key({"name": "x", "scopes": ["compute"]}), "read": client.read_health}
try:
    work[os.environ["CALL"]]()
    told = {"kind": "answered", "text": ""}
except rhoform.RhoformProblem as error:
    told = {"kind": "RhoformProblem", "status": error.status, "code": error.code, "retryAfter": error.retry_after,
        "text": f"{error} {error!r} {vars(error)}"}
except rhoform.RhoformError as error:
    told = {"kind": type(error).__name__, "text": f"{error} {error!r} {vars(error)}"}
print(json.dumps(told))
`;

async function byPython(baseUrl: string, call: Call, timeoutMs: number, retries: number): Promise<Told> {
  const ran = await python(["-c", PYTHON], {
    ...{ BASE: baseUrl, KEY, CALL: call },
    ...{ SECONDS: String(timeoutMs / 1000), RETRIES: String(retries) },
  });
  expect(ran.err).toBe("");
  return JSON.parse(ran.out);
}

interface Case {
  readonly name: string;
  readonly call: Call;
  readonly handler: Handler;
  readonly expected: Partial<Told>;
  readonly tries: number;
  /** Least time between the first two tries, ms. */
  readonly waits?: number;
  readonly timeoutMs?: number;
  readonly retries?: number;
}

/** Answers the first call with a status and the others well. */
const once =
  (status: number, headers: Record<string, string> = {}): Handler =>
  (_request, response, call) =>
    call === 1
      ? answer(response, status, problem("busy", status), headers)
      : answer(response, 200, { resistance: {}, status: "ok" });

const always =
  (status: number, code: string, headers: Record<string, string> = {}): Handler =>
  (_request, response) =>
    answer(response, status, problem(code, status), headers);

const dropped: Handler = (request, response, call) =>
  call === 1 ? request.socket.destroy() : answer(response, 200, { status: "ok" });

const refused = (status: number, code: string): Case => ({
  name: `${status} is a problem at once`,
  call: "compute",
  handler: always(status, code),
  expected: { kind: "RhoformProblem", status, code, retryAfter: null },
  tries: 1,
});

const ANSWERED = { kind: "answered" };

const CASES: readonly Case[] = [
  {
    name: "200 is the answer",
    call: "read",
    handler: (_request, response) => answer(response, 200, { status: "ok" }),
    expected: ANSWERED,
    tries: 1,
  },
  {
    name: "202 is an answer",
    call: "issue",
    handler: (_request, response) => answer(response, 202, {}),
    expected: ANSWERED,
    tries: 1,
  },
  refused(401, "invalid-key"),
  refused(403, "insufficient-scope"),
  refused(404, "not-found"),
  refused(409, "request-in-progress"),
  refused(413, "body-too-large"),
  refused(422, "invalid-input"),
  refused(500, "internal-error"),
  ...[429, 503].flatMap((status): Case[] => [
    {
      name: `${status} waits as Retry-After says`,
      call: "issue",
      handler: once(status, { "Retry-After": "1" }),
      expected: ANSWERED,
      tries: 2,
      waits: 990,
    },
    {
      name: `${status} with a date of the past is tried again at once`,
      call: "compute",
      handler: once(status, { "Retry-After": "Thu, 01 Jan 2026 00:00:00 GMT" }),
      expected: ANSWERED,
      tries: 2,
    },
    {
      name: `${status} without Retry-After waits half a second`,
      call: "compute",
      handler: once(status),
      expected: ANSWERED,
      tries: 2,
      waits: 490,
    },
    {
      name: `${status} is told where it asks for more than a minute`,
      call: "compute",
      handler: always(status, "busy", { "Retry-After": "61" }),
      expected: { kind: "RhoformProblem", status, code: "busy", retryAfter: 61 },
      tries: 1,
    },
    {
      name: `${status} ends after three tries`,
      call: "compute",
      handler: always(status, "busy", { "Retry-After": "0" }),
      expected: { kind: "RhoformProblem", status, retryAfter: 0 },
      tries: 3,
    },
  ]),
  ...[502, 504].flatMap((status): Case[] => [
    {
      name: `${status} is tried again where a repeat does no harm`,
      call: "compute",
      handler: once(status),
      expected: ANSWERED,
      tries: 2,
    },
    {
      name: `${status} is not tried again for a secret that may be lost`,
      call: "issue",
      handler: once(status),
      expected: { kind: "RhoformProblem", status },
      tries: 1,
    },
  ]),
  {
    name: "a dropped connection is tried again for a call with an idempotency key",
    call: "compute",
    handler: dropped,
    expected: ANSWERED,
    tries: 2,
  },
  {
    name: "a dropped connection is tried again for a read",
    call: "read",
    handler: dropped,
    expected: ANSWERED,
    tries: 2,
  },
  {
    name: "a dropped connection is told for a secret that may be lost",
    call: "issue",
    handler: dropped,
    expected: { kind: "RhoformUnreachable" },
    tries: 1,
  },
  {
    name: "no answer is a timeout",
    call: "compute",
    handler: () => undefined,
    expected: { kind: "RhoformTimeout" },
    tries: 2,
    timeoutMs: 300,
    retries: 1,
  },
  {
    name: "an answer that repeats the key is told without it",
    call: "compute",
    handler: (request, response) =>
      answer(response, 401, {
        ...problem("invalid-key", 401),
        title: `No ${request.headers.authorization}`,
        detail: `Sent: ${request.headers.authorization}`,
        errors: [{ pointer: `#/${KEY}`, detail: KEY }],
      }),
    expected: { kind: "RhoformProblem", status: 401 },
    tries: 1,
  },
];

describe.each([
  ["TypeScript", byTypescript],
  ["Python", byPython],
] as const)("the client for %s", (_language, make) => {
  it.each(CASES)(
    "$name",
    async ({ call, handler, expected, tries, waits, timeoutMs = 30_000, retries = 2 }) => {
      running = await answeringService(handler);
      const told = await make(running.baseUrl, call, timeoutMs, retries);
      expect(told).toMatchObject(expected);
      expect(told.text).not.toContain("secretsecret");
      expect(running.calls).toHaveLength(tries);
      if (waits !== undefined)
        expect(running.calls[1].at - running.calls[0].at).toBeGreaterThanOrEqual(waits);
      const keys = new Set(running.calls.map(({ headers }) => headers["idempotency-key"]));
      expect(keys.size).toBe(1);
    },
  );
});
