import { MOST_ITEMS, BATCH_MAX_BYTES } from "@/api/batch/items";
import { DEFAULT_MAX_BYTES } from "@/api/body";
import { NETWORK_MAX_BYTES } from "@/api/operations/networks";
import { OUTLINE_MAX_BYTES } from "@/api/operations/outlines";
import { LONGEST_WAIT } from "@/api/prefer";
import { LONGEST_EXPRESSION } from "@/lib/engine/medium/expression/scan-expression";
import { MOST_ELEMENTS } from "@/lib/engine/network/request-schema";

const count = (value: number) => value.toLocaleString("en");
const megabytes = (bytes: number) => `${bytes / 1e6} MB`;

/** What a call may weigh, in the words of the guides; the numbers are those that the API holds calls to. */
export const CALL_LIMITS = {
  body: megabytes(DEFAULT_MAX_BYTES),
  outlineBody: megabytes(OUTLINE_MAX_BYTES),
  batchBody: megabytes(BATCH_MAX_BYTES),
  batchItems: count(MOST_ITEMS),
  networkBody: megabytes(NETWORK_MAX_BYTES),
  networkElements: count(MOST_ELEMENTS),
  wait: `${LONGEST_WAIT} s`,
  expression: count(LONGEST_EXPRESSION),
} as const;
