/** What a page of the docs is made of: data, so that pages, search, contents and the tests of snippets share it. */

export interface DocSnippet {
  readonly language: "sh" | "ts" | "python" | "csv" | "json" | "http" | "text";
  readonly label: string;
  readonly code: string;
  /** Name under which later snippets of the page find it as a file. */
  readonly file?: string;
  /** Part of what it prints; without one it must only end well. */
  readonly prints?: string;
  /** Shown and not run: a form to fill in, or something that acts on the reader's own machine. */
  readonly shownOnly?: true;
}

/**
 * A paragraph, or something beside paragraphs. In texts `backticks` mark code, **stars** strong words, [words](address)
 * a link.
 */
export type Block =
  | string
  | { readonly list: readonly string[] }
  | { readonly steps: readonly string[] }
  | { readonly table: { readonly head: readonly string[]; readonly rows: readonly (readonly string[])[] } }
  | { readonly caution: string }
  | { readonly note: string }
  | { readonly tex: string }
  | { readonly snippets: readonly DocSnippet[] }
  | { readonly part: "key" };

export interface Section {
  /** Anchor. */
  readonly id: string;
  readonly title: string;
  readonly blocks: readonly Block[];
}

export interface Facts {
  /** Where the service is reached: scheme, host, port. */
  readonly origin: string;
}

export interface DocPage {
  /** Below `/docs/`. */
  readonly slug: string;
  readonly title: string;
  /** One sentence: the page's lead, its line in the contents and its description. */
  readonly summary: string;
  readonly sections: (facts: Facts) => readonly Section[];
}

export interface Group {
  readonly title: string;
  readonly pages: readonly (DocPage | Existing)[];
}

/** A page that is no guide: made elsewhere, listed with the others. */
export interface Existing {
  readonly href: string;
  readonly title: string;
  readonly summary: string;
}

export function hrefOf(page: DocPage | Existing): string {
  return "href" in page ? page.href : `/docs/${page.slug}`;
}
