"use client";

import { useState } from "react";
import { PlotFigure } from "../../../../_ui/plot/plot-figure";
import type { FieldLineView } from "../../_model/field-view";

/** Potential and density along the line of a profile. */
export function LinePlots({
  samples,
  densityUnit,
}: {
  readonly samples: FieldLineView;
  readonly densityUnit: string;
}) {
  const [cursor, setCursor] = useState<number | null>(null);
  const shared = {
    x: { label: "Distance", unit: "m", values: samples.distance },
    cursor,
    onCursor: setCursor,
  };
  // Outside the conductor there is no value; the plot leaves a gap.
  const values = (all: readonly (number | null)[]) => all.map((value) => value ?? NaN);
  return (
    <div className="grid gap-x-4 gap-y-2 medium:grid-cols-2">
      <PlotFigure
        {...shared}
        title="Potential along the line, at 1 V"
        y={{ label: "Potential", unit: "V" }}
        series={[{ label: "potential", values: values(samples.potential) }]}
        fileName="profile-potential"
      />
      <PlotFigure
        {...shared}
        title="Current density along the line, at 1 V"
        y={{ label: "Current density", unit: densityUnit }}
        series={[
          { label: "size", values: values(samples.density) },
          { label: "along the line", values: values(samples.densityAlong) },
        ]}
        fileName="profile-density"
      />
    </div>
  );
}
