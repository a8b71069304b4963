import "server-only";
import { listTeams } from "@/db/queries/teams";
import { type Action, reachOf } from "@/lib/auth/permissions";
import type { SignedIn } from "@/lib/auth/session";
import type { Service } from "@/lib/service/service";

/** A team to choose, as pages know it. */
export interface TeamChoice {
  readonly id: string;
  readonly name: string;
}

/** The teams whose things the person may do that to, by name. */
export function teamChoices(
  { db }: Pick<Service, "db">,
  person: SignedIn,
  action: Action,
): readonly TeamChoice[] {
  const reach = reachOf(person.role, action);
  if (reach === "none") return [];
  const teams = reach === "all" ? listTeams(db) : person.teams;
  return teams.map(({ id, name }) => ({ id, name }));
}
