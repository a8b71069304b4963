"use client";

import { type KeyboardEvent, memo } from "react";
import { Trash2 } from "lucide-react";
import type { Outcome } from "../_model/send";
import type { Column, Row } from "../_model/table";

interface TableRowProps {
  readonly row: Row;
  /** Its place in the table, from 0. */
  readonly place: number;
  readonly columns: readonly Column[];
  readonly outcome: Outcome | undefined;
  readonly listOf: (name: string) => string | undefined;
  readonly onCell: (id: number, column: number, text: string) => void;
  readonly onRemove: (id: number) => void;
}

/** One request: its cells, and what came out. */
export const TableRow = memo(function TableRow(props: TableRowProps) {
  const { row, place, columns, outcome, listOf, onCell, onRemove } = props;
  const number = place + 1;
  const complaints = outcome && !outcome.ok ? outcome.atColumn : {};
  const problemId = `row-${row.id}-problem`;
  return (
    <tr className="border-t border-rule">
      <th scope="row" className="px-1 text-end font-mono font-normal text-ink-soft">
        {number}
      </th>
      {columns.map((column, k) => {
        const wrong = complaints[column.name];
        return (
          <td key={k} className="p-0.5">
            <input
              value={row.cells[k] ?? ""}
              aria-label={`${column.name || column.title || "left out"}, row ${number}`}
              aria-invalid={wrong === undefined ? undefined : true}
              aria-describedby={wrong === undefined ? undefined : problemId}
              list={listOf(column.name)}
              title={wrong}
              data-row={place}
              data-column={k}
              onChange={(event) => onCell(row.id, k, event.target.value)}
              onKeyDown={move}
              autoComplete="off"
              spellCheck={false}
              className={`min-h-5.5 w-full rounded border border-transparent bg-transparent px-0.5 font-mono hover:border-edge focus:border-edge aria-invalid:border-2 aria-invalid:border-oxide medium:min-h-4 ${listOf(column.name) || column.name === "label" ? "min-w-20" : "min-w-11"} ${column.name === "" ? "text-ink-soft" : ""}`}
            />
          </td>
        );
      })}
      <td className="min-w-24 px-1 align-middle">
        {outcome?.ok ? (
          <span className="font-mono whitespace-nowrap">{outcome.text}</span>
        ) : outcome?.later ? (
          <span className="block max-w-[44ch] py-0.5 text-small text-amber">
            Not computed in time; compute again.
          </span>
        ) : outcome ? (
          <span id={problemId} className="block max-w-[44ch] py-0.5 text-small text-oxide">
            {outcome.text}
          </span>
        ) : (
          <span className="text-ink-soft">
            <span aria-hidden>–</span>
            <span className="sr-only">not computed</span>
          </span>
        )}
      </td>
      <td className="sticky end-0 bg-sheet pe-0.5 text-end">
        <button
          type="button"
          aria-label={`Remove row ${number}`}
          title="Remove the row"
          onClick={() => onRemove(row.id)}
          className="grid size-5.5 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink medium:size-3.5"
        >
          <Trash2 aria-hidden size={14} />
        </button>
      </td>
    </tr>
  );
});

/** Up and down go to the same column of the next row, as in a spreadsheet. */
function move(event: KeyboardEvent<HTMLInputElement>): void {
  const step = { ArrowUp: -1, ArrowDown: 1, Enter: 1 }[event.key];
  if (step === undefined || event.currentTarget.list) return;
  const line = event.currentTarget.closest("tr");
  const next = step > 0 ? line?.nextElementSibling : line?.previousElementSibling;
  const target = next?.querySelector<HTMLInputElement>(
    `input[data-column="${event.currentTarget.dataset.column}"]`,
  );
  if (!target) return;
  event.preventDefault();
  target.focus();
  target.select();
}
