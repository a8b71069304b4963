"use client";

import { useEffect, useState } from "react";
import useSWR from "swr";
import type { MaterialChoice } from "../_server/material-choices";
import { readJson } from "./use-geometry";

const PAUSE_MS = 150;

/** The materials with their resistivity at the temperature of the fields; at the last one that could be read. */
export function useMaterials(
  temperature: string | undefined,
  first: readonly MaterialChoice[],
): readonly MaterialChoice[] {
  const wanted = temperature?.trim() ?? "";
  const [start] = useState(wanted);
  const [asked, setAsked] = useState(wanted);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(wanted), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [wanted]);
  const { data } = useSWR<readonly MaterialChoice[], Error>(
    asked === start ? null : `/calculate/materials?temperature=${encodeURIComponent(asked)}`,
    readJson,
    { keepPreviousData: true, revalidateIfStale: false, revalidateOnFocus: false, shouldRetryOnError: false },
  );
  return asked === start ? first : (data ?? first);
}
