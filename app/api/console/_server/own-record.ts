import "server-only";
import { recordById, type RecordRow } from "@/db/queries/records";
import { Refusal } from "@/lib/service/refusal";
import type { ConsoleCall } from "./console-route";

/** The record that the path names; one of another team is unknown. */
export function ownRecord(call: ConsoleCall<unknown, unknown>): RecordRow {
  const row = recordById(call.db, call.params.id);
  if (!row) throw new Refusal("not-found", "There is nothing under this id that you may see.");
  call.requireTeam(row.teamId);
  return row;
}
