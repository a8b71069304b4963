import { lt, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { rateLimits } from "../schema/journal";

/** Removes counters whose window ended before `at` (Unix ms). The counting itself is rate-limiter-flexible's. */
export function forgetExpired(db: Database, at: number): void {
  prepared(db, "rateLimits.forget", (db) =>
    db
      .delete(rateLimits)
      .where(lt(rateLimits.expire, sql.placeholder("at")))
      .prepare(),
  ).run({ at });
}
