/** One field solution from request to answer, as a worker thread runs it. No database, no files. */
import { serialize } from "node:v8";
import type { MessagePort } from "node:worker_threads";
import {
  type FieldProgress,
  type FieldResult,
  FieldMediumError,
  InputError,
  type Material,
  prepareField,
  presentField,
  presentProgress,
  solveField,
} from "@/lib/engine";

export interface FieldTask {
  /** The body of the request, a stored outline put in its place. */
  readonly body: unknown;
  readonly materials: readonly Material[];
  /** One shared integer: 1 asks the worker to stop. */
  readonly cancel: Int32Array;
  /** Longest time it may take, s; then the bracket reached stands. */
  readonly secondsAllowed: number;
  readonly maximumUnknowns: number;
  /** Where progress is told; left out where nobody listens. */
  readonly port?: MessagePort;
}

export type FieldOutcome =
  | {
      readonly kind: "answered";
      readonly status: "done" | "limited";
      readonly result: FieldResult;
      /** The map, serialised. */
      readonly map: Uint8Array;
    }
  /** The caller's mistake that only the solution could find. */
  | { readonly kind: "refused"; readonly detail: string };

/** Progress is told at most so often, ms. */
const TELL_EVERY = 40;

/**
 * Solves one task. `clock` tells the time in ms.
 * @throws CheckFailure and anything else that is a defect.
 */
export function runFieldTask(task: FieldTask, clock: () => number = () => performance.now()): FieldOutcome {
  const started = clock();
  const byId = new Map(task.materials.map((material) => [material.id, material]));
  let told = 0;
  try {
    const prepared = prepareField(task.body, {
      material: (id) => byId.get(id),
      outline: () => undefined,
    });
    const tell = (progress: FieldProgress): void => {
      const now = clock();
      if (now - told < TELL_EVERY) return;
      told = now;
      task.port?.postMessage(presentProgress(prepared, progress));
    };
    const solution = solveField(prepared.problem, {
      accuracy: prepared.request.accuracy,
      maximumUnknowns: task.maximumUnknowns,
      shouldStop: () => Atomics.load(task.cancel, 0) === 1 || clock() - started > 1000 * task.secondsAllowed,
      onProgress: tell,
    });
    const result = presentField(prepared, solution, (clock() - started) / 1000);
    return { kind: "answered", status: solution.status, result, map: serialize(solution.map) };
  } catch (error) {
    if (error instanceof FieldMediumError || error instanceof InputError) {
      return { kind: "refused", detail: error.message };
    }
    throw error;
  } finally {
    task.port?.close();
  }
}
