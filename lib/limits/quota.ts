import { limitedAddress } from "../http/client-address";
import type { Bucket } from "./limiter";

/** Highest quotas a key may have. */
export const LARGEST_QUOTA = 1_000_000_000;
export const LARGEST_MINUTE_QUOTA = 1_000_000;

/** What a key gets where nothing else is said. */
export const DEFAULT_MINUTE_QUOTA = 600;
export const DEFAULT_MONTH_QUOTA = 100_000;

/** The same for a key that may travel in an address: a sheet's worth, since such keys get about. */
export const URL_MINUTE_QUOTA = 120;
export const URL_MONTH_QUOTA = 5_000;

/** Requests a minute. */
export function minuteBucket(subject: string, quota: number): Bucket {
  return { policy: "minute", subject, quota, windowSeconds: 60 };
}

interface Month {
  /** `2025-03` */
  readonly name: string;
  /** Unix ms. */
  readonly startsAt: number;
  readonly endsAt: number;
}

let latest: Month | undefined;

/** The calendar month (UTC) of a moment; the one asked for last is remembered. */
function monthOf(now: number): Month {
  if (latest && latest.startsAt <= now && now < latest.endsAt) return latest;
  const date = new Date(now);
  const [year, month] = [date.getUTCFullYear(), date.getUTCMonth()];
  latest = {
    name: date.toISOString().slice(0, 7),
    startsAt: Date.UTC(year, month, 1),
    endsAt: Date.UTC(year, month + 1, 1),
  };
  return latest;
}

/** Computations in the calendar month (UTC) of that moment (Unix ms): its counter carries the month's name. */
export function monthBucket(subject: string, quota: number, now: number): Bucket {
  const { name, endsAt } = monthOf(now);
  return {
    policy: "month",
    subject: `${subject}:${name}`,
    quota,
    // A day longer, so that a clock that is set back at the turn of the month finds the count still there.
    windowSeconds: Math.ceil((endsAt - now) / 1000) + 86_400,
    endsAt,
  };
}

/** Requests a minute from an address without a key. */
export function addressBucket(address: string, quota: number): Bucket {
  return { policy: "address", subject: limitedAddress(address), quota, windowSeconds: 60 };
}

/** How long attempts to sign in are remembered, s. */
const SIGN_IN_WINDOW = 900;

/** Attempts to sign in, to be counted by account and by address: `account:…`, `address:…`. */
export function signInBucket(subject: string, quota: number): Bucket {
  return { policy: "sign-in", subject, quota, windowSeconds: SIGN_IN_WINDOW };
}
