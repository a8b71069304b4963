import { z } from "zod";
import { chooseSessionTeam } from "@/db/queries/sessions";
import { listTeams } from "@/db/queries/teams";
import { sessionViews } from "@/lib/auth/session-view";
import { signedIn, type SignedIn } from "@/lib/auth/session";
import { knowsTeam } from "@/lib/auth/permissions";
import { changePerson } from "@/lib/people/manage-people";
import { Refusal } from "@/lib/service/refusal";
import { consoleRoute } from "../_server/console-route";

const shown = ({ personId, name, email, role, teams, team }: SignedIn) => ({
  id: personId,
  name,
  email,
  role,
  teams: teams.map(({ id, slug, name }) => ({ id, slug, name })),
  team: team && { id: team.id, slug: team.slug, name: team.name },
});

/** Who is signed in, with their sessions and the teams their pages can work for. */
export const GET = consoleRoute({
  action: "account.manage",
  handle: ({ db, person, now }) => ({
    ...shown(person),
    sessions: sessionViews(db, person.personId, person.sessionId, now),
    choices: listTeams(db)
      .filter(({ id }) => knowsTeam(person, id))
      .map(({ id, slug, name }) => ({ id, slug, name })),
  }),
});

/** Changes one's own name, or the team on whose behalf this browser's pages compute and store. */
export const PATCH = consoleRoute({
  action: "account.manage",
  body: z.strictObject({
    name: z.string().trim().min(1).max(100).optional(),
    team: z.string().max(64).optional(),
  }),
  handle: ({ service, db, person, actor, body, now }) => {
    if (body.team !== undefined) {
      if (!knowsTeam(person, body.team) || !listTeams(db).some(({ id }) => id === body.team)) {
        throw new Refusal("not-found", "There is no such team.");
      }
      chooseSessionTeam(db, person.sessionId, body.team);
    }
    if (body.name !== undefined) changePerson(service, person.personId, { name: body.name }, actor);
    return shown(signedIn(db, person.sessionId, now) ?? person);
  },
});
