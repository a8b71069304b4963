"use client";

import { useCallback, useEffect, useState } from "react";
import { type Column, newRow, type Table } from "../_model/table";

const KEPT = "rhoform-table";
const KEEP_MS = 500;

/** The table of this tab: it outlives a reload and signing in. */
export function useTable(start: Table, fresh: boolean) {
  const [table, setTable] = useState(start);

  useEffect(() => {
    const kept = fresh ? null : readKept();
    // Only the browser knows what this tab kept; the server's first picture is the example.
    if (kept) queueMicrotask(() => setTable((now) => (now === start ? kept : now)));
  }, [fresh, start]);

  useEffect(() => {
    if (table === start) return;
    const timer = setTimeout(() => keep(table), KEEP_MS);
    return () => clearTimeout(timer);
  }, [table, start]);

  const edit = useCallback((change: (table: Table) => Table) => setTable(change), []);
  return { table, edit };
}

function keep({ columns, rows, decimalComma }: Table): void {
  try {
    const text = JSON.stringify({ columns, rows: rows.map(({ cells }) => cells), decimalComma });
    window.sessionStorage.setItem(KEPT, text);
  } catch {
    // A table too large for the store lives as long as the page.
  }
}

function readKept(): Table | null {
  try {
    const kept = JSON.parse(window.sessionStorage.getItem(KEPT) ?? "null") as {
      columns: Column[];
      rows: string[][];
      decimalComma: boolean;
    } | null;
    if (!kept || kept.columns.length === 0) return null;
    return { ...kept, rows: kept.rows.map((cells) => newRow(cells)) };
  } catch {
    return null;
  }
}
