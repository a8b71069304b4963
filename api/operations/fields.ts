import { z } from "zod";
import { deleteField as deleteRow, fieldOfOwner, type FieldRow, outlineOfOwner } from "@/db/queries/fields";
import { keyActor } from "@/lib/activity/append";
import { requireKey } from "@/lib/auth/access";
import { type PreparedField, prepareField } from "@/lib/engine";
import { contentOf, fieldView } from "@/lib/fields/field-view";
import { chargeOf, requireCaller, requireOwner } from "@/lib/fields/owner";
import { MOST_COMPUTATIONS } from "@/lib/jobs/field-cost";
import { isFinished } from "@/lib/jobs/field-jobs";
import { usableMaterial } from "@/lib/materials/team-materials";
import { newId } from "@/lib/service/identifier";
import { Refusal } from "@/lib/service/refusal";
import { BASE_PATH } from "../base-path";
import { subjectOf } from "../call";
import { type CallContext, defineOperation, json, type Outcome } from "../operation";
import { preferredWait } from "../prefer";
import { fieldRequest, fieldSchema } from "../schemas/field";
import { bracketOutline, bracketTerminals, OUTLINE_MAX_BYTES } from "./outlines";

export const fieldId = z.object({
  id: z.string().max(64).meta({ description: "Id of the field solution." }),
});

/** A field solution of the caller; one of somebody else does not exist for it. */
export function callersField({ service, principal }: CallContext, id: string): FieldRow {
  const row = fieldOfOwner(service.db, requireOwner(principal, service.config.secret), id);
  if (row) return row;
  throw new Refusal("not-found", "There is no field solution of this id.");
}

export function viewOf(row: FieldRow) {
  return fieldView(row, (id) => `${BASE_PATH}/records/${id}`);
}

/** A guess at the work, for the order of the queue: vertices, and digits wanted. */
function sizeOf({ problem, request }: PreparedField): number {
  const vertices = problem.outline.rings.reduce((sum, ring) => sum + ring.arcs.length, 0);
  return Math.round(10 * vertices * Math.log10(request.accuracy) ** 2);
}

/** Checks the body with what the caller may use; materials it names are kept as they are now. */
function prepare(body: unknown, context: CallContext) {
  const { service, principal } = context;
  const owner = requireOwner(principal, service.config.secret);
  const teamId = principal.kind === "key" ? principal.teamId : undefined;
  const materials = new Map<string, unknown>();
  const prepared = prepareField(body, {
    material: (id) => {
      const material = usableMaterial(service.db, teamId, id);
      if (material) materials.set(id, material);
      return material;
    },
    outline: (id) => {
      const row = outlineOfOwner(service.db, owner, id);
      return row && contentOf(row);
    },
  });
  return { owner, prepared, materials: [...materials.values()] };
}

async function start(body: unknown, context: CallContext): Promise<string> {
  const { service, now } = context;
  const { owner, prepared, materials } = prepare(body, context);
  const caller = requireCaller(context.principal);
  const { record } = prepared.request;
  const by = record && requireKey(context.principal, "A record");
  if (!service.fields.hasRoom(owner)) {
    throw new Refusal("busy", "Too many field solutions are waiting; try again when some are finished.", {
      headers: { "Retry-After": "10" },
    });
  }
  const id = newId("fld");
  await service.commits.run(() => {
    service.fields.insert({
      id,
      owner,
      createdAt: now,
      request: JSON.stringify(prepared.body),
      materials,
      size: sizeOf(prepared),
      charge: chargeOf(caller, subjectOf(caller), MOST_COMPUTATIONS, now),
      record:
        record && by
          ? { label: record.label, teamId: by.teamId, actor: keyActor(by, context.requestId) }
          : null,
    });
  });
  service.fields.start(id);
  return id;
}

const solve = {
  outline: bracketOutline,
  terminals: bracketTerminals,
  medium: { sheetResistance: "50 ohm/sq" },
};

