import type { Problem } from "./generated/types.gen.js";

/** A complaint about one place in the input. */
export type Complaint = NonNullable<Problem["errors"]>[number];

/** The service refused the call; the members are those of its problem document (RFC 9457). */
export class RhoformProblem extends Error {
  override readonly name = "RhoformProblem";

  constructor(
    readonly status: number,
    /** The problem's code, such as "invalid-input" or "quota-exhausted". */
    readonly code: string,
    readonly title: string,
    readonly detail: string,
    /** For a 422: every complaint, each with the pointer or the parameter it is about. */
    readonly errors: readonly Complaint[],
    /** Id of the request, to quote to whoever runs the service. */
    readonly requestId: string | null,
    /** Seconds to wait before another try, where the answer says so. */
    readonly retryAfter: number | null,
  ) {
    const places = errors.map(
      (error) => `${"pointer" in error ? error.pointer : error.parameter} ${error.detail}`,
    );
    super([`${status} ${title}: ${detail}`, ...places].join("\n  "));
  }
}

/** The service did not answer in time. */
export class RhoformTimeout extends Error {
  override readonly name = "RhoformTimeout";

  constructor(readonly timeoutMs: number) {
    super(`The service did not answer within ${timeoutMs} ms.`);
  }
}

/** The service could not be reached, or the connection broke. */
export class RhoformUnreachable extends Error {
  override readonly name = "RhoformUnreachable";

  constructor(host: string, reason: string) {
    super(`The service at ${host} could not be reached: ${reason}`);
  }
}

/**
 * What a refused answer says. Anything that is no problem document (a proxy's page, for instance) is told by its status.
 * An answer that repeats the key, as the page of a proxy may, is told without it.
 */
export function problemOf(answered: unknown, response: Response, key?: string): RhoformProblem {
  const body = key === undefined ? answered : withoutKey(answered, key);
  const problem: Partial<Problem> = typeof body === "object" && body !== null ? body : {};
  const title = text(problem.title) ?? (response.statusText || "The call was refused");
  return new RhoformProblem(
    response.status,
    text(problem.type)?.split("/").at(-1) ?? "unknown",
    title,
    text(problem.detail) ?? "the answer is no problem document.",
    Array.isArray(problem.errors) ? problem.errors : [],
    text(problem.instance) ?? response.headers.get("Request-Id"),
    retryAfterSeconds(response),
  );
}

function withoutKey(answered: unknown, key: string): unknown {
  const written = JSON.stringify(answered ?? null);
  return written.includes(key) ? JSON.parse(written.replaceAll(key, "rho_…")) : answered;
}

/** `Retry-After` in seconds, given as a number or as a date; null where there is none. */
export function retryAfterSeconds(response: Response, now = Date.now()): number | null {
  const header = response.headers.get("Retry-After");
  if (header === null || header.trim() === "") return null;
  const seconds = /^\d+$/.test(header.trim()) ? Number(header) : (Date.parse(header) - now) / 1000;
  return Number.isFinite(seconds) ? Math.max(0, seconds) : null;
}

function text(value: unknown): string | undefined {
  return typeof value === "string" && value !== "" ? value : undefined;
}
