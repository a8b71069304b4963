import type { BucketState } from "./limiter";

/** Names of the header fields of the IETF draft, in this one place: they may still change. */
export const RATE_LIMIT = "RateLimit";
export const RATE_LIMIT_POLICY = "RateLimit-Policy";

/** The two fields for some counters: `"minute";q=600;w=60` and `"minute";r=599;t=42`. A calendar month has no window. */
export function rateLimitHeaders(states: readonly BucketState[]): [string, string][] {
  if (states.length === 0) return [];
  const policies = states.map(({ bucket }) => {
    const window = bucket.endsAt === undefined ? `;w=${bucket.windowSeconds}` : "";
    return `"${bucket.policy}";q=${bucket.quota}${window}`;
  });
  const limits = states.map(
    ({ bucket, remaining, resetSeconds }) => `"${bucket.policy}";r=${remaining};t=${resetSeconds}`,
  );
  return [
    [RATE_LIMIT_POLICY, policies.join(", ")],
    [RATE_LIMIT, limits.join(", ")],
  ];
}
