import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";

/** A stored outline: what was found on a drawing, cleaned. */
export const outlines = sqliteTable(
  "outlines",
  {
    id: text().primaryKey(),
    /** Who may use it: `team:<id>` or `address:<hash>` for signed-out pages. A row never changes and stays. */
    owner: text().notNull(),
    createdAt: integer("created_at").notNull(),
    /** JSON text: name, outline, terminals, repairs. */
    content: text().notNull(),
  },
  (table) => [index("outlines_owner").on(table.owner, table.createdAt)],
);

/** A field solution, from the request to its result. Its map lies in a file of the data folder. */
export const fields = sqliteTable(
  "fields",
  {
    id: text().primaryKey(),
    /** As of an outline, or `embed:<id>` for what a widget's frame asked for. */
    owner: text().notNull(),
    status: text({ enum: ["queued", "running", "done", "limited", "failed", "cancelled"] }).notNull(),
    createdAt: integer("created_at").notNull(),
    finishedAt: integer("finished_at"),
    /** JSON text of the body, a stored outline put in its place. */
    request: text().notNull(),
    /** Materials as they were when it was asked for, so that a restart computes the same. */
    materials: text({ mode: "json" }).$type<unknown[]>().notNull(),
    /** A guess at the work, for the order of the queue. */
    size: integer().notNull(),
    progress: text({ mode: "json" }).$type<{
      lower: number;
      upper: number;
      unknowns: number;
      refinements: number;
    }>(),
    /** JSON text, null until it is done or limited. */
    result: text(),
    /** Why it failed, for the caller. */
    failure: text(),
    /** What to settle at the end: whose month was charged how much. */
    charge: text({ mode: "json" })
      .$type<{
        keyId: string;
        teamId: string;
        /** Origin of the page around, where `keyId` is a widget. */
        host?: string;
        subject: string;
        quota: number;
        reserved: number;
        reservedAt: number;
      }>()
      .notNull(),
    /** Record to store at the end, if one was asked for. */
    record: text({ mode: "json" }).$type<{
      label: string;
      teamId: string;
      actor: {
        kind: "key" | "person" | "shell" | "service";
        id: string;
        name: string;
        address: string | null;
        requestId: string | null;
      };
    }>(),
    recordId: text("record_id"),
    /** Record that it repeats, and that record's result, for a replay. */
    replayOf: text("replay_of", { mode: "json" }).$type<{ recordId: string; before: unknown }>(),
    /** Process that works on it and until when its claim holds, Unix ms. */
    claimedBy: text("claimed_by"),
    claimedUntil: integer("claimed_until").notNull(),
  },
  (table) => [
    index("fields_owner").on(table.owner, table.createdAt),
    index("fields_status").on(table.status, table.claimedUntil),
  ],
);
