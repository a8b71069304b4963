import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type Database, migrateDatabase, openDatabase } from "@/db/client";
import { Limiter } from "@/lib/limits/limiter";
import { addressBucket, minuteBucket, monthBucket } from "@/lib/limits/quota";
import { rateLimitHeaders } from "@/lib/limits/rate-limit-headers";

let db: Database;
let limiter: Limiter;
beforeEach(() => {
  db = openDatabase(":memory:");
  migrateDatabase(db);
  limiter = new Limiter(db);
});
afterEach(() => {
  db.$client.close();
});

describe("months", () => {
  test.each([
    ["2025-01-01T00:00:00Z", "2025-01", "2025-02-01T00:00:00Z"],
    ["2025-12-31T23:59:59.999Z", "2025-12", "2026-01-01T00:00:00Z"],
    ["2024-02-29T12:00:00Z", "2024-02", "2024-03-01T00:00:00Z"],
    ["2025-03-01T00:30:00+01:00", "2025-02", "2025-03-01T00:00:00Z"],
  ])("%s belongs to %s (UTC)", (at, name, end) => {
    const bucket = monthBucket("key:k1", 10, Date.parse(at));
    expect(bucket.subject).toBe(`key:k1:${name}`);
    expect(bucket.endsAt).toBe(Date.parse(end));
    expect(bucket.windowSeconds * 1000).toBeGreaterThan(Date.parse(end) - Date.parse(at));
  });

  test("a new month begins with the whole quota", async () => {
    const of = (at: string) => monthBucket("key:k1", 2, Date.parse(at));
    for (const allowed of [true, true, false]) {
      expect((await limiter.spend(of("2025-01-31T23:59:59Z"))).allowed).toBe(allowed);
    }
    expect(await limiter.spend(of("2025-02-01T00:00:00Z"))).toMatchObject({ allowed: true, remaining: 1 });
  });
});

describe("spending", () => {
  test("is exact under many calls at once, in lots of any size", async () => {
    const bucket = monthBucket("key:k1", 100, Date.now());
    const results = await Promise.all(Array.from({ length: 60 }, () => limiter.spend(bucket, 3)));
    expect(results.filter(({ allowed }) => allowed)).toHaveLength(33);
    expect((await limiter.look(bucket)).remaining).toBe(1);
    expect((await limiter.spend(bucket, 1)).allowed).toBe(true);
    expect((await limiter.spend(bucket, 1)).allowed).toBe(false);
  });

  test("a lot that does not fit takes nothing, and what is given back can be spent", async () => {
    const bucket = monthBucket("key:k1", 10, Date.now());
    expect(await limiter.spend(bucket, 11)).toMatchObject({ allowed: false, remaining: 10 });
    expect(await limiter.spend(bucket, 10)).toMatchObject({ allowed: true, remaining: 0 });
    expect(await limiter.giveBack(bucket, 4)).toMatchObject({ remaining: 4 });
    expect((await limiter.spend(bucket, 4)).allowed).toBe(true);
  });

  test("a raised quota counts at once, a lowered one too", async () => {
    for (let i = 0; i < 6; i++) await limiter.spend(minuteBucket("key:k1", 5));
    expect((await limiter.spend(minuteBucket("key:k1", 5))).allowed).toBe(false);
    expect((await limiter.spend(minuteBucket("key:k1", 20))).allowed).toBe(true);
    expect((await limiter.spend(minuteBucket("key:k1", 3))).allowed).toBe(false);
  });

  test("counters of another process on the same file are the same counters", async () => {
    const bucket = monthBucket("key:k1", 5, Date.now());
    const other = new Limiter(db);
    await limiter.spend(bucket, 3);
    expect(await other.spend(bucket, 2)).toMatchObject({ allowed: true, remaining: 0 });
    expect((await limiter.spend(bucket)).allowed).toBe(false);
  });

  test("addresses and keys do not share counters", async () => {
    await limiter.spend(addressBucket("198.51.100.1", 1));
    expect((await limiter.spend(addressBucket("198.51.100.1", 1))).allowed).toBe(false);
    expect((await limiter.spend(addressBucket("198.51.100.2", 1))).allowed).toBe(true);
    expect((await limiter.spend(minuteBucket("198.51.100.1", 1))).allowed).toBe(true);
  });
});

describe("RateLimit headers", () => {
  test("read as the draft has them; a calendar month has no window", async () => {
    const now = Date.now();
    const minute = await limiter.spend(minuteBucket("key:k1", 600));
    const month = await limiter.look(monthBucket("key:k1", 100_000, now));
    const [policy, limit] = rateLimitHeaders([minute, month]);
    expect(policy).toEqual(["RateLimit-Policy", '"minute";q=600;w=60, "month";q=100000']);
    expect(limit[1]).toMatch(/^"minute";r=599;t=60, "month";r=100000;t=\d+$/);
  });
});
