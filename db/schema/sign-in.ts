import { index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import { people, teams } from "./organisation";

/** A browser that a person is signed in with. Ended sessions stay for a while, for the list of devices. */
export const sessions = sqliteTable(
  "sessions",
  {
    id: text().primaryKey(),
    personId: text("person_id")
      .notNull()
      .references(() => people.id),
    /** The team on whose behalf pages compute and store; null: the first of the person's teams. */
    teamId: text("team_id").references(() => teams.id),
    /** SHA-256 of the device's own cookie: a browser seen before is not told of again. */
    device: text().notNull(),
    /** "Firefox on Linux", by what the browser says of itself. */
    client: text().notNull(),
    address: text().notNull(),
    createdAt: integer("created_at").notNull(),
    /** Noted at most every few minutes. */
    lastSeenAt: integer("last_seen_at").notNull(),
    expiresAt: integer("expires_at").notNull(),
    endedAt: integer("ended_at"),
  },
  (table) => [
    index("sessions_person").on(table.personId, table.createdAt),
    index("sessions_expires").on(table.expiresAt),
  ],
);

/** What a link in a mail is for. */
export const LINK_KINDS = ["invitation", "reset", "email"] as const;
export type LinkKind = (typeof LINK_KINDS)[number];

/** A link that may be followed once. Only a hash of its secret is kept. */
export const links = sqliteTable(
  "links",
  {
    id: text().primaryKey(),
    kind: text({ enum: LINK_KINDS }).notNull(),
    personId: text("person_id")
      .notNull()
      .references(() => people.id),
    /** SHA-256 of the secret, hexadecimal. */
    hash: text().notNull(),
    /** The address that the link proves: the new one, where it confirms a change. */
    email: text().notNull(),
    createdAt: integer("created_at").notNull(),
    expiresAt: integer("expires_at").notNull(),
    usedAt: integer("used_at"),
  },
  (table) => [uniqueIndex("links_hash").on(table.hash), index("links_person").on(table.personId, table.kind)],
);
