"use client";

import useSWR, { type SWRConfiguration, type SWRResponse } from "swr";
import { callConsole, type ConsoleProblem } from "./call-console";

/**
 * Reads `/api/console/<path>` and keeps it fresh; `null` reads nothing yet. The last answer stays while the next one
 * comes, so that tables do not jump.
 */
export function useConsole<Result>(
  path: string | null,
  options: SWRConfiguration<Result, ConsoleProblem> = {},
): SWRResponse<Result, ConsoleProblem> {
  return useSWR<Result, ConsoleProblem>(path, (key: string) => callConsole<Result>("GET", key), {
    keepPreviousData: true,
    shouldRetryOnError: false,
    ...options,
  });
}
