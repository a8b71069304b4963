"use client";

import { Field, CONTROL } from "./field";
import { QuantitySymbol } from "./quantity-symbol";

interface QuantityInputProps {
  readonly label: string;
  /** Symbol as in the drawing and the formula. */
  readonly symbol?: string;
  readonly value: string;
  readonly onChange: (text: string) => void;
  readonly error?: string;
  readonly help?: string;
  readonly name?: string;
  /** Told when the field gains or loses focus, so that a drawing can mark the dimension. */
  readonly onFocusChange?: (focused: boolean) => void;
}

/** A quantity typed as one text, number and unit together: "0.25 mm". What it means is decided by the API. */
export function QuantityInput(props: QuantityInputProps) {
  const { label, symbol, value, onChange, error, help, name, onFocusChange } = props;
  return (
    <Field
      label={
        <>
          {label} {symbol ? <QuantitySymbol text={symbol} /> : null}
        </>
      }
      error={error}
      help={help}
    >
      {(control) => (
        <input
          {...control}
          name={name}
          value={value}
          onChange={(event) => onChange(event.target.value)}
          onFocus={() => onFocusChange?.(true)}
          onBlur={() => onFocusChange?.(false)}
          type="text"
          autoComplete="off"
          autoCapitalize="off"
          spellCheck={false}
          className={CONTROL}
        />
      )}
    </Field>
  );
}
