"use client";

import type { HostUsage } from "@/lib/embeds/usage";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { DataTable } from "../../../_ui/data-table";
import { EmptyState } from "../../../_ui/states";

/** Who used it, and what is left of its month. */
export function HostsTable({ detail }: { readonly detail: EmbedDetail }) {
  const { month, hosts } = detail;
  const used = month.quota - month.remaining;
  return (
    <div className="grid gap-2 pt-2">
      <p className="text-table">
        <span className="font-mono text-figure font-medium">{month.remaining.toLocaleString("en")}</span> of{" "}
        {month.quota.toLocaleString("en")} computations left this month ({used.toLocaleString("en")} used),
        until{" "}
        <time dateTime={month.resetsAt} title={month.resetsAt} suppressHydrationWarning>
          {new Date(month.resetsAt).toLocaleDateString("en-GB", { dateStyle: "long" })}
        </time>
        .
      </p>
      {hosts.length === 0 ? (
        <EmptyState title="No calls in the last 31 days">
          Calls stand here by the page around the widget, once a page shows it.
        </EmptyState>
      ) : (
        <DataTable
          caption="Calls in the last 31 days by host"
          rows={hosts}
          rowKey={({ host }: HostUsage) => host}
          columns={[
            {
              key: "host",
              title: "Host",
              cell: ({ host }: HostUsage) => (host === "" ? "not told by the browser" : host),
            },
            number("Calls", ({ requests }) => requests),
            number("Computations", ({ computations }) => computations),
            number("Refused", ({ refused }) => refused),
            { key: "day", title: "Last on (UTC)", cell: ({ lastDay }: HostUsage) => lastDay },
          ]}
        />
      )}
    </div>
  );
}

function number(title: string, read: (row: HostUsage) => number) {
  return {
    key: title,
    title,
    align: "end" as const,
    cell: (row: HostUsage) => read(row).toLocaleString("en"),
  };
}
