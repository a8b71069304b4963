import type { ReactNode } from "react";
import { Contents } from "./_parts/contents";
import { SearchForm } from "./_parts/search-form";
import { GROUPS } from "./_content/pages";
import { hrefOf } from "./_content/page";

export default function DocsLayout({ children }: { readonly children: ReactNode }) {
  const groups = GROUPS.map(({ title, pages }) => ({
    title,
    entries: pages.map((page) => ({ href: hrefOf(page), title: page.title })),
  }));
  return (
    <div className="grid gap-4 wide:grid-cols-[13rem_minmax(0,1fr)] wide:gap-6 print:block">
      <div className="print:hidden">
        <details className="group wide:hidden">
          <summary className="cursor-pointer rounded border border-edge bg-sheet px-1.5 py-1 text-table font-medium">
            Contents and search
          </summary>
          <nav aria-label="Docs, folded" className="mt-2 grid gap-2">
            <SearchForm id="docs-search-folded" />
            <Contents groups={groups} />
          </nav>
        </details>
        <nav
          aria-label="Docs"
          className="scroll-shade-down sticky top-2 hidden max-h-[calc(100dvh-2rem)] gap-2 overflow-y-auto pe-1 wide:grid"
        >
          <SearchForm id="docs-search" />
          <Contents groups={groups} />
        </nav>
      </div>
      <div className="min-w-0">{children}</div>
    </div>
  );
}
