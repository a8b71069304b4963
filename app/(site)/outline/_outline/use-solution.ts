"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { newAttemptKey } from "../../_live/attempt-key";
import { ApiProblem, callApi, postApi } from "../../_live/call-api";
import type { Complaint } from "../_model/complaints";
import { EventReader } from "../_model/events";
import { type FieldView, isOver } from "../_model/field-view";

export type SolveTrouble =
  /** The body was refused; the places say why. */
  | { readonly kind: "input"; readonly complaints: readonly Complaint[] }
  /** A limit or a full queue: the page asks again after so many seconds, null if that would be long. */
  | { readonly kind: "wait"; readonly seconds: number | null; readonly problem: ApiProblem }
  | { readonly kind: "offline" }
  /** The service knows the solution no longer: it was deleted, or its time is over. */
  | { readonly kind: "gone" }
  | { readonly kind: "service"; readonly problem: ApiProblem };

export interface SolutionState {
  readonly phase: "idle" | "starting" | "running" | "over";
  /** Body that `field` or `trouble` is about. */
  readonly body: string | null;
  readonly field: FieldView | null;
  /** The stream of events broke; the page looks again by itself. */
  readonly lost: boolean;
  readonly trouble: SolveTrouble | null;
  /** Relative width of the first bracket, from which it closes; null before. */
  readonly firstWidth: number | null;
}

export interface Solution extends SolutionState {
  readonly solve: (body: string) => void;
  readonly cancel: () => void;
}

const IDLE: SolutionState = {
  phase: "idle",
  body: null,
  field: null,
  lost: false,
  trouble: null,
  firstWidth: null,
};
const LONGEST_WAIT_S = 120;
const LONGEST_BACK_OFF_S = 15;

/** One field solution at a time: started, followed by its events as the bracket closes, and stopped on request. */
export function useSolution(): Solution {
  const [state, setState] = useState<SolutionState>(IDLE);
  const run = useRef<AbortController | null>(null);
  const running = useRef<string | null>(null);

  const stop = useCallback(() => {
    run.current?.abort();
    run.current = null;
    const id = running.current;
    running.current = null;
    // One that nobody waits for any more need not be finished.
    if (id !== null) void callApi("DELETE", `/fields/${id}`).catch(() => undefined);
  }, []);

  const solve = useCallback(
    (body: string) => {
      stop();
      const controller = new AbortController();
      run.current = controller;
      const update = (change: Partial<SolutionState>) => {
        if (controller.signal.aborted) return;
        setState((before) => ({
          ...before,
          ...change,
          firstWidth: before.firstWidth ?? widthOf(change.field?.progress),
        }));
      };
      setState({ ...IDLE, phase: "starting", body });
      const key = newAttemptKey();
      void (async () => {
        for (;;) {
          try {
            const field = await postApi<FieldView>("/fields", body, {
              idempotencyKey: key,
              signal: controller.signal,
            });
            running.current = isOver(field) ? null : field.id;
            update({ field, phase: isOver(field) ? "over" : "running", trouble: null });
            if (!isOver(field)) await follow(field.id, controller.signal, update);
            if (!controller.signal.aborted) running.current = null;
            return;
          } catch (failure) {
            if (controller.signal.aborted) return;
            const trouble = troubleOf(failure);
            update({ trouble, phase: "idle" });
            if (trouble.kind !== "wait" || trouble.seconds === null) return;
            await pause(trouble.seconds, controller.signal);
            if (controller.signal.aborted) return;
            update({ trouble: null, phase: "starting" });
          }
        }
      })();
    },
    [stop],
  );

  const cancel = useCallback(() => {
    stop();
    setState((before) => ({
      ...before,
      phase: before.field ? "over" : "idle",
      lost: false,
      trouble: null,
      field: before.field && { ...before.field, status: "cancelled" },
    }));
  }, [stop]);

  useEffect(() => stop, [stop]);
  return { ...state, solve, cancel };
}

/** Follows a solution by its events until it is over; looks again after a pause when the stream breaks. */
async function follow(
  id: string,
  signal: AbortSignal,
  update: (change: Partial<SolutionState>) => void,
): Promise<void> {
  for (let attempt = 0; !signal.aborted; attempt++) {
    try {
      const response = await callApi("GET", `/fields/${id}/events`, { signal });
      if (!response.body) throw new Error("The answer has no body.");
      const reader = new EventReader();
      const text = response.body.pipeThrough(new TextDecoderStream()).getReader();
      for (;;) {
        const { done, value } = await text.read();
        if (done) break;
        for (const event of reader.read(value)) {
          const field = JSON.parse(event.data) as FieldView;
          attempt = 0;
          update({ field, lost: false, phase: isOver(field) ? "over" : "running" });
          if (isOver(field)) return;
        }
      }
    } catch (failure) {
      if (signal.aborted) return;
      if (failure instanceof ApiProblem && failure.status < 500 && failure.status !== 429) throw failure;
    }
    update({ lost: true });
    await pause(Math.min(LONGEST_BACK_OFF_S, 2 ** attempt), signal);
  }
}

function troubleOf(failure: unknown): SolveTrouble {
  if (!(failure instanceof ApiProblem)) return { kind: "offline" };
  if (failure.status === 404) return { kind: "gone" };
  if (failure.status === 422) return { kind: "input", complaints: failure.problem.errors ?? [] };
  if (failure.status === 429 || failure.status === 503) {
    const { retryAfter } = failure;
    const seconds = retryAfter !== null && retryAfter <= LONGEST_WAIT_S ? retryAfter : null;
    return { kind: "wait", seconds, problem: failure };
  }
  return { kind: "service", problem: failure };
}

function widthOf(progress: FieldView["progress"] | undefined): number | null {
  return progress ? (2 * (progress.upper - progress.lower)) / (progress.upper + progress.lower) : null;
}

function pause(seconds: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, seconds * 1000 + 200);
    signal.addEventListener("abort", () => {
      clearTimeout(timer);
      resolve();
    });
  });
}
