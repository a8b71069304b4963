import { z } from "zod";
import { keyActor } from "@/lib/activity/append";
import { requireKey } from "@/lib/auth/access";
import { statedUncertainty } from "@/lib/materials/stated-uncertainty";
import { materialChangeSchema, newMaterialSchema } from "@/lib/materials/input";
import { readMeasuredTable } from "@/lib/materials/measured-table";
import { changeMaterial, createMaterial, retireMaterial } from "@/lib/materials/team-materials";
import { BASE_PATH } from "../base-path";
import { bodyRefusal } from "../body";
import { ifMatchVersion, requiredVersion, versionTag } from "../if-match";
import { type CallContext, defineOperation, json } from "../operation";
import { materialAnswer, materialId, versionHeader } from "./materials";

const alloy = {
  name: "Contact bronze, lot 7",
  kind: "alloy",
  resistivity: { model: "linear", resistivity: 9.5e-8, coefficient: 0.0011, reference: 20 },
  range: { from: -40, to: 150 },
  uncertainty: { lower: 0.98, upper: 1.02, note: "Four-wire measurement, coverage factor 2." },
  source: "Incoming inspection, lot 7",
  provenance: "measured",
};

const measured = "temperature/degC,resistivity/uohm cm\n-40,8.87\n20,9.50\n100,10.34\n150,10.86\n";

/** Facts about a measured table that a CSV file has no place for. */
const tableFacts = {
  name: z
    .string()
    .optional()
    .meta({ description: "Name, for a table sent as text/csv.", example: "Contact bronze" }),
  kind: z.string().optional().meta({ description: "Kind, for a table sent as text/csv.", example: "alloy" }),
  source: z.string().optional().meta({ description: "Source, for a table sent as text/csv." }),
  uncertainty: z.string().optional().meta({
    description: "Uncertainty of the values, for a table sent as text/csv, such as `2 %`.",
    example: "2 %",
  }),
};

/** The material that a table of measurements and its facts in the query stand for. */
function fromCsv(text: string, query: URLSearchParams): unknown {
  const fact = (name: string) => query.get(name) ?? undefined;
  const uncertainty = fact("uncertainty");
  return {
    ...readMeasuredTable(text),
    name: fact("name"),
    kind: fact("kind"),
    source: fact("source"),
    uncertainty: uncertainty === undefined ? undefined : statedUncertainty(uncertainty),
    provenance: "measured",
  };
}

function write({ principal, requestId, now }: CallContext) {
  const key = requireKey(principal, "A material");
  return { teamId: key.teamId, actor: keyActor(key, requestId), now };
}

export const postMaterial = defineOperation({
  id: "createMaterial",
  method: "POST",
  path: "/materials",
  tag: "Materials",
  summary: "Create a material of the team",
  description:
    "Version 1 of a new material, usable in requests by its id at once. A measured table may be sent as `text/csv`: a header of two columns, temperature and resistivity or conductivity, with units (`temperature/degC,resistivity/ohm m`), a row a measurement; `name`, `kind`, `source` and `uncertainty` then stand in the query. `Idempotency-Key` counts.",
  scope: "materials:write",
  request: {
    query: z.strictObject(tableFacts),
    body: {
      description: "The material, or a measured table.",
      schema: newMaterialSchema.meta({ id: "NewMaterial" }),
      others: {
        "text/csv": {
          description: "A measured table.",
          documented: z.string().meta({ description: "Header and rows." }),
          read: fromCsv,
        },
      },
    },
  },
  responses: {
    201: {
      description: "Created.",
      content: { "application/json": materialAnswer },
      headers: { ...versionHeader, Location: "Path of the material." },
    },
  },
  errors: ["team-required"],
  examples: [
    { name: "alloy", summary: "A measured alloy", status: 201, body: alloy },
    {
      name: "measuredTable",
      summary: "A measured table as CSV",
      status: 201,
      query: {
        name: "Contact bronze, lot 8",
        kind: "alloy",
        source: "Incoming inspection, lot 8",
        uncertainty: "2 %",
      },
      mediaType: "text/csv",
      body: measured,
    },
    {
      name: "wrongCell",
      summary: "A table with a cell that is no resistivity",
      status: 422,
      query: {
        name: "Contact bronze, lot 8",
        kind: "alloy",
        source: "Incoming inspection, lot 8",
        uncertainty: "2 %",
      },
      mediaType: "text/csv",
      body: measured.replace("9.50", "n/a"),
    },
    {
      name: "noRange",
      summary: "Members are missing",
      status: 422,
      body: { ...alloy, range: undefined, source: undefined },
    },
  ],
  stores: () => true,
  handler: ({ body }, context) => {
    const by = write(context);
    return {
      commit: () => {
        const material = createMaterial(context.service.db, by, body);
        return json(201, material, {
          headers: { Location: `${BASE_PATH}/materials/${material.id}`, ETag: versionTag(material.version) },
        });
      },
    };
  },
});

