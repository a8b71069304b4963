"use client";

import { type ReactNode, useMemo, useState } from "react";
import { ArrowDown, ArrowUp, ChevronsUpDown } from "lucide-react";
import { ScrollFrame } from "./scroll-frame";

export interface Column<Row> {
  readonly key: string;
  readonly title: string;
  readonly cell: (row: Row) => ReactNode;
  /** What the column sorts by; without it the column does not sort. */
  readonly sortBy?: (row: Row) => number | string;
  readonly align?: "start" | "end";
  /** A length of CSS; a table wider than its frame scrolls. */
  readonly minWidth?: string;
}

interface DataTableProps<Row> {
  readonly caption: string;
  readonly captionShown?: boolean;
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row, index: number) => string | number;
  /** Shown in place of rows. */
  readonly empty?: ReactNode;
  /** Longest height before the rows scroll inside. */
  readonly maxHeight?: string;
}

interface Sorting {
  readonly key: string;
  readonly descending: boolean;
}

/** Rows that can be sorted by a press on a column's head; wide ones scroll inside their own frame. */
export function DataTable<Row>(props: DataTableProps<Row>) {
  const { caption, captionShown = false, columns, rows, rowKey, empty, maxHeight } = props;
  const [sorting, setSorting] = useState<Sorting | null>(null);
  const sorted = useMemo(() => sortRows(rows, columns, sorting), [rows, columns, sorting]);
  return (
    <ScrollFrame label={caption} style={{ maxHeight }}>
      <table className="w-full border-collapse text-table">
        <caption className={captionShown ? "px-1.5 py-1 text-start text-small text-ink-soft" : "sr-only"}>
          {caption}
        </caption>
        <thead className="sticky top-0 bg-sheet">
          <tr>
            {columns.map((column) => (
              <HeadCell key={column.key} column={column} sorting={sorting} onSort={setSorting} />
            ))}
          </tr>
        </thead>
        <tbody>
          {sorted.map((row, index) => (
            <tr key={rowKey(row, index)} className="border-t border-rule hover:bg-paper">
              {columns.map((column) => (
                <td
                  key={column.key}
                  style={{ minWidth: column.minWidth }}
                  className={`px-1.5 py-0.5 align-top ${column.align === "end" ? "text-end font-mono whitespace-nowrap" : ""}`}
                >
                  {column.cell(row)}
                </td>
              ))}
            </tr>
          ))}
          {rows.length === 0 ? (
            <tr className="border-t border-rule">
              <td colSpan={columns.length} className="px-1.5 py-2 text-center text-ink-soft">
                {empty ?? "Nothing here."}
              </td>
            </tr>
          ) : null}
        </tbody>
      </table>
    </ScrollFrame>
  );
}

interface HeadCellProps<Row> {
  readonly column: Column<Row>;
  readonly sorting: Sorting | null;
  readonly onSort: (sorting: Sorting | null) => void;
}

function HeadCell<Row>({ column, sorting, onSort }: HeadCellProps<Row>) {
  const { key, title, sortBy, align } = column;
  const own = sorting?.key === key ? sorting : null;
  const Icon = own ? (own.descending ? ArrowDown : ArrowUp) : ChevronsUpDown;
  const next = own ? (own.descending ? null : { key, descending: true }) : { key, descending: false };
  return (
    <th
      scope="col"
      aria-sort={own ? (own.descending ? "descending" : "ascending") : undefined}
      className={`px-1.5 py-0.5 font-medium text-ink-soft ${align === "end" ? "text-end" : "text-start"}`}
    >
      {sortBy ? (
        <button
          type="button"
          onClick={() => onSort(next)}
          className={`inline-flex min-h-5.5 cursor-pointer items-center gap-0.5 rounded hover:text-ink medium:min-h-3 ${own ? "text-ink" : ""}`}
        >
          {title}
          <Icon aria-hidden size={14} className="shrink-0" />
        </button>
      ) : (
        title
      )}
    </th>
  );
}

function sortRows<Row>(
  rows: readonly Row[],
  columns: readonly Column<Row>[],
  sorting: Sorting | null,
): readonly Row[] {
  const by = columns.find((column) => column.key === sorting?.key)?.sortBy;
  if (!by || !sorting) return rows;
  const direction = sorting.descending ? -1 : 1;
  return [...rows].sort((a, b) => {
    const [x, y] = [by(a), by(b)];
    if (typeof x === "number" && typeof y === "number") return direction * (x - y);
    return direction * String(x).localeCompare(String(y), "en");
  });
}
