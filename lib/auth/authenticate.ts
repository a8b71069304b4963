import { type KeyRow, keyWithSecrets } from "@/db/queries/keys";
import type { Role } from "@/db/schema/organisation";
import { Refusal } from "../service/refusal";
import type { Service } from "../service/service";
import { parseKey, secretMatches } from "./key-text";
import { embedPrincipal } from "./embed-principal";
import { isEmbedToken } from "../embeds/token";
import { pageCallerId, type Principal } from "./principal";
import { isScope, type Scope } from "./scope";
import { signedIn } from "./session";
import { checkSiteToken } from "./site-token";
import { signedOutLimits } from "./signed-out-limits";

/** What a signed-out page may do, by its token. */
const SIGNED_OUT_SCOPES: readonly Scope[] = ["compute", "field", "materials:read"];

/** What the pages of somebody who is signed in may do, by their role. */
const SIGNED_IN_SCOPES: Readonly<Record<Role, readonly Scope[]>> = {
  admin: ["compute", "field", "materials:read", "materials:write", "records:read"],
  developer: ["compute", "field", "materials:read", "materials:write", "records:read"],
  viewer: ["compute", "field", "materials:read", "records:read"],
};

/** Requests a minute and computations a month of one person's pages. */
const PERSON_QUOTAS = { minuteQuota: 600, monthQuota: 100_000 };

/** A hash of nothing, compared with when the key is unknown: both answers take the same time. */
const NO_HASH = "0".repeat(64);

/**
 * Who calls, by `Authorization: Bearer` or `?key=`. Throws a Refusal for credentials that do not count;
 * no credentials at all make an anonymous caller.
 */
export async function authenticate(
  service: Service,
  call: { readonly headers: Headers; readonly url: URL; readonly address: string },
): Promise<Principal> {
  const { address } = call;
  const header = call.headers.get("authorization");
  const inUrl = call.url.searchParams.getAll("key");
  if (header !== null && inUrl.length > 0) {
    throw new Refusal(
      "ambiguous-credentials",
      "Send the key once: in the Authorization header or as ?key=, not both.",
    );
  }
  if (header === null && inUrl.length === 0) return { kind: "anonymous", address };
  if (inUrl.length > 1) throw new Refusal("ambiguous-credentials", "The parameter key may be given once.");

  const bearer = header === null ? inUrl[0] : /^Bearer +([^\s]+) *$/i.exec(header)?.[1];
  if (bearer === undefined) {
    throw new Refusal("invalid-key", 'The Authorization header must read "Bearer" and a key.');
  }
  if (header !== null && isEmbedToken(bearer)) return await embedPrincipal(service, bearer, address);
  if (header !== null && bearer.startsWith("ey")) return await pagePrincipal(service, bearer, address);
  return keyPrincipal(service, bearer, header === null, address);
}

/** A page of our own: on behalf of the person who is signed in to it, or of nobody. */
async function pagePrincipal(service: Service, token: string, address: string): Promise<Principal> {
  const verdict = await checkSiteToken(service.config.secret, token, service.now());
  if (verdict === "expired")
    throw new Refusal("invalid-token", "The page's token has expired: ask for the next one.");
  if (verdict === "wrong") throw new Refusal("invalid-token", "The token is not one of this service.");
  if (verdict.sessionId === null) {
    return { kind: "signed-out", scopes: SIGNED_OUT_SCOPES, address, ...signedOutLimits(service.db) };
  }
  const person = signedIn(service.db, verdict.sessionId, service.now());
  if (!person?.team) throw new Refusal("invalid-token", "The session of this page is over.");
  return {
    kind: "key",
    id: pageCallerId(person.personId, person.team.id),
    name: person.name,
    teamId: person.team.id,
    team: person.team.slug,
    scopes: SIGNED_IN_SCOPES[person.role],
    origins: [],
    ...PERSON_QUOTAS,
    address,
    person: { id: person.personId, name: person.name, role: person.role },
  };
}

function keyPrincipal(service: Service, text: string, inUrl: boolean, address: string): Principal {
  const given = parseKey(text);
  if (!given) throw unknownKey();
  const found = keyWithSecrets(service.db, given.id);
  if (!found) {
    secretMatches(given.secret, NO_HASH);
    throw unknownKey();
  }
  const now = service.now();
  const secret = found.secrets.find(({ hash }) => secretMatches(given.secret, hash));
  if (!secret) throw unknownKey();
  const { key } = found;
  refuseEnded(key, secret.validUntil, now);
  if (inUrl && !key.allowedInUrl) {
    throw new Refusal(
      "key-not-allowed-in-url",
      "This key may not travel in an address. Send it in the Authorization header, and rotate it: logs may have seen it.",
    );
  }
  return {
    kind: "key",
    id: key.id,
    name: key.name,
    teamId: key.teamId,
    team: key.team,
    scopes: key.scopes.filter(isScope),
    origins: key.origins,
    minuteQuota: key.minuteQuota,
    monthQuota: key.monthQuota,
    address,
  };
}

function unknownKey(): Refusal {
  return new Refusal("invalid-key", "The key is not known here.");
}

/** Told only to a caller that has the secret. */
function refuseEnded(key: KeyRow, validUntil: number | null, now: number): void {
  if (key.revokedAt !== null) {
    throw new Refusal("revoked-key", `The key was revoked on ${new Date(key.revokedAt).toISOString()}.`);
  }
  if (key.expiresAt !== null && key.expiresAt <= now) {
    throw new Refusal("expired-key", `The key expired on ${new Date(key.expiresAt).toISOString()}.`);
  }
  if (validUntil !== null && validUntil <= now) {
    throw new Refusal(
      "expired-key",
      `This secret of the key was replaced by rotation and ended on ${new Date(validUntil).toISOString()}.`,
    );
  }
}
