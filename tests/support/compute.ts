/** Short ways to compute, and to be refused, in tests of the engine. */
import { involve, note } from "./accuracy";
import {
  computeResistance,
  InputError,
  libraryMaterial,
  type Problem,
  type ResistanceResult,
} from "@/lib/engine";

const context = { material: libraryMaterial };

/** The answer to a request. */
export function compute(request: unknown): ResistanceResult {
  const result = computeResistance(request, context);
  involve(result.shape);
  return result;
}

/** The complaints about a request; fails the test where there are none. */
export function complaints(request: unknown): readonly Problem[] {
  try {
    computeResistance(request, context);
  } catch (error) {
    if (error instanceof InputError) return error.errors;
    throw error;
  }
  throw new Error("the request was answered");
}

/** Resistance in ohms of a shape with a resistivity of 1 ohm m. */
export function unitResistance(shape: string, dimensions: Record<string, number | string>): ResistanceResult {
  return compute({ shape, dimensions, medium: { resistivity: 1 } });
}

/** The answer for a shape graded in one coordinate. */
export function graded(
  shape: string,
  dimensions: Record<string, number | string>,
  coordinate: string,
  quantity: "conductivity" | "resistivity" | undefined,
  profile: Record<string, unknown>,
  more: Record<string, unknown> = {},
): ResistanceResult {
  return compute({ shape, dimensions, medium: { graded: { coordinate, quantity, profile } }, ...more });
}

/** Relative difference of a number from what was expected. */
export function deviation(found: number, expected: number | string): number {
  return note(Math.abs(found / Number(expected) - 1));
}
