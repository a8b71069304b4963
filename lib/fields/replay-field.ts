import type { Database } from "@/db/client";
import type { RecordRow } from "@/db/queries/records";
import { type Material, type PreparedField, prepareField } from "@/lib/engine";
import { pinnedMaterial } from "../materials/team-materials";

/**
 * A record of `field` made ready to be solved again, with the material versions it pinned.
 * Throws InputError where today's engine refuses the request.
 */
export function prepareReplay(
  db: Database,
  row: RecordRow,
): { prepared: PreparedField; materials: Material[]; replayOf: { recordId: string; before: unknown } } {
  const pinned = new Map(row.materials.map(({ id, version }) => [id, version]));
  const materials = new Map<string, Material>();
  const body: unknown = JSON.parse(row.request);
  const prepared = prepareField(body, {
    material: (id) => {
      const material = pinnedMaterial(db, row.teamId, id, pinned.get(id));
      if (material) materials.set(id, material);
      return material;
    },
    // The record's request carries its outline.
    outline: () => undefined,
  });
  return {
    prepared,
    materials: [...materials.values()],
    replayOf: { recordId: row.id, before: JSON.parse(row.result) },
  };
}
