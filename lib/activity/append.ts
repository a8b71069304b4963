import type { Database } from "@/db/client";
import { insertActivity } from "@/db/queries/activity";
import type { KeyPrincipal } from "../auth/principal";
import { newId } from "../service/identifier";

/** Who acts: a key by API, a person in the console, somebody on the shell, or the service itself. */
export interface Actor {
  readonly kind: "key" | "person" | "shell" | "service";
  readonly id: string;
  readonly name: string;
  readonly address: string | null;
  readonly requestId: string | null;
}

export interface Act {
  /** `key.issue`, `material.change` … */
  readonly action: string;
  readonly teamId: string | null;
  readonly subject: { readonly kind: string; readonly id: string };
  /** State before and after, without secrets. */
  readonly before?: unknown;
  readonly after?: unknown;
}

/** Appends an act to the activity. Call it in the transaction of the change itself. `at` is Unix ms. */
export function appendActivity(db: Database, actor: Actor, act: Act, at: number): void {
  insertActivity(db, {
    id: newId("act"),
    at,
    actorKind: actor.kind,
    actorId: actor.id,
    actorName: actor.name,
    teamId: act.teamId,
    action: act.action,
    subjectKind: act.subject.kind,
    subjectId: act.subject.id,
    before: act.before ?? null,
    after: act.after ?? null,
    address: actor.address,
    requestId: actor.requestId,
  });
}

/** Who acts by API: the key, or the person on whose page the call was made. */
export function keyActor(key: KeyPrincipal, requestId: string): Actor {
  const { person, address } = key;
  if (person) return { kind: "person", id: person.id, name: person.name, address, requestId };
  return { kind: "key", id: key.id, name: key.name, address: key.address, requestId };
}

export const SHELL: Actor = { kind: "shell", id: "shell", name: "shell", address: null, requestId: null };
