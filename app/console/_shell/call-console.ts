import type { ProblemShown } from "../../_ui/problem-notice";

/** A call of the console that was refused; `problem` is its problem document. */
export class ConsoleProblem extends Error {
  constructor(
    readonly status: number,
    readonly problem: ProblemShown,
  ) {
    super(problem.detail ?? problem.title);
  }

  /** The code at the end of the problem's address: `not-permitted`. */
  get code(): string {
    return this.problem.type?.split("/").pop() ?? "";
  }

  /** Complaints by the name of the form's field (`quotas.minute`). */
  fieldErrors(): ReadonlyMap<string, string> {
    const found = new Map<string, string>();
    for (const { pointer, parameter, detail } of this.problem.errors ?? []) {
      const name = parameter ?? (pointer ?? "").replace(/^#\/?/, "").replaceAll("/", ".");
      if (!found.has(name)) found.set(name, detail);
    }
    return found;
  }
}

/** Goes to a page of ours and loads it anew, so that nothing kept for another reader remains. */
export function openAnew(path: string): void {
  window.location.assign(path);
}

type Method = "GET" | "POST" | "PATCH" | "PUT" | "DELETE";

/**
 * One call of our own pages: `path` below `/api/`, a body as JSON. Answers with the parsed answer (undefined for 204).
 * Throws ConsoleProblem when refused, and leads to the sign-in where the session is over.
 */
export async function callPage<Result>(method: Method, path: string, body?: unknown): Promise<Result> {
  let response: Response;
  try {
    response = await fetch(`/api/${path}`, {
      method,
      headers: body === undefined ? {} : { "Content-Type": "application/json" },
      body: body === undefined ? undefined : JSON.stringify(body),
    });
  } catch {
    throw new ConsoleProblem(0, {
      title: "The service does not answer",
      detail: "Check the connection and try again.",
    });
  }
  if (response.status === 204) return undefined as Result;
  if (response.ok) return response.json();
  const problem: ProblemShown = await response
    .json()
    .catch(() => ({ title: `The service answered ${response.status}` }));
  const refused = new ConsoleProblem(response.status, problem);
  if (refused.code === "sign-in-required") {
    openAnew(`/sign-in?next=${encodeURIComponent(window.location.pathname + window.location.search)}`);
  }
  throw refused;
}

/** A call below `/api/console`. */
export function callConsole<Result>(method: Method, path: string, body?: unknown): Promise<Result> {
  return callPage(method, `console/${path}`, body);
}
