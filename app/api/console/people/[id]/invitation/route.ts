import { inviteAgain } from "@/lib/people/manage-people";
import { sendSoon } from "@/lib/mail/outbox";
import { consoleRoute } from "../../../_server/console-route";
import { invitedAnswer } from "../../../_server/invited-answer";

/** A new link for somebody who has not begun; the one before ends. */
export const POST = consoleRoute({
  action: "people.manage",
  handle: ({ service, params, actor }) => {
    const invited = inviteAgain(service, params.id, actor);
    sendSoon(service);
    return invitedAnswer(service, invited);
  },
});
