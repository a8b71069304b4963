/** What a sizing on a shape and one on an outline tell alike. */
import type { SizingResult } from "@/lib/engine";
import { bracketOf, verdictOf } from "./answer";
import type { Block, Headline } from "./content";
import { INPUT_COLUMNS } from "./medium";
import { plainNumber, siText, typedText } from "./typed";

export function sizingHeadline(label: string, { target, solutions }: SizingResult): Headline {
  const [first] = solutions;
  return {
    title: `${label} for ${target.text}`,
    text: solutions.map(({ dimension }) => dimension.text).join(" or "),
    bracket: null,
    statements: [
      `There the resistance is ${first.resistance.text} ${bracketOf(first.resistance)}.`,
      ...(solutions.length > 1 ? [`${solutions.length} values in the range give it.`] : []),
      ...(first.exact ? [] : [missed(first)]),
    ],
    verdict: verdictOf(first.verdict),
  };
}

/** Two whole numbers, or a value that a double cannot hold finely enough, of which the last caution tells. */
function missed({ dimension, cautions }: SizingResult["solutions"][number]): string {
  const whole = dimension.unit === "1" && Number.isInteger(dimension.value);
  return (
    (whole ? undefined : cautions.at(-1)) ??
    "No whole number gives the target; these lie on either side of it."
  );
}

/** What was looked for, and where. */
export function lookedFor(label: string, target: unknown, { within }: SizingResult): Block {
  return {
    kind: "table",
    label: "What was looked for",
    columns: INPUT_COLUMNS,
    rows: [
      ["Looked for", label, ""],
      ["Target", typedText(target, "resistance"), siText(target, "resistance")],
      ["Searched", `${within[0].text} to ${within[1].text}`, ""],
    ],
  };
}

export function solutionsTable(label: string, { solutions }: SizingResult): Block {
  const { unit } = solutions[0].dimension;
  return {
    kind: "table",
    label: "Solutions",
    columns: [
      { title: label, numeric: true },
      { title: "Resistance", numeric: true },
      { title: "Bounds", numeric: true, weight: 2 },
      { title: `Change, Ω per ${unit === "1" ? "unit" : unit.replace("m^2", "m²")}`, numeric: true },
    ],
    rows: solutions.map(({ dimension: at, resistance, sensitivity }) => [
      at.text,
      resistance.text,
      bracketOf(resistance),
      plainNumber(Number(sensitivity.toPrecision(4))),
    ]),
  };
}

export function allCautions({ solutions }: SizingResult): string[] {
  return [...new Set(solutions.flatMap(({ cautions }) => cautions))];
}
