import { z } from "zod";
import { rollBackEmbed } from "@/lib/embeds/manage-embeds";
import { consoleRoute } from "../../../_server/console-route";
import { mustFindEmbed } from "../../_server/embed-detail";

/** Brings an earlier version back. */
export const POST = consoleRoute({
  action: "embeds.manage",
  body: z.strictObject({ version: z.int().min(1) }),
  handle: ({ service, db, params, body, actor, now, requireTeam }) => {
    const row = mustFindEmbed(service, params.id);
    requireTeam(row.teamId);
    return rollBackEmbed(db, { actor, now }, row.id, body.version);
  },
});
