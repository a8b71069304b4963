import { expect, test } from "vitest";
import { collectRefusals } from "@/api/examples/refusals";
import { REFUSED_CALLS } from "@/api/examples/refused-calls";
import { PROBLEMS, type ProblemKind } from "@/api/problem";
import { registry } from "@/api/registry";

const ORIGIN = "https://rhoform.example";

test("every example of a problem page is refused with that problem, and holds no key", async () => {
  const collected = await collectRefusals(registry, ORIGIN);
  const problems: Readonly<Record<string, ProblemKind>> = PROBLEMS;
  expect([...collected.keys()].sort()).toEqual(Object.keys(REFUSED_CALLS).sort());
  for (const [code, { calls, status, answer }] of collected) {
    expect([code, status]).toEqual([code, problems[code].status]);
    expect(answer).toContain(`"type": "${ORIGIN}/docs/problems/${code}"`);
    expect(calls.at(-1)).toMatch(/^(GET|POST|PATCH|DELETE) \/api\/v1\//);
    expect([...calls, answer].join("\n")).not.toMatch(/rho_\w+_[\w-]{20}/);
  }
  expect(collected.get("invalid-input")?.answer).toContain('"#/dimensions/width"');
  expect(collected.get("too-many-requests")?.calls).toHaveLength(3);
  // A month that begins anew at its end, by the clock of the examples: 2 March 2026, noon.
  expect(collected.get("quota-exhausted")?.answer).toMatch(/^Retry-After: 25\d{5}$/m);
  expect(collected.get("quota-exhausted")?.answer).toContain(
    "2 of this month's 2 are left until the quota starts anew at 2026-04-01T00:00:00Z",
  );
});
