"use client";

import type { ReactNode } from "react";

interface RowButtonProps {
  readonly id?: string;
  readonly label: string;
  readonly disabled: boolean;
  readonly onPress: () => void;
  readonly children: ReactNode;
}

/** A small button at the end of a row. */
export function RowButton({ id, label, disabled, onPress, children }: RowButtonProps) {
  return (
    <button
      id={id}
      type="button"
      aria-label={label}
      disabled={disabled}
      onClick={onPress}
      className="inline-grid min-h-5.5 min-w-3 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink disabled:cursor-not-allowed disabled:opacity-40 medium:min-h-5"
    >
      {children}
    </button>
  );
}
