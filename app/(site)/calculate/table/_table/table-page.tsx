"use client";

import { type ReactNode, useCallback, useMemo, useState } from "react";
import { Plus } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { LiveRegion } from "../../../../_ui/live-region";
import { Notice } from "../../../../_ui/notice";
import { ToastArea, useToast } from "../../../../_ui/toast";
import { Toggle } from "../../../../_ui/toggle";
import { MOST_ROWS } from "../_model/import-text";
import { toDownload } from "../_model/send";
import {
  type Column,
  isEmpty,
  newRow,
  startTable,
  type Table,
  withCell,
  withColumn,
  withNewColumn,
  withoutColumn,
  withShape,
} from "../_model/table";
import type { Vocabulary } from "../_model/vocabulary";
import { progressText, RunBar } from "./run-bar";
import { TableGrid } from "./table-grid";
import { AsideNotice, IncomingNotice } from "./table-notices";
import { TableTools } from "./table-tools";
import { useImport } from "./use-import";
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
  const { outcomes, run, start: compute, stop, restore, forgetAll } = useRun(vocabulary);
  const kept = useTable({ start, fresh: shape !== null, outcomes, restore });
  const { table, edit } = kept;
  const [page, setPage] = useState(0);
  const [refusedOnly, setRefusedOnly] = useState(false);
  const toast = useToast();

  const { columns, rows } = table;
  const full = useMemo(() => rows.filter((row) => !isEmpty(row)), [rows]);
  const open = useMemo(() => full.filter((row) => !outcomes.get(row)?.ok), [full, outcomes]);
  const places = useMemo(() => rows.map((row, place) => ({ row, place })), [rows]);
  const wrong = useMemo(() => {
    return places.filter(({ row }) => {
      const outcome = outcomes.get(row);
      return outcome !== undefined && !outcome.ok && !outcome.later;
    });
  }, [places, outcomes]);
  const shown = refusedOnly ? wrong : places;
  const pages = Math.max(1, Math.ceil(shown.length / PAGE_ROWS));
  const at = Math.min(page, pages - 1);

  function put(next: Table, said: string) {
    const before = table;
    const show = (other: Table) => {
      stop();
      edit(() => other);
      setPage(0);
      setRefusedOnly(false);
    };
    show(next);
    toast(said, { undo: () => show(before), about: "table" });
  }

  const incoming = useImport({ table, touched: kept.touched, vocabulary, put });

  const onCell = useCallback(
    (id: number, column: number, text: string) => edit((now) => withCell(now, id, column, text)),
    [edit],
  );
  const onRemove = useCallback(
    (id: number) => edit((now) => ({ ...now, rows: now.rows.filter((row) => row.id !== id) })),
    [edit],
  );

  const change = useCallback(
    (next: (now: Table) => Table) => {
      edit(next);
      forgetAll();
    },
    [edit, forgetAll],
  );
  const onColumn = useCallback(
    (place: number, part: Partial<Column>) => change((now) => withColumn(now, place, part)),
    [change],
  );
  const onRemoveColumn = useCallback((place: number) => change((now) => withoutColumn(now, place)), [change]);

  async function save() {
    const blob = new Blob([await toDownload(table, outcomes)], { type: "text/csv;charset=utf-8" });
    const link = document.createElement("a");
    link.href = URL.createObjectURL(blob);
    link.download = "resistances.csv";
    link.click();
    setTimeout(() => URL.revokeObjectURL(link.href), 1000);
  }

  const first = at * PAGE_ROWS;
  return (
    <div onPaste={incoming.onPaste} onDrop={incoming.onDrop} onDragOver={incoming.onDragOver}>
      {heading}
      <TableTools
        shapes={vocabulary.shapes}
        first={shape ?? "bar"}
        decimalComma={table.decimalComma}
        onExample={(chosen) =>
          put(startTable(vocabulary, chosen), "The example of the shape stands in the table.")
        }
        onFile={(file) => void incoming.takeFile(file)}
        onDecimalComma={(decimalComma) => change((now) => ({ ...now, decimalComma }))}
      />
      <p className="mb-1 max-w-prose text-table text-ink-soft">
        Rows can also be pasted from a spreadsheet, with or without their header, or dropped as a file. Each
        row needs its shape; a table may mix shapes.
      </p>
      {kept.aside ? (
        <AsideNotice aside={kept.aside} onBringBack={kept.bringBack} onForget={kept.forgetAside} />
      ) : null}
      {incoming.said ? (
        <IncomingNotice
          incoming={incoming.said}
          onDismiss={incoming.dismiss}
          onShape={(chosen) => {
            incoming.dismiss();
            change((now) => withShape(now, chosen));
          }}
        />
      ) : null}
      {kept.unkept ? (
        <div className="mb-2">
          <Notice tone="caution" title="This table does not outlive the page">
            The browser has no room to keep it. Download it before you leave or reload.
          </Notice>
        </div>
      ) : null}
      {incoming.dialog}
      <TableGrid
        vocabulary={vocabulary}
        columns={columns}
        shown={shown.slice(first, first + PAGE_ROWS)}
        outcomes={outcomes}
        atColumn={run.atColumn}
        emptyText={refusedOnly ? "No row is refused." : "No rows yet. Add one, paste some or upload a file."}
        onColumn={onColumn}
        onRemoveColumn={onRemoveColumn}
        onAddColumn={() => edit((now) => withNewColumn(now, ""))}
        onCell={onCell}
        onRemove={onRemove}
      />
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
            Rows {(first + 1).toLocaleString("en")} to{" "}
            {Math.min(shown.length, first + PAGE_ROWS).toLocaleString("en")} of{" "}
            {shown.length.toLocaleString("en")}
            <Button variant="quiet" disabled={at === pages - 1} onClick={() => setPage(at + 1)}>
              Next
            </Button>
          </span>
        ) : null}
        {wrong.length > 0 ? (
          <Toggle
            label={`Only the ${wrong.length.toLocaleString("en")} refused`}
            checked={refusedOnly}
            onChange={setRefusedOnly}
          />
        ) : null}
      </div>
      <RunBar
        run={run}
        full={full.length}
        open={open.length}
        refused={wrong.length}
        onStart={() => void compute(table, open)}
        onStop={stop}
        onSave={() => void save()}
      />
      <LiveRegion
        text={run.sent > 0 && !run.busy ? progressText(run, full.length - open.length, wrong.length) : ""}
      />
    </div>
  );
}
