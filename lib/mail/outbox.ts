import { createTransport, type Transporter } from "nodemailer";
import { transact, type Database } from "@/db/client";
import { claimMails, insertMail, markMailRefused, markMailSent } from "@/db/queries/mails";
import type { MailConfig } from "../config/mail";
import { newId } from "../service/identifier";
import type { Service } from "../service/service";
import { type Letter, writeMessage } from "./letter";

/** A mail that is refused is tried again after these times, ms; then it has failed. */
const RETRIES_MS = [60_000, 300_000, 1_800_000, 7_200_000, 21_600_000];

/** A mail taken by a process that is killed is free again after this, ms. */
const CLAIM_MS = 120_000;

/** Mails sent in one go. */
const AT_ONCE = 20;

export interface Post {
  /** `invitation`, `reset` … */
  readonly kind: string;
  /** E-mail address. */
  readonly recipient: string;
  readonly letter: Letter;
}

type Where = {
  readonly db: Database;
  readonly config: { readonly mail: MailConfig; readonly origin: string };
};

/** Puts a mail on its way, or keeps it where there is no mail server. Call it in the transaction of its cause. */
export function post({ db, config }: Where, { kind, recipient, letter }: Post, now: number): void {
  insertMail(db, {
    id: newId("mail"),
    kind,
    recipient,
    ...writeMessage(letter, config.origin),
    state: config.mail.kind === "smtp" ? "queued" : "captured",
    attempts: 0,
    error: null,
    createdAt: now,
    dueAt: now,
    sentAt: null,
  });
}

const TRANSPORTS = new Map<string, Transporter>();

function transportTo(url: string): Transporter {
  let transport = TRANSPORTS.get(url);
  if (!transport) {
    transport = createTransport(url, {}) as Transporter;
    TRANSPORTS.set(url, transport);
  }
  return transport;
}

/** Sends what is due; tells how many mails went out. A mail that is refused waits for its next attempt. */
export async function sendDue(service: Service): Promise<number> {
  const { db, config, log } = service;
  const { mail } = config;
  if (mail.kind !== "smtp") return 0;
  const now = service.now();
  const due = transact(db, () => claimMails(db, now, now + CLAIM_MS, AT_ONCE));
  let sent = 0;
  for (const row of due) {
    try {
      await transportTo(mail.url).sendMail({
        from: mail.from,
        to: row.recipient,
        subject: row.subject,
        text: row.text,
        html: row.html,
        headers: { "Auto-Submitted": "auto-generated" },
      });
      markMailSent(db, row.id, service.now());
      sent += 1;
    } catch (error) {
      const delay = RETRIES_MS[row.attempts - 1];
      markMailRefused(db, row.id, reasonOf(error), delay === undefined ? null : service.now() + delay);
      log.warn({
        event: "mail-refused",
        mail: row.id,
        kind: row.kind,
        attempts: row.attempts,
        error: reasonOf(error),
      });
    }
  }
  return sent;
}

/** What the mail server said, in one line; no address of ours and no password is in it. */
function reasonOf(error: unknown): string {
  if (!(error instanceof Error)) return "The mail server refused the mail.";
  const code = "code" in error && typeof error.code === "string" ? error.code : "refused";
  const response = "response" in error && typeof error.response === "string" ? `: ${error.response}` : "";
  return `${code}${response}`.replace(/\s+/g, " ").slice(0, 300);
}

/** Sends what is due without keeping the caller waiting. */
export function sendSoon(service: Service): void {
  if (service.config.mail.kind !== "smtp") return;
  setImmediate(() => {
    sendDue(service).catch((error: unknown) => service.log.error({ event: "mail", error: String(error) }));
  });
}
