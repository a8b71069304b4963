import { clientSnippets, type ClientCall } from "../../_live/client-snippets";
import type { Block, DocSnippet } from "./page";

const LANGUAGES: Readonly<Record<string, DocSnippet["language"]>> = {
  curl: "sh",
  "typescript-client": "ts",
  "python-client": "python",
};

/** A call in every language, with what each must print. */
export function callBlock(origin: string, call: ClientCall, prints?: string): Block {
  return {
    snippets: clientSnippets(origin, call).map(({ id, label, code }) => ({
      language: LANGUAGES[id] ?? "text",
      label,
      code,
      ...(prints === undefined ? {} : { prints }),
    })),
  };
}

/** One resistance in every language. */
export function resistanceBlock(
  origin: string,
  request: object,
  lines: { readonly typescript: readonly string[]; readonly python: readonly string[] } = {
    typescript: ["console.log(answer.resistance.text, answer.resistance.lower, answer.resistance.upper);"],
    python: ["print(answer.resistance.text, answer.resistance.lower, answer.resistance.upper)"],
  },
  prints?: string,
): Block {
  return callBlock(
    origin,
    { operation: "computeResistance", method: "POST", path: "/resistance", body: request, ...lines },
    prints,
  );
}

/** JSON to read: a part of a request or of an answer. */
export function jsonBlock(label: string, value: object): Block {
  const text = JSON.stringify(value, null, 2).replace(
    /\[\s+(-?[\d.eE+-]+),\s+(-?[\d.eE+-]+)\s+\]/g,
    "[$1, $2]",
  );
  return { snippets: [{ language: "json", label, code: text, shownOnly: true }] };
}
