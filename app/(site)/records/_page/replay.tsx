"use client";

import { useEffect, useState } from "react";
import { Notice } from "../../../_ui/notice";
import { ProblemNotice, type ProblemShown } from "../../../_ui/problem-notice";
import { ApiProblem, getApi, postApi } from "../../_live/call-api";

interface Bounded {
  readonly text: string;
  readonly value: number;
  readonly lower: number;
  readonly upper: number;
}

/** What a replay answers, as far as it is shown; a field solution answers first with its own state. */
interface Answer {
  readonly id?: string;
  readonly status?: "queued" | "running" | "done" | "limited" | "failed" | "cancelled";
  readonly before?: Result;
  readonly now?: Result;
  readonly drift?: number | null;
  readonly identical?: boolean | null;
  readonly result?: Result | null;
  readonly replay?: {
    readonly before: Result;
    readonly drift: number | null;
    readonly identical: boolean | null;
  };
}

interface Result {
  readonly resistance?: Bounded;
  /** Of a sizing: the values found. */
  readonly solutions?: readonly { readonly dimension: { readonly text: string } }[];
  readonly engine?: string;
}

type State =
  | { readonly kind: "running"; readonly progress: string }
  | { readonly kind: "failed"; readonly problem: ProblemShown }
  | {
      readonly kind: "done";
      readonly before?: Result;
      readonly now?: Result;
      readonly drift: number | null;
      readonly identical: boolean;
    };

const PAUSE_MS = 1000;

/** Computes the record again, with today's engine and the material versions it pinned, and shows what has changed. */
export function Replay({ id }: { readonly id: string }) {
  const [state, setState] = useState<State>({ kind: "running", progress: "Computing again …" });

  useEffect(() => {
    const stop = new AbortController();
    replay(id, stop.signal, setState).catch((failure: unknown) => {
      if (stop.signal.aborted) return;
      const problem =
        failure instanceof ApiProblem
          ? failure.problem
          : { title: "The replay did not come about", detail: "The service cannot be reached." };
      setState({ kind: "failed", problem });
    });
    return () => stop.abort();
  }, [id]);

  return (
    <div className="mt-1.5" role="status" data-testid="replay">
      <Outcome state={state} />
    </div>
  );
}

async function replay(id: string, signal: AbortSignal, show: (state: State) => void): Promise<void> {
  let answer = await postApi<Answer>(`/records/${id}/replay`, "{}", { signal, wait: 10 });
  while (answer.id && (answer.status === "queued" || answer.status === "running")) {
    show({ kind: "running", progress: "The field is being solved again …" });
    await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
    if (signal.aborted) return;
    answer = await getApi<Answer>(`/fields/${answer.id}`, { signal });
  }
  if (signal.aborted) return;
  if (answer.status === "failed" || answer.status === "cancelled") {
    show({
      kind: "failed",
      problem: {
        title: `The field solution has ${answer.status === "failed" ? "failed" : "been cancelled"}`,
      },
    });
    return;
  }
  const { before = answer.replay?.before, now = answer.result ?? undefined } = answer;
  const drift = answer.drift ?? answer.replay?.drift ?? null;
  show({
    kind: "done",
    before,
    now,
    drift,
    identical: (answer.identical ?? answer.replay?.identical) === true,
  });
}

function Outcome({ state }: { readonly state: State }) {
  if (state.kind === "running") return <Notice title="Replay">{state.progress}</Notice>;
  if (state.kind === "failed") return <ProblemNotice problem={state.problem} />;
  const { before, now, drift, identical } = state;
  const [old, current] = [textOf(before), textOf(now)];
  const was = before?.resistance;
  const is = now?.resistance;
  const within = was && is ? is.value >= was.lower && is.value <= was.upper : false;
  const verdict = identical
    ? "Identical: the engine of today gives the same numbers to the last bit."
    : `Drift ${driftText(drift)}${within ? ", inside the bounds of the record." : "."}`;
  return (
    <Notice tone={identical || within ? "plain" : "caution"} title="Replay">
      <p>{verdict}</p>
      {old && current ? (
        <dl className="mt-0.5 grid w-fit grid-cols-[auto_auto] gap-x-2">
          <dt className="text-ink-soft">In the record{before?.engine ? `, engine ${before.engine}` : ""}</dt>
          <dd className="font-mono">{old}</dd>
          <dt className="text-ink-soft">Now{now?.engine ? `, engine ${now.engine}` : ""}</dt>
          <dd className="font-mono">{current}</dd>
        </dl>
      ) : null}
    </Notice>
  );
}

function textOf(result: Result | undefined): string | undefined {
  return result?.resistance?.text ?? result?.solutions?.map(({ dimension }) => dimension.text).join(" or ");
}

function driftText(drift: number | null): string {
  if (drift === null) return "cannot be stated";
  if (drift === 0) return "of the value is none, the bounds differ";
  return `of ${drift.toExponential(2).replace("-", "−")} of the value`;
}
