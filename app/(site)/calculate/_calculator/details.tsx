"use client";

import { lazy, type ReactNode, Suspense } from "react";
import type { ShapeEntry } from "@/lib/engine";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { Budget } from "./answer/budget";
import { PlotsPlace } from "./answer/plots-place";
import { StepList } from "./answer/step-list";
import { Checks, Grounds } from "./answer/statements";
import { WhenSeen } from "./when-seen";

const FlowPlots = lazy(() => import("./answer/flow-plots").then((module) => ({ default: module.FlowPlots })));
const Steps = lazy(() => import("./answer/steps").then((module) => ({ default: module.Steps })));

interface DetailsProps {
  readonly entry: ShapeEntry;
  readonly result: ResistanceResult | undefined;
  readonly formula: ReactNode;
  /** Whether the medium varies, so that the law is not the one that was used. */
  readonly graded: boolean;
}

/** What stands behind the number: law and steps, plots along the flow, checks, assumptions, sources. */
export function Details({ entry, result, formula, graded }: DetailsProps) {
  return (
    <div className="mt-5 grid grid-cols-1 gap-5 border-t border-rule pt-3">
      <section aria-labelledby="law">
        <h2 id="law" className="mb-1">
          How the number came about
        </h2>
        {graded ? (
          <p className="text-table text-ink-soft">The law of a uniform medium, for comparison:</p>
        ) : null}
        <div className="mb-2 text-lead [&_.katex-display]:m-0 [&_.katex-display>.katex]:text-left!">
          {formula}
        </div>
        {result?.steps ? (
          <WhenSeen fallback={<StepList steps={result.steps} />}>
            <Suspense fallback={<StepList steps={result.steps} />}>
              <Steps steps={result.steps} />
            </Suspense>
          </WhenSeen>
        ) : null}
      </section>
      {result?.profile ? (
        <section aria-labelledby="plots">
          <h2 id="plots" className="mb-1">
            Along the flow
          </h2>
          <WhenSeen fallback={<PlotsPlace profile={result.profile} />}>
            <Suspense fallback={<PlotsPlace profile={result.profile} />}>
              <FlowPlots entry={entry} profile={result.profile} />
            </Suspense>
          </WhenSeen>
        </section>
      ) : null}
      {result?.uncertainty ? (
        <section aria-labelledby="budget">
          <h2 id="budget" className="mb-1">
            Tolerance budget
          </h2>
          <Budget uncertainty={result.uncertainty} entry={entry} />
        </section>
      ) : null}
      {result?.checks ? (
        <section aria-labelledby="checks">
          <h2 id="checks" className="mb-1">
            Checks on this answer
          </h2>
          <Checks checks={result.checks} />
        </section>
      ) : null}
      <section aria-labelledby="grounds">
        <h2 id="grounds" className="mb-1">
          What it rests on
        </h2>
        <Grounds entry={entry} result={result} />
      </section>
    </div>
  );
}
