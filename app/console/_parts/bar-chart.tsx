"use client";

import { type ReactNode, useMemo, useRef, useState } from "react";
import { scaleBand, type ScaleLinear, scaleLinear } from "d3-scale";
import { Button } from "../../_ui/button";
import { DataTable } from "../../_ui/data-table";
import { useWidth } from "../../_ui/plot/use-width";

export interface BarPart {
  readonly label: string;
  /** Lowest part first. */
  readonly values: readonly number[];
  readonly tone: "verdigris" | "amber" | "oxide" | "copper";
}

interface BarChartProps {
  readonly title: string;
  /** Starts of the periods, ISO 8601. */
  readonly at: readonly string[];
  readonly by: "day" | "hour";
  /** Stacked on one another. */
  readonly parts: readonly BarPart[];
  readonly beside?: ReactNode;
}

const HEIGHT = 180;
const MARGIN = { left: 52, right: 6, top: 8, bottom: 24 };
const FILLS: Readonly<Record<BarPart["tone"], string>> = {
  verdigris: "fill-verdigris",
  amber: "fill-amber",
  oxide: "fill-oxide",
  copper: "fill-copper",
};

/** When a period began, in UTC as the sums are kept: `2025-12-01` or `12-01 14:00`. */
export function periodText(at: string, by: "day" | "hour"): string {
  return by === "day" ? at.slice(0, 10) : `${at.slice(5, 10)} ${at.slice(11, 13)}:00`;
}

/** The same on an axis: a day as `12-01`, an hour within it as `14h`. */
export function periodTick(at: string, by: "day" | "hour"): string {
  return by === "day" || at.slice(11, 13) === "00" ? at.slice(5, 10) : `${at.slice(11, 13)}h`;
}

/** Counts are whole, and so are the numbers beside them, however few there are. */
export function countTicks(y: ScaleLinear<number, number>): number[] {
  return y.ticks(4).filter((value) => Number.isInteger(value));
}

/** Counts over time as stacked bars, with the numbers behind them. */
export function BarChart({ title, at, by, parts, beside }: BarChartProps) {
  const frame = useRef<HTMLDivElement>(null);
  const width = useWidth(frame);
  const [table, setTable] = useState(false);
  const [over, setOver] = useState<number | null>(null);
  const plot = useMemo(() => {
    const totals = at.map((_, index) => parts.reduce((sum, { values }) => sum + (values[index] ?? 0), 0));
    const x = scaleBand<number>(
      at.map((_, index) => index),
      [MARGIN.left, width - MARGIN.right],
    ).paddingInner(0.2);
    const y = scaleLinear([0, Math.max(1, ...totals)], [HEIGHT - MARGIN.bottom, MARGIN.top]).nice(4);
    return { x, y, totals };
  }, [at, parts, width]);
  const { x, y, totals } = plot;
  const every = Math.max(1, Math.ceil(at.length / Math.max(2, Math.floor(width / (by === "day" ? 64 : 90)))));
  const reading =
    over === null
      ? `${totals.reduce((sum, value) => sum + value, 0).toLocaleString("en")} in all`
      : `${periodText(at[over], by)}: ${parts.map(({ label, values }) => `${(values[over] ?? 0).toLocaleString("en")} ${label}`).join(", ")}`;

  return (
    <figure>
      <figcaption className="flex flex-wrap items-center gap-x-2">
        <span className="grow text-table font-semibold">{title}</span>
        {beside}
        <Button variant="quiet" aria-expanded={table} onClick={() => setTable(!table)}>
          {table ? "Hide numbers" : "Numbers"}
        </Button>
      </figcaption>
      <p aria-hidden className="truncate font-mono text-small text-ink-soft">
        {reading}
      </p>
      <div ref={frame}>
        <svg
          viewBox={`0 0 ${width} ${HEIGHT}`}
          height={HEIGHT}
          role="img"
          aria-label={`${title}: ${reading}`}
          onPointerLeave={() => setOver(null)}
          className="block w-full font-sans text-[12px]"
        >
          <g className="fill-ink-soft stroke-rule">
            {countTicks(y).map((value) => (
              <g key={value} transform={`translate(0 ${y(value)})`}>
                <path d={`M${MARGIN.left} 0H${width - MARGIN.right}`} />
                <text x={MARGIN.left - 5} dy="0.35em" textAnchor="end" stroke="none">
                  {value >= 10_000 ? `${value / 1000}k` : value}
                </text>
              </g>
            ))}
          </g>
          {at.map((moment, index) => {
            let below = 0;
            const left = x(index) ?? 0;
            return (
              <g key={moment} onPointerEnter={() => setOver(index)}>
                <rect
                  x={left}
                  y={MARGIN.top}
                  width={x.step()}
                  height={HEIGHT - MARGIN.top - MARGIN.bottom}
                  className={over === index ? "fill-rule" : "fill-transparent"}
                />
                {parts.map(({ label, values, tone }) => {
                  const value = values[index] ?? 0;
                  if (value === 0) return null;
                  const bottom = y(below);
                  below += value;
                  const top = Math.min(y(below), bottom - 1);
                  return (
                    <rect
                      key={label}
                      x={left}
                      y={top}
                      width={x.bandwidth()}
                      height={bottom - top}
                      className={FILLS[tone]}
                    />
                  );
                })}
                {index % every === 0 ? (
                  <text
                    x={left + x.bandwidth() / 2}
                    y={HEIGHT - 7}
                    textAnchor={index === 0 ? "start" : "middle"}
                    className="fill-ink-soft"
                  >
                    {periodTick(moment, by)}
                  </text>
                ) : null}
              </g>
            );
          })}
          <path
            d={`M${MARGIN.left} ${HEIGHT - MARGIN.bottom}H${width - MARGIN.right}`}
            className="stroke-edge"
          />
        </svg>
      </div>
      <ul className="flex flex-wrap gap-x-2 text-small text-ink-soft">
        {parts.map(({ label, tone }) => (
          <li key={label} className="inline-flex items-center gap-0.5">
            <svg viewBox="0 0 10 10" aria-hidden className="size-[10px]">
              <rect width="10" height="10" className={FILLS[tone]} />
            </svg>
            {label}
          </li>
        ))}
        <li className="grow text-end">{by === "day" ? "days" : "hours"} in UTC</li>
      </ul>
      {table ? (
        <div className="mt-1">
          <DataTable
            caption={`${title}: the numbers`}
            maxHeight="18rem"
            rows={at.map((_, index) => index)}
            rowKey={(index) => index}
            columns={[
              {
                key: "at",
                title: by === "day" ? "Day (UTC)" : "Hour (UTC)",
                cell: (index) => periodText(at[index], by),
              },
              ...parts.map(({ label, values }) => ({
                key: label,
                title: label,
                align: "end" as const,
                cell: (index: number) => (values[index] ?? 0).toLocaleString("en"),
              })),
            ]}
          />
        </div>
      ) : null}
    </figure>
  );
}
