import { isOwnOrigin } from "../http/origin";
import { Refusal } from "../service/refusal";
import type { KeyPrincipal, Principal } from "./principal";
import { requireMay } from "./permissions";
import type { Scope } from "./scope";

/** What an operation asks for: a scope, any key, or nothing. */
export type Access = Scope | "any" | "none";

/** Refuses a caller that lacks what the operation asks for. */
export function requireAccess(principal: Principal, access: Access): void {
  if (access === "none") return;
  if (principal.kind === "anonymous") {
    throw new Refusal("missing-credentials", "This call needs a key: send Authorization: Bearer rho_….");
  }
  if (access === "any") return;
  if (!principal.scopes.includes(access)) {
    throw new Refusal(
      "insufficient-scope",
      `This call needs the scope ${access}, which the key does not have.`,
      {
        headers: {
          "WWW-Authenticate": `Bearer realm="rhoform", error="insufficient_scope", scope="${access}"`,
        },
      },
    );
  }
}

/** The key behind a call on what belongs to a team. */
export function requireKey(principal: Principal, purpose: string): KeyPrincipal {
  if (principal.kind === "key") return principal;
  throw new Refusal("team-required", `${purpose} belongs to a team: call with a key of that team.`);
}

/** The key behind a call that stores, changes or deletes a record; a person's page must be allowed to as well. */
export function requireRecorder(principal: Principal): KeyPrincipal {
  const key = requireKey(principal, "A record");
  const { person } = key;
  if (person) requireMay({ role: person.role, teamIds: [key.teamId] }, "records.manage", key.teamId);
  return key;
}

/** Whether a browser's page of that origin may call as this principal. */
export function originAllowed(
  principal: Principal,
  origin: string,
  headers: Headers,
  configured: string,
): boolean {
  if (isOwnOrigin(origin, headers, configured)) return true;
  // A sandboxed frame has no origin to name; its token is bound to what the widget leaves open.
  if (principal.kind === "embed") return origin === "null";
  return principal.kind === "key" && principal.origins.includes(origin);
}
