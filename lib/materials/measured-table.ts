import Papa from "papaparse";
import { type QuantityKindName, readQuantity, type ResistivityModel } from "@/lib/engine";
import { type Complaint, Refusal } from "../service/refusal";

const COLUMNS: Readonly<Record<string, QuantityKindName>> = {
  temperature: "temperature",
  resistivity: "resistivity",
  conductivity: "conductivity",
};

/** Most rows of a measured table, as the engine's table model has it. */
const MOST_ROWS = 10_000;

interface Column {
  readonly name: string;
  /** Unit from a header such as `temperature/degC`. */
  readonly unit: string | undefined;
  readonly kind: QuantityKindName;
}

export interface MeasuredTable {
  readonly resistivity: ResistivityModel;
  readonly range: { readonly from: number; readonly to: number };
}

/**
 * Reads a table of measurements: a header `temperature/degC,resistivity/ohm m` (or conductivity), then a row a
 * measurement, in any order. A unit stands in the header or in each cell. Throws a Refusal that names rows and columns.
 */
export function readMeasuredTable(text: string): MeasuredTable {
  const { data, errors } = Papa.parse<string[]>(text.replace(/^\uFEFF/, ""), {
    skipEmptyLines: "greedy",
    delimiter: ",",
  });
  if (errors.length > 0) {
    throw refusal(errors.slice(0, 20).map(({ row = 0, message }) => at(row, `cannot be read: ${message}.`)));
  }
  const [header, ...rows] = data;
  const columns = readHeader(header);
  if (rows.length < 2)
    throw refusal([{ pointer: "#", detail: "must have at least two rows below its header." }]);
  if (rows.length > MOST_ROWS) {
    throw refusal([{ pointer: "#", detail: `has ${rows.length} rows; at most ${MOST_ROWS} are read.` }]);
  }

  const complaints: Complaint[] = [];
  const cell = (row: string[], index: number, column: Column, line: number): number => {
    const raw = (row[index] ?? "").trim();
    const reading = readQuantity(column.unit && raw !== "" ? `${raw} ${column.unit}` : raw, column.kind);
    if (!reading.ok) complaints.push(at(line, `${column.name} ${reading.detail}`));
    else if (column.kind !== "temperature" && reading.value <= 0) {
      complaints.push(at(line, `${column.name} must be greater than 0.`));
    } else return reading.value;
    return 0;
  };
  const points = rows.map((row, i) => {
    if (row.length !== columns.length) {
      complaints.push(at(i + 1, `has ${row.length} cells, the header ${columns.length}.`));
      return { t: 0, value: 0 };
    }
    const [first, second] = columns.map((column, k) => cell(row, k, column, i + 1));
    return columns[0].kind === "temperature" ? { t: first, value: second } : { t: second, value: first };
  });
  if (complaints.length > 0) throw refusal(complaints.slice(0, 50));

  points.sort((a, b) => a.t - b.t);
  const double = points.find(({ t }, i) => i > 0 && points[i - 1].t === t);
  if (double) throw refusal([{ pointer: "#", detail: `has two rows for ${double.t} °C.` }]);
  const quantity = columns.some(({ kind }) => kind === "conductivity") ? "conductivity" : "resistivity";
  return {
    resistivity: {
      model: "table",
      quantity,
      temperatures: points.map(({ t }) => t),
      values: points.map(({ value }) => value),
      interpolation: "linear",
    },
    range: { from: points[0].t, to: points[points.length - 1].t },
  };
}

function readHeader(header: string[] | undefined): Column[] {
  const columns = (header ?? []).map((title): Column | undefined => {
    const [name, unit] = title.trim().split(/\/(.*)/s);
    const kind = COLUMNS[name.trim().toLowerCase()];
    return kind && { name: name.trim().toLowerCase(), unit: unit?.trim() || undefined, kind };
  });
  const known = columns.filter((column) => column !== undefined);
  const right =
    known.length === 2 &&
    columns.length === 2 &&
    known.filter(({ kind }) => kind === "temperature").length === 1;
  if (right) return known;
  throw refusal([
    {
      pointer: "#",
      detail:
        'must begin with a header of two columns separated by a comma: temperature, and resistivity or conductivity, such as "temperature/degC,resistivity/ohm m".',
    },
  ]);
}

/** Rows count from 1 below the header, as a spreadsheet's reader counts measurements. */
function at(row: number, detail: string): Complaint {
  return { pointer: `#/rows/${row}`, detail };
}

function refusal(errors: readonly Complaint[]): Refusal {
  return new Refusal("invalid-input", "The table cannot be used; errors names the rows.", { errors });
}
