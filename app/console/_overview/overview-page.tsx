"use client";

import Link from "next/link";
import type { ReactNode } from "react";
import { DataTable } from "../../_ui/data-table";
import { LocalTime } from "../../_ui/local-time";
import { Notice } from "../../_ui/notice";
import { ProblemNotice } from "../../_ui/problem-notice";
import { EmptyState, Loading } from "../../_ui/states";
import { BarChart } from "../_parts/bar-chart";
import { Figures } from "../_parts/figures";
import { Meter } from "../_parts/meter";
import { countText, msText, operationText } from "../_parts/numbers";
import { NoTeamYet } from "../_parts/no-team-yet";
import { PageHead } from "../_parts/page-head";
import { StatusWord } from "../_parts/status-word";
import { useConsole } from "../_shell/use-console";
import type { Period, RequestRow, Total } from "../usage/_parts/usage-answers";

interface Overview {
  readonly today: Total;
  readonly month: Total;
  readonly hours: readonly Period[];
  readonly days: readonly Period[];
  readonly quotas: readonly {
    readonly keyId: string;
    readonly name: string;
    readonly team: string;
    readonly used: number;
    readonly quota: number;
  }[];
  readonly errors: { readonly rows: readonly RequestRow[]; readonly total: number; readonly more: boolean };
  readonly slowest: readonly RequestRow[];
  readonly attention: readonly { readonly kind: string; readonly text: string; readonly href: string }[];
}

interface OverviewPageProps {
  /** Whether there is any team that the person sees. */
  readonly anyTeam: boolean;
  /** Whether the person may issue keys. */
  readonly mayIssue: boolean;
}

/** Today and this month at a glance, and what needs somebody. */
export function OverviewPage({ anyTeam, mayIssue }: OverviewPageProps) {
  const { data, error } = useConsole<Overview>("overview", { refreshInterval: 20_000 });
  return (
    <>
      <PageHead title="Overview">Sums of your teams; days and hours are in UTC.</PageHead>
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data ? (
        <Sections
          overview={data}
          start={anyTeam ? <NoCalls mayIssue={mayIssue} /> : <NoTeamYet what="Keys" />}
        />
      ) : error ? null : (
        <Loading what="the overview" className="h-60" />
      )}
    </>
  );
}

function NoCalls({ mayIssue }: Pick<OverviewPageProps, "mayIssue">) {
  if (!mayIssue)
    return (
      <EmptyState title="No calls yet">
        A developer of your team can issue a key; its calls appear here within seconds.
      </EmptyState>
    );
  return (
    <EmptyState
      title="No calls yet"
      action={
        <Link className="link" href="/console/keys">
          Issue a key
        </Link>
      }
    >
      Issue a key, call the API with it, and the call appears here within seconds.
    </EmptyState>
  );
}

interface SectionsProps {
  readonly overview: Overview;
  /** In place of the figures, until there is a call: what to do first. */
  readonly start: ReactNode;
}

