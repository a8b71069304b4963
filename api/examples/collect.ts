import { dispatch } from "../dispatch";
import type { Example } from "../documentation";
import type { Operation } from "../operation";
import type { RouteTable } from "../route-table";
import { makeFixtures, performExample, type Fixtures, type Send } from "./perform";
import { SampleIds } from "./sample-ids";
import { scratchService } from "./scratch-service";

/** An example with the answer that it really got. */
export interface AnsweredExample extends Example {
  /** Path parameters with sample ids in the place of fixtures. */
  readonly path: Readonly<Record<string, string>>;
  readonly answer: {
    readonly status: number;
    /** Without parameters; empty for an empty answer. */
    readonly mediaType: string;
    /** Parsed where it is JSON, else text. */
    readonly body: unknown;
  };
}

const LOCAL = "http://localhost";

/** Calls that every operation which needs a key refuses. */
const WITHOUT_KEY = { name: "noKey", summary: "Without a key", status: 401 };
const WRONG_KEY = { name: "unknownKey", summary: "With a key that was never issued", status: 401 };
/** Of the form of a key, and never issued. */
export const UNKNOWN_KEY = `rho_k${"0".repeat(15)}_${"0".repeat(43)}`;

/**
 * Makes every operation's examples on a service in memory and collects the answers, by operation. One that is not
 * answered with its status is left out: the document stays true, and a test misses it.
 */
export async function collectExamples(
  routes: RouteTable,
  origin: string,
): Promise<ReadonlyMap<string, readonly AnsweredExample[]>> {
  const { service, key, settle, close } = scratchService(origin);
  const send: Send = async (path, init) => {
    await settle();
    return dispatch(new Request(LOCAL + path, init), service, routes);
  };
  const ids = new SampleIds();
  try {
    const fixtures = await makeFixtures(send, key);
    const collected = new Map<string, readonly AnsweredExample[]>();
    for (const operation of routes.operations) {
      const [first] = operation.examples;
      const calls: (readonly [Example, string | undefined])[] = operation.examples.map((entry) => [
        entry,
        key,
      ]);
      if (first && operation.scope !== "none") {
        // As JSON, whatever the example asks for: the problem document is what is shown.
        const call = { ...first, accept: undefined };
        calls.push([{ ...call, ...WITHOUT_KEY }, undefined], [{ ...call, ...WRONG_KEY }, UNKNOWN_KEY]);
      }
      const answered: AnsweredExample[] = [];
      for (const [example, credentials] of calls) {
        const call = await perform(send, operation, example, fixtures, credentials, ids);
        if (call.answer.status === example.status) answered.push(call);
      }
      collected.set(operation.id, answered);
    }
    return collected;
  } finally {
    await settle();
    close();
  }
}

async function perform(
  send: Send,
  operation: Operation,
  example: Example,
  fixtures: Fixtures,
  key: string | undefined,
  ids: SampleIds,
): Promise<AnsweredExample> {
  const response = await performExample(send, operation, example, fixtures, key);
  const text = ids.replace(await response.text());
  const mediaType = (response.headers.get("content-type") ?? "").split(";")[0];
  const path = Object.entries(example.path ?? {}).map(([name, value]) => {
    const fixture = fixtures[value];
    return [name, fixture === undefined ? value : ids.replace(fixture)];
  });
  return {
    ...example,
    path: Object.fromEntries(path),
    answer: {
      status: response.status,
      mediaType,
      body: mediaType.endsWith("json") ? JSON.parse(text) : text,
    },
  };
}
