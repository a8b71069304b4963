"use client";

import { type ReactNode, useEffect, useRef, useState } from "react";
import { Popover } from "radix-ui";
import { Columns3, Download, Search } from "lucide-react";
import { Button } from "../../_ui/button";
import { CONTROL } from "../../_ui/field";
import { type ListColumn, shownFrom, withChoice } from "./column";
import type { ListState } from "./use-list-state";

interface ListToolsProps<Row> {
  readonly state: ListState;
  readonly columns: readonly ListColumn<Row>[];
  /** What the search looks through: "name, id". None: the list has no search. */
  readonly searches?: string;
  /** Path below /api/console that answers the list as CSV with `csv=1`. */
  readonly csv?: string;
  /** What the page adds to the list's own query: `from=…&to=…`. */
  readonly more?: string;
  /** The list's own filters. */
  readonly children?: ReactNode;
}

/** Search, filters, columns and export above a list. */
export function ListTools<Row>({ state, columns, searches, csv, more, children }: ListToolsProps<Row>) {
  return (
    <div className="mb-1.5 flex flex-wrap items-end gap-1.5">
      {searches ? <SearchBox state={state} searches={searches} /> : null}
      {children}
      {state.filtered ? (
        <Button variant="quiet" onClick={() => state.change({ search: "", filters: cleared(state) })}>
          Show all
        </Button>
      ) : null}
      <span className="grow max-medium:hidden" />
      <ColumnChoice state={state} columns={columns} />
      {csv ? (
        <a
          href={`/api/console/${csv}?${exported(state.query, more)}`}
          download
          className="inline-flex min-h-5.5 items-center gap-1 rounded border border-transparent px-1 text-table font-medium text-ink-soft hover:border-edge hover:text-ink medium:min-h-5"
        >
          <Download aria-hidden size={16} /> CSV
        </a>
      ) : null}
    </div>
  );
}

function cleared(state: ListState): Record<string, string> {
  const own = new Set(["page", "size", "sort", "q"]);
  const names = [...new URLSearchParams(state.query).keys()].filter((name) => !own.has(name));
  return Object.fromEntries(names.map((name) => [name, ""]));
}

function exported(query: string, more = ""): string {
  const params = new URLSearchParams(`${query}&${more}`);
  params.delete("page");
  params.delete("size");
  params.set("csv", "1");
  return params.toString();
}

const TYPING_MS = 250;

function SearchBox({ state, searches }: { readonly state: ListState; readonly searches: string }) {
  const [typed, setTyped] = useState(state.search);
  const [before, setBefore] = useState(state.search);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  // Another way than typing changed it: "Show all", or the browser's way back.
  if (state.search !== before) {
    setBefore(state.search);
    if (state.search !== typed.trim()) setTyped(state.search);
  }
  useEffect(() => () => clearTimeout(timer.current), []);

  return (
    <label className="relative block w-full medium:w-28">
      <span className="sr-only">Search by {searches}</span>
      <Search aria-hidden size={16} className="absolute start-1 top-1/2 -translate-y-1/2 text-ink-soft" />
      <input
        type="search"
        value={typed}
        maxLength={200}
        placeholder={`Search by ${searches}`}
        onChange={(event) => {
          setTyped(event.target.value);
          clearTimeout(timer.current);
          timer.current = setTimeout(() => state.change({ search: event.target.value.trim() }), TYPING_MS);
        }}
        className={`${CONTROL} ps-3.5! font-sans!`}
      />
    </label>
  );
}

interface FilterProps {
  readonly state: ListState;
  /** Name of the filter, as the server takes it. */
  readonly name: string;
  readonly label: string;
  /** Choices besides "all", which is empty. */
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly all?: string;
}

/** One of the list's own filters. */
export function ListFilter({ state, name, label, options, all = "All" }: FilterProps) {
  return (
    <label className="block text-table">
      <span className="block text-small text-ink-soft">{label}</span>
      <select
        value={state.filter(name)}
        onChange={(event) => state.change({ filters: { [name]: event.target.value } })}
        className={`${CONTROL} max-w-26 pe-3 font-sans!`}
      >
        <option value="">{all}</option>
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </label>
  );
}

interface ColumnChoiceProps<Row> {
  readonly state: ListState;
  readonly columns: readonly ListColumn<Row>[];
}

function ColumnChoice<Row>({ state, columns }: ColumnChoiceProps<Row>) {
  const free = columns.filter(({ fixed }) => !fixed);
  if (free.length === 0) return null;
  return (
    <Popover.Root>
      <Popover.Trigger asChild>
        <Button variant="quiet">
          <Columns3 aria-hidden size={16} /> Columns
        </Button>
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="end"
          sideOffset={4}
          collisionPadding={12}
          aria-label="Columns"
          className="z-20 flex max-h-[60dvh] flex-col overflow-y-auto rounded border border-ink bg-sheet px-1.5 py-1 text-table outline-none"
        >
          <ColumnBoxes state={state} columns={free} />
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

/** Made only once the choice is open, and so in the browser: it asks how wide the window is. */
function ColumnBoxes<Row>({ state, columns }: ColumnChoiceProps<Row>) {
  return columns.map((column) => (
    <label key={column.id} className="flex min-h-4 cursor-pointer items-center gap-1">
      <input
        type="checkbox"
        checked={visible(shownFrom(column, state.columns))}
        onChange={(event) =>
          state.change({ columns: withChoice(column, state.columns, event.target.checked) })
        }
      />
      {column.title}
    </label>
  ));
}

/** Whether a column is to be seen at the width that the window has now. */
function visible(from: ReturnType<typeof shownFrom>): boolean {
  if (from === "always" || from === "never") return from === "always";
  return window.matchMedia(from === "medium" ? "(min-width: 48rem)" : "(min-width: 64rem)").matches;
}