export const postField = defineOperation({
  id: "solveField",
  method: "POST",
  path: "/fields",
  tag: "Fields",
  summary: "Solve the field on an outline",
  description:
    "From any outline, its terminals and a medium to a resistance between a lower and an upper bound from two independent field solutions. Everything about the outline, the terminals and the medium is checked at once; then the solution runs as a job. `Prefer: wait=N` waits up to N seconds (at most 30) for its end: 200 if it is ready, else 202 with `Location`. It counts against the month by its unknowns: 1 computation up to 20,000, 5 up to 100,000, 20 up to 500,000; the most is reserved before, the rest given back at the end.",
  scope: "field",
  request: {
    body: {
      description: "What to solve.",
      schema: z.unknown(),
      documented: () => fieldRequest,
      maxBytes: OUTLINE_MAX_BYTES,
    },
  },
  responses: {
    200: {
      description: "Finished within the time that the caller was ready to wait.",
      content: { "application/json": fieldSchema },
      headers: { Location: "Path of the solution.", "Preference-Applied": "The wait that was granted." },
    },
    202: {
      description: "On its way; ask for it at `Location`.",
      content: { "application/json": fieldSchema },
      headers: { Location: "Path of the solution.", "Preference-Applied": "The wait that was granted." },
    },
  },
  errors: ["team-required"],
  examples: [
    {
      name: "bentTrack",
      summary: "A bent track of 50 Ω a square, to 1e-6",
      status: 200,
      headers: { Prefer: "wait=20" },
      body: { ...solve, accuracy: 1e-6 },
    },
    {
      name: "terminalOffTheBoundary",
      summary: "A terminal that does not lie on the outline",
      status: 422,
      body: {
        ...solve,
        terminals: [
          bracketTerminals[0],
          {
            name: "out",
            segments: [
              [
                [11, 42],
                [0, 42],
              ],
            ],
          },
        ],
      },
    },
  ],
  reserve: () => MOST_COMPUTATIONS,
  stores: () => true,
  handler: async ({ body }, context): Promise<Outcome> => {
    const { service, principal, headers } = context;
    const wait = preferredWait(headers);
    const id = await start(body, context);
    if (wait > 0) await service.fields.waitFor(id, wait * 1000);
    const row = fieldOfOwner(service.db, requireOwner(principal, service.config.secret), id);
    if (!row) throw new Refusal("not-found", "The field solution was deleted while it was waited for.");
    return json(isFinished(row) ? 200 : 202, viewOf(row), {
      held: MOST_COMPUTATIONS,
      headers: {
        Location: `${BASE_PATH}/fields/${id}`,
        ...(wait > 0 ? { "Preference-Applied": `wait=${wait}` } : {}),
      },
    });
  },
});

export const readField = defineOperation({
  id: "readField",
  method: "GET",
  path: "/fields/{id}",
  tag: "Fields",
  summary: "Read a field solution",
  description:
    "Its status, the bracket so far and, once it is finished, the result. `Prefer: wait=N` waits up to N seconds (at most 30) for its end.",
  scope: "field",
  request: { path: fieldId },
  responses: { 200: { description: "The solution.", content: { "application/json": fieldSchema } } },
  errors: ["not-found"],
  examples: [
    { name: "solution", summary: "A finished solution", status: 200, path: { id: "$field" } },
    { name: "unknown", summary: "Unknown, or of another team", status: 404, path: { id: "fld_0" } },
  ],
  handler: async ({ path }, context) => {
    const wait = preferredWait(context.headers);
    if (wait > 0 && !isFinished(callersField(context, path.id))) {
      await context.service.fields.waitFor(path.id, wait * 1000);
    }
    return json(200, viewOf(callersField(context, path.id)), {
      headers: wait > 0 ? { "Preference-Applied": `wait=${wait}` } : {},
    });
  },
});

export const deleteField = defineOperation({
  id: "deleteField",
  method: "DELETE",
  path: "/fields/{id}",
  tag: "Fields",
  summary: "Cancel or delete a field solution",
  description:
    "Cancels one that waits or runs: its status becomes `cancelled` and what it reserved is given back. Deletes one that is finished.",
  scope: "field",
  request: { path: fieldId },
  responses: { 204: { description: "Cancelled or deleted." } },
  errors: ["not-found"],
  examples: [
    { name: "deleted", summary: "Gone", status: 204, path: { id: "$oldField" } },
    { name: "unknown", summary: "Unknown, or of another team", status: 404, path: { id: "fld_0" } },
  ],
  handler: async ({ path }, context) => {
    const { fields, db } = context.service;
    const row = callersField(context, path.id);
    if (isFinished(row) || !(await fields.cancel(row))) {
      await fields.files.remove(path.id);
      return {
        commit: () => {
          deleteRow(db, path.id);
          return { status: 204, content: { kind: "none" } };
        },
      };
    }
    return { status: 204, content: { kind: "none" } };
  },
});
