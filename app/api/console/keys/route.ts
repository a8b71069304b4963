import { z } from "zod";
import { KEY_STATES, pageOfKeys } from "@/db/queries/key-list";
import { listedKeyView } from "@/lib/auth/key-detail";
import { keySettings } from "@/lib/auth/key-settings";
import { issueKey } from "@/lib/auth/manage-keys";
import { SOON_MS } from "@/lib/auth/key-expiry";
import { json } from "../../_server/page-call";
import { consoleRoute } from "../_server/console-route";
import { csvAnswer, listQuery, paging } from "../_server/list-query";

/** Keys of the person's teams. */
export const GET = consoleRoute({
  action: "keys.view",
  query: listQuery(["name", "team", "createdAt", "expiresAt", "lastUsedAt", "month"], "-createdAt").extend({
    team: z.string().max(64).optional(),
    state: z.enum(KEY_STATES).optional(),
  }),
  handle: ({ db, query, teamIds, requireTeam, now }) => {
    if (query.team !== undefined) requireTeam(query.team);
    const { rows, total } = pageOfKeys(db, {
      ...paging(query),
      teamIds: query.team === undefined ? teamIds : [query.team],
      search: query.q,
      state: query.state,
      now,
      soonMs: SOON_MS,
      month: new Date(now).toISOString().slice(0, 7),
    });
    const view = rows.map((row) => listedKeyView(row, now));
    if (!query.csv) return { rows: view, total };
    return csvAnswer(
      "keys.csv",
      {
        id: ({ id }) => id,
        name: ({ name }) => name,
        team: ({ teamName }) => teamName,
        state: ({ state }) => state,
        scopes: ({ scopes }) => scopes.join(" "),
        "requests a minute": ({ quotas }) => quotas.minute,
        "computations a month": ({ quotas }) => quotas.month,
        "computations this month": ({ monthUsed }) => monthUsed,
        origins: ({ origins }) => origins.join(" "),
        "allowed in URL": ({ allowedInUrl }) => (allowedInUrl ? "yes" : "no"),
        created: ({ createdAt }) => createdAt,
        "created by": ({ createdBy }) => createdBy,
        expires: ({ expiresAt }) => expiresAt,
        revoked: ({ revokedAt }) => revokedAt,
        "last use": ({ lastUsedAt }) => lastUsedAt,
        "last client": ({ lastClient }) => lastClient,
      },
      view,
    );
  },
});

/** Issues a key; its text is in this answer and nowhere else. */
export const POST = consoleRoute({
  action: "keys.manage",
  body: z.strictObject({ teamId: z.string().max(64), ...keySettings.shape }),
  handle: ({ db, body: { teamId, ...settings }, actor, requireTeam, now }) => {
    requireTeam(teamId);
    const { view, text } = issueKey(db, { teamId, settings, actor, now });
    return json({ ...view, key: text }, 201);
  },
});
