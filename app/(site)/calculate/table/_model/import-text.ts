/** Rows that are pasted or come from a file: CSV with commas or semicolons, or the tabs of a spreadsheet's clipboard. */
import { suggestion } from "@/lib/engine/shape/nearest-names";
import { type Column, type Delimiter, newRow, readTitle, type Row, type Table } from "./table";
import { likelyShape, type Vocabulary } from "./vocabulary";

/** Most rows of one table, as the API takes them. */
export const MOST_ROWS = 10_000;
/** Most lines that are read, empty ones among them. */
const MOST_LINES = 30_000;
/** So many remarks of a kind are told one by one. */
const TOLD = 4;

const RESULTS = /^(resistance\/ohm|lower\/ohm|upper\/ohm|text|status|problem)$/;
const DELIMITERS: readonly Delimiter[] = ["\t", ";", ","];

export type Import =
  | {
      readonly ok: true;
      readonly table: Table;
      /** Whether its first row named the columns. */
      readonly headed: boolean;
      /** Whether it says the shape of its rows. */
      readonly shaped: boolean;
      /** Where the shape is missing: the one that its columns fit best. */
      readonly likely: string | null;
      /** What the reader should know of it. */
      readonly notes: readonly string[];
    }
  | { readonly ok: false; readonly reason: string };

/**
 * Reads a text into a table. Without a header the columns of the table that is there are taken, in their order.
 * @param before The table that is there.
 */
export async function importText(text: string, before: Table, vocabulary: Vocabulary): Promise<Import> {
  const { default: Papa } = await import("papaparse");
  const content = text.replace(/^\uFEFF/, "");
  if (content.trim() === "") return refused("There is nothing in it.");
  const delimiter = delimiterOf(content);
  const { data, errors } = Papa.parse<string[]>(content, { delimiter, preview: MOST_LINES });
  const quotes = errors.find(({ type }) => type === "Quotes");
  if (quotes) {
    return refused(
      `Row ${(quotes.row ?? 0) + 1} has a quote that is not closed or not followed by a new cell.`,
    );
  }
  const lines = data.map((cells, k) => ({ cells, line: k + 1 }));
  while (lines.length > 0 && isBlank(lines[lines.length - 1].cells)) lines.pop();
  const filled = lines.filter(({ cells }) => !isBlank(cells));
  const [first] = filled;
  const readings = first.cells.map((title) => readTitle(title, vocabulary));
  const headed = isHeader(first.cells, readings, vocabulary);
  const rowLines = headed ? filled.slice(1) : filled;
  if (rowLines.length > MOST_ROWS || data.length === MOST_LINES) {
    return refused("It has more than 10,000 rows, and a table takes no more. Split it.");
  }
  if (headed && readings.every((reading) => reading === null)) {
    return refused(`No column of it is known here. ${unknownTexts(first.cells, vocabulary).join(" ")}`);
  }
  if (rowLines.length === 0) return refused("There is a header and no row below it.");
  const kept = first.cells.flatMap((title, k) => (headed && RESULTS.test(title.trim()) ? [] : [k]));
  const wide = headed ? rowLines.find(({ cells }) => !isBlank(cells.slice(first.cells.length))) : undefined;
  if (wide) {
    const comma = delimiter === "," ? " Where commas are decimal marks, cells are parted by semicolons." : "";
    return refused(
      `Row ${wide.line} has ${wide.cells.length} cells where the header names ${first.cells.length} columns.${comma}`,
    );
  }
  const columns = headed
    ? namedOnce(
        kept.map((k): Column => ({
          ...(readings[k] ?? { name: "", unit: "" }),
          title: first.cells[k].trim(),
        })),
      )
    : widened(before.columns, Math.max(...rowLines.map(({ cells }) => cells.length)));
  const rows = rowLines.map(({ cells }): Row => newRow(headed ? kept.map((k) => cells[k] ?? "") : cells));
  const place = columns.findIndex(({ name }) => name === "shape");
  const known = new Set(vocabulary.shapes.map(({ id }) => id));
  const shaped = headed ? place >= 0 : rows.some(({ cells }) => known.has(cells[place]?.trim() ?? ""));
  return {
    ok: true,
    table: { columns, rows, decimalComma: writesComma(rows, delimiter, before), delimiter },
    headed,
    shaped,
    likely: headed && !shaped ? likelyShape(columns, vocabulary) : null,
    notes: [
      ...(headed ? leftOut(columns, vocabulary) : []),
      ...(lines.length > filled.length ? [emptyText(lines.length - filled.length)] : []),
    ],
  };
}

