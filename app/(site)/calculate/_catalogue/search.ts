/** Search of the catalogue by words and symbols. */
import type { ShapeEntry } from "@/lib/engine";
import { TRADE_WORDS } from "../../docs/_search/trade-words";
import { FAMILY_TITLES } from "../_model/families";

/**
 * Everything a shape may be searched by, the trade's other words included. A word of its title stands as "^bar", a
 * symbol as "=w=".
 */
export function searchText(entry: ShapeEntry): string {
  const sheet = entry.media.kind === "sheet";
  const words = [
    entry.id.replaceAll("-", " "),
    FAMILY_TITLES[entry.family],
    entry.summary,
    ...entry.dimensions.flatMap(({ label, name }) => [label, name]),
    ...entry.coordinates.map(({ label }) => label),
    ...entry.media.names.map(({ label }) => label),
    "resistivity conductivity",
    sheet ? "sheet resistance" : "",
    entry.media.gradable.length > 0 ? "graded" : "",
    TRADE_WORDS[`/docs/shapes/${entry.id}`] ?? "",
  ];
  const symbols = [...entry.dimensions.map(({ symbol }) => symbol), "ρ", "σ", ...(sheet ? ["R□", "Rs"] : [])];
  return [
    ...entry.title.split(" ").map((word) => `^${plain(word)}`),
    plain(words.join(" ")),
    ...symbols.map((symbol) => `=${plain(symbol)}=`),
  ].join(" ");
}

const GREEK: Readonly<Record<string, string>> = {
  alpha: "α",
  beta: "β",
  theta: "θ",
  phi: "φ",
  rho: "ρ",
  sigma: "σ",
};

/** Words as long as this are no chance part of another: "sphere" is found in "hemisphere", "ring" not in "string". */
const LONG = 6;

/**
 * Whether every word of a search is found: as a symbol, or where a word begins; one character only where a word of the
 * title does, and a long word anywhere.
 */
export function matches(search: string, text: string): boolean {
  return plain(search)
    .split(/\s+/)
    .filter(Boolean)
    .every((word) => {
      if (text.includes(`=${GREEK[word] ?? word}=`)) return true;
      if (word.length >= LONG) return text.includes(word);
      return new RegExp(`${word.length === 1 ? "\\^" : "(?:^|[\\s,;(/^-])"}${escape(word)}`).test(text);
    });
}

/** Lower case, subscripts as plain digits and letters, also "w_1". */
function plain(text: string): string {
  return text.normalize("NFKC").toLowerCase().replaceAll("_", "");
}

function escape(word: string): string {
  return word.replace(/[.*+?^${}()|[\]\\]/g, "\\$&");
}
