import type { RefusalCode } from "@/lib/service/refusal";

/** What is said of a problem, in answers, in the OpenAPI document and on its page under `/docs/problems/{code}`. */
export interface ProblemKind {
  readonly status: number;
  readonly title: string;
  /** What it means, for people. */
  readonly description: string;
  /** What to do about it. */
  readonly remedy: string;
}

/** The one table of problems. */
export const PROBLEMS: Readonly<Record<RefusalCode, ProblemKind>> = {
  "malformed-json": {
    status: 400,
    title: "The body cannot be read",
    description: "The body is not text in UTF-8, or not JSON where JSON is asked for.",
    remedy: "Send one JSON text, or a file saved as UTF-8. The detail names the place where reading stopped.",
  },
  "invalid-header": {
    status: 400,
    title: "A header is missing or wrong",
    description:
      "A header that this call reads is missing or does not have the form that its standard asks for.",
    remedy: "Send the header as the detail says.",
  },
  "ambiguous-credentials": {
    status: 400,
    title: "More than one key",
    description: "The call carries a key in more than one place, so it is not clear on whose behalf it acts.",
    remedy: "Send the key once, in the Authorization header.",
  },
  "missing-credentials": {
    status: 401,
    title: "No key",
    description: "The call needs a key and carries none.",
    remedy: "Send Authorization: Bearer with a key of your team. Administrators issue keys in the console.",
  },
  "invalid-key": {
    status: 401,
    title: "Unknown key",
    description: "The key is misspelt, cut off, or was never issued here.",
    remedy: "Check that the whole key arrives, with its prefix rho_ and without quotes around it.",
  },
  "expired-key": {
    status: 401,
    title: "The key has expired",
    description: "The key, or the secret of it that a rotation replaced, has reached its end.",
    remedy: "Use the secret that the rotation gave, or have a new key issued.",
  },
  "revoked-key": {
    status: 401,
    title: "The key was revoked",
    description: "The key was ended by a person or a program of its team.",
    remedy: "Have a new key issued. The console's activity says who revoked it and when.",
  },
  "key-not-allowed-in-url": {
    status: 401,
    title: "This key may not travel in an address",
    description:
      "Addresses end up in logs and histories, so a key counts there only if it was issued for that.",
    remedy:
      "Send the key in the Authorization header, or use one that may come as ?key=. Rotate the one that was sent.",
  },
  "invalid-token": {
    status: 401,
    title: "The page's token does not count",
    description: "The short-lived token with which a page of this service calls is over or not one of ours.",
    remedy: "Reload the page. Programs call with a key.",
  },
  "sign-in-required": {
    status: 401,
    title: "Nobody is signed in",
    description: "The page or call is for people who are signed in, and the session is missing or over.",
    remedy: "Sign in, then try again. Programs call /api/v1 with a key.",
  },
  "sign-in-failed": {
    status: 401,
    title: "Sign-in failed",
    description: "The e-mail address and the password do not belong together.",
    remedy: "Check both, or have a link sent with which to choose a new password.",
  },
  "insufficient-scope": {
    status: 403,
    title: "The key lacks a scope",
    description: "The key is known, but what it may do does not include this call.",
    remedy: "Use a key with the scope that the detail names, or have one issued.",
  },
  "origin-not-allowed": {
    status: 403,
    title: "This page may not use the key",
    description: "A browser called from a page whose origin is not among those that the key allows.",
    remedy: "Add the origin (scheme, host and port) to the key, or call from a server.",
  },
  "not-permitted": {
    status: 403,
    title: "Your role does not allow this",
    description: "The person is signed in, but their role does not allow the action.",
    remedy: "Ask an administrator. /docs/permissions says which role may do what.",
  },
  "team-required": {
    status: 403,
    title: "This belongs to a team",
    description: "The call concerns what a team owns, and it came without a key of a team.",
    remedy: "Call with a key of the team.",
  },
  "library-read-only": {
    status: 403,
    title: "The library cannot be changed",
    description:
      "Materials of the shared library come with the service; their values change with its versions only.",
    remedy: "Create a material of your team with the values you need.",
  },
  "not-found": {
    status: 404,
    title: "Not found",
    description:
      "There is nothing under this id that the caller may see. What another team owns looks the same.",
    remedy: "Check the id, and that the key belongs to the right team.",
  },
  "embed-withdrawn": {
    status: 410,
    title: "The widget was withdrawn",
    description: "The team that owns this widget has taken it off all pages.",
    remedy: "Take the frame off the page, or ask the team that owns the widget.",
  },
  "not-ready": {
    status: 409,
    title: "Not ready",
    description: "The field solution has no picture: it is not finished yet, or it ended without a result.",
    remedy: "Wait for its end (`Prefer: wait=30` on the solution, or its events) and ask again.",
  },
  "unknown-path": {
    status: 404,
    title: "No such address",
    description: "The API has no operation at this path.",
    remedy: "Compare the path with the reference under /docs/api.",
  },
  "method-not-allowed": {
    status: 405,
    title: "Wrong method",
    description: "The path exists, but not with this method.",
    remedy: "Use one of the methods in the Allow header.",
  },
  "not-acceptable": {
    status: 406,
    title: "No answer in that form",
    description: "The Accept header admits none of the media types that this call can answer with.",
    remedy: "Accept application/json, or one of the types that the detail names.",
  },
  "last-administrator": {
    status: 409,
    title: "The last administrator stays",
    description: "The change would leave the service without an administrator.",
    remedy: "Make somebody else an administrator first.",
  },
  "version-conflict": {
    status: 409,
    title: "Changed in the meantime",
    description: "The version in If-Match is not the current one: somebody else made a change first.",
    remedy: "Read the current version, apply the change to it, and send it with the new version in If-Match.",
  },
  "request-in-progress": {
    status: 409,
    title: "The same call is still running",
    description: "A call with this Idempotency-Key has started and not finished.",
    remedy: "Wait a moment and repeat the call: the finished answer will be given again.",
  },
  "link-over": {
    status: 410,
    title: "The link is over",
    description: "The link was used before, has expired, or was replaced by a newer one.",
    remedy: "Ask for a new one: from the sign-in page, or from an administrator.",
  },
  "body-too-large": {
    status: 413,
    title: "The body is too large",
    description: "The body is longer than this call takes.",
    remedy: "Send less, or split it into several calls. The detail names the limit.",
  },
  "unsupported-media-type": {
    status: 415,
    title: "Wrong media type",
    description: "The body's Content-Type is not one that this call reads.",
    remedy: "Send one of the types that the detail names, unencoded.",
  },
  "invalid-input": {
    status: 422,
    title: "The input cannot be used",
    description:
      "The call is well formed, but its content is not: a value is missing, out of range or contradictory.",
    remedy: "Each entry of errors points at one place and says what is wrong there and what is allowed.",
  },
  "idempotency-key-reused": {
    status: 422,
    title: "The idempotency key belongs to another call",
    description: "The Idempotency-Key was used before with another body or another path.",
    remedy: "Choose a new key for each new call; repeat a key only to repeat the very same call.",
  },
  "precondition-required": {
    status: 428,
    title: "If-Match is missing",
    description: "The change must say which version it was made from, so that nobody's change is lost.",
    remedy: "Send If-Match with the version, as the ETag header gave it.",
  },
  "too-many-requests": {
    status: 429,
    title: "Too many requests",
    description: "The requests of this minute are used up.",
    remedy: "Wait as long as Retry-After says. Thousands of calculations belong into one batch.",
  },
  "quota-exhausted": {
    status: 429,
    title: "The quota of this month does not suffice",
    description: "The call would need more computations than are left of the calendar month (UTC).",
    remedy: "Wait for the next month or have the key's quota raised. Refused computations cost nothing.",
  },
  internal: {
    status: 500,
    title: "A defect of the service",
    description:
      "Something went wrong that is not the caller's doing. Nothing was stored and nothing counted.",
    remedy: "Report it with the request id, which is in instance and in the Request-Id header.",
  },
  busy: {
    status: 503,
    title: "The service is busy",
    description: "The service is starting, stopping or has more work than it can take at the moment.",
    remedy: "Repeat the call after the time that Retry-After names.",
  },
  "not-computed": {
    status: 503,
    title: "Not computed in time",
    description:
      "The time that a batch may take was over before this item had its turn. It cost nothing. Only items of a batch are told so; the batch itself is answered.",
    remedy: "Send the items that are left in another batch.",
  },
};
