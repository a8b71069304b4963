"use client";

import type { ReactNode } from "react";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { engineering } from "./engineering";

/** Conductance, operating point and peak, as a list of pairs. */
export function Facts({ result }: { readonly result: ResistanceResult }) {
  const { operating, peak, conductance, materials } = result;
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-2 gap-y-0.5 text-table narrow:grid-cols-[auto_1fr_auto_1fr]">
      <Fact title="Conductance">{conductance.text}</Fact>
      <Fact title="Temperature">{operating.temperature} °C</Fact>
      {operating.voltage === undefined ? null : (
        <Fact title="Voltage">{engineering(operating.voltage, "V")}</Fact>
      )}
      {operating.current === undefined ? null : (
        <Fact title="Current">{engineering(operating.current, "A")}</Fact>
      )}
      {operating.power === undefined ? null : <Fact title="Power">{engineering(operating.power, "W")}</Fact>}
      {peak ? <PeakFacts peak={peak} /> : null}
      {materials.length > 0 ? (
        <Fact title={materials.length > 1 ? "Materials" : "Material"} plain wide>
          {materials.map(({ name, version }) => `${name}, version ${version}`).join("; ")}
        </Fact>
      ) : null}
    </dl>
  );
}

function PeakFacts({ peak }: { readonly peak: NonNullable<ResistanceResult["peak"]> }) {
  const per = peak.per === "volt" ? " at 1 V" : "";
  const fact = (
    quantity: { readonly value: number | null; readonly text: string },
    place: string,
  ): ReactNode => {
    // An unbounded peak says so at its place already.
    if (quantity.value === null && place.startsWith(quantity.text)) return <Place>{place}</Place>;
    return (
      <>
        {quantity.text}
        {quantity.value === null ? "" : per} <Place>{place}</Place>
      </>
    );
  };
  return (
    <>
      <Fact title="Peak field">{fact(peak.field, peak.position.text)}</Fact>
      <Fact title="Peak density">{fact(peak.currentDensity, peak.currentDensityPosition.text)}</Fact>
    </>
  );
}

function Place({ children }: { readonly children: string }) {
  return <span className="font-sans text-small text-ink-soft">{children}</span>;
}

interface FactProps {
  readonly title: string;
  readonly children: ReactNode;
  readonly plain?: boolean;
  readonly wide?: boolean;
}

function Fact({ title, children, plain = false, wide = false }: FactProps) {
  return (
    <>
      <dt className="text-ink-soft">{title}</dt>
      <dd className={`${plain ? "" : "font-mono"} ${wide ? "narrow:col-span-3" : ""}`}>{children}</dd>
    </>
  );
}
