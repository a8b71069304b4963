import { listKeys } from "@/db/queries/keys";
import { listMemberships } from "@/db/queries/people";
import { listTeams } from "@/db/queries/teams";
import { addTeam, newTeam } from "@/lib/people/manage-teams";
import { json } from "../../_server/page-call";
import { consoleRoute } from "../_server/console-route";

/** Teams that the person may see, with how many belong to them and how many keys are in use. */
export const GET = consoleRoute({
  action: "people.view",
  handle: ({ db, teamIds, now }) => {
    const memberships = listMemberships(db);
    const rows = listTeams(db)
      .filter(({ id }) => teamIds.includes(id))
      .map(({ id, slug, name, createdAt }) => ({
        id,
        slug,
        name,
        createdAt: new Date(createdAt).toISOString(),
        people: memberships.filter(({ teamId }) => teamId === id).length,
        keys: listKeys(db, { teamId: id }).filter(
          (key) => key.revokedAt === null && (key.expiresAt === null || key.expiresAt > now),
        ).length,
      }));
    return { rows };
  },
});

/** Makes a team. */
export const POST = consoleRoute({
  action: "teams.manage",
  body: newTeam,
  handle: ({ service, body, actor }) => {
    const { id, slug, name } = addTeam(service, body, actor);
    return json({ id, slug, name }, 201);
  },
});
