"use client";

import { OutlineDrawing } from "../../_ui/drawing/outline-drawing";
import type { OutlinePlan } from "../../_ui/drawing/outline-plan";
import { filled } from "../_words/words";
import type { FrameView } from "./frame-view";
import { localNumbers } from "./local-number";

/** The outline that a widget is on, with its terminals and its size; loaded only where there is one. */
export function PlanView({ view, plan }: { readonly view: FrameView; readonly plan: OutlinePlan }) {
  const { words, locale } = view;
  const size = localNumbers(plan.size, locale);
  const names = plan.terminals.map(({ name }) => name).join(", ");
  return (
    <figure>
      <OutlineDrawing
        plan={plan}
        label={filled(words.outlineOf, size, names)}
        className="mx-auto block w-full max-w-[20rem]"
      />
      <figcaption className="text-center font-mono text-small text-ink-soft">{size}</figcaption>
    </figure>
  );
}
