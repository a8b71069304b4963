import type { ProblemShown } from "../../_ui/problem-notice";
import { dropSiteToken, siteToken } from "./site-token";

/** A call of the API that was refused; `problem` is its problem document. */
export class ApiProblem extends Error {
  constructor(
    readonly status: number,
    readonly problem: ProblemShown,
    /** Seconds to wait, where the answer says so. */
    readonly retryAfter: number | null,
  ) {
    super(problem.detail ?? problem.title);
  }
}

interface CallOptions {
  /** Told the headers of the answer, refused or not: what is left of the limits. */
  readonly observe?: (headers: Headers) => void;
  /** The same for every repeat of a call that stores something. */
  readonly idempotencyKey?: string;
}

/** Posts a body to an operation of the API on behalf of this page. Throws ApiProblem when it is refused. */
export async function postApi<Result>(
  path: string,
  body: string,
  { observe, idempotencyKey }: CallOptions = {},
): Promise<Result> {
  const more: Record<string, string> = idempotencyKey ? { "Idempotency-Key": idempotencyKey } : {};
  let response = await send(path, body, more);
  if (response.status === 401) {
    // The token may have ended while the page slept: one new one, once.
    dropSiteToken();
    response = await send(path, body, more);
  }
  observe?.(response.headers);
  return read(response);
}

async function send(path: string, body: string, more: Readonly<Record<string, string>>): Promise<Response> {
  return fetch(`/api/v1${path}`, {
    method: "POST",
    headers: {
      Authorization: `Bearer ${await siteToken()}`,
      "Content-Type": "application/json",
      ...more,
    },
    body,
  });
}

async function read<Result>(response: Response): Promise<Result> {
  if (response.ok) return response.json();
  const retryAfter = Number(response.headers.get("Retry-After"));
  const problem: ProblemShown = await response
    .json()
    .catch(() => ({ title: `The service answered ${response.status}` }));
  throw new ApiProblem(response.status, problem, retryAfter > 0 ? retryAfter : null);
}
