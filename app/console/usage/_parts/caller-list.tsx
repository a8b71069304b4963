"use client";

import { useMemo } from "react";
import { EmptyState } from "../../../_ui/states";
import { countText, msText } from "../../_parts/numbers";
import type { ListColumn } from "../../_table/column";
import { ConsoleTable } from "../../_table/console-table";
import { ListTools } from "../../_table/list-tools";
import { columnsForTeams } from "../../_table/shared-columns";
import { useList } from "../../_table/use-list";
import type { CallerRow } from "./usage-answers";
import type { Span } from "./use-span";

/** Who called, with sums; a press on one leads to its own usage. */
export function CallerList({ span, manyTeams }: { readonly span: Span; readonly manyTeams: boolean }) {
  const { state, table } = useList<CallerRow>("usage/callers", {
    sort: "-requests",
    size: 25,
    more: span.query,
  });
  const { change } = span;
  const columns = useMemo((): readonly ListColumn<CallerRow>[] => {
    const all: readonly ListColumn<CallerRow>[] = [
      {
        id: "name",
        title: "Caller",
        sortable: true,
        fixed: true,
        cell: ({ caller }) => (
          <button
            type="button"
            className="link cursor-pointer text-start font-medium"
            onClick={() => {
              change({ caller: caller.id });
              window.scrollTo({ top: 0 });
            }}
          >
            {caller.name}
          </button>
        ),
      },
      { id: "team", title: "Team", from: "medium", cell: ({ team }) => team ?? "–" },
      {
        id: "requests",
        title: "Requests",
        sortable: true,
        align: "end",
        cell: ({ requests }) => countText(requests),
      },
      {
        id: "computations",
        title: "Computations",
        sortable: true,
        align: "end",
        from: "medium",
        cell: ({ computations }) => countText(computations),
      },
      {
        id: "refused",
        title: "Refused",
        sortable: true,
        align: "end",
        cell: ({ refused }) => countText(refused),
      },
      {
        id: "failed",
        title: "Failed",
        sortable: true,
        align: "end",
        from: "wide",
        cell: ({ failed }) => countText(failed),
      },
      {
        id: "latency",
        title: "Mean latency",
        sortable: true,
        align: "end",
        from: "wide",
        cell: ({ meanMs }) => msText(meanMs),
      },
    ];
    return columnsForTeams(all, manyTeams);
  }, [change, manyTeams]);
  return (
    <>
      <ListTools state={state} columns={columns} searches="key" csv="usage/callers" more={span.query} />
      <ConsoleTable
        caption="Callers"
        columns={columns}
        {...table}
        rowKey={({ caller }) => caller.id}
        empty={<EmptyState title="Nobody called in these days">Choose a longer span.</EmptyState>}
      />
    </>
  );
}
