import { transact } from "@/db/client";
import { endSession } from "@/lib/auth/session";
import { ownSessions } from "@/lib/auth/session-view";
import { consoleRoute } from "../../_server/console-route";

/** Signs out all other devices of one's own. */
export const DELETE = consoleRoute({
  action: "account.manage",
  handle: ({ db, person, actor, now }) => {
    transact(db, () => {
      for (const session of ownSessions(db, person.personId, now)) {
        if (session.id !== person.sessionId) endSession(db, session, actor, now);
      }
    });
  },
});
