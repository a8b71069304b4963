"use client";

import { useId } from "react";
import { Button } from "../../../_ui/button";
import { CONTROL } from "../../../_ui/field";
import type { TeamChoice } from "../../_shell/team-choices";
import { dayFrom, type Span } from "./use-span";

interface SpanFieldsProps {
  readonly span: Span;
  readonly teams: readonly TeamChoice[];
  readonly today: string;
}

const SPANS = [
  { days: 1, label: "Today" },
  { days: 7, label: "7 days" },
  { days: 30, label: "30 days" },
  { days: 90, label: "90 days" },
] as const;

/** Which days and whose. */
export function SpanFields({ span, teams, today }: SpanFieldsProps) {
  const id = useId();
  return (
    <div className="mb-2 flex flex-wrap items-end gap-1.5">
      <div role="group" aria-label="Span" className="flex flex-wrap gap-0.5">
        {SPANS.map(({ days, label }) => {
          const from = dayFrom(today, 1 - days);
          const chosen = span.to === today && span.from === from;
          return (
            <Button
              key={days}
              aria-pressed={chosen}
              className={chosen ? "border-ink! bg-ink! text-paper!" : ""}
              onClick={() => span.change({ from: days === 7 ? "" : from, to: "", by: "" })}
            >
              {label}
            </Button>
          );
        })}
      </div>
      <DayField
        id={`${id}-from`}
        label="From"
        value={span.from}
        max={span.to}
        onChange={(from) => span.change({ from })}
      />
      <DayField
        id={`${id}-to`}
        label="To"
        value={span.to}
        min={span.from}
        max={today}
        onChange={(to) => span.change({ from: span.from, to })}
      />
      {teams.length > 1 ? (
        <label className="block text-table">
          <span className="block text-small text-ink-soft">Team</span>
          <select
            value={span.team}
            onChange={(event) => span.change({ team: event.target.value, caller: "" })}
            className={`${CONTROL} max-w-26 pe-3 font-sans!`}
          >
            <option value="">All</option>
            {teams.map(({ id: team, name }) => (
              <option key={team} value={team}>
                {name}
              </option>
            ))}
          </select>
        </label>
      ) : null}
    </div>
  );
}

interface DayFieldProps {
  readonly id: string;
  readonly label: string;
  readonly value: string;
  readonly min?: string;
  readonly max?: string;
  readonly onChange: (day: string) => void;
}

function DayField({ id, label, value, min, max, onChange }: DayFieldProps) {
  return (
    <div className="text-table">
      <label htmlFor={id} className="block text-small text-ink-soft">
        {label}
      </label>
      <input
        id={id}
        type="date"
        value={value}
        min={min}
        max={max}
        onChange={(event) => event.target.value !== "" && onChange(event.target.value)}
        className={`${CONTROL} w-auto!`}
      />
    </div>
  );
}
