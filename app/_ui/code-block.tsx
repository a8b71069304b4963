import { CopyButton } from "./copy-button";

/** Lines that are shown at most: a table of thousands of points would make the page miles long. */
const MOST_LINES = 200;

interface CodeBlockProps {
  readonly code: string;
  /** What the code is, for its caption and for the copy button: "curl", "the answer". */
  readonly label: string;
  /** What the copy button copies, where that is more than is shown. */
  readonly copies?: string;
}

/** Code to read and to copy; long lines scroll inside the block, and break on paper. Of very long code the start is shown. */
export function CodeBlock({ code, label, copies = code }: CodeBlockProps) {
  const { start, more } = startOf(code);
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
        <code>{start}</code>
      </pre>
      {more > 0 ? (
        <p className="border-t border-rule px-2 py-1 text-small text-ink-soft">
          {more} more lines are not shown; Copy takes them all.
        </p>
      ) : null}
    </figure>
  );
}

/** The first lines, and how many follow. */
function startOf(code: string): { readonly start: string; readonly more: number } {
  const lines = code.split("\n");
  if (lines.length <= MOST_LINES) return { start: code, more: 0 };
  return { start: lines.slice(0, MOST_LINES).join("\n"), more: lines.length - MOST_LINES };
}
