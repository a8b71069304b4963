import { reachOf } from "@/lib/auth/permissions";
import { overviewOf } from "@/lib/usage/overview";
import { consoleRoute } from "../_server/console-route";

/** What the first page of the console shows, over all teams that the person sees. */
export const GET = consoleRoute({
  action: "overview.view",
  handle: ({ db, person, teamIds, now }) =>
    overviewOf(db, {
      scope: { teamIds: reachOf(person.role, "overview.view") === "all" ? "all" : teamIds },
      teamIds,
      now,
    }),
});
