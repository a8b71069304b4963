import { createHash } from "node:crypto";
import { z } from "zod";
import { catalogue, findShape, nearestNames, shapeEntry } from "@/lib/engine";
import { Refusal } from "@/lib/service/refusal";
import { defineOperation, type Outcome } from "../operation";
import { decodeCursor, encodeCursor, page } from "../pagination";
import { pageOf, pageQuery } from "../schemas/page";
import { shapeSchema } from "../schemas/resistance";

/** More shapes than there will ever be. */
const LARGEST_PAGE = 1000;

interface Written {
  readonly text: string;
  readonly etag: string;
}

function write(value: unknown): Written {
  const text = JSON.stringify(value);
  return { text, etag: `W/"${createHash("sha256").update(text).digest("base64url").slice(0, 22)}"` };
}

/** The catalogue changes with the program only: each answer is written once. */
const WRITTEN = new Map<string, Written>();

function answer(name: string, value: () => unknown): Outcome {
  let written = WRITTEN.get(name);
  if (!written) WRITTEN.set(name, (written = write(value())));
  return {
    status: 200,
    content: { kind: "text", text: written.text, mediaType: "application/json" },
    headers: { ETag: written.etag, "Cache-Control": "no-cache" },
  };
}

export const listShapes = defineOperation({
  id: "listShapes",
  method: "GET",
  path: "/shapes",
  tag: "Shapes",
  summary: "List the catalogue",
  description:
    "Every shape with everything a form needs: dimensions with labels, units and ranges, alternatives, coordinates, terminals, constraints, formula, validity, cautions, sources and a request that works. Without a limit it fits one page.",
  scope: "none",
  request: { query: z.strictObject(pageQuery(LARGEST_PAGE, LARGEST_PAGE)) },
  responses: {
    200: {
      description: "The catalogue.",
      content: { "application/json": pageOf(shapeSchema, "The whole catalogue.").meta({ id: "Catalogue" }) },
      headers: {
        ETag: "Changes when the catalogue does; send it back in If-None-Match.",
        Link: "The next page, where a limit was given and there is one.",
      },
    },
  },
  errors: [],
  examples: [{ name: "firstTwo", summary: "The first two shapes", status: 200, query: { limit: "2" } }],
  handler: ({ query: { limit, cursor } }, { url }) => {
    if (cursor === undefined && limit >= catalogue.length) {
      return answer("", () => ({ items: catalogue.map(shapeEntry), next: null }));
    }
    const start = decodeCursor(cursor)?.at ?? 0;
    const end = start + limit;
    const next = end < catalogue.length ? encodeCursor({ at: end, id: "" }) : null;
    return page(url, catalogue.slice(start, end).map(shapeEntry), next);
  },
});

export const readShape = defineOperation({
  id: "readShape",
  method: "GET",
  path: "/shapes/{shape}",
  tag: "Shapes",
  summary: "Read one shape",
  description: "One entry of the catalogue.",
  scope: "none",
  request: {
    path: z.object({
      shape: z.string().max(64).meta({ description: "Id of the shape.", example: "cylindrical-shell" }),
    }),
  },
  responses: {
    200: {
      description: "The shape's entry.",
      content: { "application/json": shapeSchema },
      headers: { ETag: "Changes when the entry does; send it back in If-None-Match." },
    },
  },
  errors: ["not-found"],
  examples: [
    {
      name: "cylindricalShell",
      summary: "A sleeve or pipe wall",
      status: 200,
      path: { shape: "cylindrical-shell" },
    },
    {
      name: "unknownShape",
      summary: "An id that the catalogue lacks",
      status: 404,
      path: { shape: "cylinder-shell" },
    },
  ],
  handler: ({ path }) => {
    const shape = findShape(path.shape);
    if (!shape) throw unknownShape(path.shape);
    return answer(shape.id, () => shapeEntry(shape));
  },
});

/** A shape that the catalogue lacks, asked for by address. */
export function unknownShape(id: string): Refusal {
  const near = nearestNames(
    id,
    catalogue.map((shape) => shape.id),
  );
  const hint = near.length > 0 ? ` Near it: ${near.join(", ")}.` : "";
  return new Refusal("not-found", `The catalogue has no shape "${id}".${hint}`);
}
