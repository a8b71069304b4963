"use client";

import type { Complaint } from "../../_model/complaints";
import type { Answer } from "../use-answer";
import { Facts } from "./facts";
import { StrayRange } from "./budget";
import { Headline, Verdict } from "./headline";
import { OUTDATED } from "./outdated-tag";
import { Cautions } from "./statements";
import { TroubleNotice } from "./trouble-notice";

interface OutcomeProps {
  readonly answer: Answer;
  readonly elsewhere: readonly Complaint[];
  /** Whether signing in would allow more calculations. */
  readonly signedOut: boolean;
  readonly className: string;
}

/** The answer with what must stand at the number: its verdict, or why there is none. */
export function Outcome({ answer, elsewhere, signedOut, className }: OutcomeProps) {
  const { result, stale, trouble, retry } = answer;
  const outdated = trouble !== undefined;
  return (
    <section aria-label="Answer" className={`grid gap-1.5 ${className}`}>
      <Headline result={result} stale={stale} outdated={outdated} />
      <div className={`grid gap-1.5 empty:hidden ${outdated ? OUTDATED : ""}`}>
        {result?.uncertainty ? <StrayRange uncertainty={result.uncertainty} /> : null}
        {result ? <Verdict result={result} /> : null}
      </div>
      {trouble ? (
        <TroubleNotice
          trouble={trouble}
          elsewhere={elsewhere}
          answered={result !== undefined}
          signedOut={signedOut}
          retry={retry}
        />
      ) : null}
    </section>
  );
}

/** What the answer tells beside the number: operating point, peak, material, and its cautions. */
export function Particulars({ answer, className }: Pick<OutcomeProps, "answer" | "className">) {
  const { result } = answer;
  if (!result) return null;
  return (
    <section
      aria-label="Particulars of the answer"
      className={`grid gap-1.5 ${answer.trouble ? OUTDATED : ""} ${className}`}
    >
      <Facts result={result} />
      <Cautions cautions={result.cautions} />
    </section>
  );
}
