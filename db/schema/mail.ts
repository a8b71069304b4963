import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";

export const MAIL_STATES = ["queued", "sent", "captured", "failed"] as const;
export type MailState = (typeof MAIL_STATES)[number];

/** Mails on their way and, in the demo and in tests, those kept here in place of being sent. */
export const mails = sqliteTable(
  "mails",
  {
    id: text().primaryKey(),
    /** `invitation`, `reset`, `key-expiry` … */
    kind: text().notNull(),
    recipient: text().notNull(),
    subject: text().notNull(),
    /** Both parts are emptied once the mail is sent: links in them would stay readable. */
    text: text().notNull(),
    html: text().notNull(),
    state: text({ enum: MAIL_STATES }).notNull(),
    attempts: integer().notNull().default(0),
    /** What the mail server said last, without particulars of ours. */
    error: text(),
    createdAt: integer("created_at").notNull(),
    /** Not tried before this moment. */
    dueAt: integer("due_at").notNull(),
    sentAt: integer("sent_at"),
  },
  (table) => [index("mails_state").on(table.state, table.dueAt), index("mails_created").on(table.createdAt)],
);

/** Notices that were given, each once: `key-expiry:k123:14:1767225600000`. */
export const notices = sqliteTable("notices", {
  name: text().primaryKey(),
  at: integer().notNull(),
});
