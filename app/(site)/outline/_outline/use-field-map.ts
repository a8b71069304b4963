"use client";

import { useMemo } from "react";
import useSWR, { type SWRConfiguration } from "swr";
import { ApiProblem, getApi } from "../../_live/call-api";
import type { FieldMapView, FieldView } from "../_model/field-view";
import { legibleShares, MOST_SHARES } from "./picture/legible";

const RESOLUTION = 240;
/** The coarsest that the API gives, where only lines are wanted. */
const COARSEST = 8;

/** A map as the page draws it, with as many lines as can be told apart. */
export interface LegibleMap extends FieldMapView {
  /** Volts between two equipotentials, for one volt. */
  readonly voltageStep: number;
}

export interface FieldMapState {
  readonly map: LegibleMap | undefined;
  /** Why there is none, in a sentence; the page goes on asking where that helps. */
  readonly trouble: string | undefined;
}

const OPTIONS: SWRConfiguration<FieldMapView, Error> = {
  revalidateIfStale: false,
  revalidateOnFocus: false,
  onErrorRetry: (failure, _key, _config, revalidate, { retryCount }) => {
    const problem = failure instanceof ApiProblem ? failure : null;
    if (problem && problem.status !== 429 && problem.status < 500) return;
    const wait = problem?.retryAfter ?? Math.min(30, 2 ** retryCount);
    if (wait <= 120) setTimeout(() => void revalidate({ retryCount }), wait * 1000 + 200);
  },
};

/** Lines and densities of a finished solution. */
export function useFieldMap(field: FieldView | null): FieldMapState {
  const id = field?.result ? field.id : null;
  const full = useMap(id, MOST_SHARES, RESOLUTION);
  const shares = useMemo(() => (full.data ? legibleShares(full.data) : null), [full.data]);
  // Fewer stream lines are others, not some of the same: where twenty are a stripe, fewer are asked for.
  const thin = shares !== null && shares.current < MOST_SHARES;
  const sparse = useMap(thin ? id : null, shares?.current ?? MOST_SHARES, COARSEST);
  const lines = thin ? sparse.data : full.data;
  const map = useMemo((): LegibleMap | undefined => {
    if (!full.data || !lines || !shares) return undefined;
    const step = MOST_SHARES / shares.voltage;
    return {
      ...full.data,
      equipotentials: full.data.equipotentials.filter((_, k) => (k + 1) % step === 0),
      voltageStep: 1 / shares.voltage,
      streamlines: lines.streamlines,
      currentBetweenStreamlines: lines.currentBetweenStreamlines,
    };
  }, [full.data, lines, shares]);
  const error = full.error ?? sparse.error;
  if (map || !error) return { map, trouble: undefined };
  if (error instanceof ApiProblem && error.status === 404) {
    return {
      map: undefined,
      trouble: "The picture of this solution is no longer kept; solve again to see it.",
    };
  }
  return { map: undefined, trouble: "The picture is not here yet; the page asks again by itself." };
}

function useMap(id: string | null, shares: number, resolution: number) {
  return useSWR<FieldMapView, Error>(
    id === null ? null : `/fields/${id}/map.json?lines=${shares}&resolution=${resolution}`,
    (path: string) => getApi<FieldMapView>(path),
    OPTIONS,
  );
}
