import "server-only";
import { keyById, type KeyRow } from "@/db/queries/keys";
import { Refusal } from "@/lib/service/refusal";
import type { ConsoleCall } from "./console-route";

/** The key that the path names; one of another team is unknown. */
export function ownKey(call: ConsoleCall<unknown, unknown>): KeyRow {
  const row = keyById(call.db, call.params.id);
  if (!row) throw new Refusal("not-found", "There is nothing under this id that you may see.");
  call.requireTeam(row.teamId);
  return row;
}
