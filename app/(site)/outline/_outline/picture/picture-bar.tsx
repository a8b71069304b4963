"use client";

import type { ReactNode } from "react";
import { Button } from "../../../../_ui/button";
import { superscript } from "../../../../_ui/plot/axis";
import { saveFile } from "../../../../_ui/picture-file";
import { Toggle } from "../../../../_ui/toggle";
import { useToast } from "../../../../_ui/toast";
import { engineering } from "../../../calculate/_calculator/answer/engineering";
import { callApi } from "../../../_live/call-api";
import type { RasterView } from "../../_model/field-view";
import type { LegibleMap } from "../use-field-map";
import { MOST_OPACITY, topDensity } from "./raster-image";
import type { Shown } from "./shown";

interface PictureBarProps {
  readonly id: string;
  readonly map: LegibleMap;
  readonly axisymmetric: boolean;
  readonly shown: Shown;
  readonly setShown: (shown: Shown) => void;
}

/** What of the picture is shown, its legend, and its files. */
export function PictureBar({ id, map, axisymmetric, shown, setShown }: PictureBarProps) {
  const toast = useToast();
  const unit = axisymmetric ? "A/m²" : "A/m";
  const top = topDensity(map.raster);

  async function save(kind: "svg" | "png" | "json" | "csv") {
    try {
      if (kind === "csv")
        return saveFile(`${id}-density.csv`, rasterCsv(map.raster, map.unit, unit), "text/csv");
      if (kind === "json") return saveFile(`${id}-map.json`, JSON.stringify(map), "application/json");
      const text = await (await callApi("GET", `/fields/${id}/plot.svg`)).text();
      if (kind === "svg") return saveFile(`${id}.svg`, text, "image/svg+xml");
      const [width, height] = [/ width="([\d.]+)"/, / height="([\d.]+)"/].map((find) =>
        Number(find.exec(text)?.[1] ?? 960),
      );
      const { pngOfSvg } = await import("../../../../_ui/picture-file");
      saveFile(`${id}.png`, await pngOfSvg(text, width, height), "image/png");
    } catch {
      toast("The file could not be fetched; try again in a moment.");
    }
  }

  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-0.5 text-small" data-testid="picture-bar">
      <div className="flex flex-wrap items-center gap-x-2">
        <Toggle
          label={
            <Legend mark="stroke-ink" dash={undefined}>
              Equipotentials, every {Number((100 * map.voltageStep).toPrecision(3))} % of the voltage
            </Legend>
          }
          checked={shown.equipotentials}
          onChange={(equipotentials) => setShown({ ...shown, equipotentials })}
        />
        <Toggle
          label={
            <Legend mark="stroke-verdigris" dash="6 3">
              Stream lines, {engineering(map.currentBetweenStreamlines, "A")} between two at 1 V
            </Legend>
          }
          checked={shown.streamlines}
          onChange={(streamlines) => setShown({ ...shown, streamlines })}
        />
        <Toggle
          label={
            <span className="inline-flex flex-wrap items-center gap-x-0.5">
              Density 0
              <svg width="80" height="10" aria-hidden className="border border-edge">
                <defs>
                  <linearGradient id="density-scale">
                    <stop offset="0" stopColor="var(--copper)" stopOpacity="0" />
                    <stop offset="1" stopColor="var(--copper)" stopOpacity={MOST_OPACITY} />
                  </linearGradient>
                </defs>
                <rect width="80" height="10" fill="url(#density-scale)" />
              </svg>
              {densityText(top, unit)} and more, at 1 V
            </span>
          }
          checked={shown.density}
          onChange={(density) => setShown({ ...shown, density })}
        />
      </div>
      <div className="ms-auto flex flex-wrap print:hidden">
        {(["svg", "png", "json", "csv"] as const).map((kind) => (
          <Button key={kind} variant="quiet" onClick={() => save(kind)} aria-label={FILES[kind]}>
            {kind.toUpperCase()}
          </Button>
        ))}
      </div>
    </div>
  );
}

const FILES = {
  svg: "Finished picture as SVG",
  png: "Finished picture as PNG",
  json: "Lines and densities as JSON",
  csv: "Densities as CSV",
} as const;

interface LegendProps {
  readonly mark: string;
  readonly dash: string | undefined;
  readonly children: ReactNode;
}

function Legend({ mark, dash, children }: LegendProps) {
  return (
    <span className="inline-flex items-center gap-0.5">
      <svg width="26" height="4" aria-hidden className="shrink-0">
        <path d="M0 2H26" className={mark} strokeWidth="1.5" strokeDasharray={dash} />
      </svg>
      <span>{children}</span>
    </span>
  );
}

/** A density with an engineering prefix; A/m² beyond what a prefix makes readable as a power. */
export function densityText(value: number, unit: string): string {
  if (unit === "A/m" || value === 0) return engineering(value, unit);
  const exponent = Math.floor(Math.log10(Math.abs(value)));
  if (exponent >= -2 && exponent < 5) return engineering(value, unit);
  return `${Number((value / 10 ** exponent).toPrecision(4))}·10${superscript(exponent)} ${unit}`;
}

function rasterCsv(
  { origin, cell, columns, density }: RasterView,
  unit: string,
  densityUnit: string,
): string {
  const rows = density.flatMap((value, k) =>
    value === null
      ? []
      : [[origin[0] + (k % columns) * cell, origin[1] + Math.floor(k / columns) * cell, value].join(",")],
  );
  return [`x/${unit},y/${unit},density at 1 V/(${densityUnit})`, ...rows].join("\r\n") + "\r\n";
}
