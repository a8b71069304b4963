import { z } from "zod";
import { callerNames } from "@/lib/usage/caller-names";
import { MOST_HOURLY_DAYS, usageOf } from "@/lib/usage/console-usage";
import { Refusal } from "@/lib/service/refusal";
import { consoleRoute } from "../_server/console-route";
import { csvAnswer } from "../_server/list-query";
import { daysOf, isoDays, scopeOf, usageQuery } from "../_server/usage-scope";

/** Sums and percentiles of some days, whole and day by day or hour by hour. */
export const GET = consoleRoute({
  action: "usage.view",
  query: z.object({
    ...usageQuery,
    by: z.enum(["day", "hour"]).default("day"),
    csv: z.enum(["1"]).optional(),
  }),
  handle: (call) => {
    const { db, query, now } = call;
    const days = daysOf(query, now);
    if (query.by === "hour" && days.to - days.from >= MOST_HOURLY_DAYS) {
      const detail = `hour is for at most ${MOST_HOURLY_DAYS} days.`;
      throw new Refusal("invalid-input", detail, { errors: [{ parameter: "by", detail }] });
    }
    const scope = scopeOf(call, query);
    const { total, periods } = usageOf(db, scope, days, query.by, now);
    const span = isoDays(days);
    if (query.csv) {
      return csvAnswer(
        `usage-${span.from}-${span.to}.csv`,
        {
          [query.by === "day" ? "day (UTC)" : "hour (UTC)"]: ({ at }) =>
            at.slice(0, query.by === "day" ? 10 : 16),
          requests: ({ requests }) => requests,
          computations: ({ computations }) => computations,
          refused: ({ refused }) => refused,
          failed: ({ failed }) => failed,
          "mean/ms": ({ meanMs }) => meanMs,
          "p50/ms": ({ p50Ms }) => p50Ms,
          "p95/ms": ({ p95Ms }) => p95Ms,
          "p99/ms": ({ p99Ms }) => p99Ms,
        },
        periods,
      );
    }
    return {
      ...span,
      by: query.by,
      caller: query.caller === undefined ? null : callerNames(db)(query.caller),
      total,
      periods,
    };
  },
});
