"use client";

import { useState } from "react";
import { LinePlot } from "../../_ui/plot/line-plot";
import { filled } from "../_words/words";
import type { FrameResult, FrameView } from "./frame-view";
import { localNumbers } from "./local-number";

interface FramePlotsProps {
  readonly view: FrameView;
  readonly profile: NonNullable<FrameResult["profile"]>;
}

/** Potential, field and current density along the flow; loaded only where the widget shows them. */
export function FramePlots({ view, profile }: FramePlotsProps) {
  const { words } = view;
  const [cursor, setCursor] = useState<number | null>(null);
  const angle = profile.unit === "rad";
  const x = {
    label: view.coordinateLabel,
    unit: angle ? "°" : "m",
    values: angle ? profile.position.map((value) => (value / Math.PI) * 180) : profile.position,
  };
  const plots = [
    { title: words.potential, unit: "V", values: profile.potential },
    { title: words.field, unit: "V/m", values: profile.field },
    { title: words.currentDensity, unit: "A/m²", values: profile.currentDensity },
  ];
  const per = profile.per === "volt" ? `, ${words.atOneVolt}` : "";
  return (
    <div className="mt-2 grid gap-x-3 gap-y-1.5 min-[600px]:grid-cols-2">
      {plots.map(({ title, unit, values }) => (
        <figure key={title} className="border-t border-rule pt-1">
          <figcaption className="text-table font-semibold">{`${title}${per}`}</figcaption>
          <LinePlot
            title={title}
            x={x}
            y={{ label: title, unit }}
            series={[{ label: title, values }]}
            logX={false}
            logY={false}
            cursor={cursor}
            onCursor={setCursor}
            spoken={{
              readOff: filled(words.readOff, title),
              noPosition: words.noPosition,
              numbers: (text) => localNumbers(text, view.locale),
            }}
          />
        </figure>
      ))}
    </div>
  );
}
