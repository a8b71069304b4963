"use client";

import { type ReactNode, useId } from "react";

interface ToggleProps {
  readonly label: ReactNode;
  readonly checked: boolean;
  readonly onChange: (checked: boolean) => void;
  readonly disabled?: boolean;
  readonly help?: string;
}

/** One thing that is on or off, and takes effect at once. */
export function Toggle({ label, checked, onChange, disabled = false, help }: ToggleProps) {
  const helpId = useId();
  return (
    <div>
      <label
        className={`relative inline-flex min-h-5.5 items-center gap-1 text-table medium:min-h-4 ${disabled ? "opacity-55" : "cursor-pointer"}`}
      >
        <input
          type="checkbox"
          role="switch"
          checked={checked}
          disabled={disabled}
          aria-describedby={help ? helpId : undefined}
          onChange={(event) => onChange(event.target.checked)}
          className="peer sr-only"
        />
        <span
          aria-hidden
          className="flex h-2.5 w-4.5 shrink-0 items-center rounded border border-edge bg-sheet p-px peer-checked:justify-end peer-checked:border-copper peer-checked:bg-copper peer-focus-visible:outline-2 peer-focus-visible:outline-offset-2 peer-focus-visible:outline-verdigris [&>span]:bg-edge peer-checked:[&>span]:bg-sheet"
        >
          <span className="h-2 w-2 rounded" />
        </span>
        {label}
      </label>
      {help ? (
        <p id={helpId} className="text-small text-ink-soft">
          {help}
        </p>
      ) : null}
    </div>
  );
}
