import { expect, test } from "vitest";
import { latencyBucket } from "@/db/queries/usage";
import { exactPercentiles, percentilesOf } from "@/lib/usage/percentiles";

test("percentiles of a histogram are within a bucket, 19 %, of those of the calls themselves", () => {
  const latenciesUs = Array.from({ length: 1000 }, (_, i) => Math.round(500 * 1.006 ** i));
  const buckets = new Map<number, number>();
  for (const each of latenciesUs) {
    const bucket = latencyBucket(each);
    buckets.set(bucket, (buckets.get(bucket) ?? 0) + 1);
  }
  const rows = [...buckets].sort(([a], [b]) => a - b).map(([bucket, requests]) => ({ bucket, requests }));
  const [kept, exact] = [percentilesOf(rows), exactPercentiles(latenciesUs)];
  for (const name of ["p50Ms", "p95Ms", "p99Ms"] as const) {
    const ratio = (kept[name] ?? NaN) / (exact[name] ?? NaN);
    expect(ratio).toBeGreaterThan(2 ** -0.25);
    expect(ratio).toBeLessThan(2 ** 0.25);
  }
});

test("no calls have no percentiles; one call is all of them", () => {
  expect(percentilesOf([])).toEqual({ p50Ms: null, p95Ms: null, p99Ms: null });
  expect(exactPercentiles([])).toEqual({ p50Ms: null, p95Ms: null, p99Ms: null });
  expect(exactPercentiles([1500])).toEqual({ p50Ms: 1.5, p95Ms: 1.5, p99Ms: 1.5 });
});
