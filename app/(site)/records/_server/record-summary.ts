import "server-only";
import { recordById } from "@/db/queries/records";
import { teamById } from "@/db/queries/teams";
import { may } from "@/lib/auth/permissions";
import { signedInBy } from "@/lib/auth/session";
import type { Service } from "@/lib/service/service";
import { recordCode } from "../_content/record-code";

export interface RecordSummary {
  readonly id: string;
  readonly label: string;
  /** As it stands on the printed sheet. */
  readonly code: string;
  /** Name of the team that owns it. */
  readonly team: string;
}

/** Undefined for what does not exist and what another team owns alike. */
export async function summaryFor(
  service: Service,
  cookies: string | null,
  id: string,
): Promise<RecordSummary | "signed-out" | undefined> {
  const reader = await signedInBy(service, cookies);
  if (!reader) return "signed-out";
  const row = recordById(service.db, id);
  if (!row || !may(reader, "records.view", row.teamId)) return undefined;
  return { id, label: row.label, code: recordCode(id), team: teamById(service.db, row.teamId)?.name ?? "" };
}
