"use client";

import { useMemo } from "react";
import katex from "katex";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { StepList } from "./step-list";

/** How the number came about, step by step, typeset. Loaded when it is looked at. */
export function Steps({ steps }: { readonly steps: NonNullable<ResistanceResult["steps"]> }) {
  return <StepList steps={steps} line={(tex, title) => <TexLine tex={tex} title={title} />} />;
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
