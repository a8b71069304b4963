"use client";

import type { NetworkResult, NetworkUncertainty } from "@/lib/engine/network/result-schema";
import { BudgetTable } from "../../calculate/_calculator/answer/budget-table";

/** So many elements are told; what the others contribute is told together. */
const MOST_ROWS = 20;

interface BudgetProps {
  readonly uncertainty: NetworkUncertainty;
  readonly materials: NetworkResult["materials"];
}

/** What each element, and each material that several share, does to the uncertainty of the whole. */
export function NetworkBudget({ uncertainty, materials }: BudgetProps) {
  const { contributions, method, standard, basis } = uncertainty;
  const nameOf = (id = "") => materials.find((one) => one.id === id)?.name ?? id;
  const rest = contributions.slice(MOST_ROWS);
  const left = rest.reduce((sum, { share }) => sum + share, 0);
  return (
    <>
      <p className="mb-1 max-w-prose text-table text-ink-soft">{basis}</p>
      {contributions.length === 0 ? (
        <p className="text-table">Nothing has a tolerance: press ± in an element’s row.</p>
      ) : (
        <BudgetTable
          head="Element"
          method={method}
          standard={standard}
          rows={contributions.slice(0, MOST_ROWS).map(({ element, material, share, ...part }) => ({
            label: element ?? `${nameOf(material)}: resistivity as stated, in all its elements`,
            share,
            standard:
              element === undefined
                ? { value: 100 * part.standard, unit: "%" }
                : { value: part.standard, unit: "Ω" },
            sensitivity: { value: part.sensitivity, unit: element === undefined ? "Ω" : "Ω/Ω" },
          }))}
        />
      )}
      {rest.length > 0 ? (
        <p className="mt-1 text-table text-ink-soft">
          {rest.length.toLocaleString("en")} more contribute {(100 * left).toPrecision(2)} % together.
        </p>
      ) : null}
    </>
  );
}
