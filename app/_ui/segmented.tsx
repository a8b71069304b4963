"use client";

import { type ReactNode, useId } from "react";

interface SegmentedProps<Value extends string> {
  readonly label: ReactNode;
  /** Whether the label is shown; it is always read. */
  readonly labelShown?: boolean;
  readonly value: Value;
  readonly options: readonly { readonly value: Value; readonly label: string }[];
  readonly onChange: (value: Value) => void;
  readonly className?: string;
}

/** One of a few short choices, all in sight; a group of radio buttons by keyboard and to readers. */
export function Segmented<Value extends string>(props: SegmentedProps<Value>) {
  const { label, labelShown = true, value, options, onChange, className = "" } = props;
  const name = useId();
  return (
    <fieldset className={className}>
      <legend className={labelShown ? "mb-0.5 text-table" : "sr-only"}>{label}</legend>
      <div className="inline-flex max-w-full flex-wrap rounded border border-edge bg-sheet">
        {options.map((option) => (
          <label
            key={option.value}
            className="relative flex min-h-5.5 cursor-pointer items-center rounded px-1.5 text-table text-ink-soft hover:text-ink has-checked:bg-ink has-checked:font-medium has-checked:text-paper has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris medium:min-h-4.5"
          >
            <input
              type="radio"
              name={name}
              value={option.value}
              checked={option.value === value}
              onChange={() => onChange(option.value)}
              className="sr-only"
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
