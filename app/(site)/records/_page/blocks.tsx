import type { ReactNode } from "react";
import { CodeBlock } from "../../../_ui/code-block";
import { ProseText } from "../../../_ui/prose-text";
import { QuantitySymbol } from "../../../_ui/quantity-symbol";
import { Tex } from "../../../_ui/tex";
import type { Block, Column, Fact, RecordStep, Section } from "../_content/content";

/** One section of a record; it stays together with its title on paper. */
export function RecordSection({ section }: { readonly section: Section }) {
  return (
    <section aria-labelledby={section.id} className="mt-3 print:mt-2">
      <h2 id={section.id} className="mb-1 border-b border-rule pb-0.5 text-h3 print:break-after-avoid">
        {section.title}
      </h2>
      <div className="grid grid-cols-1 gap-1.5">
        {section.blocks.map((block, index) => (
          <BlockView key={index} block={block} />
        ))}
      </div>
    </section>
  );
}

function BlockView({ block }: { readonly block: Block }): ReactNode {
  switch (block.kind) {
    case "facts":
      return <Facts facts={block.facts} />;
    case "table":
      return <Table label={block.label} remark={block.remark} columns={block.columns} rows={block.rows} />;
    case "lines":
      return (
        <ul className="grid max-w-[90ch] list-disc gap-0.5 ps-2 text-table">
          {block.lines.map((line) => (
            <li key={line} className="print:break-inside-avoid">
              {line}
            </li>
          ))}
        </ul>
      );
    case "paragraph":
      return (
        <p className="max-w-[90ch] text-table">
          <ProseText text={block.text} />
        </p>
      );
    case "law":
      return (
        <div className="text-lead print:break-inside-avoid [&_.katex-display]:m-0! [&_.katex-display>.katex]:text-left!">
          <Tex tex={block.tex} display />
        </div>
      );
    case "steps":
      return <Steps steps={block.steps} />;
    case "code":
      return <CodeBlock code={block.text} label={block.label} />;
  }
}

function Facts({ facts }: { readonly facts: readonly Fact[] }) {
  return (
    <dl className="grid grid-cols-[minmax(7rem,auto)_1fr] gap-x-2 gap-y-0.5 text-table print:break-inside-avoid">
      {facts.map(({ name, value, note }, index) => (
        <div key={index} className="col-span-2 grid grid-cols-subgrid">
          <dt className="text-ink-soft">{name}</dt>
          <dd className="[overflow-wrap:anywhere]">
            {value}
            {note ? <span className="ms-1 text-small text-ink-soft">{note}</span> : null}
          </dd>
        </div>
      ))}
    </dl>
  );
}

interface TableProps {
  readonly label: string;
  readonly remark?: string;
  readonly columns: readonly Column[];
  readonly rows: readonly (readonly string[])[];
}

/** A table of so few rows is not spread over two pages. */
const KEPT_WHOLE = 10;

function Table({ label, remark, columns, rows }: TableProps) {
  return (
    <div
      className={`relative overflow-x-auto print:overflow-visible ${rows.length <= KEPT_WHOLE ? "print:break-inside-avoid" : ""}`}
      tabIndex={0}
      role="group"
      aria-label={label}
    >
      <table className="w-full border-collapse text-table">
        <caption className="sr-only">{label}</caption>
        <thead className="text-small text-ink-soft">
          <tr>
            {columns.map(({ title }) => (
              <th key={title} scope="col" className="pe-2 pb-0.5 text-start font-normal last:pe-0">
                {title}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => (
            <tr key={index} className="border-t border-rule align-top print:break-inside-avoid">
              {row.map((cell, place) => (
                <td
                  key={place}
                  className={`py-0.5 pe-2 last:pe-0 ${columns[place].numeric ? "font-mono" : ""}`}
                >
                  {columns[place].title === "Symbol" ? <QuantitySymbol text={cell} /> : cell}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {remark ? <p className="mt-0.5 text-small text-ink-soft">{remark}</p> : null}
    </div>
  );
}

function Steps({ steps }: { readonly steps: readonly RecordStep[] }) {
  return (
    <ol className="grid grid-cols-1 gap-1.5">
      {steps.map(({ title, tex, value }, index) => (
        <li
          key={index}
          className="grid grid-cols-1 gap-x-3 medium:grid-cols-[14rem_minmax(0,1fr)] print:grid-cols-[11rem_minmax(0,1fr)] print:break-inside-avoid"
        >
          <p className="text-table">
            <span className="font-mono text-small text-ink-soft">{index + 1}</span> {title}
          </p>
          <div>
            <div tabIndex={0} role="group" aria-label={title} className="overflow-x-auto overflow-y-hidden">
              <Tex tex={tex} />
            </div>
            {value ? <p className="font-mono text-table">{value}</p> : null}
          </div>
        </li>
      ))}
    </ol>
  );
}
