import { z } from "zod";
import { keyActor } from "@/lib/activity/append";
import { requireKey } from "@/lib/auth/access";
import { computeSizing, type SizingResult } from "@/lib/engine";
import { usableMaterial } from "@/lib/materials/team-materials";
import { storeRecord } from "@/lib/records/records";
import { BASE_PATH } from "../base-path";
import { overdueAfter } from "../deadline";
import { type CallContext, defineOperation, json } from "../operation";
import { documentedSizingRequest } from "../schemas/resistance";
import { answeredSizing } from "../schemas/sizing";
import { computationsOf } from "./resistance";

function size(request: unknown, { service, principal }: CallContext): SizingResult {
  const teamId = principal.kind === "key" ? principal.teamId : undefined;
  return computeSizing(request, {
    material: (id) => usableMaterial(service.db, teamId, id),
    overdue: overdueAfter(),
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

export const postSizing = defineOperation({
  id: "sizeDimension",
  method: "POST",
  path: "/sizing",
  tag: "Resistance",
  summary: "Find the dimension that gives a resistance",
  description:
    "The body of `POST /resistance` with one dimension left out, and beside it `solveFor`, `target` and optionally `within`. Answers every value of the dimension in the range that gives the target, each with its resistance and bounds and with what else the request asks for (`include`, `requirement`, `uncertainty`). Of a dimension that is a whole number the two on either side are answered where none gives the target exactly. None is a 422 that states the resistances at both ends. With `record` the sizing is stored for the team; then an `Idempotency-Key` counts. Costs one computation of the month; a refused request costs none.",
  scope: "compute",
  request: {
    body: { description: "What to find.", schema: z.unknown(), documented: documentedSizingRequest },
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
  reserve: ({ body }) => computationsOf(body),
  stores: ({ body }) => asksForRecord(body),
  handler: ({ body }, context) => {
    const by = asksForRecord(body) ? requireKey(context.principal, "A record") : undefined;
    const result = size(body, context);
    const facts = { shape: result.shape, computations: computationsOf(body) };
    if (!by) return json(200, result, facts);

    const { record, ...request } = bodyMembers.parse(body);
    const actor = keyActor(by, context.requestId);
    return {
      commit: () => {
        const id = storeRecord(
          context.service.db,
          { teamId: by.teamId, actor, now: context.now },
          {
            operation: "sizing",
            label: record?.label ?? "",
            shape: result.shape,
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
