/** A table as the page keeps it: columns with what they stand for, and cells as they were typed. */
import type { Vocabulary } from "./vocabulary";

export interface Column {
  /** Name of the API's column; empty where the column is left out. */
  readonly name: string;
  /** Unit of bare numbers; empty where each cell has its own or SI is meant. */
  readonly unit: string;
  /** As the file named it. */
  readonly title: string;
}

export interface Row {
  readonly id: number;
  readonly cells: readonly string[];
}

/** What parts the cells of a file. */
export type Delimiter = "," | ";" | "\t";

export interface Table {
  readonly columns: readonly Column[];
  readonly rows: readonly Row[];
  /** Whether numbers are written with a decimal comma. */
  readonly decimalComma: boolean;
  /** What parted the cells of the file that it came from, and parts those of its download. */
  readonly delimiter: Delimiter;
}

let lastId = 0;

export function newRow(cells: readonly string[]): Row {
  return { id: ++lastId, cells };
}

/** The table that a shape starts with: its columns and its example. */
export function startTable(vocabulary: Vocabulary, shape: string): Table {
  const choice = vocabulary.shapes.find(({ id }) => id === shape) ?? vocabulary.shapes[0];
  return {
    columns: choice.header.map((name) => ({ name, unit: "", title: name })),
    rows: [newRow(choice.row)],
    decimalComma: false,
    delimiter: ",",
  };
}

export function withCell(table: Table, id: number, column: number, text: string): Table {
  return {
    ...table,
    rows: table.rows.map((row) => {
      if (row.id !== id) return row;
      const cells = table.columns.map((_, k) => row.cells[k] ?? "");
      cells[column] = text;
      return { id, cells };
    }),
  };
}

export function withColumn(table: Table, index: number, change: Partial<Column>): Table {
  return {
    ...table,
    columns: table.columns.map((column, k) => (k === index ? { ...column, ...change } : column)),
  };
}

export function withNewColumn(table: Table, name: string): Table {
  return { ...table, columns: [...table.columns, { name, unit: "", title: name }] };
}

/** A column in front that says the same shape in every row. */
export function withShape(table: Table, shape: string): Table {
  return {
    ...table,
    columns: [{ name: "shape", unit: "", title: "shape" }, ...table.columns],
    rows: table.rows.map(({ cells }) => newRow([shape, ...cells])),
  };
}

export function withoutColumn(table: Table, index: number): Table {
  const drop = <Entry>(list: readonly Entry[]) => list.filter((_, k) => k !== index);
  return {
    ...table,
    columns: drop(table.columns),
    rows: table.rows.map(({ id, cells }) => ({ id, cells: drop(cells) })),
  };
}

export function isEmpty({ cells }: Row): boolean {
  return cells.every((cell) => cell.trim() === "");
}

/** What a header of a file stands for: `width/mm`, `Width [mm]`, `width (mm)` or a bare name; null where unknown. */
export function readTitle(title: string, vocabulary: Vocabulary): Pick<Column, "name" | "unit"> | null {
  const text = title.trim();
  const bracketed = /^(.*?)\s*[[(]\s*([^\])]*)\s*[\])]$/.exec(text);
  const slash = text.indexOf("/");
  const [name, unit] = bracketed
    ? [bracketed[1], bracketed[2]]
    : slash > 0
      ? [text.slice(0, slash), text.slice(slash + 1)]
      : [text, ""];
  const plain = (word: string) => word.toLowerCase().replace(/[\s_-]/g, "");
  const wanted = plain(name);
  if (wanted === "") return null;
  const found =
    vocabulary.columns.find((column) => plain(column.name) === wanted) ??
    vocabulary.columns.find((column) => plain(column.label) === wanted);
  return found ? { name: found.name, unit: unit.trim() } : null;
}
