"use client";

import type { ShapeEntry } from "@/lib/engine";
import type { Uncertainty } from "@/lib/engine/resistance/uncertainty/result-schema";
import { ShareBar } from "../../../../_ui/share-bar";

const METHOD_WORDS: Readonly<Record<Uncertainty["method"], string>> = {
  propagation: "95 % of the time, by first-order propagation",
  "worst-case": "in the worst case",
  "monte-carlo": "95 % of the time, by Monte Carlo",
};

/** The range that tolerances leave, beside the bounds. */
export function StrayRange({ uncertainty }: { readonly uncertainty: Uncertainty }) {
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
        <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Tolerance budget">
          <table className="w-full min-w-[34rem] max-w-[60rem] text-table" data-testid="budget">
            <thead>
              <tr className="border-b border-edge text-start">
                <th className="py-0.5 pe-2 text-start font-medium">Input</th>
                <th className="w-2/5 py-0.5 pe-2 text-start font-medium">
                  Share of the {method === "worst-case" ? "range" : "variance"}
                </th>
                <th className="py-0.5 pe-2 text-end font-medium">Standard uncertainty</th>
                <th className="py-0.5 text-end font-medium">Sensitivity</th>
              </tr>
            </thead>
            <tbody>
              {contributions.map(({ input, share, standard: own, sensitivity }) => {
                const { label, unit } = wordsOf(input, entry);
                return (
                  <tr key={input} className="border-b border-rule">
                    <th scope="row" className="py-0.5 pe-2 text-start font-normal">
                      {label}
                    </th>
                    <td className="py-0.5 pe-2">
                      <ShareBar share={share} text={percent(share)} />
                    </td>
                    <td className="py-0.5 pe-2 text-end font-mono whitespace-nowrap">
                      {input.endsWith("material") ? (
                        <Figure value={100 * own} unit="%" />
                      ) : (
                        <Figure value={own} unit={unit} />
                      )}
                    </td>
                    <td className="py-0.5 text-end font-mono whitespace-nowrap">
                      <Figure value={sensitivity} unit={`Ω${unit === "" ? "" : `/${unit}`}`} />
                    </td>
                  </tr>
                );
              })}
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
      )}
    </>
  );
}

const MEMBERS: Readonly<Record<string, readonly [string, string]>> = {
  temperature: ["Temperature", "K"],
  resistivity: ["Resistivity", "Ω·m"],
  conductivity: ["Conductivity", "S/m"],
  sheetResistance: ["Sheet resistance", "Ω"],
  thickness: ["Thickness of the sheet", "m"],
  temperatureCoefficient: ["Temperature coefficient", "1/K"],
  referenceTemperature: ["Reference temperature", "K"],
  material: ["Resistivity of the material, as stated", ""],
};
const UNITS: Readonly<Record<string, string>> = { m: "m", "m^2": "m²", deg: "rad", "1": "" };

/** An input's place in the request in the page's words, and its SI unit. */
function wordsOf(
  input: string,
  entry: BudgetProps["entry"],
): { readonly label: string; readonly unit: string } {
  const path = input.split(".");
  const last = path[path.length - 1];
  if (path[0] === "dimensions") {
    const dimension = entry.dimensions.find(({ name }) => name === last);
    return { label: dimension?.label ?? last, unit: UNITS[dimension?.unit ?? "1"] ?? "" };
  }
  const profile = path.indexOf("profile");
  const medium = path[0] === "media" ? entry.media.names.find(({ name }) => name === path[1]) : undefined;
  const [label, unit] =
    profile < 0 ? (MEMBERS[last] ?? [last, ""]) : [profileWords(path.slice(profile + 1)), ""];
  return { label: medium ? `${medium.label}: ${label.toLowerCase()}` : label, unit };
}

/** "layers.0.value" as "Profile: layer 1, value". */
function profileWords(path: readonly string[]): string {
  const places = { layers: "layer", positions: "position", values: "value", table: "point" };
  const words: string[] = [];
  for (const part of path) {
    const number = /^\d+$/.test(part) ? Number(part) + 1 : null;
    if (number === null) words.push(part in places ? places[part as keyof typeof places] : part);
    else words.push(`${words.pop() ?? ""} ${number}`.trim());
  }
  return `Profile: ${words.join(", ")}`;
}

function percent(share: number): string {
  return share > 0 && share < 0.001 ? "<0.1 %" : `${(100 * share).toFixed(1)} %`;
}

/** Three significant digits, with a power of ten where it is far from 1, and the unit. */
function Figure({ value, unit }: { readonly value: number; readonly unit: string }) {
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