function refused(reason: string): Import {
  return { ok: false, reason };
}

function isBlank(cells: readonly string[]): boolean {
  return cells.every((cell) => cell.trim() === "");
}

/** A first row names the columns unless something in it is a number or a shape. */
function isHeader(cells: readonly string[], readings: readonly unknown[], { shapes }: Vocabulary): boolean {
  if (cells.some((cell) => /^\s*[+-]?[.,]?\d/.test(cell))) return false;
  if (readings.some((reading) => reading !== null)) return true;
  return !cells.some((cell) => shapes.some(({ id }) => id === cell.trim()));
}

/** A name that comes again stands for nothing the second time. */
function namedOnce(columns: readonly Column[]): readonly Column[] {
  const seen = new Set<string>();
  return columns.map((column) => {
    if (!seen.has(column.name)) {
      seen.add(column.name);
      return column;
    }
    return { name: "", unit: "", title: column.title };
  });
}

function leftOut(columns: readonly Column[], vocabulary: Vocabulary): readonly string[] {
  const out = columns.filter(({ name, title }) => name === "" && title !== "");
  if (out.length === 0) return [];
  const told =
    out.length === 1
      ? "One column is left out until its head says what it is."
      : `${out.length} columns are left out until their heads say what they are.`;
  const why = unknownTexts(
    out.map(({ title }) => title),
    vocabulary,
  );
  return [`${told} ${why.join(" ")}`];
}

function unknownTexts(titles: readonly string[], vocabulary: Vocabulary): readonly string[] {
  const names = vocabulary.columns.map(({ name }) => name);
  const shown = titles.filter((title) => title.trim() !== "");
  const texts = shown.slice(0, TOLD).map((title) => {
    const short = title.trim().length > 40 ? `${title.trim().slice(0, 40)}…` : title.trim();
    const known = readTitle(title, vocabulary);
    if (known) return `“${short}” names ${known.name} again.`;
    return `“${short}” is not known.${suggestion(title.split(/[/[(]/)[0].trim(), names)}`;
  });
  return shown.length > TOLD ? [...texts, `${shown.length - TOLD} more are not known.`] : texts;
}

function emptyText(count: number): string {
  return count === 1
    ? "One empty row between the others is left out."
    : `${count.toLocaleString("en")} empty rows between the others are left out.`;
}

function delimiterOf(content: string): Delimiter {
  const line = content
    .trimStart()
    .slice(0, 20_000)
    .split(/[\r\n]/, 1)[0]
    .replace(/"[^"]*"/g, "");
  const counts = DELIMITERS.map((delimiter) => line.split(delimiter).length);
  return DELIMITERS[counts.indexOf(Math.max(...counts))];
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
function writesComma(rows: readonly Row[], delimiter: Delimiter, before: Table): boolean {
  if (delimiter === ",") return false;
  let commas = 0;
  let points = 0;
  for (const { cells } of rows.slice(0, 200)) {
    for (const cell of cells) {
      if (/^[+-]?\d*,\d+/.test(cell.trim())) commas++;
      if (/^[+-]?\d*\.\d+/.test(cell.trim())) points++;
    }
  }
  return commas === points ? before.decimalComma : commas > points;
}
