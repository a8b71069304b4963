import { z } from "zod";
import { listTeams } from "@/db/queries/teams";
import { newMaterialSchema } from "@/lib/materials/input";
import { changeMaterial } from "@/lib/materials/team-materials";
import { consoleRoute } from "../../_server/console-route";
import { ownMaterial, seenMaterial } from "../../_server/own-material";

/** A material with all its versions and the records that used each. */
export const GET = consoleRoute({
  action: "materials.view",
  handle: (call) => {
    const history = seenMaterial(call);
    const { teamId } = history;
    const teamName = listTeams(call.db).find(({ id }) => id === teamId)?.name ?? null;
    return { ...history, teamName, mayManage: teamId !== null && call.may("materials.manage", teamId) };
  },
});

/** The next version, made from the one that the form began with; refused where somebody was faster. */
export const PATCH = consoleRoute({
  action: "materials.manage",
  body: z.strictObject({ from: z.number().int().min(1), ...newMaterialSchema.partial().shape }),
  handle: (call) => {
    const { id, teamId } = ownMaterial(call);
    const { from, ...change } = call.body;
    return changeMaterial(call.db, { teamId, actor: call.actor, now: call.now }, id, from, change);
  },
});
