import { z } from "zod";
import { transact } from "@/db/client";
import { voidLinks } from "@/db/queries/links";
import {
  otherAdministrators,
  personByEmail,
  personById,
  type PersonRow,
  replaceMemberships,
  updatePerson,
} from "@/db/queries/people";
import { endSessionsOf } from "@/db/queries/sessions";
import { insertPerson, listTeams } from "@/db/queries/teams";
import { type Role, ROLES } from "@/db/schema/organisation";
import { type Actor, appendActivity } from "../activity/append";
import { type MadeLink, makeLink } from "../auth/links";
import { invitationLetter } from "../mail/letters";
import { post } from "../mail/outbox";
import { newId } from "../service/identifier";
import { Refusal } from "../service/refusal";
import type { Service } from "../service/service";
import { personView, type PersonView } from "./person-view";

const name = z.string().trim().min(1).max(100);
const email = z
  .string()
  .trim()
  .max(254)
  .regex(/^[^\s@<>()",;:\\]+@[^\s@<>()",;:\\]+\.[^\s@<>()",;:\\.]+$/, "must be an e-mail address");
const teams = z.array(z.string().max(64)).max(200);

export const emailAddress = email;

/** Who is invited. `teams` are ids. */
export const invitation = z.strictObject({ email, name, role: z.enum(ROLES), teams });

export const personChange = z.strictObject({
  name: name.optional(),
  role: z.enum(ROLES).optional(),
  teams: teams.optional(),
});

type Invitation = z.infer<typeof invitation>;
type PersonChange = z.infer<typeof personChange>;

/** What of a person the activity keeps. */
const told = ({ name, email, role, teams }: PersonView) => ({
  name,
  email,
  role,
  teams: teams.map(({ slug }) => slug),
});

/** Only administrators see anything without a team. */
function requireSomeTeam(role: Role, teams: readonly unknown[]): void {
  if (role === "admin" || teams.length > 0) return;
  throw new Refusal("invalid-input", `A ${role} belongs to at least one team.`, {
    errors: [{ pointer: "#/teams", detail: "must name at least one team: only an admin may be without." }],
  });
}

function requireTeams(service: Service, ids: readonly string[]): void {
  const known = new Set(listTeams(service.db).map(({ id }) => id));
  const index = ids.findIndex((id) => !known.has(id));
  if (index < 0) return;
  throw new Refusal("invalid-input", "One of the teams does not exist.", {
    errors: [{ pointer: `#/teams/${index}`, detail: "is no team." }],
  });
}

/** The person of an id who was not removed. */
export function requirePerson(service: Service, id: string): PersonRow {
  const person = personById(service.db, id);
  if (!person || person.removedAt !== null) throw new Refusal("not-found", "There is no such person.");
  return person;
}

function requireAnotherAdministrator(service: Service, person: PersonRow): void {
  if (person.role !== "admin") return;
  const others = otherAdministrators(service.db, person.id);
  // Who was invited may never come, so one who can sign in leaves only behind another who can.
  if ((person.passwordHash === null ? others.all : others.entered) > 0) return;
  throw new Refusal(
    "last-administrator",
    others.all === 0
      ? "This is the only administrator: make somebody else one first."
      : "No other administrator has followed the invitation yet: wait until one has.",
  );
}

export interface Invited {
  readonly person: PersonView;
  readonly link: MadeLink;
}

/** Makes or makes again an account and a link with which to begin; sends it. */
export function invitePerson(service: Service, given: Invitation, actor: Actor): Invited {
  const { db } = service;
  const now = service.now();
  requireTeams(service, given.teams);
  requireSomeTeam(given.role, given.teams);
  return transact(db, () => {
    const before = personByEmail(db, given.email);
    if (before && before.removedAt === null) {
      throw new Refusal("invalid-input", "There is an account with this address.", {
        errors: [{ pointer: "#/email", detail: "has an account already." }],
      });
    }
    const id = before?.id ?? newId("per");
    // Somebody who was removed comes back as the same person, without the old password.
    if (before)
      updatePerson(db, id, { name: given.name, role: given.role, passwordHash: null, removedAt: null });
    else insertPerson(db, { id, email: given.email, name: given.name, role: given.role, createdAt: now });
    replaceMemberships(db, id, given.teams, now);
    const person = requirePerson(service, id);
    const view = personView(db, person, now);
    const act = { action: "person.invite", teamId: null, subject: { kind: "person", id }, after: told(view) };
    appendActivity(db, actor, act, now);
    return { person: view, link: sendInvitation(service, person, actor, now) };
  });
}

function sendInvitation(service: Service, person: PersonRow, actor: Actor, now: number): MadeLink {
  const link = makeLink(service.db, service.config.origin, { kind: "invitation", person, now });
  const by = actor.kind === "person" ? actor.name : "An administrator";
  const letter = invitationLetter(person, { by, url: link.url, until: link.expiresAt });
  // On the shell the link is printed in place of a mail.
  if (actor.kind !== "shell") post(service, { kind: "invitation", recipient: person.email, letter }, now);
  return link;
}

/** A new link for somebody who has not followed theirs; the one before ends. */
export function inviteAgain(service: Service, id: string, actor: Actor): Invited {
  const { db } = service;
  const now = service.now();
  return transact(db, () => {
    const person = requirePerson(service, id);
    if (person.passwordHash !== null) {
      throw new Refusal("invalid-input", "The person has an account already.", {
        errors: [{ pointer: "#", detail: "is for people who have not chosen a password yet." }],
      });
    }
    appendActivity(
      db,
      actor,
      { action: "person.invite-again", teamId: null, subject: { kind: "person", id } },
      now,
    );
    return { person: personView(db, person, now), link: sendInvitation(service, person, actor, now) };
  });
}

/** Changes name, role or teams. A role or team that is taken away counts for the next request. */
export function changePerson(service: Service, id: string, change: PersonChange, actor: Actor): PersonView {
  const { db } = service;
  const now = service.now();
  if (change.teams) requireTeams(service, change.teams);
  return transact(db, () => {
    const person = requirePerson(service, id);
    const before = personView(db, person, now);
    if (change.role !== undefined && change.role !== "admin") requireAnotherAdministrator(service, person);
    const { name = person.name, role = person.role, teams = before.teams } = change;
    if (change.role !== undefined || change.teams !== undefined) requireSomeTeam(role, teams);
    updatePerson(db, id, { name, role });
    if (change.teams) replaceMemberships(db, id, change.teams, now);
    const after = personView(db, requirePerson(service, id), now);
    if (JSON.stringify(told(before)) === JSON.stringify(told(after))) return after;
    appendActivity(
      db,
      actor,
      {
        action: "person.change",
        teamId: null,
        subject: { kind: "person", id },
        before: told(before),
        after: told(after),
      },
      now,
    );
    return after;
  });
}

/** Removes a person: sessions and links end at once; the teams' keys and records stay. */
export function removePerson(service: Service, id: string, actor: Actor): void {
  const { db } = service;
  const now = service.now();
  transact(db, () => {
    const person = requirePerson(service, id);
    requireAnotherAdministrator(service, person);
    const before = personView(db, person, now);
    updatePerson(db, id, { removedAt: now, passwordHash: null });
    replaceMemberships(db, id, [], now);
    endSessionsOf(db, id, now);
    voidLinks(db, id, now);
    appendActivity(
      db,
      actor,
      { action: "person.remove", teamId: null, subject: { kind: "person", id }, before: told(before) },
      now,
    );
  });
}
