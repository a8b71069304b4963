import { z } from "zod";
import { listEvents } from "@/db/queries/usage-events";
import { callerNames } from "@/lib/usage/caller-names";
import { DAY_MS, requestView } from "@/lib/usage/console-usage";
import { consoleRoute } from "../../_server/console-route";
import { csvAnswer, listQuery, paging } from "../../_server/list-query";
import { daysOf, isoDays, scopeOf, usageQuery } from "../../_server/usage-scope";

/** Rows that are counted; beyond them the list says "more". */
const COUNTED = 10_000;

/** Single requests of some days, the newest first. The search takes a whole request id. */
export const GET = consoleRoute({
  action: "usage.view",
  query: listQuery(["at"], "-at").extend({
    ...usageQuery,
    statuses: z.enum(["2xx", "4xx", "5xx", "error"]).optional(),
    operation: z.string().max(40).optional(),
    shape: z.string().max(64).optional(),
  }),
  handle: (call) => {
    const { db, query, now } = call;
    const days = daysOf(query, now);
    const { limit, offset } = paging(query);
    const { rows, total, more } = listEvents(
      db,
      {
        scope: scopeOf(call, query),
        from: days.from * DAY_MS,
        to: (days.to + 1) * DAY_MS,
        statuses: query.statuses,
        operation: query.operation,
        shape: query.shape,
        requestId: query.q === "" ? undefined : query.q,
      },
      { limit, offset, countUpTo: COUNTED },
    );
    const nameOf = callerNames(db);
    const view = rows.map((row) => requestView(row, nameOf));
    if (!query.csv) return { rows: view, total, more };
    const { from, to } = isoDays(days);
    return csvAnswer(
      `requests-${from}-${to}.csv`,
      {
        "time (UTC)": ({ at }) => at,
        request: ({ requestId }) => requestId,
        caller: ({ caller }) => caller.name,
        "caller id": ({ caller }) => caller.id,
        operation: ({ operation }) => operation,
        shape: ({ shape }) => shape,
        status: ({ status }) => status,
        "latency/ms": ({ latencyMs }) => latencyMs,
        computations: ({ computations }) => computations,
        client: ({ client }) => client,
      },
      view,
    );
  },
});
