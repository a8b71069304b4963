import { and, asc, count, eq, isNull, ne, sql } from "drizzle-orm";
import { type Database, prepared } from "../client";
import { memberships, people, type Role, teams } from "../schema/organisation";
import type { Team } from "./teams";

export type PersonRow = typeof people.$inferSelect;

export function personById(db: Database, id: string): PersonRow | undefined {
  return prepared(db, "people.byId", (db) =>
    db
      .select()
      .from(people)
      .where(eq(people.id, sql.placeholder("id")))
      .prepare(),
  ).get({ id });
}

/** By e-mail address, whatever its case; removed people too. */
export function personByEmail(db: Database, email: string): PersonRow | undefined {
  return db.select().from(people).where(eq(people.email, email.toLowerCase())).get();
}

/** Everybody who was not removed, by name. */
export function listPeople(db: Database): PersonRow[] {
  return db
    .select()
    .from(people)
    .where(isNull(people.removedAt))
    .orderBy(asc(sql`lower(${people.name})`), asc(people.email))
    .all();
}

export function updatePerson(
  db: Database,
  id: string,
  change: Partial<Pick<PersonRow, "email" | "name" | "role" | "passwordHash" | "removedAt">>,
): void {
  const { email } = change;
  db.update(people)
    .set(email === undefined ? change : { ...change, email: email.toLowerCase() })
    .where(eq(people.id, id))
    .run();
}

/** People of that role who are not removed. */
export function countRole(db: Database, role: Role): number {
  return (
    db
      .select({ people: count() })
      .from(people)
      .where(and(eq(people.role, role), isNull(people.removedAt)))
      .get()?.people ?? 0
  );
}

/** Administrators besides one person: how many there are, and how many of them have chosen a password. */
export function otherAdministrators(db: Database, personId: string): { all: number; entered: number } {
  const counted = db
    .select({ all: count(), entered: count(people.passwordHash) })
    .from(people)
    .where(and(eq(people.role, "admin"), isNull(people.removedAt), ne(people.id, personId)))
    .get();
  return counted ?? { all: 0, entered: 0 };
}

/** The teams of a person, by short name. */
export function teamsOfPerson(db: Database, personId: string): Team[] {
  return prepared(db, "people.teams", (db) =>
    db
      .select({ id: teams.id, slug: teams.slug, name: teams.name, createdAt: teams.createdAt })
      .from(memberships)
      .innerJoin(teams, eq(teams.id, memberships.teamId))
      .where(eq(memberships.personId, sql.placeholder("personId")))
      .orderBy(asc(teams.slug))
      .prepare(),
  ).all({ personId });
}

/** Every membership of people who are not removed. */
export function listMemberships(db: Database): { personId: string; teamId: string }[] {
  return db
    .select({ personId: memberships.personId, teamId: memberships.teamId })
    .from(memberships)
    .innerJoin(people, and(eq(people.id, memberships.personId), isNull(people.removedAt)))
    .all();
}

/** Makes a person a member of exactly these teams. */
export function replaceMemberships(
  db: Database,
  personId: string,
  teamIds: readonly string[],
  createdAt: number,
): void {
  db.delete(memberships).where(eq(memberships.personId, personId)).run();
  for (const teamId of new Set(teamIds)) {
    db.insert(memberships).values({ personId, teamId, createdAt }).run();
  }
}
