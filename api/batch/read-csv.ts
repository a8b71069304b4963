import Papa from "papaparse";
import type { Complaint } from "@/lib/service/refusal";
import { Refusal } from "@/lib/service/refusal";
import { type Column, readHeaderCell } from "./columns";
import { MOST_ITEMS, tooManyItems } from "./items";

/** Most lines that are looked at, empty ones among them. */
const MOST_LINES = 2 * MOST_ITEMS + 1;

/** A table as it came: the answer has the same rows and columns. */
export interface CsvTable {
  readonly header: readonly string[];
  readonly columns: readonly Column[];
  /** Cells as they came; an empty row has no item. */
  readonly rows: readonly (readonly string[])[];
  readonly delimiter: string;
  /** Whether the file began with a byte order mark; spreadsheets tell UTF-8 by it. */
  readonly marked: boolean;
}

const DELIMITERS = [",", ";", "\t"];

/**
 * Reads a CSV table with a header.
 * @throws Refusal of 413 for too many rows, of 422 with every complaint about the header, or for broken quotes.
 */
export function readCsv(text: string, marked: boolean): CsvTable {
  const content = text.startsWith("\uFEFF") ? text.slice(1) : text;
  if (content.trim() === "") {
    throw refusal([
      { pointer: "#", detail: "is empty; its first row must name the columns, at least shape." },
    ]);
  }
  const delimiter = delimiterOf(content);
  const { data, errors } = Papa.parse<string[]>(content, { delimiter, preview: MOST_LINES + 1 });
  const broken = errors.find(({ type }) => type === "Quotes");
  if (broken) {
    const row = (broken.row ?? 0) + 1;
    throw refusal([
      {
        pointer: "#",
        detail: `has a quote in row ${row} that is not closed or not followed by a delimiter.`,
      },
    ]);
  }
  const header = data[0] ?? [];
  const rows = data.slice(1);
  while (rows.length > 0 && isEmptyRow(rows[rows.length - 1])) rows.pop();
  const items = rows.reduce((count, row) => count + (isEmptyRow(row) ? 0 : 1), 0);
  if (items > MOST_ITEMS)
    throw tooManyItems(`The table has more than ${MOST_ITEMS.toLocaleString("en")} rows`);
  if (data.length > MOST_LINES) {
    throw tooManyItems(`The table has more than ${MOST_LINES.toLocaleString("en")} lines`);
  }
  const columns = readHeader(header, rows);
  return { header, columns, rows, delimiter, marked };
}

export function isEmptyRow(row: readonly string[]): boolean {
  return row.every((cell) => cell.trim() === "");
}

/** The delimiter that the first line has most of, outside quotes. */
function delimiterOf(content: string): string {
  const end = content.search(/[\r\n]/);
  const line = (end < 0 ? content : content.slice(0, end)).slice(0, 20_000).replace(/"[^"]*"/g, "");
  const counts = DELIMITERS.map((delimiter) => line.split(delimiter).length);
  return DELIMITERS[counts.indexOf(Math.max(...counts))];
}

function readHeader(header: readonly string[], rows: readonly (readonly string[])[]): readonly Column[] {
  const complaints: Complaint[] = [];
  const seen = new Map<string, number>();
  const columns = header.map((cell, index): Column => {
    const pointer = `#/header/${index}`;
    const column = readHeaderCell(cell);
    if ("complaint" in column) {
      complaints.push({ pointer, detail: column.complaint });
      return { role: "blank" };
    }
    if (column.role === "blank" && rows.some((row) => (row[index] ?? "").trim() !== "")) {
      complaints.push({ pointer, detail: `Column ${index + 1} has values but no name.` });
    }
    if (column.role === "row" || column.role === "input") {
      const first = seen.get(column.name);
      if (first !== undefined) {
        const detail = `names ${column.name} again; column ${first + 1} has it already.`;
        complaints.push({ pointer, detail });
      } else seen.set(column.name, index);
    }
    return column;
  });
  if (!seen.has("shape")) {
    complaints.unshift({ pointer: "#/header", detail: "has no column named shape; each row needs one." });
  }
  if (complaints.length > 0) throw refusal(complaints.slice(0, 50));
  return columns;
}

/** A 422 of the table as a whole. */
function refusal(errors: readonly Complaint[]): Refusal {
  const [first] = errors;
  const place = "pointer" in first && first.pointer === "#" ? "The table" : "The header:";
  const more = errors.length > 1 ? ` (and ${errors.length - 1} more)` : "";
  return new Refusal("invalid-input", `${place} ${first.detail}${more}`, { errors });
}
