import { endSession } from "@/lib/auth/session";
import { requireSessionOf } from "@/lib/auth/session-view";
import { consoleRoute } from "../../../_server/console-route";

/** Ends one of one's own sessions. */
export const DELETE = consoleRoute({
  action: "account.manage",
  handle: ({ db, person, params, actor, now }) => {
    endSession(db, requireSessionOf(db, person.personId, params.session, now), actor, now);
  },
});
