"use client";

import { useEffect, useState } from "react";
import useSWR from "swr";
import { PlotFigure } from "../../../../_ui/plot/plot-figure";
import { Loading } from "../../../../_ui/states";
import { plainDimensions, requestBody } from "../../_model/request";
import { nominalParameters } from "../../_model/tolerances";
import type { ProfilePreview } from "../../_server/profile-preview";
import { useForm } from "../form-context";

const PAUSE_MS = 120;

const QUANTITIES = {
  conductivity: { label: "Conductivity", unit: "S/m" },
  resistivity: { label: "Resistivity", unit: "Ω·m" },
  density: { label: "Dopant density", unit: "1/cm³" },
} as const;

/** The profile as it stands, over the whole range of its coordinate; the last one that made sense while it does not. */
export function ProfilePlot({ prefix, label }: { readonly prefix: string; readonly label: string }) {
  const { entry, parameters } = useForm();
  const body = requestBody(entry, nominalParameters(parameters));
  const medium = prefix === "" ? body.medium : body.media?.[prefix.slice(0, -1)];
  const text = JSON.stringify({
    dimensions: plainDimensions(entry, parameters),
    graded: medium?.graded ?? {},
  });
  const [asked, setAsked] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(text), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [text]);
  const { data, error } = useSWR<ProfilePreview, Error>(
    [`/calculate/${entry.id}/profile`, asked],
    ([path, content]: [string, string]) => postJson<ProfilePreview>(path, content),
    { keepPreviousData: true, revalidateIfStale: false, revalidateOnFocus: false, shouldRetryOnError: false },
  );
  if (!data) {
    return error ? (
      <p className="grid min-h-[280px] place-items-center border-t border-rule text-table text-ink-soft">
        The profile is plotted as soon as it can be read.
      </p>
    ) : (
      <Loading what="the profile" className="min-h-[280px]" />
    );
  }
  const { label: quantity, unit } = QUANTITIES[data.quantity];
  const largest = Math.max(...data.values);
  const smallest = Math.min(...data.values);
  return (
    <div className={error ? "opacity-60" : undefined}>
      <PlotFigure
        key={`${data.quantity} ${data.coordinate}`}
        title={`Profile as entered${error ? " before the last change" : ""}`}
        x={{ label: shortLabel(label), unit: data.unit === "deg" ? "°" : "m", values: data.positions }}
        y={{ label: quantity, unit }}
        series={[{ label: quantity, values: data.values }]}
        fileName={`${entry.id}-profile`}
        startLogY={smallest > 0 && largest / smallest > 100}
      />
    </div>
  );
}

/** The plot's axis has room for a few words. */
function shortLabel(label: string): string {
  return label.length <= 32 ? label : `${label.slice(0, 31)}…`;
}

async function postJson<Result>(path: string, body: string): Promise<Result> {
  const response = await fetch(path, {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body,
  });
  if (!response.ok) throw new Error(`The service answered ${response.status}.`);
  return response.json();
}
