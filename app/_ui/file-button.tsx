"use client";

import { useId } from "react";

type FileButtonProps = {
  readonly label: string;
  /** Endings and media types that the reader's dialog offers. */
  readonly accept: string;
} & (
  | { readonly onText: (text: string) => void }
  /** The file itself, where its bytes matter. */
  | { readonly onFile: (file: File) => void }
);

/** Takes a file from the reader's disk. */
export function FileButton(props: FileButtonProps) {
  const { label, accept } = props;
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
          if (!file) return;
          if ("onFile" in props) props.onFile(file);
          else props.onText(await file.text());
        }}
      />
    </label>
  );
}
