import { z } from "zod";
import type { Database } from "@/db/client";
import type { RecordRow } from "@/db/queries/records";
import { type NetworkResult, networkInStretches, networkResultSchema } from "@/lib/engine";
import { workInTurns } from "../jobs/in-turns";
import { pinnedMaterial } from "../materials/team-materials";

const stored = z.object({ resistance: networkResultSchema.shape.resistance });

/** A stored network beside the same one computed today; `drift` and `identical` are those of its resistance. */
export interface NetworkReplay {
  readonly before: unknown;
  readonly now: NetworkResult;
  readonly drift: number;
  readonly identical: boolean;
}

/**
 * Computes a record of `network` again, with the material versions it pinned and today's engine.
 * Throws InputError where today's engine refuses the request.
 */
export async function replayNetwork(db: Database, row: RecordRow): Promise<NetworkReplay> {
  const before: unknown = JSON.parse(row.result);
  const was = stored.parse(before).resistance;
  const pinned = new Map(row.materials.map(({ id, version }) => [id, version]));
  const request: unknown = JSON.parse(row.request);
  const now = await workInTurns(
    networkInStretches(request, { material: (id) => pinnedMaterial(db, row.teamId, id, pinned.get(id)) }),
  );
  const is = now.resistance;
  return {
    before,
    now,
    drift: (is.value - was.value) / was.value,
    identical: is.value === was.value && is.lower === was.lower && is.upper === was.upper,
  };
}
