import { z } from "zod";
import { teamOutlines } from "@/lib/fields/team-outlines";
import { consoleRoute } from "../../_server/console-route";
import { outlineChoice } from "../_server/outline-choice";

/** The stored outlines of a team, newest first, to make a widget on. */
export const GET = consoleRoute({
  action: "embeds.view",
  query: z.strictObject({ teamId: z.string().max(40) }),
  handle: ({ db, query, requireTeam }) => {
    requireTeam(query.teamId);
    return {
      rows: teamOutlines(db, query.teamId).map(({ createdAt, ...stored }) => ({
        ...outlineChoice(stored.id, stored),
        createdAt,
      })),
    };
  },
});
