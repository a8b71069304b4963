import "server-only";
import {
  CheckFailure,
  computeResistance,
  InputError,
  type Material,
  type ResistanceResult,
} from "@/lib/engine";
import { INCLUDE, type RequestBody } from "../_model/request";
import type { Complaint } from "../_model/complaints";

/** What the page shows before its script runs: the answer, or the complaints about what the address holds. */
export type FirstAnswer =
  { readonly result: ResistanceResult } | { readonly complaints: readonly Complaint[] };

/** Computes with the materials that the reader of the page may use. */
export function firstAnswer(
  body: RequestBody,
  material: (id: string) => Material | undefined,
): FirstAnswer | null {
  // A page does not wait for a hundred thousand trials; it asks the API for them.
  if (body.uncertainty?.method === "monte-carlo") return null;
  try {
    return { result: computeResistance({ ...body, include: INCLUDE }, { material }) };
  } catch (error) {
    if (error instanceof InputError) {
      const unknownMaterial = error.errors.some(({ pointer }) => pointer.endsWith("/material"));
      return unknownMaterial ? null : { complaints: error.errors };
    }
    if (error instanceof CheckFailure) return null;
    throw error;
  }
}
