import { testLetter } from "@/lib/mail/letters";
import { post, sendSoon } from "@/lib/mail/outbox";
import { consoleRoute } from "../../_server/console-route";

/** Sends a mail to the administrator who asks. */
export const POST = consoleRoute({
  action: "settings.manage",
  handle: ({ service, person, now }) => {
    post(service, { kind: "test", recipient: person.email, letter: testLetter(person) }, now);
    sendSoon(service);
    return { recipient: person.email };
  },
});
