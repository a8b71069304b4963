"use client";

import useSWR from "swr";
import { ApiProblem, getApi } from "../../_live/call-api";
import type { FieldMapView, FieldView } from "../_model/field-view";

const LINES = 20;
const RESOLUTION = 240;

export interface FieldMapState {
  readonly map: FieldMapView | undefined;
  /** Why there is none, in a sentence; the page goes on asking where that helps. */
  readonly trouble: string | undefined;
}

/** Lines and densities of a finished solution. */
export function useFieldMap(field: FieldView | null): FieldMapState {
  const id = field?.result ? field.id : null;
  const { data, error } = useSWR<FieldMapView, Error>(
    id === null ? null : `/fields/${id}/map.json?lines=${LINES}&resolution=${RESOLUTION}`,
    (path: string) => getApi<FieldMapView>(path),
    {
      revalidateIfStale: false,
      revalidateOnFocus: false,
      onErrorRetry: (failure, _key, _config, revalidate, { retryCount }) => {
        const problem = failure instanceof ApiProblem ? failure : null;
        if (problem && problem.status !== 429 && problem.status < 500) return;
        const wait = problem?.retryAfter ?? Math.min(30, 2 ** retryCount);
        if (wait <= 120) setTimeout(() => void revalidate({ retryCount }), wait * 1000 + 200);
      },
    },
  );
  if (data || !error) return { map: data, trouble: undefined };
  if (error instanceof ApiProblem && error.status === 404) {
    return {
      map: undefined,
      trouble: "The picture of this solution is no longer kept; solve again to see it.",
    };
  }
  return { map: undefined, trouble: "The picture is not here yet; the page asks again by itself." };
}
