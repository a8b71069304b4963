import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { registry } from "@/api/registry";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import { seededRandom } from "../field/random-outlines";
import { call, expectProblem } from "../support/call";
import { startServer, type TestServer } from "../support/server";

/** How many bodies each path gets. */
const BODIES: Readonly<Record<string, number>> = {
  "/resistance": 70,
  "/sizing": 50,
  "/networks": 60,
  "/resistance/batch": 30,
  "/outlines": 50,
  "/fields": 50,
  "/materials": 50,
  "/keys": 50,
};

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer({});
  key = server.issue({ scopes: [...SCOPE_NAMES], quotas: { minute: 1_000_000, month: 100_000_000 } }).key;
});
afterAll(() => server.stop());

type Random = () => number;
const pick = <T>(random: Random, from: readonly T[]): T => from[Math.floor(random() * from.length)];

/** Written as they stand into the text of the body, for JSON can say more than JavaScript writes. */
const RAW = (text: string) => `\u0001${text}\u0001`;
const nested = (depth: number) => RAW("[".repeat(depth) + "]".repeat(depth));

const VALUES: readonly unknown[] = [
  null,
  true,
  false,
  0,
  -0,
  1,
  -1,
  0.5,
  1e-320,
  5e-324,
  1e-30,
  1e30,
  1e300,
  -1.7976931348623157e308,
  2 ** 53,
  RAW("1e999"),
  RAW("-1e999"),
  RAW("0.".padEnd(400, "1")),
  RAW('{"__proto__": {"a": 1}, "constructor": 1}'),
  nested(60),
  nested(5000),
  "",
  " ",
  "NaN",
  "Infinity",
  "-Infinity mm",
  "1e999 mm",
  "0 mm",
  "1e-300 m",
  "1e300 m",
  "12,5 mm",
  "1/0 in",
  "1 mm 2",
  "5 kg",
  "-3 Ω",
  "５ｍｍ",
  "\u0000",
  "\ud800",
  "\u202e12 mm",
  "e\u0301🜁\u2028",
  "x".repeat(5000),
  "9".repeat(4000),
  "__proto__",
  "toString",
  [],
  [[]],
  [null],
  [1, 2],
  {},
  { value: 1 },
  { value: "1 mm", tolerance: "200 %" },
  { length: 3 },
];

const NAMES = [
  "__proto__",
  "constructor",
  "length",
  "toString",
  "",
  "x\u0000",
  "unit",
  "value",
  "🜁",
  "record",
];

type Json = unknown[] | Record<string, unknown>;
const isJson = (value: unknown): value is Json => typeof value === "object" && value !== null;

/** Every array and object of a body, with the body in front of them. */
function containers(body: Json): Json[] {
  return [body, ...Object.values(body).filter(isJson).flatMap(containers)];
}

/** Changes one place of a body. */
function mutate(body: Json, random: Random): void {
  const holder = pick(random, containers(body));
  const names = Object.keys(holder);
  const name = names.length === 0 ? "0" : pick(random, names);
  const old: unknown = Reflect.get(holder, name);
  const put = (key: string, value: unknown) =>
    Object.defineProperty(holder, key, { value, enumerable: true, writable: true, configurable: true });
  const scale = 10 ** Math.round(pick(random, [4, 40, 600]) * (random() - 0.5));
  const scaled = () =>
    typeof old === "number"
      ? old * scale
      : String(old).replace(/^[\d.]+/, (digits) => String(Number(digits) * scale));
  const changes = [
    () => put(name, isJson(old) ? old : scaled()),
    () => put(name, isJson(old) ? old : scaled()),
    () => put(name, pick(random, VALUES)),
    () => put(name, pick(random, VALUES)),
    () => (Array.isArray(holder) ? holder.pop() : Reflect.deleteProperty(holder, name)),
    () => (Array.isArray(holder) ? holder.push(old) : put(pick(random, NAMES), pick(random, VALUES))),
    () => put(name, [old]),
    () => put(name, { value: old }),
    () => put(name, typeof old === "number" ? -old : isJson(old) ? Object.values(old) : `${String(old)}`),
    () => put(name, isJson(old) ? { ...old } : [old, old]),
    () => put(name, structuredClone(pick(random, containers(body)))),
  ];
  pick(random, changes)();
}

/** The text of a body, with what is written as it stands. */
function write(body: unknown): string {
  if (typeof body === "string" && body.startsWith("\u0001")) return body.slice(1, -1);
  if (!isJson(body)) return JSON.stringify(body) ?? "null";
  if (Array.isArray(body)) return `[${body.map(write).join()}]`;
  const members = Object.entries(body).map(([name, value]) => `${JSON.stringify(name)}:${write(value)}`);
  return `{${members.join()}}`;
}

/** What of an answer is out of order: bounds that do not hold their value, and words for what is no number. */
function disorder(answer: unknown): unknown[] {
  if (!isJson(answer)) return [];
  const { lower, value, upper, text } = answer as Record<string, unknown>;
  const numbers = [lower, value, upper];
  const bounded = text !== undefined && numbers.every((number) => number !== undefined);
  const ordered =
    numbers.every(Number.isFinite) && Number(lower) <= Number(value) && Number(value) <= Number(upper);
  const wrong = (bounded && !ordered) || /NaN|Infinity|undefined/.test(String(text ?? ""));
  return [...(wrong ? [answer] : []), ...Object.values(answer).flatMap(disorder)];
}

describe.each(Object.entries(BODIES))("POST %s", (path, count) => {
  test("answers every changed body with a success in order or a problem", { timeout: 60_000 }, async () => {
    const operation = registry.operations.find((one) => one.method === "POST" && one.path === path);
    const bodies = (operation?.examples ?? []).flatMap(({ status, body }) =>
      status < 300 && isJson(body) ? [body] : [],
    );
    const random = seededRandom(path.length);
    const seen = { answered: 0, refused: 0 };
    for (let k = 0; k < count; k++) {
      const body = structuredClone(pick(random, bodies));
      for (let changes = Math.floor(1 + 3 * random() ** 2); changes > 0; changes--) mutate(body, random);
      const text = write(body);
      const headers = { Prefer: "wait=5" };
      const response = await call(server, "post", path, { key, body: text, headers });
      const told = text.length > 1000 ? `${text.slice(0, 500)} … ${text.slice(-500)}` : text;
      if (response.status >= 500) throw new Error(`${told}\n${response.text}`);
      if (response.status >= 400) {
        seen.refused++;
        expectProblem(response, response.status, response.body.type?.split("/").pop());
      } else {
        seen.answered++;
        expect([told, disorder(response.body)]).toEqual([told, []]);
      }
    }
    // Neither kind is missed by changes that are too small or too large.
    expect(Math.min(seen.answered, seen.refused)).toBeGreaterThan(0);
  });
});
