import MiniSearch from "minisearch";
import { catalogue, shapeEntry } from "@/lib/engine";
import { PROBLEMS } from "@/api/problem";
import { plainText } from "../_parts/inline";
import { GROUPS } from "../_content/pages";
import type { Block } from "../_content/page";

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
}

/** Longest excerpt, characters. */
const EXCERPT = 180;

let kept: MiniSearch<Entry> | undefined;

/**
 * The best places for a query, each once; words may be begun only, and mistyped by a letter. All words must be there,
 * or, where that finds nothing, any of them.
 */
export function searchDocs(query: string): readonly Hit[] {
  const words = query.trim();
  if (words === "") return [];
  kept ??= build();
  return kept
    .search(words)
    .slice(0, 20)
    .map(({ href, title, page, excerpt }): Hit => ({
      href: String(href),
      title: String(title),
      page: String(page),
      excerpt: String(excerpt),
    }));
}

function build(): MiniSearch<Entry> {
  const index = new MiniSearch<Entry>({
    fields: ["title", "page", "text"],
    storeFields: ["href", "title", "page", "excerpt"],
    searchOptions: {
      prefix: true,
      fuzzy: (term) => (term.length > 4 ? 0.2 : false),
      boost: { title: 4, page: 2 },
      combineWith: "AND",
    },
  });
  index.addAll([...guides(), ...shapes(), ...problems()].map((hit, id) => ({ ...hit, id })));
  return index;
}

type Found = Omit<Entry, "id">;

function* guides(): Generator<Found> {
  for (const page of GROUPS.flatMap(({ pages }) => pages)) {
    if (!("slug" in page)) {
      yield { href: page.href, title: page.title, page: "", excerpt: page.summary, text: page.summary };
      continue;
    }
    const href = `/docs/${page.slug}`;
    const summary = plainText(page.summary);
    yield { href, title: page.title, page: "", excerpt: summary, text: summary };
    for (const { id, title, blocks } of page.sections({ origin: "" })) {
      const text = blocks.map(blockText).join(" ");
      const first = plainText(blocks.find((block) => typeof block === "string") ?? text);
      yield { href: `${href}#${id}`, title, page: page.title, excerpt: cut(first), text };
    }
  }
}

function* shapes(): Generator<Found> {
  for (const entry of catalogue.map(shapeEntry)) {
    const names = entry.dimensions.flatMap(({ name, label }) => [name, label]);
    const text = [entry.id, entry.summary, ...names, ...entry.validity].join(" ");
    const href = `/docs/shapes/${entry.id}`;
    yield { href, title: entry.title, page: "Shapes", excerpt: cut(entry.summary), text };
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

function cut(text: string): string {
  if (text.length <= EXCERPT) return text;
  return `${text.slice(0, text.lastIndexOf(" ", EXCERPT))} …`;
}
