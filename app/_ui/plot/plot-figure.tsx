"use client";

import { useRef, useState } from "react";
import { Button } from "../button";
import { DataTable } from "../data-table";
import { pngFile, saveFile, svgFile } from "../picture-file";
import { Toggle } from "../toggle";
import { fitsLog } from "./axis";
import { LinePlot, type PlotAxis, type PlotSeries } from "./line-plot";
import { csvText } from "./plot-csv";

interface PlotFigureProps {
  readonly title: string;
  readonly x: PlotAxis & { readonly values: readonly number[] };
  readonly y: PlotAxis;
  readonly series: readonly PlotSeries[];
  /** Name of the files, without their ending. */
  readonly fileName: string;
  readonly startLogY?: boolean;
  /** Shared between plots of one coordinate, so that all are read off at the same place. */
  readonly cursor?: number | null;
  readonly onCursor?: (index: number | null) => void;
}

/** A plot with its axes' switches, its downloads and the numbers behind it. */
export function PlotFigure(props: PlotFigureProps) {
  const { title, x, y, series, fileName, startLogY = false } = props;
  const [ownCursor, setOwnCursor] = useState<number | null>(null);
  const [logX, setLogX] = useState(false);
  const [logY, setLogY] = useState(startLogY);
  const [table, setTable] = useState(false);
  const frame = useRef<HTMLDivElement>(null);
  const canLogX = fitsLog(x.values);
  const canLogY = series.every(({ values }) => fitsLog(values));
  const columns = [
    { title: x.label, unit: x.unit, values: x.values },
    ...series.map(({ label, values }) => ({ title: label, unit: y.unit, values })),
  ];
  const picture = () => frame.current?.querySelector<SVGSVGElement>('svg[role="slider"]');

  async function savePng() {
    const svg = picture();
    if (svg) saveFile(`${fileName}.png`, await pngFile(svg), "image/png");
  }

  function saveSvg() {
    const svg = picture();
    if (svg) saveFile(`${fileName}.svg`, svgFile(svg), "image/svg+xml");
  }

  return (
    <figure className="border-t border-rule pt-1.5">
      <figcaption className="flex min-h-5.5 flex-wrap items-center gap-x-2 medium:min-h-4">
        <span className="grow text-table font-semibold">{title}</span>
        <span className="flex flex-wrap items-center gap-x-2 print:hidden">
          {canLogX ? <Toggle label={<>log x</>} checked={logX} onChange={setLogX} /> : null}
          {canLogY ? <Toggle label={<>log y</>} checked={logY} onChange={setLogY} /> : null}
        </span>
      </figcaption>
      <div ref={frame}>
        <LinePlot
          title={title}
          x={x}
          y={y}
          series={series}
          logX={logX && canLogX}
          logY={logY && canLogY}
          cursor={props.cursor === undefined ? ownCursor : props.cursor}
          onCursor={props.onCursor ?? setOwnCursor}
        />
      </div>
      <div className="flex flex-wrap items-center gap-x-0.5 print:hidden">
        <Button variant="quiet" aria-expanded={table} onClick={() => setTable(!table)}>
          {table ? "Hide numbers" : "Numbers"}
        </Button>
        <Button
          variant="quiet"
          onClick={() => saveFile(`${fileName}.csv`, csvText(columns), "text/csv")}
          aria-label={`${title} as CSV`}
        >
          CSV
        </Button>
        <Button variant="quiet" onClick={saveSvg} aria-label={`${title} as SVG`}>
          SVG
        </Button>
        <Button variant="quiet" onClick={savePng} aria-label={`${title} as PNG`}>
          PNG
        </Button>
      </div>
      {table ? (
        <DataTable
          caption={`${title}: the numbers`}
          maxHeight="18rem"
          rows={x.values.map((_, index) => index)}
          rowKey={(index) => index}
          columns={columns.map((column) => ({
            key: column.title,
            title: column.unit === "" ? column.title : `${column.title} / ${column.unit}`,
            align: "end" as const,
            cell: (index: number) => String(column.values[index]),
          }))}
        />
      ) : null}
    </figure>
  );
}
