import { type ReactNode, useId } from "react";

/** What a control inside a field must carry, so that its label, help and error are read with it. */
export interface ControlProps {
  readonly id: string;
  /** Only where no label stands beside the control, as in a table's cell. */
  readonly "aria-label"?: string;
  readonly "aria-describedby"?: string;
  readonly "aria-invalid"?: true;
}

interface FieldProps {
  readonly label: ReactNode;
  readonly help?: ReactNode;
  /** A sentence: what was wrong and what is allowed. */
  readonly error?: string;
  readonly className?: string;
  /** Stands at the end of the label's line, outside the label: a help button, a choice of what is given. */
  readonly beside?: ReactNode;
  readonly children: (control: ControlProps) => ReactNode;
}

/** A labelled control with its help and its error; the error keeps its line, so that nothing jumps. */
export function Field({ label, help, error, className = "", beside, children }: FieldProps) {
  const id = useId();
  const helpId = `${id}-help`;
  const errorId = `${id}-error`;
  const describedBy = [error ? errorId : null, help ? helpId : null].filter(Boolean).join(" ");
  return (
    <div className={className}>
      <div className="mb-0.5 flex items-center gap-1">
        <label htmlFor={id} className="block grow text-table">
          {label}
        </label>
        {beside}
      </div>
      {children({
        id,
        ...(describedBy ? { "aria-describedby": describedBy } : {}),
        ...(error ? { "aria-invalid": true } : {}),
      })}
      {help ? (
        <p id={helpId} className="mt-0.5 text-small text-ink-soft">
          {help}
        </p>
      ) : null}
      <p id={errorId} className={ERROR_LINE}>
        {error}
      </p>
    </div>
  );
}

/** A line kept for what is wrong, and room below it, so that nothing jumps and the words keep clear of the next label. */
export const ERROR_LINE = "mt-0.25 min-h-3.5 pb-1 text-small text-oxide";

/** The look shared by text inputs and selects. */
export const CONTROL =
  "block min-h-5.5 medium:min-h-5 w-full rounded border border-edge bg-sheet px-1 py-0.5 font-mono text-table text-ink hover:border-ink aria-invalid:border-oxide aria-invalid:border-2 disabled:opacity-55";
