import { revokeKey } from "@/lib/auth/manage-keys";
import { consoleRoute } from "../../../_server/console-route";
import { ownKey } from "../../../_server/own-key";

/** Ends a key for the next request. */
export const POST = consoleRoute({
  action: "keys.manage",
  handle: (call) => {
    const { id } = ownKey(call);
    return revokeKey(call.db, { id, actor: call.actor, now: call.now });
  },
});
