"use client";

import { useEffect, useState } from "react";
import useSWR from "swr";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { ApiProblem, postApi } from "./call-api";

/** How long typing may pause before a call is made, ms. */
const PAUSE = 250;

export interface LiveResistance {
  /** The answer to what was typed last, or the one before while that is on its way or refused. */
  readonly result: ResistanceResult | undefined;
  readonly problem: ApiProblem | Error | undefined;
  /** An answer to the present input is not there yet. */
  readonly pending: boolean;
  readonly retry: () => void;
}

/**
 * Asks the API for one resistance whenever the request changes. Answers are kept by request, so a slow one never
 * replaces that of a later request.
 */
export function useResistance(request: object, initial?: ResistanceResult): LiveResistance {
  const body = JSON.stringify(request);
  const [asked, setAsked] = useState(body);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(body), PAUSE);
    return () => clearTimeout(timer);
  }, [body]);

  const { data, error, isValidating, mutate } = useSWR<ResistanceResult, ApiProblem | Error>(
    ["/resistance", asked],
    ([path, text]: [string, string]) => postApi<ResistanceResult>(path, text),
    {
      keepPreviousData: true,
      fallbackData: initial,
      revalidateOnFocus: false,
      revalidateOnReconnect: true,
      onErrorRetry: (failure, _key, _config, revalidate, { retryCount }) => {
        // What the caller got wrong stays wrong; a full minute passes by itself.
        const wait = failure instanceof ApiProblem ? failure.retryAfter : null;
        if (wait === null || retryCount > 5) return;
        setTimeout(() => void revalidate({ retryCount }), wait * 1000);
      },
    },
  );
  return {
    result: data,
    problem: error,
    pending: isValidating || asked !== body,
    retry: () => void mutate(),
  };
}
