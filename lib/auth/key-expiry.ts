const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;

/** A key's end is soon within this time, ms. */
export const SOON_MS = 14 * DAY_MS;

/**
 * When a key ends, seen from a moment `leftMs` before its end, in the words of mails and pages: to the nearest day from
 * two days on, to the nearest hour below.
 */
export function expiryText(leftMs: number): string {
  if (leftMs <= 0) return "has expired";
  if (leftMs < HOUR_MS) return "expires within the hour";
  const [count, unit] =
    leftMs < 2 * DAY_MS ? [Math.round(leftMs / HOUR_MS), "hour"] : [Math.round(leftMs / DAY_MS), "day"];
  return `expires in ${count} ${unit}${count === 1 ? "" : "s"}`;
}
