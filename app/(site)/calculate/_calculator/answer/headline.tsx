"use client";

import { bracketText } from "../../../../_ui/bracket";
import { CopyButton } from "../../../../_ui/copy-button";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { OUTDATED, OutdatedTag } from "./outdated-tag";
import { BOUNDS_MEANING, METHODS, VERDICTS } from "./words";

interface HeadlineProps {
  readonly result: ResistanceResult | undefined;
  /** Whether it belongs to an earlier input. */
  readonly stale: boolean;
  /** Whether no newer one will come: the fields are refused, or the service gives no answer. */
  readonly outdated: boolean;
}

/** The number, its bracket, and in one sentence what the bracket means. Keeps its height in every state. */
export function Headline({ result, stale, outdated }: HeadlineProps) {
  const dimmed = !result ? "" : outdated ? OUTDATED : stale ? "opacity-60" : "";
  return (
    <div id="answer" aria-busy={stale && !outdated} className="scroll-mt-8">
      <h2 className="flex min-h-3 flex-wrap items-center gap-x-1 text-table font-normal text-ink-soft">
        Resistance between the terminals
        {outdated && result ? <OutdatedTag>To the input before</OutdatedTag> : null}
      </h2>
      <div className={`transition-opacity duration-100 ${outdated ? "" : "delay-300"} ${dimmed}`}>
        {result ? <Numbers resistance={result.resistance} method={result.method} /> : <NoNumbers />}
      </div>
    </div>
  );
}

type NumbersProps = Pick<ResistanceResult, "resistance" | "method">;

/** A resistance with its bracket, what the bracket means, and both to copy. */
export function Numbers({ resistance, method }: NumbersProps) {
  const { value, lower, upper, text, boundsBasis, proved } = resistance;
  const bracket = bracketText(value, lower, upper, "Ω");
  return (
    <>
      <p className="mt-0.5 flex flex-wrap items-baseline gap-x-2">
        <span data-testid="resistance" className="font-mono text-figure font-medium whitespace-nowrap">
          {text}
        </span>
        <span data-testid="bracket" className="font-mono text-table [overflow-wrap:anywhere]">
          [{bracket.lower} … {bracket.upper}] {bracket.unit}
        </span>
      </p>
      <p className="mt-0.5 min-h-5 text-table text-ink-soft">
        {METHODS[method]}, bounds {proved ? "proved" : "not proved"}. {BOUNDS_MEANING[boundsBasis]}
      </p>
      <div className="mt-0.5 -ms-2 flex flex-wrap print:hidden">
        <CopyButton text={String(value)} what="the value in ohms" label="Copy ohms" />
        <CopyButton
          text={`${value} ohm [${lower} … ${upper}]`}
          what="the value with bounds"
          label="Copy with bounds"
        />
      </div>
    </>
  );
}

/** The number alone, at the upper edge of narrow windows, where the answer itself is below the fields. */
export function AnswerStrip({ result, stale, outdated }: HeadlineProps) {
  return (
    <a
      href="#answer"
      className="sticky top-0 z-10 -mx-2 mt-1 flex min-h-5.5 items-center gap-1.5 border-y border-rule bg-paper px-2 wide:hidden print:hidden"
    >
      <span className="text-small text-ink-soft">{outdated && result ? "Before" : "Resistance"}</span>
      <span className={`font-mono font-medium ${outdated ? "text-ink-soft" : stale ? "opacity-60" : ""}`}>
        {result?.resistance.text ?? "–"}
      </span>
      <span className="link ms-auto text-small">bounds</span>
    </a>
  );
}

function NoNumbers() {
  return (
    <div className="min-h-14">
      <p className="mt-0.5 font-mono text-figure text-ink-soft">–</p>
      <p className="text-table text-ink-soft">The fields do not tell a resistance yet.</p>
    </div>
  );
}

/** The verdict on the requirement, where one was asked for. */
export function Verdict({ result }: { readonly result: Pick<ResistanceResult, "verdict"> }) {
  if (!result.verdict) return null;
  const { word, sentence } = VERDICTS[result.verdict];
  const tone =
    result.verdict === "met"
      ? "border-s-verdigris text-verdigris"
      : result.verdict === "not-met"
        ? "border-s-oxide text-oxide"
        : "border-s-amber text-amber";
  return (
    <p className={`border-s-3 ps-1.5 text-table ${tone}`} data-testid="verdict">
      <strong className="font-semibold">Requirement {word}.</strong>{" "}
      <span className="text-ink">{sentence}</span>
    </p>
  );
}
