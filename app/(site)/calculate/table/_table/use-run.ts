"use client";

import { useCallback, useRef, useState } from "react";
import type { ProblemShown } from "../../../../_ui/problem-notice";
import { ApiProblem, callApi } from "../../../_live/call-api";
import { type Outcome, outcomeOf, readItems, type Sent, toSend } from "../_model/send";
import type { Row, Table } from "../_model/table";
import type { Vocabulary } from "../_model/vocabulary";

export interface Run {
  readonly busy: boolean;
  /** Rows of the present or last run, and how many of them have come back. */
  readonly sent: number;
  readonly done: number;
  readonly problem: ProblemShown | null;
  /** What is wrong with a column as a whole, by its place in the table. */
  readonly atColumn: ReadonlyMap<number, string>;
}

const IDLE: Run = { busy: false, sent: 0, done: 0, problem: null, atColumn: new Map() };
/** How often the page is redrawn while answers arrive, ms. */
const REDRAW_MS = 150;

/** Sends rows and gathers what comes out of them, while it arrives. An answer belongs to its row as it was sent. */
export function useRun(vocabulary: Vocabulary) {
  const [outcomes, setOutcomes] = useState<ReadonlyMap<Row, Outcome>>(new Map());
  const [run, setRun] = useState<Run>(IDLE);
  const stopper = useRef<AbortController>(undefined);

  const start = useCallback(
    async (table: Table, rows: readonly Row[]) => {
      const controller = new AbortController();
      stopper.current = controller;
      const sent = await toSend(table, rows, vocabulary);
      const count = sent.rows.length;
      setRun({ ...IDLE, busy: true, sent: count });
      const fresh = new Map<Row, Outcome>();
      let done = 0;
      let drawn = 0;
      const show = () => {
        drawn = Date.now();
        const news = new Map(fresh);
        fresh.clear();
        setOutcomes((before) => new Map([...before, ...news]));
        setRun({ ...IDLE, busy: true, sent: count, done });
      };
      let problem: ProblemShown | null = null;
      try {
        const response = await callApi(
          "POST",
          "/resistance/batch",
          { signal: controller.signal, mediaType: "text/csv", accept: "application/json" },
          sent.body,
        );
        await readItems(response, (items) => {
          for (const item of items) fresh.set(sent.rows[item.index], outcomeOf(item));
          done += items.length;
          if (Date.now() - drawn > REDRAW_MS) show();
        });
        if (done < count) problem = cutOff(done, count);
      } catch (failure) {
        problem = controller.signal.aborted
          ? null
          : failure instanceof ApiProblem
            ? failure.problem
            : cutOff(done, count);
      }
      // What was changed as a whole meanwhile has no use for these answers.
      if (stopper.current !== controller) return;
      show();
      setRun({ busy: false, sent: count, done, ...sorted(problem, sent) });
    },
    [vocabulary],
  );

  return {
    outcomes,
    run,
    start,
    stop: useCallback(() => stopper.current?.abort(), []),
    restore: useCallback((known: ReadonlyMap<Row, Outcome>) => {
      setOutcomes((before) => new Map([...before, ...known]));
      setRun((before) => (before.busy ? before : IDLE));
    }, []),
    /** Forgets every answer, and those that are on their way: a column now means something else. */
    forgetAll: useCallback(() => {
      stopper.current?.abort();
      stopper.current = undefined;
      setOutcomes((before) => (before.size === 0 ? before : new Map()));
      setRun(IDLE);
    }, []),
  };
}

/** Complaints about a column go to its head. */
function sorted(problem: ProblemShown | null, { places }: Sent): Pick<Run, "problem" | "atColumn"> {
  const atColumn = new Map<number, string>();
  const rest = (problem?.errors ?? []).filter(({ pointer, detail }) => {
    const place = places[Number(/^#\/header\/(\d+)$/.exec(pointer ?? "")?.[1] ?? NaN)];
    if (place !== undefined) atColumn.set(place, detail);
    return place === undefined;
  });
  if (!problem || atColumn.size === 0) return { problem, atColumn };
  const detail = rest.length > 0 ? undefined : "A column cannot be read: see its head.";
  return { problem: { ...problem, detail, errors: rest }, atColumn };
}

function cutOff(done: number, sent: number): ProblemShown {
  return done === 0
    ? { title: "The service cannot be reached", detail: "The table is still here. Try again in a moment." }
    : {
        title: "The connection broke off",
        detail: `${done.toLocaleString("en")} of ${sent.toLocaleString("en")} rows came back and stay; compute the rest when the service can be reached again.`,
      };
}
