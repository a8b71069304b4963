/** A team as the pages of people show it. */
export interface TeamShown {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly people: number;
  /** Keys in use. */
  readonly keys: number;
}

export const ROLE_CHOICES = [
  { value: "viewer", label: "viewer", help: "Sees everything of their teams, changes nothing." },
  {
    value: "developer",
    label: "developer",
    help: "Manages keys, embeds, materials and records of their teams.",
  },
  { value: "admin", label: "admin", help: "Manages everything, of all teams, and people." },
] as const;

export type RoleShown = (typeof ROLE_CHOICES)[number]["value"];

/** A person as `/api/console/people` tells them. */
export interface PersonShown {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: RoleShown;
  readonly teams: readonly { readonly id: string; readonly name: string }[];
  readonly state: "active" | "invited";
  readonly sessions: number;
  readonly createdAt: string;
  readonly lastSeenAt: string | null;
}

/** What an invitation is answered with. */
export interface InvitedShown {
  readonly person: PersonShown;
  readonly mailed: boolean;
  /** To be passed on by hand, where no mail server brings it. */
  readonly link: string | null;
  readonly expiresAt: string;
}
