"use client";

import { type ClipboardEvent, type ReactNode, useCallback, useMemo, useState } from "react";
import { Plus } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { FileButton } from "../../../../_ui/file-button";
import { LiveRegion } from "../../../../_ui/live-region";
import { Notice } from "../../../../_ui/notice";
import { Segmented } from "../../../../_ui/segmented";
import { Select } from "../../../../_ui/select";
import { ToastArea, useToast } from "../../../../_ui/toast";
import { Toggle } from "../../../../_ui/toggle";
import { importText, MOST_ROWS } from "../_model/import-text";
import { toDownload } from "../_model/send";
import {
  isEmpty,
  newRow,
  startTable,
  type Table,
  withCell,
  withColumn,
  withNewColumn,
  withoutColumn,
} from "../_model/table";
import type { Vocabulary } from "../_model/vocabulary";
import { ColumnHead } from "./column-head";
import { count, RunBar } from "./run-bar";
import { TableRow } from "./table-row";
import { useRun } from "./use-run";
import { useTable } from "./use-table";

interface TablePageProps {
  readonly vocabulary: Vocabulary;
  /** Shape that the address asks for. */
  readonly shape: string | null;
  readonly heading: ReactNode;
}

const PAGE_ROWS = 50;

/** Many resistances at once: rows that are typed, pasted or uploaded, and what comes out of each. */
export function TablePage(props: TablePageProps) {
  return (
    <ToastArea>
      <LiveTable {...props} />
    </ToastArea>
  );
}

