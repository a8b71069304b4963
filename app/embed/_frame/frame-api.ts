import type { FrameView } from "./frame-view";

export type Values = Readonly<Record<string, string>>;

/** Why there is no answer. */
export type Trouble =
  /** Complaints about open inputs by name, and about the whole. */
  | { readonly kind: "fields"; readonly fields: Values; readonly whole: readonly string[] }
  /** A field solution that failed, and why. */
  | { readonly kind: "failed"; readonly detail: string }
  | { readonly kind: "quota"; readonly until: number }
  | { readonly kind: "pause"; readonly waitMs: number }
  | { readonly kind: "away"; readonly waitMs: number }
  | { readonly kind: "gone" }
  | { readonly kind: "stale" };

export class FrameTrouble extends Error {
  constructor(readonly trouble: Trouble) {
    super(trouble.kind);
  }
}

/** A token is renewed this long before its end, ms. */
const MARGIN = 60_000;
/** The service is asked again after this, ms; twice as long each time. */
const FIRST_WAIT = 2_000;
const LONGEST_WAIT = 30_000;

interface Sent {
  readonly body?: object;
  readonly prefer?: string;
  readonly keepalive?: boolean;
}

interface ProblemDocument {
  readonly type?: string;
  readonly detail?: string;
  readonly errors?: readonly { readonly pointer?: string; readonly detail: string }[];
}

/** The calls of one frame, with its token, which it renews by itself. */
export class FrameApi {
  private token: string;
  private expiresAt: number;
  private failures = 0;

  constructor({ token }: Pick<FrameView, "token">) {
    this.token = token.token;
    this.expiresAt = Date.parse(token.expiresAt);
  }

  /** Posts open values. Throws FrameTrouble for everything but an answer. */
  post<Result>(path: string, values: Values, signal: AbortSignal): Promise<Result> {
    return this.ask("POST", path, signal, { body: { values } }, (response) => response.json());
  }

  /** Reads what it asked for before, and waits so many seconds for its end. Throws FrameTrouble likewise. */
  get<Result>(path: string, signal: AbortSignal, waitSeconds: number): Promise<Result> {
    return this.ask("GET", path, signal, { prefer: `wait=${waitSeconds}` }, (response) => response.json());
  }

  /** Reads a text, such as a picture. Throws FrameTrouble likewise. */
  text(path: string, signal: AbortSignal): Promise<string> {
    return this.ask("GET", path, signal, {}, (response) => response.text());
  }

  /** Lets go of what nobody waits for any more; that may fail. */
  drop(path: string): void {
    void this.send("DELETE", path, new AbortController().signal, { keepalive: true }).catch(() => undefined);
  }

  private async ask<Result>(
    method: string,
    path: string,
    signal: AbortSignal,
    more: Sent,
    read: (response: Response) => Promise<Result>,
  ): Promise<Result> {
    try {
      if (this.expiresAt - MARGIN < Date.now()) await this.renew(signal);
      let response = await this.send(method, path, signal, more);
      if (response.status === 401) {
        await this.renew(signal);
        response = await this.send(method, path, signal, more);
      }
      if (!response.ok) throw new FrameTrouble(await this.troubleOf(response));
      const answer = await read(response);
      this.failures = 0;
      return answer;
    } catch (error) {
      if (error instanceof FrameTrouble || signal.aborted) throw error;
      throw new FrameTrouble(this.away());
    }
  }

  private async renew(signal: AbortSignal): Promise<void> {
    const response = await this.send("POST", "/api/embed/token", signal, { body: {} });
    if (response.status === 401 || response.status === 409) throw new FrameTrouble({ kind: "stale" });
    if (!response.ok) throw new FrameTrouble(await this.troubleOf(response));
    const { token, expiresAt }: FrameView["token"] = await response.json();
    this.token = token;
    this.expiresAt = Date.parse(expiresAt);
  }

  private send(
    method: string,
    path: string,
    signal: AbortSignal,
    { body, prefer, keepalive }: Sent,
  ): Promise<Response> {
    return fetch(path, {
      method,
      credentials: "omit",
      headers: {
        Authorization: `Bearer ${this.token}`,
        ...(body ? { "Content-Type": "application/json" } : {}),
        ...(prefer ? { Prefer: prefer } : {}),
      },
      body: body && JSON.stringify(body),
      signal,
      keepalive,
    });
  }

  private away(): Trouble {
    const waitMs = Math.min(LONGEST_WAIT, FIRST_WAIT * 2 ** this.failures);
    this.failures += 1;
    return { kind: "away", waitMs };
  }

  private async troubleOf(response: Response): Promise<Trouble> {
    const { status } = response;
    const problem: ProblemDocument = await response.json().catch(() => ({}));
    const seconds = Number(response.headers.get("Retry-After"));
    if (status === 410) return { kind: "gone" };
    if (status === 401 || status === 403 || status === 404) return { kind: "stale" };
    if (status === 429 && problem.type?.endsWith("/quota-exhausted")) {
      return { kind: "quota", until: Date.now() + seconds * 1000 };
    }
    // A full queue of field solutions says so by 503 and when to come back.
    if (status === 429 || (status === 503 && seconds > 0))
      return { kind: "pause", waitMs: Math.max(1, seconds) * 1000 };
    if (status !== 422) return this.away();
    const fields: Record<string, string> = {};
    const whole: string[] = [];
    for (const { pointer, detail } of problem.errors ?? []) {
      const name = /^#\/values\/([^/]+)$/.exec(pointer ?? "")?.[1];
      if (name === undefined) whole.push(detail);
      else fields[decodeURIComponent(name)] ??= detail;
    }
    if (whole.length === 0 && Object.keys(fields).length === 0) whole.push(problem.detail ?? "");
    return { kind: "fields", fields, whole };
  }
}