export const patchMaterial = defineOperation({
  id: "changeMaterial",
  method: "PATCH",
  path: "/materials/{id}",
  tag: "Materials",
  summary: "Make the next version of a material",
  description:
    "Members that are sent replace those of the version named in `If-Match`; the others stay. Records keep the version they used.",
  scope: "materials:write",
  request: {
    path: materialId,
    body: {
      description: "The members to change.",
      schema: materialChangeSchema.meta({ id: "MaterialChange" }),
    },
  },
  responses: {
    200: {
      description: "The new version.",
      content: { "application/json": materialAnswer },
      headers: versionHeader,
    },
  },
  errors: [
    "team-required",
    "not-found",
    "library-read-only",
    "version-conflict",
    "precondition-required",
    "invalid-header",
  ],
  examples: [
    {
      name: "nextVersion",
      summary: "A better measurement",
      status: 200,
      path: { id: "$material" },
      headers: { "If-Match": "*" },
      body: { resistivity: { model: "linear", resistivity: 9.47e-8, coefficient: 0.00112, reference: 20 } },
    },
    {
      name: "conflict",
      summary: "Made from a version that is not the newest",
      status: 409,
      path: { id: "$material" },
      headers: { "If-Match": '"999"' },
      body: { note: "Second lot." },
    },
    {
      name: "noVersion",
      summary: "Without If-Match",
      status: 428,
      path: { id: "$material" },
      body: { note: "Second lot." },
    },
    {
      name: "library",
      summary: "The library cannot be changed",
      status: 403,
      path: { id: "copper-annealed" },
      headers: { "If-Match": '"1"' },
      body: { note: "Ours is better." },
    },
  ],
  handler: ({ path, body }, context) => {
    const by = write(context);
    const from = requiredVersion(context.headers);
    if (Object.keys(body).length === 0) {
      throw bodyRefusal([{ pointer: "#", detail: "must change at least one member." }]);
    }
    return {
      commit: () => {
        const material = changeMaterial(context.service.db, by, path.id, from, body);
        return json(200, material, { headers: { ETag: versionTag(material.version) } });
      },
    };
  },
});

export const deleteMaterial = defineOperation({
  id: "retireMaterial",
  method: "DELETE",
  path: "/materials/{id}",
  tag: "Materials",
  summary: "Retire a material",
  description:
    "Withdraws the material: it leaves the list and no request can use it any more. It stays readable by its id, and records that used it can still be replayed. `If-Match` is honoured if it is sent.",
  scope: "materials:write",
  request: { path: materialId },
  responses: { 204: { description: "Retired." } },
  errors: ["team-required", "not-found", "library-read-only", "version-conflict", "invalid-header"],
  examples: [
    { name: "retired", summary: "Out of use", status: 204, path: { id: "$oldMaterial" } },
    {
      name: "unknown",
      summary: "An id that the team does not have",
      status: 404,
      path: { id: "unobtainium" },
    },
  ],
  handler: ({ path }, context) => {
    const by = write(context);
    const from = ifMatchVersion(context.headers) ?? "any";
    return {
      commit: () => {
        retireMaterial(context.service.db, by, path.id, from);
        return { status: 204, content: { kind: "none" } };
      },
    };
  },
});
