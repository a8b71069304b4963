import { z } from "zod";
import { relabel, removeRecord } from "@/lib/records/records";
import { consoleRoute } from "../../_server/console-route";
import { ownRecord } from "../../_server/own-record";

/** Gives a record another label. */
export const PATCH = consoleRoute({
  action: "records.manage",
  body: z.strictObject({ label: z.string().trim().min(1).max(200) }),
  handle: (call) => {
    const { id, teamId } = ownRecord(call);
    const { label } = relabel(call.db, { teamId, actor: call.actor, now: call.now }, id, call.body.label);
    return { id, label };
  },
});

/** Removes a record for good. */
export const DELETE = consoleRoute({
  action: "records.manage",
  handle: (call) => {
    const { id, teamId } = ownRecord(call);
    removeRecord(call.db, { teamId, actor: call.actor, now: call.now }, id);
    return undefined;
  },
});
