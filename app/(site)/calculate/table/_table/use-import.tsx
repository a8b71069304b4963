"use client";

import { type ClipboardEvent, type DragEvent, useState } from "react";
import { type Import, importText } from "../_model/import-text";
import { below, from } from "../_model/join";
import { readFile } from "../_model/read-file";
import { isEmpty, type Table } from "../_model/table";
import type { Vocabulary } from "../_model/vocabulary";
import { ImportDialog, type Way } from "./import-dialog";
import { count } from "./run-bar";

/** A cell by its row's place and its column's. */
interface Cell {
  readonly row: number;
  readonly column: number;
}

/** What the page says about the rows that came in last. */
export interface Incoming {
  readonly refused: boolean;
  readonly notes: readonly string[];
  /** The shape that its columns fit, where none says a shape. */
  readonly likely: string | null;
}

type Found = Extract<Import, { ok: true }>;

interface UseImportOptions {
  readonly table: Table;
  /** Whether the table has anything but its example. */
  readonly touched: boolean;
  readonly vocabulary: Vocabulary;
  readonly put: (table: Table, said: string) => void;
}

/** Takes rows from the clipboard or a file; asks first where rows are there. */
export function useImport({ table, touched, vocabulary, put }: UseImportOptions) {
  const [said, setSaid] = useState<Incoming | null>(null);
  const [waiting, setWaiting] = useState<{ readonly found: Found; readonly cell: Cell | null } | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const there = touched ? table.rows.filter((row) => !isEmpty(row)).length : 0;

  const refuse = (reason: string) => setSaid({ refused: true, notes: [reason], likely: null });

  async function take(text: string, note: string | null, cell: Cell | null) {
    const result = await importText(text, table, vocabulary);
    if (!result.ok) return refuse(result.reason);
    const found = note === null ? result : { ...result, notes: [note, ...result.notes] };
    const ways = waysOf(found, cell);
    if (ways.length === 0) {
      return refuse(
        `It has no header, and no row has a shape where the column “shape” is; the columns here are ${table.columns.map(({ name }) => name || "left out").join(", ")}.`,
      );
    }
    setRefusal(null);
    if (ways[0] === "from") {
      // Cells over cells, as in a spreadsheet; nobody is asked there either.
      const filled = from(table, found.table, cell?.row ?? 0, cell?.column ?? 0, vocabulary);
      return filled.ok ? finish(found, filled.table) : refuse(filled.reason);
    }
    if (there > 0) setWaiting({ found, cell });
    else finish(found, found.table);
  }

  function finish(found: Found, next: Table) {
    setWaiting(null);
    setSaid(
      found.notes.length > 0 || found.likely !== null
        ? { refused: false, notes: found.notes, likely: found.likely }
        : null,
    );
    put(next, `${count(found.table.rows.length, "row")} taken.`);
  }

  function choose(way: Way) {
    if (!waiting) return;
    const { found, cell } = waiting;
    if (way === "replace") return finish(found, found.table);
    const joined =
      way === "below"
        ? below(table, found.table, vocabulary)
        : from(table, found.table, cell?.row ?? 0, cell?.column ?? 0, vocabulary);
    if (joined.ok) finish(found, joined.table);
    else setRefusal(joined.reason);
  }

  async function takeFile(file: File) {
    const reading = await readFile(file);
    if (reading.ok) await take(reading.text, reading.note, null);
    else refuse(reading.reason);
  }

  return {
    /** What to tell of the rows that came in last. */
    said,
    dismiss: () => setSaid(null),
    takeFile,
    onPaste: (event: ClipboardEvent) => {
      const text = event.clipboardData.getData("text/plain");
      if (!/[\t\n]/.test(text.trim())) return;
      event.preventDefault();
      void take(text, null, cellAt(event.target));
    },
    onDrop: (event: DragEvent) => {
      const [file] = event.dataTransfer.files;
      if (!file) return;
      event.preventDefault();
      void takeFile(file);
    },
    onDragOver: (event: DragEvent) => {
      if (event.dataTransfer.types.includes("Files")) event.preventDefault();
    },
    dialog: waiting ? (
      <ImportDialog
        coming={waiting.found.table.rows.length}
        there={there}
        ways={waysOf(waiting.found, waiting.cell)}
        notes={waiting.found.notes}
        refusal={refusal}
        onChoose={choose}
        onCancel={() => setWaiting(null)}
      />
    ) : null,
  };
}

function replaces({ headed, shaped }: Found): boolean {
  return headed || shaped;
}

function waysOf(found: Found, cell: Cell | null): readonly Way[] {
  const whole: readonly Way[] = replaces(found) ? ["replace", "below"] : [];
  return cell !== null && !found.headed ? [...whole, "from"] : whole;
}

/** The cell of the table that something was pasted into. */
function cellAt(target: EventTarget): Cell | null {
  if (!(target instanceof HTMLInputElement)) return null;
  const { row, column } = target.dataset;
  return row === undefined || column === undefined ? null : { row: Number(row), column: Number(column) };
}
