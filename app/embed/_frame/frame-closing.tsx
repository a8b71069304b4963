"use client";

import { bracketText } from "../../_ui/bracket";
import { ClosingJaws } from "../../_ui/closing-jaws";
import type { FrameProgress, FrameView } from "./frame-view";
import { localNumbers } from "./local-number";

interface ClosingProps {
  readonly view: FrameView;
  readonly now: FrameProgress;
  readonly first: FrameProgress;
  readonly goal: number;
}

/** The bracket of a field solution as it closes in. */
export function FrameClosing({ view, now, first, goal }: ClosingProps) {
  const { words, locale } = view;
  const bracket = bracketText((now.lower + now.upper) / 2, now.lower, now.upper, "Ω");
  return (
    <div data-testid="closing">
      <ClosingJaws width={widthOf(now)} first={widthOf(first)} goal={goal} label={words.solving} />
      <p className="mt-0.5 font-mono text-small">
        [{localNumbers(bracket.lower, locale)} … {localNumbers(bracket.upper, locale)}] {bracket.unit}
        <span className="font-sans text-ink-soft"> {words.solving}</span>
      </p>
    </div>
  );
}

function widthOf({ lower, upper }: FrameProgress): number {
  return (2 * (upper - lower)) / (upper + lower);
}
