import type { ReactNode } from "react";
import { LocalTime } from "../../../_ui/local-time";
import { Notice } from "../../../_ui/notice";
import { ShapeDrawing } from "../../../_ui/drawing/shape-drawing";
import { FieldPicture } from "./field-picture";
import type { Headline, Picture, RecordContent } from "../_content/content";
import { RecordSection } from "./blocks";

const TONES = {
  met: "border-s-verdigris text-verdigris",
  "not-met": "border-s-oxide text-oxide",
  undecided: "border-s-amber text-amber",
} as const;

const WORDS = { met: "met", "not-met": "not met", undecided: "undecided" } as const;

/** A whole record, to be read without anything beside it, on screen and on paper. */
export function RecordSheet({ content }: { readonly content: RecordContent }) {
  const { code, address, team, storedAt, by, headline, picture, cautions, sections, engine } = content;
  return (
    <>
      <style href={`record-${code}`} precedence="print">
        {pageRules(content)}
      </style>
      <dl className="mt-1 flex flex-wrap gap-x-3 gap-y-0.5 text-table">
        <Meta title="Code">
          <span className="font-mono">{code}</span>
        </Meta>
        <Meta title="Stored">
          <LocalTime at={storedAt} /> by {by}
        </Meta>
        {team ? <Meta title="Team">{team}</Meta> : null}
        <Meta title="Engine">{engine}</Meta>
        <Meta title="Address">
          <span className="font-mono text-small [overflow-wrap:anywhere]">{address}</span>
        </Meta>
      </dl>
      <div
        className={`mt-2 grid grid-cols-1 items-start gap-x-5 gap-y-2 ${picture?.kind === "shape" ? "wide:grid-cols-[minmax(0,5fr)_minmax(0,6fr)] print:grid-cols-1" : ""}`}
      >
        <div className="grid grid-cols-1 gap-1.5">
          <HeadlineView headline={headline} />
          {cautions.length > 0 ? <Cautions cautions={cautions} /> : null}
        </div>
        {picture ? <PictureView picture={picture} id={content.id} /> : null}
      </div>
      {sections.map((section) => (
        <RecordSection key={section.id} section={section} />
      ))}
    </>
  );
}

function Meta({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <div className="flex flex-wrap gap-x-1">
      <dt className="text-ink-soft">{title}</dt>
      <dd>{children}</dd>
    </div>
  );
}

function HeadlineView({ headline }: { readonly headline: Headline }) {
  const { title, text, bracket, statements, verdict } = headline;
  return (
    <section aria-label="Answer" className="print:break-inside-avoid">
      <h2 className="text-table font-normal text-ink-soft">{title}</h2>
      {text === "" ? null : (
        <p className="mt-0.5 flex flex-wrap items-baseline gap-x-2">
          <span data-testid="resistance" className="font-mono text-figure font-medium">
            {text}
          </span>
          {bracket ? (
            <span data-testid="bracket" className="font-mono text-table [overflow-wrap:anywhere]">
              {bracket}
            </span>
          ) : null}
        </p>
      )}
      {statements.map((statement) => (
        <p key={statement} className="mt-0.5 text-table text-ink-soft">
          {statement}
        </p>
      ))}
      {verdict ? (
        <p className={`mt-1 border-s-3 ps-1.5 text-table ${TONES[verdict.outcome]}`} data-testid="verdict">
          <strong className="font-semibold">Requirement {WORDS[verdict.outcome]}.</strong>{" "}
          <span className="text-ink">{verdict.sentence}</span>
        </p>
      ) : null}
    </section>
  );
}

function Cautions({ cautions }: { readonly cautions: readonly string[] }) {
  return (
    <Notice tone="caution" title={cautions.length > 1 ? "Cautions" : "Caution"}>
      <ul className={cautions.length > 1 ? "list-disc ps-2" : ""}>
        {cautions.map((caution) => (
          <li key={caution}>{caution}</li>
        ))}
      </ul>
    </Notice>
  );
}

function PictureView({ picture, id }: { readonly picture: Picture; readonly id: string }) {
  const frame = "rounded border border-rule bg-sheet px-1 py-1.5 print:break-inside-avoid";
  return picture.kind === "shape" ? (
    <div className={`${frame} print:mx-auto print:w-full print:max-w-[150mm]`}>
      <ShapeDrawing
        drawing={picture.drawing}
        toScale={picture.toScale}
        labels={picture.labels}
        terminals={picture.terminals}
      />
    </div>
  ) : (
    <div className={`${frame} print:border-0 print:p-0`}>
      <FieldPicture draw={picture.draw} description={picture.description} id={id} />
    </div>
  );
}

/** What every printed page says at its edges. */
function pageRules({ label, code, address }: RecordContent): string {
  const text = (value: string) =>
    `"${value.replace(/\p{C}/gu, " ").replace(/[\\"<>]/g, (c) => `\\${c.charCodeAt(0).toString(16)} `)}"`;
  const font = "font: 8pt system-ui, sans-serif; color: #566067;";
  return `@page { margin: 18mm 15mm 20mm;
    @top-left { content: ${text(`Rhoform record · ${label.slice(0, 80)}`)}; ${font} }
    @top-right { content: ${text(code)}; ${font} }
    @bottom-left { content: ${text(address)}; ${font} }
    @bottom-right { content: "page " counter(page) " of " counter(pages); ${font} } }`;
}
