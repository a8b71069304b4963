import { createHash } from "node:crypto";
import { transact } from "@/db/client";
import { type PersonRow, personByEmail } from "@/db/queries/people";
import { knownDevice, type SessionRow } from "@/db/queries/sessions";
import { appendActivity } from "../activity/append";
import { agentName } from "../http/agent-name";
import { limitedAddress } from "../http/client-address";
import type { Bucket } from "../limits/limiter";
import { signInBucket } from "../limits/quota";
import { newDeviceLetter } from "../mail/letters";
import { post, sendSoon } from "../mail/outbox";
import { Refusal } from "../service/refusal";
import type { Service } from "../service/service";
import { passwordMatches } from "./password";
import { openSession } from "./session";
import { deviceOf, sessionCookie } from "./session-cookie";

/** Attempts in a quarter of an hour: for one account, and from one address (a company's people may share one). */
const ACCOUNT_ATTEMPTS = 10;
const ADDRESS_ATTEMPTS = 60;
const ACCOUNT_RESETS = 3;

/** The call by which somebody signs in, as far as it matters here. */
export interface SignInCall {
  readonly headers: Headers;
  readonly address: string;
  readonly requestId: string;
}

/** What an answer must set in the browser. */
export interface OpenedSession {
  readonly session: SessionRow;
  readonly setCookies: readonly string[];
}

export function accountBucket(email: string): Bucket {
  const digest = createHash("sha256").update(email.toLowerCase()).digest("base64url");
  return signInBucket(`account:${digest}`, ACCOUNT_ATTEMPTS);
}

export function signInAddressBucket(address: string): Bucket {
  return signInBucket(`address:${limitedAddress(address)}`, ADDRESS_ATTEMPTS);
}

/** Requests for a new password: fewer for one account, since each is a mail. */
export function resetBuckets(email: string, address: string): Bucket[] {
  const { subject } = accountBucket(email);
  return [
    signInBucket(`reset:address:${limitedAddress(address)}`, ADDRESS_ATTEMPTS),
    signInBucket(`reset:${subject}`, ACCOUNT_RESETS),
  ];
}

/** Spends one attempt of an account and of an address. Refuses with the time to wait. */
export async function spendAttempt(service: Service, buckets: readonly Bucket[]): Promise<void> {
  for (const bucket of buckets) {
    const { allowed, resetSeconds } = await service.limiter.spend(bucket);
    if (allowed) continue;
    const minutes = Math.ceil(resetSeconds / 60);
    throw new Refusal(
      "too-many-requests",
      `There were too many attempts. Try again in ${minutes} ${minutes === 1 ? "minute" : "minutes"}.`,
      { headers: { "Retry-After": String(resetSeconds) } },
    );
  }
}

/**
 * Signs a person in by e-mail address and password. Limited by account and by address; a wrong password and an
 * unknown address are refused alike, after the same time.
 */
export async function signIn(
  service: Service,
  { email, password }: { readonly email: string; readonly password: string },
  call: SignInCall,
): Promise<OpenedSession> {
  const account = accountBucket(email);
  const from = signInAddressBucket(call.address);
  await spendAttempt(service, [from, account]);
  const person = personByEmail(service.db, email);
  const open = person && person.removedAt === null ? person : undefined;
  if (!(await passwordMatches(password, open?.passwordHash)) || !open) {
    throw new Refusal("sign-in-failed", "The e-mail address and the password do not belong together.");
  }
  // Who knows the password is not who guesses it.
  await service.limiter.giveBack(account, 1);
  await service.limiter.giveBack(from, 1);
  return openPersonSession(service, open, call);
}

/** Opens a session for a person whose identity is proved, by a password or by a link. */
export async function openPersonSession(
  service: Service,
  person: PersonRow,
  { headers, address, requestId }: SignInCall,
): Promise<OpenedSession> {
  const { db, config } = service;
  const now = service.now();
  const device = deviceOf(config, headers.get("cookie"));
  const client = agentName(headers.get("user-agent"));
  const session = transact(db, () => {
    const known = knownDevice(db, person.id, device.hash);
    const opened = openSession(db, { personId: person.id, device: device.hash, client, address, now });
    appendActivity(
      db,
      { kind: "person", id: person.id, name: person.name, address, requestId },
      {
        action: "session.start",
        teamId: null,
        subject: { kind: "person", id: person.id },
        after: { client, newDevice: !known.same },
      },
      now,
    );
    if (known.any && !known.same) {
      const url = `${config.origin}/console/account`;
      const letter = newDeviceLetter(person, { client, address, at: now, url });
      post(service, { kind: "new-device", recipient: person.email, letter }, now);
    }
    return opened;
  });
  sendSoon(service);
  return { session, setCookies: [await sessionCookie(config, session, now), device.setCookie] };
}
