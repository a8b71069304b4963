"use client";

import type { ShapeEntry } from "@/lib/engine";
import type { Uncertainty } from "@/lib/engine/resistance/uncertainty/result-schema";
import { inputWords } from "../../_model/input-words";
import { BudgetTable } from "./budget-table";

const METHOD_WORDS: Readonly<Record<Uncertainty["method"], string>> = {
  propagation: "95 % of the time, by first-order propagation",
  "worst-case": "in the worst case",
  "monte-carlo": "95 % of the time, by Monte Carlo",
};

/** The range that tolerances leave, beside the bounds. */
export function StrayRange({ uncertainty }: { readonly uncertainty: Pick<Uncertainty, "text" | "method"> }) {
  return (
    <p className="border-s-3 border-s-copper ps-1.5 text-table" data-testid="stray-range">
      With its tolerances <span className="font-mono whitespace-nowrap">{uncertainty.text}</span>{" "}
      <span className="text-ink-soft">{METHOD_WORDS[uncertainty.method]}.</span>
    </p>
  );
}

interface BudgetProps {
  readonly uncertainty: Uncertainty;
  readonly entry: Pick<ShapeEntry, "dimensions" | "media">;
}

/** What each input contributes: bars, with the numbers beside them. */
export function Budget({ uncertainty, entry }: BudgetProps) {
  const { contributions, standard, basis, method } = uncertainty;
  return (
    <>
      <p className="mb-1 max-w-prose text-table text-ink-soft">{basis}</p>
      {contributions.length === 0 ? (
        <p className="text-table">Nothing has a tolerance: press ± at a quantity.</p>
      ) : (
        <BudgetTable
          head="Input"
          method={method}
          standard={standard}
          rows={contributions.map(({ input, share, standard: own, sensitivity }) => {
            const { label, unit } = inputWords(input, entry);
            return {
              label,
              share,
              standard: input.endsWith("material") ? { value: 100 * own, unit: "%" } : { value: own, unit },
              sensitivity: { value: sensitivity, unit: `Ω${unit === "" ? "" : `/${unit}`}` },
            };
          })}
        />
      )}
    </>
  );
}
