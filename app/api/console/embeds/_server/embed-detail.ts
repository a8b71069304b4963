import "server-only";
import { embedById, embedHistory, type EmbedRow } from "@/db/queries/embeds";
import { definitionProblems } from "@/lib/embeds/check-definition";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import { embedView, type EmbedView, versionView, type VersionView } from "@/lib/embeds/embed-view";
import { type InputFacts, inputsOf } from "@/lib/embeds/inputs";
import { embedQuota, type EmbedQuota, type HostUsage, usageByHost } from "@/lib/embeds/usage";
import { findShape, libraryMaterials, type Problem } from "@/lib/engine";
import { materialOf, usableMaterial } from "@/lib/materials/team-materials";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { listMaterials } from "@/db/queries/materials";

/** Everything that the page of one widget shows. */
export interface EmbedDetail {
  readonly embed: EmbedView;
  readonly versions: readonly VersionView[];
  readonly shapeTitle: string;
  /** Every input that the shape has, used or not. */
  readonly inputs: readonly InputFacts[];
  readonly materials: readonly { readonly id: string; readonly name: string }[];
  readonly hasCautions: boolean;
  readonly month: EmbedQuota;
  readonly hosts: readonly HostUsage[];
  readonly problems: readonly Problem[];
  readonly mayManage: boolean;
}

export function mustFindEmbed(service: Service, id: string): EmbedRow {
  const row = embedById(service.db, id);
  if (!row) throw new Refusal("not-found", "There is nothing under this id that you may see.");
  return row;
}

export async function embedDetail(
  service: Service,
  row: EmbedRow,
  mayManage: boolean,
  now: number,
): Promise<EmbedDetail> {
  const versions = embedHistory(service.db, row.id).map((version) => versionView(version, row));
  const { definition } = versions[0];
  const shape = findShape(definition.shape);
  return {
    embed: embedView(row),
    versions,
    shapeTitle: shape?.title ?? definition.shape,
    inputs: shape ? [...inputsOf(shape).values()] : [],
    materials: [...ownMaterials(service, row.teamId), ...libraryMaterials].map(({ id, name }) => ({
      id,
      name,
    })),
    hasCautions: (shape?.cautions.length ?? 0) > 0,
    month: await embedQuota(service, row, now),
    hosts: usageByHost(service, row.id, now),
    problems: problemsOf(service, row.teamId, definition),
    mayManage,
  };
}

/** The team's own materials in use; a team has dozens. */
function ownMaterials({ db }: Service, teamId: string) {
  return listMaterials(db, teamId, 200)
    .filter(({ retiredAt }) => retiredAt === null)
    .map(materialOf);
}

/** What stands in the way of publishing. */
export function problemsOf(
  service: Service,
  teamId: string,
  definition: EmbedDefinition,
): readonly Problem[] {
  return definitionProblems(definition, (id) => usableMaterial(service.db, teamId, id));
}
