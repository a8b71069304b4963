"use client";

import { useState } from "react";
import { CONTROL, Field } from "../../../../_ui/field";
import type { PointsReading } from "./read-points";

/** Longer tables are edited as text. */
export const MOST_ROWS_SHOWN = 40;

const MOST_PROBLEMS = 5;

interface RowsTextProps {
  readonly label: string;
  /** What the two columns are. */
  readonly columns: string;
  readonly rows: readonly (readonly [string, string])[];
  readonly onChange: (text: string) => void;
}

/** The rows of a table as text: to paste into, and for tables too long to show row by row. */
export function RowsText({ label, columns, rows, onChange }: RowsTextProps) {
  const [text, setText] = useState(() => rows.map((row) => row.join("; ")).join("\n"));
  return (
    <Field
      label={label}
      help={`${columns}, with a tab, a semicolon or a comma between them; a first line may carry names and units, such as radius/mm; conductivity/(S/m).`}
    >
      {(control) => (
        <textarea
          {...control}
          rows={8}
          value={text}
          spellCheck={false}
          onChange={(event) => {
            setText(event.target.value);
            onChange(event.target.value);
          }}
          className={`${CONTROL} resize-y`}
        />
      )}
    </Field>
  );
}

/** What was understood of a text, and what was not. */
export function ReadingNotes({ reading }: { readonly reading: PointsReading | null }) {
  const more = (reading?.problems.length ?? 0) - MOST_PROBLEMS;
  return (
    <div aria-live="polite" className="text-small">
      {reading?.problems.slice(0, MOST_PROBLEMS).map((problem) => (
        <p key={problem} className="text-oxide">
          {problem}
        </p>
      ))}
      {more > 0 ? <p className="text-oxide">And {more} more.</p> : null}
      {reading?.note ? <p className="text-ink-soft">{reading.note}</p> : null}
    </div>
  );
}
