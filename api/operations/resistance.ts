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
import { overdueAfter } from "../deadline";
import type { Example } from "../documentation";
import { type CallContext, defineOperation, json, type Outcome } from "../operation";
import { answeredResistance, documentedResistanceRequest } from "../schemas/resistance";

/** Computes with the materials that the caller may use. */
export function compute(request: unknown, { service, principal }: CallContext): ResistanceResult {
  const teamId = principal.kind === "key" || principal.kind === "embed" ? principal.teamId : undefined;
  return computeResistance(request, {
    material: (id) => usableMaterial(service.db, teamId, id),
    overdue: overdueAfter(),
  });
}

/** Trials of one computation of the month. */
const TRIALS_A_COMPUTATION = 100_000;

/** Computations that a request costs: one, and one more for each further 100,000 trials begun. */
export function computationsOf(body: unknown): number {
  const trials = manyTrials.safeParse(body);
  return trials.success ? Math.ceil(trials.data.uncertainty.trials / TRIALS_A_COMPUTATION) : 1;
}

const manyTrials = z.object({
  uncertainty: z.object({ method: z.literal("monte-carlo"), trials: z.int().min(1).max(1_000_000) }),
});

/** The open values of a widget, with everything else as its version fixes it. */
function computeWidget(body: unknown, context: CallContext, { definition }: EmbedPrincipal): Outcome {
  const request = widgetRequest(definition, body);
  try {
    const result = compute(request, context);
    return json(200, result, { shape: result.shape, computations: computationsOf(request) });
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

const busbar = {
  shape: "bar",
  dimensions: {
    length: { value: "1.2 m", tolerance: "2 mm" },
    width: { value: "50 mm", tolerance: "0.4 mm", distribution: "normal" },
    thickness: { value: "10 mm", plus: "0 mm", minus: "0.2 mm" },
  },
  medium: { material: "copper-annealed" },
  operating: { temperature: { value: 65, tolerance: "5 K" } },
  requirement: { max: "60 uohm" },
  uncertainty: { method: "worst-case" },
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
  {
    name: "toleranceTooLarge",
    summary: "A tolerance that lets a length vanish",
    status: 422,
    body: {
      ...busbar,
      dimensions: { ...busbar.dimensions, thickness: { value: "1 mm", tolerance: "1 mm" } },
    },
  },
];

export const postResistance = defineOperation({
  id: "computeResistance",
  method: "POST",
  path: "/resistance",
  tag: "Resistance",
  summary: "Compute one resistance",
  description:
    "From a shape, a medium and two terminals to a DC resistance with bounds: how it was computed, what it assumes, which cautions apply, and the engine's checks on this very answer. With `record` the calculation is stored for the team and can be replayed later; then an `Idempotency-Key` counts. A dimension, a value of the medium and the temperature may be an object with a tolerance; with `uncertainty` the answer tells how far the resistance strays, the stated uncertainty of the materials included, and what each input contributes. Without `uncertainty` the nominal values alone count. Costs one computation of the month, by Monte Carlo one for each 100,000 trials begun; a refused request costs none.",
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
    {
      name: "tolerances",
      summary: "A busbar with tolerances: how far its resistance strays, held against a requirement",
      status: 200,
      body: busbar,
    },
    {
      name: "monteCarlo",
      summary: "The same by Monte Carlo, repeatable by its seed",
      status: 200,
      body: { ...busbar, include: [], uncertainty: { method: "monte-carlo", trials: 20_000, seed: 7 } },
    },
    ...catalogue.map((shape): Example => ({
      name: shape.id.replace(/-(.)/g, (_, letter: string) => letter.toUpperCase()),
      summary: shape.title,
      status: 200,
      body: exampleRequest(shape),
    })),
    ...mistakes,
  ],
  reserve: ({ body }) => computationsOf(body),
  stores: ({ body }) => asksForRecord(body),
  handler: ({ body }, context) => {
    if (context.principal.kind === "embed") return computeWidget(body, context, context.principal);
    const by = asksForRecord(body) ? requireRecorder(context.principal) : undefined;
    const result = compute(body, context);
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
