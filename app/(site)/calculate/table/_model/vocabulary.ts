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
