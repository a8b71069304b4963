import { z } from "zod";
import { listTeams } from "@/db/queries/teams";
import { BREAKDOWNS } from "@/db/queries/usage-sums";
import { sharesOf } from "@/lib/usage/console-usage";
import { consoleRoute } from "../../_server/console-route";
import { csvAnswer } from "../../_server/list-query";
import { daysOf, isoDays, scopeOf, usageQuery } from "../../_server/usage-scope";

/** Calls that have no such name: batches, networks and outlines have no shape. */
const UNNAMED = { operation: "", shape: "no shape", status: "", client: "", team: "signed out" } as const;

/** What the calls of some days divide into: operation, shape, status, team or client. */
export const GET = consoleRoute({
  action: "usage.view",
  query: z.object({
    ...usageQuery,
    by: z.enum(BREAKDOWNS).default("operation"),
    csv: z.enum(["1"]).optional(),
  }),
  handle: (call) => {
    const { db, query, now } = call;
    const days = daysOf(query, now);
    const { rows, sampled } = sharesOf(db, scopeOf(call, query), days, query.by);
    const names = new Map(listTeams(db).map(({ id, name }) => [id, name]));
    const labelOf = (name: string): string => names.get(name) ?? (name === "" ? UNNAMED[query.by] : name);
    const named = rows.map((row) => ({ ...row, label: labelOf(row.name) }));
    if (!query.csv) return { by: query.by, rows: named, sampled };
    const { from, to } = isoDays(days);
    return csvAnswer(
      `usage-by-${query.by}-${from}-${to}.csv`,
      {
        [query.by]: ({ label }) => label,
        requests: ({ requests }) => requests,
        computations: ({ computations }) => computations,
      },
      named,
    );
  },
});
