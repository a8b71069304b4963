import { and, asc, eq, gt, inArray, isNull, lte, or, sql } from "drizzle-orm";
import type { Database } from "../client";
import { rateLimits } from "../schema/journal";
import { keys } from "../schema/keys";
import { memberships, people, teams } from "../schema/organisation";

/** A key as a notice names it. */
export interface NoticedKey {
  readonly id: string;
  readonly name: string;
  readonly teamId: string;
  readonly team: string;
  readonly createdAt: number;
}

const noticed = {
  id: keys.id,
  name: keys.name,
  teamId: keys.teamId,
  team: teams.name,
  createdAt: keys.createdAt,
};

/** Keys that end or ended between two moments (Unix ms) and were not revoked. */
export function keysEnding(
  db: Database,
  after: number,
  until: number,
): (NoticedKey & { readonly expiresAt: number })[] {
  return db
    .select({ ...noticed, expiresAt: sql<number>`${keys.expiresAt}` })
    .from(keys)
    .innerJoin(teams, eq(teams.id, keys.teamId))
    .where(and(isNull(keys.revokedAt), gt(keys.expiresAt, after), lte(keys.expiresAt, until)))
    .all();
}

/** Keys in use that have used at least `share` of the month's quota (`2026-03`). */
export function keysNearQuota(
  db: Database,
  { month, share, now }: { readonly month: string; readonly share: number; readonly now: number },
): (NoticedKey & { readonly used: number; readonly quota: number })[] {
  return db
    .select({ ...noticed, used: rateLimits.points, quota: keys.monthQuota })
    .from(keys)
    .innerJoin(teams, eq(teams.id, keys.teamId))
    .innerJoin(rateLimits, eq(rateLimits.key, sql`'month:key:' || ${keys.id} || ':' || ${month}`))
    .where(
      and(
        isNull(keys.revokedAt),
        or(isNull(keys.expiresAt), gt(keys.expiresAt, now)),
        gt(keys.monthQuota, 0),
        sql`${rateLimits.points} >= ${share} * ${keys.monthQuota}`,
      ),
    )
    .all();
}

/** Who looks after a team's keys: its administrators and developers, or all administrators where it has none. */
export function keepersOfTeam(db: Database, teamId: string): { name: string; email: string }[] {
  const person = { name: people.name, email: people.email };
  const active = and(isNull(people.removedAt), sql`${people.passwordHash} is not null`);
  const own = db
    .select(person)
    .from(people)
    .innerJoin(memberships, and(eq(memberships.personId, people.id), eq(memberships.teamId, teamId)))
    .where(and(active, inArray(people.role, ["admin", "developer"])))
    .orderBy(asc(people.email))
    .all();
  if (own.length > 0) return own;
  return db
    .select(person)
    .from(people)
    .where(and(active, eq(people.role, "admin")))
    .orderBy(asc(people.email))
    .all();
}
