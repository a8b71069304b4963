import { z } from "zod";
import { listMaterials as listRows } from "@/db/queries/materials";
import { libraryMaterials } from "@/lib/engine";
import { materialViewSchema } from "@/lib/materials/input";
import { libraryView, readMaterial as findMaterial, viewOf } from "@/lib/materials/team-materials";
import { Refusal } from "@/lib/service/refusal";
import { versionTag } from "../if-match";
import { defineOperation, json } from "../operation";
import { cut, decodeCursor, encodeCursor, page } from "../pagination";
import { pageOf, pageQuery } from "../schemas/page";

export const materialAnswer = materialViewSchema.meta({
  id: "Material",
  description: "A material with its law of resistivity.",
});

export const materialId = z.object({
  id: z.string().max(64).meta({ description: "Id of the material.", example: "copper-annealed" }),
});

export const versionHeader = { ETag: "The version, for If-Match." };

/** Marks of the library's part of the list: before every moment, by place. */
const inLibrary = (place: number) => ({ at: -1, id: String(place) });

export const listMaterials = defineOperation({
  id: "listMaterials",
  method: "GET",
  path: "/materials",
  tag: "Materials",
  summary: "List materials",
  description: "The shared library, then the team's own materials in use, each in its newest version.",
  scope: "materials:read",
  request: {
    query: z.strictObject({
      ...pageQuery(100, 500),
      owner: z
        .enum(["library", "team"])
        .optional()
        .meta({ description: "Only the library's, or only the team's own." }),
    }),
  },
  responses: {
    200: {
      description: "A page of materials.",
      content: {
        "application/json": pageOf(materialAnswer, "A page of materials.").meta({ id: "MaterialPage" }),
      },
      headers: { Link: "The next page, where there is one." },
    },
  },
  errors: [],
  examples: [
    {
      name: "library",
      summary: "The first two of the library",
      status: 200,
      query: { owner: "library", limit: "2" },
    },
    { name: "wrongLimit", summary: "A limit out of range", status: 422, query: { limit: "0" } },
  ],
  handler: ({ query: { limit, cursor, owner } }, { service, principal, url }) => {
    const mark = decodeCursor(cursor);
    const start = mark === undefined ? 0 : mark.at < 0 ? Number(mark.id) : libraryMaterials.length;
    const shared = owner === "team" ? [] : libraryMaterials.slice(start, start + limit);
    const items = shared.map(libraryView);
    const through = start + shared.length;
    const others = owner !== "library" && principal.kind === "key";
    const more = owner !== "team" && through < libraryMaterials.length;
    if (more) return page(url, items, encodeCursor(inLibrary(through)));
    if (!others) return page(url, items, null);
    const room = limit - items.length;
    const after = mark !== undefined && mark.at >= 0 ? mark : undefined;
    const rows = listRows(service.db, principal.teamId, room + 1, after);
    if (room === 0) return page(url, items, rows.length > 0 ? encodeCursor(inLibrary(through)) : null);
    const team = cut(rows, room, ({ createdAt, id }) => ({ at: createdAt, id }));
    return page(url, [...items, ...team.rows.map(viewOf)], team.next);
  },
});

export const readMaterial = defineOperation({
  id: "readMaterial",
  method: "GET",
  path: "/materials/{id}",
  tag: "Materials",
  summary: "Read a material",
  description:
    "A material of the library or the team, in its newest version or an older one. A retired one is still readable, so that a record can show what it used.",
  scope: "materials:read",
  request: {
    path: materialId,
    query: z.strictObject({
      version: z.coerce
        .number({ error: "must be a whole number." })
        .int({ error: "must be a whole number." })
        .min(1)
        .optional()
        .meta({ description: "A certain version." }),
    }),
  },
  responses: {
    200: {
      description: "The material.",
      content: { "application/json": materialAnswer },
      headers: versionHeader,
    },
  },
  errors: ["not-found"],
  examples: [
    { name: "copper", summary: "Annealed copper", status: 200, path: { id: "copper-annealed" } },
    { name: "unknownMaterial", summary: "An id that nobody has", status: 404, path: { id: "unobtainium" } },
  ],
  handler: ({ path, query }, { service, principal }) => {
    const teamId = principal.kind === "key" ? principal.teamId : undefined;
    const material = findMaterial(service.db, teamId, path.id, query.version);
    if (!material) throw new Refusal("not-found", "There is no material of this id and version.");
    return json(200, material, { headers: { ETag: versionTag(material.version) } });
  },
});
