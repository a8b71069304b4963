import { RhoformTimeout, RhoformUnreachable, retryAfterSeconds } from "./failure.js";

export interface Persistence {
  /** Time one try may take, body included, ms. */
  readonly timeoutMs: number;
  /** Further tries after the first. */
  readonly retries: number;
  /** Longest wait between two tries, ms; an answer that asks for more is not waited for. */
  readonly maxWaitMs: number;
  readonly fetch: (request: Request, init?: RequestInit) => Promise<Response>;
}

/** Refused before anything was done: a repeat is safe whatever the method. */
const NOT_DONE = new Set([429, 503]);
/** From something between us and the service: a repeat is safe only where the call may be made twice. */
const BROKEN = new Set([502, 504]);

/** A fetch that times out, waits as the service asks, and tries again where that cannot do harm. */
export function persistentFetch(persistence: Persistence): (request: Request) => Promise<Response> {
  return async (request) => {
    const repeatable =
      request.method === "GET" || request.method === "HEAD" || request.headers.has("Idempotency-Key");
    for (let tries = 0; ; tries += 1) {
      const last = tries >= persistence.retries;
      // The body can be read once; each try sends a copy of its own.
      const copy = last ? request : request.clone();
      const outcome = await attempt(copy, persistence);
      if (outcome instanceof Response) {
        const again = NOT_DONE.has(outcome.status) || (repeatable && BROKEN.has(outcome.status));
        if (last || !again) return outcome;
        const asked = retryAfterSeconds(outcome);
        const wait = asked === null ? backoff(tries) : asked * 1000;
        if (wait > persistence.maxWaitMs) return outcome;
        await outcome.body?.cancel();
        await pause(wait, request.signal);
      } else {
        if (last || !repeatable || request.signal.aborted) throw outcome;
        await pause(Math.min(backoff(tries), persistence.maxWaitMs), request.signal);
      }
    }
  };
}

async function attempt(request: Request, { timeoutMs, fetch }: Persistence): Promise<Response | Error> {
  const timeout = AbortSignal.timeout(timeoutMs);
  try {
    return await fetch(request, { signal: AbortSignal.any([request.signal, timeout]) });
  } catch (error) {
    if (request.signal.aborted) throw request.signal.reason;
    if (timeout.aborted) return new RhoformTimeout(timeoutMs);
    // The message alone: an error of the network layer may hold the request, and with it the key.
    return new RhoformUnreachable(new URL(request.url).host, reasonOf(error));
  }
}

function reasonOf(error: unknown): string {
  if (!(error instanceof Error)) return "unknown reason";
  const { cause } = error;
  const code =
    cause instanceof Error && "code" in cause && typeof cause.code === "string" ? cause.code : null;
  return code ?? error.message;
}

/** 0.5 s, 1 s, 2 s, … */
function backoff(tries: number): number {
  return 500 * 2 ** tries;
}

/** Waits; an abort ends the waiting with the signal's reason. */
export function pause(ms: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve, reject) => {
    const stop = () => {
      clearTimeout(timer);
      reject(signal.reason);
    };
    const timer = setTimeout(() => {
      signal.removeEventListener("abort", stop);
      resolve();
    }, ms);
    if (signal.aborted) stop();
    else signal.addEventListener("abort", stop, { once: true });
  });
}
