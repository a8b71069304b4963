import type { OpenAPIRegistry } from "@asteasolutions/zod-to-openapi";
import { RATE_LIMIT, RATE_LIMIT_POLICY } from "@/lib/limits/rate-limit-headers";

/** Headers that every answer carries. */
const COMMON: Readonly<Record<string, { description: string; example: string }>> = {
  "Request-Id": {
    description: "Id of this call, for questions about it; problems repeat it in `instance`.",
    example: "req_5HkXb2mQ9tWz7LcV",
  },
  [RATE_LIMIT_POLICY]: {
    description:
      "The quotas that count for the caller: `q` requests in `w` seconds, or `q` computations a month.",
    example: '"minute";q=600;w=60, "month";q=100000',
  },
  [RATE_LIMIT]: {
    description: "What is left (`r`) and after how many seconds the quota is whole again (`t`).",
    example: '"minute";r=599;t=42, "month";r=99871;t=1206000',
  },
};

const RETRY_AFTER = { description: "Seconds to wait before the next try.", example: "42" };
const WWW_AUTHENTICATE = {
  description: "How to authenticate, and what was wrong (RFC 6750).",
  example: 'Bearer realm="rhoform", error="invalid_token"',
};
const ALLOW = { description: "Methods that the path takes.", example: "GET, HEAD, OPTIONS" };

const string = { type: "string" as const };

/** Declares the headers once. */
export function documentHeaders(registry: OpenAPIRegistry): void {
  const all = { ...COMMON, "Retry-After": RETRY_AFTER, "WWW-Authenticate": WWW_AUTHENTICATE, Allow: ALLOW };
  for (const [name, { description, example }] of Object.entries(all)) {
    registry.registerComponent("headers", name, { description, schema: string, example });
  }
}

type HeaderSpec = { $ref: string } | { description: string; schema: { type: "string" } };

/** The headers of an answer: the common ones, those that its status brings, and the operation's own. */
export function responseHeaders(
  status: number,
  own: Readonly<Record<string, string>> = {},
): Record<string, HeaderSpec> {
  const names = Object.keys(COMMON);
  if (status === 429 || status === 503) names.push("Retry-After");
  if (status === 401 || status === 403) names.push("WWW-Authenticate");
  if (status === 405) names.push("Allow");
  return {
    ...Object.fromEntries(names.map((name) => [name, { $ref: `#/components/headers/${name}` }])),
    ...Object.fromEntries(
      Object.entries(own).map(([name, description]) => [name, { description, schema: string }]),
    ),
  };
}
