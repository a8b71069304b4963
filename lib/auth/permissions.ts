import type { Role } from "@/db/schema/organisation";
import { Refusal } from "../service/refusal";

/** How far an action reaches for a role: nowhere, to the person's own teams, or everywhere. */
export type Reach = "none" | "own" | "all";

interface Rule {
  /** What it is, as the page of permissions says it. */
  readonly title: string;
  /** What belongs to a team, or what there is once in the installation. */
  readonly about: "team" | "installation";
  readonly admin: Reach;
  readonly developer: Reach;
  readonly viewer: Reach;
}

const team = (title: string, developer: Reach, viewer: Reach): Rule => ({
  title,
  about: "team",
  admin: "all",
  developer,
  viewer,
});

const installation = (title: string, others: "none" | "all" = "none"): Rule => ({
  title,
  about: "installation",
  admin: "all",
  developer: others,
  viewer: others,
});

/** The one table of who may do what: role × action × own or other team. Pages, console JSON and actions ask it. */
export const PERMISSIONS = {
  "overview.view": team("See the overview", "own", "own"),
  "keys.view": team("See keys, their scopes and last use", "own", "own"),
  "keys.manage": team("Issue, change, rotate and revoke keys", "own", "none"),
  "embeds.view": team("See embeds", "own", "own"),
  "embeds.manage": team("Make, change and withdraw embeds", "own", "none"),
  "usage.view": team("See usage, down to single requests", "own", "own"),
  "materials.view": team("See the library's and the team's materials", "own", "own"),
  "materials.manage": team("Create, change and retire materials", "own", "none"),
  "records.view": team("See, search and export records", "own", "own"),
  "records.manage": team("Store, relabel, replay and delete records", "own", "none"),
  "people.view": team("See who belongs to the team", "own", "own"),
  "people.manage": installation("Invite people, set roles and teams, remove people, end their sessions"),
  "teams.manage": installation("Make and rename teams"),
  "activity.view": team("See the activity", "own", "own"),
  "settings.view": installation("See settings and mails"),
  "settings.manage": installation("Change settings"),
  "account.manage": installation("Own password, e-mail address and sessions", "all"),
} as const satisfies Record<string, Rule>;

export type Action = keyof typeof PERMISSIONS;

export const ACTIONS: readonly Action[] = Object.keys(PERMISSIONS).filter(isAction);

function isAction(name: string): name is Action {
  return Object.hasOwn(PERMISSIONS, name);
}

/** Whose permissions are asked for. */
export interface Member {
  readonly role: Role;
  /** Ids of the teams that the person belongs to. */
  readonly teamIds: readonly string[];
}

export function reachOf(role: Role, action: Action): Reach {
  return PERMISSIONS[action][role];
}

/** Whether a member may do something at all, for what the pages offer. */
export function mayAnywhere(member: Member, action: Action): boolean {
  return reachOf(member.role, action) !== "none";
}

/** Whether a member may do something to what belongs to a team; without a team, to what belongs to none. */
export function may(member: Member, action: Action, teamId: string | null): boolean {
  const reach = reachOf(member.role, action);
  if (reach === "all") return true;
  return reach === "own" && teamId !== null && member.teamIds.includes(teamId);
}

/** Whether a member sees that a team exists: otherwise all of it answers 404. */
export function knowsTeam(member: Member, teamId: string): boolean {
  return member.role === "admin" || member.teamIds.includes(teamId);
}

/**
 * Refuses what a member may not do: as unknown where the team is none of the member's, so that ids tell nothing, and
 * as not permitted where only the role is in the way.
 */
export function requireMay(member: Member, action: Action, teamId: string | null): void {
  if (may(member, action, teamId)) return;
  if (teamId !== null && !knowsTeam(member, teamId)) {
    throw new Refusal("not-found", "There is nothing under this id that you may see.");
  }
  throw notPermitted(member.role, action);
}

/** Refuses what a member's role never allows. */
export function requireMayAnywhere(member: Member, action: Action): void {
  if (!mayAnywhere(member, action)) throw notPermitted(member.role, action);
}

function notPermitted(role: Role, action: Action): Refusal {
  return new Refusal(
    "not-permitted",
    `${PERMISSIONS[action].title}: the role ${role} does not allow it. Ask an administrator.`,
  );
}
