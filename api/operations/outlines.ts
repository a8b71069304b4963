import { z } from "zod";
import { insertOutline, outlineOfOwner } from "@/db/queries/fields";
import { cleanOutline } from "@/lib/engine";
import { outlineView } from "@/lib/fields/field-view";
import { requireOwner } from "@/lib/fields/owner";
import { newId } from "@/lib/service/identifier";
import { Refusal } from "@/lib/service/refusal";
import { BASE_PATH } from "../base-path";
import { defineOperation, json } from "../operation";
import { outlineRequest, storedOutlineSchema } from "../schemas/field";

/** Largest body of outlines and fields, bytes. */
export const OUTLINE_MAX_BYTES = 10_000_000;

/** An L of 10 mm track, 40 mm along each outer side. */
export const bracketOutline = {
  unit: "mm",
  outer: [
    [0, 0],
    [40, 0],
    [40, 10],
    [10, 10],
    [10, 40],
    [0, 40],
  ],
};

export const bracketTerminals = [
  {
    name: "in",
    segments: [
      [
        [40, 0],
        [40, 10],
      ],
    ],
  },
  {
    name: "out",
    segments: [
      [
        [10, 40],
        [0, 40],
      ],
    ],
  },
];

export const postOutline = defineOperation({
  id: "storeOutline",
  method: "POST",
  path: "/outlines",
  tag: "Fields",
  summary: "Store an outline",
  description:
    "Checks a plan drawing, repairs what is harmless (repeated and collinear vertices) and stores it for field solutions. The answer is the cleaned outline; terminals come back on its edges. A stored outline never changes and stays: what refers to it, a published widget too, refers to this very drawing.",
  scope: "field",
  request: {
    body: {
      description: "An outline and, if they are known, its name and its terminals.",
      // The engine checks the body itself: it finds every mistake at once.
      schema: z.unknown(),
      documented: () => outlineRequest,
      maxBytes: OUTLINE_MAX_BYTES,
    },
  },
  responses: {
    201: {
      description: "Stored.",
      content: { "application/json": storedOutlineSchema },
      headers: { Location: "Path of the outline." },
    },
  },
  errors: [],
  examples: [
    {
      name: "track",
      summary: "A bent track with its terminals",
      status: 201,
      headers: { "Idempotency-Key": "track-rev-b" },
      body: { name: "Track, rev B", outline: bracketOutline, terminals: bracketTerminals },
    },
    {
      name: "crossing",
      summary: "Edges that cross",
      status: 422,
      body: {
        outline: {
          unit: "mm",
          outer: [
            [0, 0],
            [10, 10],
            [10, 0],
            [0, 10],
          ],
        },
      },
    },
  ],
  stores: () => true,
  handler: ({ body }, { service, principal, now }) => {
    const owner = requireOwner(principal, service.config.secret);
    const content = JSON.stringify(cleanOutline(body));
    const row = { id: newId("out"), owner, createdAt: now, content };
    return {
      commit: () => {
        insertOutline(service.db, row);
        return json(201, outlineView(row), { headers: { Location: `${BASE_PATH}/outlines/${row.id}` } });
      },
    };
  },
});

export const readOutline = defineOperation({
  id: "readOutline",
  method: "GET",
  path: "/outlines/{id}",
  tag: "Fields",
  summary: "Read a stored outline",
  description: "The cleaned outline with its terminals and what was repaired.",
  scope: "field",
  request: { path: z.object({ id: z.string().max(64).meta({ description: "Id of the outline." }) }) },
  responses: { 200: { description: "The outline.", content: { "application/json": storedOutlineSchema } } },
  errors: ["not-found"],
  examples: [
    { name: "outline", summary: "A stored outline", status: 200, path: { id: "$outline" } },
    { name: "unknown", summary: "Unknown, or of another team", status: 404, path: { id: "out_0" } },
  ],
  handler: ({ path }, { service, principal }) => {
    const owner = requireOwner(principal, service.config.secret);
    const row = outlineOfOwner(service.db, owner, path.id);
    if (!row) throw new Refusal("not-found", "There is no outline of this id.");
    return json(200, outlineView(row));
  },
});
