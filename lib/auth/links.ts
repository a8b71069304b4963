import type { Database } from "@/db/client";
import { insertLink, linkByHash, type LinkRow, markLinkUsed, voidLinks } from "@/db/queries/links";
import { personById, type PersonRow } from "@/db/queries/people";
import type { LinkKind } from "@/db/schema/sign-in";
import { newId } from "../service/identifier";
import { Refusal } from "../service/refusal";
import { hashSecret, newSecret } from "./key-text";

/** How long a link may be followed, ms. */
export const LINK_MS: Readonly<Record<LinkKind, number>> = {
  invitation: 7 * 86_400_000,
  reset: 3_600_000,
  email: 86_400_000,
};

/** Where each link leads; the secret is the last part of the address. */
const PATHS: Readonly<Record<LinkKind, string>> = {
  invitation: "/invitation",
  reset: "/new-password",
  email: "/confirm-email",
};

export interface MadeLink {
  readonly url: string;
  /** Unix ms. */
  readonly expiresAt: number;
}

/** A new link of a person; earlier ones of that kind end. Only the address carries the secret. */
export function makeLink(
  db: Database,
  origin: string,
  { kind, person, email, now }: { kind: LinkKind; person: PersonRow; email?: string; now: number },
): MadeLink {
  const secret = newSecret();
  const expiresAt = now + LINK_MS[kind];
  voidLinks(db, person.id, now, kind);
  insertLink(db, {
    id: newId("lnk"),
    kind,
    personId: person.id,
    hash: hashSecret(secret),
    email: (email ?? person.email).toLowerCase(),
    createdAt: now,
    expiresAt,
    usedAt: null,
  });
  return { url: `${origin}${PATHS[kind]}/${secret}`, expiresAt };
}

export interface OpenLink {
  readonly link: LinkRow;
  readonly person: PersonRow;
}

/** The link of a secret, if it may still be followed; following it is `followLink`. */
export function openLink(
  db: Database,
  secret: string,
  kinds: readonly LinkKind[],
  now: number,
): OpenLink | undefined {
  const link = linkByHash(db, hashSecret(secret));
  if (!link || !kinds.includes(link.kind) || link.usedAt !== null || link.expiresAt <= now) return undefined;
  const person = personById(db, link.personId);
  if (!person || person.removedAt !== null) return undefined;
  // A link proves the address it was sent to; once that is another one, it proves nothing.
  if (link.kind !== "email" && link.email !== person.email) return undefined;
  return { link, person };
}

/** Follows a link, once. Refuses one that is over. Call it in the transaction of what it is for. */
export function followLink(db: Database, secret: string, kinds: readonly LinkKind[], now: number): OpenLink {
  const open = openLink(db, secret, kinds, now);
  if (!open || !markLinkUsed(db, open.link.id, now)) {
    throw new Refusal("link-over", "The link was used before, has expired, or was replaced by a newer one.");
  }
  return open;
}
