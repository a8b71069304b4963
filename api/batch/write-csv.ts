import Papa from "papaparse";
import { RESULT_COLUMNS } from "./columns";
import type { CsvTable } from "./read-csv";
import { columnOf } from "./row-request";
import type { ItemOutcome } from "./outcome";

/** Longest text of a cell that says what was wrong. */
const LONGEST_PROBLEM = 1_000;

/** Plain numbers and quantities may begin with a sign; a spreadsheet makes no formula of them. */
const SIGNED_QUANTITY =
  /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?(?: ?[A-Za-zµμΩ°%][A-Za-zµμΩ°%^/0-9 ]{0,20})?$/;

/**
 * A cell that no spreadsheet takes for a formula: one that begins with a sign of a formula gets an apostrophe in front,
 * which shows the rest as text.
 */
export function defused(cell: string): string {
  return /^[\s\u0000-\u001f]*[=+\-@＝＋－＠]/.test(cell) && !SIGNED_QUANTITY.test(cell) ? `'${cell}` : cell;
}

/** Writes the answer of a table: its own rows and columns, and behind them what came out. */
export class CsvWriter {
  private readonly kept: readonly number[];

  constructor(private readonly table: CsvTable) {
    this.kept = table.columns.flatMap(({ role }, index) => (role === "result" ? [] : [index]));
  }

  header(): string {
    const names = this.kept.map((index) => this.table.header[index]);
    return (this.table.marked ? "\uFEFF" : "") + this.line([...names, ...RESULT_COLUMNS]);
  }

  row(cells: readonly string[], outcome: ItemOutcome | null): string {
    const own = this.kept.map((index) => cells[index] ?? "");
    return this.line([...own, ...(outcome ? resultCells(outcome) : RESULT_COLUMNS.map(() => ""))]);
  }

  private line(cells: readonly string[]): string {
    return csvLine(cells, this.table.delimiter);
  }
}

/** One line with its end, every cell defused and quoted where it must be. */
export function csvLine(cells: readonly string[], delimiter = ","): string {
  return `${Papa.unparse([cells.map(defused)], { delimiter, newline: "\r\n", header: false })}\r\n`;
}

/** The cells of the columns that an answer adds. */
export function resultCells(outcome: ItemOutcome): string[] {
  if ("result" in outcome) {
    const { value, lower, upper, text } = outcome.result.resistance;
    return [String(value), String(lower), String(upper), text, "200", ""];
  }
  const { errors = [], detail } = outcome.problem;
  const sentences = errors.map((complaint) => {
    const { detail: what } = complaint;
    const column = "pointer" in complaint ? columnOf(complaint.pointer) : complaint.parameter;
    return column === "" ? what : `${column} ${what}`;
  });
  const text = sentences.length > 0 ? sentences.join(" ") : detail;
  const short = text.length > LONGEST_PROBLEM ? `${text.slice(0, LONGEST_PROBLEM)}…` : text;
  return ["", "", "", "", String(outcome.status), short];
}
