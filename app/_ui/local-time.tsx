"use client";

import { useSyncExternalStore } from "react";

const never = () => () => undefined;

interface LocalTimeProps {
  /** ISO 8601, UTC. */
  readonly at: string;
}

/** A moment in the reader's own time; its zone and the time in UTC on hover. Before the script runs it is in UTC. */
export function LocalTime({ at }: LocalTimeProps) {
  const inBrowser = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  const utc = `${at.slice(0, 10)} ${at.slice(11, 16)} UTC`;
  const { text, zone } = inBrowser ? local(new Date(at)) : { text: utc, zone: "UTC" };
  return (
    <time dateTime={at} title={zone === "UTC" ? utc : `${zone}; ${utc}`} className="whitespace-nowrap">
      {text}
    </time>
  );
}

function local(moment: Date): { readonly text: string; readonly zone: string } {
  const two = (value: number) => String(value).padStart(2, "0");
  const day = `${moment.getFullYear()}-${two(moment.getMonth() + 1)}-${two(moment.getDate())}`;
  return {
    text: `${day} ${two(moment.getHours())}:${two(moment.getMinutes())}`,
    zone: Intl.DateTimeFormat().resolvedOptions().timeZone || "local time",
  };
}
