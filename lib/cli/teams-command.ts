import { parseArgs } from "node:util";
import { transact } from "@/db/client";
import { insertTeam, listTeams, teamBySlug } from "@/db/queries/teams";
import { appendActivity, SHELL } from "../activity/append";
import { newId } from "../service/identifier";
import type { Service } from "../service/service";
import { type CommandResult, runCommand, UsageError } from "./command";

const USAGE = `Usage: npm run -s teams -- <command>

  add <slug> --name TEXT   makes a team; its slug is its short name on the shell and in answers
  list`;

/** `npm run -s teams -- …`, for an installation that begins without the demo. */
export function teamsCommand(argv: string[], open: () => Service): CommandResult {
  return runCommand(argv, USAGE, open, run);
}

function run({ db, now }: Service, argv: string[]): string {
  const [command, ...rest] = argv;
  const { values, positionals } = parseArgs({
    args: rest,
    allowPositionals: true,
    options: { name: { type: "string" } },
  });
  switch (command) {
    case "add": {
      const [slug] = positionals;
      if (positionals.length !== 1 || !/^[a-z][a-z0-9-]{1,39}$/.test(slug)) {
        throw new UsageError("add takes one short name: lower case, digits and hyphens, 2 to 40 of them.");
      }
      const name = values.name?.trim() ?? "";
      if (name === "" || name.length > 100) throw new UsageError("add needs --name, at most 100 characters.");
      const team = { id: newId("team"), slug, name, createdAt: now() };
      transact(db, () => {
        if (teamBySlug(db, slug)) throw new UsageError(`There is a team "${slug}" already.`);
        insertTeam(db, team);
        const act = {
          action: "team.add",
          teamId: team.id,
          subject: { kind: "team", id: team.id },
          after: team,
        };
        appendActivity(db, SHELL, act, team.createdAt);
      });
      return slug;
    }
    case "list":
      return listTeams(db)
        .map(({ slug, name }) => `${slug}  ${name}`)
        .join("\n");
    default:
      throw new UsageError(USAGE);
  }
}
