"use client";

import { type KeyboardEvent, type PointerEvent, useId, useMemo, useRef } from "react";
import { line } from "d3-shape";
import { type AxisUnit, axisUnit, domainOf, powerLabel, readOff } from "./axis";
import { decadeTicks, roundDomain, roundLabels, roundTicks, type Scale, scaleOf } from "./scale";
import { useWidth } from "./use-width";

export interface PlotAxis {
  readonly label: string;
  /** Plain unit of the values, "V/m"; the axis chooses the prefix. */
  readonly unit: string;
}

/** Values along the coordinate. Where each has a name of its own, such as a date, names stand for numbers and unit. */
export interface PlotPlaces extends PlotAxis {
  readonly values: readonly number[];
  readonly names?: readonly { readonly tick: string; readonly full: string }[];
}

export interface PlotSeries {
  readonly label: string;
  readonly values: readonly number[];
}

interface LinePlotProps {
  readonly title: string;
  readonly x: PlotPlaces;
  readonly y: PlotAxis;
  readonly series: readonly PlotSeries[];
  readonly logX: boolean;
  readonly logY: boolean;
  /** Index of the sample that is read off. */
  readonly cursor: number | null;
  readonly onCursor: (index: number | null) => void;
  /** Where the page speaks another language: what the plot is for, that nothing is chosen yet, how numbers are written. */
  readonly spoken?: {
    readonly readOff: string;
    readonly noPosition: string;
    readonly numbers: (text: string) => string;
  };
}

const HEIGHT = 220;
const MARGIN = { left: 62, right: 14, top: 10, bottom: 40 };
const STROKES = [
  { className: "stroke-copper" },
  { className: "stroke-verdigris", strokeDasharray: "7 3" },
  { className: "stroke-ink", strokeDasharray: "2 3" },
  { className: "stroke-amber", strokeDasharray: "9 3 2 3" },
] as const;

/** One or a few lines over one coordinate. Pointer and arrow keys move a hair line that reads the values off. */
export function LinePlot(props: LinePlotProps) {
  const { title, x, y, series, logX, logY, cursor, onCursor, spoken } = props;
  const frame = useRef<HTMLDivElement>(null);
  const clip = useId();
  const width = useWidth(frame);

  const plot = useMemo(() => {
    // A place without a value is a gap.
    const all = series.flatMap(({ values }) => values.filter((value) => Number.isFinite(value)));
    const xUnit = axisUnit(x.values, x.unit);
    const yUnit = axisUnit(all, y.unit);
    const xs = x.values.map((value) => value * xUnit.factor);
    const horizontal = scaleOf(logX, domainOf(xs, logX, false), [MARGIN.left, width - MARGIN.right]);
    const ys = all.map((value) => value * yUnit.factor);
    const vertical = scaleOf(logY, roundDomain(logY, domainOf(ys, logY, true)), [
      HEIGHT - MARGIN.bottom,
      MARGIN.top,
    ]);
    const paths = series.map(({ values }) => {
      const draw = line<number>()
        .x((_, i) => horizontal(xs[i]))
        .y((value) => vertical(value * yUnit.factor))
        .defined(
          (value, i) => Number.isFinite(vertical(value * yUnit.factor)) && Number.isFinite(horizontal(xs[i])),
        );
      return draw(values as number[]) ?? "";
    });
    return {
      xUnit,
      yUnit,
      xs,
      horizontal,
      vertical,
      paths,
      xTicks: x.names
        ? namedTicks(xs, x.names, Math.max(2, Math.floor(width / 90)))
        : ticksOf(horizontal, logX, Math.max(3, Math.floor(width / 90))),
      yTicks: ticksOf(vertical, logY, 5),
    };
  }, [x, y, series, logX, logY, width]);

  const { xUnit, yUnit, xs, horizontal, vertical, paths } = plot;
  const last = x.values.length - 1;
  const numbers = spoken?.numbers ?? ((text: string) => text);
  const reading =
    cursor === null || cursor > last
      ? null
      : numbers(readingText(cursor, x, series, y, { xUnit, yUnit }, xs[cursor]));

  function follow(event: PointerEvent<SVGSVGElement>) {
    const box = event.currentTarget.getBoundingClientRect();
    const at = ((event.clientX - box.left) / box.width) * width;
    let nearest = 0;
    let distance = Infinity;
    xs.forEach((value, index) => {
      const away = Math.abs(horizontal(value) - at);
      if (away < distance) [nearest, distance] = [index, away];
    });
    onCursor(nearest);
  }

  function step(event: KeyboardEvent) {
    const from = cursor ?? 0;
    const large = Math.max(1, Math.round(last / 10));
    const next = {
      ArrowRight: from + 1,
      ArrowUp: from + 1,
      ArrowLeft: from - 1,
      ArrowDown: from - 1,
      PageUp: from + large,
      PageDown: from - large,
      Home: 0,
      End: last,
    }[event.key];
    if (event.key === "Escape") onCursor(null);
    if (next === undefined) return;
    event.preventDefault();
    onCursor(Math.min(last, Math.max(0, next)));
  }

  return (
    <div ref={frame} className="relative">
      <p aria-hidden className="min-h-2.5 truncate ps-[62px] font-mono text-small text-ink-soft">
        {reading ?? ""}
      </p>
      <svg
        viewBox={`0 0 ${width} ${HEIGHT}`}
        height={HEIGHT}
        role="slider"
        aria-label={spoken?.readOff ?? `${title}: read off a value`}
        aria-orientation="horizontal"
        aria-valuemin={0}
        aria-valuemax={last}
        aria-valuenow={cursor ?? 0}
        aria-valuetext={reading ?? spoken?.noPosition ?? "No position chosen"}
        tabIndex={0}
        onPointerMove={follow}
        onPointerDown={follow}
        onPointerLeave={(event) => event.pointerType === "mouse" && onCursor(null)}
        onKeyDown={step}
        className="block w-full cursor-crosshair touch-pan-y font-sans text-[12px]"
      >
        <clipPath id={clip}>
          <rect
            x={MARGIN.left}
            y={MARGIN.top - 2}
            width={Math.max(0, width - MARGIN.left - MARGIN.right)}
            height={HEIGHT - MARGIN.top - MARGIN.bottom + 4}
          />
        </clipPath>
        <g className="fill-ink-soft stroke-rule" strokeWidth="1">
          {plot.yTicks.map(({ value, label }) => (
            <g key={value} transform={`translate(0 ${vertical(value)})`}>
              <path d={`M${MARGIN.left} 0H${width - MARGIN.right}`} />
              <text x={MARGIN.left - 6} dy="0.35em" textAnchor="end" stroke="none">
                {numbers(label)}
              </text>
            </g>
          ))}
          {plot.xTicks.map(({ value, label }) => (
            <g key={value} transform={`translate(${horizontal(value)} ${HEIGHT - MARGIN.bottom})`}>
              <path d="M0 0V5" className="stroke-edge" />
              <text y="18" textAnchor={x.names && value === xs[last] ? "end" : "middle"} stroke="none">
                {numbers(label)}
              </text>
            </g>
          ))}
        </g>
        <path
          d={`M${MARGIN.left} ${MARGIN.top}V${HEIGHT - MARGIN.bottom}H${width - MARGIN.right}`}
          fill="none"
          className="stroke-edge"
        />
        <text x={width - MARGIN.right} y={HEIGHT - 6} textAnchor="end" className="fill-ink">
          {x.names ? x.label : `${x.label} / ${xUnit.label}`}
        </text>
        <text transform={`translate(12 ${MARGIN.top}) rotate(-90)`} textAnchor="end" className="fill-ink">
          {y.label} / {yUnit.label}
        </text>
        <g clipPath={`url(#${clip})`} fill="none" strokeWidth="2" strokeLinejoin="round">
          {paths.map((path, index) => (
            <path key={index} d={path} {...STROKES[index % STROKES.length]} />
          ))}
        </g>
        {cursor !== null && cursor <= last ? (
          <g pointerEvents="none" data-cursor="">
            <path
              d={`M${horizontal(xs[cursor])} ${MARGIN.top}V${HEIGHT - MARGIN.bottom}`}
              className="stroke-ink"
              strokeDasharray="3 3"
            />
            {series
              .filter(({ values }) => Number.isFinite(values[cursor]))
              .map(({ label, values }) => (
                <circle
                  key={label}
                  cx={horizontal(xs[cursor])}
                  cy={vertical(values[cursor] * yUnit.factor)}
                  r="4"
                  className="fill-sheet stroke-ink"
                  strokeWidth="1.5"
                />
              ))}
          </g>
        ) : null}
      </svg>
      {series.length > 1 ? <Legend series={series} /> : null}
    </div>
  );
}

