/** The numbers behind a plot as CSV: SI values in full precision, the unit in each column's head. */
export interface CsvColumn {
  readonly title: string;
  readonly unit: string;
  readonly values: readonly number[];
}

export function csvText(columns: readonly CsvColumn[]): string {
  const head = columns.map(({ title, unit }) => cell(unit === "" ? title : `${title}/${unit}`));
  const count = Math.max(0, ...columns.map(({ values }) => values.length));
  const rows = Array.from({ length: count }, (_, i) => columns.map(({ values }) => number(values[i])));
  return [head, ...rows].map((row) => row.join(",")).join("\r\n") + "\r\n";
}

/** A place without a value, outside of what was measured, is an empty cell. */
function number(value: number | undefined): string {
  return value === undefined || Number.isNaN(value) ? "" : String(value);
}

function cell(text: string): string {
  return /[",\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
