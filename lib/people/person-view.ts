import type { Database } from "@/db/client";
import { listMemberships, listPeople, type PersonRow, teamsOfPerson } from "@/db/queries/people";
import { openSessions } from "@/db/queries/sessions";
import { listTeams } from "@/db/queries/teams";
import type { Role } from "@/db/schema/organisation";
import { IDLE_MS } from "../auth/session";

/** A person as the console and the shell show them. */
export interface PersonView {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly teams: readonly { readonly id: string; readonly slug: string; readonly name: string }[];
  /** `invited` until a password was chosen. */
  readonly state: "active" | "invited";
  readonly createdAt: string;
  /** Sessions that are open now. */
  readonly sessions: number;
  readonly lastSeenAt: string | null;
}

function view(db: Database, person: PersonRow, teams: PersonView["teams"], now: number): PersonView {
  const sessions = openSessions(db, person.id, now, now - IDLE_MS);
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    role: person.role,
    teams,
    state: person.passwordHash === null ? "invited" : "active",
    createdAt: new Date(person.createdAt).toISOString(),
    sessions: sessions.length,
    lastSeenAt: sessions.length > 0 ? new Date(sessions[0].lastSeenAt).toISOString() : null,
  };
}

export function personView(db: Database, person: PersonRow, now: number): PersonView {
  const teams = teamsOfPerson(db, person.id).map(({ id, slug, name }) => ({ id, slug, name }));
  return view(db, person, teams, now);
}

/** Everybody, or those who belong to one of these teams. */
export function peopleViews(db: Database, now: number, teamIds?: readonly string[]): PersonView[] {
  const teams = new Map(listTeams(db).map(({ id, slug, name }) => [id, { id, slug, name }]));
  const of = new Map<string, string[]>();
  for (const { personId, teamId } of listMemberships(db))
    of.set(personId, [...(of.get(personId) ?? []), teamId]);
  return listPeople(db).flatMap((person) => {
    const own = of.get(person.id) ?? [];
    if (teamIds && !own.some((id) => teamIds.includes(id))) return [];
    const shown = own
      .flatMap((id) => teams.get(id) ?? [])
      .filter(({ id }) => !teamIds || teamIds.includes(id))
      .sort((a, b) => a.slug.localeCompare(b.slug, "en"));
    return [view(db, person, shown, now)];
  });
}
