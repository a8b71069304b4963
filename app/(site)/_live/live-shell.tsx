"use client";

import { useMemo, useState } from "react";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { cylindricalShell } from "@/lib/engine/shape/radial/cylindrical-shell";
import { readableDrawing } from "@/lib/engine/shape/readable";
import { resolveDimensions } from "@/lib/engine/shape/resolve-dimensions";
import { CodeBlock } from "../../_ui/code-block";
import { ShapeDrawing } from "../../_ui/drawing/shape-drawing";
import { QuantityInput } from "../../_ui/quantity-input";
import { Tabs } from "../../_ui/tabs";
import { Answer } from "./answer";
import { ApiProblem } from "./call-api";
import { type ShellInput, SHELL_FIELDS, shellRequest } from "./shell-request";
import { resistanceSnippets } from "./snippets";
import { useResistance } from "./use-resistance";

interface LiveShellProps {
  readonly start: ShellInput;
  /** The answer to the start, so that the page has one before its script runs. */
  readonly initial: ResistanceResult;
  /** Where the API is reached, for the snippets. */
  readonly origin: string;
}

/** One live calculation: a cylindrical shell with editable numbers, its drawing, its answer, and the same call as code. */
export function LiveShell({ start, initial, origin }: LiveShellProps) {
  const [input, setInput] = useState(start);
  const [focused, setFocused] = useState<string>();
  const request = shellRequest(input);
  const live = useResistance(request, initial);

  const errors = live.problem instanceof ApiProblem ? (live.problem.problem.errors ?? []) : [];
  const pointers = new Set<string>(SHELL_FIELDS.map((field) => field.pointer));
  const errorAt = (pointer: string) => errors.find((error) => error.pointer === pointer)?.detail;
  const picture = useDrawing(input);

  return (
    <>
      <section
        aria-label="Live calculation"
        className="grid gap-4 rounded border border-rule bg-sheet p-2 medium:p-3 wide:grid-cols-[13rem_minmax(0,1fr)_17rem]"
      >
        <form
          className="grid grid-cols-2 gap-x-2 gap-y-0.5 wide:grid-cols-1"
          onSubmit={(event) => event.preventDefault()}
        >
          {SHELL_FIELDS.map(({ name, label, symbol, pointer }) => (
            <QuantityInput
              key={name}
              name={name}
              label={label}
              symbol={symbol}
              value={input[name]}
              onChange={(text) => setInput((before) => ({ ...before, [name]: text }))}
              error={errorAt(pointer)}
              onFocusChange={(on) => setFocused(on ? name : undefined)}
            />
          ))}
        </form>
        {picture ? (
          <ShapeDrawing {...picture} focused={focused} terminals={cylindricalShell.terminals} />
        ) : null}
        <Answer live={live} shownAtFields={(pointer) => pointers.has(pointer)} />
      </section>
      <section aria-labelledby="same-call" className="mt-5">
        <h2 id="same-call" className="mb-1">
          The same call in your own program
        </h2>
        <Tabs
          label="Languages"
          tabs={resistanceSnippets(origin, request).map(({ id, label, code }) => ({
            id,
            label,
            content: <CodeBlock code={code} label={label} />,
          }))}
        />
      </section>
    </>
  );
}

/** The drawing of the last dimensions that made sense. */
function useDrawing({ innerRadius, outerRadius, length }: ShellInput) {
  const current = useMemo(
    () => drawingOf({ innerRadius, outerRadius, length }),
    [innerRadius, outerRadius, length],
  );
  const [last, setLast] = useState(current);
  if (current && current !== last) setLast(current);
  return current ?? last;
}

function drawingOf(dimensions: Pick<ShellInput, "innerRadius" | "outerRadius" | "length">) {
  try {
    const resolved = resolveDimensions(cylindricalShell, dimensions);
    const labels = Object.fromEntries(
      Object.entries(dimensions).map(([name, value]) => [
        name,
        { symbol: cylindricalShell.dimensions[name].symbol, value: value.trim() },
      ]),
    );
    const { drawing, toScale } = readableDrawing(cylindricalShell, resolved);
    return { drawing, toScale, labels };
  } catch {
    return undefined;
  }
}
