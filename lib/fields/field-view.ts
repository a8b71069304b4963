import type { FieldRow, OutlineRow } from "@/db/queries/fields";
import type { CleanedOutline, FieldResult } from "@/lib/engine";
import { fieldDrift } from "./field-drift";

/** A field solution as it is answered. */
export function fieldView(row: FieldRow, recordUrl: (id: string) => string) {
  return {
    id: row.id,
    status: row.status,
    createdAt: new Date(row.createdAt).toISOString(),
    finishedAt: row.finishedAt === null ? null : new Date(row.finishedAt).toISOString(),
    progress: row.progress,
    result: row.result === null ? null : (JSON.parse(row.result) as unknown),
    ...(row.failure === null ? {} : { failure: row.failure }),
    ...(row.recordId === null ? {} : { record: { id: row.recordId, url: recordUrl(row.recordId) } }),
    ...(row.replayOf === null ? {} : { replay: replayView(row, row.replayOf, recordUrl) }),
  };
}

/** A replay beside what it repeats; drift and identity once it is finished. */
function replayView(
  { result }: FieldRow,
  { recordId, before }: NonNullable<FieldRow["replayOf"]>,
  recordUrl: (id: string) => string,
) {
  // Both were made by this application from results of the engine.
  const drift = result === null ? null : fieldDrift(before as FieldResult, JSON.parse(result) as FieldResult);
  return {
    record: { id: recordId, url: recordUrl(recordId) },
    before,
    drift: drift && drift.drift,
    identical: drift && drift.identical,
  };
}

export function contentOf(row: OutlineRow): CleanedOutline {
  // Written by this application only, from what `cleanOutline` made; the first ones had no names.
  const content = JSON.parse(row.content) as Omit<CleanedOutline, "name"> & { readonly name?: string };
  return { ...content, name: content.name ?? "" };
}

/** A stored outline as it is answered. */
export function outlineView(row: OutlineRow) {
  const { name, outline, terminals, repairs } = contentOf(row);
  return {
    id: row.id,
    name,
    createdAt: new Date(row.createdAt).toISOString(),
    outline,
    terminals,
    regions: [],
    repairs,
  };
}
