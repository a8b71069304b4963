import { createHash } from "node:crypto";
import type { FieldRow } from "@/db/queries/fields";
import {
  type EmbedPrincipal,
  type KeyPrincipal,
  type Principal,
  SIGNED_OUT_ID,
  type SignedOutPrincipal,
} from "../auth/principal";
import { limitedAddress } from "../http/client-address";
import { Refusal } from "../service/refusal";

/** A caller that may own field solutions; all but a widget own outlines too. */
type Caller = KeyPrincipal | EmbedPrincipal | SignedOutPrincipal;

export function requireCaller(principal: Principal): Caller {
  if (principal.kind !== "anonymous") return principal;
  throw new Refusal("missing-credentials", "This call needs a key: send Authorization: Bearer rho_….");
}

/**
 * Whom outlines and field solutions belong to: a team, a widget, or the address of a page that nobody is signed in to.
 * A widget's belong to it alone: neither its team nor another widget of the team sees them.
 */
export function requireOwner(principal: Principal, secret: string): string {
  const caller = requireCaller(principal);
  if (caller.kind === "key") return teamOwner(caller.teamId);
  if (caller.kind === "embed") return `embed:${caller.id}`;
  const digest = createHash("sha256")
    .update(`${secret}:${limitedAddress(caller.address)}`)
    .digest("base64url");
  return `address:${digest}`;
}

export function teamOwner(teamId: string): string {
  return `team:${teamId}`;
}

/** Whose outlines a caller's requests may name: a widget's are its team's. */
export function outlineOwner(principal: Principal, secret: string): string {
  return principal.kind === "embed" ? teamOwner(principal.teamId) : requireOwner(principal, secret);
}

/** Whose month a solution is charged to, as it is kept until its end. */
export function chargeOf(
  caller: Caller,
  subject: string,
  reserved: number,
  reservedAt: number,
): FieldRow["charge"] {
  const known = caller.kind !== "signed-out";
  return {
    keyId: known ? caller.id : SIGNED_OUT_ID,
    teamId: known ? caller.teamId : "",
    ...(caller.kind === "embed" ? { host: caller.host } : {}),
    subject,
    quota: caller.monthQuota,
    reserved,
    reservedAt,
  };
}
