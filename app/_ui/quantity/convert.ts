import { add, decimalText, divide, multiply, rational, subtract, toNumber } from "./rational";
import type { Unit } from "./units";

/**
 * The same size in another unit, exact to 15 digits (to 14 where a circle's number comes in).
 * @param number A decimal text.
 * @returns null where the number cannot be read.
 */
export function convertUnit(number: string, from: Unit, to: Unit): string | null {
  if (from.id === to.id) return number;
  const value = rational(number);
  if (!value) return null;
  if (typeof from.scale === "number" || typeof to.scale === "number") {
    const factor = (unit: Unit) => (typeof unit.scale === "number" ? unit.scale : toNumber(unit.scale));
    return numberText((toNumber(value) * factor(from)) / factor(to), 14);
  }
  const base = multiply(value, from.scale);
  const shifted = from.offset ? add(base, from.offset) : base;
  return decimalText(divide(to.offset ? subtract(shifted, to.offset) : shifted, to.scale));
}

/** A double as a decimal text of so many digits, without the noise of its last ones. */
export function numberText(value: number, digits = 12): string {
  const exact = rational(value.toPrecision(digits));
  return exact ? decimalText(exact, digits) : String(value);
}

/** A value in the kind's base unit (m, deg, °C, S/m …) written in one of its units. */
export function textInUnit(value: number, unit: Unit, digits = 12): string {
  if (typeof unit.scale === "number") return numberText(value / unit.scale, digits);
  const exact = rational(value.toPrecision(Math.min(17, digits + 3)));
  if (!exact) return String(value);
  return decimalText(divide(unit.offset ? subtract(exact, unit.offset) : exact, unit.scale), digits);
}
