/**
 * The response headers of every page, in one place. The API sets its own; these are for documents that a browser
 * renders and for the files they load.
 */

export interface Header {
  readonly key: string;
  readonly value: string;
}

export interface PolicyOptions {
  /** Value for `nonce-…`, fresh for each request. */
  readonly nonce: string;
  /** Development needs `eval` for React's error stacks and a socket for reloads. */
  readonly development: boolean;
  /** Whether browsers reach this service by https. */
  readonly secure: boolean;
  /** Origins whose pages may frame the document; none by default. */
  readonly frameAncestors?: readonly string[];
}

/** The Content-Security-Policy of one document. Scripts run by nonce only, and nothing comes from another host. */
export function contentSecurityPolicy(options: PolicyOptions): string {
  const { nonce, development, secure, frameAncestors = [] } = options;
  const directives: [string, ...string[]][] = [
    ["default-src", "'self'"],
    [
      "script-src",
      "'self'",
      `'nonce-${nonce}'`,
      "'strict-dynamic'",
      ...(development ? ["'unsafe-eval'"] : []),
    ],
    // Typeset formulas and drawings position their parts by style attributes.
    ["style-src", "'self'", "'unsafe-inline'"],
    ["img-src", "'self'", "data:", "blob:"],
    ["font-src", "'self'"],
    ["connect-src", "'self'", ...(development ? ["ws:"] : [])],
    ["object-src", "'none'"],
    ["base-uri", "'none'"],
    ["form-action", "'self'"],
    ["frame-ancestors", ...(frameAncestors.length > 0 ? frameAncestors : ["'none'"])],
  ];
  if (secure) directives.push(["upgrade-insecure-requests"]);
  return directives.map((directive) => directive.join(" ")).join("; ");
}

const NO_SNIFF: Header = { key: "X-Content-Type-Options", value: "nosniff" };

/** Headers of a document beside its policy. `Strict-Transport-Security` only where the service is on https. */
export function documentHeaders(secure: boolean): readonly Header[] {
  return [
    NO_SNIFF,
    { key: "Referrer-Policy", value: "strict-origin-when-cross-origin" },
    { key: "Permissions-Policy", value: "camera=(), microphone=(), geolocation=()" },
    { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
    ...(secure ? [{ key: "Strict-Transport-Security", value: "max-age=31536000; includeSubDomains" }] : []),
  ];
}

/** Headers of built scripts, styles and fonts: public, and a widget's frame in a sandbox has no origin of its own. */
export function assetHeaders(): { key: string; value: string }[] {
  return [{ ...NO_SNIFF }, { key: "Access-Control-Allow-Origin", value: "*" }];
}
