import { endSession } from "@/lib/auth/session";
import { requireSessionOf } from "@/lib/auth/session-view";
import { requirePerson } from "@/lib/people/manage-people";
import { consoleRoute } from "../../../../_server/console-route";

/** Ends one session of somebody. */
export const DELETE = consoleRoute({
  action: "people.manage",
  handle: ({ service, db, params, actor, now }) => {
    const { id } = requirePerson(service, params.id);
    endSession(db, requireSessionOf(db, id, params.session, now), actor, now);
  },
});
