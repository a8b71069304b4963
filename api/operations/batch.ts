import { z } from "zod";
import { type Refusal } from "@/lib/service/refusal";
import { RESULT_COLUMNS } from "../batch/columns";
import { BATCH_MAX_BYTES, itemsOf } from "../batch/items";
import type { ItemOutcome } from "../batch/outcome";
import { type CsvTable, isEmptyRow, readCsv } from "../batch/read-csv";
import { RowReader } from "../batch/row-request";
import { type BatchPlan, batchStream, type BatchStep } from "../batch/stream";
import { csvLine, CsvWriter, resultCells } from "../batch/write-csv";
import { negotiate } from "../negotiate";
import { bodyRefusal } from "../body";
import { defineOperation } from "../operation";
import { computationsOf } from "./resistance";
import { batchAnswer, csvTable, documentedBatch } from "../schemas/batch";

const JSON_TYPE = "application/json";
const CSV_TYPE = "text/csv";
const OPERATION = "computeBatch";

/** A body that came as a table. */
class UploadedTable {
  readonly items: number;

  constructor(readonly table: CsvTable) {
    this.items = table.rows.reduce((count, row) => count + (isEmptyRow(row) ? 0 : 1), 0);
  }
}

const batchSchema = z.unknown();

/** Computations that a body costs if all of it is answered. */
function reservationOf(body: unknown): number {
  if (body instanceof UploadedTable) return body.items;
  return itemsOf(body).reduce((sum: number, item) => sum + computationsOf(item), 0);
}

/** The requests of a body, each with its row where it came as a table. */
function* requestsOf(
  body: unknown,
): Generator<{ readonly row: readonly string[]; readonly step: Requested }> {
  if (!(body instanceof UploadedTable)) {
    for (const request of itemsOf(body)) {
      yield { row: [], step: { kind: "item", request, cost: computationsOf(request) } };
    }
    return;
  }
  const reader = new RowReader(body.table.columns);
  for (const row of body.table.rows) {
    if (isEmptyRow(row)) {
      yield { row, step: { kind: "empty" } };
      continue;
    }
    const read = reader.request(row);
    yield "body" in read
      ? { row, step: { kind: "item", request: read.body, cost: 1 } }
      : { row, step: { kind: "refused", error: bodyRefusal([{ pointer: "#", detail: read.complaint }]) } };
  }
}

type Requested =
  | { readonly kind: "item"; readonly request: unknown; readonly cost: number }
  | { readonly kind: "refused"; readonly error: Refusal }
  | { readonly kind: "empty" };

function jsonPlan(body: unknown): BatchPlan {
  const write = (outcome: ItemOutcome) => `${outcome.index === 0 ? "" : ",\n"}${JSON.stringify(outcome)}`;
  function* steps(): Generator<BatchStep> {
    for (const { step } of requestsOf(body)) if (step.kind !== "empty") yield { ...step, write };
  }
  return {
    operation: OPERATION,
    reserved: reservationOf(body),
    open: '{"items":[\n',
    steps: steps(),
    close: (counts) => `\n],"counts":${JSON.stringify(counts)}}\n`,
  };
}

function csvPlan(body: unknown): BatchPlan {
  const writer = body instanceof UploadedTable ? new CsvWriter(body.table) : undefined;
  function* steps(): Generator<BatchStep> {
    for (const { row, step } of requestsOf(body)) {
      if (step.kind === "empty") yield { kind: "text", text: writer?.row(row, null) ?? "" };
      else {
        const write = (outcome: ItemOutcome) =>
          writer?.row(row, outcome) ?? csvLine([String(outcome.index), ...resultCells(outcome)]);
        yield { ...step, write };
      }
    }
  }
  return {
    operation: OPERATION,
    reserved: reservationOf(body),
    open: writer?.header() ?? csvLine(["index", ...RESULT_COLUMNS]),
    steps: steps(),
    close: () => "",
  };
}

const TABLE = [
  "shape,length,width/mm,thickness/mm,material,temperature,label",
  "bar,1.2 m,50,10,copper-annealed,75,Riser",
  "bar,1.2 m,50,10 kg,copper-annealed,75,Misread",
  "sheet-strip,40 mm,2,,copper-annealed,20,Track",
  "",
].join("\r\n");

const bar = (width: string) => ({
  shape: "bar",
  dimensions: { length: "1.2 m", width, thickness: "10 mm" },
  medium: { material: "copper-annealed" },
  include: [],
});

export const postBatch = defineOperation({
  id: OPERATION,
  method: "POST",
  path: "/resistance/batch",
  tag: "Resistance",
  summary: "Compute up to 10,000 resistances",
  description:
    "Each item is answered or refused on its own, in order, as `POST /resistance` would; only `record` is not for batches. Answers stream out as they are ready. As `text/csv` a row is a request: columns `shape`, the dimensions by name, `material`, `resistivity`, `conductivity`, `sheetResistance`, `thickness`, `core.material` and the like, `temperature`, `voltage`, `current`, `power`, `label`; a unit stands in the cell or in the header (`width/mm`); comma, semicolon or tab separates. Numbers have decimal points, whatever separates. The answer has the same rows and columns and behind them what came out. A cell that a spreadsheet would take for a formula gets an apostrophe in front. A table is answered as a table and JSON as JSON, unless `Accept` or `format` says otherwise. Each answered item costs what it would by itself, as a rule one computation; what all of them would cost is reserved before the work, and what was not needed is given back. Where the time of a batch is over, the items that are left are told with status 503.",
  scope: "compute",
  produces: [JSON_TYPE, CSV_TYPE],
  request: {
    body: {
      description: "What to compute.",
      // Items are checked one by one, when their turn comes.
      schema: batchSchema,
      documented: documentedBatch,
      maxBytes: BATCH_MAX_BYTES,
      others: {
        [CSV_TYPE]: {
          description: "A table with a header; a row is a request.",
          documented: csvTable,
          read: (text) => new UploadedTable(readCsv(text, text.startsWith("\uFEFF"))),
        },
      },
    },
  },
  responses: {
    200: {
      description: "Every item, answered or refused.",
      content: {
        [JSON_TYPE]: batchAnswer,
        [CSV_TYPE]: csvTable.meta({ description: "The table with what came out behind each row." }),
      },
    },
  },
  errors: [],
  examples: [
    {
      name: "twoWidths",
      summary: "One item answered, one refused",
      status: 200,
      body: { items: [bar("50 mm"), bar("50 kg")] },
    },
    {
      name: "table",
      summary: "A table in, a table out",
      status: 200,
      mediaType: CSV_TYPE,
      accept: CSV_TYPE,
      body: TABLE,
    },
    {
      name: "wrongHeader",
      summary: "A column that does not exist",
      status: 422,
      mediaType: CSV_TYPE,
      body: "shape,lenght,width\r\nbar,1 m,50 mm\r\n",
    },
  ],
  reserve: ({ body }) => reservationOf(body),
  handler: ({ body }, context) => {
    const fromTable = body instanceof UploadedTable;
    const accepts = fromTable
      ? negotiate([CSV_TYPE, JSON_TYPE], context.headers, context.url.searchParams)
      : context.accepts;
    const plan = accepts === CSV_TYPE ? csvPlan(body) : jsonPlan(body);
    return {
      status: 200,
      content: {
        kind: "stream",
        stream: batchStream(plan, context),
        mediaType: accepts === CSV_TYPE ? `${CSV_TYPE}; charset=utf-8` : `${JSON_TYPE}; charset=utf-8`,
      },
      held: plan.reserved,
    };
  },
});
