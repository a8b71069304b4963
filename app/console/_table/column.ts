import type { ReactNode } from "react";

/** A column of a console list. */
export interface ListColumn<Row> {
  /** Name by which the server sorts, where `sortable`. */
  readonly id: string;
  readonly title: string;
  readonly cell: (row: Row) => ReactNode;
  readonly sortable?: boolean;
  /** `end` for numbers. */
  readonly align?: "start" | "end";
  /** From which width it is shown by itself; the reader may show it anywhere. `extra`: only on request. */
  readonly from?: "always" | "medium" | "wide" | "extra";
  /** It can never be hidden: what the row is called. */
  readonly fixed?: boolean;
}

/** A page of a list, as the server answers it. */
export interface ListPage<Row> {
  readonly rows: readonly Row[];
  /** Rows there are in all; counted only up to `counted`. */
  readonly total: number;
  /** There are more than `total`. */
  readonly more?: boolean;
}

export type Shown = "always" | "medium" | "wide" | "never";

/** From which width a column is shown, after what the reader chose. */
export function shownFrom<Row>(column: ListColumn<Row>, chosen: readonly string[]): Shown {
  if (column.fixed || chosen.includes(column.id)) return "always";
  if (chosen.includes(`-${column.id}`)) return "never";
  return column.from === "extra" ? "never" : (column.from ?? "always");
}

/** The reader's choices after one more. */
export function withChoice<Row>(
  column: ListColumn<Row>,
  chosen: readonly string[],
  show: boolean,
): readonly string[] {
  const others = chosen.filter((name) => name !== column.id && name !== `-${column.id}`);
  const byItself = (column.from ?? "always") === "always";
  if (show) return byItself ? others : [...others, column.id];
  return column.from === "extra" ? others : [...others, `-${column.id}`];
}
