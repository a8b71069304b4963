"use client";

import { useId } from "react";

interface FileButtonProps {
  readonly label: string;
  /** Endings and media types that the reader's dialog offers. */
  readonly accept: string;
  readonly onText: (text: string) => void;
}

/** Reads a text file from the reader's disk. */
export function FileButton({ label, accept, onText }: FileButtonProps) {
  const id = useId();
  return (
    <label
      htmlFor={id}
      className="inline-flex min-h-5.5 cursor-pointer items-center rounded border border-edge bg-sheet px-2 text-table font-medium hover:border-ink has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris medium:min-h-5"
    >
      {label}
      <input
        id={id}
        type="file"
        accept={accept}
        className="sr-only"
        onChange={async (event) => {
          const file = event.target.files?.[0];
          event.target.value = "";
          if (file) onText(await file.text());
        }}
      />
    </label>
  );
}
