import type { Client } from "./generated/client/index.js";
import { computeBatch } from "./generated/sdk.gen.js";
import type { AnsweredItem, RefusedItem, ResistanceRequest } from "./generated/types.gen.js";

/** Items and characters of one call; the service takes 10,000 and 20 MB, smaller calls end within a try's time. */
const CALL_ITEMS = 500;
const CALL_CHARACTERS = 4_000_000;
/** How often items are asked for again for which the service had no time. */
const ROUNDS = 5;

export interface ComputeAllOptions {
  readonly client: Client;
  readonly requests: Iterable<ResistanceRequest>;
  /** Called with the number of requests answered so far. */
  readonly onProgress?: (answered: number) => void;
  readonly signal?: AbortSignal;
}

/**
 * Computes any number of requests in as few calls as the limits allow, one after the other, and answers in their order.
 *
 * Each item has its `index` among all requests and either a `result` or, refused, a `problem`; a request that is refused
 * does not hinder the others.
 */
export async function computeAll(options: ComputeAllOptions): Promise<(AnsweredItem | RefusedItem)[]> {
  const items: (AnsweredItem | RefusedItem)[] = [];
  for (const chunk of chunks(options.requests)) {
    items.push(...(await computeChunk(chunk, items.length, options)));
    options.onProgress?.(items.length);
  }
  return items;
}

function* chunks(requests: Iterable<ResistanceRequest>): Generator<ResistanceRequest[]> {
  let chunk: ResistanceRequest[] = [];
  let characters = 0;
  for (const request of requests) {
    const length = JSON.stringify(request).length;
    if (chunk.length >= CALL_ITEMS || (chunk.length > 0 && characters + length > CALL_CHARACTERS)) {
      yield chunk;
      chunk = [];
      characters = 0;
    }
    chunk.push(request);
    characters += length;
  }
  if (chunk.length > 0) yield chunk;
}

async function computeChunk(
  requests: readonly ResistanceRequest[],
  offset: number,
  { client, signal }: ComputeAllOptions,
): Promise<(AnsweredItem | RefusedItem)[]> {
  const answered: (AnsweredItem | RefusedItem)[] = [];
  let left = requests.map((request, place) => ({ request, place }));
  for (let round = 0; round < ROUNDS; round += 1) {
    const { items } = await computeBatch({
      client,
      signal,
      body: { items: left.map(({ request }) => request) },
    });
    const late = left.filter((_entry, index) => items[index].status === 503);
    left.forEach(({ place }, index) => {
      answered[place] = { ...items[index], index: offset + place };
    });
    // Without a single answer the service is too slow for these: more rounds would not help.
    if (late.length === 0 || late.length === left.length) break;
    left = late;
  }
  return answered;
}
