"use client";

import { useState } from "react";
import { DataTable } from "../../../_ui/data-table";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Segmented } from "../../../_ui/segmented";
import { Loading } from "../../../_ui/states";
import { clientText, countText, operationText, shareText } from "../../_parts/numbers";
import type { TeamChoice } from "../../_shell/team-choices";
import { useConsole } from "../../_shell/use-console";
import type { SharesAnswer } from "./usage-answers";
import type { Span } from "./use-span";

type By = "operation" | "shape" | "status" | "team" | "client";

const CHOICES: readonly { readonly value: By; readonly label: string }[] = [
  { value: "operation", label: "Operation" },
  { value: "shape", label: "Shape" },
  { value: "status", label: "Status" },
  { value: "client", label: "Client" },
  { value: "team", label: "Team" },
];

/** What the calls divide into. */
export function Shares({ span, teams }: { readonly span: Span; readonly teams: readonly TeamChoice[] }) {
  const [by, setBy] = useState<By>("shape");
  const { data, error } = useConsole<SharesAnswer>(`usage/shares?${span.query}&by=${by}`);
  const choices = teams.length > 1 && span.caller === "" && span.team === "" ? CHOICES : CHOICES.slice(0, 4);
  const whole = data?.rows.reduce((sum, { requests }) => sum + requests, 0) ?? 0;
  return (
    <section className="mt-4">
      <div className="mb-1 flex flex-wrap items-center gap-x-2 gap-y-1">
        <h2 className="grow">Divided by</h2>
        <Segmented label="Divided by" labelShown={false} value={by} options={choices} onChange={setBy} />
        <a
          href={`/api/console/usage/shares?${span.query}&by=${by}&csv=1`}
          download
          className="inline-flex min-h-5 items-center px-1 text-table font-medium text-ink-soft hover:text-ink"
        >
          CSV
        </a>
      </div>
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data ? (
        <DataTable
          caption={`Requests by ${by}`}
          maxHeight="24rem"
          rows={data.rows}
          rowKey={({ name }) => name}
          empty="No call in these days."
          columns={[
            {
              key: "name",
              title: CHOICES.find(({ value }) => value === by)?.label ?? "",
              cell: ({ label }) => labelOf(by, label),
              sortBy: ({ label }) => label,
            },
            {
              key: "requests",
              title: "Requests",
              align: "end",
              cell: ({ requests }) => countText(requests),
              sortBy: ({ requests }) => requests,
            },
            {
              key: "share",
              title: "Share",
              align: "end",
              cell: ({ requests }) => shareText(requests, whole),
            },
            {
              key: "computations",
              title: "Computations",
              align: "end",
              cell: ({ computations }) => countText(computations),
              sortBy: ({ computations }) => computations,
            },
          ]}
        />
      ) : error ? null : (
        <Loading what="the shares" className="h-20" />
      )}
      {data?.sampled ? (
        <p className="mt-0.5 text-small text-ink-soft">
          Of the latest {countText(data.sampled)} calls of this caller.
        </p>
      ) : null}
    </section>
  );
}

function labelOf(by: By, label: string): string {
  if (by === "client") return clientText(label);
  return by === "operation" ? operationText(label) : label;
}
