import { asc, eq } from "drizzle-orm";
import type { Database } from "../client";
import { memberships, people, type Role, teams } from "../schema/organisation";

export interface Team {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly createdAt: number;
}

export function insertTeam(db: Database, team: Team): void {
  db.insert(teams).values(team).run();
}

export function listTeams(db: Database): Team[] {
  return db.select().from(teams).orderBy(asc(teams.slug)).all();
}

export function teamBySlug(db: Database, slug: string): Team | undefined {
  return db.select().from(teams).where(eq(teams.slug, slug)).get();
}

export function teamById(db: Database, id: string): Team | undefined {
  return db.select().from(teams).where(eq(teams.id, id)).get();
}

export interface NewPerson {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly role: Role;
  readonly createdAt: number;
}

export function insertPerson(db: Database, person: NewPerson): void {
  db.insert(people)
    .values({ ...person, email: person.email.toLowerCase() })
    .run();
}

export function insertMembership(db: Database, personId: string, teamId: string, createdAt: number): void {
  db.insert(memberships).values({ personId, teamId, createdAt }).run();
}

export function renameTeam(db: Database, id: string, name: string): void {
  db.update(teams).set({ name }).where(eq(teams.id, id)).run();
}
