"use client";

import dynamic from "next/dynamic";
import { bracketText } from "../../_ui/bracket";
import { cautionIn } from "../_cautions/caution-in";
import { filled } from "../_words/words";
import type { FrameResult, FrameView } from "./frame-view";
import type { FrameAnswer } from "./use-answer";
import { localNumbers } from "./local-number";
import { StrayRange } from "./stray-range";

const FrameClosing = dynamic(() => import("./frame-closing").then(({ FrameClosing: Closing }) => Closing), {
  ssr: false,
});

interface AnswerProps {
  readonly view: FrameView;
  readonly result: FrameResult | null;
  /** Whether it belongs to an earlier input. */
  readonly stale: boolean;
  readonly closing: FrameAnswer["closing"];
}

/** The number, its bounds, the verdict and the cautions. */
export function FrameAnswerPane({ view, result, stale, closing }: AnswerProps) {
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
      {closing && view.outline ? (
        <FrameClosing view={view} {...closing} goal={view.outline.accuracy} />
      ) : null}
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
          <ul className="grid gap-0.5">
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
  const { words, locale } = view;
  const { resistance, pairs = [], limit, uncertainty } = result;
  return (
    <>
      {resistance ? (
        <p data-testid="resistance" className="font-mono text-figure font-medium whitespace-nowrap">
          {localNumbers(resistance.text, locale)}
        </p>
      ) : null}
      {resistance ? <Bounds view={view} bounded={resistance} /> : null}
      {pairs.length > 0 ? (
        <dl data-testid="pairs" className="grid grid-cols-[auto_1fr] gap-x-2 text-table">
          {pairs.map(({ between: [from, to], floating }) => (
            <div key={`${from} ${to}`} className="contents">
              <dt className="text-ink-soft">{filled(words.between, from, to)}</dt>
              <dd>
                <span className="font-mono font-medium">{localNumbers(floating.text, locale)}</span>
                <Bounds view={view} bounded={floating} />
              </dd>
            </div>
          ))}
        </dl>
      ) : null}
      {limit === undefined ? null : <p className="text-small text-amber">{words.limited}</p>}
      {uncertainty ? <StrayRange view={view} uncertainty={uncertainty} /> : null}
    </>
  );
}

type Bounded = NonNullable<FrameResult["resistance"]> | NonNullable<FrameResult["pairs"]>[number]["floating"];

/** Both bounds and where they come from, where the widget shows them and there are two. */
function Bounds({ view, bounded }: { readonly view: FrameView; readonly bounded: Bounded }) {
  const { words, locale, show } = view;
  const { value, lower, upper, proved, boundsBasis } = bounded;
  if (!show.bounds || value === null || upper === null) return null;
  const bracket = bracketText(value, lower, upper, "Ω");
  return (
    <p data-testid="bracket" className="font-mono text-small [overflow-wrap:anywhere]">
      [{localNumbers(bracket.lower, locale)} … {localNumbers(bracket.upper, locale)}] {bracket.unit}
      <span className="font-sans text-ink-soft">
        {" "}
        {proved ? words.proved : words.notProved} ({words.basis[boundsBasis]})
      </span>
    </p>
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
