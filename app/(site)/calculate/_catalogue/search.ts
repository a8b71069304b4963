/** Search of the catalogue by words and symbols. */
import type { ShapeEntry } from "@/lib/engine";
import { TRADE_WORDS } from "../../docs/_search/trade-words";
import { FAMILY_TITLES } from "../_model/families";

/** Everything a shape may be searched by, the trade's other words included; symbols are kept as words of their own. */
export function searchText(entry: ShapeEntry): string {
  const symbols = entry.dimensions.map(({ symbol }) => plain(symbol));
  return plain(
    [
      entry.id.replaceAll("-", " "),
      entry.title,
      FAMILY_TITLES[entry.family],
      entry.summary,
      ...entry.dimensions.flatMap(({ label, name }) => [label, name]),
      ...entry.coordinates.map(({ label }) => label),
      ...entry.media.names.map(({ label }) => label),
      TRADE_WORDS[`/docs/shapes/${entry.id}`] ?? "",
    ].join(" "),
  ).concat(" ", symbols.map((symbol) => `=${symbol}=`).join(" "));
}

/**
 * Whether every word of a search is found. A word of one or two characters must be a symbol, or begin a word; longer
 * ones may stand anywhere.
 */
export function matches(search: string, text: string): boolean {
  return plain(search)
    .split(/\s+/)
    .filter(Boolean)
    .every((word) => {
      if (word.length > 2) return text.includes(word);
      return text.includes(`=${word}=`) || new RegExp(`(?:^|[\\s,;(])${escape(word)}`).test(text);
    });
}

/** Lower case, subscripts as plain digits and letters. */
function plain(text: string): string {
  return text.normalize("NFKC").toLowerCase();
}

function escape(word: string): string {
  return word.replace(/[.*+?^${}()|[\]\\]/g, "\\$&");
}
