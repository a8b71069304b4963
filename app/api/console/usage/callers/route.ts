import { listTeams } from "@/db/queries/teams";
import { usageByKey } from "@/db/queries/usage-sums";
import { callerNames } from "@/lib/usage/caller-names";
import { consoleRoute } from "../../_server/console-route";
import { csvAnswer, listQuery, paging } from "../../_server/list-query";
import { daysOf, isoDays, scopeOf, usageQuery } from "../../_server/usage-scope";

/** Who called in some days: keys, pages and embeds, with their sums. */
export const GET = consoleRoute({
  action: "usage.view",
  query: listQuery(["name", "requests", "computations", "refused", "failed", "latency"], "-requests").extend(
    usageQuery,
  ),
  handle: (call) => {
    const { db, query, now } = call;
    const days = daysOf(query, now);
    const { rows, total } = usageByKey(db, scopeOf(call, query), days, { ...paging(query), search: query.q });
    const nameOf = callerNames(db);
    const teams = new Map(listTeams(db).map(({ id, name }) => [id, name]));
    const view = rows.map(({ keyId, teamId, latencyUs, name: _name, lastUsedAt, ...sums }) => ({
      caller: nameOf(keyId),
      team: teams.get(teamId) ?? null,
      ...sums,
      meanMs: sums.requests === 0 ? null : latencyUs / sums.requests / 1000,
      lastUsedAt: lastUsedAt === null ? null : new Date(lastUsedAt).toISOString(),
    }));
    if (!query.csv) return { rows: view, total };
    const { from, to } = isoDays(days);
    return csvAnswer(
      `usage-by-key-${from}-${to}.csv`,
      {
        caller: ({ caller }) => caller.name,
        id: ({ caller }) => caller.id,
        team: ({ team }) => team,
        requests: ({ requests }) => requests,
        computations: ({ computations }) => computations,
        refused: ({ refused }) => refused,
        failed: ({ failed }) => failed,
        "mean/ms": ({ meanMs }) => meanMs,
      },
      view,
    );
  },
});
