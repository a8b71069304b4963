/** Texts of fields from values in the unit of bare numbers, and back. */
import { convertUnit, textInUnit } from "../../../_ui/quantity/convert";
import { splitQuantity } from "../../../_ui/quantity/quantity-text";
import { toNumber } from "../../../_ui/quantity/rational";
import { findUnit, type Unit, UNITS } from "../../../_ui/quantity/units";

/** A value in the prefix that reads best, with the digits that it has. */
export function neatText(
  value: number | null,
  kind: "resistivity" | "conductivity" | "sheetResistance",
  base: string,
): string {
  if (value === null) return "";
  const prefixed = UNITS[kind].filter((unit) => !unit.hidden && unit.id.endsWith(base));
  const size = (unit: Unit) => (typeof unit.scale === "number" ? unit.scale : toNumber(unit.scale));
  const sorted = [...prefixed].sort((a, b) => size(b) - size(a));
  const unit = sorted.find((own) => value / size(own) >= 1) ?? sorted.at(-1);
  if (!unit) return "";
  const short = textInUnit(value, unit, 12);
  const exact = Math.abs((Number(short) * size(unit)) / value - 1) < 1e-14;
  return `${exact ? short : textInUnit(value, unit, 15)} ${unit.id}`;
}

type ReadKind = "resistivity" | "conductivity" | "density" | "length" | "angle";

/** The number that a field's text stands for in the unit of bare numbers; null where it is none. */
export function plainValue(text: string | undefined, kind: ReadKind, base: string): number | null {
  if (!text) return null;
  const units = UNITS[kind];
  const unit = findUnit(base, units);
  const parts = splitQuantity(text, units);
  if (!unit || parts.foreign !== undefined || parts.number === "") return null;
  const number = Number(convertUnit(parts.number, parts.unit ?? unit, unit));
  return Number.isFinite(number) ? number : null;
}

/** The same; null where it is none greater than 0. */
export function baseValue(text: string | undefined, kind: ReadKind, base: string): number | null {
  const number = plainValue(text, kind, base);
  return number !== null && number > 0 ? number : null;
}
