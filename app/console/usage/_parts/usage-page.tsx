"use client";

import Link from "next/link";
import { X } from "lucide-react";
import { Button } from "../../../_ui/button";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Segmented } from "../../../_ui/segmented";
import { Loading } from "../../../_ui/states";
import { BarChart } from "../../_parts/bar-chart";
import { Figures } from "../../_parts/figures";
import { PageHead } from "../../_parts/page-head";
import type { TeamChoice } from "../../_shell/team-choices";
import { useConsole } from "../../_shell/use-console";
import { CallerList } from "./caller-list";
import { LatencyFigure } from "./latency-figure";
import { RequestList } from "./request-list";
import { Shares } from "./shares";
import { SpanFields } from "./span-fields";
import type { UsageAnswer } from "./usage-answers";
import { type Span, useSpan } from "./use-span";

interface UsagePageProps {
  readonly teams: readonly TeamChoice[];
  /** UTC, `2025-03-01`. */
  readonly today: string;
}

const REFRESH_MS = 30_000;

/** What was called, by whom, how it was answered and how fast; from months down to single requests. */
export function UsagePage({ teams, today }: UsagePageProps) {
  const span = useSpan(today);
  const { data, error } = useConsole<UsageAnswer>(`usage?${span.query}&by=${span.by}`, {
    refreshInterval: REFRESH_MS,
  });
  return (
    <>
      <PageHead title="Usage">Days and hours are in UTC, as quotas count them.</PageHead>
      <SpanFields span={span} teams={teams} today={today} />
      {span.caller !== "" ? <OneCaller span={span} answer={data} /> : null}
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data ? (
        <Sums answer={data} span={span} />
      ) : error ? null : (
        <Loading what="the sums" className="h-50" />
      )}
      <Shares span={span} teams={teams} />
      {span.caller === "" ? (
        <section className="mt-4">
          <h2 className="mb-1">Callers</h2>
          <CallerList span={span} manyTeams={teams.length > 1} />
        </section>
      ) : null}
      <section className="mt-4">
        <h2 className="mb-1">Single requests</h2>
        <RequestList span={span} />
      </section>
    </>
  );
}

function OneCaller({ span, answer }: { readonly span: Span; readonly answer: UsageAnswer | undefined }) {
  const caller = answer?.caller;
  return (
    <p className="mb-2 flex flex-wrap items-center gap-1 text-table">
      <span>
        Only{" "}
        {caller?.kind === "key" ? (
          <Link className="link font-medium" href={`/console/keys/${caller.id}`}>
            {caller.name}
          </Link>
        ) : (
          <strong className="font-medium">{caller?.name ?? span.caller}</strong>
        )}
      </span>
      <Button variant="quiet" onClick={() => span.change({ caller: "" })}>
        <X aria-hidden size={16} /> All callers
      </Button>
    </p>
  );
}

function Sums({ answer, span }: { readonly answer: UsageAnswer; readonly span: Span }) {
  const { periods, total, by } = answer;
  return (
    <>
      <Figures total={total} />
      <div className="mt-3">
        <BarChart
          title="Requests"
          at={periods.map(({ at }) => at)}
          by={by}
          parts={[
            {
              label: "answered",
              tone: "verdigris",
              values: periods.map((each) => each.requests - each.refused),
            },
            {
              label: "refused (4xx)",
              tone: "amber",
              values: periods.map((each) => each.refused - each.failed),
            },
            { label: "failed (5xx)", tone: "oxide", values: periods.map(({ failed }) => failed) },
          ]}
          beside={
            <>
              {span.hourly ? (
                <Segmented
                  label="Step"
                  labelShown={false}
                  value={by}
                  options={[
                    { value: "day", label: "Days" },
                    { value: "hour", label: "Hours" },
                  ]}
                  onChange={(value) => span.change({ by: value })}
                />
              ) : null}
              <a
                href={`/api/console/usage?${span.query}&by=${by}&csv=1`}
                download
                className="inline-flex min-h-5 items-center px-1 text-table font-medium text-ink-soft hover:text-ink"
              >
                CSV
              </a>
            </>
          }
        />
      </div>
      <div className="mt-3 grid gap-3 wide:grid-cols-2">
        <BarChart
          title="Computations"
          at={periods.map(({ at }) => at)}
          by={by}
          parts={[
            { label: "computations", tone: "copper", values: periods.map((each) => each.computations) },
          ]}
        />
        <LatencyFigure periods={periods} by={by} />
      </div>
    </>
  );
}
