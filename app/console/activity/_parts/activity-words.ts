/** An act as `/api/console/activity` tells it. */
export interface ActShown {
  readonly id: string;
  readonly at: string;
  readonly actor: {
    readonly kind: "key" | "person" | "shell" | "service";
    readonly id: string;
    readonly name: string;
  };
  readonly team: { readonly id: string; readonly name: string } | null;
  readonly action: string;
  readonly subject: { readonly kind: string; readonly id: string; readonly name: string | null };
  readonly before: unknown;
  readonly after: unknown;
  readonly address: string | null;
  readonly requestId: string | null;
}

const WORDS: Readonly<Record<string, string>> = {
  "key.issue": "issued the key",
  "key.change": "changed the key",
  "key.rotate": "rotated the key",
  "key.revoke": "revoked the key",
  "embed.create": "made the embed",
  "embed.change": "changed the embed",
  "embed.publish": "published the embed",
  "embed.withdraw": "withdrew the embed",
  "material.create": "created the material",
  "material.change": "changed the material",
  "material.retire": "retired the material",
  "record.relabel": "relabelled the record",
  "record.delete": "deleted the record",
  "team.add": "made the team",
  "team.rename": "renamed the team",
  "person.invite": "invited",
  "person.invite-again": "invited again",
  "person.change": "changed",
  "person.remove": "removed",
  "session.start": "signed in",
  "session.end": "ended a session",
  "invitation.accept": "accepted the invitation",
  "password.reset-requested": "asked for a new password",
  "password.reset": "set a new password by link",
  "password.change": "changed the password",
  "email.change-requested": "asked to change the e-mail address",
  "email.change": "confirmed a new e-mail address",
  "settings.change": "changed the setting",
};

/** What was done, as a person says it; an action without words of its own is told by its name. */
export function actionWords(action: string): string {
  const known = WORDS[action];
  if (known) return known;
  const [kind, verb = ""] = action.split(".");
  return `${kind}: ${verb.replaceAll("-", " ")}`;
}

/** Kinds of acts to filter by: the first word of their name. */
export const ACT_KINDS = [
  { value: "key", label: "keys" },
  { value: "embed", label: "embeds" },
  { value: "material", label: "materials" },
  { value: "record", label: "records" },
  { value: "person", label: "people" },
  { value: "team", label: "teams" },
  { value: "session", label: "sign-ins" },
  { value: "password", label: "passwords" },
  { value: "email", label: "e-mail addresses" },
  { value: "settings", label: "settings" },
] as const;

export const ACTOR_KINDS = [
  { value: "person", label: "people" },
  { value: "key", label: "keys" },
  { value: "shell", label: "shell" },
  { value: "service", label: "the service" },
] as const;

/** One member that an act changed. */
export interface Difference {
  readonly member: string;
  readonly before: string;
  readonly after: string;
}

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === "object" && value !== null && !Array.isArray(value);

function shown(value: unknown): string {
  if (value === undefined || value === null) return "";
  if (typeof value === "string") return value;
  if (Array.isArray(value) && value.every((each) => typeof each === "string")) return value.join(", ");
  return JSON.stringify(value);
}

/** What an act changed, member by member; members that stayed are left out. */
export function differences(before: unknown, after: unknown): readonly Difference[] {
  const [old, now] = [isObject(before) ? before : {}, isObject(after) ? after : {}];
  const members = [...new Set([...Object.keys(old), ...Object.keys(now)])];
  return members.flatMap((member) => {
    const [was, is] = [shown(old[member]), shown(now[member])];
    return was === is ? [] : [{ member, before: was, after: is }];
  });
}
