import type { BucketState } from "@/lib/limits/limiter";
import { rateLimitHeaders } from "@/lib/limits/rate-limit-headers";
import type { Complaint, Refusal, RefusalCode } from "@/lib/service/refusal";
import type { Content } from "./operation";
import { PROBLEMS } from "./problem";

/** Headers of every answer: an answer is data, never a document to render or to frame. */
const SECURITY_HEADERS = {
  "X-Content-Type-Options": "nosniff",
  "Content-Security-Policy": "default-src 'none'; frame-ancestors 'none'",
  "Referrer-Policy": "no-referrer",
  "Permissions-Policy": "camera=(), microphone=(), geolocation=()",
};

export interface Answer {
  readonly status: number;
  readonly headers: Record<string, string>;
  readonly body: string | ReadableStream<Uint8Array> | null;
}

/** The body and its type for what a handler answered. */
export function answerOf(
  status: number,
  content: Content,
  headers: Readonly<Record<string, string>> = {},
): Answer {
  switch (content.kind) {
    case "json":
      return {
        status,
        headers: { "Content-Type": "application/json; charset=utf-8", ...headers },
        body: JSON.stringify(content.value),
      };
    case "text":
      return {
        status,
        headers: { "Content-Type": `${content.mediaType}; charset=utf-8`, ...headers },
        body: content.text,
      };
    case "stream":
      return { status, headers: { "Content-Type": content.mediaType, ...headers }, body: content.stream };
    case "none":
      return { status, headers: { ...headers }, body: null };
  }
}

/** The problem document of a refusal (RFC 9457), or one line of text where the client asked for text. */
export function problemAnswer(refusal: Refusal, requestId: string, origin: string, accepts: string): Answer {
  const { status } = PROBLEMS[refusal.code];
  const headers: Record<string, string> = { ...refusal.more.headers };
  if (status === 401) headers["WWW-Authenticate"] = challenge(refusal);
  if (accepts === "text/plain") {
    headers["Content-Type"] = "text/plain; charset=utf-8";
    return { status, headers, body: `error: ${refusal.detail.replace(/\s+/g, " ")}` };
  }
  headers["Content-Type"] = "application/problem+json; charset=utf-8";
  return { status, headers, body: JSON.stringify(problemDocument(refusal, requestId, origin)) };
}

export interface ProblemDocument {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly instance: string;
  readonly errors?: readonly Complaint[];
}

/** A refusal as its document says it (RFC 9457). */
export function problemDocument(refusal: Refusal, instance: string, origin: string): ProblemDocument {
  const { status, title } = PROBLEMS[refusal.code];
  return {
    type: `${origin}/docs/problems/${refusal.code}`,
    title,
    status,
    detail: refusal.detail,
    instance,
    ...(refusal.more.errors ? { errors: refusal.more.errors } : {}),
  };
}

/** RFC 6750, section 3: no error code where no credentials were sent. */
function challenge(refusal: Refusal): string {
  const none: readonly RefusalCode[] = ["missing-credentials", "sign-in-required", "sign-in-failed"];
  return none.includes(refusal.code)
    ? 'Bearer realm="rhoform"'
    : 'Bearer realm="rhoform", error="invalid_token"';
}

export interface Envelope {
  readonly requestId: string;
  /** Whether clients reach the service by https. */
  readonly secure: boolean;
  readonly limits: readonly BucketState[];
  readonly cors: readonly (readonly [string, string])[];
  /** HEAD: the same headers without the body. */
  readonly bodyless: boolean;
}

/** The response with everything that every answer carries. */
export function respond(answer: Answer, envelope: Envelope): Response {
  const { body, status } = answer;
  const headers: Record<string, string> = {
    ...SECURITY_HEADERS,
    "Cache-Control": "no-store",
    Vary: "Accept, Authorization, Origin",
    ...answer.headers,
    "Request-Id": envelope.requestId,
    ...Object.fromEntries(rateLimitHeaders(envelope.limits)),
    ...Object.fromEntries(envelope.cors),
  };
  if (envelope.secure) headers["Strict-Transport-Security"] = "max-age=31536000; includeSubDomains";
  if (typeof body === "string") headers["Content-Length"] = String(Buffer.byteLength(body));
  return new Response(envelope.bodyless ? null : body, { status, headers });
}
