"use client";

import type { ShapeEntry } from "@/lib/engine";
import type { Uncertainty } from "@/lib/engine/resistance/uncertainty/result-schema";
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
            const { label, unit } = wordsOf(input, entry);
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
