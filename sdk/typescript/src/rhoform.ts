import { problemOf } from "./failure.js";
import { type Client, createClient, createConfig } from "./generated/client/index.js";
import { withIdempotencyKey } from "./idempotency.js";
import { persistentFetch } from "./persistent-fetch.js";

export interface RhoformOptions {
  /** Where the service is reached, without the path of the API: "https://rhoform.example". */
  readonly baseUrl: string;
  /** A key, `rho_…`. Without one only the catalogue and the document can be read. */
  readonly key?: string;
  /** Time one try may take, ms; 30 s where left out. */
  readonly timeoutMs?: number;
  /** Further tries after a refusal for the moment or a broken connection; 2 where left out. */
  readonly retries?: number;
  /** Longest wait between two tries, ms; 60 s where left out. */
  readonly maxWaitMs?: number;
  /** In place of the global `fetch`. */
  readonly fetch?: (request: Request, init?: RequestInit) => Promise<Response>;
}

/**
 * Makes a client to pass to the calls: `computeResistance({ client, body })`.
 *
 * Calls answer with the body of the answer and throw: RhoformProblem where the service refuses, RhoformTimeout,
 * RhoformUnreachable, and the signal's own reason where the caller aborts (`{ client, signal }`).
 * @throws TypeError for settings that cannot work; its message never holds the key.
 */
export function rhoform(options: RhoformOptions): Client {
  const { baseUrl, key, timeoutMs = 30_000, retries = 2, maxWaitMs = 60_000 } = options;
  const origin = originOf(baseUrl);
  if (key !== undefined && !/^rho_[A-Za-z0-9_-]+$/.test(key)) {
    throw new TypeError("The key does not look like one: it begins with rho_ and has no spaces or quotes.");
  }
  const client = createClient(
    createConfig({
      baseUrl: `${origin}/api/v1`,
      responseStyle: "data",
      throwOnError: true,
      // A function, so that printing the client does not print the key.
      auth: (scheme) => (scheme.scheme === "bearer" ? key : undefined),
      fetch: asFetch(
        persistentFetch({
          timeoutMs,
          retries,
          maxWaitMs,
          fetch: options.fetch ?? ((request, init) => fetch(request, init)),
        }),
      ),
    }),
  );
  client.interceptors.request.use(withIdempotencyKey);
  client.interceptors.error.use((error, response) =>
    // Without a response the error is one of ours, or the caller's reason to abort.
    (response as Response | undefined) ? problemOf(error, response, key) : error,
  );
  return client;
}

function asFetch(send: (request: Request) => Promise<Response>): typeof fetch {
  return (input, init) =>
    send(input instanceof Request && init === undefined ? input : new Request(input, init));
}

function originOf(baseUrl: string): string {
  let url: URL;
  try {
    url = new URL(baseUrl);
  } catch {
    throw new TypeError('baseUrl is no address; it has the form "https://rhoform.example".');
  }
  if (url.protocol !== "https:" && url.protocol !== "http:") {
    throw new TypeError("baseUrl must begin with https:// or http://.");
  }
  return url.href.replace(/\/+$/, "").replace(/\/api\/v1$/, "");
}
