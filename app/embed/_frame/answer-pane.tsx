"use client";

import { bracketText } from "../../_ui/bracket";
import { cautionIn } from "../_cautions/caution-in";
import type { FrameResult, FrameView } from "./frame-view";
import { localNumbers } from "./local-number";
import { StrayRange } from "./stray-range";

interface AnswerProps {
  readonly view: FrameView;
  readonly result: FrameResult | null;
  /** Whether it belongs to an earlier input. */
  readonly stale: boolean;
}

/** The number, its bounds, the verdict and the cautions. */
export function FrameAnswerPane({ view, result, stale }: AnswerProps) {
  const { words } = view;
  const cautions = result?.cautions ?? view.cautions;
  return (
    <>
      <div
        className={`border-s-3 border-s-(--accent) ps-1.5 ${stale && result ? "opacity-70" : ""}`}
        aria-live="polite"
        aria-busy={stale}
      >
        <h2 className="text-table! font-normal! text-ink-soft">{words.resistance}</h2>
        {result ? (
          <Numbers view={view} result={result} />
        ) : (
          <p className="min-h-7 text-table text-ink-soft">{stale ? "…" : words.noAnswer}</p>
        )}
      </div>
      {view.requirement ? (
        <p className="text-table" data-testid="verdict">
          <span className="text-ink-soft">
            {words.requirement}: <span className="font-mono">{view.requirement}</span>.
          </span>{" "}
          {result?.verdict && !stale ? <Verdict verdict={result.verdict} view={view} /> : null}
        </p>
      ) : null}
      {cautions.length > 0 ? (
        <section className="border-s-3 border-s-amber ps-1.5 text-table" aria-label={words.cautions}>
          <h2 className="text-table! text-amber">{words.cautions}</h2>
          <ul>
            {cautions.map((caution) => (
              <Caution key={caution} caution={caution} view={view} />
            ))}
          </ul>
        </section>
      ) : null}
    </>
  );
}

function Caution({ caution, view }: { readonly caution: string; readonly view: FrameView }) {
  const { text, english } = cautionIn(view.cautionTexts, caution);
  return <li lang={english ? "en" : undefined}>{english ? text : localNumbers(text, view.locale)}</li>;
}

function Numbers({ view, result }: { readonly view: FrameView; readonly result: FrameResult }) {
  const { words, locale, show } = view;
  const { value, lower, upper, text, proved, boundsBasis } = result.resistance;
  const bracket = bracketText(value, lower, upper, "Ω");
  return (
    <>
      <p data-testid="resistance" className="font-mono text-figure font-medium whitespace-nowrap">
        {localNumbers(text, locale)}
      </p>
      {show.bounds ? (
        <p data-testid="bracket" className="font-mono text-small [overflow-wrap:anywhere]">
          [{localNumbers(bracket.lower, locale)} … {localNumbers(bracket.upper, locale)}] {bracket.unit}
          <span className="font-sans text-ink-soft">
            {" "}
            {proved ? words.proved : words.notProved} ({words.basis[boundsBasis]})
          </span>
        </p>
      ) : null}
      {result.uncertainty ? <StrayRange view={view} uncertainty={result.uncertainty} /> : null}
    </>
  );
}

const TONES = { met: "text-verdigris", "not-met": "text-oxide", undecided: "text-amber" } as const;

function Verdict({
  verdict,
  view: { words, tolerances },
}: {
  readonly verdict: NonNullable<FrameResult["verdict"]>;
  readonly view: FrameView;
}) {
  const sentences = tolerances
    ? { met: words.metTolerances, "not-met": words.notMetTolerances, undecided: words.undecidedTolerances }
    : { met: words.met, "not-met": words.notMet, undecided: words.undecided };
  return <strong className={`font-semibold ${TONES[verdict]}`}>{sentences[verdict]}</strong>;
}
