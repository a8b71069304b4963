import { type Complaint, Refusal } from "../service/refusal";
import type { KeySettings } from "./key-settings";
import type { KeyPrincipal } from "./principal";

/** Refuses a key that would have more than the key that makes it: scopes by 403, quotas by 422. */
export function requireWithinOwn(
  own: KeyPrincipal,
  wanted: { readonly scopes: readonly string[]; readonly quotas?: KeySettings["quotas"] },
): void {
  const scopes: readonly string[] = own.scopes;
  const beyond = wanted.scopes.filter((scope) => !scopes.includes(scope));
  if (beyond.length > 0) {
    throw new Refusal(
      "insufficient-scope",
      `A key cannot grant scopes that it lacks: ${beyond.join(", ")}.`,
      {
        headers: {
          "WWW-Authenticate": `Bearer realm="rhoform", error="insufficient_scope", scope="${beyond.join(" ")}"`,
        },
      },
    );
  }
  const errors: Complaint[] = [];
  const { minute, month } = wanted.quotas ?? {};
  if (minute !== undefined && minute > own.minuteQuota) {
    errors.push({
      pointer: "#/quotas/minute",
      detail: `must be at most ${own.minuteQuota}, as the key that issues it has.`,
    });
  }
  if (month !== undefined && month > own.monthQuota) {
    errors.push({
      pointer: "#/quotas/month",
      detail: `must be at most ${own.monthQuota}, as the key that issues it has.`,
    });
  }
  if (errors.length > 0) {
    throw new Refusal("invalid-input", "A key cannot grant a larger quota than its own.", { errors });
  }
}
