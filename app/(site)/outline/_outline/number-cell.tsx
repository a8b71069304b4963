"use client";

import { type KeyboardEvent, useId, useState } from "react";
import type { LengthUnit } from "@/lib/engine/field/outline/length-units";
import { readLength } from "../_model/read-length";
import { coordinateText } from "../_model/sketch";

interface NumberCellProps {
  readonly label: string;
  readonly value: number;
  readonly onCommit: (value: number) => void;
  /** Unit of the value: a length typed with another one is converted. Left out where it is no length. */
  readonly unit?: LengthUnit;
  readonly invalid?: boolean;
  readonly disabled?: boolean;
  /** Its width. */
  readonly className?: string;
  /** Height on wide screens; the table's where left out. */
  readonly inputClass?: string;
  /** What may not be taken, as a sentence; null where all is well. */
  readonly refuse?: (value: number) => string | null;
}

/** A number that takes effect when the field is left or Enter pressed; Escape brings the old one back. */
export function NumberCell(props: NumberCellProps) {
  const {
    label,
    value,
    onCommit,
    unit,
    invalid = false,
    disabled = false,
    className = "w-full",
    inputClass = "medium:min-h-4",
    refuse,
  } = props;
  const [draft, setDraft] = useState<string | null>(null);
  const [wrong, setWrong] = useState<string | null>(null);
  const reason = useId();

  function commit() {
    if (draft === null) return;
    const number = readLength(draft, unit, readerWritesCommas());
    const why = number === null ? `This is no ${unit ? "length" : "number"}.` : (refuse?.(number) ?? null);
    if (number === null || why !== null) return setWrong(why);
    setDraft(null);
    setWrong(null);
    if (coordinateText(number) !== coordinateText(value)) onCommit(number);
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.key === "Enter") commit();
    if (event.key !== "Escape" || draft === null) return;
    setDraft(null);
    setWrong(null);
    event.stopPropagation();
  }

  return (
    <span className={`inline-block ${className}`}>
      <input
        aria-label={label}
        aria-invalid={wrong !== null || invalid ? true : undefined}
        aria-describedby={wrong === null ? undefined : reason}
        value={draft ?? coordinateText(value)}
        disabled={disabled}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={commit}
        onKeyDown={onKeyDown}
        // Undo is the page's once nothing half-typed stands here.
        data-cell={draft === null ? "settled" : "draft"}
        inputMode="text"
        autoComplete="off"
        spellCheck={false}
        className={`min-h-5.5 w-full rounded border border-edge bg-sheet px-0.5 text-end font-mono text-table hover:border-ink disabled:opacity-55 aria-invalid:border-2 aria-invalid:border-oxide ${inputClass}`}
      />
      {wrong === null ? null : (
        <span id={reason} role="alert" className="block text-small text-oxide">
          {wrong} {coordinateText(value)} still holds.
        </span>
      )}
    </span>
  );
}

/** Whether the reader's language writes a decimal comma. */
function readerWritesCommas(): boolean {
  return (
    typeof navigator !== "undefined" && new Intl.NumberFormat(navigator.language).format(1.5).includes(",")
  );
}
