import { type FrameApi, FrameTrouble, type Values } from "./frame-api";
import type { FrameProgress, FrameResult } from "./frame-view";

/** Waits for the end of a solution in steps of so many seconds: short ones first, to show the bracket closing in. */
const FIRST_WAITS = 10;
const SHORT_WAIT_S = 1;
const LONG_WAIT_S = 5;
/** One that was cancelled, as by a restart of the service, is asked for again after this, ms. */
const AGAIN_MS = 2_000;

interface FieldAnswer {
  readonly id: string;
  readonly status: "queued" | "running" | "done" | "limited" | "failed" | "cancelled";
  readonly progress: FrameProgress | null;
  readonly result: FrameResult | null;
  readonly failure?: string;
}

export interface SolvedOutline {
  readonly result: FrameResult;
  /** Where its picture lies. */
  readonly path: string;
}

/**
 * Solves the field for the open values and tells the bracket on the way. What is asked for no more is cancelled, so that
 * it costs nothing. Throws FrameTrouble for everything but an answer.
 */
export async function solveOutline(
  api: FrameApi,
  values: Values,
  signal: AbortSignal,
  tell: (progress: FrameProgress) => void,
): Promise<SolvedOutline> {
  let field = await api.post<FieldAnswer>("/api/v1/fields", values, signal);
  const path = `/api/v1/fields/${field.id}`;
  const drop = () => api.drop(path);
  signal.addEventListener("abort", drop);
  try {
    for (let turn = 0; field.status === "queued" || field.status === "running"; turn++) {
      const wait = turn < FIRST_WAITS ? SHORT_WAIT_S : LONG_WAIT_S;
      field = await api.get<FieldAnswer>(path, signal, wait);
      if (field.progress) tell(field.progress);
    }
  } finally {
    signal.removeEventListener("abort", drop);
  }
  if (field.result) return { result: field.result, path };
  throw new FrameTrouble(
    field.status === "cancelled"
      ? { kind: "pause", waitMs: AGAIN_MS }
      : { kind: "failed", detail: field.failure ?? "" },
  );
}
