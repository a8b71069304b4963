import type { ReactNode } from "react";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";

interface StepListProps {
  readonly steps: NonNullable<ResistanceResult["steps"]>;
  /** The typeset line of a step; its place is kept where it is still to come. */
  readonly line?: (tex: string, title: string) => ReactNode;
}

/** Steps in their order, each with its title, its line and its value. */
export function StepList({ steps, line }: StepListProps) {
  return (
    <ol className="grid gap-2" aria-busy={line === undefined}>
      {steps.map((step, index) => (
        <li key={index} className="grid gap-x-3 medium:grid-cols-[14rem_minmax(0,1fr)]">
          <p className="text-table">
            <span className="font-mono text-small text-ink-soft">{index + 1}</span> {step.title}
          </p>
          <div>
            <div className="min-h-7">{line?.(step.tex, step.title)}</div>
            {step.value ? <p className="font-mono text-table">{step.value}</p> : null}
          </div>
        </li>
      ))}
    </ol>
  );
}
