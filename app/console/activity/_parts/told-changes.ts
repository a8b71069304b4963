import { countText } from "../../_parts/numbers";
import { factsOf, type MaterialTold } from "../../materials/_parts/material-facts";

/** One member that an act changed, in words; an empty text where there was nothing. */
export interface Difference {
  readonly member: string;
  readonly before: string;
  readonly after: string;
}

interface Told {
  readonly before: unknown;
  readonly after: unknown;
  readonly subject: { readonly kind: string };
}

type Facts = ReadonlyMap<string, string>;

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === "object" && value !== null && !Array.isArray(value);

const count = (unit: string) => (value: unknown) =>
  typeof value === "number" ? `${countText(value)} ${unit}` : plain(value);

/** A moment as the activity keeps it: ISO 8601 or Unix ms. */
function moment(value: unknown): string {
  if (typeof value === "number") return moment(new Date(value).toISOString());
  return typeof value === "string" ? `${value.slice(0, 10)} ${value.slice(11, 16)} UTC` : "never";
}

const yesOrNo = (value: unknown) => (value === true ? "yes" : "no");

/** Members by their path, with what they are called and how they are read. */
const MEMBERS: Readonly<Record<string, readonly [title: string, text?: (value: unknown) => string]>> = {
  "quotas.minute": ["Quota", count("requests a minute")],
  "quotas.month": ["Quota of the month", count("computations")],
  monthQuota: ["Quota of the month", count("computations")],
  minuteQuota: ["Quota", count("requests a minute")],
  origins: ["Origins"],
  allowedInUrl: ["May travel in a URL", yesOrNo],
  expiresAt: ["Expires", moment],
  previousUntil: ["Secret before works until", moment],
  version: ["Version", (value) => (value === null ? "none" : plain(value))],
  restores: ["Says the same as version"],
  createdAt: ["Stored", moment],
  byName: ["Stored by"],
  retiredAt: ["Retired", (value) => (value === null ? "no" : moment(value))],
  client: ["Browser"],
  newDevice: ["New device", yesOrNo],
  signedInAt: ["Signed in", moment],
  otherSessionsEnded: ["Other devices signed out"],
  usageDays: ["Single requests are kept", count("days")],
  mailDays: ["Mails are kept", count("days")],
  email: ["E-mail address"],
  slug: ["Short name"],
};

/** What says nothing that the act does not say itself. */
const LEFT_OUT: Readonly<Record<string, readonly string[]>> = {
  key: ["id", "createdAt", "createdBy", "lastUsedAt", "lastClient", "revokedAt"],
  material: ["id"],
};

function plain(value: unknown): string {
  if (value === undefined || value === null) return "";
  if (typeof value === "boolean") return yesOrNo(value);
  if (Array.isArray(value) && value.every((each) => typeof each !== "object")) return value.join(", ");
  return typeof value === "object" ? JSON.stringify(value) : String(value);
}

/** "monthQuota" is "Month quota". */
function titleOf(path: string): string {
  const spaced = path.replace(
    /([a-z])([A-Z])/g,
    (_, before: string, next: string) => `${before} ${next.toLowerCase()}`,
  );
  return spaced.charAt(0).toUpperCase() + spaced.slice(1).replaceAll(".", ", ");
}

function factsIn(
  members: Record<string, unknown>,
  leftOut: readonly string[],
  within = "",
): [string, string][] {
  return Object.entries(members).flatMap(([name, value]): [string, string][] => {
    if (value === undefined || leftOut.includes(name)) return [];
    const path = within + name;
    if (isObject(value)) return factsIn(value, leftOut, `${path}.`);
    const [title, text = plain] = MEMBERS[path] ?? [titleOf(path)];
    return [[title, text(value)]];
  });
}

const isMaterial = (value: Record<string, unknown>): value is Record<string, unknown> & MaterialTold =>
  isObject(value.resistivity) && isObject(value.range) && isObject(value.uncertainty);

function factsAbout(kind: string, value: unknown): Facts {
  if (!isObject(value))
    return new Map(value === undefined || value === null ? [] : [["Value", plain(value)]]);
  const leftOut = LEFT_OUT[kind] ?? [];
  if (kind !== "material" || !isMaterial(value)) return new Map(factsIn(value, leftOut));
  const { version, owner, retiredAt } = value;
  return new Map([...factsOf(value), ...factsIn({ version, owner, retiredAt }, leftOut)]);
}

/** The first changes of what was there before, in a line; empty where something was made or ended. */
export function changesLine(told: Told, most = 2): string {
  if (!isObject(told.before) || !isObject(told.after)) return "";
  const changes = toldChanges(told);
  const shown = changes
    .slice(0, most)
    .map(({ member, before, after }) => `${member}: ${before || "none"} → ${after || "none"}`);
  const rest = changes.length - shown.length;
  return [...shown, ...(rest > 0 ? [`${rest} more`] : [])].join("; ");
}

/** What an act changed, member by member and with units; members that stayed are left out. */
export function toldChanges({ before, after, subject }: Told): readonly Difference[] {
  const [old, now] = [factsAbout(subject.kind, before), factsAbout(subject.kind, after)];
  return [...new Set([...old.keys(), ...now.keys()])].flatMap((member) => {
    const [was, is] = [old.get(member) ?? "", now.get(member) ?? ""];
    return was === is ? [] : [{ member, before: was, after: is }];
  });
}
