"use client";

import { bracketText } from "../../../_ui/bracket";
import { ClosingJaws } from "../../../_ui/closing-jaws";
import type { FieldProgress } from "../_model/field-view";

interface ClosingBarProps {
  readonly progress: FieldProgress;
  /** The first bracket's relative width, from which the bar closes. */
  readonly first: number;
  /** Relative width that is wanted. */
  readonly goal: number;
}

/** The bracket closing in: two jaws, as far apart as digits are missing, with both bounds at them. */
export function ClosingBar({ progress, first, goal }: ClosingBarProps) {
  const { lower, upper, unknowns, refinements } = progress;
  const value = (lower + upper) / 2;
  const width = (upper - lower) / value;
  const bracket = bracketText(value, lower, upper, "Ω");
  return (
    <div data-testid="closing">
      <ClosingJaws width={width} first={first} goal={goal} label={`Bracket ${percent(width)} wide`} />
      <p className="mt-0.5 flex flex-wrap justify-between gap-x-2 font-mono text-table">
        <span>
          {bracket.lower} {bracket.unit}
        </span>
        <span>
          {bracket.upper} {bracket.unit}
        </span>
      </p>
      <p className="text-small text-ink-soft">
        {percent(width)} wide, {percent(goal)} wanted · {unknowns.toLocaleString("en")} unknowns ·{" "}
        {refinements} {refinements === 1 ? "refinement" : "refinements"}
      </p>
    </div>
  );
}

function percent(share: number): string {
  return `${Number((100 * share).toPrecision(2))} %`;
}
