import { SiteLink } from "../../../_ui/site/site-link";
import { hrefOf, type DocPage, type Existing } from "../_content/page";

interface PageLinksProps {
  readonly before: DocPage | Existing | undefined;
  readonly after: DocPage | Existing | undefined;
}

/** To the page before and the page after, in the order of the contents. */
export function PageLinks({ before, after }: PageLinksProps) {
  return (
    <nav
      aria-label="Previous and next page"
      className="mt-6 flex max-w-prose flex-wrap justify-between gap-2 border-t border-rule pt-2 text-table print:hidden"
    >
      {before ? (
        <SiteLink href={hrefOf(before)} className="link">
          ← {before.title}
        </SiteLink>
      ) : (
        <span />
      )}
      {after ? (
        <SiteLink href={hrefOf(after)} className="link">
          {after.title} →
        </SiteLink>
      ) : null}
    </nav>
  );
}
