import { z } from "zod";
import { pageOfRecords } from "@/db/queries/record-list";
import { consoleRoute } from "../_server/console-route";
import { csvAnswer, listQuery, paging } from "../_server/list-query";

const DAY_MS = 86_400_000;

/** Records of the person's teams. */
export const GET = consoleRoute({
  action: "records.view",
  query: listQuery(["label", "operation", "shape", "team", "createdAt", "by"], "-createdAt").extend({
    team: z.string().max(64).optional(),
    operation: z.string().max(40).optional(),
    shape: z.string().max(64).optional(),
    material: z.string().max(64).optional(),
    from: z.iso.date().optional(),
    to: z.iso.date().optional(),
  }),
  handle: ({ db, query, teamIds, requireTeam }) => {
    if (query.team !== undefined) requireTeam(query.team);
    const { rows, total } = pageOfRecords(db, {
      ...paging(query),
      teamIds: query.team === undefined ? teamIds : [query.team],
      search: query.q,
      operation: query.operation,
      shape: query.shape,
      materialId: query.material,
      from: query.from === undefined ? undefined : Date.parse(query.from),
      to: query.to === undefined ? undefined : Date.parse(query.to) + DAY_MS,
    });
    const view = rows.map(({ createdAt, ...row }) => ({
      ...row,
      createdAt: new Date(createdAt).toISOString(),
    }));
    if (!query.csv) return { rows: view, total };
    return csvAnswer(
      "records.csv",
      {
        id: ({ id }) => id,
        label: ({ label }) => label,
        team: ({ teamName }) => teamName,
        operation: ({ operation }) => operation,
        shape: ({ shape }) => shape,
        resistance: ({ resistance }) => resistance,
        stored: ({ createdAt }) => createdAt,
        by: ({ byName }) => byName,
        engine: ({ engine }) => engine,
      },
      view,
    );
  },
});
