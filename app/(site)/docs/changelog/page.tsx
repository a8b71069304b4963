import type { Metadata } from "next";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { ProseText } from "../../../_ui/prose-text";
import { type ChangelogBlock, readChangelog } from "./read-changelog";
import { neighbours } from "../_content/pages";
import { PageLinks } from "../_parts/page-links";

export const metadata: Metadata = { title: "Changelog" };

export default async function Changelog() {
  const blocks = await readChangelog();
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <article className="prose">
        <h1>Changelog</h1>
        {blocks.map((block, index) => (
          <Block key={index} block={block} />
        ))}
      </article>
      <PageLinks {...neighbours("/docs/changelog")} />
    </>
  );
}

function Block({ block }: { readonly block: ChangelogBlock }) {
  switch (block.kind) {
    case "version":
      return <h2>{block.text}</h2>;
    case "section":
      return <h3>{block.text}</h3>;
    case "paragraph":
      return (
        <p>
          <ProseText text={block.text} />
        </p>
      );
    case "list":
      return (
        <ul>
          {block.items.map((item, index) => (
            <li key={index}>
              <ProseText text={item} />
            </li>
          ))}
        </ul>
      );
  }
}
