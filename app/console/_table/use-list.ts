"use client";

import type { SWRConfiguration } from "swr";
import type { ConsoleProblem } from "../_shell/call-console";
import { useConsole } from "../_shell/use-console";
import type { ListPage } from "./column";
import { type ListState, type ListOptions, useListState } from "./use-list-state";

interface Asked extends ListOptions {
  /** What the page adds to the list's own query: `from=…&to=…`. */
  readonly more?: string;
  /** How often the list is read again, ms; of the first page only where `firstPageOnly`. */
  readonly refreshMs?: number;
  readonly firstPageOnly?: boolean;
}

/** A list below `/api/console/<path>`, by the state in the page's address; `table` is what a ConsoleTable takes of it. */
export function useList<Row>(path: string, { more, refreshMs = 0, firstPageOnly, ...options }: Asked) {
  const state: ListState = useListState(options);
  const settings: SWRConfiguration<ListPage<Row>, ConsoleProblem> = {
    refreshInterval: firstPageOnly && state.page > 1 ? 0 : refreshMs,
  };
  const query = more ? `${state.query}&${more}` : state.query;
  const { data, error, isLoading, mutate } = useConsole<ListPage<Row>>(`${path}?${query}`, settings);
  const table = { state, data, error, busy: isLoading, onRetry: () => void mutate() };
  return { state, data, mutate, table };
}
