"use client";

import { useEffect, useState } from "react";
import useSWR from "swr";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { ApiProblem, postApi } from "../../_live/call-api";
import type { Complaint } from "../_model/complaints";
import type { FirstAnswer } from "../_server/first-answer";

export type Trouble =
  /** The input has no answer; the fields say why. */
  | { readonly kind: "input"; readonly complaints: readonly Complaint[] }
  /** The limit of this minute or month is used up; `seconds` until the page asks again, null if not soon. */
  | { readonly kind: "limit"; readonly seconds: number | null; readonly detail: string }
  | { readonly kind: "offline" }
  | { readonly kind: "service"; readonly problem: ApiProblem };

export interface Answer {
  /** The answer to what the fields say, or the last one there was. */
  readonly result: ResistanceResult | undefined;
  /** Whether `result` belongs to an earlier input. */
  readonly stale: boolean;
  readonly trouble: Trouble | undefined;
  readonly retry: () => void;
}

/** After the last change, ms; longer when little is left of the minute's calls. */
const PAUSE_MS = 80;
const SPARING_MS = 400;
const FRUGAL_MS = 1200;
const LONGEST_WAIT_S = 30;

/** Calls left in this minute, as the last answer said. */
let callsLeft = Infinity;

function observe(headers: Headers): void {
  const left = /"minute";\s*r=(\d+)/.exec(headers.get("RateLimit") ?? "");
  callsLeft = left ? Number(left[1]) : Infinity;
}

function pauseMs(): number {
  if (callsLeft > 25) return PAUSE_MS;
  return callsLeft > 8 ? SPARING_MS : FRUGAL_MS;
}

/**
 * The API's answer to a body, asked for when typing pauses. Answers are kept by body: a late one never replaces that of
 * a newer body, and going back to an earlier input costs no call.
 * @param body JSON text of the request; null asks nothing.
 */
export function useAnswer(body: string | null, first: FirstAnswer | null): Answer {
  const [start] = useState({ body, first });
  const [asked, setAsked] = useState(body);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(body), pauseMs());
    return () => clearTimeout(timer);
  }, [body]);

  // What the server answered already when it made the page.
  const known = asked !== null && asked === start.body ? start.first : null;
  const { data, error, isValidating, mutate } = useSWR<ResistanceResult, Error>(
    asked === null || known ? null : ["/resistance", asked],
    ([path, text]: [string, string]) => postApi<ResistanceResult>(path, text, { observe }),
    {
      keepPreviousData: true,
      // The same body has the same answer: what is known is not asked again.
      revalidateIfStale: false,
      revalidateOnFocus: false,
      onErrorRetry: (failure, _key, _config, revalidate, { retryCount }) => {
        const wait = waitBeforeRetry(failure, retryCount);
        if (wait !== null) setTimeout(() => void revalidate({ retryCount }), wait * 1000);
      },
    },
  );

  const [last, setLast] = useState<ResistanceResult>();
  const fresh = known && "result" in known ? known.result : !known && !error ? data : undefined;
  if (fresh && fresh !== last) setLast(fresh);
  const trouble = known && "complaints" in known ? inputTrouble(known.complaints) : troubleOf(error);
  return {
    result: fresh ?? last ?? data,
    stale: asked !== body || isValidating || fresh === undefined,
    trouble,
    retry: () => void mutate(),
  };
}

/** Seconds until a call that failed may be made again by itself; null if it would fail again or that is far off. */
export function waitBeforeRetry(failure: Error, retryCount: number): number | null {
  const backOff = Math.min(LONGEST_WAIT_S, 2 ** Math.min(retryCount, 5));
  if (!(failure instanceof ApiProblem)) return backOff;
  if (failure.status === 429) {
    return failure.retryAfter !== null && failure.retryAfter <= 120 ? failure.retryAfter + 0.2 : null;
  }
  return failure.status >= 500 ? (failure.retryAfter ?? backOff) : null;
}

function inputTrouble(complaints: readonly Complaint[]): Trouble {
  return { kind: "input", complaints };
}

function troubleOf(error: Error | undefined): Trouble | undefined {
  if (!error) return undefined;
  if (!(error instanceof ApiProblem)) return { kind: "offline" };
  if (error.status === 422) return inputTrouble(error.problem.errors ?? []);
  if (error.status === 429) {
    return { kind: "limit", seconds: error.retryAfter, detail: error.problem.detail ?? "" };
  }
  return { kind: "service", problem: error };
}
