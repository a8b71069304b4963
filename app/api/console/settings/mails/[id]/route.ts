import { mailById } from "@/db/queries/mails";
import { Refusal } from "@/lib/service/refusal";
import { consoleRoute } from "../../../_server/console-route";

/** One kept mail with both parts. */
export const GET = consoleRoute({
  action: "settings.view",
  handle: ({ db, params }) => {
    const mail = mailById(db, params.id);
    // A mail on its way to a mail server is for its recipient alone.
    if (!mail || mail.state !== "captured") throw new Refusal("not-found", "There is no such mail.");
    const { id, kind, recipient, subject, text, html, createdAt } = mail;
    return { id, kind, recipient, subject, text, html, createdAt: new Date(createdAt).toISOString() };
  },
});
