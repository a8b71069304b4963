/** Rows that are pasted or come from a file: CSV with commas or semicolons, or the tabs of a spreadsheet's clipboard. */
import { type Column, newRow, readTitle, type Row, type Table } from "./table";
import type { Vocabulary } from "./vocabulary";

/** Most rows of one table, as the API takes them. */
export const MOST_ROWS = 10_000;

const RESULTS = /^(resistance\/ohm|lower\/ohm|upper\/ohm|text|status|problem)$/;

export type Import =
  | { readonly ok: true; readonly table: Table; readonly unknown: number; readonly cut: number }
  | { readonly ok: false; readonly reason: string };

/**
 * Reads a text into a table. Without a header the columns of the table that is there are taken, in their order.
 * @param before The table that is there.
 */
export async function importText(text: string, before: Table, vocabulary: Vocabulary): Promise<Import> {
  const { default: Papa } = await import("papaparse");
  const content = text.replace(/^\uFEFF/, "");
  if (content.trim() === "") return { ok: false, reason: "There is nothing in it." };
  const delimiter = delimiterOf(content);
  const { data } = Papa.parse<string[]>(content, {
    delimiter,
    preview: MOST_ROWS + 2,
    skipEmptyLines: "greedy",
  });
  const [first = [], ...others] = data;
  const readings = first.map((title) => readTitle(title, vocabulary));
  const titled =
    readings.some((reading) => reading !== null) && !first.some((cell) => /^\s*[+-]?\d/.test(cell));
  const kept = first.flatMap((title, k) => (titled && RESULTS.test(title.trim()) ? [] : [k]));
  const columns = titled
    ? kept.map((k): Column => ({ ...(readings[k] ?? { name: "", unit: "" }), title: first[k].trim() }))
    : widened(before.columns, first.length);
  const cells = titled ? others : data;
  const rows = cells
    .slice(0, MOST_ROWS)
    .map((row): Row => newRow(titled ? kept.map((k) => row[k] ?? "") : row));
  if (rows.length === 0) return { ok: false, reason: "There is a header and no row below it." };
  return {
    ok: true,
    table: { columns, rows, decimalComma: writesComma(rows, delimiter) },
    unknown: columns.filter(({ name }) => name === "").length,
    cut: Math.max(0, cells.length - MOST_ROWS),
  };
}

function delimiterOf(content: string): string {
  const line = content
    .slice(0, 20_000)
    .split(/[\r\n]/, 1)[0]
    .replace(/"[^"]*"/g, "");
  const counts = ["\t", ";", ","].map((delimiter) => line.split(delimiter).length);
  return ["\t", ";", ","][counts.indexOf(Math.max(...counts))];
}

function widened(columns: readonly Column[], width: number): readonly Column[] {
  const more = Array.from({ length: Math.max(0, width - columns.length) }, () => ({
    name: "",
    unit: "",
    title: "",
  }));
  return [...columns, ...more];
}

/** Where nothing else parts digits from digits, a comma between them is a decimal one. */
function writesComma(rows: readonly Row[], delimiter: string): boolean {
  if (delimiter === ",") return false;
  let commas = 0;
  let points = 0;
  for (const { cells } of rows.slice(0, 200)) {
    for (const cell of cells) {
      if (/^[+-]?\d*,\d+/.test(cell.trim())) commas++;
      if (/^[+-]?\d*\.\d+/.test(cell.trim())) points++;
    }
  }
  return commas > points;
}
