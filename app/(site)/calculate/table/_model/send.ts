/** A table to the text that the API computes, and its answer, line by line, back to the rows. */
import { defused } from "@/api/batch/defuse";
import { readTyped } from "../../../../_ui/quantity/read-typed";
import { type Column, isEmpty, type Row, type Table } from "./table";
import type { Vocabulary } from "./vocabulary";

/** What came out for a row. */
export type Outcome =
  | {
      readonly ok: true;
      readonly value: number;
      readonly lower: number;
      readonly upper: number;
      readonly text: string;
    }
  | {
      readonly ok: false;
      readonly status: number;
      /** Nothing is wrong with it: the time was over before its turn. */
      readonly later: boolean;
      /** Complaints by the name of their column. */
      readonly atColumn: Readonly<Record<string, string>>;
      /** Everything in one text. */
      readonly text: string;
    };

export interface Sent {
  readonly body: string;
  /** The rows in the order of their lines. */
  readonly rows: readonly Row[];
  /** The columns that go, by their places in the table. */
  readonly places: readonly number[];
}

/** The rows as a CSV table in the API's own spelling: decimal points, units as the API reads them. */
export async function toSend(table: Table, rows: readonly Row[], vocabulary: Vocabulary): Promise<Sent> {
  const { default: Papa } = await import("papaparse");
  const used = table.columns.flatMap((column, k) => (column.name === "" ? [] : [{ column, k }]));
  const kinds = new Map(vocabulary.columns.map(({ name, kind }) => [name, kind]));
  const full = rows.filter((row) => !isEmpty(row));
  const lines = full.map(({ cells }) =>
    used.map(({ column, k }) => spelled(cells[k] ?? "", kinds.get(column.name) !== null, table.decimalComma)),
  );
  const header = used.map(({ column }) => headerOf(column));
  return {
    body: Papa.unparse([header, ...lines], { newline: "\n" }),
    rows: full,
    places: used.map(({ k }) => k),
  };
}

export function headerOf({ name, unit }: Column): string {
  return unit === "" ? name : `${name}/${unit}`;
}

function spelled(cell: string, measured: boolean, decimalComma: boolean): string {
  const text = cell.trim();
  if (!measured || text === "") return text;
  const typed = readTyped(text, decimalComma);
  if (typed.kind !== "quantity") return text;
  return typed.unit === "" ? typed.number : `${typed.number} ${typed.unit}`;
}

interface Item {
  readonly index: number;
  readonly status: number;
  readonly result?: {
    readonly resistance: {
      readonly value: number;
      readonly lower: number;
      readonly upper: number;
      readonly text: string;
    };
  };
  readonly problem?: {
    readonly detail: string;
    readonly errors?: readonly { readonly pointer?: string; readonly detail: string }[];
  };
}

/** Tells every item of a batch's answer as its line arrives. */
export async function readItems(response: Response, tell: (items: readonly Item[]) => void): Promise<void> {
  if (!response.body) return;
  const reader = response.body.pipeThrough(new TextDecoderStream()).getReader();
  let rest = "";
  for (;;) {
    const { done, value } = await reader.read();
    const lines = (rest + (value ?? "")).split("\n");
    rest = done ? "" : (lines.pop() ?? "");
    const items = lines.filter((line) => line.startsWith('{"index":')).map(itemOf);
    if (items.length > 0) tell(items);
    if (done) return;
  }
}

function itemOf(line: string): Item {
  // Written by the API of this very service, one item a line.
  return JSON.parse(line.replace(/,$/, "")) as Item;
}

export function outcomeOf({ status, result, problem }: Item): Outcome {
  if (result) return { ok: true, ...result.resistance };
  const errors = problem?.errors ?? [];
  const atColumn: Record<string, string> = {};
  for (const { pointer, detail } of errors) atColumn[columnOf(pointer ?? "#")] ??= detail;
  const text = errors.map(({ pointer, detail }) => `${columnOf(pointer ?? "#")} ${detail}`.trim()).join(" ");
  return {
    ok: false,
    status,
    later: status === 503,
    atColumn,
    text: text || (problem?.detail ?? "was refused."),
  };
}

/** `#/media/core/material` as the column `core.material`. */
function columnOf(pointer: string): string {
  const [place = "", ...path] = pointer.slice(2).split("/");
  return place === "media" ? path.join(".") : (path[0] ?? place);
}

/** The whole table with what came out, for a spreadsheet: decimal mark and cells parted as in the table itself. */
export async function toDownload(table: Table, outcomes: ReadonlyMap<Row, Outcome>): Promise<string> {
  const { default: Papa } = await import("papaparse");
  const titles = table.columns.map((column) => (column.name === "" ? column.title : headerOf(column)));
  const lines = table.rows.map((row) => {
    const own = table.columns.map((_, k) => safe(row.cells[k] ?? "", table.decimalComma));
    return [...own, ...resultCells(outcomes.get(row), table.decimalComma)];
  });
  const header = [...titles.map(defused), ...RESULT_HEADER];
  const delimiter = table.decimalComma && table.delimiter === "," ? ";" : table.delimiter;
  return `\uFEFF${Papa.unparse([header, ...lines], { delimiter, newline: "\r\n" })}\r\n`;
}

/** No cell is a formula; a negative number with a decimal comma is as harmless as one with a point. */
function safe(cell: string, decimalComma: boolean): string {
  const pointed = decimalComma ? cell.replace(/(\d),(?=\d)/, "$1.") : cell;
  return defused(pointed) === pointed ? cell : defused(cell);
}

/** The columns that the API's own answer adds. */
const RESULT_HEADER = ["resistance/ohm", "lower/ohm", "upper/ohm", "text", "status", "problem"];

function resultCells(outcome: Outcome | undefined, decimalComma: boolean): readonly string[] {
  if (!outcome) return RESULT_HEADER.map(() => "");
  if (!outcome.ok) return ["", "", "", "", String(outcome.status), defused(outcome.text)];
  const { value, lower, upper, text } = outcome;
  const cells = [...[value, lower, upper].map(String), text];
  return [...(decimalComma ? cells.map((cell) => cell.replace(".", ",")) : cells), "200", ""];
}
