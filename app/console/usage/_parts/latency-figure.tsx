"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { DataTable } from "../../../_ui/data-table";
import { LinePlot } from "../../../_ui/plot/line-plot";
import { periodText, periodTick } from "../../_parts/bar-chart";
import { msText } from "../../_parts/numbers";
import type { Period } from "./usage-answers";

interface LatencyFigureProps {
  readonly periods: readonly Period[];
  readonly by: "day" | "hour";
}

const NAMES = { p50Ms: "median", p95Ms: "95 %", p99Ms: "99 %" } as const;

/** Percentiles of the latency over time; where they are kept by team only, the mean. */
export function LatencyFigure({ periods, by }: LatencyFigureProps) {
  const [cursor, setCursor] = useState<number | null>(null);
  const [table, setTable] = useState(false);
  const kept = periods.some(({ p50Ms }) => p50Ms !== null);
  const longest = Math.max(...periods.map(({ p99Ms, meanMs }) => p99Ms ?? meanMs ?? 0));
  const [unit, perUnit] = longest >= 1000 ? ["s", 1000] : ["ms", 1];
  const series = kept
    ? (["p50Ms", "p95Ms", "p99Ms"] as const).map((name) => ({
        label: NAMES[name],
        values: periods.map((each) => (each[name] ?? NaN) / perUnit),
      }))
    : [{ label: "mean", values: periods.map(({ meanMs }) => (meanMs ?? NaN) / perUnit) }];
  const points = series[0].values.filter(Number.isFinite).length;
  const title = kept ? "Latency" : "Latency, mean";
  return (
    <figure>
      <figcaption className="flex flex-wrap items-center gap-x-2">
        <span className="grow text-table font-semibold">{title}</span>
        <Button variant="quiet" aria-expanded={table} onClick={() => setTable(!table)}>
          {table ? "Hide numbers" : "Numbers"}
        </Button>
      </figcaption>
      {points > 1 ? (
        <LinePlot
          title={title}
          x={{
            label: by === "day" ? "Day (UTC)" : "Hour (UTC)",
            unit: "",
            values: periods.map((_, index) => index),
            names: periods.map(({ at }) => ({ tick: periodTick(at, by), full: periodText(at, by) })),
          }}
          y={{ label: "Latency", unit }}
          series={series}
          logX={false}
          logY={false}
          cursor={cursor}
          onCursor={setCursor}
        />
      ) : (
        <p className="py-3 text-table text-ink-soft">
          {points === 0
            ? "No call in these days."
            : "Calls in one of these periods only: the numbers are below, a line needs two."}
        </p>
      )}
      {table ? (
        <DataTable
          caption={`${title}: the numbers`}
          maxHeight="18rem"
          rows={periods}
          rowKey={({ at }) => at}
          columns={[
            {
              key: "at",
              title: by === "day" ? "Day (UTC)" : "Hour (UTC)",
              cell: ({ at }) => periodText(at, by),
            },
            { key: "mean", title: "Mean", align: "end", cell: ({ meanMs }) => msText(meanMs) },
            ...(kept
              ? (["p50Ms", "p95Ms", "p99Ms"] as const).map((name) => ({
                  key: name,
                  title: NAMES[name],
                  align: "end" as const,
                  cell: (row: Period) => msText(row[name]),
                }))
              : []),
          ]}
        />
      ) : null}
    </figure>
  );
}
