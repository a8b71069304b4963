import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";

/** Roles of a person in the whole installation; membership in teams says what a developer or viewer sees. */
export const ROLES = ["admin", "developer", "viewer"] as const;
export type Role = (typeof ROLES)[number];

export const teams = sqliteTable(
  "teams",
  {
    id: text().primaryKey(),
    /** Short name used on the shell and in addresses: `busbar`. */
    slug: text().notNull(),
    name: text().notNull(),
    createdAt: integer("created_at").notNull(),
  },
  (table) => [uniqueIndex("teams_slug").on(table.slug)],
);

export const people = sqliteTable(
  "people",
  {
    id: text().primaryKey(),
    /** Lower case, so that the unique index compares what a mail server compares. */
    email: text().notNull(),
    name: text().notNull(),
    role: text({ enum: ROLES }).notNull(),
    /** Argon2id hash; null until the invitation is accepted. */
    passwordHash: text("password_hash"),
    createdAt: integer("created_at").notNull(),
    removedAt: integer("removed_at"),
  },
  (table) => [uniqueIndex("people_email").on(table.email)],
);

export const memberships = sqliteTable(
  "memberships",
  {
    personId: text("person_id")
      .notNull()
      .references(() => people.id),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    createdAt: integer("created_at").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.personId, table.teamId] }),
    index("memberships_team").on(table.teamId),
  ],
);
