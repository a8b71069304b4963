import { z } from "zod";
import { listedMaterials, type ListedMaterial } from "@/lib/materials/console-materials";
import { newMaterialSchema } from "@/lib/materials/input";
import { createMaterial } from "@/lib/materials/team-materials";
import { json } from "../../_server/page-call";
import { consoleRoute } from "../_server/console-route";
import { csvAnswer, listQuery, paging } from "../_server/list-query";

const VALUES: Readonly<Record<string, (row: ListedMaterial) => string | number>> = {
  name: ({ name }) => name.toLowerCase(),
  kind: ({ kind }) => kind,
  owner: ({ teamName }) => teamName ?? "",
  resistivity: ({ resistivityOhmM }) => resistivityOhmM,
  records: ({ records }) => records,
};

/** The library and the materials of the person's teams. They are few: ordered and filtered here. */
export const GET = consoleRoute({
  action: "materials.view",
  query: listQuery(["name", "kind", "owner", "resistivity", "records"], "name").extend({
    owner: z.string().max(64).optional(),
    kind: z.string().max(40).optional(),
    state: z.enum(["in-use", "retired"]).optional(),
  }),
  handle: ({ db, query, teamIds, requireTeam }) => {
    if (query.owner !== undefined && query.owner !== "library") requireTeam(query.owner);
    const { order, limit, offset } = paging(query);
    const needle = query.q.toLowerCase();
    const value = VALUES[order.by];
    const found = listedMaterials(db, teamIds)
      .filter(
        (row) =>
          (query.owner === undefined || (row.teamId ?? "library") === query.owner) &&
          (query.kind === undefined || row.kind === query.kind) &&
          (query.state === undefined || (row.retiredAt === null) === (query.state === "in-use")) &&
          (needle === "" || `${row.name} ${row.id}`.toLowerCase().includes(needle)),
      )
      .sort((a, b) => {
        const [x, y] = [value(a), value(b)];
        const sign = x < y ? -1 : x > y ? 1 : a.id < b.id ? -1 : 1;
        return order.descending ? -sign : sign;
      });
    if (!query.csv) return { rows: found.slice(offset, offset + limit), total: found.length };
    return csvAnswer(
      "materials.csv",
      {
        id: ({ id }) => id,
        version: ({ version }) => version,
        name: ({ name }) => name,
        kind: ({ kind }) => kind,
        owner: ({ teamName }) => teamName ?? "library",
        "resistivity/ohm m": ({ resistivityOhmM }) => resistivityOhmM,
        "at/degC": ({ atC }) => atC,
        provenance: ({ provenance }) => provenance,
        retired: ({ retiredAt }) => retiredAt,
        records: ({ records }) => records,
      },
      found,
    );
  },
});

/** Version 1 of a new material of a team. */
export const POST = consoleRoute({
  action: "materials.manage",
  body: z.strictObject({ teamId: z.string().max(64), ...newMaterialSchema.shape }),
  handle: ({ db, body: { teamId, ...material }, actor, requireTeam, now }) => {
    requireTeam(teamId);
    return json(createMaterial(db, { teamId, actor, now }, material), 201);
  },
});
