import type { Metadata } from "next";
import { SiteLink } from "../../_ui/site/site-link";
import { Inline } from "./_parts/inline";
import { GROUPS } from "./_content/pages";
import { hrefOf } from "./_content/page";

export const metadata: Metadata = { title: "Docs" };

export default function Docs() {
  return (
    <>
      <h1>Docs</h1>
      <p className="mt-2 max-w-prose text-lead text-ink-soft">
        The API is one address, JSON in and JSON out. Numbers are SI, or carry their unit; refusals are
        problem documents that point at the field.
      </p>
      {GROUPS.map(({ title, pages }) => (
        <section key={title} className="mt-4 max-w-prose border-t border-rule pt-2">
          <h2>{title}</h2>
          <dl className="mt-1 grid gap-1.5">
            {pages.map((page) => (
              <div key={hrefOf(page)}>
                <dt className="font-semibold">
                  <SiteLink href={hrefOf(page)} className="link">
                    {page.title}
                  </SiteLink>
                </dt>
                <dd className="text-ink-soft">
                  <Inline text={page.summary} />
                </dd>
              </div>
            ))}
          </dl>
        </section>
      ))}
      <p className="mt-4 max-w-prose">
        For generators and other tools, the contract is an{" "}
        <SiteLink href="/api/v1/openapi.json" className="link">
          OpenAPI 3.1 document
        </SiteLink>
        .
      </p>
    </>
  );
}
