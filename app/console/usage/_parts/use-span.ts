"use client";

import { useCallback, useMemo } from "react";
import { useSearchParams } from "next/navigation";

export interface Span {
  /** Days in UTC, both included. */
  readonly from: string;
  readonly to: string;
  readonly by: "day" | "hour";
  /** Whether these days are few enough to be shown hour by hour. */
  readonly hourly: boolean;
  readonly team: string;
  readonly caller: string;
  /** `from=…&to=…&team=…&caller=…` */
  readonly query: string;
  readonly change: (next: Readonly<Record<string, string>>) => void;
}

const DAY_MS = 86_400_000;
const MOST_HOURLY_DAYS = 7;
const USUAL_DAYS = 7;

const isDay = (text: string | null): text is string => text !== null && !Number.isNaN(Date.parse(text));

/** A day some days away from another. */
export function dayFrom(day: string, days: number): string {
  return new Date(Date.parse(day) + days * DAY_MS).toISOString().slice(0, 10);
}

/** Which days, whose team and which caller the page shows, kept in its address. */
export function useSpan(today: string): Span {
  const address = useSearchParams();
  const change = useCallback((next: Readonly<Record<string, string>>) => {
    const params = new URLSearchParams(window.location.search);
    for (const [name, value] of Object.entries(next)) {
      if (value === "") params.delete(name);
      else params.set(name, value);
    }
    params.delete("page");
    params.delete("requests-page");
    window.history.replaceState(null, "", params.size === 0 ? window.location.pathname : `?${params}`);
  }, []);
  return useMemo(() => {
    const to = isDay(address.get("to")) ? (address.get("to") ?? today) : today;
    const from = isDay(address.get("from")) ? (address.get("from") ?? to) : dayFrom(to, 1 - USUAL_DAYS);
    const days = Math.round((Date.parse(to) - Date.parse(from)) / DAY_MS) + 1;
    const hourly = days <= MOST_HOURLY_DAYS;
    const by = hourly && (address.get("by") ?? (days <= 2 ? "hour" : "day")) === "hour" ? "hour" : "day";
    const team = address.get("team") ?? "";
    const caller = address.get("caller") ?? "";
    const query = new URLSearchParams({ from, to });
    if (team !== "") query.set("team", team);
    if (caller !== "") query.set("caller", caller);
    return { from, to, by, hourly, team, caller, query: query.toString(), change };
  }, [address, today, change]);
}
