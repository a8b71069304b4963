import { afterEach, beforeEach, expect, test } from "vitest";
import { type Database, migrateDatabase, openDatabase, transact } from "@/db/client";
import { insertTeam } from "@/db/queries/teams";
import { insertUsage } from "@/db/queries/usage";
import { listEvents, slowestEvents } from "@/db/queries/usage-events";
import { clientsOfKey, latencyBuckets, usageByKey, usageShares, usageTotal } from "@/db/queries/usage-sums";

const HOUR_MS = 3_600_000;
const DAY = 20_000;
const START = DAY * 24 * HOUR_MS;
const CALLS = 600;

let db: Database;
const events = Array.from({ length: CALLS }, (_, i) => ({
  at: START + Math.floor((i * 48 * HOUR_MS) / CALLS),
  requestId: `req_${i}`,
  keyId: `k${i % 5}`,
  teamId: i % 5 === 4 ? "" : `t${(i % 5) % 2}`,
  operation: i % 3 === 0 ? "solveField" : "computeResistance",
  shape: i % 3 === 0 ? null : "bar",
  status: i % 50 === 7 ? 500 : i % 10 === 3 ? 422 : 200,
  latencyUs: 300 + ((i * 7919) % 90_001),
  computations: 1,
  client: i % 4 === 0 ? "python" : "browser",
}));
beforeEach(() => {
  db = openDatabase(":memory:");
  migrateDatabase(db);
  for (const id of ["t0", "t1"]) insertTeam(db, { id, slug: id, name: id, createdAt: 0 });
  transact(db, () => events.forEach((event) => insertUsage(db, event)));
});
afterEach(() => {
  db.$client.close();
});

const days = { from: DAY, to: DAY + 1 };

test("sums are those of the calls, for everybody, a team and a key", () => {
  const of = (matches: (event: (typeof events)[number]) => boolean) => {
    const found = events.filter(matches);
    return {
      requests: found.length,
      computations: found.length,
      refused: found.filter(({ status }) => status >= 400).length,
      failed: found.filter(({ status }) => status >= 500).length,
      latencyUs: found.reduce((sum, { latencyUs }) => sum + latencyUs, 0),
    };
  };
  expect(usageTotal(db, { teamIds: "all" }, days)).toEqual(of(() => true));
  expect(usageTotal(db, { teamIds: ["t1"] }, days)).toEqual(of(({ teamId }) => teamId === "t1"));
  expect(usageTotal(db, { teamIds: "all", keyId: "k3" }, days)).toEqual(of(({ keyId }) => keyId === "k3"));
  for (const by of ["all", "day", "hour"] as const) {
    const counted = latencyBuckets(db, { teamIds: "all" }, days, by);
    expect(counted.reduce((sum, { requests }) => sum + requests, 0)).toBe(CALLS);
  }
});

test("shares add up to the whole, signed-out calls included", () => {
  for (const by of ["operation", "shape", "status", "team", "client"] as const) {
    const shares = usageShares(db, { teamIds: "all" }, days, by);
    expect(shares.reduce((sum, { requests }) => sum + requests, 0)).toBe(CALLS);
  }
  const page = { order: { by: "requests", descending: true }, limit: 2, offset: 0, search: "" };
  const callers = usageByKey(db, { teamIds: ["t0", "t1"] }, days, page);
  expect(callers).toMatchObject({ total: 4, rows: [{ requests: 120 }, { requests: 120 }] });
  expect(
    clientsOfKey(db, "k0", DAY)
      .map(({ client }) => client)
      .sort(),
  ).toEqual(["browser", "python"]);
});

test("the slowest calls are the slowest of all, though only a few hours are read", () => {
  const hours = { from: DAY * 24, to: DAY * 24 + 47 };
  const sorted = [...events].sort((a, b) => b.latencyUs - a.latencyUs);
  const slowest = slowestEvents(db, { teamIds: "all" }, hours, 8);
  expect(slowest.map(({ latencyUs }) => latencyUs)).toEqual(
    sorted.slice(0, 8).map((event) => event.latencyUs),
  );
});

test("single requests: newest first, by status, counted up to a limit", () => {
  const filter = { scope: { teamIds: "all" as const }, from: START, to: START + 48 * HOUR_MS };
  const all = listEvents(db, filter, { limit: 3, offset: 1, countUpTo: 100 });
  expect(all).toMatchObject({ total: 100, more: true });
  expect(all.rows.map(({ requestId }) => requestId)).toEqual(["req_598", "req_597", "req_596"]);
  const page = { limit: 1000, offset: 0, countUpTo: 1000 };
  const failed = listEvents(db, { ...filter, statuses: "5xx" }, page);
  expect(failed.total).toBe(events.filter(({ status }) => status >= 500).length);
  const own = listEvents(db, { ...filter, scope: { teamIds: ["t0"], keyId: "k2" }, statuses: "error" }, page);
  expect(
    own.rows.every(({ keyId, teamId, status }) => keyId === "k2" && teamId === "t0" && status >= 400),
  ).toBe(true);
});
