import { z } from "zod";
import { keyById, type KeyRow, listKeys as listRows } from "@/db/queries/keys";
import { keyActor } from "@/lib/activity/append";
import { requireKey } from "@/lib/auth/access";
import { LONGEST_OVERLAP_MS, parseDuration } from "@/lib/auth/duration";
import { requireWithinOwn } from "@/lib/auth/grant";
import { issueKey, keyView, revokeKey, rotateKey, type ShownKey } from "@/lib/auth/manage-keys";
import { Refusal } from "@/lib/service/refusal";
import { BASE_PATH } from "../base-path";
import { bodyRefusal } from "../body";
import { type CallContext, defineOperation, json } from "../operation";
import { cut, decodeCursor, page } from "../pagination";
import { keySchema, newKeySchema, rotatedKeySchema, rotationSchema, shownKeySchema } from "../schemas/key";
import { pageOf, pageQuery } from "../schemas/page";

const keyId = z.object({
  id: z.string().max(64).meta({ description: "Id of the key, the part after rho_." }),
});

function caller({ principal, requestId }: CallContext) {
  const key = requireKey(principal, "A key");
  return { key, actor: keyActor(key, requestId) };
}

/** A key of the caller's team; one of another team does not exist for it. */
function teamKey(context: CallContext, id: string): KeyRow {
  const row = keyById(context.service.db, id);
  if (row && row.teamId === caller(context).key.teamId) return row;
  throw new Refusal("not-found", "The team has no key of this id.");
}

export const listKeys = defineOperation({
  id: "listKeys",
  method: "GET",
  path: "/keys",
  tag: "Keys",
  summary: "List the team's keys",
  description: "Every key of the team, the newest first, revoked and expired ones included, without secrets.",
  scope: "keys:manage",
  request: { query: z.strictObject(pageQuery(100, 500)) },
  responses: {
    200: {
      description: "A page of keys.",
      content: { "application/json": pageOf(keySchema, "A page of keys.").meta({ id: "KeyPage" }) },
      headers: { Link: "The next page, where there is one." },
    },
  },
  errors: ["team-required"],
  examples: [{ name: "keys", summary: "The team's newest key", status: 200, query: { limit: "1" } }],
  handler: ({ query: { limit, cursor } }, context) => {
    const { teamId } = caller(context).key;
    const found = listRows(context.service.db, { teamId, limit: limit + 1, after: decodeCursor(cursor) });
    const { rows, next } = cut(found, limit, ({ createdAt, id }) => ({ at: createdAt, id }));
    return page(
      context.url,
      rows.map((row) => keyView(row, context.now)),
      next,
    );
  },
});

export const readKey = defineOperation({
  id: "readKey",
  method: "GET",
  path: "/keys/{id}",
  tag: "Keys",
  summary: "Read a key",
  description: "One key of the team, without its secret.",
  scope: "keys:manage",
  request: { path: keyId },
  responses: { 200: { description: "The key.", content: { "application/json": keySchema } } },
  errors: ["team-required", "not-found"],
  examples: [
    { name: "key", summary: "A key of the team", status: 200, path: { id: "$key" } },
    { name: "otherTeam", summary: "Unknown, or of another team", status: 404, path: { id: "k0" } },
  ],
  handler: ({ path }, context) => json(200, keyView(teamKey(context, path.id), context.now)),
});

/** The answer shows the key; what is kept for a repeat does not. */
function shown(status: number, { view, text }: ShownKey, more: object, headers: Record<string, string> = {}) {
  return json(status, { ...view, key: text, ...more }, { headers, repeat: { ...view, ...more } });
}

