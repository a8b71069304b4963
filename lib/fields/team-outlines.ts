import type { Database } from "@/db/client";
import { outlineOfOwner, outlinesOfOwner } from "@/db/queries/fields";
import type { CleanedOutline } from "@/lib/engine";
import { contentOf } from "./field-view";
import { teamOwner } from "./owner";

/** So many can be chosen from, the newest. */
const MOST_LISTED = 100;

/** A stored outline of a team; one of another team is none. */
export function teamOutline(db: Database, teamId: string, id: string): CleanedOutline | undefined {
  const row = outlineOfOwner(db, teamOwner(teamId), id);
  return row && contentOf(row);
}

export interface TeamOutline extends CleanedOutline {
  readonly id: string;
  readonly createdAt: string;
}

/** The outlines of a team, newest first. */
export function teamOutlines(db: Database, teamId: string): TeamOutline[] {
  return outlinesOfOwner(db, teamOwner(teamId), MOST_LISTED).map((row) => ({
    ...contentOf(row),
    id: row.id,
    createdAt: new Date(row.createdAt).toISOString(),
  }));
}
