import { changeTeam, teamChange } from "@/lib/people/manage-teams";
import { consoleRoute } from "../../_server/console-route";

/** Renames a team. */
export const PATCH = consoleRoute({
  action: "teams.manage",
  body: teamChange,
  handle: ({ service, params, body, actor }) => {
    const { id, slug, name } = changeTeam(service, params.id, body, actor);
    return { id, slug, name };
  },
});
