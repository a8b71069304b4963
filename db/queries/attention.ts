import { and, eq, inArray, isNotNull, isNull, sql } from "drizzle-orm";
import type { Database } from "../client";
import { embeds, embedVersions } from "../schema/embeds";
import { materials } from "../schema/materials";

/** Embeds in use whose published version names a material that their team has retired. */
export function brokenEmbeds(
  db: Database,
  teamIds: readonly string[],
): { id: string; name: string; material: string }[] {
  return db
    .select({ id: embeds.id, name: embeds.name, material: materials.id })
    .from(materials)
    .innerJoin(embeds, eq(embeds.teamId, materials.teamId))
    .innerJoin(
      embedVersions,
      and(eq(embedVersions.embedId, embeds.id), eq(embedVersions.number, embeds.publishedVersion)),
    )
    .where(
      and(
        inArray(materials.teamId, [...teamIds]),
        isNotNull(materials.retiredAt),
        isNull(embeds.withdrawnAt),
        sql`instr(${embedVersions.definition}, '"' || ${materials.id} || '"') > 0`,
      ),
    )
    .all();
}
