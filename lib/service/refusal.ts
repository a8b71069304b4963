/** Every way in which the service says no. `api/problem` gives each its status, title and page. */
export type RefusalCode =
  | "malformed-json"
  | "invalid-header"
  | "ambiguous-credentials"
  | "missing-credentials"
  | "invalid-key"
  | "expired-key"
  | "revoked-key"
  | "key-not-allowed-in-url"
  | "invalid-token"
  | "sign-in-required"
  | "sign-in-failed"
  | "insufficient-scope"
  | "origin-not-allowed"
  | "not-permitted"
  | "team-required"
  | "library-read-only"
  | "not-found"
  | "embed-withdrawn"
  | "not-ready"
  | "unknown-path"
  | "method-not-allowed"
  | "not-acceptable"
  | "last-administrator"
  | "version-conflict"
  | "request-in-progress"
  | "link-over"
  | "body-too-large"
  | "unsupported-media-type"
  | "invalid-input"
  | "idempotency-key-reused"
  | "precondition-required"
  | "too-many-requests"
  | "quota-exhausted"
  | "internal"
  | "busy"
  | "not-computed";

/** One complaint about an input: a member of the body by JSON pointer, or a query parameter by name. */
export type Complaint =
  | { readonly pointer: string; readonly detail: string }
  | { readonly parameter: string; readonly detail: string };

/** A refusal that the caller may read: everything in it is public. */
export class Refusal extends Error {
  override readonly name = "Refusal";

  constructor(
    readonly code: RefusalCode,
    readonly detail: string,
    readonly more: {
      readonly errors?: readonly Complaint[];
      readonly headers?: Readonly<Record<string, string>>;
    } = {},
  ) {
    super(detail);
  }
}
