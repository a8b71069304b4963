import { type ReactNode, useId } from "react";
import { ERROR_LINE } from "../../_ui/field";

interface ChoicesProps {
  readonly legend: string;
  /** A sentence: what was wrong and what is allowed. */
  readonly error?: string;
  readonly children: ReactNode;
}

/** Boxes or buttons that belong together, with their complaint; it keeps its line, so that nothing jumps. */
export function Choices({ legend, error, children }: ChoicesProps) {
  const errorId = useId();
  return (
    <fieldset className="mb-1" aria-describedby={error ? errorId : undefined}>
      <legend className="mb-0.5 text-table">{legend}</legend>
      {children}
      <p id={errorId} className={ERROR_LINE}>
        {error}
      </p>
    </fieldset>
  );
}
