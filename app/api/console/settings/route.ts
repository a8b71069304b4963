import { countMails } from "@/db/queries/mails";
import { changeSettings, readSettings, settingsChange } from "@/lib/config/service-settings";
import { consoleRoute } from "../_server/console-route";

/** The settings, and what the environment says of mails and addresses. */
export const GET = consoleRoute({
  action: "settings.view",
  handle: ({ service, db }) => {
    const { mail, origin, demo } = service.config;
    return {
      ...readSettings(db),
      mail:
        mail.kind === "smtp"
          ? { kind: mail.kind, server: new URL(mail.url).host, from: mail.from, counts: countMails(db) }
          : { kind: mail.kind, counts: countMails(db) },
      origin,
      demo,
    };
  },
});

export const PATCH = consoleRoute({
  action: "settings.manage",
  body: settingsChange,
  handle: ({ db, body, actor, now }) => changeSettings(db, body, actor, now),
});
