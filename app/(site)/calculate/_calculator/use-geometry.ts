"use client";

import { useEffect, useState } from "react";
import useSWR from "swr";
import type { Geometry } from "../_server/geometry";

const PAUSE_MS = 80;

/** The drawing of the dimensions, and of the last ones that made sense while these do not. */
export function useGeometry(
  shape: string,
  dimensions: Readonly<Record<string, string | number>>,
  first: Geometry | null,
): Geometry | null {
  const query = new URLSearchParams(
    Object.entries(dimensions).map(([name, value]): [string, string] => [name, String(value)]),
  ).toString();
  const [start] = useState(query);
  const [asked, setAsked] = useState(query);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(query), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [query]);
  const { data } = useSWR<Geometry, Error>(
    asked === start && first ? null : `/calculate/${shape}/geometry?${asked}`,
    readJson,
    { keepPreviousData: true, revalidateIfStale: false, revalidateOnFocus: false, shouldRetryOnError: false },
  );
  const [last, setLast] = useState(first);
  const shown = asked === start && first ? first : data;
  if (shown && shown !== last) setLast(shown);
  return shown ?? last;
}

export async function readJson<Result>(path: string): Promise<Result> {
  const response = await fetch(path);
  if (!response.ok) throw new Error(`The service answered ${response.status}.`);
  return response.json();
}
