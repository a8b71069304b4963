import { originAllowed } from "@/lib/auth/access";
import type { Principal } from "@/lib/auth/principal";
import { RATE_LIMIT, RATE_LIMIT_POLICY } from "@/lib/limits/rate-limit-headers";
import { Refusal } from "@/lib/service/refusal";

/** Response headers that a page's script may read. */
export const EXPOSED_HEADERS = [
  RATE_LIMIT,
  RATE_LIMIT_POLICY,
  "Retry-After",
  "Request-Id",
  "Location",
  "Link",
  "ETag",
  "Deprecation",
  "Sunset",
];

const REQUEST_HEADERS = [
  "Authorization",
  "Content-Type",
  "Accept",
  "Idempotency-Key",
  "If-Match",
  "If-None-Match",
  "Prefer",
];

/** How long a browser may remember a preflight, s. */
const PREFLIGHT_SECONDS = 7200;

export function isPreflight(request: Request): boolean {
  return (
    request.method === "OPTIONS" &&
    request.headers.has("origin") &&
    request.headers.has("access-control-request-method")
  );
}

/** A preflight carries no key, so every origin is told yes; the call itself enforces the key's origins. */
export function preflightHeaders(origin: string, methods: readonly string[]): [string, string][] {
  return [
    ["Access-Control-Allow-Origin", origin],
    ["Access-Control-Allow-Methods", methods.join(", ")],
    ["Access-Control-Allow-Headers", REQUEST_HEADERS.join(", ")],
    ["Access-Control-Max-Age", String(PREFLIGHT_SECONDS)],
  ];
}

/** Refuses a browser's call from a page that may not use the key. */
export function requireOrigin(principal: Principal, headers: Headers, configured: string): void {
  const origin = headers.get("origin");
  if (origin === null || principal.kind === "anonymous") return;
  if (originAllowed(principal, origin, headers, configured)) return;
  throw new Refusal("origin-not-allowed", `Pages of ${origin.slice(0, 200)} may not call with this key.`);
}

/**
 * Headers that let a page's script read the answer: without a key there is nothing in it that is not public (a refusal
 * included); with one, only for the origins it allows.
 */
export function corsHeaders(
  principal: Principal | undefined,
  headers: Headers,
  configured: string,
): [string, string][] {
  const origin = headers.get("origin");
  if (origin === null) return [];
  if (principal && principal.kind !== "anonymous" && !originAllowed(principal, origin, headers, configured))
    return [];
  return [
    ["Access-Control-Allow-Origin", origin],
    ["Access-Control-Expose-Headers", EXPOSED_HEADERS.join(", ")],
  ];
}
