"use client";

import dynamic from "next/dynamic";
import { useEffect, useState, useSyncExternalStore } from "react";
import useSWR from "swr";
import { Button } from "../../../../_ui/button";
import { Loading } from "../../../../_ui/states";
import { getApi } from "../../../_live/call-api";
import type { FieldLineView, FieldMapView } from "../../_model/field-view";
import { coordinateText, type Point, type Sketch } from "../../_model/sketch";
import { boxOf } from "../../_model/edges";
import type { Readings } from "../board/tools";
import type { HoverStore } from "../board/hover-store";
import { NumberCell } from "../number-cell";
import { useOutline } from "../outline-context";
import { densityText } from "./picture-bar";

const LinePlots = dynamic(() => import("./line-plots").then((module) => module.LinePlots), {
  ssr: false,
  loading: () => <Loading what="the plots" className="min-h-34" />,
});

/** A pointer that rests this long asks; calls of a signed-out page are few. */
const PROBE_MS = 250;
const SAMPLES = 201;

interface ReadPanelProps {
  readonly id: string;
  readonly map: FieldMapView;
  readonly readings: Readings;
  readonly setReadings: (readings: Readings) => void;
  readonly hover: HoverStore;
  readonly className: string;
}

/** Potential and density at a point, and along a line. */
export function ReadPanel({ id, map, readings, setReadings, hover, className }: ReadPanelProps) {
  const { sketch } = useOutline();
  const over = useSyncExternalStore(hover.subscribe, hover.get, () => null);
  const middle = middleOf(sketch);
  const point = over ?? readings.probe;
  const line = readings.line ?? null;
  const unit = sketch.unit === "um" ? "µm" : sketch.unit;
  const densityUnit = sketch.symmetry === "axisymmetric" ? "A/m²" : "A/m";
  const cell = "w-9";

  return (
    <section
      aria-labelledby="read-off"
      className={`grid grid-cols-1 gap-1 ${className}`}
      data-testid="read-off"
    >
      <h2 id="read-off" className="text-h3">
        Read off
      </h2>
      <p className="text-small text-ink-soft">
        With the tool Read off, move over the board or press on it; drag for a profile. All values at 1 V from{" "}
        {map.between[0]} to {map.between[1]}.
      </p>
      <div className="flex flex-wrap items-center gap-x-1 gap-y-0.5 text-table">
        <span className="min-w-8">At / {unit}</span>
        {[0, 1].map((axis) => (
          <NumberCell
            key={axis}
            label={`Probe, ${axis === 0 ? "x" : "y"}`}
            value={(readings.probe ?? middle)[axis]}
            unit={sketch.unit}
            onCommit={(value) => {
              const [x, y] = readings.probe ?? middle;
              setReadings({ ...readings, probe: axis === 0 ? [value, y] : [x, value] });
            }}
            className={cell}
          />
        ))}
        {readings.probe ? null : (
          <Button
            className="min-h-5.5! py-0! medium:min-h-4!"
            onClick={() => setReadings({ ...readings, probe: middle })}
          >
            Read here
          </Button>
        )}
      </div>
      {point ? <ProbeValues id={id} point={point} unit={unit} densityUnit={densityUnit} /> : null}
      <div className="flex flex-wrap items-center gap-x-1 gap-y-0.5 text-table">
        <span className="min-w-8">Along / {unit}</span>
        {line
          ? [0, 1, 2, 3].map((k) => (
              <span key={k} className="flex items-center gap-0.5">
                {k === 2 ? "…" : null}
                <NumberCell
                  label={`Profile, ${k < 2 ? "start" : "end"} ${k % 2 === 0 ? "x" : "y"}`}
                  value={line[k < 2 ? 0 : 1][k % 2]}
                  unit={sketch.unit}
                  onCommit={(value) => {
                    const flat = [...line[0], ...line[1]];
                    flat[k] = value;
                    setReadings({
                      ...readings,
                      line: [
                        [flat[0], flat[1]],
                        [flat[2], flat[3]],
                      ],
                    });
                  }}
                  className={cell}
                />
              </span>
            ))
          : null}
        <Button
          className="min-h-5.5! py-0! medium:min-h-4!"
          onClick={() => setReadings({ ...readings, line: line ? null : acrossMiddle(sketch) })}
        >
          {line ? "Remove the profile" : "Profile across the middle"}
        </Button>
      </div>
      {line ? <Profile id={id} line={line} densityUnit={densityUnit} /> : null}
    </section>
  );
}

