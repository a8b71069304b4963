import { teamById } from "@/db/queries/teams";
import { keyDetail } from "@/lib/auth/key-detail";
import { keyChange } from "@/lib/auth/key-settings";
import { changeKey } from "@/lib/auth/manage-keys";
import { consoleRoute } from "../../_server/console-route";
import { ownKey } from "../../_server/own-key";

/** One key with its month, its clients and the secret that is on its way out. */
export const GET = consoleRoute({
  action: "keys.view",
  handle: (call) => {
    const row = ownKey(call);
    const detail = keyDetail(call.db, row, teamById(call.db, row.teamId)?.name ?? row.team, call.now);
    return { ...detail, mayManage: call.may("keys.manage", row.teamId) };
  },
});

/** Changes what a key may do; the secret stays. */
export const PATCH = consoleRoute({
  action: "keys.manage",
  body: keyChange,
  handle: (call) => {
    const { id } = ownKey(call);
    return changeKey(call.db, { id, actor: call.actor, now: call.now, change: call.body });
  },
});
