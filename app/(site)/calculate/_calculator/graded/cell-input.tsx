"use client";

import { useId } from "react";
import { UnitEntry } from "../../../../_ui/quantity/unit-entry";
import type { UnitKind } from "../../../../_ui/quantity/units";

interface CellInputProps {
  readonly label: string;
  readonly kind: UnitKind;
  readonly bareUnit: string;
  readonly value: string;
  readonly error?: string;
  readonly onChange: (text: string) => void;
}

/** A quantity in a table's cell; its complaint stands below it. */
export function CellInput({ label, kind, bareUnit, value, error, onChange }: CellInputProps) {
  const id = useId();
  return (
    <>
      <UnitEntry
        control={{
          id,
          "aria-label": label,
          ...(error ? { "aria-describedby": `${id}-error`, "aria-invalid": true as const } : {}),
        }}
        label={label}
        kind={kind}
        bareUnit={bareUnit}
        value={value}
        onChange={onChange}
      />
      {error ? (
        <p id={`${id}-error`} className="text-small text-oxide">
          {error}
        </p>
      ) : null}
    </>
  );
}
