import { z } from "zod";
import type { Database } from "@/db/client";
import type { RecordRow } from "@/db/queries/records";
import { boundedResistanceSchema, computeResistance, type ResistanceResult } from "@/lib/engine";
import { pinnedMaterial } from "../materials/team-materials";

const storedResult = z.object({ resistance: boundedResistanceSchema });

/** A stored calculation beside the same one computed today. */
export interface Replay {
  readonly before: unknown;
  readonly now: ResistanceResult;
  /** (now − before)/before of the resistance. */
  readonly drift: number;
  /** Whether value and bounds are the same to the last bit. */
  readonly identical: boolean;
}

/**
 * Computes a record of `resistance` again, with the material versions it pinned and today's engine.
 * Throws InputError where today's engine refuses the request.
 */
export function replayResistance(db: Database, row: RecordRow): Replay {
  const before: unknown = JSON.parse(row.result);
  const was = storedResult.parse(before).resistance;
  const pinned = new Map(row.materials.map(({ id, version }) => [id, version]));
  const request: unknown = JSON.parse(row.request);
  const now = computeResistance(request, {
    material: (id) => pinnedMaterial(db, row.teamId, id, pinned.get(id)),
  });
  const is = now.resistance;
  return {
    before,
    now,
    drift: (is.value - was.value) / was.value,
    identical: is.value === was.value && is.lower === was.lower && is.upper === was.upper,
  };
}
