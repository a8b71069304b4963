import "server-only";
import { type MaterialHistory, materialHistory } from "@/lib/materials/console-materials";
import { Refusal } from "@/lib/service/refusal";
import type { ConsoleCall } from "./console-route";

/** The material that the path names, of the library or a team the person sees; another team's is unknown. */
export function seenMaterial(call: ConsoleCall<unknown, unknown>): MaterialHistory {
  const found = materialHistory(call.db, call.params.id, call.teamIds);
  if (!found) throw new Refusal("not-found", "There is nothing under this id that you may see.");
  if (found.teamId !== null) call.requireTeam(found.teamId);
  return found;
}

/** The same where it is to be changed: the library cannot be. */
export function ownMaterial(call: ConsoleCall<unknown, unknown>): { id: string; teamId: string } {
  const { id, teamId } = seenMaterial(call);
  if (teamId === null) {
    throw new Refusal("library-read-only", "This material belongs to the library, which no team can change.");
  }
  return { id, teamId };
}
