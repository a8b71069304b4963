"use client";

import type { FrameResult, FrameView } from "./frame-view";
import { localNumbers, localShare } from "./local-number";
import { filled } from "../_words/words";

interface StrayProps {
  readonly view: FrameView;
  readonly uncertainty: NonNullable<FrameResult["uncertainty"]>;
}

/** The range that the tolerances leave, and how it is meant. */
export function StrayRange({ view: { words, locale }, uncertainty }: StrayProps) {
  const { method, coverage, text } = uncertainty;
  const meanings = {
    propagation: words.propagation,
    "worst-case": words.worstCase,
    "monte-carlo": words.monteCarlo,
  };
  return (
    <p data-testid="stray-range" className="text-table">
      {words.withTolerances} <span className="font-mono whitespace-nowrap">{localNumbers(text, locale)}</span>{" "}
      <span className="text-ink-soft">({filled(meanings[method], localShare(coverage, locale))})</span>
    </p>
  );
}