function Sections({ overview, start }: SectionsProps) {
  const { today, month, hours, days, quotas, errors, slowest, attention } = overview;
  // The last of the days is today; months are those of UTC, as quotas count them.
  const beginsToday = days.at(-1)?.at.slice(8, 10) === "01";
  const idle = month.requests === 0 && days.every(({ requests }) => requests === 0);
  return (
    <div className="grid gap-4">
      <section>
        <h2 className="mb-1">Needs attention</h2>
        {attention.length === 0 ? (
          <p className="text-table text-ink-soft">
            Nothing: no quota above 80&nbsp;%, no key about to expire, no failed call.
          </p>
        ) : (
          <ul className="grid gap-1">
            {attention.map(({ kind, text, href }) => (
              <li key={text}>
                <Notice tone={kind === "failed" ? "problem" : "caution"} title={TITLES[kind] ?? "Caution"}>
                  <Link className="link" href={href}>
                    {text}
                  </Link>
                </Notice>
              </li>
            ))}
          </ul>
        )}
      </section>
      {idle ? (
        start
      ) : (
        <>
          <section>
            <h2 className="mb-1">Today</h2>
            <Figures total={today} />
            <div className="mt-2">
              <Requests title="Requests, hour by hour since yesterday" periods={hours} by="hour" />
            </div>
          </section>
          <section>
            <h2 className="mb-1">This month</h2>
            {beginsToday ? (
              <p className="text-table text-ink-soft">It began today: its figures are those of today.</p>
            ) : (
              <Figures total={month} />
            )}
          </section>
          <section>
            <h2 className="mb-1">Last 30 days</h2>
            <Requests title="Requests, day by day" periods={days} by="day" />
          </section>
        </>
      )}
      {quotas.length > 0 ? (
        <section>
          <h2 className="mb-1">Quotas above 80&nbsp;%</h2>
          <ul className="grid gap-x-3 gap-y-1 medium:grid-cols-2">
            {quotas.map(({ keyId, name, team, used, quota }) => (
              <li key={keyId} className="text-table">
                <Link className="link" href={`/console/keys/${keyId}`}>
                  {name}
                </Link>{" "}
                <span className="text-ink-soft">{team}</span>
                <Meter used={used} quota={quota} what="computations" />
              </li>
            ))}
          </ul>
        </section>
      ) : null}
      <div className="grid gap-4 wide:grid-cols-2">
        <section className="min-w-0">
          <h2 className="mb-1">Errors of the last 24 hours</h2>
          <Calls
            caption="Errors of the last 24 hours"
            rows={errors.rows}
            empty="No call was refused or failed."
          />
          {errors.total > errors.rows.length ? (
            <p className="mt-0.5 text-table">
              <Link className="link" href="/console/usage?requests-statuses=error">
                All {errors.more ? "of them" : countText(errors.total)}
              </Link>
            </p>
          ) : null}
        </section>
        <section className="min-w-0">
          <h2 className="mb-1">Slowest calls of the last 24 hours</h2>
          <Calls caption="Slowest calls of the last 24 hours" rows={slowest} empty="No call." slow />
        </section>
      </div>
    </div>
  );
}

const TITLES: Readonly<Record<string, string>> = {
  failed: "Failed calls",
  quota: "Quota",
  "key-expires": "Key expires",
  "retired-material": "Retired material in use",
};

interface RequestsProps {
  readonly title: string;
  readonly periods: readonly Period[];
  readonly by: "day" | "hour";
}

function Requests({ title, periods, by }: RequestsProps) {
  return (
    <BarChart
      title={title}
      at={periods.map(({ at }) => at)}
      by={by}
      parts={[
        { label: "answered", tone: "verdigris", values: periods.map((each) => each.requests - each.refused) },
        { label: "refused (4xx)", tone: "amber", values: periods.map((each) => each.refused - each.failed) },
        { label: "failed (5xx)", tone: "oxide", values: periods.map(({ failed }) => failed) },
      ]}
    />
  );
}

interface CallsProps {
  readonly caption: string;
  readonly rows: readonly RequestRow[];
  readonly empty: string;
  readonly slow?: boolean;
}

function Calls({ caption, rows, empty, slow = false }: CallsProps) {
  return (
    <DataTable
      caption={caption}
      rows={rows}
      rowKey={({ requestId, at }) => requestId + at}
      empty={empty}
      columns={[
        { key: "at", title: "Time", cell: ({ at }) => <LocalTime at={at} /> },
        slow
          ? {
              key: "latency",
              title: "Latency",
              align: "end" as const,
              cell: ({ latencyMs }: RequestRow) => msText(latencyMs),
            }
          : {
              key: "status",
              title: "Status",
              cell: ({ status }: RequestRow) => <StatusWord status={status} />,
            },
        {
          key: "operation",
          title: "Call",
          minWidth: "10rem",
          cell: ({ operation, shape }) => (
            <>
              {operationText(operation)}
              {shape ? <span className="text-ink-soft">&nbsp;· {shape}</span> : null}
            </>
          ),
        },
        {
          key: "caller",
          title: "Caller",
          minWidth: "10rem",
          cell: ({ caller }) => (
            <Link className="link" href={`/console/usage?caller=${encodeURIComponent(caller.id)}`}>
              {caller.name}
            </Link>
          ),
        },
      ]}
    />
  );
}
