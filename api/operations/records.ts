import { z } from "zod";
import { listRecords as listRows } from "@/db/queries/records";
import { keyActor } from "@/lib/activity/append";
import { requireKey, requireRecorder } from "@/lib/auth/access";
import { MOST_FIELD_SOLUTIONS } from "@/lib/engine";
import { prepareReplay } from "@/lib/fields/replay-field";
import { isFieldSizing } from "@/lib/fields/size-field";
import { MOST_COMPUTATIONS } from "@/lib/jobs/field-cost";
import { recordView, relabel, removeRecord, teamRecord } from "@/lib/records/records";
import { replayResistance, replaySizing } from "@/lib/records/replay";
import { replayNetwork } from "@/lib/records/replay-network";
import { type CallContext, defineOperation, json } from "../operation";
import { decodeCursor, encodeCursor, page } from "../pagination";
import { fieldSchema } from "../schemas/field";
import { pageOf, pageQuery } from "../schemas/page";
import { recordSchema, relabelSchema, replaySchema } from "../schemas/record";
import { answerField, startField } from "./field-start";
import { networkComputations } from "./networks";
import { computationsOf } from "./resistance";

/** Requests and results of one page together, characters; a page ends early where they would be more. */
const LARGEST_PAGE = 2_000_000;

const recordId = z.object({ id: z.string().max(64).meta({ description: "Id of the record." }) });

function write({ principal, requestId, now }: CallContext) {
  const key = requireRecorder(principal);
  return { teamId: key.teamId, actor: keyActor(key, requestId), now };
}

export const listRecords = defineOperation({
  id: "listRecords",
  method: "GET",
  path: "/records",
  tag: "Records",
  summary: "List stored calculations",
  description:
    "The team's records, newest first. A page may end before its limit where the records are large.",
  scope: "records:read",
  request: {
    query: z.strictObject({
      ...pageQuery(25, 100),
      operation: z
        .string()
        .max(40)
        .optional()
        .meta({ description: "Only those of one operation.", example: "field" }),
      shape: z.string().max(64).optional().meta({ description: "Only those of one shape.", example: "bar" }),
      search: z.string().max(200).optional().meta({ description: "Part of the label.", example: "rev C" }),
    }),
  },
  responses: {
    200: {
      description: "A page of records.",
      content: { "application/json": pageOf(recordSchema, "A page of records.").meta({ id: "RecordPage" }) },
      headers: { Link: "The next page, where there is one." },
    },
  },
  errors: ["team-required"],
  examples: [{ name: "search", summary: "By label", status: 200, query: { search: "rev C", limit: "1" } }],
  handler: ({ query: { limit, cursor, operation, shape, search } }, { service, principal, url }) => {
    const { teamId } = requireKey(principal, "A record");
    const { rows, more } = listRows(service.db, teamId, {
      limit,
      after: decodeCursor(cursor),
      operation,
      shape,
      search,
      maxChars: LARGEST_PAGE,
    });
    const last = rows[rows.length - 1];
    return page(
      url,
      rows.map(recordView),
      more && last ? encodeCursor({ at: last.createdAt, id: last.id }) : null,
    );
  },
});

export const readRecord = defineOperation({
  id: "readRecord",
  method: "GET",
  path: "/records/{id}",
  tag: "Records",
  summary: "Read a record",
  description: "What was asked, what came out, and with which versions of materials and engine.",
  scope: "records:read",
  request: { path: recordId },
  responses: { 200: { description: "The record.", content: { "application/json": recordSchema } } },
  errors: ["team-required", "not-found"],
  examples: [
    { name: "record", summary: "A stored calculation", status: 200, path: { id: "$record" } },
    { name: "otherTeam", summary: "Unknown, or of another team", status: 404, path: { id: "rec_0" } },
  ],
  handler: ({ path }, { service, principal }) => {
    const { teamId } = requireKey(principal, "A record");
    return json(200, recordView(teamRecord(service.db, teamId, path.id)));
  },
});

