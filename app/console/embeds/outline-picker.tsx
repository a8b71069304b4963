"use client";

import Link from "next/link";
import type { OutlineChoice } from "../../api/console/embeds/_server/outline-choice";
import { OutlineDrawing } from "../../_ui/drawing/outline-drawing";
import { LocalTime } from "../../_ui/local-time";
import { ProblemNotice } from "../../_ui/problem-notice";
import { EmptyState, Loading } from "../../_ui/states";
import { useConsole } from "../_shell/use-console";

type Listed = OutlineChoice & { readonly createdAt: string };

interface PickerProps {
  readonly teamId: string;
  /** Id of the chosen one; empty for none. */
  readonly value: string;
  readonly onChange: (id: string) => void;
}

/** The stored outlines of a team, each with its drawing, to choose one from. */
export function OutlinePicker({ teamId, value, onChange }: PickerProps) {
  const { data, error } = useConsole<{ rows: readonly Listed[] }>(
    `embeds/outlines?${new URLSearchParams({ teamId })}`,
    { keepPreviousData: false },
  );
  if (error) return <ProblemNotice problem={error.problem} />;
  if (!data) return <Loading what="the outlines" className="min-h-14" />;
  if (data.rows.length === 0) {
    return (
      <EmptyState title="This team has stored no outline">
        Draw one on{" "}
        <Link className="link" href="/outline">
          the outline page
        </Link>{" "}
        and keep it there, or send it to <code>POST /api/v1/outlines</code>. What is stored never changes.
      </EmptyState>
    );
  }
  return (
    <fieldset>
      <legend className="mb-0.5 text-table">Outline</legend>
      <div className="grid max-h-56 gap-1 overflow-y-auto narrow:grid-cols-2">
        {data.rows.map((outline) => (
          <label
            key={outline.id}
            className="flex cursor-pointer flex-col gap-0.5 rounded border border-edge bg-sheet p-1 has-checked:border-ink has-checked:outline-1 has-checked:outline-ink has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris"
          >
            <span className="flex items-baseline gap-1 text-table font-medium">
              <input
                type="radio"
                name="outline"
                value={outline.id}
                checked={outline.id === value}
                onChange={() => onChange(outline.id)}
              />
              <span className="min-w-0 [overflow-wrap:anywhere]">{outlineName(outline)}</span>
            </span>
            <OutlineDrawing
              plan={outline.plan}
              label={outlineFacts(outline)}
              bare
              className="max-h-12 w-full"
            />
            <span className="text-small text-ink-soft">
              {outlineFacts(outline)}, <LocalTime at={outline.createdAt} />
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}

export function outlineName({ name, id }: Pick<OutlineChoice, "name" | "id">): string {
  return name || id;
}

/** "40 × 40 mm, terminals in and out" */
export function outlineFacts({ plan, axisymmetric }: Pick<OutlineChoice, "plan" | "axisymmetric">): string {
  const names = plan.terminals.map(({ name }) => name);
  const terminals = names.length === 0 ? "no terminals" : `terminals ${names.join(", ")}`;
  return [plan.size, ...(axisymmetric ? ["about an axis"] : []), terminals].join(", ");
}
