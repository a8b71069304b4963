import { forgetLinks } from "@/db/queries/links";
import { forgetMails } from "@/db/queries/mails";
import { forgetUsageEvents } from "@/db/queries/retention";
import { forgetSessions } from "@/db/queries/sessions";
import { readSettings } from "../config/service-settings";
import type { Service } from "../service/service";
import { tellOfExpiry, tellOfQuotas } from "./key-notices";
import { sendDue } from "./outbox";

/** How often the rounds are made, ms. */
const EVERY_MS = 60_000;

const DAY_MS = 86_400_000;

/** Ended sessions and followed links are kept this long, ms. */
const AFTERLIFE_MS = 30 * DAY_MS;

/** What time alone brings about: notices that are due, mails that wait, and what has been kept long enough. */
export async function makeRound(service: Service): Promise<void> {
  tellOfExpiry(service);
  tellOfQuotas(service);
  await sendDue(service);
  forgetOld(service);
}

function forgetOld({ db, now }: Service): void {
  const at = now();
  const { usageDays, mailDays } = readSettings(db).retention;
  forgetUsageEvents(db, at - usageDays * DAY_MS);
  forgetMails(db, at - mailDays * DAY_MS);
  forgetSessions(db, at - AFTERLIFE_MS);
  forgetLinks(db, at - AFTERLIFE_MS);
}

/** Makes a round every minute until told to stop. One process is enough; two do nothing twice. */
export function startRounds(service: Service): () => void {
  let running = false;
  const timer = setInterval(() => {
    if (running || !service.db.$client.open) return;
    running = true;
    makeRound(service)
      .catch((error: unknown) => service.log.error({ event: "rounds", error: String(error) }))
      .finally(() => (running = false));
  }, EVERY_MS);
  timer.unref();
  return () => clearInterval(timer);
}