interface ProbeValuesProps {
  readonly id: string;
  readonly point: Point;
  readonly unit: string;
  readonly densityUnit: string;
}

function ProbeValues({ id, point, unit, densityUnit }: ProbeValuesProps) {
  const asked = usePaused(point, PROBE_MS);
  const { data, error } = useLine(id, asked, asked, 2);
  const [potential, density] = [data?.potential[0], data?.density[0]];
  return (
    <p className="min-h-2.5 font-mono text-table" aria-live="polite" data-testid="probe">
      ({coordinateText(point[0])}, {coordinateText(point[1])}) {unit}:{" "}
      {data === undefined
        ? error
          ? "no answer for now"
          : "…"
        : potential === null || potential === undefined
          ? "outside the conductor"
          : `${potential.toFixed(4)} V, ${densityText(density ?? 0, densityUnit)}`}
    </p>
  );
}

function Profile({
  id,
  line: [from, to],
  densityUnit,
}: {
  readonly id: string;
  readonly line: readonly [Point, Point];
  readonly densityUnit: string;
}) {
  const asked = usePaused(`${from} ${to}`, PROBE_MS);
  const current = asked === `${from} ${to}`;
  const [known, setKnown] = useState<readonly [Point, Point]>([from, to]);
  if (current && `${known[0]} ${known[1]}` !== asked) setKnown([from, to]);
  const { data, error } = useLine(id, known[0], known[1], SAMPLES);
  if (error && !data) return <p className="text-table text-amber">No answer for now; the page asks again.</p>;
  if (!data) return <Loading what="the profile" className="min-h-34" />;
  if (data.potential.every((value) => value === null)) {
    return <p className="text-table text-ink-soft">The line runs outside the conductor.</p>;
  }
  return <LinePlots samples={data} densityUnit={densityUnit} />;
}

function useLine(id: string, from: Point, to: Point, samples: number) {
  const query = `from=${from.join(",")}&to=${to.join(",")}&samples=${samples}`;
  return useSWR<FieldLineView, Error>(
    `/fields/${id}/line?${query}`,
    (path: string) => getApi<FieldLineView>(path),
    {
      keepPreviousData: samples > 2,
      revalidateIfStale: false,
      revalidateOnFocus: false,
      errorRetryInterval: 4000,
    },
  );
}

/** A value once it has stood still. */
function usePaused<Value>(value: Value, ms: number): Value {
  const [paused, setPaused] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setPaused(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return paused;
}

function middleOf(sketch: Sketch): Point {
  const { minX, minY, maxX, maxY } = boxOf(sketch.rings.slice(0, 1)) ?? {
    minX: 0,
    minY: 0,
    maxX: 1,
    maxY: 1,
  };
  return [tidyHalf(minX, maxX), tidyHalf(minY, maxY)];
}

function acrossMiddle(sketch: Sketch): readonly [Point, Point] {
  const box = boxOf(sketch.rings.slice(0, 1)) ?? { minX: 0, minY: 0, maxX: 1, maxY: 1 };
  const y = tidyHalf(box.minY, box.maxY);
  return [
    [box.minX, y],
    [box.maxX, y],
  ];
}

function tidyHalf(a: number, b: number): number {
  return Number(((a + b) / 2).toPrecision(6));
}
