"use client";

import { useState } from "react";
import type { ShapeEntry } from "@/lib/engine";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { PlotFigure } from "../../../../_ui/plot/plot-figure";
import { varies } from "./plots-place";

interface FlowPlotsProps {
  readonly entry: ShapeEntry;
  readonly profile: NonNullable<ResistanceResult["profile"]>;
}

/** Potential, field, current density and conductivity along the flow, and across it for a medium graded there. */
export function FlowPlots({ entry, profile }: FlowPlotsProps) {
  const [cursor, setCursor] = useState<number | null>(null);
  const x = axisOf(entry, profile.coordinate, profile.unit, profile.position);
  const per = profile.per === "volt" ? ", at 1 V" : "";
  const shared = { x, cursor, onCursor: setCursor };
  const { across } = profile;
  return (
    <div className="grid gap-x-4 gap-y-2 medium:grid-cols-2">
      <PlotFigure
        {...shared}
        title={`Potential${per}`}
        y={{ label: "Potential", unit: "V" }}
        series={[{ label: "potential", values: profile.potential }]}
        fileName={`${entry.id}-potential`}
      />
      <PlotFigure
        {...shared}
        title={`Field strength${per}`}
        y={{ label: "Field", unit: "V/m" }}
        series={[{ label: "field", values: profile.field }]}
        fileName={`${entry.id}-field`}
      />
      <PlotFigure
        {...shared}
        title={`Current density${per}`}
        y={{ label: "Current density", unit: "A/m²" }}
        series={[{ label: "current density", values: profile.currentDensity }]}
        fileName={`${entry.id}-current-density`}
      />
      {varies(profile.conductivity) ? (
        <PlotFigure
          {...shared}
          title="Conductivity along the flow"
          y={{ label: "Conductivity", unit: "S/m" }}
          series={[{ label: "conductivity", values: profile.conductivity }]}
          fileName={`${entry.id}-conductivity`}
        />
      ) : null}
      {across ? <AcrossPlots entry={entry} across={across} per={per} /> : null}
    </div>
  );
}

function AcrossPlots({
  entry,
  across,
  per,
}: {
  readonly entry: ShapeEntry;
  readonly across: NonNullable<NonNullable<ResistanceResult["profile"]>["across"]>;
  readonly per: string;
}) {
  const [cursor, setCursor] = useState<number | null>(null);
  const shared = {
    x: axisOf(entry, across.coordinate, across.unit, across.position),
    cursor,
    onCursor: setCursor,
  };
  return (
    <>
      <PlotFigure
        {...shared}
        title="Conductivity across the flow"
        y={{ label: "Conductivity", unit: "S/m" }}
        series={[{ label: "conductivity", values: across.conductivity }]}
        fileName={`${entry.id}-conductivity-across`}
      />
      <PlotFigure
        {...shared}
        title={`Current density across the flow${per}`}
        y={{ label: "Current density", unit: "A/m²" }}
        series={[{ label: "current density", values: across.currentDensity }]}
        fileName={`${entry.id}-current-density-across`}
      />
    </>
  );
}

function axisOf(entry: ShapeEntry, name: string, unit: "m" | "rad", values: readonly number[]) {
  const label = entry.coordinates.find((coordinate) => coordinate.name === name)?.label ?? name;
  return unit === "rad"
    ? { label, unit: "°", values: values.map((value) => (value / Math.PI) * 180) }
    : { label, unit: "m", values };
}
