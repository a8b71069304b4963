import type { ComponentProps, ReactNode } from "react";
import { CONTROL, Field } from "./field";

interface TextFieldProps extends ComponentProps<"input"> {
  readonly label: ReactNode;
  readonly help?: ReactNode;
  readonly error?: string;
  /** Whether the value is text for people and not a number or an identifier. */
  readonly prose?: boolean;
}

/** A line of text with its label, help and error. */
export function TextField({ label, help, error, className, prose = true, ...rest }: TextFieldProps) {
  return (
    <Field label={label} help={help} error={error} className={className}>
      {(control) => <input {...control} {...rest} className={`${CONTROL} ${prose ? "font-sans!" : ""}`} />}
    </Field>
  );
}
