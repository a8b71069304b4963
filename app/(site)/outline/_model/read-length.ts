import { LENGTH_UNITS_M, type LengthUnit } from "@/lib/engine/field/outline/length-units";
import { readTyped } from "../../../_ui/quantity/read-typed";
import { tidy } from "./sketch";

/**
 * A typed number in the unit; "1/2 in" in a drawing in mm is 12.7. Null where it is none.
 * @param unit of the drawing; left out where the number is no length.
 * @param decimalComma whether "1,234" has a decimal comma.
 */
export function readLength(text: string, unit: LengthUnit | undefined, decimalComma: boolean): number | null {
  const typed = readTyped(text, decimalComma);
  if (typed.kind !== "quantity") return null;
  const number = Number(typed.number);
  if (!Number.isFinite(number)) return null;
  if (typed.unit === "" || typed.unit === unit) return number;
  if (!unit || !(typed.unit in LENGTH_UNITS_M)) return null;
  return tidy((number * LENGTH_UNITS_M[typed.unit as LengthUnit]) / LENGTH_UNITS_M[unit]);
}
