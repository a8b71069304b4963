import { createHash } from "node:crypto";
import type { FieldRow } from "@/db/queries/fields";
import { type KeyPrincipal, type Principal, SIGNED_OUT_ID, type SignedOutPrincipal } from "../auth/principal";
import { limitedAddress } from "../http/client-address";
import { Refusal } from "../service/refusal";

/** A caller that may own outlines and field solutions. */
type Caller = KeyPrincipal | SignedOutPrincipal;

export function requireCaller(principal: Principal): Caller {
  if (principal.kind === "embed") {
    throw new Refusal("insufficient-scope", "A widget's frame computes; this call is not for it.");
  }
  if (principal.kind !== "anonymous") return principal;
  throw new Refusal("missing-credentials", "This call needs a key: send Authorization: Bearer rho_….");
}

/** Whom outlines and field solutions belong to: a team, or the address of a page that nobody is signed in to. */
export function requireOwner(principal: Principal, secret: string): string {
  const caller = requireCaller(principal);
  if (caller.kind === "key") return `team:${caller.teamId}`;
  const digest = createHash("sha256")
    .update(`${secret}:${limitedAddress(caller.address)}`)
    .digest("base64url");
  return `address:${digest}`;
}

/** Whose month a solution is charged to, as it is kept until its end. */
export function chargeOf(
  caller: Caller,
  subject: string,
  reserved: number,
  reservedAt: number,
): FieldRow["charge"] {
  return {
    keyId: caller.kind === "key" ? caller.id : SIGNED_OUT_ID,
    teamId: caller.kind === "key" ? caller.teamId : "",
    subject,
    quota: caller.monthQuota,
    reserved,
    reservedAt,
  };
}
