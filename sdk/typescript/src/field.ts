import type { Client } from "./generated/client/index.js";
import { deleteField, readField, solveField } from "./generated/sdk.gen.js";
import type { Field, FieldRequest } from "./generated/types.gen.js";
import { pause } from "./persistent-fetch.js";

/** A bracket on the way: ohms, and how much was solved for it. */
export type FieldProgress = NonNullable<Field["progress"]>;

export interface RunFieldOptions {
  readonly client: Client;
  readonly body: FieldRequest;
  /** Called with each new bracket, and the state it came with; not before there is one. */
  readonly onProgress?: (progress: FieldProgress, field: Field) => void;
  /** An abort cancels the solution, and the call throws the signal's reason. */
  readonly signal?: AbortSignal;
  /** Time between two looks, ms; 500 where left out. */
  readonly everyMs?: number;
}

/** Whether a field solution has ended, one way or another. */
export function hasEnded({ status }: Field): boolean {
  return status !== "queued" && status !== "running";
}

/**
 * Solves a field and waits for its end: "done", or "limited" where a cap was met and the bracket reached stands.
 * "failed" and "cancelled" are ends too; look at `status`.
 */
export async function runField(options: RunFieldOptions): Promise<Field> {
  const { client, body, onProgress, signal = new AbortController().signal, everyMs = 500 } = options;
  let field = await solveField({ client, body, signal });
  let told = "null";
  const tell = () => {
    const news = JSON.stringify(field.progress);
    if (field.progress && news !== told) onProgress?.(field.progress, field);
    told = news;
  };
  tell();
  try {
    while (!hasEnded(field)) {
      await pause(everyMs, signal);
      field = await readField({ client, path: { id: field.id }, signal });
      tell();
    }
  } catch (error) {
    if (signal.aborted) await cancelField({ client, id: field.id });
    throw error;
  }
  return field;
}

/** Cancels a solution that waits or runs; one that has ended stays as it is. */
export async function cancelField({
  client,
  id,
}: {
  readonly client: Client;
  readonly id: string;
}): Promise<void> {
  if (!hasEnded(await readField({ client, path: { id } }))) await deleteField({ client, path: { id } });
}
