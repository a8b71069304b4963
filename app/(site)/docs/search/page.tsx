import type { Metadata } from "next";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { SiteLink } from "../../../_ui/site/site-link";
import { SearchForm } from "../_parts/search-form";
import { searchDocs } from "../_search/search-index";

export const metadata: Metadata = { title: "Search the docs" };

interface Props {
  readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

export default async function Search({ searchParams }: Props) {
  const { q } = await searchParams;
  const query = (Array.isArray(q) ? q.join(" ") : (q ?? "")).slice(0, 200);
  const hits = searchDocs(query);
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <h1>Search the docs</h1>
      <div className="mt-2 max-w-prose">
        <SearchForm id="docs-search-page" label="Search the docs" query={query} />
      </div>
      {query.trim() === "" ? (
        <p className="mt-3 max-w-prose text-ink-soft">
          Guides, shapes and problems. The beginning of a word is enough.
        </p>
      ) : (
        <p className="mt-3 text-table text-ink-soft" role="status">
          {hits.length === 0 ? `Nothing found for “${query}”.` : `${hits.length} found, the best first.`}
        </p>
      )}
      <ol className="mt-2 grid max-w-prose gap-2">
        {hits.map(({ href, title, page, excerpt }) => (
          <li key={href}>
            <h2 className="text-h3">
              <SiteLink href={href} className="link">
                {title}
              </SiteLink>
              {page ? <span className="text-table font-normal text-ink-soft"> · {page}</span> : null}
            </h2>
            <p className="text-table text-ink-soft">{excerpt}</p>
          </li>
        ))}
      </ol>
    </>
  );
}
