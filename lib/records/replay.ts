import { z } from "zod";
import type { Database } from "@/db/client";
import type { RecordRow } from "@/db/queries/records";
import {
  boundedResistanceSchema,
  computeResistance,
  computeSizing,
  type ComputeContext,
  type ResistanceResult,
  type SizingResult,
  sizingResultSchema,
  uncertaintySchema,
} from "@/lib/engine";
import { isFieldSizing, sizeField } from "../fields/size-field";
import type { FieldJobs } from "../jobs/field-jobs";
import { pinnedMaterial } from "../materials/team-materials";

const storedResult = z.object({
  resistance: boundedResistanceSchema,
  uncertainty: uncertaintySchema.optional(),
});
const storedSizing = sizingResultSchema.pick({ solutions: true });

/** A stored calculation beside the same one computed today. */
export interface Replay<Result = ResistanceResult> {
  readonly before: unknown;
  readonly now: Result;
  /** (now − before)/before of the resistance; for a sizing the largest such change of a dimension found. */
  readonly drift: number;
  /** Whether value, bounds and uncertainty, or for a sizing the dimensions found, are the same to the last bit. */
  readonly identical: boolean;
}

/**
 * Computes a record of `resistance` again, with the material versions it pinned and today's engine.
 * Throws InputError where today's engine refuses the request.
 */
export function replayResistance(db: Database, row: RecordRow): Replay {
  const before: unknown = JSON.parse(row.result);
  const { resistance: was, uncertainty } = storedResult.parse(before);
  const request: unknown = JSON.parse(row.request);
  const now = computeResistance(request, pinnedContext(db, row));
  const is = now.resistance;
  return {
    before,
    now,
    drift: (is.value - was.value) / was.value,
    identical:
      is.value === was.value &&
      is.lower === was.lower &&
      is.upper === was.upper &&
      // Both as the schema reads them, so that their members stand in one order.
      JSON.stringify(storedResult.parse(now).uncertainty) === JSON.stringify(uncertainty),
  };
}

/** Finds the dimension of a record of `sizing` again, in the same way; on an outline by field solutions. */
export async function replaySizing(
  db: Database,
  fields: FieldJobs,
  row: RecordRow,
): Promise<Replay<SizingResult> & { readonly computations: number }> {
  const before: unknown = JSON.parse(row.result);
  const request: unknown = JSON.parse(row.request);
  const { material } = pinnedContext(db, row);
  const was = storedSizing.parse(before).solutions.map(({ dimension }) => dimension.value);
  const again = isFieldSizing(request)
    ? await sizeField(request, { fields, material, outline: () => undefined })
    : { result: computeSizing(request, { material }), computations: 1 };
  const now = again.result;
  const is = now.solutions.map(({ dimension }) => dimension.value);
  const drifts = was.map((value, i) => (is[i] === undefined ? 1 : (is[i] - value) / value));
  return {
    before,
    now,
    drift: drifts.reduce((most, drift) => (Math.abs(drift) > Math.abs(most) ? drift : most), 0),
    identical: JSON.stringify(is) === JSON.stringify(was),
    computations: again.computations,
  };
}

function pinnedContext(db: Database, row: RecordRow): ComputeContext {
  const pinned = new Map(row.materials.map(({ id, version }) => [id, version]));
  return { material: (id) => pinnedMaterial(db, row.teamId, id, pinned.get(id)) };
}
