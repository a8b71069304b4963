import { z } from "zod";
import { deleteField as deleteRow, outlineOfOwner } from "@/db/queries/fields";
import type { EmbedPrincipal } from "@/lib/auth/principal";
import { widgetComplaints, widgetRequest } from "@/lib/embeds/enforce";
import { InputError, prepareField } from "@/lib/engine";
import { contentOf } from "@/lib/fields/field-view";
import { outlineOwner } from "@/lib/fields/owner";
import { FIELD_COSTS, MOST_COMPUTATIONS } from "@/lib/jobs/field-cost";
import { isFinished } from "@/lib/jobs/field-jobs";
import { usableMaterial } from "@/lib/materials/team-materials";
import { type CallContext, defineOperation, json } from "../operation";
import { preferredWait } from "../prefer";
import { fieldRequest, fieldSchema } from "../schemas/field";
import { answerField, callersField, type FieldStart, startField, viewFor } from "./field-start";
import { bracketOutline, bracketTerminals, OUTLINE_MAX_BYTES } from "./outlines";

export const fieldId = z.object({
  id: z.string().max(64).meta({ description: "Id of the field solution." }),
});

/** Checks the body with what the caller may use; materials it names are kept as they are now. */
function prepare(body: unknown, { service, principal }: CallContext): FieldStart {
  const owner = outlineOwner(principal, service.config.secret);
  const teamId = principal.kind === "key" || principal.kind === "embed" ? principal.teamId : undefined;
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
  return { prepared, materials: [...materials.values()] };
}

/** The open values of a widget on an outline, with everything else as its version fixes it. */
function prepareWidget(body: unknown, context: CallContext, { definition }: EmbedPrincipal): FieldStart {
  const request = widgetRequest(definition, body);
  try {
    return prepare(request, context);
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    throw new InputError(widgetComplaints(definition, error.errors));
  }
}

/** The table of costs in words. */
function costTable(): string {
  return FIELD_COSTS.map(
    ({ upToUnknowns, computations }) =>
      `${computations} ${computations === 1 ? "computation" : "computations"} up to ${upToUnknowns.toLocaleString("en")} unknowns`,
  ).join(", ");
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
  description: `From any outline, its terminals and a medium to a resistance between a lower and an upper bound from two independent field solutions. Everything about the outline, the terminals and the medium is checked at once; then the solution runs as a job. \`Prefer: wait=N\` waits up to N seconds (at most 30) for its end: 200 if it is ready, else 202 with \`Location\`. It counts against the month by its unknowns: ${costTable()}; the most is reserved before, the rest given back at the end. One that is cancelled, refused or fails costs nothing.`,
  scope: "field",
  widgets: true,
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
      name: "onItsWay",
      summary: "Without a wait: where to ask",
      status: 202,
      headers: { "Idempotency-Key": "track-rev-b-field" },
      body: solve,
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
  handler: async ({ body }, context) => {
    const { principal } = context;
    const start =
      principal.kind === "embed" ? prepareWidget(body, context, principal) : prepare(body, context);
    return answerField(context, await startField(context, start));
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
  widgets: true,
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
    return json(200, viewFor(context, callersField(context, path.id)), {
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
  widgets: true,
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
