import { Notice } from "../../../_ui/notice";
import { Tabs } from "../../../_ui/tabs";
import { Tex } from "../../../_ui/tex";
import type { Block, DocSnippet } from "../_content/page";
import { Inline, plainText } from "./inline";
import { KeyField } from "./key-field";
import { OwnCode } from "./own-code";
import { ScrollTable } from "./scroll-table";

/** The parts of a section, one after the other. */
export function Blocks({ blocks }: { readonly blocks: readonly Block[] }) {
  return blocks.map((block, index) => <BlockPart key={index} block={block} />);
}

function BlockPart({ block }: { readonly block: Block }) {
  if (typeof block === "string")
    return (
      <p>
        <Inline text={block} />
      </p>
    );
  if ("list" in block)
    return (
      <ul>
        {block.list.map((item) => (
          <li key={item}>
            <Inline text={item} />
          </li>
        ))}
      </ul>
    );
  if ("steps" in block)
    return (
      <ol>
        {block.steps.map((item) => (
          <li key={item}>
            <Inline text={item} />
          </li>
        ))}
      </ol>
    );
  if ("table" in block) return <Table {...block.table} />;
  if ("tex" in block) return <Tex tex={block.tex} display />;
  if ("snippets" in block) return <Snippets snippets={block.snippets} />;
  if ("part" in block) return <KeyField />;
  return "caution" in block ? (
    <Notice tone="caution">
      <Inline text={block.caution} />
    </Notice>
  ) : (
    <Notice>
      <Inline text={block.note} />
    </Notice>
  );
}

function Table({
  head,
  rows,
}: {
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}) {
  return (
    <ScrollTable label={plainText(head.join(", "))}>
      <thead>
        <tr>
          {head.map((text) => (
            <th key={text} scope="col" className="font-semibold">
              <Inline text={text} />
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((cells) => (
          <tr key={cells.join(" ")}>
            {cells.map((cell, index) => (
              <td key={index}>
                <Inline text={cell} />
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </ScrollTable>
  );
}

/** The forms of a call, one shown at a time; without scripts, one below the other. */
export function Snippets({ snippets }: { readonly snippets: readonly DocSnippet[] }) {
  if (snippets.length === 1) return <OwnCode code={snippets[0].code} label={snippets[0].label} />;
  return (
    <>
      <Tabs
        label="Forms of the call"
        tabs={snippets.map(({ label, code }) => ({
          id: label.toLowerCase().replaceAll(" ", "-"),
          label,
          content: <OwnCode code={code} label={label} />,
        }))}
      />
      <noscript>
        {snippets.slice(1).map(({ label, code }) => (
          <figure key={label} className="mt-2 rounded border border-rule bg-sheet">
            <figcaption className="border-b border-rule px-2 py-1 text-small text-ink-soft">
              {label}
            </figcaption>
            <pre tabIndex={0} aria-label={label} className="overflow-x-auto px-2 py-1.5 text-small">
              <code>{code}</code>
            </pre>
          </figure>
        ))}
      </noscript>
    </>
  );
}
