import {
  findScale,
  InputError,
  type Material,
  readFieldSizing,
  type SizingResult,
  type StoredOutline,
} from "@/lib/engine";
import { fieldCost } from "../jobs/field-cost";
import type { FieldJobs } from "../jobs/field-jobs";

/** Longest that a sizing on an outline may take, ms: it answers within the call. */
const LONGEST_MS = 25_000;
/** Most unknowns of one of its solutions: each then costs one computation. */
const MOST_UNKNOWNS = 20_000;

/** What a sizing on an outline may use, and where it is solved. */
export interface FieldSizingContext {
  readonly fields: FieldJobs;
  readonly material: (id: string) => Material | undefined;
  readonly outline: (id: string) => StoredOutline | undefined;
}

export interface SizedField {
  readonly result: SizingResult;
  /** Computations that its solutions cost. */
  readonly computations: number;
  /** The request with a stored outline put in its place, for a record. */
  readonly request: unknown;
}

/** Whether a sizing is on an outline rather than on a shape. */
export function isFieldSizing(request: unknown): boolean {
  return (
    typeof request === "object" &&
    request !== null &&
    !("shape" in request) &&
    ("outline" in request || "outlineId" in request)
  );
}

/**
 * Finds the scale of a drawing on the threads that solve fields. Nothing is stored.
 * @throws InputError for everything that the caller can get wrong, for a target out of reach, and where it takes too long.
 */
export async function sizeField(
  request: unknown,
  { fields, material, outline }: FieldSizingContext,
): Promise<SizedField> {
  const materials = new Map<string, Material>();
  const sizing = readFieldSizing(request, {
    outline,
    material: (id) => {
      const found = material(id);
      if (found) materials.set(id, found);
      return found;
    },
  });
  const end = performance.now() + LONGEST_MS;
  let computations = 0;
  const result = await findScale(sizing, async (body) => {
    const left = end - performance.now();
    if (left <= 0) {
      throw new InputError([
        {
          pointer: "#/within",
          detail: "takes longer than a call may: give a narrower range, or a lower accuracy.",
        },
      ]);
    }
    const outcome = await fields.solve({
      body,
      materials: [...materials.values()],
      secondsAllowed: left / 1000,
      maximumUnknowns: MOST_UNKNOWNS,
    });
    if (outcome.kind === "refused") return null;
    computations += fieldCost(outcome.result.mesh.unknowns);
    return outcome.result;
  });
  const { solveFor, target, within } = request as Record<string, unknown>;
  const stored = { ...sizing.prepared.body, solveFor, target, ...(within === undefined ? {} : { within }) };
  return { result, computations, request: stored };
}
