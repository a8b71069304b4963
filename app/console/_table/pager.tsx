"use client";

import { ChevronLeft, ChevronRight } from "lucide-react";
import { Button } from "../../_ui/button";
import type { ListPage } from "./column";
import { type ListState, PAGE_SIZES } from "./use-list-state";

/** Where the reader is in a list, the ways on and back, and how much a page holds. */
export function Pager({ state, data }: { readonly state: ListState; readonly data: ListPage<unknown> }) {
  const { page, size } = state;
  const last = Math.max(1, Math.ceil(data.total / size));
  const from = (page - 1) * size + 1;
  const to = from + data.rows.length - 1;
  const total = `${data.more ? "more than " : ""}${data.total.toLocaleString("en")}`;
  return (
    <div className="mt-1 flex flex-wrap items-center gap-x-2 gap-y-0.5 text-table text-ink-soft">
      <p className="grow" role="status">
        {data.rows.length === 0
          ? `0 of ${total}`
          : `${from.toLocaleString("en")}–${to.toLocaleString("en")} of ${total}`}
      </p>
      {data.total > PAGE_SIZES[0] ? (
        <label className="inline-flex items-center gap-1">
          Rows
          <select
            value={size}
            onChange={(event) => state.change({ size: Number(event.target.value) })}
            className="min-h-5.5 rounded border border-edge bg-sheet px-0.5 text-ink medium:min-h-4"
          >
            {PAGE_SIZES.map((each) => (
              <option key={each} value={each}>
                {each}
              </option>
            ))}
          </select>
        </label>
      ) : null}
      {last > 1 || page > 1 ? (
        <nav aria-label="Pages of the list" className="flex items-center gap-0.5">
          <Button
            variant="quiet"
            aria-label="Page before"
            disabled={page <= 1}
            onClick={() => state.change({ page: Math.min(page - 1, last) })}
          >
            <ChevronLeft aria-hidden size={16} />
          </Button>
          <span>
            {page} / {data.more ? `${last}+` : last}
          </span>
          <Button
            variant="quiet"
            aria-label="Next page"
            disabled={page >= last}
            onClick={() => state.change({ page: page + 1 })}
          >
            <ChevronRight aria-hidden size={16} />
          </Button>
        </nav>
      ) : null}
    </div>
  );
}
