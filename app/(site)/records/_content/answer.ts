/** Parts of an answer that more than one operation has: headline, operating point, checks, uncertainty, sources. */
import type { z } from "zod";
import type { boundedResistanceSchema, Check, ResistanceResult, ShapeEntry } from "@/lib/engine";
import { bracketText } from "../../../_ui/bracket";
import { engineering } from "../../calculate/_calculator/answer/engineering";
import { BOUNDS_MEANING, CHECK_TITLES, PROVENANCE } from "../../calculate/_calculator/answer/words";
import { inputWords } from "../../calculate/_model/input-words";
import type { Block, Fact, Headline, Section } from "./content";
import { plainNumber, words } from "./typed";

type Bounded = z.infer<typeof boundedResistanceSchema>;

/** A number with its bracket, and in words where the bracket comes from. */
export function boundedHeadline(title: string, resistance: Bounded, method: string): Headline {
  const { text, boundsBasis, proved } = resistance;
  return {
    title,
    text,
    bracket: bracketOf(resistance),
    statements: [`${method}, bounds ${proved ? "proved" : "not proved"}. ${BOUNDS_MEANING[boundsBasis]}`],
    verdict: null,
  };
}

/** Both bounds in the unit of the value: "[1.2344 … 1.2346] mΩ". */
export function bracketOf({ value, lower, upper }: { value: number; lower: number; upper: number }): string {
  const bracket = bracketText(value, lower, upper, "Ω");
  return `[${bracket.lower} … ${bracket.upper}] ${bracket.unit}`;
}

const SENTENCES = {
  met: "The requirement is met, bounds included.",
  "not-met": "The requirement is not met, bounds included.",
  undecided: "The answer reaches across a limit, so the requirement is undecided.",
} as const;

export function verdictOf(verdict: ResistanceResult["verdict"]): Headline["verdict"] {
  return verdict ? { outcome: verdict, sentence: SENTENCES[verdict] } : null;
}

/** Temperature, and voltage, current and power where the request gave one of them. */
export function operatingFacts(operating: ResistanceResult["operating"]): Fact[] {
  const { temperature, voltage, current, power } = operating;
  return [
    { name: "Temperature", value: `${plainNumber(temperature)}\u2009°C` },
    ...(voltage === undefined ? [] : [{ name: "Voltage", value: engineering(voltage, "V") }]),
    ...(current === undefined ? [] : [{ name: "Current", value: engineering(current, "A") }]),
    ...(power === undefined ? [] : [{ name: "Power", value: engineering(power, "W") }]),
  ];
}

/** A check of any operation. */
type AnyCheck = Omit<Check, "name"> & { readonly name: string };

export function checksSection(checks: readonly AnyCheck[] | undefined): Section[] {
  if (!checks || checks.length === 0) return [];
  const rows = checks.map((check) => [
    CHECK_TITLES[check.name] ?? words(check.name),
    check.applies ? (check.passed ? "passed" : "failed") : "does not apply",
    check.applies ? `${small(check.deviation)} of ${small(check.tolerance)} allowed` : (check.reason ?? ""),
  ]);
  const table: Block = {
    kind: "table",
    label: "Checks",
    columns: [
      { title: "Check", weight: 1.2 },
      { title: "Outcome", weight: 0.6 },
      { title: "Deviation", weight: 1.6 },
    ],
    rows,
  };
  return [{ id: "checks", title: "Checks on this answer", blocks: [table] }];
}

function small(value: number | undefined): string {
  if (value === undefined) return "–";
  if (value === 0) return "0";
  return plainNumber(Number(value.toPrecision(2)));
}

const UNCERTAINTY_METHODS = {
  propagation: "First-order propagation (GUM)",
  "worst-case": "Worst case over the tolerances",
  "monte-carlo": "Monte Carlo (GUM Supplement 1)",
} as const;

type Strayed = NonNullable<ResistanceResult["uncertainty"]>;

interface Part {
  readonly name: string;
  readonly sensitivity: number;
  readonly standard: number;
  readonly share: number;
}

/** The range that the tolerances of the inputs span, and what each contributes. */
export function uncertaintySection(
  uncertainty: ResistanceResult["uncertainty"],
  entry: ShapeEntry | undefined,
): Section[] {
  if (!uncertainty) return [];
  const parts = uncertainty.contributions.map(({ input, ...part }) => ({
    name: entry ? inputWords(input, entry).label : input,
    ...part,
  }));
  return toleranceSection("Tolerances of the inputs", "Input", uncertainty, parts);
}

/** The same of whatever has a budget; `of` says what its parts are. */
export function toleranceSection(
  title: string,
  of: string,
  uncertainty: Omit<Strayed, "contributions">,
  parts: readonly Part[],
): Section[] {
  const { method, standard, low, high, coverage, basis, trials, seed } = uncertainty;
  const facts: Fact[] = [
    { name: "Method", value: UNCERTAINTY_METHODS[method] },
    {
      name: "Range",
      value: `${engineering(low, "Ω")} … ${engineering(high, "Ω")}`,
      note:
        coverage === 1
          ? "covers every value inside the tolerances"
          : `covers ${plainNumber(coverage * 100)} %`,
    },
    { name: "Standard uncertainty", value: engineering(standard, "Ω") },
    ...(trials === undefined
      ? []
      : [{ name: "Trials", value: `${trials}${seed === undefined ? "" : `, seed ${seed}`}` }]),
  ];
  const blocks: Block[] = [
    { kind: "facts", facts },
    { kind: "paragraph", text: basis },
  ];
  if (parts.length > 0) {
    blocks.push({
      kind: "table",
      label: "Contributions",
      columns: [
        { title: of, weight: 1.4 },
        { title: "Sensitivity, Ω per SI unit", numeric: true },
        { title: "Standard uncertainty, SI", numeric: true },
        { title: "Share", numeric: true, weight: 0.5 },
      ],
      rows: parts.map(({ name, sensitivity, standard: own, share }) => [
        name,
        plainNumber(Number(sensitivity.toPrecision(4))),
        plainNumber(Number(own.toPrecision(3))),
        `${plainNumber(Number((share * 100).toPrecision(3)))} %`,
      ]),
    });
  }
  return [{ id: "uncertainty", title, blocks }];
}

export function linesSection(id: string, title: string, lines: readonly string[]): Section[] {
  return lines.length === 0 ? [] : [{ id, title, blocks: [{ kind: "lines", lines }] }];
}

export function sourceLines(sources: ResistanceResult["sources"]): string[] {
  return sources.map(
    ({ title, detail, provenance }) =>
      `${title.replaceAll("`", "")}${detail ? `: ${detail}` : ""} (${PROVENANCE[provenance] ?? provenance})`,
  );
}