function Legend({ series }: { readonly series: readonly PlotSeries[] }) {
  return (
    <ul className="flex flex-wrap gap-x-2 gap-y-0.5 ps-[62px] text-small text-ink-soft">
      {series.map(({ label }, index) => (
        <li key={label} className="inline-flex items-center gap-0.5">
          <svg viewBox="0 0 28 6" aria-hidden className="h-[6px] w-[28px]">
            <path d="M0 3H28" strokeWidth="2" {...STROKES[index % STROKES.length]} />
          </svg>
          {label}
        </li>
      ))}
    </ul>
  );
}

interface Tick {
  readonly value: number;
  readonly label: string;
}

/** The names of some places, evenly spread. */
function namedTicks(
  xs: readonly number[],
  names: NonNullable<PlotPlaces["names"]>,
  count: number,
): readonly Tick[] {
  const every = Math.max(1, Math.ceil(xs.length / count));
  return xs.flatMap((value, index) => (index % every === 0 ? [{ value, label: names[index].tick }] : []));
}

function ticksOf({ domain }: Scale, log: boolean, count: number): readonly Tick[] {
  if (!log) {
    const label = roundLabels(domain, count);
    return roundTicks(domain, count).map((value) => ({ value, label: label(value) }));
  }
  const [from, to] = domain;
  const decades = Math.log10(to / from);
  const wanted = decadeTicks(domain).filter((value) => {
    const power = Math.log10(value);
    const whole = Math.abs(power - Math.round(power)) < 1e-9;
    const every = Math.max(1, Math.ceil(decades / count));
    return whole ? Math.round(power) % every === 0 : decades < 2;
  });
  return wanted.map((value) => ({
    value,
    label: decades < 2 ? String(Number(value.toPrecision(3))) : powerLabel(value),
  }));
}

function readingText(
  index: number,
  x: LinePlotProps["x"],
  series: readonly PlotSeries[],
  y: PlotAxis,
  { xUnit, yUnit }: { readonly xUnit: AxisUnit; readonly yUnit: AxisUnit },
  position: number,
): string {
  const values = series.map(({ label, values: all }) => {
    const value = all[index] * yUnit.factor;
    const text = Number.isFinite(value) ? `${readOff(value)} ${yUnit.label}` : "none here";
    return series.length > 1 ? `${label} ${text}` : text;
  });
  const place = x.names ? x.names[index].full : `${x.label} ${readOff(position)} ${xUnit.label}`;
  return `${place}: ${y.label.toLowerCase()} ${values.join("; ")}`;
}
