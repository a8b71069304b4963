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

/** The comparisons in which a shape was computed, from the tests' own results. */
export function comparisonsOf(shape: string): readonly Comparison[] {
  return ROWS.flatMap(({ file, group, shapes }) => {
    const own = shapes[shape];
    const against = AGAINST.find(([prefix]) => file.startsWith(prefix))?.[1] ?? "";
    return own ? [{ group: group === shape ? "closed form" : group, against, ...own }] : [];
  });
}
