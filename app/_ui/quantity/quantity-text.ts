/** A quantity as the pages keep it: one text that the API reads, "0.25 mm"; in addresses without the space. */
import { readTyped } from "./read-typed";
import { findUnit, type Unit } from "./units";

export interface QuantityParts {
  /** Decimal text, or whatever stands there where it is no quantity. */
  readonly number: string;
  /** The unit, where the field knows it. */
  readonly unit?: Unit;
  /** A unit that the field does not know, as it was typed; the API decides. */
  readonly foreign?: string;
}

/** Splits a text of the API's spelling into its number and its unit. */
export function splitQuantity(text: string, units: readonly Unit[]): QuantityParts {
  const typed = readTyped(text, false);
  if (typed.kind === "empty") return { number: "" };
  if (typed.kind !== "quantity") return { number: typed.text };
  if (typed.unit === "") return { number: typed.number };
  const unit = findUnit(typed.unit, units);
  return unit ? { number: typed.number, unit } : { number: typed.number, foreign: typed.unit };
}

/** Number and unit as one text; a bare number where there is no unit. */
export function joinQuantity(number: string, unit: string): string {
  if (number.trim() === "") return "";
  return unit === "" ? number : `${number} ${unit}`;
}

/** Shorter, for an address: "0.25mm". A unit that would read as an exponent keeps its space. */
export function compactQuantity(text: string): string {
  return text.replace(/^([+-]?[\d.]+(?:[eE][+-]?\d+)?) (?=[A-Za-z%])(?![eE]\d)/, "$1");
}

/** The inverse: "0.25mm" as "0.25 mm". */
export function spaceQuantity(text: string): string {
  return text.replace(/^([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)(?![eE][+-]?\d)(?=[A-Za-z%])/, "$1 ");
}
