"use client";

import { LocalTime } from "../../../_ui/local-time";
import { EmptyState } from "../../../_ui/states";
import { clientText, countText, msText, operationText } from "../../_parts/numbers";
import { StatusWord } from "../../_parts/status-word";
import type { ListColumn } from "../../_table/column";
import { ConsoleTable } from "../../_table/console-table";
import { ListFilter, ListTools } from "../../_table/list-tools";
import { useList } from "../../_table/use-list";
import type { RequestRow } from "./usage-answers";
import type { Span } from "./use-span";

const COLUMNS: readonly ListColumn<RequestRow>[] = [
  { id: "at", title: "Time", fixed: true, cell: ({ at }) => <LocalTime at={at} /> },
  { id: "status", title: "Status", cell: ({ status }) => <StatusWord status={status} /> },
  { id: "operation", title: "Operation", cell: ({ operation }) => operationText(operation) },
  { id: "shape", title: "Shape", from: "medium", cell: ({ shape }) => shape ?? "–" },
  { id: "caller", title: "Caller", from: "medium", cell: ({ caller }) => caller.name },
  { id: "client", title: "Client", from: "wide", cell: ({ client }) => clientText(client) },
  {
    id: "latency",
    title: "Latency",
    align: "end",
    from: "medium",
    cell: ({ latencyMs }) => msText(latencyMs),
  },
  {
    id: "computations",
    title: "Computations",
    align: "end",
    from: "extra",
    cell: ({ computations }) => countText(computations),
  },
  {
    id: "requestId",
    title: "Request id",
    from: "extra",
    cell: ({ requestId }) => <span className="font-mono text-small">{requestId}</span>,
  },
];

const FILTERS = ["statuses"];
const STATUSES = [
  { value: "2xx", label: "Answered" },
  { value: "error", label: "Refused or failed" },
  { value: "4xx", label: "Refused (4xx)" },
  { value: "5xx", label: "Failed (5xx)" },
];

/** Call by call. */
export function RequestList({ span }: { readonly span: Span }) {
  const { state, table } = useList<RequestRow>("usage/requests", {
    sort: "-at",
    size: 25,
    filters: FILTERS,
    prefix: "requests-",
    more: span.query,
    refreshMs: 15_000,
    firstPageOnly: true,
  });
  return (
    <>
      <ListTools state={state} columns={COLUMNS} searches="request id" csv="usage/requests" more={span.query}>
        <ListFilter state={state} name="statuses" label="Status" options={STATUSES} />
      </ListTools>
      <ConsoleTable
        caption="Single requests"
        columns={COLUMNS}
        {...table}
        rowKey={({ requestId, at }) => requestId + at}
        empty={<EmptyState title="No request in these days">Choose a longer span.</EmptyState>}
      />
    </>
  );
}
