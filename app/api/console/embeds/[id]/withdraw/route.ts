import { withdrawEmbed } from "@/lib/embeds/manage-embeds";
import { consoleRoute } from "../../../_server/console-route";
import { mustFindEmbed } from "../../_server/embed-detail";

/** Takes the widget off every page. */
export const POST = consoleRoute({
  action: "embeds.manage",
  handle: ({ service, db, params, actor, now, requireTeam }) => {
    const row = mustFindEmbed(service, params.id);
    requireTeam(row.teamId);
    return withdrawEmbed(db, { actor, now }, row.id);
  },
});
