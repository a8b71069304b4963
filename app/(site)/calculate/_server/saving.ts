import "server-only";
import { mayAnywhere } from "@/lib/auth/permissions";
import { sharedService } from "@/lib/service/service";
import { currentPerson } from "../../../console/_shell/require-session";
import { teamChoices } from "../../../console/_shell/team-choices";
import type { Saving } from "../_calculator/save-record";

/**
 * How the reader of a page may keep a calculation, and for which teams; undefined where the person's role never may.
 * @param back Path that signing in leads back to.
 */
export async function savingFor(back: string): Promise<Saving | undefined> {
  const person = await currentPerson();
  if (!person) return { kind: "sign-in", href: `/sign-in?next=${encodeURIComponent(back)}` };
  if (!person.team || !mayAnywhere(person, "records.manage")) return undefined;
  return {
    kind: "signed-in",
    team: person.team.id,
    teams: teamChoices(sharedService(), person, "records.manage"),
  };
}
