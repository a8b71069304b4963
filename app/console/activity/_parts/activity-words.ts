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
  readonly subject: {
    readonly kind: string;
    readonly id: string;
    readonly name: string | null;
    /** Whether it is still there, or again. */
    readonly present: boolean;
  };
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
  "embed.roll-back": "brought back an earlier version of the embed",
  "embed.discard-draft": "threw away the draft of the embed",
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

/** What each setting is called on the page of settings. */
const SETTINGS: Readonly<Record<string, string>> = {
  organisation: "Organisation",
  retention: "Kept for",
  "signed-out-limit": "Without signing in",
};

/** What an act was about, as people call it. */
export function subjectName({ subject }: ActShown): string {
  if (subject.kind === "setting") return SETTINGS[subject.id] ?? subject.id;
  return subject.name || subject.id;
}

/** The page of what an act was about; none where it is gone. */
export function subjectPage({ subject: { kind, id, name, present } }: ActShown): string | undefined {
  if (kind === "setting") return "/console/settings";
  if (!present) return undefined;
  if (kind === "key") return `/console/keys/${id}`;
  if (kind === "embed") return `/console/embeds/${id}`;
  if (kind === "material") return `/console/materials/${id}`;
  if (kind === "record") return `/records/${id}`;
  if (kind === "person") return `/console/people?q=${encodeURIComponent(name ?? "")}`;
  return kind === "team" ? "/console/people" : undefined;
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
