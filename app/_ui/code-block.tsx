import { CopyButton } from "./copy-button";

interface CodeBlockProps {
  readonly code: string;
  /** What the code is, for its caption and for the copy button: "curl", "the answer". */
  readonly label: string;
  /** What the copy button copies, where that is more than is shown. */
  readonly copies?: string;
}

/** Code to read and to copy; long lines scroll inside the block, and break on paper. */
export function CodeBlock({ code, label, copies = code }: CodeBlockProps) {
  return (
    <figure className="break-inside-avoid rounded border border-rule bg-sheet">
      <figcaption className="flex items-center justify-between border-b border-rule ps-2 pe-0.5 text-small text-ink-soft">
        {label}
        <span className="print:hidden">
          <CopyButton text={copies} what={label} />
        </span>
      </figcaption>
      <pre
        // Reachable by keyboard, since it scrolls.
        tabIndex={0}
        aria-label={label}
        className="overflow-x-auto px-2 py-1.5 text-small print:break-words print:whitespace-pre-wrap"
      >
        <code>{code}</code>
      </pre>
    </figure>
  );
}
