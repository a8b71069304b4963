import { afterEach, beforeEach, expect, test } from "vitest";
import { type Database, migrateDatabase, openDatabase } from "@/db/client";
import { type ActivityWanted, pageOfActivity } from "@/db/queries/activity-list";
import { activityOfSubject } from "@/db/queries/activity";
import { KEY_STATES, keysInNeed, pageOfKeys } from "@/db/queries/key-list";
import { pageOfRecords, usesOfMaterial } from "@/db/queries/record-list";
import { insertTeam } from "@/db/queries/teams";
import { insertUsage } from "@/db/queries/usage";
import { keyDetail } from "@/lib/auth/key-detail";
import { issueKey } from "@/lib/auth/manage-keys";
import { keyById } from "@/db/queries/keys";
import { SHELL } from "@/lib/activity/append";
import { listEvents } from "@/db/queries/usage-events";
import { BREAKDOWNS, usageByKey, type UsageScope } from "@/db/queries/usage-sums";
import { DAY_MS, sharesOf, usageOf } from "@/lib/usage/console-usage";
import { storeRecord } from "@/lib/records/records";
import { overviewOf } from "@/lib/usage/overview";

const NOW = Date.UTC(2026, 2, 15);
const TODAY = Math.floor(NOW / DAY_MS);
const TEAMS = ["team_1", "team_2"];
const SCOPES: readonly UsageScope[] = [{ teamIds: "all" }, { teamIds: ["team_1"] }, { teamIds: TEAMS }];

let db: Database;
let keyId: string;
beforeEach(() => {
  db = openDatabase(":memory:");
  migrateDatabase(db);
  TEAMS.forEach((id, index) => insertTeam(db, { id, slug: `t${index}`, name: id, createdAt: 0 }));
  const settings = { name: "CAD scripts", scopes: ["compute" as const] };
  keyId = issueKey(db, { teamId: "team_1", settings, actor: SHELL, now: NOW }).view.id;
  insertUsage(db, {
    at: NOW - 1,
    requestId: "req_1",
    keyId,
    teamId: "team_1",
    operation: "computeResistance",
    shape: "bar",
    status: 200,
    latencyUs: 900,
    computations: 1,
    client: "python",
  });
  storeRecord(
    db,
    { teamId: "team_1", actor: SHELL, now: NOW },
    {
      operation: "resistance",
      label: "Main bar",
      shape: "bar",
      request: {},
      result: {},
      materials: [{ id: "mat-1", version: 1 }],
    },
  );
});
afterEach(() => {
  db.$client.close();
});

/** The plan of every statement that some work reads with, step by step. */
function plansOf(work: () => unknown): readonly string[] {
  const { $client } = db;
  const prepare = $client.prepare.bind($client);
  const statements: string[] = [];
  $client.prepare = ((sql: string) => {
    statements.push(sql);
    return prepare(sql);
  }) as typeof $client.prepare;
  try {
    work();
  } finally {
    $client.prepare = prepare as typeof $client.prepare;
  }
  return statements
    .filter((sql) => /^\s*(select|with)\b/i.test(sql))
    .flatMap((sql) => {
      const places = (sql.replace(/'[^']*'/g, "").match(/\?/g) ?? []).map(() => null);
      const steps = prepare(`explain query plan ${sql}`).all(...places) as { detail: string }[];
      return steps.map(({ detail }) => detail);
    });
}

const page = (by: string) => ({ order: { by, descending: true }, limit: 50, offset: 0 });

test("no sum or list of the usage reads a table of calls or sums from end to end", () => {
  const days = { from: TODAY - 29, to: TODAY };
  const works = SCOPES.flatMap((all): (() => unknown)[] =>
    [all, { ...all, keyId }].flatMap((scope): (() => unknown)[] => [
      () => usageOf(db, scope, days, "day", NOW),
      () => usageOf(db, scope, { from: TODAY - 6, to: TODAY }, "hour", NOW),
      ...BREAKDOWNS.map((by) => () => sharesOf(db, scope, days, by)),
      () => usageByKey(db, scope, days, { ...page("requests"), search: "cad" }),
      () => overviewOf(db, { scope, teamIds: TEAMS, now: NOW }),
      ...([undefined, "2xx", "4xx", "5xx", "error"] as const).map(
        (statuses) => () =>
          listEvents(
            db,
            { scope, from: NOW - DAY_MS, to: NOW, statuses, shape: "bar", requestId: "req_1" },
            { limit: 50, offset: 0, countUpTo: 1000 },
          ),
      ),
    ]),
  );
  const plans = plansOf(() => works.forEach((work) => work()));
  const ofUsage = plans.filter((step) => /\busage_/.test(step));
  expect(ofUsage.length).toBeGreaterThan(works.length);
  for (const step of ofUsage) expect(step).toMatch(/^SEARCH /);
});

test("lists of keys, records and activity go by an index", () => {
  const keyFilter = { teamIds: TEAMS, now: NOW, soonMs: DAY_MS, month: "2026-03" };
  const plans = plansOf(() => {
    for (const state of [undefined, ...KEY_STATES])
      pageOfKeys(db, { ...page("createdAt"), ...keyFilter, state, search: "cad" });
    keysInNeed(db, { ...keyFilter, most: 50 });
    const row = keyById(db, keyId);
    if (row) keyDetail(db, row, "Busbar", NOW);
    for (const by of ["createdAt", "label"])
      pageOfRecords(db, { ...page(by), teamIds: TEAMS, search: "main", materialId: "mat-1" });
    usesOfMaterial(db, "mat-1", TEAMS);
    activityOfSubject(db, keyId);
  });
  expect(plans.length).toBeGreaterThan(20);
  // What a search has found already may be read from end to end.
  expect(plans.filter((step) => step.startsWith("SCAN") && !step.includes("subquery"))).toEqual([]);
});

test("the activity is read backwards as it is kept, or by team or subject, and never sorted", () => {
  const read = (more: Partial<ActivityWanted>) =>
    plansOf(() =>
      pageOfActivity(db, { readers: null, search: "", oldestFirst: false, limit: 50, offset: 0, ...more }),
    );
  const readers = { teamIds: TEAMS, personId: "per_1" };
  const byIndex: readonly Partial<ActivityWanted>[] = [
    { teamId: "team_1" },
    { readers, teamId: "team_1" },
    { subjectId: keyId },
  ];
  for (const more of [{}, { readers }, { search: "cad", kind: "key" }, ...byIndex]) {
    const plan = read(more);
    expect(plan.filter((step) => step.includes("TEMP B-TREE"))).toEqual([]);
    expect(plan.filter((step) => /^SCAN (?!activity)/.test(step))).toEqual([]);
  }
  for (const more of byIndex) expect(read(more).filter((step) => step.startsWith("SCAN"))).toEqual([]);
});
