import { sessionById } from "@/db/queries/sessions";
import { clearedSessionCookie } from "@/lib/auth/session-cookie";
import { endSession, personActor, signedInBy } from "@/lib/auth/session";
import { requireSamePage } from "@/lib/http/same-page";
import { answerPageCall, done } from "../../_server/page-call";

/** Ends the session of this browser. Without one there is nothing to do, and that is no error. */
export function POST(request: Request): Promise<Response> {
  return answerPageCall(request, async ({ service, headers, address, requestId, now }) => {
    requireSamePage(headers, service.config.origin);
    const person = await signedInBy(service, headers.get("cookie"));
    const session = person && sessionById(service.db, person.sessionId);
    if (person && session) endSession(service.db, session, personActor(person, address, requestId), now);
    return done([clearedSessionCookie(service.config)]);
  });
}
