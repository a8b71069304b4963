import MiniSearch from "minisearch";
import { catalogue, shapeEntry } from "@/lib/engine";
import { PROBLEMS } from "@/api/problem";
import { plainText } from "../_parts/inline";
import { GROUPS } from "../_content/pages";
import type { Block } from "../_content/page";
import { TRADE_WORDS } from "./trade-words";

export interface Hit {
  readonly href: string;
  readonly title: string;
  /** The page, where the hit is a section of it. */
  readonly page: string;
  readonly excerpt: string;
}

interface Entry extends Hit {
  readonly id: number;
  readonly text: string;
  /** What snippets say. */
  readonly code: string;
  /** Other words of the trade for it. */
  readonly trade: string;
}

/** Longest excerpt, characters. */
const EXCERPT = 180;

let kept: MiniSearch<Entry> | undefined;

/** Words of a question that say nothing about its subject. */
const SMALL_WORDS = new Set(
  "a an the of to in on at by for from with without and or not is are be do does i my we our it its how what where which why can".split(
    " ",
  ),
);

/**
 * The best places for a query, each once; words may be begun only, and mistyped by a letter. All words must be there,
 * or, where that finds nothing, any of them.
 */
export function searchDocs(query: string): readonly Hit[] {
  kept ??= build();
  const all = kept.search(query, { combineWith: "AND" });
  const found = all.length > 0 ? all : kept.search(query, { combineWith: "OR" });
  return found.slice(0, 20).map(({ href, title, page, excerpt }): Hit => ({
    href: String(href),
    title: String(title),
    page: String(page),
    excerpt: String(excerpt),
  }));
}

function build(): MiniSearch<Entry> {
  const index = new MiniSearch<Entry>({
    fields: ["title", "page", "trade", "text", "code"],
    storeFields: ["href", "title", "page", "excerpt"],
    processTerm: (term) => {
      const word = term.toLowerCase();
      return SMALL_WORDS.has(word) ? null : word;
    },
    searchOptions: {
      prefix: (term) => term.length > 1,
      fuzzy: (term) => (term.length > 4 ? 0.2 : false),
      boost: { title: 4, trade: 3, page: 2, code: 0.2 },
    },
  });
  index.addAll(
    [...guides(), ...shapes(), ...problems()].map((hit, id) => ({
      ...hit,
      id,
      trade: [hit.trade, TRADE_WORDS[hit.href]].join(" "),
    })),
  );
  return index;
}

type Found = Omit<Entry, "id" | "trade"> & { readonly trade?: string };

function* guides(): Generator<Found> {
  for (const page of GROUPS.flatMap(({ pages }) => pages)) {
    if (!("slug" in page)) {
      const { href, title, summary } = page;
      yield { href, title, page: "", excerpt: summary, text: summary, code: "" };
      continue;
    }
    const href = `/docs/${page.slug}`;
    const summary = plainText(page.summary);
    yield { href, title: page.title, page: "", excerpt: summary, text: summary, code: "" };
    for (const { id, title, blocks } of page.sections({ origin: "" })) {
      const text = blocks.map(blockText).join(" ");
      const first = plainText(blocks.find((block) => typeof block === "string") ?? text);
      yield {
        href: `${href}#${id}`,
        title,
        page: page.title,
        excerpt: cut(first),
        text,
        code: blocks.map(blockCode).join(" "),
      };
    }
  }
}

function* shapes(): Generator<Found> {
  for (const entry of catalogue.map(shapeEntry)) {
    const names = entry.dimensions.flatMap(({ name, label }) => [name, label]);
    const text = [entry.id, entry.summary, ...names, ...entry.validity].join(" ");
    const href = `/docs/shapes/${entry.id}`;
    yield { href, title: entry.title, page: "Shapes", excerpt: cut(entry.summary), text, code: "" };
  }
}

function* problems(): Generator<Found> {
  for (const [code, { title, description, remedy, status }] of Object.entries(PROBLEMS)) {
    const text = plainText(`${code} ${status} ${description} ${remedy}`);
    yield {
      href: `/docs/problems/${code}`,
      title,
      page: "Problems",
      excerpt: cut(plainText(description)),
      text,
      code: "",
      // People look a status up before they know its problem's name.
      trade: String(status),
    };
  }
}

function blockText(block: Block): string {
  if (typeof block === "string") return plainText(block);
  if ("list" in block) return plainText(block.list.join(" "));
  if ("steps" in block) return plainText(block.steps.join(" "));
  if ("table" in block) return plainText([block.table.head, ...block.table.rows].flat().join(" "));
  if ("caution" in block) return plainText(block.caution);
  if ("note" in block) return plainText(block.note);
  return "";
}

function blockCode(block: Block): string {
  if (typeof block === "string" || !("snippets" in block)) return "";
  return block.snippets.map(({ label, code }) => `${label} ${code}`).join(" ");
}

function cut(text: string): string {
  if (text.length <= EXCERPT) return text;
  return `${text.slice(0, text.lastIndexOf(" ", EXCERPT))} …`;
}
