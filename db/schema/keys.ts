import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { teams } from "./organisation";

/** A key of a team. It is never deleted: a revoked key stays for the usage and the activity that name it. */
export const keys = sqliteTable(
  "keys",
  {
    id: text().primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    name: text().notNull(),
    scopes: text({ mode: "json" }).$type<string[]>().notNull(),
    /** Origins whose pages may call with this key; empty: no browser of another host. */
    origins: text({ mode: "json" }).$type<string[]>().notNull(),
    /** Whether the key may come as `?key=`, where logs and histories see it. */
    allowedInUrl: integer("allowed_in_url", { mode: "boolean" }).notNull(),
    /** Requests a minute. */
    minuteQuota: integer("minute_quota").notNull(),
    /** Computations a calendar month (UTC). */
    monthQuota: integer("month_quota").notNull(),
    createdAt: integer("created_at").notNull(),
    /** Who issued it, for people. */
    createdBy: text("created_by").notNull(),
    expiresAt: integer("expires_at"),
    revokedAt: integer("revoked_at"),
    lastUsedAt: integer("last_used_at"),
    /** Kind of client of the last call: `python`, `browser` … */
    lastClient: text("last_client"),
  },
  (table) => [index("keys_team").on(table.teamId, table.createdAt)],
);

/** The secrets of a key: one, or two while a rotation overlaps. Only a hash is kept. */
export const keySecrets = sqliteTable(
  "key_secrets",
  {
    id: text().primaryKey(),
    keyId: text("key_id")
      .notNull()
      .references(() => keys.id),
    /** SHA-256 of the secret, hexadecimal. A 256-bit random secret needs no slow hash. */
    hash: text().notNull(),
    createdAt: integer("created_at").notNull(),
    /** Not accepted from this moment on; null: as long as the key. */
    validUntil: integer("valid_until"),
  },
  (table) => [index("key_secrets_key").on(table.keyId)],
);
