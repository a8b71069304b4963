"use client";

import { memo, useMemo } from "react";
import { Plus } from "lucide-react";
import { type Column, type Row } from "../_model/table";
import type { Outcome } from "../_model/send";
import type { Vocabulary } from "../_model/vocabulary";
import { ColumnHead } from "./column-head";
import { TableRow } from "./table-row";

interface TableGridProps {
  readonly vocabulary: Vocabulary;
  readonly columns: readonly Column[];
  /** The rows of this leaf, with their places in the table. */
  readonly shown: readonly { readonly row: Row; readonly place: number }[];
  readonly outcomes: ReadonlyMap<Row, Outcome>;
  /** What is wrong with a column as a whole. */
  readonly atColumn: ReadonlyMap<number, string>;
  readonly emptyText: string;
  readonly onColumn: (place: number, change: Partial<Column>) => void;
  readonly onRemoveColumn: (place: number) => void;
  readonly onAddColumn: () => void;
  readonly onCell: (id: number, column: number, text: string) => void;
  readonly onRemove: (id: number) => void;
}

/** The cells, one leaf of them, with their heads and what came out. */
export function TableGrid(props: TableGridProps) {
  const { vocabulary, columns, shown, outcomes, atColumn, emptyText } = props;
  const taken = useMemo(() => new Set(columns.map(({ name }) => name)), [columns]);
  return (
    <>
      <Choices vocabulary={vocabulary} />
      <div
        role="group"
        tabIndex={0}
        aria-label="The table"
        className="relative overflow-x-auto rounded border border-rule bg-sheet text-table"
      >
        <table className="w-full border-collapse">
          <caption className="sr-only">Requests, one a row, and what came out</caption>
          <thead>
            <tr>
              <th scope="col" className="px-1 text-end align-top font-normal text-ink-soft">
                <span className="sr-only">Row</span>
              </th>
              {columns.map((column, k) => (
                <ColumnHead
                  key={k}
                  column={column}
                  place={k}
                  choices={vocabulary.columns}
                  taken={taken}
                  complaint={atColumn.get(k)}
                  onChange={props.onColumn}
                  onRemove={props.onRemoveColumn}
                />
              ))}
              <th scope="col" className="px-1 py-1 text-start align-top font-medium">
                Resistance
              </th>
              <th scope="col" className="sticky end-0 bg-sheet py-0.5 pe-0.5 text-end align-top">
                <button
                  type="button"
                  aria-label="Add a column"
                  title="Add a column"
                  onClick={props.onAddColumn}
                  className="grid size-5.5 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink medium:size-3.5"
                >
                  <Plus aria-hidden size={16} />
                </button>
              </th>
            </tr>
          </thead>
          <tbody>
            {shown.map(({ row, place }) => (
              <TableRow
                key={row.id}
                row={row}
                place={place}
                columns={columns}
                outcome={outcomes.get(row)}
                listOf={listOf}
                onCell={props.onCell}
                onRemove={props.onRemove}
              />
            ))}
            {shown.length === 0 ? (
              <tr className="border-t border-rule">
                <td colSpan={columns.length + 3} className="px-2 py-3 text-center text-ink-soft">
                  {emptyText}
                </td>
              </tr>
            ) : null}
          </tbody>
        </table>
      </div>
    </>
  );
}

/** The list of choices that a column's cells offer. */
function listOf(name: string): string | undefined {
  if (name === "shape") return "shapes";
  return name === "material" || name.endsWith(".material") ? "materials" : undefined;
}

/** What the cells of shapes and materials offer. */
const Choices = memo(function Choices({ vocabulary }: { readonly vocabulary: Vocabulary }) {
  return (
    <>
      <datalist id="shapes">
        {vocabulary.shapes.map(({ id, title }) => (
          <option key={id} value={id}>
            {title}
          </option>
        ))}
      </datalist>
      <datalist id="materials">
        {vocabulary.materials.map((id) => (
          <option key={id} value={id} />
        ))}
      </datalist>
    </>
  );
});