function LiveTable({ vocabulary, shape, heading }: TablePageProps) {
  const [start] = useState(() => startTable(vocabulary, shape ?? "bar"));
  const { table, edit } = useTable(start, shape !== null);
  const { outcomes, run, start: compute, stop, forget, forgetAll } = useRun(vocabulary);
  const [chosen, setChosen] = useState(shape ?? "bar");
  const [page, setPage] = useState(0);
  const [refusedOnly, setRefusedOnly] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);
  const toast = useToast();

  const { columns, rows } = table;
  const taken = useMemo(() => new Set(columns.map(({ name }) => name)), [columns]);
  const full = useMemo(() => rows.filter((row) => !isEmpty(row)), [rows]);
  const open = useMemo(() => full.filter(({ id }) => !outcomes.get(id)?.ok), [full, outcomes]);
  const refused = useMemo(
    () => rows.filter(({ id }) => outcomes.get(id)?.ok === false).length,
    [rows, outcomes],
  );
  const numbered = rows.map((row, k) => ({ row, number: k + 1 }));
  const shown = refusedOnly ? numbered.filter(({ row }) => outcomes.get(row.id)?.ok === false) : numbered;
  const pages = Math.max(1, Math.ceil(shown.length / PAGE_ROWS));
  const at = Math.min(page, pages - 1);

  function put(next: Table, said: string) {
    const before = table;
    const show = (other: Table) => {
      edit(() => other);
      forgetAll();
      setPage(0);
      setRefusedOnly(false);
    };
    show(next);
    toast(said, { undo: () => show(before) });
  }

  async function take(text: string) {
    const found = await importText(text, table, vocabulary);
    if (!found.ok) return setTrouble(found.reason);
    setTrouble(
      found.cut > 0
        ? `The first ${MOST_ROWS.toLocaleString("en")} rows are here; ${found.cut.toLocaleString("en")} more are left out.`
        : found.unknown > 0
          ? `${found.unknown === 1 ? "One column is" : `${found.unknown} columns are`} left out because their names are not known here. Say in their heads what they are.`
          : null,
    );
    put(found.table, `${count(found.table.rows.length, "row")} taken.`);
  }

  function onPaste(event: ClipboardEvent) {
    const text = event.clipboardData.getData("text/plain");
    if (!/[\t\n]/.test(text.trim())) return;
    event.preventDefault();
    void take(text);
  }

  const onCell = useCallback(
    (id: number, column: number, text: string) => {
      edit((now) => withCell(now, id, column, text));
      forget(id);
    },
    [edit, forget],
  );
  const onRemove = useCallback(
    (id: number) => edit((now) => ({ ...now, rows: now.rows.filter((row) => row.id !== id) })),
    [edit],
  );
  async function save() {
    const blob = new Blob([await toDownload(table, outcomes)], { type: "text/csv;charset=utf-8" });
    const link = document.createElement("a");
    link.href = URL.createObjectURL(blob);
    link.download = "resistances.csv";
    link.click();
    setTimeout(() => URL.revokeObjectURL(link.href), 1000);
  }

  return (
    <div onPaste={onPaste}>
      {heading}
      <div className="mt-3 flex flex-wrap items-end gap-x-2 gap-y-1">
        <Select
          label="Start with the columns of"
          value={chosen}
          options={vocabulary.shapes.map(({ id, title }) => ({ value: id, label: title }))}
          onChange={(event) => setChosen(event.target.value)}
          className="w-full narrow:w-32"
        />
        <div className="flex flex-wrap gap-1 pb-3">
          <Button
            onClick={() =>
              put(startTable(vocabulary, chosen), "The example of the shape stands in the table.")
            }
          >
            Use them
          </Button>
          <a
            href={`/calculate/table/template?shape=${chosen}`}
            download
            className="inline-flex min-h-5.5 items-center rounded px-1 text-table link medium:min-h-5"
          >
            CSV template
          </a>
          <FileButton
            label="Upload CSV"
            accept=".csv,.tsv,.txt,text/csv"
            onText={(text) => void take(text)}
          />
        </div>
        <Segmented
          label="Numbers are written"
          value={table.decimalComma ? "comma" : "point"}
          options={[
            { value: "point", label: "0.5" },
            { value: "comma", label: "0,5" },
          ]}
          onChange={(value) => {
            edit((now) => ({ ...now, decimalComma: value === "comma" }));
            forgetAll();
          }}
          className="pb-3"
        />
      </div>
      <p className="mb-1 max-w-prose text-table text-ink-soft">
        Rows can also be pasted from a spreadsheet, with or without their header. Each row needs its shape; a
        table may mix shapes.
      </p>
      {trouble ? (
        <div className="mb-2">
          <Notice tone="caution" title="About the rows that came in">
            {trouble}
          </Notice>
        </div>
      ) : null}
      <datalist id="shapes">
        {vocabulary.shapes.map(({ id, title }) => (
          <option key={id} value={id}>
            {title}
          </option>
        ))}
      </datalist>
      <datalist id="materials">
        {vocabulary.materials.map((id) => (
          <option key={id} value={id} />
        ))}
      </datalist>
      <div
        role="group"
        tabIndex={0}
        aria-label="The table"
        className="relative overflow-x-auto rounded border border-rule bg-sheet text-table"
      >
        <table className="w-full border-collapse">
          <caption className="sr-only">Requests, one a row, and what came out</caption>
          <thead>
            <tr>
              <th scope="col" className="px-1 text-end align-top font-normal text-ink-soft">
                <span className="sr-only">Row</span>
              </th>
              {columns.map((column, k) => (
                <ColumnHead
                  key={k}
                  column={column}
                  place={k}
                  choices={vocabulary.columns}
                  taken={taken}
                  onChange={(change) => {
                    edit((now) => withColumn(now, k, change));
                    forgetAll();
                  }}
                  onRemove={() => {
                    edit((now) => withoutColumn(now, k));
                    forgetAll();
                  }}
                />
              ))}
              <th scope="col" className="px-1 py-1 text-start align-top font-medium">
                Resistance
              </th>
              <th scope="col" className="sticky end-0 bg-sheet py-0.5 pe-0.5 text-end align-top">
                <button
                  type="button"
                  aria-label="Add a column"
                  title="Add a column"
                  onClick={() => edit((now) => withNewColumn(now, ""))}
                  className="grid size-5.5 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink medium:size-3.5"
                >
                  <Plus aria-hidden size={16} />
                </button>
              </th>
            </tr>
          </thead>
          <tbody>
            {shown.slice(at * PAGE_ROWS, (at + 1) * PAGE_ROWS).map(({ row, number }) => (
              <TableRow
                key={row.id}
                row={row}
                number={number}
                columns={columns}
                outcome={outcomes.get(row.id)}
                listOf={listOf}
                onCell={onCell}
                onRemove={onRemove}
              />
            ))}
            {shown.length === 0 ? (
              <tr className="border-t border-rule">
                <td colSpan={columns.length + 3} className="px-2 py-3 text-center text-ink-soft">
                  {refusedOnly ? "No row is refused." : "No rows yet. Add one, paste some or upload a file."}
                </td>
              </tr>
            ) : null}
          </tbody>
        </table>
      </div>
      <div className="mt-1 flex flex-wrap items-center gap-1">
        <Button
          disabled={rows.length >= MOST_ROWS}
          onClick={() => {
            const last = rows.at(-1);
            edit((now) => ({ ...now, rows: [...now.rows, newRow(last?.cells ?? [])] }));
            setRefusedOnly(false);
            setPage(Math.floor(rows.length / PAGE_ROWS));
          }}
        >
          <Plus aria-hidden size={16} /> Add a row
        </Button>
        {pages > 1 ? (
          <span className="flex items-center gap-1 text-table">
            <Button variant="quiet" disabled={at === 0} onClick={() => setPage(at - 1)}>
              Before
            </Button>
            Rows {(at * PAGE_ROWS + 1).toLocaleString("en")} to{" "}
            {Math.min(shown.length, (at + 1) * PAGE_ROWS).toLocaleString("en")} of{" "}
            {shown.length.toLocaleString("en")}
            <Button variant="quiet" disabled={at === pages - 1} onClick={() => setPage(at + 1)}>
              Next
            </Button>
          </span>
        ) : null}
        {refused > 0 ? (
          <Toggle
            label={`Only the ${refused.toLocaleString("en")} refused`}
            checked={refusedOnly}
            onChange={setRefusedOnly}
          />
        ) : null}
      </div>
      <RunBar
        run={run}
        full={full.length}
        open={open.length}
        refused={refused}
        onStart={() => void compute(table, open)}
        onStop={stop}
        onSave={() => void save()}
      />
      <LiveRegion
        text={
          run.sent > 0 && !run.busy
            ? `${count(full.length - open.length, "row")} answered, ${refused} refused.`
            : ""
        }
      />
    </div>
  );
}

/** The list of choices that a column's cells offer. */
function listOf(name: string): string | undefined {
  if (name === "shape") return "shapes";
  return name === "material" || name.endsWith(".material") ? "materials" : undefined;
}
