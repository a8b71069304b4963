import { transact } from "@/db/client";
import { voidLinks } from "@/db/queries/links";
import { personByEmail, personById, type PersonRow, updatePerson } from "@/db/queries/people";
import { endSessionsOf } from "@/db/queries/sessions";
import { type Actor, appendActivity } from "../activity/append";
import { emailChangeLetter, emailChangeNotice, passwordChangedNotice, resetLetter } from "../mail/letters";
import { post, sendSoon } from "../mail/outbox";
import { Refusal } from "../service/refusal";
import type { Service } from "../service/service";
import { followLink, makeLink, openLink } from "./links";
import { hashPassword, passwordComplaint, passwordMatches } from "./password";
import {
  accountBucket,
  openPersonSession,
  type OpenedSession,
  type SignInCall,
  spendAttempt,
} from "./sign-in";

/** Kinds of links that let a person choose a password. */
export const PASSWORD_LINKS = ["invitation", "reset"] as const;

function requirePassword(password: string, email: string, pointer = "#/password"): void {
  const complaint = passwordComplaint(password, email);
  if (complaint === undefined) return;
  throw new Refusal("invalid-input", `The password ${complaint}`, {
    errors: [{ pointer, detail: complaint }],
  });
}

const personAs = (person: PersonRow, call: Pick<SignInCall, "address" | "requestId">): Actor => ({
  kind: "person",
  id: person.id,
  name: person.name,
  address: call.address,
  requestId: call.requestId,
});

/**
 * Has a link for a new password sent, if the address belongs to somebody; the caller learns nothing either way, and the
 * work is done after the answer, so that its time tells nothing as well.
 */
export function requestReset(
  service: Service,
  email: string,
  call: Pick<SignInCall, "address" | "requestId">,
): void {
  const { db, config, log } = service;
  setImmediate(() => {
    try {
      const person = personByEmail(db, email);
      if (!person || person.removedAt !== null) return;
      const now = service.now();
      transact(db, () => {
        const { url, expiresAt } = makeLink(db, config.origin, { kind: "reset", person, now });
        const letter = resetLetter(person, { url, until: expiresAt });
        post(service, { kind: "reset", recipient: person.email, letter }, now);
        const act = {
          action: "password.reset-requested",
          teamId: null,
          subject: { kind: "person", id: person.id },
        };
        // Whoever asks is not proved to be that person.
        appendActivity(
          db,
          { ...personAs(person, call), kind: "service", id: "sign-in", name: "sign-in" },
          act,
          now,
        );
      });
      sendSoon(service);
    } catch (error) {
      log.error({ event: "reset", error: String(error) });
    }
  });
}

/** Sets the password of an invited person, or a new one, by a link; ends all sessions before and opens one. */
export async function choosePassword(
  service: Service,
  { secret, password, name }: { readonly secret: string; readonly password: string; readonly name?: string },
  call: SignInCall,
): Promise<OpenedSession> {
  const { db } = service;
  const now = service.now();
  const open = openLink(db, secret, PASSWORD_LINKS, now);
  if (!open)
    throw new Refusal("link-over", "The link was used before, has expired, or was replaced by a newer one.");
  requirePassword(password, open.person.email);
  const passwordHash = await hashPassword(password);
  const person = transact(db, () => {
    const { link, person } = followLink(db, secret, PASSWORD_LINKS, now);
    const invited = link.kind === "invitation";
    const calledNow = invited && name ? name : person.name;
    updatePerson(db, person.id, { passwordHash, name: calledNow });
    voidLinks(db, person.id, now);
    endSessionsOf(db, person.id, now);
    appendActivity(
      db,
      personAs({ ...person, name: calledNow }, call),
      {
        action: invited ? "invitation.accept" : "password.reset",
        teamId: null,
        subject: { kind: "person", id: person.id },
      },
      now,
    );
    if (!invited) {
      post(
        service,
        { kind: "password", recipient: person.email, letter: passwordChangedNotice(person, { at: now }) },
        now,
      );
    }
    return personById(db, person.id) ?? person;
  });
  sendSoon(service);
  return openPersonSession(service, person, call);
}

