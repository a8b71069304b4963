"use client";

import { useCallback, useMemo } from "react";
import { useSearchParams } from "next/navigation";

/** What a list shows: kept in the page's address, so that a link and the way back show the same. */
export interface ListState {
  /** From 1. */
  readonly page: number;
  readonly size: number;
  /** Name of a column, with a minus in front where the largest comes first. */
  readonly sort: string;
  /** What was typed into the search. */
  readonly search: string;
  /** Value of one of the list's own filters; empty where it does not filter. */
  readonly filter: (name: string) => string;
  readonly filtered: boolean;
  /** Columns that the reader shows or hides against the list's own choice: `client`, `-origins`. */
  readonly columns: readonly string[];
  /** Changes some of it; anything but a page leads back to the first page. */
  readonly change: (change: ListChange) => void;
  /** The same for the server: `page=1&size=50&sort=-createdAt&q=…`. */
  readonly query: string;
}

export interface ListChange {
  readonly page?: number;
  readonly size?: number;
  readonly sort?: string;
  readonly search?: string;
  readonly filters?: Readonly<Record<string, string>>;
  readonly columns?: readonly string[];
}

export interface ListOptions {
  readonly sort: string;
  readonly size?: number;
  /** Names of the list's own filters, as the server takes them. */
  readonly filters?: readonly string[];
  /** Where a page has two lists, the words that stand before the names in the address: `requests-`. */
  readonly prefix?: string;
}

export const PAGE_SIZES = [25, 50, 100, 200] as const;

const NO_FILTERS: readonly string[] = [];

/** The state of a list in the page's address, with what the list shows where the address says nothing. */
export function useListState(options: ListOptions): ListState {
  const { sort: firstSort, size: firstSize = 50, filters = NO_FILTERS, prefix = "" } = options;
  const address = useSearchParams();

  const change = useCallback(
    (next: ListChange) => {
      const params = new URLSearchParams(window.location.search);
      const put = (name: string, value: string, usual: string) => {
        if (value === usual) params.delete(prefix + name);
        else params.set(prefix + name, value);
      };
      if (next.size !== undefined) put("size", String(next.size), String(firstSize));
      if (next.sort !== undefined) put("sort", next.sort, firstSort);
      if (next.search !== undefined) put("q", next.search, "");
      if (next.columns !== undefined) put("columns", next.columns.join(","), "");
      for (const [name, value] of Object.entries(next.filters ?? {})) put(name, value, "");
      if (next.page !== undefined) put("page", String(next.page), "1");
      else if (next.columns === undefined) params.delete(`${prefix}page`);
      const text = params.toString();
      window.history.replaceState(null, "", text === "" ? window.location.pathname : `?${text}`);
    },
    [prefix, firstSort, firstSize],
  );

  return useMemo(() => {
    const read = (name: string) => address.get(prefix + name) ?? "";
    const page = Math.max(1, Math.trunc(Number(read("page"))) || 1);
    const size = PAGE_SIZES.find((each) => String(each) === read("size")) ?? firstSize;
    const sort = read("sort") || firstSort;
    const search = read("q").slice(0, 200);
    const query = new URLSearchParams({ page: String(page), size: String(size), sort });
    if (search !== "") query.set("q", search);
    for (const name of filters) if (read(name) !== "") query.set(name, read(name));
    return {
      page,
      size,
      sort,
      search,
      filter: (name: string) => read(name),
      filtered: search !== "" || filters.some((name) => read(name) !== ""),
      columns: read("columns").split(",").filter(Boolean),
      change,
      query: query.toString(),
    };
  }, [address, change, filters, firstSize, firstSort, prefix]);
}
