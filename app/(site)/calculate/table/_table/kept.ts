/** The table of this tab with its answers, in the browser's store: it outlives a reload and signing in. */
import type { Outcome } from "../_model/send";
import { type Column, type Delimiter, newRow, type Row, type Table } from "../_model/table";

const KEPT = "rhoform-table";

export interface Kept {
  readonly table: Table;
  readonly outcomes: ReadonlyMap<Row, Outcome>;
}

type Answer = readonly [value: number, lower: number, upper: number, text: string];

interface Stored {
  readonly columns: readonly Column[];
  readonly rows: readonly (readonly string[])[];
  readonly decimalComma: boolean;
  readonly delimiter?: Delimiter;
  /** One a row; refused rows are asked for again, at no cost. */
  readonly answers?: readonly (Answer | null)[];
}

/** Whether there was room for it. */
export function keep({ columns, rows, decimalComma, delimiter }: Table, outcomes: Kept["outcomes"]): boolean {
  const stored: Stored = {
    columns,
    rows: rows.map(({ cells }) => cells),
    decimalComma,
    delimiter,
    answers: rows.map((row) => {
      const outcome = outcomes.get(row);
      return outcome?.ok ? [outcome.value, outcome.lower, outcome.upper, outcome.text] : null;
    }),
  };
  try {
    window.sessionStorage.setItem(KEPT, JSON.stringify(stored));
    return true;
  } catch {
    return false;
  }
}

export function readKept(): Kept | null {
  try {
    const text = window.sessionStorage.getItem(KEPT);
    // Written by this page; a text of an older one that does not fit is as none.
    const kept = text === null ? null : (JSON.parse(text) as Stored);
    if (!kept || kept.columns.length === 0) return null;
    const rows = kept.rows.map((cells) => newRow(cells));
    const outcomes = new Map<Row, Outcome>();
    rows.forEach((row, k) => {
      const answer = kept.answers?.[k];
      if (!answer) return;
      const [value, lower, upper, said] = answer;
      outcomes.set(row, { ok: true, value, lower, upper, text: said });
    });
    const { columns, decimalComma, delimiter = "," } = kept;
    return { table: { columns, rows, decimalComma, delimiter }, outcomes };
  } catch {
    return null;
  }
}
