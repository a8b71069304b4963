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
  /** Seconds to wait for an answer that may take its time. */
  readonly wait?: number;
  readonly signal?: AbortSignal;
  /** Media type of the body where it is not JSON, and of the answer where it is not the body's. */
  readonly mediaType?: string;
  readonly accept?: string;
}

/** Posts a body to an operation of the API on behalf of this page. Throws ApiProblem when it is refused. */
export async function postApi<Result>(
  path: string,
  body: string,
  options: CallOptions = {},
): Promise<Result> {
  return (await callApi("POST", path, options, body)).json();
}

/** Reads from the API on behalf of this page. Throws ApiProblem when it is refused. */
export async function getApi<Result>(path: string, options: CallOptions = {}): Promise<Result> {
  return (await callApi("GET", path, options)).json();
}

/** One call with the page's token; a token that has ended is renewed once. Throws ApiProblem when it is refused. */
export async function callApi(
  method: "GET" | "POST" | "PATCH" | "DELETE",
  path: string,
  { observe, idempotencyKey, wait, signal, mediaType, accept }: CallOptions = {},
  body?: string,
): Promise<Response> {
  const send = async (): Promise<Response> =>
    fetch(`/api/v1${path}`, {
      method,
      headers: {
        Authorization: `Bearer ${await siteToken()}`,
        ...(body === undefined ? {} : { "Content-Type": mediaType ?? "application/json" }),
        ...(accept ? { Accept: accept } : {}),
        ...(idempotencyKey ? { "Idempotency-Key": idempotencyKey } : {}),
        ...(wait ? { Prefer: `wait=${wait}` } : {}),
      },
      body,
      signal,
    });
  let response = await send();
  if (response.status === 401) {
    // The token may have ended while the page slept: one new one, once.
    dropSiteToken();
    response = await send();
  }
  observe?.(response.headers);
  if (!response.ok) throw await problemOf(response);
  return response;
}

async function problemOf(response: Response): Promise<ApiProblem> {
  const retryAfter = Number(response.headers.get("Retry-After"));
  const problem: ProblemShown = await response
    .json()
    .catch(() => ({ title: `The service answered ${response.status}` }));
  return new ApiProblem(response.status, problem, retryAfter > 0 ? retryAfter : null);
}
