"use client";

import { useState } from "react";
import type { ControlProps } from "../field";
import { convertUnit, numberText } from "./convert";
import { gaugeMm } from "./gauge";
import { joinQuantity, splitQuantity } from "./quantity-text";
import { readTyped } from "./read-typed";
import { BASE_UNITS, FIRST_UNIT, findUnit, type Unit, type UnitKind, unitsOf } from "./units";

interface UnitEntryProps {
  readonly control: ControlProps;
  readonly label: string;
  readonly kind: UnitKind;
  /** One text that the API reads: "0.25 mm". */
  readonly value: string;
  readonly onChange: (text: string) => void;
  /** Unit of a number that has none, and of an empty field. */
  readonly bareUnit?: string;
  /** Whether a foil's weight is a unit here. */
  readonly foil?: boolean;
  readonly name?: string;
  readonly placeholder?: string;
  readonly onFocusChange?: (focused: boolean) => void;
  /** Locale in which numbers are shown and read; left out: shown with a point, read as the browser's language has it. */
  readonly locale?: string;
  /** Name of the menu, where the page speaks another language than English. */
  readonly unitName?: string;
}

/** The size that the menu converts from: what was typed last, so that there and back is no rounding. */
interface Origin {
  readonly text: string;
  readonly number: string;
  readonly unit: Unit;
}

/**
 * A number with its unit beside it. The menu converts; a unit typed or pasted with the number ("12,5 mm", "1/2 in")
 * sets the menu. While the field has focus it shows what was typed, afterwards the number as it was understood.
 */
export function UnitEntry(props: UnitEntryProps) {
  const {
    control,
    label,
    kind,
    value,
    onChange,
    foil = false,
    bareUnit,
    name,
    placeholder,
    onFocusChange,
    locale,
    unitName,
  } = props;
  const comma = locale !== undefined && commaLocale(locale);
  const units = unitsOf(kind, foil);
  const [draft, setDraft] = useState<string | null>(null);
  /** The unit that a number takes whose own is deleted, or that comes after what is no quantity: "-" before "-40". */
  const [held, setHeld] = useState((placeholder && bareUnit) || FIRST_UNIT[kind]);
  const [origin, setOrigin] = useState<Origin | null>(null);

  const parts = splitQuantity(value, units);
  const gauge = gaugeMm(value);
  const unclear = parts.number === "" || readTyped(value, false).kind === "unclear";
  const bare = findUnit(bareUnit ?? BASE_UNITS[kind] ?? "", units);
  const current =
    parts.unit ??
    (parts.foreign !== undefined || gauge !== null ? undefined : unclear ? findUnit(held, units) : bare);
  const foreign = gauge === null ? parts.foreign : "AWG";
  /** A unit that only the API knows cannot be converted here; one that is wrong may be replaced. */
  const fixed = parts.foreign !== undefined && gauge === null && control["aria-invalid"] !== true;

  function type(text: string) {
    setDraft(text);
    setOrigin(null);
    const typed = readTyped(text, locale === undefined ? decimalComma() : comma);
    if (typed.kind === "empty") {
      if (current) setHeld(current.id);
      onChange("");
    } else if (typed.kind !== "quantity") {
      // What is typed over a quantity keeps its unit; what is left of one while it is deleted does not.
      if (current && !shortened(draft, text)) setHeld(current.id);
      onChange(typed.text);
    } else {
      const known = findUnit(typed.unit, units);
      const unit = typed.unit === "" ? unitOfBare(text) : (known?.id ?? typed.unit);
      onChange(joinQuantity(typed.number, unit));
    }
  }

  /** A number without unit keeps the menu's; where its own was deleted, the one that stood there before typing. */
  function unitOfBare(text: string): string {
    const before = draft !== null && shortened(draft, text) ? readTyped(draft, false) : null;
    const deleted = before?.kind === "gauge" || (before?.kind === "quantity" && before.unit !== "");
    if (current && !deleted) return current.id;
    if (fixed && !deleted) return parts.foreign ?? "";
    return findUnit(held, units)?.id ?? "";
  }

  function convertTo(id: string) {
    const target = findUnit(id, units);
    if (!target) return;
    setDraft(null);
    if (unclear) {
      setHeld(id);
      return;
    }
    const from = origin?.text === value ? origin : present();
    const number = from ? convertUnit(from.number, from.unit, target) : parts.number;
    if (number === null) return;
    const text = joinQuantity(number, target.id);
    onChange(text);
    setOrigin(from ? { ...from, text } : null);
  }

  /** What stands in the field, as something to convert; undefined where only the API could tell. */
  function present(): Origin | undefined {
    const millimetre = findUnit("mm", units);
    if (gauge !== null && millimetre) {
      return { text: value, number: numberText(gauge, 14), unit: millimetre };
    }
    return current && { text: value, number: parts.number, unit: current };
  }

  const shown = units.filter((unit) => !unit.hidden || unit.id === current?.id);
  return (
    <div className="flex items-stretch rounded border border-edge bg-sheet hover:border-ink has-[input[aria-invalid]]:border-oxide has-[input[aria-invalid]]:outline-1 has-[input[aria-invalid]]:outline-oxide has-[input[aria-invalid]]:-outline-offset-2">
      <input
        {...control}
        name={name}
        value={draft ?? (gauge === null ? (comma ? parts.number.replace(".", ",") : parts.number) : value)}
        placeholder={placeholder}
        onChange={(event) => type(event.target.value)}
        onFocus={() => {
          if (current) setHeld(current.id);
          onFocusChange?.(true);
        }}
        onBlur={() => {
          setDraft(null);
          onFocusChange?.(false);
        }}
        type="text"
        inputMode={kind === "number" ? "decimal" : "text"}
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
        className="min-h-5.5 w-full min-w-0 rounded bg-transparent px-1 font-mono text-table text-ink placeholder:text-ink-soft medium:min-h-5"
      />
      {units.length > 0 ? (
        <select
          aria-label={unitName ?? `Unit of ${label}`}
          value={foreign ?? current?.id ?? ""}
          disabled={fixed}
          title={
            fixed && unitName === undefined ? "Type another unit after the number to change it" : undefined
          }
          onChange={(event) => convertTo(event.target.value)}
          className="min-h-5.5 shrink-0 cursor-pointer rounded border-s border-rule bg-transparent ps-0.5 font-mono text-table text-ink medium:min-h-5"
        >
          {foreign !== undefined ? <option value={foreign}>{foreign}</option> : null}
          {shown.map((unit) => (
            <option key={unit.id} value={unit.id}>
              {unit.label}
            </option>
          ))}
        </select>
      ) : null}
    </div>
  );
}

/** Whether the last character was deleted: typing over the whole leaves its first character as often as not. */
function shortened(before: string | null, text: string): boolean {
  return before !== null && before.slice(0, -1) === text;
}

/** Whether the reader's language writes "1,5". */
function decimalComma(): boolean {
  return typeof navigator !== "undefined" && commaLocale(navigator.language);
}

function commaLocale(locale: string): boolean {
  return new Intl.NumberFormat(locale).format(1.5).includes(",");
}
