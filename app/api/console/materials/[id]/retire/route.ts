import { z } from "zod";
import { retireMaterial } from "@/lib/materials/team-materials";
import { consoleRoute } from "../../../_server/console-route";
import { ownMaterial } from "../../../_server/own-material";

/** Withdraws a material from use; records that used it keep it. */
export const POST = consoleRoute({
  action: "materials.manage",
  body: z.strictObject({ from: z.number().int().min(1) }),
  handle: (call) => {
    const { id, teamId } = ownMaterial(call);
    retireMaterial(call.db, { teamId, actor: call.actor, now: call.now }, id, call.body.from);
    return undefined;
  },
});
