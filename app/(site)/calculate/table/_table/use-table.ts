"use client";

import { useCallback, useEffect, useState } from "react";
import { replaceAddress } from "../../replace-address";
import type { Outcome } from "../_model/send";
import type { Row, Table } from "../_model/table";
import { keep, type Kept, readKept } from "./kept";

const KEEP_MS = 500;

interface UseTableOptions {
  /** What the page begins with: an example. */
  readonly start: Table;
  /** Whether the address asks for this very example. */
  readonly fresh: boolean;
  readonly outcomes: ReadonlyMap<Row, Outcome>;
  readonly restore: (outcomes: ReadonlyMap<Row, Outcome>) => void;
}

/** The table of this tab. Where the address asks for an example, what the tab had is set aside and not lost. */
export function useTable({ start, fresh, outcomes, restore }: UseTableOptions) {
  const [table, setTable] = useState(start);
  const [aside, setAside] = useState<Kept | null>(null);
  const [unkept, setUnkept] = useState(false);
  const touched = table !== start;

  const bringBack = useCallback(
    (kept: Kept) => {
      setTable(kept.table);
      restore(kept.outcomes);
      setAside(null);
    },
    [restore],
  );

  useEffect(() => {
    // Only the browser knows what this tab kept; the server's first picture is the example.
    const kept = readKept();
    if (kept) queueMicrotask(() => (fresh ? setAside(kept) : bringBack(kept)));
  }, [fresh, bringBack]);

  useEffect(() => {
    if (!touched) return;
    const timer = setTimeout(() => {
      setUnkept(!keep(table, outcomes));
      // From now on a reload brings this table, not the example that the address asked for.
      if (window.location.search !== "") replaceAddress(window.location.pathname);
    }, KEEP_MS);
    return () => clearTimeout(timer);
  }, [table, touched, outcomes]);

  useEffect(() => {
    if (!unkept) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [unkept]);

  return {
    table,
    edit: useCallback((change: (table: Table) => Table) => setTable(change), []),
    touched,
    /** What the tab had before. */
    aside,
    bringBack,
    forgetAside: useCallback(() => setAside(null), []),
    /** The browser has no room to keep this table over a reload. */
    unkept,
  };
}
