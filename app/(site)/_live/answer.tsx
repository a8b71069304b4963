import { bracketText } from "../../_ui/bracket";
import { Notice } from "../../_ui/notice";
import { ProblemNotice } from "../../_ui/problem-notice";
import { Button } from "../../_ui/button";
import { ApiProblem } from "./call-api";
import type { LiveResistance } from "./use-resistance";

const METHODS = { "closed-form": "closed form", quadrature: "integral", field: "field solution" } as const;

const BASES = {
  rounding: "rounding of the closed form",
  quadrature: "error estimate of the integral",
  rayleigh: "conducting sheets and insulating walls",
  "formula-accuracy": "stated accuracy of the formula",
  energy: "two field solutions",
  "energy-quadrature": "two field solutions with estimated integrals",
} as const;

interface AnswerProps {
  readonly live: LiveResistance;
  /** Complaints about these pointers stand at their fields already. */
  readonly shownAtFields: (pointer: string) => boolean;
}

/** The resistance with its bracket, or why there is none yet. The answer before stays, dimmed, until the next is there. */
export function Answer({ live, shownAtFields }: AnswerProps) {
  const { result, problem, pending, retry } = live;
  const stale = pending || problem !== undefined;
  return (
    <div>
      <div aria-live="polite" aria-busy={pending} className={stale ? "text-ink-soft" : undefined}>
        {result ? <Bracket result={result} /> : <p className="text-ink-soft">No answer yet.</p>}
      </div>
      <div className="mt-2 min-h-6" aria-live="polite">
        {problem ? <Refused problem={problem} retry={retry} shownAtFields={shownAtFields} /> : null}
      </div>
    </div>
  );
}

function Bracket({ result }: { readonly result: NonNullable<LiveResistance["result"]> }) {
  const { value, lower, upper, text, boundsBasis, proved } = result.resistance;
  const bracket = bracketText(value, lower, upper, "Ω");
  const passed = (result.checks ?? []).filter((check) => check.applies !== false && check.passed);
  const applied = (result.checks ?? []).filter((check) => check.applies !== false);
  return (
    <>
      <p className="text-small text-ink-soft">Resistance between the terminals</p>
      <p className="mt-0.5 font-mono text-figure font-medium" data-testid="resistance">
        {text}
      </p>
      <p className="mt-0.5 font-mono text-small [overflow-wrap:anywhere]" data-testid="bracket">
        [{bracket.lower} … {bracket.upper}] {bracket.unit}
      </p>
      <dl className="mt-2 grid grid-cols-[auto_1fr] gap-x-2 gap-y-0.5 text-table">
        <dt className="text-ink-soft">Method</dt>
        <dd>{METHODS[result.method]}</dd>
        <dt className="text-ink-soft">Bounds</dt>
        <dd>
          {BASES[boundsBasis]}, {proved ? "proved" : "not proved"}
        </dd>
        <dt className="text-ink-soft">Conductance</dt>
        <dd className="font-mono">{result.conductance.text}</dd>
        {applied.length > 0 ? (
          <>
            <dt className="text-ink-soft">Checks</dt>
            <dd>
              {passed.length} of {applied.length} passed
            </dd>
          </>
        ) : null}
        <dt className="text-ink-soft">Engine</dt>
        <dd className="font-mono">{result.engine}</dd>
      </dl>
    </>
  );
}

interface RefusedProps {
  readonly problem: ApiProblem | Error;
  readonly retry: () => void;
  readonly shownAtFields: (pointer: string) => boolean;
}

function Refused({ problem, retry, shownAtFields }: RefusedProps) {
  if (!(problem instanceof ApiProblem)) {
    return (
      <Notice tone="caution" title="The service cannot be reached">
        <p>The last answer stands above. Check the connection, then try again.</p>
        <Button className="mt-1" onClick={retry}>
          Try again
        </Button>
      </Notice>
    );
  }
  if (problem.status === 429) {
    const wait = problem.retryAfter;
    return (
      <Notice tone="caution" title="A short pause">
        <p>
          This address has made all the calls it may make for now without a key.
          {wait !== null && wait <= 120 ? ` The page asks again by itself in ${wait} s.` : ""}
        </p>
      </Notice>
    );
  }
  const elsewhere = (problem.problem.errors ?? []).filter(
    ({ pointer }) => !pointer || !shownAtFields(pointer),
  );
  if (problem.status === 422 && elsewhere.length === 0 && problem.problem.errors?.length) {
    return (
      <Notice tone="problem" title="One more look at the numbers">
        <p>What is marked at the fields has no answer. The last answer stands above.</p>
      </Notice>
    );
  }
  return <ProblemNotice problem={{ ...problem.problem, errors: elsewhere }} />;
}
