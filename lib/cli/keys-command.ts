import { parseArgs } from "node:util";
import { listKeys } from "@/db/queries/keys";
import { listTeams, teamBySlug } from "@/db/queries/teams";
import { SHELL } from "../activity/append";
import { LONGEST_OVERLAP_MS, parseDuration } from "../auth/duration";
import { keySettings } from "../auth/key-settings";
import { issueKey, keyView, revokeKey, rotateKey } from "../auth/manage-keys";
import { SCOPE_NAMES } from "../auth/scope";
import type { Service } from "../service/service";
import { type CommandResult, runCommand, UsageError } from "./command";

const USAGE = `Usage: npm run -s keys -- <command>

  issue --team SLUG --name TEXT --scopes A,B [--minute N] [--month N] [--expires ISO] [--origins URL,URL] [--in-url]
        issues a key and prints it, this once
  list [--team SLUG]
  revoke <id>
  rotate <id> [--overlap 7d]
        prints the new key; the secret before ends after the overlap (at once where left out)

Scopes: ${SCOPE_NAMES.join(", ")}`;

const listOf = (text: string) => text.split(",").map((part) => part.trim());

function numberOf(option: string, text: string | undefined): number | undefined {
  if (text === undefined) return undefined;
  if (!/^\d+$/.test(text)) throw new UsageError(`--${option}: "${text}" is not a whole number.`);
  return Number(text);
}

/** Runs one command; what it returns goes to stdout. */
function run(service: Service, argv: string[]): string {
  const { db, now } = service;
  const [command, ...rest] = argv;
  const { values, positionals } = parseArgs({
    args: rest,
    allowPositionals: true,
    options: {
      team: { type: "string" },
      name: { type: "string" },
      scopes: { type: "string" },
      minute: { type: "string" },
      month: { type: "string" },
      expires: { type: "string" },
      origins: { type: "string" },
      "in-url": { type: "boolean" },
      overlap: { type: "string" },
    },
  });
  const team = (slug: string) => {
    const found = teamBySlug(db, slug);
    if (found) return found;
    const known = listTeams(db).map((entry) => entry.slug);
    throw new UsageError(
      known.length === 0
        ? "There are no teams yet."
        : `There is no team "${slug}". Teams: ${known.join(", ")}.`,
    );
  };
  const onlyId = () => {
    if (positionals.length !== 1) throw new UsageError(`${command} takes the id of one key.`);
    return positionals[0];
  };

  switch (command) {
    case "issue": {
      if (!values.team || !values.name || !values.scopes) {
        throw new UsageError("issue needs --team, --name and --scopes.");
      }
      const settings = keySettings.safeParse({
        name: values.name,
        scopes: listOf(values.scopes),
        quotas: { minute: numberOf("minute", values.minute), month: numberOf("month", values.month) },
        origins: values.origins === undefined ? undefined : listOf(values.origins),
        allowedInUrl: values["in-url"],
        expiresAt: values.expires,
      });
      if (!settings.success) {
        throw new UsageError(
          settings.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`).join("\n"),
        );
      }
      return issueKey(db, {
        teamId: team(values.team).id,
        settings: settings.data,
        actor: SHELL,
        now: now(),
      }).text;
    }
    case "list": {
      const teamId = values.team === undefined ? undefined : team(values.team).id;
      const rows = listKeys(db, { teamId }).map((row) => keyView(row, now()));
      const header = ["id", "team", "state", "name", "scopes", "minute", "month", "last use"];
      const table = rows.map((key) => [
        key.id,
        key.team,
        key.state,
        key.name,
        key.scopes.join(","),
        String(key.quotas.minute),
        String(key.quotas.month),
        key.lastUsedAt ?? "never",
      ]);
      const widths = header.map((title, i) => Math.max(title.length, ...table.map((row) => row[i].length)));
      return [header, ...table]
        .map((row) =>
          row
            .map((cell, i) => cell.padEnd(widths[i]))
            .join("  ")
            .trimEnd(),
        )
        .join("\n");
    }
    case "revoke": {
      const view = revokeKey(db, { id: onlyId(), actor: SHELL, now: now() });
      return `${view.id} revoked at ${view.revokedAt}`;
    }
    case "rotate": {
      const overlapMs = parseDuration(values.overlap ?? "0");
      if (overlapMs === undefined || overlapMs > LONGEST_OVERLAP_MS) {
        throw new UsageError('--overlap is a duration such as "12h" or "7d", at most 90 days.');
      }
      return rotateKey(db, { id: onlyId(), actor: SHELL, now: now(), overlapMs }).text;
    }
    default:
      throw new UsageError(USAGE);
  }
}

/** `npm run -s keys -- …` */
export function keysCommand(argv: string[], open: () => Service): CommandResult {
  return runCommand(argv, USAGE, open, run);
}
