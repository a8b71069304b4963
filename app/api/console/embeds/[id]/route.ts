import { embedSettings } from "@/lib/embeds/definition";
import { changeEmbedSettings } from "@/lib/embeds/manage-embeds";
import { consoleRoute } from "../../_server/console-route";
import { embedDetail, mustFindEmbed } from "../_server/embed-detail";

/** One widget with its versions, its usage and what its builder needs. */
export const GET = consoleRoute({
  action: "embeds.view",
  handle: ({ service, params, requireTeam, may, now }) => {
    const row = mustFindEmbed(service, params.id);
    requireTeam(row.teamId);
    return embedDetail(service, row, may("embeds.manage", row.teamId), now);
  },
});

/** Name, origins and quota: they count at once. */
export const PATCH = consoleRoute({
  action: "embeds.manage",
  body: embedSettings,
  handle: ({ service, db, params, body, actor, now, requireTeam }) => {
    const row = mustFindEmbed(service, params.id);
    requireTeam(row.teamId);
    return changeEmbedSettings(db, { actor, now }, row.id, body);
  },
});