export const postKey = defineOperation({
  id: "issueKey",
  method: "POST",
  path: "/keys",
  tag: "Keys",
  summary: "Issue a key",
  description:
    "Issues a key for the caller's team. It can have no scope and no larger quota than the key that issues it. The whole key is in this answer and nowhere else; a repeat with the same `Idempotency-Key` answers without it.",
  scope: "keys:manage",
  request: { body: { description: "The key to issue.", schema: newKeySchema } },
  responses: {
    201: {
      description: "Issued.",
      content: { "application/json": shownKeySchema },
      headers: { Location: "Path of the key." },
    },
  },
  errors: ["team-required"],
  examples: [
    {
      name: "cadScripts",
      summary: "A key for scripts",
      status: 201,
      headers: { "Idempotency-Key": "cad-scripts" },
      body: {
        name: "CAD scripts",
        scopes: ["compute", "materials:read"],
        quotas: { minute: 120, month: 20_000 },
        expiresAt: "2035-01-01T00:00:00Z",
      },
    },
    {
      name: "forPages",
      summary: "A key for pages of one host",
      status: 201,
      body: { name: "Intranet", scopes: ["compute"], origins: ["https://intranet.merrow-pike.example"] },
    },
    {
      name: "unknownScope",
      summary: "A scope that does not exist",
      status: 422,
      body: { name: "CAD scripts", scopes: ["calculate"] },
    },
  ],
  stores: () => true,
  handler: ({ body }, context) => {
    const { key, actor } = caller(context);
    requireWithinOwn(key, body);
    return {
      commit: () => {
        const issued = issueKey(context.service.db, {
          teamId: key.teamId,
          settings: body,
          actor,
          now: context.now,
          largest: { minute: key.minuteQuota, month: key.monthQuota },
        });
        return shown(201, issued, {}, { Location: `${BASE_PATH}/keys/${issued.view.id}` });
      },
    };
  },
});

export const postRotation = defineOperation({
  id: "rotateKey",
  method: "POST",
  path: "/keys/{id}/rotate",
  tag: "Keys",
  summary: "Rotate a key",
  description:
    "Gives the key a new secret. The one before counts until `overlap` is over, so that programs can change over without a gap. A key with scopes that the caller lacks cannot be rotated by it.",
  scope: "keys:manage",
  request: {
    path: keyId,
    body: { description: "How long both secrets count.", schema: rotationSchema, optional: true },
  },
  responses: {
    200: { description: "Rotated.", content: { "application/json": rotatedKeySchema } },
  },
  errors: ["team-required", "not-found"],
  examples: [
    {
      name: "aWeek",
      summary: "With a week to change over",
      status: 200,
      path: { id: "$key" },
      body: { overlap: "7d" },
    },
    {
      name: "tooLong",
      summary: "An overlap too long",
      status: 422,
      path: { id: "$key" },
      body: { overlap: "400d" },
    },
  ],
  stores: () => true,
  handler: ({ path, body }, context) => {
    const { key, actor } = caller(context);
    const row = teamKey(context, path.id);
    requireWithinOwn(key, { scopes: row.scopes });
    const overlapMs = parseDuration(body.overlap ?? "0");
    if (overlapMs === undefined || overlapMs > LONGEST_OVERLAP_MS) {
      throw bodyRefusal([
        { pointer: "#/overlap", detail: 'must be a duration such as "12h" or "7d", at most "90d".' },
      ]);
    }
    return {
      commit: () => {
        const rotated = rotateKey(context.service.db, { id: row.id, actor, now: context.now, overlapMs });
        return shown(200, rotated, { previousUntil: rotated.previousUntil });
      },
    };
  },
});

export const deleteKey = defineOperation({
  id: "revokeKey",
  method: "DELETE",
  path: "/keys/{id}",
  tag: "Keys",
  summary: "Revoke a key",
  description: "Ends the key for the next request. It stays in the list for the usage that names it.",
  scope: "keys:manage",
  request: { path: keyId },
  responses: { 204: { description: "Revoked." } },
  errors: ["team-required", "not-found"],
  examples: [
    { name: "revoked", summary: "Over at once", status: 204, path: { id: "$oldKey" } },
    { name: "unknown", summary: "Unknown, or of another team", status: 404, path: { id: "k0" } },
  ],
  handler: ({ path }, context) => {
    const { actor } = caller(context);
    const row = teamKey(context, path.id);
    return {
      commit: () => {
        revokeKey(context.service.db, { id: row.id, actor, now: context.now });
        return { status: 204, content: { kind: "none" } };
      },
    };
  },
});
