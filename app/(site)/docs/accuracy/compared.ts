import { findShape } from "@/lib/engine";
import table from "./table.json";

/** One group of comparisons in which a shape was computed. */
export interface Comparison {
  readonly group: string;
  /** What stands on the other side. */
  readonly against: string;
  readonly cases: number;
  /** Largest relative deviation of this shape in the group, rounded up. */
  readonly worst: number;
}

/** What the tests of each file, or of each folder, compare the engine with. */
export const AGAINST: readonly (readonly [prefix: string, against: string])[] = [
  ["tests/reference/conductor-tables", "printed tables, as far as they were rounded"],
  ["tests/reference/conductors", "standards and common practice"],
  ["tests/reference/earthing-practice", "published worked examples, as far as they were rounded"],
  ["tests/reference/", "values of 50 digits, each agreed by a second route"],
  ["tests/engine/shape/radial/flow", "its own closed form by another route"],
  ["tests/engine/shape/", "the textbook form in 60-digit arithmetic, extreme sizes included"],
];

interface Row {
  readonly file: string;
  readonly group: string;
  readonly cases: number;
  readonly worst: number;
  /** The part of each shape that was computed in the group. */
  readonly shapes: Readonly<Record<string, { readonly cases: number; readonly worst: number } | undefined>>;
}

/** The table as `npm run accuracy` wrote it. */
export const ROWS: readonly Row[] = table;

/** Groups whose tests are named after a function or after several shapes. */
const TITLES: Readonly<Record<string, string>> = {
  "common practice, no source": "Values of common practice, for which no source is at hand",
  asinhIncrease: "Growth of the inverse hyperbolic sine, for electrodes side by side",
  inlineMean: "Mean potential of one segment on another in line with it",
  peak: "Field at its peak",
  rods: "Earth rods",
  "sheet-end-terminal and sheet-slit": "Sheet with a partial end terminal, strip with a slit",
  "what an answer says": "Earth rod in two layers",
};

/** What a group compares, as a reader would call it. */
export function titleOf(group: string): string {
  // The tests note of which sources the print itself was looked at.
  const title = findShape(group)?.title ?? TITLES[group] ?? group.replace(" (seen)", "");
  return title.charAt(0).toUpperCase() + title.slice(1);
}

export function againstOf(file: string): string {
  return AGAINST.find(([prefix]) => file.startsWith(prefix))?.[1] ?? "";
}

/** The comparisons in which a shape was computed, from the tests' own results. */
export function comparisonsOf(shape: string): readonly Comparison[] {
  return ROWS.flatMap(({ file, group, shapes }) => {
    const own = shapes[shape];
    return own
      ? [{ group: group === shape ? "Closed form" : titleOf(group), against: againstOf(file), ...own }]
      : [];
  });
}
