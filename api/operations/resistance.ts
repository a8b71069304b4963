import { z } from "zod";
import { keyActor } from "@/lib/activity/append";
import { requireRecorder } from "@/lib/auth/access";
import {
  catalogue,
  computeResistance,
  exampleRequest,
  InputError,
  type ResistanceResult,
} from "@/lib/engine";
import type { EmbedPrincipal } from "@/lib/auth/principal";
import { widgetComplaints, widgetRequest } from "@/lib/embeds/enforce";
import { usableMaterial } from "@/lib/materials/team-materials";
import { storeRecord } from "@/lib/records/records";
import { BASE_PATH } from "../base-path";
import type { Example } from "../documentation";
import { type CallContext, defineOperation, json, type Outcome } from "../operation";
import { answeredResistance, documentedResistanceRequest } from "../schemas/resistance";

/** Computes with the materials that the caller may use. */
export function compute(request: unknown, { service, principal }: CallContext): ResistanceResult {
  const teamId = principal.kind === "key" || principal.kind === "embed" ? principal.teamId : undefined;
  return computeResistance(request, { material: (id) => usableMaterial(service.db, teamId, id) });
}

/** The open values of a widget, with everything else as its version fixes it. */
function computeWidget(body: unknown, context: CallContext, { definition }: EmbedPrincipal): Outcome {
  const request = widgetRequest(definition, body);
  try {
    const result = compute(request, context);
    return json(200, result, { shape: result.shape, computations: 1 });
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    throw new InputError(widgetComplaints(definition, error.errors));
  }
}

/** The body's own members, if it is an object at all; everything in them is the engine's to check. */
const bodyMembers = z.object({ record: z.object({ label: z.string() }).optional() }).loose();

function asksForRecord(body: unknown): boolean {
  return typeof body === "object" && body !== null && "record" in body && body.record !== undefined;
}

const sleeve = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
  operating: { temperature: "75 degC", voltage: "500 V" },
};

const mistakes: readonly Example[] = [
  {
    name: "unknownShape",
    summary: "A misspelt shape",
    status: 422,
    body: { ...sleeve, shape: "cylindrical-shel" },
  },
  {
    name: "severalMistakes",
    summary: "Every mistake is told at once",
    status: 422,
    body: { ...sleeve, dimensions: { innerRadius: "5 kg", length: "0 m", outerRadius: "5 mm", depth: 1 } },
  },
  {
    name: "innerBeyondOuter",
    summary: "Dimensions that contradict each other",
    status: 422,
    body: { ...sleeve, dimensions: { innerRadius: "6 mm", outerRadius: "5 mm", length: "1 m" } },
  },
  {
    name: "twoMedia",
    summary: "More than one medium",
    status: 422,
    body: { ...sleeve, medium: { conductivity: 1e-12, material: "copper-annealed" } },
  },
];

export const postResistance = defineOperation({
  id: "computeResistance",
  method: "POST",
  path: "/resistance",
  tag: "Resistance",
  summary: "Compute one resistance",
  description:
    "From a shape, a medium and two terminals to a DC resistance with bounds: how it was computed, what it assumes, which cautions apply, and the engine's checks on this very answer. With `record` the calculation is stored for the team and can be replayed later; then an `Idempotency-Key` counts. Costs one computation of the month; a refused request costs none.",
  scope: "compute",
  widgets: true,
  request: {
    body: {
      description: "What to compute.",
      // The engine checks the body itself: it knows the shape's dimensions and finds every mistake at once.
      schema: z.unknown(),
      documented: documentedResistanceRequest,
    },
  },
  responses: {
    200: {
      description: "The resistance.",
      content: { "application/json": answeredResistance },
      headers: { Location: "Path of the record, where one was stored." },
    },
  },
  errors: ["team-required"],
  examples: [
    {
      name: "insulatingSleeve",
      summary: "Leakage through an insulating sleeve at 500 V, with the steps",
      status: 200,
      body: { ...sleeve, include: ["steps", "checks", "peak"] },
    },
    {
      name: "storedRecord",
      summary: "The same, stored as a record",
      status: 200,
      headers: { "Idempotency-Key": "sleeve-rev-c" },
      body: { ...sleeve, record: { label: "Sleeve, rev C" } },
    },
    ...catalogue.map((shape): Example => ({
      name: shape.id.replace(/-(.)/g, (_, letter: string) => letter.toUpperCase()),
      summary: shape.title,
      status: 200,
      body: exampleRequest(shape),
    })),
    ...mistakes,
  ],
  reserve: () => 1,
  stores: ({ body }) => asksForRecord(body),
  handler: ({ body }, context) => {
    if (context.principal.kind === "embed") return computeWidget(body, context, context.principal);
    const by = asksForRecord(body) ? requireRecorder(context.principal) : undefined;
    const result = compute(body, context);
    const facts = { shape: result.shape, computations: 1 };
    if (!by) return json(200, result, facts);

    const { record, ...request } = bodyMembers.parse(body);
    const actor = keyActor(by, context.requestId);
    return {
      commit: () => {
        const id = storeRecord(
          context.service.db,
          { teamId: by.teamId, actor, now: context.now },
          {
            operation: "resistance",
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
