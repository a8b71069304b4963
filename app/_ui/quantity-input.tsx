"use client";

import type { ReactNode } from "react";
import { Field, CONTROL } from "./field";
import { Help } from "./help";
import { QuantitySymbol } from "./quantity-symbol";
import { UnitEntry } from "./quantity/unit-entry";
import type { UnitKind } from "./quantity/units";

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
  /** What it measures: gives the field a menu of units, which converts. */
  readonly kind?: UnitKind;
  /** Unit of a number that has none, and of an empty field. */
  readonly bareUnit?: string;
  /** Whether a foil's weight is a unit here. */
  readonly foil?: boolean;
  readonly placeholder?: string;
  /** Keeps the help behind a button, so that a form stays short. */
  readonly helpOnDemand?: boolean;
  /** Stands at the end of the label's line: a choice of what is given. */
  readonly beside?: ReactNode;
  readonly className?: string;
}

/**
 * A quantity typed as one text, number and unit together: "0.25 mm". With `kind` the unit has a menu of its own. What
 * the text means is decided by the API.
 */
export function QuantityInput(props: QuantityInputProps) {
  const { label, symbol, value, onChange, error, help, name, onFocusChange, kind } = props;
  const { helpOnDemand = false, beside, className, ...entry } = props;
  return (
    <Field
      label={
        <>
          {label} {symbol ? <QuantitySymbol text={symbol} /> : null}
        </>
      }
      error={error}
      help={helpOnDemand ? undefined : help}
      className={className}
      beside={
        <>
          {helpOnDemand && help ? <Help about={label} text={help} /> : null}
          {beside}
        </>
      }
    >
      {(control) =>
        kind ? (
          <UnitEntry
            control={control}
            label={label}
            kind={kind}
            value={value}
            onChange={onChange}
            bareUnit={entry.bareUnit}
            foil={entry.foil}
            placeholder={entry.placeholder}
            name={name}
            onFocusChange={onFocusChange}
          />
        ) : (
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
        )
      }
    </Field>
  );
}
