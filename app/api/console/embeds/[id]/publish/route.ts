import { publishEmbed } from "@/lib/embeds/manage-embeds";
import { consoleRoute } from "../../../_server/console-route";
import { mustFindEmbed } from "../../_server/embed-detail";

/** Shows the draft on every page from now on. */
export const POST = consoleRoute({
  action: "embeds.manage",
  handle: ({ service, db, params, actor, now, requireTeam }) => {
    const row = mustFindEmbed(service, params.id);
    requireTeam(row.teamId);
    return publishEmbed(db, { actor, now }, row.id);
  },
});
