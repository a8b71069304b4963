"use client";

import { useEffect, useState } from "react";
import { bracketText } from "../../../_ui/bracket";
import { Button } from "../../../_ui/button";
import { Notice } from "../../../_ui/notice";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Numbers, Verdict } from "../../calculate/_calculator/answer/headline";
import { OUTDATED } from "../../calculate/_calculator/answer/outdated-tag";
import { sentence } from "../../calculate/_model/complaints";
import type { FieldView } from "../_model/field-view";
import { whatIsMissing } from "../_model/unready";
import { ClosingBar } from "./closing-bar";
import { useOutline } from "./outline-context";
import { PairTable } from "./pair-table";
import { Refusal } from "./refusal";
import type { Solution, SolveTrouble } from "./use-solution";

interface SolvePanelProps {
  readonly solution: Solution;
  /** The body that the page stands for now. */
  readonly body: string;
  readonly className: string;
}

/** Starts and stops the solution, shows the bracket closing, and then the answer. */
export function SolvePanel({ solution, body, className }: SolvePanelProps) {
  const { sketch } = useOutline();
  const { phase, field, trouble, lost } = solution;
  const busy =
    phase === "starting" || phase === "running" || (trouble?.kind === "wait" && trouble.seconds !== null);
  const current = solution.body === body;
  const { resistance, pairs } = field?.result ?? {};
  const missing = whatIsMissing(sketch);
  const asked = solution.body === null ? undefined : (JSON.parse(solution.body) as { accuracy: number });
  return (
    <section
      aria-label="Answer"
      aria-busy={busy}
      id="answer"
      className={`grid min-h-14 scroll-mt-2 grid-cols-1 content-start gap-1 ${className}`}
    >
      <div className="flex flex-wrap items-center gap-1">
        <Button
          variant="primary"
          disabled={busy || missing !== null}
          aria-describedby={missing === null ? undefined : "solve-missing"}
          onClick={() => solution.solve(body)}
          className="min-w-12"
        >
          {busy ? "Solving …" : "Solve"}
        </Button>
        {busy ? <Button onClick={solution.cancel}>Cancel</Button> : null}
        {field && !busy && !current && trouble === null ? (
          <p className="text-small text-amber">Changed since this answer.</p>
        ) : null}
      </div>
      {busy && field?.progress ? (
        <ClosingBar
          progress={field.progress}
          first={solution.firstWidth ?? 1}
          goal={asked?.accuracy ?? sketch.accuracy}
        />
      ) : null}
      {phase === "starting" || (phase === "running" && !field?.progress) ? (
        <p className="text-table text-ink-soft" role="status">
          {field?.status === "queued" || phase === "starting" ? "In the queue …" : "Meshing …"}
        </p>
      ) : null}
      {lost && busy ? (
        <p className="text-small text-amber">The connection broke; the page looks again by itself.</p>
      ) : null}
      {trouble ? <Trouble trouble={trouble} current={current} /> : null}
      {phase === "over" && field ? (
        <div className={`grid grid-cols-1 gap-1 ${current ? "" : OUTDATED}`}>
          {resistance ? (
            <div>
              <h2 className="text-table font-normal text-ink-soft">Resistance between the terminals</h2>
              <Numbers resistance={resistance} method="field" />
            </div>
          ) : null}
          {field.result?.squares ? <Squares squares={field.result.squares} /> : null}
          {field.result ? <Verdict result={field.result} /> : null}
          {pairs ? <PairTable pairs={pairs} /> : null}
          <Ending solution={solution} />
        </div>
      ) : null}
      {missing !== null && !busy ? (
        <p id="solve-missing" className="text-table text-ink-soft">
          {missing}
        </p>
      ) : phase === "idle" && !trouble ? (
        <p className="text-table text-ink-soft">
          No answer yet. Solve brackets the resistance between two field solutions.
        </p>
      ) : null}
    </section>
  );
}

function Squares({
  squares,
}: {
  readonly squares: NonNullable<NonNullable<FieldView["result"]>["squares"]>;
}) {
  const { value, lower, upper, text } = squares;
  const bracket = bracketText(value, lower, upper, "");
  return (
    <p className="font-mono text-table" data-testid="squares">
      {text}{" "}
      <span className="text-ink-soft">
        [{bracket.lower} … {bracket.upper}] {bracket.unit}
      </span>
    </p>
  );
}

/** What there is to say about how it ended, other than well. */
function Ending({ solution }: { readonly solution: Solution }) {
  const { field } = solution;
  if (!field) return null;
  switch (field.status) {
    case "limited":
      return (
        <Notice tone="caution" title="Stopped at a limit">
          <p>
            {field.result?.limit ? `${sentence(field.result.limit).replace(/\.$/, "")}. ` : ""}
            The bracket reached so far stands; ask for a wider one to stay within the limit.
          </p>
        </Notice>
      );
    case "failed":
      return (
        <Notice tone="problem" title="No solution">
          <p>{field.failure ?? "The solution failed."}</p>
        </Notice>
      );
    case "cancelled":
      return (
        <Notice title="Cancelled">
          <p>
            {field.progress
              ? "The bracket reached by then is not kept. Solve starts again."
              : "Nothing was computed. Solve starts again."}
          </p>
        </Notice>
      );
    default:
      return null;
  }
}

function Trouble({ trouble, current }: { readonly trouble: SolveTrouble; readonly current: boolean }) {
  switch (trouble.kind) {
    case "input":
      return current ? <Refusal /> : null;
    case "wait": {
      const busy = trouble.problem.status === 503;
      return (
        <Notice tone="caution" title={busy ? "All places are taken" : "A short pause"}>
          <p>
            {busy
              ? "Other field solutions are waiting as well."
              : "The calls that this page may make are used up for now."}{" "}
            <Countdown key={trouble.seconds} seconds={trouble.seconds} />
          </p>
        </Notice>
      );
    }
    case "offline":
      return (
        <Notice tone="caution" title="No connection">
          <p>The service cannot be reached. The drawing is safe; solve again when it is back.</p>
        </Notice>
      );
    case "gone":
      return (
        <Notice tone="caution" title="This solution is gone">
          <p>The service no longer has it. The drawing is safe; solve again.</p>
        </Notice>
      );
    case "service":
      return <ProblemNotice problem={trouble.problem.problem} />;
  }
}

function Countdown({ seconds }: { readonly seconds: number | null }) {
  const [left, setLeft] = useState(seconds ?? 0);
  useEffect(() => {
    if (seconds === null) return;
    const timer = setInterval(() => setLeft((before) => Math.max(0, before - 1)), 1000);
    return () => clearInterval(timer);
  }, [seconds]);
  if (seconds === null) return "They come back later, or after signing in.";
  return left > 0 ? `The page asks again in ${Math.round(left)} s.` : "The page asks again now.";
}
