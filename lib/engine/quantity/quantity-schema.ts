/** The zod schema of a quantity as it appears in a body: a number or a text with a unit; its unit is read later. */
import { z } from "zod";
import { QUANTITY_KINDS, type QuantityKindName } from "./quantity-kind";

function complain(input: unknown): string {
  if (typeof input === "number") {
    return Number.isNaN(input)
      ? "must be finite, but is not a number (NaN)."
      : "must be finite, but is infinite (a number beyond 1.8e308 reads as infinity).";
  }
  if (input === undefined) return "is required.";
  if (input === null) return "must be a number or a text with a unit, not null.";
  if (Array.isArray(input)) return "must be a number or a text with a unit, not an array.";
  if (typeof input === "object") {
    if ("tolerance" in input || "plus" in input || "minus" in input) {
      return "value" in input
        ? "takes no tolerance; give a number or a text with a unit."
        : "has a tolerance but no value.";
    }
    return "must be a number or a text with a unit, not an object.";
  }
  return `must be a number or a text with a unit, not a ${typeof input}.`;
}

/** A number (finite) or a text of at most 200 characters; complaints are whole sentences. */
export const anyQuantitySchema = z.union([z.number(), z.string().max(200)], {
  error: (issue) =>
    typeof issue.input === "string" ? "is longer than a quantity may be." : complain(issue.input),
});

/** A quantity of one kind, with a description that states the unit of a bare number. */
export function quantitySchema(kind: QuantityKindName, description: string, example?: number | string) {
  const { unit, noun } = QUANTITY_KINDS[kind];
  const bare = unit === "1" ? "a plain number" : `a bare number is in ${unit}`;
  return anyQuantitySchema.meta({
    description: `${description} (${noun}; ${bare}, or a text with a unit).`,
    ...(example === undefined ? {} : { example }),
  });
}
