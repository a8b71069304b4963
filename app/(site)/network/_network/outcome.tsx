"use client";

import { bracketText } from "../../../_ui/bracket";
import { CopyButton } from "../../../_ui/copy-button";
import { formatQuantity } from "@/lib/engine/quantity/format-quantity";
import type { NetworkResult } from "@/lib/engine/network/result-schema";
import { StrayRange } from "../../calculate/_calculator/answer/budget";
import { Verdict } from "../../calculate/_calculator/answer/headline";

interface HeadlineProps {
  readonly result: NetworkResult | undefined;
  readonly stale: boolean;
}

const MEANING: Readonly<Record<NetworkResult["resistance"]["boundsBasis"], string>> = {
  rounding: "The bracket holds every rounding error; the elements count as exact.",
  elements: "The bracket runs from all elements at their lower to all at their upper bound.",
};

/** The number between the ports, its bracket and the operating point. */
export function NetworkHeadline({ result, stale }: HeadlineProps) {
  if (!result) {
    return (
      <div id="answer" aria-busy={stale}>
        <h2 className="text-table font-normal text-ink-soft">Resistance between the ports</h2>
        <p className="mt-0.5 font-mono text-figure text-ink-soft">–</p>
      </div>
    );
  }
  const { value, lower, upper, text, boundsBasis, proved } = result.resistance;
  const { voltage, current, power } = result.operating;
  const bracket = bracketText(value, lower, upper, "Ω");
  return (
    <div id="answer" aria-busy={stale} className={stale ? "opacity-60" : ""}>
      <h2 className="text-table font-normal text-ink-soft">Resistance between the ports</h2>
      <p className="mt-0.5 flex flex-wrap items-baseline gap-x-2">
        <span data-testid="resistance" className="font-mono text-figure font-medium whitespace-nowrap">
          {text}
        </span>
        <span className="font-mono text-table [overflow-wrap:anywhere]">
          [{bracket.lower} … {bracket.upper}] {bracket.unit}
        </span>
      </p>
      <p className="mt-0.5 text-table text-ink-soft">
        Bounds {proved ? "proved" : "not proved"}. {MEANING[boundsBasis]}
      </p>
      {result.verdict ? (
        <div className="mt-1">
          <Verdict result={result} />
        </div>
      ) : null}
      {result.uncertainty ? (
        <div className="mt-1">
          <StrayRange uncertainty={result.uncertainty} />
        </div>
      ) : null}
      {voltage !== undefined && current !== undefined && power !== undefined ? (
        <p className="mt-0.5 font-mono text-table">
          {formatQuantity(voltage, "volt")} · {formatQuantity(current, "ampere")} ·{" "}
          {formatQuantity(power, "watt")}
        </p>
      ) : (
        <p className="mt-0.5 text-table text-ink-soft">Voltages and currents are those of one volt.</p>
      )}
      <div className="-ms-2 flex flex-wrap print:hidden">
        <CopyButton text={String(value)} what="the value in ohms" label="Copy ohms" />
        <CopyButton
          text={`${value} ohm [${lower} … ${upper}]`}
          what="the value with bounds"
          label="Copy with bounds"
        />
      </div>
    </div>
  );
}

const CHECKS: Readonly<Record<NetworkResult["checks"][number]["name"], string>> = {
  "current-law": "Currents at every node add up to nothing",
  "voltage-law": "Element voltages are differences of node voltages",
  "power-balance": "The elements' losses add up to the power at the ports",
};

/** What stands beside the numbers: checks, cautions, assumptions and sources. */
export function Statements({ result, stale }: { readonly result: NetworkResult; readonly stale: boolean }) {
  const { checks, cautions, assumptions, sources } = result;
  return (
    <div className={`mt-3 grid gap-x-5 gap-y-2 medium:grid-cols-2 ${stale ? "opacity-60" : ""}`}>
      {cautions.length > 0 ? <List title="Cautions" entries={cautions} tone="text-amber" /> : null}
      <section>
        <h3>Checks</h3>
        <ul className="mt-0.5 text-table">
          {checks.map(({ name, passed, deviation }) => (
            <li key={name}>
              {CHECKS[name]}: {passed ? "passed" : "failed"},{" "}
              <span className="font-mono whitespace-nowrap">off by {deviation.toExponential(1)}</span>
            </li>
          ))}
        </ul>
      </section>
      <List title="Assumptions" entries={assumptions} />
      <List
        title="Sources"
        entries={sources.map(({ title, detail }) => (detail ? `${title}: ${detail}` : title))}
      />
    </div>
  );
}

function List({
  title,
  entries,
  tone = "",
}: {
  readonly title: string;
  readonly entries: readonly string[];
  readonly tone?: string;
}) {
  return (
    <section>
      <h3 className={tone}>{title}</h3>
      <ul className="mt-0.5 grid list-disc gap-0.5 ps-2 text-table">
        {entries.map((entry) => (
          <li key={entry}>{entry}</li>
        ))}
      </ul>
    </section>
  );
}
