import { z } from "zod";
import { embedDefinition } from "@/lib/embeds/definition";
import { discardEmbedDraft, saveEmbedDraft, teamProblems } from "@/lib/embeds/manage-embeds";
import { consoleRoute } from "../../../_server/console-route";
import { mustFindEmbed } from "../../_server/embed-detail";

/** Saves the draft; answers with what still stands in the way of publishing it. */
export const PUT = consoleRoute({
  action: "embeds.manage",
  body: z.strictObject({ definition: embedDefinition, from: z.int().nullable() }),
  handle: ({ service, db, params, body, actor, now, requireTeam }) => {
    const row = mustFindEmbed(service, params.id);
    requireTeam(row.teamId);
    const version = saveEmbedDraft(db, { actor, now }, row.id, body);
    return { version, problems: teamProblems(db, row.teamId, version.definition) };
  },
});

export const DELETE = consoleRoute({
  action: "embeds.manage",
  handle: ({ service, db, params, actor, now, requireTeam }) => {
    const row = mustFindEmbed(service, params.id);
    requireTeam(row.teamId);
    discardEmbedDraft(db, { actor, now }, row.id);
  },
});
