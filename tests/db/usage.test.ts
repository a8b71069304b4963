import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type Database, migrateDatabase, openDatabase, transact } from "@/db/client";
import { daysOfKey, insertUsage, latencyBucket, latencyOfBucket, type UsageEvent } from "@/db/queries/usage";

let db: Database;
beforeEach(() => {
  db = openDatabase(":memory:");
  migrateDatabase(db);
});
afterEach(() => {
  db.$client.close();
});

const NOON = Date.UTC(2025, 2, 1, 12);

const event = (over: Partial<UsageEvent> = {}): UsageEvent => ({
  at: NOON,
  requestId: "req_1",
  keyId: "k1",
  teamId: "team_1",
  operation: "computeResistance",
  shape: "bar",
  status: 200,
  latencyUs: 800,
  computations: 1,
  client: "python",
  ...over,
});

const all = (sql: string) => db.$client.prepare(sql).all();

describe("usage", () => {
  test("writes the event and every sum, hour by hour and day by day", () => {
    transact(db, () => {
      insertUsage(db, event());
      insertUsage(db, event({ at: NOON + 3_600_000, status: 422, computations: 0, latencyUs: 200 }));
      insertUsage(
        db,
        event({ at: NOON + 3_600_000, status: 500, computations: 0, shape: null, latencyUs: 1000 }),
      );
      insertUsage(db, event({ at: NOON + 86_400_000, computations: 5 }));
      insertUsage(db, event({ keyId: "k2" }));
    });
    expect(all("select count(*) n from usage_events")).toEqual([{ n: 5 }]);
    const hour = NOON / 3_600_000;
    expect(
      all(
        "select hour, key_id, requests, computations, refused, failed, latency_us from usage_hours order by key_id, hour",
      ),
    ).toEqual([
      { hour, key_id: "k1", requests: 1, computations: 1, refused: 0, failed: 0, latency_us: 800 },
      { hour: hour + 1, key_id: "k1", requests: 2, computations: 0, refused: 2, failed: 1, latency_us: 1200 },
      { hour: hour + 24, key_id: "k1", requests: 1, computations: 5, refused: 0, failed: 0, latency_us: 800 },
      { hour, key_id: "k2", requests: 1, computations: 1, refused: 0, failed: 0, latency_us: 800 },
    ]);
    expect(daysOfKey(db, "k1", NOON)).toEqual([
      { day: "2025-03-01", requests: 3, computations: 1, refused: 2 },
      { day: "2025-03-02", requests: 1, computations: 5, refused: 0 },
    ]);
    expect(daysOfKey(db, "k1", NOON + 86_400_000)).toHaveLength(1);
    expect(
      all("select shape, status, requests, computations from usage_day_details order by day, shape, status"),
    ).toEqual([
      { shape: "", status: 500, requests: 1, computations: 0 },
      { shape: "bar", status: 200, requests: 2, computations: 2 },
      { shape: "bar", status: 422, requests: 1, computations: 0 },
      { shape: "bar", status: 200, requests: 1, computations: 5 },
    ]);
    expect(all("select sum(requests) n from usage_hour_latencies")).toEqual([{ n: 5 }]);
  });

  test("stands or falls with its transaction", () => {
    expect(() =>
      transact(db, () => {
        insertUsage(db, event());
        throw new Error("no");
      }),
    ).toThrow("no");
    for (const table of ["events", "hours", "days", "day_details", "hour_latencies"]) {
      expect(all(`select count(*) n from usage_${table}`)).toEqual([{ n: 0 }]);
    }
  });

  test("sums equal the events after many random calls", () => {
    let state = 42;
    const random = (n: number) => (state = (state * 48271) % 2147483647) % n;
    transact(db, () => {
      for (let i = 0; i < 2000; i++) {
        insertUsage(
          db,
          event({
            at: NOON + random(40) * 3_600_000,
            keyId: `k${random(5)}`,
            status: [200, 422, 429, 500][random(4)],
            computations: random(3),
            latencyUs: 1 + random(1_000_000),
          }),
        );
      }
    });
    const sums =
      "count(*) requests, sum(computations) computations, sum(status >= 400) refused, sum(status >= 500) failed, sum(latency_us) latency_us";
    const counted =
      "sum(requests) requests, sum(computations) computations, sum(refused) refused, sum(failed) failed, sum(latency_us) latency_us";
    const [events] = all(`select ${sums} from usage_events`);
    expect(all(`select ${counted} from usage_hours`)).toEqual([events]);
    expect(all(`select ${counted} from usage_days`)).toEqual([events]);
  });

  test("latency buckets hold their middle and grow by a fourth of an octave", () => {
    for (const us of [1, 10, 999, 123_456, 60_000_000]) {
      const bucket = latencyBucket(us);
      expect(latencyBucket(latencyOfBucket(bucket))).toBe(bucket);
      expect(latencyOfBucket(bucket) / us).toBeGreaterThan(2 ** -0.25);
      expect(latencyOfBucket(bucket) / us).toBeLessThan(2 ** 0.25);
    }
    expect(latencyBucket(0)).toBe(0);
  });
});
