/** A requirement on the resistance, and whether an answer with its bounds meets it. */
import { pointerTo, type Problems } from "../failure";
import { readQuantity } from "../quantity/parse-quantity";
import type { Bounds } from "./bounds";
import type { ResistanceRequest } from "./request-schema";

export interface Requirement {
  readonly min: number;
  readonly max: number;
}

/** Reads the limits in ohms; null where there is no requirement or it has complaints. */
export function readRequirement(
  input: ResistanceRequest["requirement"],
  problems: Problems,
): Requirement | null {
  if (!input) return null;
  const limits = { min: 0, max: Infinity };
  let whole = true;
  for (const name of ["min", "max"] as const) {
    const given = input[name];
    if (given === undefined) continue;
    const reading = readQuantity(given, "resistance");
    const pointer = pointerTo("#/requirement", name);
    if (!reading.ok) problems.add(pointer, reading.detail);
    else if (reading.value < 0) problems.add(pointer, "must be 0 or greater.");
    else {
      limits[name] = reading.value;
      continue;
    }
    whole = false;
  }
  if (!whole) return null;
  if (limits.min <= limits.max) return limits;
  problems.add("#/requirement/min", "must not be greater than max.");
  return null;
}

/**
 * Decided only if the bounds lie wholly on one side of each limit; with an uncertainty, if its range widened by the
 * bounds does.
 */
export function verdictOf(
  { min, max }: Requirement,
  { value, lower, upper }: Bounds,
  uncertainty?: { readonly low: number; readonly high: number },
): "met" | "not-met" | "undecided" {
  const low = uncertainty ? Math.min(uncertainty.low, value) * (lower / value) : lower;
  const high = uncertainty ? Math.max(uncertainty.high, value) * (upper / value) : upper;
  if (low >= min && high <= max) return "met";
  return high < min || low > max ? "not-met" : "undecided";
}
