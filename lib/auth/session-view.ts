import type { Database } from "@/db/client";
import { openSessions, type SessionRow } from "@/db/queries/sessions";
import { Refusal } from "../service/refusal";
import { IDLE_MS } from "./session";

/** A session as its owner and administrators see it. */
export interface SessionView {
  readonly id: string;
  /** "Firefox on Linux" */
  readonly client: string;
  readonly address: string;
  readonly createdAt: string;
  readonly lastSeenAt: string;
  /** The one that asks. */
  readonly current: boolean;
}

/** The sessions of a person that are open. */
export function ownSessions(db: Database, personId: string, now: number): SessionRow[] {
  return openSessions(db, personId, now, now - IDLE_MS);
}

export function sessionViews(db: Database, personId: string, currentId: string, now: number): SessionView[] {
  return ownSessions(db, personId, now).map((session) => ({
    id: session.id,
    client: session.client,
    address: session.address,
    createdAt: new Date(session.createdAt).toISOString(),
    lastSeenAt: new Date(session.lastSeenAt).toISOString(),
    current: session.id === currentId,
  }));
}

/** An open session of that person; any other id is unknown. */
export function requireSessionOf(db: Database, personId: string, id: string, now: number): SessionRow {
  const session = ownSessions(db, personId, now).find((each) => each.id === id);
  if (!session) throw new Refusal("not-found", "There is no such session.");
  return session;
}
