import { transact, type Database } from "@/db/client";
import {
  deleteRecord,
  insertRecord,
  recordOfTeam,
  type RecordRow,
  relabelRecord,
} from "@/db/queries/records";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "@/lib/engine";
import { type Actor, appendActivity } from "../activity/append";
import { newId } from "../service/identifier";
import { Refusal } from "../service/refusal";

/** A record as it is answered. */
export interface RecordView {
  readonly id: string;
  readonly operation: string;
  readonly label: string;
  readonly createdAt: string;
  readonly by: { readonly kind: string; readonly id: string; readonly name: string };
  readonly request: unknown;
  readonly result: unknown;
  readonly materials: readonly { readonly id: string; readonly version: number }[];
  readonly engine: string;
  readonly catalogue: string;
}

export function recordView(row: RecordRow): RecordView {
  return {
    id: row.id,
    operation: row.operation,
    label: row.label,
    createdAt: new Date(row.createdAt).toISOString(),
    by: { kind: row.byKind, id: row.byId, name: row.byName },
    request: JSON.parse(row.request),
    result: JSON.parse(row.result),
    materials: row.materials,
    engine: row.engine,
    catalogue: row.catalogue,
  };
}

/** What a computation hands over to be stored. */
export interface NewRecord {
  readonly operation: string;
  readonly label: string;
  readonly shape: string | null;
  /** The request without `record`, the result as it is answered without it. */
  readonly request: unknown;
  readonly result: unknown;
  readonly materials: readonly { readonly id: string; readonly version: number }[];
}

/** Stores a calculation; call it in the transaction of the call. */
export function storeRecord(
  db: Database,
  by: { readonly teamId: string; readonly actor: Actor; readonly now: number },
  record: NewRecord,
): string {
  const id = newId("rec");
  insertRecord(db, {
    id,
    teamId: by.teamId,
    operation: record.operation,
    label: record.label,
    shape: record.shape,
    createdAt: by.now,
    byKind: by.actor.kind,
    byId: by.actor.id,
    byName: by.actor.name,
    request: JSON.stringify(record.request),
    result: JSON.stringify(record.result),
    materials: record.materials.map(({ id, version }) => ({ id, version })),
    engine: ENGINE_VERSION,
    catalogue: CATALOGUE_VERSION,
  });
  return id;
}

/** A record of the team. Refuses what does not exist and what another team owns alike. */
export function teamRecord(db: Database, teamId: string, id: string): RecordRow {
  const row = recordOfTeam(db, teamId, id);
  if (!row) throw new Refusal("not-found", "The team has no record of this id.");
  return row;
}

interface Write {
  readonly teamId: string;
  readonly actor: Actor;
  readonly now: number;
}

export function relabel(db: Database, { teamId, actor, now }: Write, id: string, label: string): RecordView {
  return transact(db, () => {
    const before = teamRecord(db, teamId, id);
    relabelRecord(db, id, label);
    appendActivity(
      db,
      actor,
      {
        action: "record.relabel",
        teamId,
        subject: { kind: "record", id },
        before: { label: before.label },
        after: { label },
      },
      now,
    );
    return recordView({ ...before, label });
  });
}

export function removeRecord(db: Database, { teamId, actor, now }: Write, id: string): void {
  transact(db, () => {
    const before = teamRecord(db, teamId, id);
    deleteRecord(db, id);
    const { operation, label, shape, createdAt, byName } = before;
    appendActivity(
      db,
      actor,
      {
        action: "record.delete",
        teamId,
        subject: { kind: "record", id },
        before: { operation, label, shape, createdAt, byName },
      },
      now,
    );
  });
}
