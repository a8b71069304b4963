import type { Database } from "@/db/client";
import { embedById } from "@/db/queries/embeds";
import { keyById } from "@/db/queries/keys";
import { personById } from "@/db/queries/people";
import { SIGNED_OUT_ID } from "../auth/principal";

/** Who called, as usage counts it. */
export interface Caller {
  readonly id: string;
  readonly kind: "key" | "pages" | "embed" | "signed-out";
  readonly name: string;
}

/** What the ids under which usage is counted stand for: a key, a person's pages, an embed, pages nobody is signed in to. */
export function callerNames(db: Database): (id: string) => Caller {
  const known = new Map<string, Caller>();
  return (id) => {
    let caller = known.get(id);
    if (!caller) known.set(id, (caller = nameOf(db, id)));
    return caller;
  };
}

function nameOf(db: Database, id: string): Caller {
  if (id === SIGNED_OUT_ID) return { id, kind: "signed-out", name: "Pages, signed out" };
  const key = keyById(db, id);
  if (key) return { id, kind: "key", name: key.name };
  const [personId, teamId] = id.split(":");
  if (teamId !== undefined) {
    return { id, kind: "pages", name: `Pages of ${personById(db, personId)?.name ?? "a former member"}` };
  }
  const embed = embedById(db, id);
  return { id, kind: "embed", name: embed ? `Embed ${embed.name}` : id };
}
