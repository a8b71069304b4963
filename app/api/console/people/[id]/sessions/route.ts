import { transact } from "@/db/client";
import { endSession } from "@/lib/auth/session";
import { ownSessions, sessionViews } from "@/lib/auth/session-view";
import { requirePerson } from "@/lib/people/manage-people";
import { consoleRoute } from "../../../_server/console-route";

/** The devices that somebody is signed in with. */
export const GET = consoleRoute({
  action: "people.manage",
  handle: ({ service, db, params, person, now }) => {
    const { id } = requirePerson(service, params.id);
    return { rows: sessionViews(db, id, person.sessionId, now) };
  },
});

/** Signs somebody out everywhere; the administrator's own present session stays. */
export const DELETE = consoleRoute({
  action: "people.manage",
  handle: ({ service, db, params, person, actor, now }) => {
    const { id } = requirePerson(service, params.id);
    transact(db, () => {
      for (const session of ownSessions(db, id, now)) {
        if (session.id !== person.sessionId) endSession(db, session, actor, now);
      }
    });
  },
});
