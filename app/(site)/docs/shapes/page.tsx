import type { Metadata } from "next";
import { catalogue } from "@/lib/engine";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { SiteLink } from "../../../_ui/site/site-link";
import { FAMILIES, FAMILY_NOTES, FAMILY_TITLES } from "../../calculate/_model/families";
import { PageLinks } from "../_parts/page-links";
import { neighbours } from "../_content/pages";

export const metadata: Metadata = { title: "Shapes" };

export default function Shapes() {
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <h1>Shapes</h1>
      <p className="mt-2 max-w-prose text-lead text-ink-soft">
        {catalogue.length} shapes, each with its drawing, dimensions, formula, where it holds, and the call in
        every language. A part that is none of them is an{" "}
        <SiteLink href="/docs/fields" className="link">
          outline
        </SiteLink>
        .
      </p>
      {FAMILIES.map((family) => (
        <section key={family} className="mt-4 max-w-prose border-t border-rule pt-2">
          <h2 id={family}>{FAMILY_TITLES[family]}</h2>
          <p className="text-ink-soft">{FAMILY_NOTES[family]}</p>
          <dl className="mt-1 grid gap-1">
            {catalogue
              .filter((shape) => shape.family === family)
              .map(({ id, title, summary }) => (
                <div key={id}>
                  <dt>
                    <SiteLink href={`/docs/shapes/${id}`} className="link font-semibold">
                      {title}
                    </SiteLink>{" "}
                    <code className="text-small text-ink-soft">{id}</code>
                  </dt>
                  <dd className="text-table text-ink-soft">{summary}</dd>
                </div>
              ))}
          </dl>
        </section>
      ))}
      <PageLinks {...neighbours("/docs/shapes")} />
    </>
  );
}
