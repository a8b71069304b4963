"use client";

import { useMemo } from "react";
import katex from "katex";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";

/** How the number came about, step by step, typeset. Loaded when it is looked at. */
export function Steps({ steps }: { readonly steps: NonNullable<ResistanceResult["steps"]> }) {
  return (
    <ol className="grid gap-2">
      {steps.map((step, index) => (
        <li key={index} className="grid gap-x-3 medium:grid-cols-[14rem_minmax(0,1fr)]">
          <p className="text-table">
            <span className="font-mono text-small text-ink-soft">{index + 1}</span> {step.title}
          </p>
          <div>
            <TexLine tex={step.tex} title={step.title} />
            {step.value ? <p className="font-mono text-table">{step.value}</p> : null}
          </div>
        </li>
      ))}
    </ol>
  );
}

function TexLine({ tex, title }: { readonly tex: string; readonly title: string }) {
  const html = useMemo(
    () =>
      katex.renderToString(tex, { displayMode: false, throwOnError: false, strict: "ignore", trust: false }),
    [tex],
  );
  return (
    <div
      tabIndex={0}
      role="group"
      aria-label={title}
      className="overflow-x-auto overflow-y-hidden py-0.5"
      dangerouslySetInnerHTML={{ __html: html }}
    />
  );
}
