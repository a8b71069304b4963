"use client";

import { useCallback, useState } from "react";
import type { ProblemShown } from "../../../_ui/problem-notice";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";

interface Answer {
  readonly now: string;
  readonly drift: number;
  readonly identical: boolean;
}

/** Where the replay of a record stands. */
export type Replay = "running" | Answer | { readonly problem: ProblemShown };

/** Replays records one after the other and keeps what came out. */
export function useReplays() {
  const [replays, setReplays] = useState<ReadonlyMap<string, Replay>>(new Map());
  const [running, setRunning] = useState(false);

  const replayAll = useCallback(async (ids: readonly string[]) => {
    const put = (id: string, replay: Replay) => setReplays((before) => new Map(before).set(id, replay));
    setRunning(true);
    try {
      for (const id of ids) {
        put(id, "running");
        try {
          put(id, await callConsole<Answer>("POST", `records/${id}/replay`));
        } catch (failure) {
          if (!(failure instanceof ConsoleProblem)) throw failure;
          put(id, { problem: failure.problem });
        }
      }
    } finally {
      setRunning(false);
    }
  }, []);

  return { replays, running, replayAll };
}
