import { latestMails } from "@/db/queries/mails";
import { consoleRoute } from "../../_server/console-route";

const SHOWN = 200;

/** The latest mails, without what they say. */
export const GET = consoleRoute({
  action: "settings.view",
  handle: ({ db }) => ({
    rows: latestMails(db, SHOWN).map(({ createdAt, sentAt, ...mail }) => ({
      ...mail,
      createdAt: new Date(createdAt).toISOString(),
      sentAt: sentAt === null ? null : new Date(sentAt).toISOString(),
    })),
  }),
});