export const patchRecord = defineOperation({
  id: "relabelRecord",
  method: "PATCH",
  path: "/records/{id}",
  tag: "Records",
  summary: "Relabel a record",
  description: "Changes the label; nothing else of a record can change.",
  scope: "compute",
  request: { path: recordId, body: { description: "The new label.", schema: relabelSchema } },
  responses: { 200: { description: "The record.", content: { "application/json": recordSchema } } },
  errors: ["team-required", "not-found"],
  examples: [
    {
      name: "relabelled",
      summary: "The next revision",
      status: 200,
      path: { id: "$record" },
      body: { label: "Sleeve, rev C, approved" },
    },
    {
      name: "otherMember",
      summary: "Only the label changes",
      status: 422,
      path: { id: "$record" },
      body: { lable: "x" },
    },
  ],
  handler: ({ path, body }, context) => {
    const by = write(context);
    return { commit: () => json(200, relabel(context.service.db, by, path.id, body.label)) };
  },
});

export const deleteRecord = defineOperation({
  id: "deleteRecord",
  method: "DELETE",
  path: "/records/{id}",
  tag: "Records",
  summary: "Delete a record",
  description: "Removes the record for good; the activity keeps who did it and when.",
  scope: "compute",
  request: { path: recordId },
  responses: { 204: { description: "Deleted." } },
  errors: ["team-required", "not-found"],
  examples: [
    { name: "deleted", summary: "Gone", status: 204, path: { id: "$oldRecord" } },
    { name: "unknown", summary: "Unknown, or of another team", status: 404, path: { id: "rec_0" } },
  ],
  handler: ({ path }, context) => {
    const by = write(context);
    return {
      commit: () => {
        removeRecord(context.service.db, by, path.id);
        return { status: 204, content: { kind: "none" } };
      },
    };
  },
});

export const replayRecord = defineOperation({
  id: "replayRecord",
  method: "POST",
  path: "/records/{id}/replay",
  tag: "Records",
  summary: "Replay a record",
  description:
    "Computes the record again with today's engine and the material versions it pinned, and shows the drift. It stores no record. A resistance and a sizing cost what they did. A field solution is answered, and costs, as `POST /fields` does: `Prefer: wait=N` waits for its end, 202 has its `Location`, and `replay` in it shows the drift once it is finished; reading it later takes the scope `field`.",
  scope: "compute",
  request: { path: recordId },
  responses: {
    200: {
      description: "Before and now; for a field solution, the finished solution with its `replay`.",
      content: { "application/json": z.union([replaySchema, fieldSchema]) },
    },
    202: {
      description: "A field solution on its way; ask for it at `Location`.",
      content: { "application/json": fieldSchema },
      headers: { Location: "Path of the solution.", "Preference-Applied": "The wait that was granted." },
    },
  },
  errors: ["team-required", "not-found"],
  examples: [
    {
      name: "replayed",
      summary: "The same engine gives the same number",
      status: 200,
      path: { id: "$record" },
    },
    {
      name: "fieldReplayed",
      summary: "A field solution, solved again",
      status: 200,
      headers: { Prefer: "wait=20" },
      path: { id: "$fieldRecord" },
    },
    {
      name: "fieldStarted",
      summary: "A field solution, on its way",
      status: 202,
      path: { id: "$fieldRecord" },
    },
  ],
  // What it costs is known once the record is read.
  reserve: () => 0,
  handler: async ({ path }, context) => {
    const { service, principal } = context;
    const { teamId } = requireKey(principal, "A record");
    const row = teamRecord(service.db, teamId, path.id);
    if (row.operation === "field") {
      const replay = prepareReplay(service.db, row);
      await context.reserve(MOST_COMPUTATIONS);
      return answerField(context, await startField(context, replay));
    }
    if (row.operation === "network") {
      const costs = networkComputations(JSON.parse(row.request));
      await context.reserve(costs);
      return json(200, await replayNetwork(service.db, row), { computations: costs });
    }
    if (row.operation === "sizing") {
      const request: unknown = JSON.parse(row.request);
      await context.reserve(isFieldSizing(request) ? MOST_FIELD_SOLUTIONS : computationsOf(request));
      const { computations, ...replay } = await replaySizing(service.db, service.fields, row);
      const costs = isFieldSizing(request) ? computations : computationsOf(request);
      return json(200, replay, { shape: replay.now.shape, computations: costs });
    }
    const costs = computationsOf(JSON.parse(row.request));
    await context.reserve(costs);
    const replay = replayResistance(service.db, row);
    return json(200, replay, { shape: replay.now.shape, computations: costs });
  },
});
