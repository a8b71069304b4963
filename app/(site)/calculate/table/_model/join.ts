/** New rows beside those that are there: below them, or from one cell on. */
import { BASE_UNITS, type UnitKind } from "../../../../_ui/quantity/units";
import { readTyped } from "../../../../_ui/quantity/read-typed";
import { MOST_ROWS } from "./import-text";
import { type Column, newRow, type Row, type Table } from "./table";
import type { Vocabulary } from "./vocabulary";

export type Joined =
  { readonly ok: true; readonly table: Table } | { readonly ok: false; readonly reason: string };

/** The rows of `more` below those of `before`; columns of one name become one, with the unit in the cell where it differs. */
export function below(before: Table, more: Table, vocabulary: Vocabulary): Joined {
  const columns: Column[] = [...before.columns];
  const places = more.columns.map((column) => {
    const same = columns.findIndex(({ name, title }) =>
      column.name === "" ? name === "" && title === column.title : name === column.name,
    );
    return same >= 0 ? same : columns.push(column) - 1;
  });
  const rows = more.rows.map(({ cells }) => {
    const placed = columns.map(() => "");
    places.forEach((place, k) => {
      const spelled = respelled(cells[k] ?? "", more, before, measures(columns[place], vocabulary));
      placed[place] = withUnit(spelled, more.columns[k], columns[place], vocabulary);
    });
    return newRow(placed);
  });
  return limited({ ...before, columns, rows: [...before.rows, ...rows] });
}

/** The cells of `more` over those of `before`, from a row and a column on. */
export function from(
  before: Table,
  more: Table,
  row: number,
  column: number,
  vocabulary: Vocabulary,
): Joined {
  const width = Math.max(...more.rows.map(({ cells }) => cells.length));
  const columns = [...before.columns];
  while (columns.length < column + width) columns.push({ name: "", unit: "", title: "" });
  const rows: Row[] = [...before.rows];
  more.rows.forEach(({ cells }, k) => {
    const filled = columns.map((_, c) => rows[row + k]?.cells[c] ?? "");
    cells.forEach((cell, c) => {
      const place = column + c;
      filled[place] = respelled(cell, more, before, measures(columns[place], vocabulary));
    });
    rows[row + k] = newRow(filled);
  });
  return limited({ ...before, columns, rows });
}

function limited(table: Table): Joined {
  if (table.rows.length <= MOST_ROWS) return { ok: true, table };
  const count = table.rows.length.toLocaleString("en");
  return { ok: false, reason: `Together they are ${count} rows; a table takes at most 10,000.` };
}

function kindOf({ name }: Column, { columns }: Vocabulary): UnitKind | null {
  return columns.find((column) => column.name === name)?.kind ?? null;
}

function measures(column: Column, vocabulary: Vocabulary): boolean {
  return kindOf(column, vocabulary) !== null;
}

/** A number in the decimal mark of the table that it goes into. */
function respelled(cell: string, source: Table, target: Table, measured: boolean): string {
  if (!measured || source.decimalComma === target.decimalComma || !/[.,]/.test(cell)) return cell;
  const typed = readTyped(cell, source.decimalComma);
  if (typed.kind !== "quantity") return cell;
  const number = target.decimalComma ? typed.number.replace(".", ",") : typed.number;
  return typed.unit === "" ? number : `${number} ${typed.unit}`;
}

/** A bare number keeps what it was in when its column says another unit. */
function withUnit(cell: string, source: Column, target: Column, vocabulary: Vocabulary): string {
  const kind = kindOf(target, vocabulary);
  if (kind === null || source.unit === target.unit || !BARE_NUMBER.test(cell)) return cell;
  return `${cell.trim()} ${source.unit === "" ? (BASE_UNITS[kind] ?? "") : source.unit}`.trim();
}

const BARE_NUMBER = /^\s*[+-]?[\d.,' ]*\d[\d.,' ]*(?:[eE][+-]?\d+)?\s*$/;
