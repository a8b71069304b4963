import { fieldById, fieldOfOwner, type FieldRow } from "@/db/queries/fields";
import { keyActor } from "@/lib/activity/append";
import { requireRecorder } from "@/lib/auth/access";
import { widgetComplaints } from "@/lib/embeds/enforce";
import type { PreparedField } from "@/lib/engine";
import { fieldView } from "@/lib/fields/field-view";
import { chargeOf, requireCaller, requireOwner } from "@/lib/fields/owner";
import { MOST_COMPUTATIONS } from "@/lib/jobs/field-cost";
import { isFinished } from "@/lib/jobs/field-jobs";
import { newId } from "@/lib/service/identifier";
import { Refusal } from "@/lib/service/refusal";
import { BASE_PATH } from "../base-path";
import { subjectOf } from "../call";
import { type CallContext, json, type Outcome } from "../operation";
import { preferredWait } from "../prefer";

/** A field solution of the caller; one of somebody else does not exist for it. */
export function callersField({ service, principal }: CallContext, id: string): FieldRow {
  const row = fieldOfOwner(service.db, requireOwner(principal, service.config.secret), id);
  if (row) return row;
  throw new Refusal("not-found", "There is no field solution of this id.");
}

export function viewOf(row: FieldRow) {
  return fieldView(row, (id) => `${BASE_PATH}/records/${id}`);
}

/** As the caller may see it: why it failed could tell a visitor what the widget hides. */
export function viewFor({ principal }: CallContext, row: FieldRow) {
  const view = viewOf(row);
  if (principal.kind !== "embed" || view.failure === undefined) return view;
  const [{ detail }] = widgetComplaints(principal.definition, [{ pointer: "#", detail: view.failure }]);
  return { ...view, failure: detail };
}

/** A guess at the work, for the order of the queue: vertices, and digits wanted. */
function sizeOf({ problem, request }: PreparedField): number {
  const vertices = problem.outline.rings.reduce((sum, ring) => sum + ring.arcs.length, 0);
  return Math.round(10 * vertices * Math.log10(request.accuracy) ** 2);
}

export interface FieldStart {
  readonly prepared: PreparedField;
  /** The materials that it names, as they are to be used. */
  readonly materials: readonly unknown[];
  readonly replayOf?: FieldRow["replayOf"];
}

/**
 * Stores a checked field solution and begins work on it. The call must have reserved MOST_COMPUTATIONS; the solution
 * settles them at its end, so the answer must hold them.
 */
export async function startField(
  context: CallContext,
  { prepared, materials, replayOf = null }: FieldStart,
): Promise<FieldRow> {
  const { service, principal, now, requestId } = context;
  const owner = requireOwner(principal, service.config.secret);
  const caller = requireCaller(principal);
  const { record } = prepared.request;
  const by = record && requireRecorder(principal);
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
      materials: [...materials],
      size: sizeOf(prepared),
      charge: chargeOf(caller, subjectOf(caller), MOST_COMPUTATIONS, now),
      record:
        record && by ? { label: record.label, teamId: by.teamId, actor: keyActor(by, requestId) } : null,
      replayOf,
    });
  });
  service.fields.start(id);
  return callersField(context, id);
}

/** Waits as long as the caller prefers to, and answers with the solution: 200 where it is finished, else 202. */
export async function answerField(context: CallContext, started: FieldRow): Promise<Outcome> {
  const { service, headers } = context;
  const { id } = started;
  const wait = preferredWait(headers);
  if (wait > 0) await service.fields.waitFor(id, wait * 1000);
  // Only another call that cancelled and deleted it can have taken it away; what it held was given back then.
  const row = fieldById(service.db, id) ?? { ...started, status: "cancelled", finishedAt: service.now() };
  return json(isFinished(row) ? 200 : 202, viewFor(context, row), {
    held: MOST_COMPUTATIONS,
    headers: {
      Location: `${BASE_PATH}/fields/${id}`,
      ...(wait > 0 ? { "Preference-Applied": `wait=${wait}` } : {}),
    },
  });
}
