"use client";

import type { Uncertainty } from "@/lib/engine/resistance/uncertainty/result-schema";
import { ShareBar } from "../../../../_ui/share-bar";

interface Measured {
  readonly value: number;
  readonly unit: string;
}

export interface BudgetRow {
  readonly label: string;
  /** 0 … 1. */
  readonly share: number;
  readonly standard: Measured;
  readonly sensitivity: Measured;
}

interface BudgetTableProps {
  /** What the rows are. */
  readonly head: string;
  readonly method: Uncertainty["method"];
  /** Of the resistance, ohms. */
  readonly standard: number;
  readonly rows: readonly BudgetRow[];
}

/** Shares of an uncertainty as bars, with the numbers beside them. */
export function BudgetTable({ head, method, standard, rows }: BudgetTableProps) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Tolerance budget">
      <table className="w-full min-w-[34rem] max-w-[60rem] text-table" data-testid="budget">
        <thead>
          <tr className="border-b border-edge text-start">
            <th className="py-0.5 pe-2 text-start font-medium">{head}</th>
            <th className="w-2/5 py-0.5 pe-2 text-start font-medium">
              Share of the {method === "worst-case" ? "range" : "variance"}
            </th>
            <th className="py-0.5 pe-2 text-end font-medium">Standard uncertainty</th>
            <th className="py-0.5 text-end font-medium">Sensitivity</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ label, share, standard: own, sensitivity }, k) => (
            <tr key={k} className="border-b border-rule">
              <th scope="row" className="py-0.5 pe-2 text-start font-normal">
                {label}
              </th>
              <td className="py-0.5 pe-2">
                <ShareBar share={share} text={percent(share)} />
              </td>
              <td className="py-0.5 pe-2 text-end font-mono whitespace-nowrap">
                <Figure {...own} />
              </td>
              <td className="py-0.5 text-end font-mono whitespace-nowrap">
                <Figure {...sensitivity} />
              </td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <th scope="row" className="py-0.5 pe-2 text-start font-medium">
              Standard uncertainty of the resistance
            </th>
            <td />
            <td className="py-0.5 pe-2 text-end font-mono whitespace-nowrap">
              <Figure value={standard} unit="Ω" />
            </td>
            <td />
          </tr>
        </tfoot>
      </table>
    </div>
  );
}

function percent(share: number): string {
  return share > 0 && share < 0.001 ? "<0.1 %" : `${(100 * share).toFixed(1)} %`;
}

/** Three significant digits, with a power of ten where it is far from 1, and the unit. */
function Figure({ value, unit }: Measured) {
  const far = Math.abs(value) >= 1e4 || (value !== 0 && Math.abs(value) < 1e-2);
  const [mantissa, exponent] = (far ? value.toExponential(2) : value.toPrecision(3)).split("e");
  return (
    <>
      {mantissa.replace("-", "−")}
      {exponent === undefined ? null : (
        <>
          ·10<sup>{String(Number(exponent)).replace("-", "−")}</sup>
        </>
      )}
      {unit === "" ? "" : `\u2009${unit}`}
    </>
  );
}
