"use client";

import { useEffect, useMemo, useState } from "react";
import useSWR from "swr";
import type { NetworkResult } from "@/lib/engine/network/result-schema";
import type { ProblemShown } from "../../../_ui/problem-notice";
import { ApiProblem, postApi } from "../../_live/call-api";
import { waitBeforeRetry } from "../../calculate/_calculator/use-answer";
import { networkBody, type ShapeRequest } from "../_model/body";
import { type Complaints, sortComplaints } from "../_model/complaints";
import type { Network } from "../_model/network";

/** How long typing may pause before a call is made, ms. */
const PAUSE_MS = 350;

export interface Solution {
  /** Null while a shape's request is on its way, and where there is no element to ask about. */
  readonly body: Readonly<Record<string, unknown>> | null;
  /** Of what was typed last, or of what stood there before; none where it was refused. */
  readonly result: NetworkResult | undefined;
  readonly stale: boolean;
  readonly problem: ProblemShown | null;
  /** Why there is no answer for now, though nothing is wrong with the network; the numbers before stay. */
  readonly pause: Pause | null;
  /** What passes through each element, by its id; an element with a complaint has none. */
  readonly answers: ReadonlyMap<number, Answer>;
  /** Complaints by the element's id, by what they concern. */
  readonly complaints: ReadonlyMap<number, Complaints>;
  readonly portComplaints: readonly string[];
  readonly uncertaintyComplaint: string | undefined;
  /** By the limit's name. */
  readonly requirementComplaints: ReadonlyMap<string, string>;
  readonly requests: ReadonlyMap<string, ShapeRequest>;
}

export interface Pause {
  readonly title: string;
  readonly detail: string;
}

export type Answer = NetworkResult["elements"][number];

/** What was asked, with the ids of its elements in their order: an answer belongs to them, whatever they are called. */
interface Asked {
  readonly text: string;
  readonly ids: readonly number[];
}

interface Answered extends Asked {
  readonly result: NetworkResult;
}

/** What the server has solved already. */
export interface FirstSolution {
  readonly text: string;
  readonly result: NetworkResult;
  readonly requests: readonly (readonly [string, ShapeRequest])[];
}

/** Solves the network whenever it changes; requests of shapes are read from their addresses first. */
export function useSolution(network: Network, first: FirstSolution): Solution {
  const requests = useRequests(network, first.requests);
  const empty = network.elements.length === 0;
  const body = useMemo(() => (empty ? null : networkBody(network, requests)), [empty, network, requests]);
  const text = body === null ? null : JSON.stringify(body);
  const [asked, setAsked] = useState<Asked | null>(() => ({
    text: first.text,
    ids: network.elements.map(({ id }) => id),
  }));
  useEffect(() => {
    const ids = network.elements.map(({ id }) => id);
    const timer = setTimeout(() => setAsked(text === null ? null : { text, ids }), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [text, network.elements]);
  const { data, error, isLoading } = useSWR<Answered, Error>(
    asked === null ? null : ["/networks", asked.text],
    async ([path, wanted]: [string, string]) => ({
      text: wanted,
      ids: asked?.ids ?? [],
      result: await postApi<NetworkResult>(path, wanted),
    }),
    {
      keepPreviousData: true,
      fallbackData:
        asked?.text === first.text ? { text: first.text, ids: asked.ids, result: first.result } : undefined,
      revalidateOnMount: false,
      revalidateOnFocus: false,
      onErrorRetry: (failure: Error, _key, _config, revalidate, { retryCount }) => {
        const wait = waitBeforeRetry(failure, retryCount);
        if (wait !== null) setTimeout(() => void revalidate({ retryCount }), wait * 1000);
      },
    },
  );
  const pause = error === undefined ? null : pauseOf(error);
  const problem = error instanceof ApiProblem && pause === null ? error.problem : null;
  const sorted = useMemo(() => sortComplaints(problem, asked?.ids ?? []), [problem, asked]);
  const refused = problem !== null;
  const answers = useMemo(() => {
    if (!data || refused) return NO_ANSWERS;
    // The same network may have been asked before with other rows: then the rows of now stand in the same order.
    const ids = data.text === asked?.text ? asked.ids : data.ids;
    return new Map(data.result.elements.map((element, k) => [ids[k], element]));
  }, [data, asked, refused]);
  return {
    body,
    result: refused || empty ? undefined : data?.result,
    stale: !empty && (isLoading || text === null || asked?.text !== text || error !== undefined),
    problem: sorted.rest,
    pause,
    answers,
    complaints: sorted.complaints,
    portComplaints: sorted.ports,
    uncertaintyComplaint: sorted.uncertainty,
    requirementComplaints: sorted.requirement,
    requests,
  };
}

const NO_ANSWERS: ReadonlyMap<number, Answer> = new Map();

function pauseOf(error: Error): Pause | null {
  const again = waitBeforeRetry(error, 0) !== null;
  if (!(error instanceof ApiProblem)) {
    return {
      title: "No connection",
      detail: "The service cannot be reached. The network is still here; the page asks again by itself.",
    };
  }
  if (error.status !== 429) return null;
  const then = again ? "The page asks again by itself." : "They come back later, or after signing in.";
  return { title: "A short pause", detail: `The calls that this page may make are used up for now. ${then}` };
}

/** What the addresses of shapes ask for, read by the service; kept once known. */
function useRequests(network: Network, first: FirstSolution["requests"]): ReadonlyMap<string, ShapeRequest> {
  const [known, setKnown] = useState<ReadonlyMap<string, ShapeRequest>>(() => new Map(first));
  const missing = network.elements.flatMap(({ value }) =>
    value.kind === "shape" && !known.has(value.address) ? [value.address] : [],
  );
  const wanted = [...new Set(missing)].join("\n");
  useEffect(() => {
    if (wanted === "") return;
    let current = true;
    void Promise.all(wanted.split("\n").map(readRequest)).then((found) => {
      if (current) setKnown((before) => new Map([...before, ...found]));
    });
    return () => {
      current = false;
    };
  }, [wanted]);
  return known;
}

async function readRequest(address: string): Promise<readonly [string, ShapeRequest]> {
  const [shape, query = ""] = address.split("?", 2);
  try {
    const response = await fetch(`/network/request?shape=${shape}&${query}`);
    if (response.ok) return [address, await response.json()];
  } catch {
    // Told by the API, which gets the shape's name alone.
  }
  return [address, { title: shape, request: { shape, dimensions: {} } }];
}
