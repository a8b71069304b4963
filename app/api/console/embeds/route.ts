import { z } from "zod";
import { teamById } from "@/db/queries/teams";
import type { Database } from "@/db/client";
import { DEFAULT_EMBED_QUOTA, type EmbedDefinition, embedSettings } from "@/lib/embeds/definition";
import { type EmbedRowView, embedRows } from "@/lib/embeds/embed-list";
import { createEmbed } from "@/lib/embeds/manage-embeds";
import { startDefinition, startOnOutline } from "@/lib/embeds/start-definition";
import { findShape, type Problem } from "@/lib/engine";
import { teamOutline } from "@/lib/fields/team-outlines";
import { Refusal } from "@/lib/service/refusal";
import { json } from "../../_server/page-call";
import { consoleRoute } from "../_server/console-route";
import { csvAnswer, listQuery, paging } from "../_server/list-query";

const COLUMNS = ["name", "team", "state", "createdAt", "requests", "remaining"] as const;
type Column = (typeof COLUMNS)[number];

const VALUES: Readonly<Record<Column, (row: EmbedRowView) => string | number>> = {
  name: ({ name }) => name.toLowerCase(),
  team: ({ teamName }) => teamName.toLowerCase(),
  state: ({ state }) => state,
  createdAt: ({ createdAt }) => createdAt,
  requests: ({ requests }) => requests,
  remaining: ({ month }) => month.remaining,
};

/** The widgets of the teams that the person sees; a team has dozens, so they are sorted here. */
export const GET = consoleRoute({
  action: "embeds.view",
  query: listQuery(COLUMNS, "-createdAt").extend({
    state: z.enum(["draft", "published", "withdrawn"]).optional(),
  }),
  handle: async ({ service, teamIds, query, now }) => {
    const text = query.q.toLowerCase();
    const found = (await embedRows(service, teamIds, now)).filter(
      ({ id, name, state }) =>
        (query.state === undefined || state === query.state) &&
        (text === "" || name.toLowerCase().includes(text) || id.toLowerCase().includes(text)),
    );
    const { order, limit, offset } = paging(query);
    const valueOf = VALUES[COLUMNS.find((name) => name === order.by) ?? "createdAt"];
    found.sort((a, b) => {
      const [one, other] = [valueOf(a), valueOf(b)];
      const sign = one < other ? -1 : one > other ? 1 : 0;
      return order.descending ? -sign : sign;
    });
    const rows = found.slice(offset, offset + limit);
    if (!query.csv) return { rows, total: found.length };
    return csvAnswer(
      "embeds.csv",
      {
        id: (row: EmbedRowView) => row.id,
        name: (row) => row.name,
        team: (row) => row.teamName,
        state: (row) => row.state,
        version: (row) => row.version,
        origins: (row) => row.origins.join(" "),
        "calls in 31 days": (row) => row.requests,
        "computations a month": (row) => row.monthQuota,
        "left this month": (row) => row.month.remaining,
        created: (row) => row.createdAt,
      },
      rows,
    );
  },
});

const newEmbed = z
  .strictObject({
    teamId: z.string().max(40),
    name: embedSettings.shape.name,
    shape: z.string().max(64).optional(),
    /** In place of a shape. */
    outlineId: z.string().max(64).optional(),
    /** Values of a calculation page, by the names of the shape's inputs. */
    values: z.record(z.string().max(90), z.string().max(120)).optional(),
  })
  .refine(({ shape, outlineId }) => (shape === undefined) !== (outlineId === undefined), {
    path: ["shape"],
    error: "must be given, or outlineId, and not both.",
  });

/** Makes a widget with a draft that starts as the shape's example, or on a stored outline of the team. */
export const POST = consoleRoute({
  action: "embeds.manage",
  body: newEmbed,
  handle: ({ db, body, actor, now, requireTeam }) => {
    const { teamId, name } = body;
    requireTeam(teamId);
    if (!teamById(db, teamId)) throw refused({ pointer: "#/teamId", detail: "is not a team." });
    const settings = { name, origins: [], monthQuota: DEFAULT_EMBED_QUOTA };
    return json(createEmbed(db, { actor, now }, { teamId, settings, definition: firstDraft(db, body) }), 201);
  },
});

/** Refuses an unknown shape, and an outline that is not the team's as one that there is not. */
function firstDraft(
  db: Database,
  { teamId, shape: shapeId = "", outlineId, values }: z.infer<typeof newEmbed>,
): EmbedDefinition {
  if (outlineId !== undefined) {
    const stored = teamOutline(db, teamId, outlineId);
    if (stored) return startOnOutline(outlineId, stored);
    throw new Refusal("not-found", "There is no outline of this id that the team has stored.");
  }
  const shape = findShape(shapeId);
  if (!shape) throw refused({ pointer: "#/shape", detail: "is not a shape of the catalogue." });
  return startDefinition(shape, values);
}

function refused(error: Problem): Refusal {
  return new Refusal("invalid-input", "The widget cannot be made.", { errors: [error] });
}
