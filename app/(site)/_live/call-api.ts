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

/**
 * Posts a body to an operation of the API on behalf of this page. Throws ApiProblem when it is refused.
 * @param observe Told the headers of the answer, refused or not: what is left of the limits.
 */
export async function postApi<Result>(
  path: string,
  body: string,
  observe?: (headers: Headers) => void,
): Promise<Result> {
  let response = await send(path, body);
  if (response.status === 401) {
    // The token may have ended while the page slept: one new one, once.
    dropSiteToken();
    response = await send(path, body);
  }
  observe?.(response.headers);
  return read(response);
}

async function send(path: string, body: string): Promise<Response> {
  return fetch(`/api/v1${path}`, {
    method: "POST",
    headers: { Authorization: `Bearer ${await siteToken()}`, "Content-Type": "application/json" },
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
