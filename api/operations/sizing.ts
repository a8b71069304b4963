import { z } from "zod";
import { keyActor } from "@/lib/activity/append";
import { outlineOfOwner } from "@/db/queries/fields";
import { requireAccess, requireKey } from "@/lib/auth/access";
import { computeSizing, MOST_FIELD_SOLUTIONS } from "@/lib/engine";
import { contentOf } from "@/lib/fields/field-view";
import { requireOwner } from "@/lib/fields/owner";
import { isFieldSizing, type SizedField, sizeField } from "@/lib/fields/size-field";
import { usableMaterial } from "@/lib/materials/team-materials";
import { storeRecord } from "@/lib/records/records";
import { Refusal } from "@/lib/service/refusal";
import { BASE_PATH } from "../base-path";
import { overdueAfter } from "../deadline";
import { type CallContext, defineOperation, json } from "../operation";
import { documentedSizingRequest } from "../schemas/resistance";
import { answeredSizing } from "../schemas/sizing";
import { bracketOutline, bracketTerminals, OUTLINE_MAX_BYTES } from "./outlines";
import { computationsOf } from "./resistance";

/** On a shape at once, on an outline by field solutions; with the materials and outlines that the caller may use. */
async function size(request: unknown, { service, principal }: CallContext): Promise<SizedField> {
  const { db, fields, config } = service;
  const teamId = principal.kind === "key" ? principal.teamId : undefined;
  const material = (id: string) => usableMaterial(db, teamId, id);
  if (!isFieldSizing(request)) {
    const result = computeSizing(request, { material, overdue: overdueAfter() });
    return { result, request, computations: computationsOf(request) };
  }
  const owner = requireOwner(principal, config.secret);
  if (!fields.hasRoom(owner)) {
    throw new Refusal("busy", "Too many field solutions are waiting; try again when some are finished.", {
      headers: { "Retry-After": "10" },
    });
  }
  return sizeField(request, {
    fields,
    material,
    outline: (id) => {
      const row = outlineOfOwner(db, owner, id);
      return row && contentOf(row);
    },
  });
}

/** The body's own members, if it is an object at all; everything in them is the engine's to check. */
const bodyMembers = z.object({ record: z.object({ label: z.string().min(1).max(200) }).optional() }).loose();

function asksForRecord(body: unknown): boolean {
  return typeof body === "object" && body !== null && "record" in body && body.record !== undefined;
}

const busbar = {
  shape: "bar",
  dimensions: { length: "1.2 m", thickness: "10 mm" },
  medium: { material: "copper-annealed" },
  operating: { temperature: "65 degC" },
  solveFor: "width",
  target: "50 uohm",
};

const track = {
  outline: bracketOutline,
  terminals: bracketTerminals,
  medium: { sheetResistance: "50 ohm/sq" },
  accuracy: 1e-4,
  solveFor: "scaleX",
  target: "500 ohm",
};

export const postSizing = defineOperation({
  id: "sizeDimension",
  method: "POST",
  path: "/sizing",
  tag: "Resistance",
  summary: "Find the dimension that gives a resistance",
  description:
    "The body of `POST /resistance` with one dimension left out, and beside it `solveFor`, `target` and optionally `within`. Answers every value of the dimension in the range that gives the target, each with its resistance and bounds and with what else the request asks for (`include`, `requirement`, `uncertainty`). Of a dimension that is a whole number the two on either side are answered where none gives the target exactly. None is a 422 that states the resistances at both ends. With `record` the sizing is stored for the team; then an `Idempotency-Key` counts. Needs the scope `compute`, and costs one computation of the month.\n\nOr the body of `POST /fields` with two terminals and `solveFor` one of `scaleX`, `scaleY` (the drawing is stretched one way) and `scale` (it is scaled evenly, and the thickness with it; a plan sheet does not change then). An expression stays where it is in metres. This needs the scope `field`, and costs one computation for each field solution made, at most 60. A refused request costs none.",
  // Which scope it takes depends on the body, which the handler looks at.
  scope: "any",
  request: {
    body: {
      description: "What to find.",
      schema: z.unknown(),
      documented: documentedSizingRequest,
      maxBytes: OUTLINE_MAX_BYTES,
    },
  },
  responses: {
    200: {
      description: "The solutions, smallest first.",
      content: { "application/json": answeredSizing },
      headers: { Location: "Path of the record, where one was stored." },
    },
  },
  errors: ["team-required"],
  examples: [
    {
      name: "busbarWidth",
      summary: "How wide a busbar must be for 50 µΩ at 65 °C",
      status: 200,
      body: { ...busbar, within: ["10 mm", "200 mm"] },
    },
    {
      name: "storedSizing",
      summary: "The same, stored as a record",
      status: 200,
      headers: { "Idempotency-Key": "busbar-width" },
      body: { ...busbar, record: { label: "Busbar width for 50 µΩ" } },
    },
    {
      name: "wholeNumber",
      summary: "How many strands: the two numbers on either side",
      status: 200,
      body: {
        shape: "stranded-conductor",
        dimensions: { length: "1 km", strandDiameter: "0.4 mm" },
        medium: { material: "copper-annealed" },
        include: [],
        solveFor: "strands",
        target: "3.08 ohm",
      },
    },
    {
      name: "stretchedTrack",
      summary: "How far a bent track must be stretched in x for 500 Ω",
      status: 200,
      body: track,
    },
    {
      name: "sheetUnderScale",
      summary: "A plan sheet does not change with an even scale",
      status: 422,
      body: { ...track, solveFor: "scale" },
    },
    {
      name: "outOfReach",
      summary: "A target that no width in the range gives",
      status: 422,
      body: { ...busbar, within: ["10 mm", "20 mm"] },
    },
    {
      name: "dimensionGiven",
      summary: "The dimension to find is given as well",
      status: 422,
      body: { ...busbar, dimensions: { ...busbar.dimensions, width: "50 mm" } },
    },
  ],
  reserve: ({ body }) => (isFieldSizing(body) ? MOST_FIELD_SOLUTIONS : computationsOf(body)),
  stores: ({ body }) => asksForRecord(body),
  handler: async ({ body }, context) => {
    requireAccess(context.principal, isFieldSizing(body) ? "field" : "compute");
    const by = asksForRecord(body) ? requireKey(context.principal, "A record") : undefined;
    const sized = await size(body, context);
    const { result, computations } = sized;
    const facts = { shape: result.shape, computations };
    if (!by) return json(200, result, facts);

    const { record } = bodyMembers.parse(body);
    const { record: _record, ...request } = bodyMembers.parse(sized.request);
    const actor = keyActor(by, context.requestId);
    return {
      commit: () => {
        const id = storeRecord(
          context.service.db,
          { teamId: by.teamId, actor, now: context.now },
          {
            operation: "sizing",
            label: record?.label ?? "",
            shape: result.shape ?? null,
            request,
            result,
            materials: result.materials,
          },
        );
        const url = `${BASE_PATH}/records/${id}`;
        return json(200, { ...result, record: { id, url } }, { ...facts, headers: { Location: url } });
      },
    };
  },
});
