import type { Database } from "@/db/client";
import { personById, teamsOfPerson } from "@/db/queries/people";
import {
  endSessionRow,
  insertSession,
  type SessionRow,
  sessionById,
  touchSession,
} from "@/db/queries/sessions";
import { listTeams, type Team } from "@/db/queries/teams";
import type { Role } from "@/db/schema/organisation";
import { type Actor, appendActivity } from "../activity/append";
import { newId } from "../service/identifier";
import type { Service } from "../service/service";
import type { Member } from "./permissions";
import { sessionInCookie } from "./session-cookie";

/** A session ends this long after its sign-in, ms. */
export const SESSION_MS = 30 * 86_400_000;
/** It ends earlier where it was not used for this long, ms. */
export const IDLE_MS = 7 * 86_400_000;
/** The last use is noted this often, ms. */
const TOUCH_MS = 5 * 60_000;

/** A person who is signed in, as everything behind the sign-in knows them. */
export interface SignedIn extends Member {
  readonly sessionId: string;
  readonly personId: string;
  readonly email: string;
  readonly name: string;
  readonly role: Role;
  /** Teams the person belongs to, by short name. */
  readonly teams: readonly Team[];
  readonly teamIds: readonly string[];
  /** The team on whose behalf pages compute and store; none only where the person has no team at all. */
  readonly team: Team | null;
}

/** Who is signed in by a call's cookies; undefined for nobody, an ended session or a removed person. */
export async function signedInBy(
  service: Pick<Service, "config" | "db" | "now">,
  cookieHeader: string | null,
  address?: string,
): Promise<SignedIn | undefined> {
  const named = await sessionInCookie(service.config, cookieHeader, service.now());
  if (!named) return undefined;
  return signedIn(service.db, named.id, service.now(), address);
}

/** The person of a session that is open at `now`. Notes its use where the address is told. */
export function signedIn(
  db: Database,
  sessionId: string,
  now: number,
  address?: string,
): SignedIn | undefined {
  const session = sessionById(db, sessionId);
  if (!session || !isOpen(session, now)) return undefined;
  const person = personById(db, session.personId);
  if (!person || person.removedAt !== null) return undefined;
  if (address !== undefined && now - session.lastSeenAt > TOUCH_MS)
    touchSession(db, session.id, now, address);
  const teams = teamsOfPerson(db, person.id);
  return {
    sessionId: session.id,
    personId: person.id,
    email: person.email,
    name: person.name,
    role: person.role,
    teams,
    teamIds: teams.map(({ id }) => id),
    team: workingTeam(db, session.teamId, teams, person.role),
  };
}

function isOpen(session: SessionRow, now: number): boolean {
  return session.endedAt === null && session.expiresAt > now && now - session.lastSeenAt < IDLE_MS;
}

function workingTeam(db: Database, chosen: string | null, own: readonly Team[], role: Role): Team | null {
  const open = role === "admin" ? listTeams(db) : own;
  return open.find(({ id }) => id === chosen) ?? own[0] ?? open[0] ?? null;
}

/** Opens a session for a person. */
export function openSession(
  db: Database,
  {
    personId,
    device,
    client,
    address,
    now,
  }: {
    readonly personId: string;
    readonly device: string;
    readonly client: string;
    readonly address: string;
    readonly now: number;
  },
): SessionRow {
  const session: SessionRow = {
    id: newId("ses"),
    personId,
    teamId: null,
    device,
    client,
    address,
    createdAt: now,
    lastSeenAt: now,
    expiresAt: now + SESSION_MS,
    endedAt: null,
  };
  insertSession(db, session);
  return session;
}

/** Ends a session for the next request and records who did it. Ending twice changes nothing. */
export function endSession(db: Database, session: SessionRow, actor: Actor, now: number): void {
  if (!endSessionRow(db, session.id, now)) return;
  appendActivity(
    db,
    actor,
    {
      action: "session.end",
      teamId: null,
      subject: { kind: "person", id: session.personId },
      before: { client: session.client, signedInAt: new Date(session.createdAt).toISOString() },
    },
    now,
  );
}

/** A signed-in person as the activity names them. */
export function personActor(person: SignedIn, address: string, requestId: string): Actor {
  return { kind: "person", id: person.personId, name: person.name, address, requestId };
}
