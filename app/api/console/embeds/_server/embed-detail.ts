import "server-only";
import { embedById, embedHistory, type EmbedRow } from "@/db/queries/embeds";
import { embedView, type EmbedView, versionView, type VersionView } from "@/lib/embeds/embed-view";
import { type InputFacts, inputsOf, outlineInputs } from "@/lib/embeds/inputs";
import { teamProblems } from "@/lib/embeds/manage-embeds";
import { embedQuota, type EmbedQuota, type HostUsage, usageByHost } from "@/lib/embeds/usage";
import { findShape, libraryMaterials, type Problem } from "@/lib/engine";
import { teamOutline } from "@/lib/fields/team-outlines";
import { teamMaterialsInUse } from "@/lib/materials/team-materials";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { type OutlineChoice, outlineChoice } from "./outline-choice";

/** Everything that the page of one widget shows. */
export interface EmbedDetail {
  readonly embed: EmbedView;
  readonly versions: readonly VersionView[];
  /** What it computes, in words. */
  readonly subject: string;
  /** The stored outline that it is on; null for a shape. */
  readonly outline: OutlineChoice | null;
  /** Every input that there is, used or not. */
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
  const shape = findShape(definition.shape ?? "");
  const stored =
    definition.outlineId === undefined
      ? undefined
      : teamOutline(service.db, row.teamId, definition.outlineId);
  const inputs = shape ? inputsOf(shape) : outlineInputs(stored?.outline.symmetry === "axisymmetric");
  return {
    embed: embedView(row),
    versions,
    subject: shape?.title ?? (stored?.name ? `Outline “${stored.name}”` : "Outline"),
    outline: stored && definition.outlineId ? outlineChoice(definition.outlineId, stored) : null,
    inputs: [...inputs.values()],
    materials: [...teamMaterialsInUse(service.db, row.teamId), ...libraryMaterials].map(({ id, name }) => ({
      id,
      name,
    })),
    // A field solution always has one.
    hasCautions: shape === undefined || shape.cautions.length > 0,
    month: await embedQuota(service, row, now),
    hosts: usageByHost(service, row.id, now),
    problems: teamProblems(service.db, row.teamId, definition),
    mayManage,
  };
}
