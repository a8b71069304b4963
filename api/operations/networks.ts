import { z } from "zod";
import { keyActor } from "@/lib/activity/append";
import { requireRecorder } from "@/lib/auth/access";
import { MOST_ELEMENTS, type NetworkResult, networkInStretches } from "@/lib/engine";
import { workInTurns } from "@/lib/jobs/in-turns";
import { usableMaterial } from "@/lib/materials/team-materials";
import { storeRecord } from "@/lib/records/records";
import { Refusal } from "@/lib/service/refusal";
import { BASE_PATH } from "../base-path";
import { overdueAfter } from "../deadline";
import { type CallContext, defineOperation, json } from "../operation";
import { answeredNetwork, documentedNetwork } from "../schemas/network";

/** Largest body of a network, bytes. */
export const NETWORK_MAX_BYTES = 20_000_000;

/** Longest that the uncertainties of all elements and of one may take: others wait during the one. */
const LONGEST_MS = 20_000;
const LONGEST_ELEMENT_MS = 1_000;

/** Only what has to be known before the work; everything is the engine's to check. */
const members = z.looseObject({ elements: z.array(z.unknown()) });
const recorded = z.looseObject({ record: z.object({ label: z.string() }).optional() });

/** Elements that are computed from a request, one computation each; a network of plain resistances is one. */
export function networkComputations(body: unknown): number {
  const parsed = members.safeParse(body);
  if (!parsed.success) return 1;
  const { elements } = parsed.data;
  if (elements.length > MOST_ELEMENTS) {
    throw new Refusal(
      "body-too-large",
      `The network has ${elements.length.toLocaleString("en")} elements; at most ${MOST_ELEMENTS.toLocaleString("en")} are taken.`,
    );
  }
  const computed = elements.filter(
    (element) => typeof element === "object" && element !== null && "request" in element,
  );
  return Math.max(1, computed.length);
}

function asksForRecord(body: unknown): boolean {
  return typeof body === "object" && body !== null && "record" in body && body.record !== undefined;
}

async function compute(body: unknown, { service, principal }: CallContext): Promise<NetworkResult> {
  const teamId = principal.kind === "key" ? principal.teamId : undefined;
  const known = new Map<string, ReturnType<typeof usableMaterial>>();
  const material = (id: string) => {
    if (!known.has(id)) known.set(id, usableMaterial(service.db, teamId, id));
    return known.get(id);
  };
  const whole = overdueAfter(LONGEST_MS);
  let stretch = whole;
  const work = networkInStretches(body, { material, overdue: () => stretch() || whole() });
  return workInTurns({
    next: () => {
      stretch = overdueAfter(LONGEST_ELEMENT_MS);
      return work.next();
    },
  });
}

const riser = {
  elements: [
    { name: "bar A", between: ["in", "joint"], resistance: "42 uohm" },
    {
      name: "bar B",
      between: ["in", "joint"],
      request: {
        shape: "bar",
        dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },
        medium: { material: "copper-annealed" },
      },
    },
    { name: "bolts", between: ["joint", "braid"], resistance: "6 uohm" },
    { name: "braid", between: ["braid", "out"], resistance: "18 uohm" },
  ],
  ports: ["in", "out"],
  operating: { current: "630 A", temperature: "65 degC" },
};

export const postNetwork = defineOperation({
  id: "solveNetwork",
  method: "POST",
  path: "/networks",
  tag: "Networks",
  summary: "Solve a network of resistances",
  description:
    "Elements between named nodes, each with a resistance or with a request that gives it, to the resistance between two ports, the voltage of every node, and what passes through every element: current, power, share of the loss, and by how much the whole rises when the element does. Bounds come from all elements at their lowest and at their highest. With `uncertainty` the tolerances of elements, those in their requests and the stated uncertainty of materials tell how far the whole strays, with a budget by element. At most 10,000 elements. With `record` the calculation is stored for the team; then an `Idempotency-Key` counts. Costs one computation, or one for each element with a request where there are more.",
  scope: "compute",
  request: {
    body: {
      description: "The network.",
      // The engine checks the body itself: it finds every mistake at once.
      schema: z.unknown(),
      documented: documentedNetwork,
      maxBytes: NETWORK_MAX_BYTES,
    },
  },
  responses: {
    200: {
      description: "The network's resistance, nodes and elements.",
      content: { "application/json": answeredNetwork },
      headers: { Location: "Path of the record, where one was stored." },
    },
  },
  errors: ["team-required"],
  examples: [
    {
      name: "riser",
      summary: "Two bars side by side, a bolted joint and a braid at 630 A",
      status: 200,
      body: riser,
    },
    {
      name: "toleranced",
      summary: "How far the path strays with its elements, and which one matters",
      status: 200,
      body: {
        ...riser,
        elements: [
          { ...riser.elements[0], resistance: { value: "42 uohm", tolerance: "5 %" } },
          ...riser.elements.slice(1, 3),
          { ...riser.elements[3], resistance: { value: "18 uohm", plus: "6 uohm" } },
        ],
        uncertainty: { method: "propagation" },
      },
    },
    {
      name: "storedRecord",
      summary: "The same, stored as a record",
      status: 200,
      headers: { "Idempotency-Key": "riser-path" },
      body: { ...riser, record: { label: "Riser, whole path" } },
    },
    {
      name: "island",
      summary: "An element that nothing joins to the ports",
      status: 422,
      body: {
        ...riser,
        elements: [...riser.elements, { name: "bar C", between: ["inn", "joimt"], resistance: "42 uohm" }],
      },
    },
    {
      name: "noSuchPort",
      summary: "A port that is no node, a name that is used twice",
      status: 422,
      body: { ...riser, elements: [...riser.elements, riser.elements[0]], ports: ["in", "outt"] },
    },
  ],
  reserve: ({ body }) => networkComputations(body),
  stores: ({ body }) => asksForRecord(body),
  handler: async ({ body }, context) => {
    const by = asksForRecord(body) ? requireRecorder(context.principal) : undefined;
    const result = await compute(body, context);
    const facts = { computations: networkComputations(body) };
    if (!by) return json(200, result, facts);

    const { record, ...request } = recorded.parse(body);
    const actor = keyActor(by, context.requestId);
    return {
      commit: () => {
        const id = storeRecord(
          context.service.db,
          { teamId: by.teamId, actor, now: context.now },
          {
            operation: "network",
            label: record?.label ?? "",
            shape: null,
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
