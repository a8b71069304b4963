/** Short ways to declare the commonest dimensions of a shape. */
import type { IntegerDimension, QuantityDimension } from "./define-shape";

type Extras = Partial<Pick<QuantityDimension, "default" | "max" | "zero" | "diameter" | "radius">>;

/** A length in metres, greater than 0. */
export function lengthDimension(
  label: string,
  symbol: string,
  help: string,
  extras: Extras = {},
): QuantityDimension {
  return { type: "quantity", kind: "length", label, symbol, help, ...extras };
}

/** An angle in radians, greater than 0. */
export function angleDimension(
  label: string,
  symbol: string,
  help: string,
  extras: Extras = {},
): QuantityDimension {
  return { type: "quantity", kind: "angle", label, symbol, help, ...extras };
}

/** One or two equal sides in series, 2 unless the request says otherwise. */
export function sidesDimension(help: string): IntegerDimension {
  return { type: "integer", label: "Sides", symbol: "n", default: 2, min: 1, max: 2, help };
}
