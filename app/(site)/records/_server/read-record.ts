import "server-only";
import { fieldOfRecord } from "@/db/queries/fields";
import { recordById, recordIdsOfTeams } from "@/db/queries/records";
import { listTeams, teamById } from "@/db/queries/teams";
import { plotTextOf } from "@/api/operations/field-pictures";
import { type FieldRequest, type FieldResult, plotSvg } from "@/lib/engine";
import { may } from "@/lib/auth/permissions";
import { type SignedIn, signedInBy } from "@/lib/auth/session";
import { pinnedMaterial } from "@/lib/materials/team-materials";
import { recordView } from "@/lib/records/records";
import { type Service, sharedService } from "@/lib/service/service";
import { recordContent } from "../_content/build-content";
import type { Draw, RecordContent } from "../_content/content";
import { readRecordCode, recordCode } from "../_content/record-code";

/** What a reader of a record may do with it. */
export interface RecordRights {
  /** Whether the record belongs to the team on whose behalf the reader's pages call. */
  readonly ownTeam: boolean;
  readonly manage: boolean;
}

export type RecordReading =
  | { readonly kind: "signed-out" }
  | { readonly kind: "unknown" }
  /** The address had the code that stands on paper; the record's own address is this. */
  | { readonly kind: "elsewhere"; readonly id: string }
  | { readonly kind: "read"; readonly content: RecordContent; readonly rights: RecordRights };

/**
 * A record for whoever is signed in by these cookies, by its id or by its code. What another team owns is unknown, as
 * what does not exist is.
 */
export async function readRecordFor(cookies: string | null, idOrCode: string): Promise<RecordReading> {
  const service = sharedService();
  const reader = await signedInBy(service, cookies);
  if (!reader) return { kind: "signed-out" };
  const code = readRecordCode(idOrCode);
  if (code) {
    const id = idOfCode(service, reader, code);
    return id === undefined ? { kind: "unknown" } : { kind: "elsewhere", id };
  }
  const row = recordById(service.db, idOrCode);
  if (!row || !may(reader, "records.view", row.teamId)) return { kind: "unknown" };
  const { db, config } = service;
  const content = recordContent(recordView(row), {
    origin: config.origin,
    team: teamById(db, row.teamId)?.name ?? "",
    lookUp: (id, version) => {
      const material = pinnedMaterial(db, row.teamId, id, version);
      return material?.version === version ? material : undefined;
    },
    plot: row.operation === "field" ? await fieldPlot(service, row.id) : null,
  });
  const rights = {
    ownTeam: reader.team?.id === row.teamId,
    manage: may(reader, "records.manage", row.teamId),
  };
  return { kind: "read", content, rights };
}

function idOfCode({ db }: Service, reader: SignedIn, code: string): string | undefined {
  const open = listTeams(db).filter(({ id }) => may(reader, "records.view", id));
  return recordIdsOfTeams(
    db,
    open.map(({ id }) => id),
  ).find((id) => recordCode(id) === code);
}

/** Draws the picture of the field solution that stored a record; null where its map is gone. */
async function fieldPlot({ db, fields }: Service, recordId: string): Promise<Draw | null> {
  const row = fieldOfRecord(db, recordId);
  if (!row?.result) return null;
  const map = await fields.files.read(row.id);
  if (!map) return null;
  // Both were written by this application from what its schemas had checked.
  const request = JSON.parse(row.request) as FieldRequest;
  const result = JSON.parse(row.result) as FieldResult;
  const names = (request.terminals ?? []).map(({ name }) => name);
  const text = plotTextOf(result, map, names, request.outline?.unit ?? "m");
  return (look) => plotSvg(map, text, look);
}
