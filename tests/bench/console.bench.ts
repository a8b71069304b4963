/**
 * What the sections of the console cost on the server with 1,000,000 calls and 2,000 keys: each answer's own work, the
 * median of five, against 300 ms. `npx tsx tests/bench/console.bench.ts` runs it alone.
 */
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { migrateDatabase, openDatabase } from "@/db/client";
import { keyById } from "@/db/queries/keys";
import { pageOfKeys } from "@/db/queries/key-list";
import { pageOfRecords } from "@/db/queries/record-list";
import { listEvents } from "@/db/queries/usage-events";
import { BREAKDOWNS, usageByKey, type UsageScope } from "@/db/queries/usage-sums";
import { keyDetail } from "@/lib/auth/key-detail";
import { SOON_MS } from "@/lib/auth/key-expiry";
import { listedMaterials } from "@/lib/materials/console-materials";
import { DAY_MS, sharesOf, usageOf } from "@/lib/usage/console-usage";
import { overviewOf } from "@/lib/usage/overview";
import { fillConsoleData } from "./console-data";

const LIMIT_MS = 300;
const ROUNDS = 5;

export interface SectionCost {
  readonly name: string;
  readonly ms: number;
  readonly passed: boolean;
}

export function benchConsole(): SectionCost[] {
  const folder = mkdtempSync(join(tmpdir(), "rhoform-console-"));
  const db = openDatabase(join(folder, "rhoform.sqlite"));
  try {
    migrateDatabase(db);
    const now = Date.now();
    const { busiest, teamIds } = fillConsoleData(db, now);
    const today = Math.floor(now / DAY_MS);
    const all: UsageScope = { teamIds: "all" };
    const team: UsageScope = { teamIds: [teamIds[0]] };
    const several: UsageScope = { teamIds: teamIds.slice(0, 3) };
    const one: UsageScope = { teamIds: "all", keyId: busiest };
    const span = (days: number) => ({ from: today - days + 1, to: today });
    const month = new Date(now).toISOString().slice(0, 7);
    const page = (by: string, offset = 0) => ({ order: { by, descending: true }, limit: 50, offset });
    const events = (scope: UsageScope, more: object = {}, offset = 0) =>
      listEvents(
        db,
        { scope, from: now - 60 * DAY_MS, to: now + 1, ...more },
        { limit: 50, offset, countUpTo: 10_000 },
      );
    const usage = (scope: UsageScope, days: number, by: "day" | "hour") =>
      usageOf(db, scope, span(days), by, now);
    const keys = (by: string, search = "") =>
      pageOfKeys(db, { ...page(by), teamIds, search, now, soonMs: SOON_MS, month });
    const records = (by: string, search = "") => pageOfRecords(db, { ...page(by), teamIds, search });
    const sections: readonly (readonly [string, () => unknown])[] = [
      ["overview, all teams", () => overviewOf(db, { scope: all, teamIds, now })],
      ["overview, three teams", () => overviewOf(db, { scope: several, teamIds: teamIds.slice(0, 3), now })],
      ["usage, 60 days", () => usage(all, 60, "day")],
      ["usage, 7 days by hour", () => usage(all, 7, "hour")],
      ["usage, 60 days of a team", () => usage(team, 60, "day")],
      ["usage, 60 days of the busiest key", () => usage(one, 60, "day")],
      ...BREAKDOWNS.map((by) => [`shares by ${by}, 60 days`, () => sharesOf(db, all, span(60), by)] as const),
      ["shares by shape of the busiest key", () => sharesOf(db, one, span(60), "shape")],
      ["callers, 60 days", () => usageByKey(db, all, span(60), { ...page("requests"), search: "" })],
      [
        "callers of a team, searched",
        () => usageByKey(db, team, span(60), { ...page("latency"), search: "12" }),
      ],
      ["requests", () => events(all)],
      ["requests, page 200", () => events(all, {}, 10_000)],
      ["requests of a team", () => events(team)],
      ["requests of three teams, refused", () => events(several, { statuses: "error" })],
      ["requests, failed", () => events(all, { statuses: "5xx" })],
      ["requests of the busiest key, refused", () => events(one, { statuses: "error" })],
      ["keys by name", () => keys("name")],
      ["keys by month, searched", () => keys("month", "key 1")],
      ["one key", () => keyDetail(db, keyById(db, busiest) ?? fail(), "Team 0", now)],
      ["records", () => records("createdAt")],
      ["records, searched", () => records("label", "99")],
      ["materials", () => listedMaterials(db, teamIds)],
    ];
    return sections.map(([name, work]) => {
      const times = Array.from({ length: ROUNDS }, () => {
        const started = performance.now();
        work();
        return performance.now() - started;
      });
      const ms = times.sort((a, b) => a - b)[Math.floor(ROUNDS / 2)];
      return { name, ms, passed: ms <= LIMIT_MS };
    });
  } finally {
    db.$client.close();
    rmSync(folder, { recursive: true, force: true });
  }
}

function fail(): never {
  throw new Error("The busiest key is missing.");
}

export function printSections(costs: readonly SectionCost[]): string {
  return costs
    .map(
      ({ name, ms, passed }) =>
        `${passed ? "ok  " : "over"} console: ${name} ${ms.toFixed(0)} ms (at most ${LIMIT_MS} ms)`,
    )
    .join("\n");
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? "").href) console.log(printSections(benchConsole()));
