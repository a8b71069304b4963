import "server-only";
import { z } from "zod";
import { keyById } from "@/db/queries/keys";
import type { Days, UsageScope } from "@/db/queries/usage-sums";
import { reachOf } from "@/lib/auth/permissions";
import { DAY_MS, MOST_DAYS } from "@/lib/usage/console-usage";
import { Refusal } from "@/lib/service/refusal";
import type { ConsoleCall } from "./console-route";

const day = z.iso.date();

/** What every list and sum of the usage takes: from which day to which (UTC), of which team, of which caller. */
export const usageQuery = {
  from: day.optional(),
  to: day.optional(),
  team: z.string().max(64).optional(),
  caller: z.string().max(140).optional(),
};

interface Asked {
  readonly from?: string;
  readonly to?: string;
  readonly team?: string;
  readonly caller?: string;
}

const USUAL_DAYS = 7;

/** The days asked for, the last week where nothing is said. Refuses what ends before it begins and what is too long. */
export function daysOf({ from, to }: Asked, now: number): Days {
  const today = Math.floor(now / DAY_MS);
  const last = to === undefined ? today : Math.floor(Date.parse(to) / DAY_MS);
  const first = from === undefined ? last - USUAL_DAYS + 1 : Math.floor(Date.parse(from) / DAY_MS);
  const wrong =
    first > last
      ? { parameter: "to", detail: "must not lie before from." }
      : last - first >= MOST_DAYS
        ? { parameter: "from", detail: `must lie at most ${MOST_DAYS} days before to.` }
        : undefined;
  if (wrong) throw new Refusal("invalid-input", `${wrong.parameter} ${wrong.detail}`, { errors: [wrong] });
  return { from: first, to: last };
}

/** Whose usage the person may see of what was asked for; another team's is unknown. */
export function scopeOf(call: ConsoleCall<unknown, unknown>, { team, caller }: Asked): UsageScope {
  if (team !== undefined) call.requireTeam(team);
  if (caller !== undefined) {
    const key = keyById(call.db, caller);
    if (key) call.requireTeam(key.teamId);
  }
  const everything = team === undefined && reachOf(call.person.role, "usage.view") === "all";
  return {
    teamIds: everything ? "all" : team === undefined ? call.teamIds : [team],
    ...(caller === undefined ? {} : { keyId: caller }),
  };
}

/** The days as they are written: both included. */
export function isoDays({ from, to }: Days): { from: string; to: string } {
  const iso = (at: number) => new Date(at * DAY_MS).toISOString().slice(0, 10);
  return { from: iso(from), to: iso(to) };
}
