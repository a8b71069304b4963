import { eq, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { settings } from "../schema/journal";

/** The value an administrator set, or undefined. */
export function readSetting(db: Database, name: string): unknown {
  return prepared(db, "settings.read", (db) =>
    db
      .select({ value: settings.value })
      .from(settings)
      .where(eq(settings.name, sql.placeholder("name")))
      .prepare(),
  ).get({ name })?.value;
}

export function writeSetting(db: Database, name: string, value: unknown, updatedAt: number): void {
  db.insert(settings)
    .values({ name, value, updatedAt })
    .onConflictDoUpdate({ target: settings.name, set: { value, updatedAt } })
    .run();
}
