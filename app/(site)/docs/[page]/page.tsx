import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { sharedService } from "@/lib/service/service";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { Blocks } from "../_parts/blocks";
import { Inline } from "../_parts/inline";
import { PageLinks } from "../_parts/page-links";
import { guideOf, neighbours } from "../_content/pages";

interface Props {
  readonly params: Promise<{ readonly page: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const guide = guideOf((await params).page);
  return guide ? { title: guide.title, description: guide.summary } : { title: "No such page" };
}

export default async function Guide({ params }: Props) {
  const guide = guideOf((await params).page);
  if (!guide) notFound();
  const sections = guide.sections({ origin: sharedService().config.origin });
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <article className="prose">
        <h1>{guide.title}</h1>
        <p className="text-lead text-ink-soft">
          <Inline text={guide.summary} />
        </p>
        {sections.length > 2 ? (
          <nav aria-label="On this page" className="text-table print:hidden">
            <ul>
              {sections.map(({ id, title }) => (
                <li key={id}>
                  <a href={`#${id}`}>{title}</a>
                </li>
              ))}
            </ul>
          </nav>
        ) : null}
        {sections.map(({ id, title, blocks }) => (
          <section key={id} className="prose">
            <h2 id={id} className="scroll-mt-2">
              {title}{" "}
              <a
                href={`#${id}`}
                aria-label={`Address of “${title}”`}
                className="text-table font-normal text-ink-soft no-underline"
              >
                #
              </a>
            </h2>
            <Blocks blocks={blocks} />
          </section>
        ))}
      </article>
      <PageLinks {...neighbours(`/docs/${guide.slug}`)} />
    </>
  );
}
