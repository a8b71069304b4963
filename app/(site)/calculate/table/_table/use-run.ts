"use client";

import { useCallback, useRef, useState } from "react";
import type { ProblemShown } from "../../../../_ui/problem-notice";
import { ApiProblem, callApi } from "../../../_live/call-api";
import { type Outcome, outcomeOf, readItems, toSend } from "../_model/send";
import type { Row, Table } from "../_model/table";
import type { Vocabulary } from "../_model/vocabulary";

export interface Run {
  readonly busy: boolean;
  /** Rows of the present or last run, and how many of them have come back. */
  readonly sent: number;
  readonly done: number;
  readonly problem: ProblemShown | null;
}

const IDLE: Run = { busy: false, sent: 0, done: 0, problem: null };
/** How often the page is redrawn while answers arrive, ms. */
const REDRAW_MS = 150;

/** Sends rows and gathers what comes out of them, while it arrives. */
export function useRun(vocabulary: Vocabulary) {
  const [outcomes, setOutcomes] = useState<ReadonlyMap<number, Outcome>>(new Map());
  const [run, setRun] = useState<Run>(IDLE);
  const stopper = useRef<AbortController>(undefined);

  const start = useCallback(
    async (table: Table, rows: readonly Row[]) => {
      const controller = new AbortController();
      stopper.current = controller;
      const { body, ids } = await toSend(table, rows, vocabulary);
      setRun({ busy: true, sent: ids.length, done: 0, problem: null });
      const fresh = new Map<number, Outcome>();
      let done = 0;
      let drawn = 0;
      const show = () => {
        drawn = Date.now();
        const news = new Map(fresh);
        fresh.clear();
        setOutcomes((before) => new Map([...before, ...news]));
        setRun({ busy: true, sent: ids.length, done, problem: null });
      };
      let problem: ProblemShown | null = null;
      try {
        const response = await callApi(
          "POST",
          "/resistance/batch",
          { signal: controller.signal, mediaType: "text/csv", accept: "application/json" },
          body,
        );
        await readItems(response, (items) => {
          for (const item of items) fresh.set(ids[item.index], outcomeOf(item));
          done += items.length;
          if (Date.now() - drawn > REDRAW_MS) show();
        });
      } catch (failure) {
        problem = controller.signal.aborted ? null : shown(failure);
      }
      show();
      setRun({ busy: false, sent: ids.length, done, problem });
    },
    [vocabulary],
  );

  return {
    outcomes,
    run,
    start,
    stop: useCallback(() => stopper.current?.abort(), []),
    /** Forgets what came out for a row that has changed. */
    forget: useCallback((id: number) => {
      setOutcomes((before) => {
        if (!before.has(id)) return before;
        const left = new Map(before);
        left.delete(id);
        return left;
      });
    }, []),
    forgetAll: useCallback(() => {
      setOutcomes((before) => (before.size === 0 ? before : new Map()));
      setRun((before) => (before.busy ? before : IDLE));
    }, []),
  };
}

function shown(failure: unknown): ProblemShown {
  if (failure instanceof ApiProblem) return failure.problem;
  return {
    title: "The service cannot be reached",
    detail: "The table is still here. Try again in a moment.",
  };
}
