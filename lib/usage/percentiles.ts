/** Quantiles of latencies that are told, as shares. */
const QUANTILES = { p50Ms: 0.5, p95Ms: 0.95, p99Ms: 0.99 } as const;

export type Percentiles = { readonly [name in keyof typeof QUANTILES]: number | null };

interface Bucket {
  readonly bucket: number;
  readonly requests: number;
}

/**
 * Percentiles of a histogram with four buckets an octave from 1 µs, in ms; within a bucket the requests count as spread
 * evenly over its logarithm, so a percentile is within 19 % of the true one. `buckets` from the lowest on.
 */
export function percentilesOf(buckets: readonly Bucket[]): Percentiles {
  const total = buckets.reduce((sum, { requests }) => sum + requests, 0);
  const at = (share: number): number | null => {
    let below = 0;
    for (const { bucket, requests } of buckets) {
      if (requests > 0 && below + requests >= share * total) {
        const inside = (share * total - below) / requests;
        return 2 ** ((bucket + inside) / 4) / 1000;
      }
      below += requests;
    }
    return null;
  };
  return { p50Ms: at(QUANTILES.p50Ms), p95Ms: at(QUANTILES.p95Ms), p99Ms: at(QUANTILES.p99Ms) };
}

/** Percentiles of single latencies (µs), in ms: the value that at least that share of the calls did not exceed. */
export function exactPercentiles(latenciesUs: readonly number[]): Percentiles {
  const sorted = [...latenciesUs].sort((a, b) => a - b);
  const at = (share: number): number | null =>
    sorted.length === 0 ? null : sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)] / 1000;
  return { p50Ms: at(QUANTILES.p50Ms), p95Ms: at(QUANTILES.p95Ms), p99Ms: at(QUANTILES.p99Ms) };
}
