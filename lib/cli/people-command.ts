import { parseArgs } from "node:util";
import { transact } from "@/db/client";
import { personByEmail } from "@/db/queries/people";
import { teamBySlug } from "@/db/queries/teams";
import { ROLES, type Role } from "@/db/schema/organisation";
import { appendActivity, SHELL } from "../activity/append";
import { makeLink } from "../auth/links";
import { changePerson, emailAddress, inviteAgain, invitePerson, removePerson } from "../people/manage-people";
import { peopleViews } from "../people/person-view";
import type { Service } from "../service/service";
import { type CommandResult, runCommand, UsageError } from "./command";

const USAGE = `Usage: npm run -s people -- <command>

  add-admin <email> [--name TEXT]
        makes an administrator and prints the link with which to choose a password; it works once
  add <email> --role ROLE [--name TEXT] [--teams SLUG,SLUG]
        the same for any role; all but admin need a team
  list
  link <email>
        prints a new link with which to choose a password
  change <email> [--name TEXT] [--role ROLE] [--teams SLUG,SLUG]
  remove <email>
        ends the person's sessions; keys and records stay with the teams

Roles: ${ROLES.join(", ")}`;

interface Options {
  readonly name?: string;
  readonly role?: string;
  readonly teams?: string;
}

function roleOf(text: string | undefined): Role | undefined {
  if (text === undefined) return undefined;
  const role = ROLES.find((known) => known === text);
  if (!role) throw new UsageError(`--role: "${text}" is none of ${ROLES.join(", ")}.`);
  return role;
}

function teamIds(service: Service, text: string | undefined): string[] | undefined {
  if (text === undefined) return undefined;
  return text.split(",").flatMap((part) => {
    const slug = part.trim();
    if (slug === "") return [];
    const team = teamBySlug(service.db, slug);
    if (!team) throw new UsageError(`There is no team "${slug}".`);
    return [team.id];
  });
}

function nameOf(text: string | undefined): string | undefined {
  if (text === undefined) return undefined;
  const name = text.trim();
  if (name === "" || name.length > 100) throw new UsageError("--name takes 1 to 100 characters.");
  return name;
}

function existing(service: Service, email: string) {
  const person = personByEmail(service.db, email);
  if (!person || person.removedAt !== null)
    throw new UsageError(`There is nobody with the address ${email}.`);
  return person;
}

/** A name to begin with, until the person says a better one: "ines.harrow@…" is Ines Harrow. */
function nameFrom(email: string): string {
  const words = email
    .split("@")[0]
    .split(/[._-]+/)
    .filter((word) => word !== "");
  return words.map((word) => word[0].toUpperCase() + word.slice(1)).join(" ") || email;
}

function add(service: Service, email: string, role: Role, options: Options): string {
  const name = nameOf(options.name) ?? nameFrom(email);
  const teams = teamIds(service, options.teams) ?? [];
  return invitePerson(service, { email, name, role, teams }, SHELL).link.url;
}

function freshLink(service: Service, email: string): string {
  const { db, config, now } = service;
  const person = existing(service, email);
  if (person.passwordHash === null) return inviteAgain(service, person.id, SHELL).link.url;
  return transact(db, () => {
    const act = {
      action: "password.reset-requested",
      teamId: null,
      subject: { kind: "person", id: person.id },
    };
    appendActivity(db, SHELL, act, now());
    return makeLink(db, config.origin, { kind: "reset", person, now: now() }).url;
  });
}

function table(service: Service): string {
  const rows = peopleViews(service.db, service.now()).map(({ email, name, role, teams, state }) => [
    email,
    role,
    state,
    name,
    teams.map(({ slug }) => slug).join(",") || "-",
  ]);
  const all = [["e-mail", "role", "state", "name", "teams"], ...rows];
  const widths = all[0].map((_, i) => Math.max(...all.map((row) => row[i].length)));
  return all
    .map((row) =>
      row
        .map((cell, i) => cell.padEnd(widths[i]))
        .join("  ")
        .trimEnd(),
    )
    .join("\n");
}

function run(service: Service, argv: string[]): string {
  const [command, ...rest] = argv;
  const { values, positionals } = parseArgs({
    args: rest,
    allowPositionals: true,
    options: { name: { type: "string" }, role: { type: "string" }, teams: { type: "string" } },
  });
  if (command === "list") return table(service);
  const [email] = positionals;
  if (!["add-admin", "add", "link", "change", "remove"].includes(command)) throw new UsageError(USAGE);
  if (positionals.length !== 1 || !emailAddress.safeParse(email).success) {
    throw new UsageError(`${command} takes one e-mail address.`);
  }
  switch (command) {
    case "add-admin":
      return add(service, email, "admin", values);
    case "add": {
      const role = roleOf(values.role);
      if (!role) throw new UsageError("add needs --role.");
      return add(service, email, role, values);
    }
    case "link":
      return freshLink(service, email);
    case "change": {
      const change = {
        name: nameOf(values.name),
        role: roleOf(values.role),
        teams: teamIds(service, values.teams),
      };
      const after = changePerson(service, existing(service, email).id, change, SHELL);
      return `${after.email}  ${after.role}  ${after.teams.map(({ slug }) => slug).join(",") || "-"}`;
    }
    default:
      removePerson(service, existing(service, email).id, SHELL);
      return `${email} removed`;
  }
}

/** `npm run -s people -- …` */
export function peopleCommand(argv: string[], open: () => Service): CommandResult {
  return runCommand(argv, USAGE, open, run);
}
