"use client";

import { bracketText } from "../../../_ui/bracket";
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
  const open = openShare(width, first, goal);
  const bracket = bracketText(value, lower, upper, "Ω");
  const jaw = 42 * (1 - open);
  return (
    <div data-testid="closing">
      <svg
        viewBox="0 0 100 12"
        preserveAspectRatio="none"
        className="block h-3 w-full"
        role="img"
        aria-label={`Bracket ${percent(width)} wide`}
      >
        <rect x="0" y="0" width="100" height="12" className="fill-rule" opacity="0.5" />
        <rect x="0" y="0" width={8 + jaw} height="12" className="fill-copper transition-[width]" />
        <rect
          x={92 - jaw}
          y="0"
          width={8 + jaw}
          height="12"
          className="fill-verdigris transition-[width,x]"
        />
      </svg>
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

/** 1 at the first bracket, 0 at the wanted one, in digits. */
function openShare(width: number, first: number, goal: number): number {
  if (!(width > goal)) return 0;
  if (!(first > goal)) return 0.5;
  return Math.min(1, Math.log(width / goal) / Math.log(first / goal));
}

function percent(share: number): string {
  return `${Number((100 * share).toPrecision(2))} %`;
}
