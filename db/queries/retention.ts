import { asc, inArray } from "drizzle-orm";
import type { Database } from "../client";
import { usageEvents } from "../schema/usage";

/** Removed in one go, so that other writers are not kept waiting. */
const AT_ONCE = 2_000;

/** Removes single requests from before `at` (Unix ms), the oldest first and not too many; their sums stay. Tells how many. */
export function forgetUsageEvents(db: Database, at: number): number {
  // Ids are in the order of time, so the oldest stand first and no index on the time is needed.
  const oldest = db
    .select({ id: usageEvents.id, at: usageEvents.at })
    .from(usageEvents)
    .orderBy(asc(usageEvents.id))
    .limit(AT_ONCE)
    .all()
    .filter((event) => event.at < at)
    .map(({ id }) => id);
  if (oldest.length === 0) return 0;
  return db.delete(usageEvents).where(inArray(usageEvents.id, oldest)).run().changes;
}
