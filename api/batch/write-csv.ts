import Papa from "papaparse";
import { RESULT_COLUMNS } from "./columns";
import { defused } from "./defuse";
import type { CsvTable } from "./read-csv";
import { columnOf } from "./row-request";
import type { ItemOutcome } from "./outcome";

/** Longest text of a cell that says what was wrong. */
const LONGEST_PROBLEM = 1_000;

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
