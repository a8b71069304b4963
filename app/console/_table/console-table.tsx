"use client";

import { type ReactNode, useMemo } from "react";
import {
  type ColumnDef,
  columnVisibilityFeature,
  rowPaginationFeature,
  rowSortingFeature,
  type SortingState,
  tableFeatures,
  useTable,
} from "@tanstack/react-table";
import { ArrowDown, ArrowUp, ChevronsUpDown } from "lucide-react";
import { ScrollFrame } from "../../_ui/scroll-frame";
import { Loading } from "../../_ui/states";
import { ProblemNotice } from "../../_ui/problem-notice";
import { Button } from "../../_ui/button";
import type { ConsoleProblem } from "../_shell/call-console";
import { type ListColumn, type ListPage, type Shown, shownFrom } from "./column";
import { Pager } from "./pager";
import type { ListState } from "./use-list-state";

interface ConsoleTableProps<Row extends object> {
  /** What the list holds: "Keys". */
  readonly caption: string;
  readonly columns: readonly ListColumn<Row>[];
  readonly state: ListState;
  readonly data: ListPage<Row> | undefined;
  readonly error?: ConsoleProblem;
  /** Another page or order is on its way; the rows shown are the ones before. */
  readonly busy?: boolean;
  readonly onRetry?: () => void;
  readonly rowKey: (row: Row) => string;
  /** Where there is nothing at all yet: what to do first. */
  readonly empty: ReactNode;
  /** Hides where the list ends: lists that are never longer than a page. */
  readonly paged?: boolean;
}

const features = tableFeatures({ columnVisibilityFeature, rowPaginationFeature, rowSortingFeature });

const CLASS_OF: Readonly<Record<Shown, string>> = {
  always: "",
  medium: "max-medium:hidden",
  wide: "max-wide:hidden",
  never: "hidden",
};

/**
 * A list of the console: the server sorts, filters and pages; the page's address keeps the state. Rows that are wider
 * than the screen scroll inside their own frame, and what a narrow screen can do without is hidden until asked for.
 */
export function ConsoleTable<Row extends object>(props: ConsoleTableProps<Row>) {
  const { caption, columns, state, data, error, busy = false, onRetry, rowKey, empty, paged = true } = props;
  const definitions = useMemo(
    (): ColumnDef<typeof features, Row>[] =>
      columns.map((column) => ({
        id: column.id,
        header: column.title,
        accessorFn: () => null,
        enableSorting: column.sortable ?? false,
        enableHiding: !column.fixed,
      })),
    [columns],
  );
  const descending = state.sort.startsWith("-");
  const sorting: SortingState = [{ id: state.sort.replace(/^-/, ""), desc: descending }];
  const shown = new Map(columns.map((column) => [column.id, shownFrom(column, state.columns)]));
  const rows = useMemo(() => [...(data?.rows ?? [])], [data]);
  const table = useTable({
    features,
    columns: definitions,
    data: rows,
    getRowId: rowKey,
    manualSorting: true,
    manualPagination: true,
    enableSortingRemoval: false,
    rowCount: data?.total ?? 0,
    state: {
      sorting,
      pagination: { pageIndex: state.page - 1, pageSize: state.size },
      columnVisibility: Object.fromEntries([...shown].map(([id, from]) => [id, from !== "never"])),
    },
    onSortingChange: (change) => {
      const [next] = typeof change === "function" ? change(sorting) : change;
      if (next) state.change({ sort: `${next.desc ? "-" : ""}${next.id}` });
    },
  });
  const column = (id: string) => columns.find((each) => each.id === id);
  const look = (id: string) =>
    `px-1.5 ${CLASS_OF[shown.get(id) ?? "always"]} ${column(id)?.align === "end" ? "text-end" : "text-start"}`;

  if (error && !data) return <Failed error={error} onRetry={onRetry} />;
  if (!data) return <Loading what={caption.toLowerCase()} className="h-40" />;
  if (data.total === 0 && !state.filtered && state.page === 1) return <>{empty}</>;
  return (
    <div>
      {error ? <Failed error={error} onRetry={onRetry} /> : null}
      <ScrollFrame label={caption} busy={busy} className={busy ? "opacity-70" : ""}>
        <table className="w-full border-collapse text-table">
          <caption className="sr-only">{caption}</caption>
          <thead>
            {table.getHeaderGroups().map((group) => (
              <tr key={group.id}>
                {group.headers.map((header) => (
                  <th
                    key={header.id}
                    scope="col"
                    aria-sort={
                      header.column.getIsSorted() === false
                        ? undefined
                        : header.column.getIsSorted() === "desc"
                          ? "descending"
                          : "ascending"
                    }
                    className={`py-0.5 font-medium whitespace-nowrap text-ink-soft ${look(header.column.id)}`}
                  >
                    {header.column.getCanSort() ? (
                      <SortButton
                        title={column(header.column.id)?.title ?? ""}
                        sorted={header.column.getIsSorted()}
                        onPress={() => header.column.toggleSorting(header.column.getIsSorted() !== "desc")}
                      />
                    ) : (
                      column(header.column.id)?.title
                    )}
                  </th>
                ))}
              </tr>
            ))}
          </thead>
          <tbody>
            {table.getRowModel().rows.map((row) => (
              <tr key={row.id} className="border-t border-rule hover:bg-paper">
                {row.getVisibleCells().map((cell) => (
                  <td
                    key={cell.id}
                    className={`py-0.5 align-top ${look(cell.column.id)} ${column(cell.column.id)?.align === "end" ? "font-mono whitespace-nowrap" : ""}`}
                  >
                    {column(cell.column.id)?.cell(row.original)}
                  </td>
                ))}
              </tr>
            ))}
            {data.rows.length === 0 ? (
              <tr className="border-t border-rule">
                <td colSpan={columns.length} className="px-1.5 py-3 text-center text-ink-soft">
                  {data.total > 0 || state.page > 1
                    ? "This page is past the end."
                    : "Nothing fits the search and the filters."}
                </td>
              </tr>
            ) : null}
          </tbody>
        </table>
      </ScrollFrame>
      {paged ? <Pager state={state} data={data} /> : null}
    </div>
  );
}

function Failed({ error, onRetry }: { readonly error: ConsoleProblem; readonly onRetry?: () => void }) {
  return (
    <div className="mb-1.5 flex flex-wrap items-start gap-2">
      <ProblemNotice problem={error.problem} />
      {onRetry ? <Button onClick={onRetry}>Try again</Button> : null}
    </div>
  );
}

interface SortButtonProps {
  readonly title: string;
  readonly sorted: false | "asc" | "desc";
  readonly onPress: () => void;
}

function SortButton({ title, sorted, onPress }: SortButtonProps) {
  const Icon = sorted === false ? ChevronsUpDown : sorted === "desc" ? ArrowDown : ArrowUp;
  return (
    <button
      type="button"
      onClick={onPress}
      className={`inline-flex min-h-5.5 cursor-pointer items-center gap-0.5 rounded hover:text-ink medium:min-h-3 ${sorted ? "text-ink" : ""}`}
    >
      {title}
      <Icon aria-hidden size={14} className="shrink-0" />
    </button>
  );
}
