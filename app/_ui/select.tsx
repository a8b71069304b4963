import type { ComponentProps, ReactNode } from "react";
import { CONTROL, Field } from "./field";

interface SelectProps extends ComponentProps<"select"> {
  readonly label: ReactNode;
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly help?: ReactNode;
  readonly error?: string;
}

/** A choice among a few named values. */
export function Select({ label, options, help, error, className, ...rest }: SelectProps) {
  return (
    <Field label={label} help={help} error={error} className={className}>
      {(control) => (
        <select {...control} {...rest} className={`${CONTROL} pe-3 font-sans!`}>
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