/** Checks the password of somebody who is signed in, before what must not be done by a borrowed browser. */
async function requireOwnPassword(service: Service, person: PersonRow, password: string): Promise<void> {
  const bucket = accountBucket(person.email);
  await spendAttempt(service, [bucket]);
  if (!(await passwordMatches(password, person.passwordHash))) {
    throw new Refusal("invalid-input", "The current password is another one.", {
      errors: [{ pointer: "#/currentPassword", detail: "is not your password." }],
    });
  }
  await service.limiter.giveBack(bucket, 1);
}

interface OwnChange {
  readonly personId: string;
  readonly sessionId: string;
  readonly actor: Actor;
}

function self(service: Service, personId: string): PersonRow {
  const person = personById(service.db, personId);
  if (!person) throw new Refusal("sign-in-required", "Sign in first.");
  return person;
}

/** Changes one's own password and signs out all other devices. */
export async function changePassword(
  service: Service,
  { personId, sessionId, actor }: OwnChange,
  { currentPassword, password }: { readonly currentPassword: string; readonly password: string },
): Promise<void> {
  const { db } = service;
  const person = self(service, personId);
  requirePassword(password, person.email);
  await requireOwnPassword(service, person, currentPassword);
  const passwordHash = await hashPassword(password);
  const now = service.now();
  transact(db, () => {
    updatePerson(db, personId, { passwordHash });
    voidLinks(db, personId, now, "reset");
    const ended = endSessionsOf(db, personId, now, sessionId);
    appendActivity(
      db,
      actor,
      {
        action: "password.change",
        teamId: null,
        subject: { kind: "person", id: personId },
        after: { otherSessionsEnded: ended },
      },
      now,
    );
    post(
      service,
      { kind: "password", recipient: person.email, letter: passwordChangedNotice(person, { at: now }) },
      now,
    );
  });
  sendSoon(service);
}

/**
 * Begins the change of one's own e-mail address: a link goes to the new one, a notice to the old one. An address that
 * somebody else has is not told: its owner would learn of an account by asking.
 */
export async function requestEmailChange(
  service: Service,
  { personId, actor }: OwnChange,
  { currentPassword, email }: { readonly currentPassword: string; readonly email: string },
): Promise<void> {
  const { db, config } = service;
  const person = self(service, personId);
  if (email.toLowerCase() === person.email) {
    throw new Refusal("invalid-input", "That is your address already.", {
      errors: [{ pointer: "#/email", detail: "is your address already." }],
    });
  }
  await requireOwnPassword(service, person, currentPassword);
  const now = service.now();
  transact(db, () => {
    const { url, expiresAt } = makeLink(db, config.origin, { kind: "email", person, email, now });
    if (!personByEmail(db, email)) {
      post(
        service,
        { kind: "email", recipient: email, letter: emailChangeLetter(person, { url, until: expiresAt }) },
        now,
      );
    }
    post(
      service,
      { kind: "email", recipient: person.email, letter: emailChangeNotice(person, { email }) },
      now,
    );
    appendActivity(
      db,
      actor,
      {
        action: "email.change-requested",
        teamId: null,
        subject: { kind: "person", id: personId },
        before: { email: person.email },
        after: { email: email.toLowerCase() },
      },
      now,
    );
  });
  sendSoon(service);
}

/** Makes the confirmed address the one to sign in with. */
export function confirmEmail(
  service: Service,
  secret: string,
  call: Pick<SignInCall, "address" | "requestId">,
): string {
  const { db } = service;
  const now = service.now();
  return transact(db, () => {
    const { link, person } = followLink(db, secret, ["email"], now);
    const taken = personByEmail(db, link.email);
    if (taken && taken.id !== person.id) {
      throw new Refusal("link-over", "The address belongs to another account by now.");
    }
    updatePerson(db, person.id, { email: link.email });
    appendActivity(
      db,
      personAs(person, call),
      {
        action: "email.change",
        teamId: null,
        subject: { kind: "person", id: person.id },
        before: { email: person.email },
        after: { email: link.email },
      },
      now,
    );
    return link.email;
  });
}
