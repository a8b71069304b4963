import type { UnitKind } from "../../../../_ui/quantity/units";

export interface ColumnChoice {
  readonly name: string;
  readonly label: string;
  readonly group: "row" | "dimension" | "medium" | "operating";
  /** What it measures; null for words and counts. */
  readonly kind: UnitKind | null;
}

export interface ShapeChoice {
  readonly id: string;
  readonly title: string;
  /** Columns of its own: dimensions, and its media where there are two. */
  readonly columns: readonly string[];
  /** A table to start from. */
  readonly header: readonly string[];
  readonly row: readonly string[];
}

/** What a table may hold. */
export interface Vocabulary {
  readonly shapes: readonly ShapeChoice[];
  readonly columns: readonly ColumnChoice[];
  readonly materials: readonly string[];
}

export const GROUP_TITLES: Readonly<Record<ColumnChoice["group"], string>> = {
  row: "The row",
  dimension: "Dimensions",
  medium: "Medium",
  operating: "Operating point",
};

/** The shape whose columns a table has most of; null where it has no dimension. */
export function likelyShape(
  columns: readonly { readonly name: string }[],
  vocabulary: Vocabulary,
): string | null {
  const dimensions = new Set(
    vocabulary.columns.filter(({ group }) => group === "dimension").map(({ name }) => name),
  );
  const given = columns.map(({ name }) => name).filter((name) => dimensions.has(name));
  if (given.length === 0) return null;
  const score = ({ columns: own, header }: ShapeChoice): number => {
    const fitting = given.filter((name) => own.includes(name)).length;
    const missing = header.filter((name) => dimensions.has(name) && !given.includes(name)).length;
    return 2 * fitting - given.length - 0.5 * missing;
  };
  const best = vocabulary.shapes.toSorted((one, other) => score(other) - score(one))[0];
  return best.id;
}
