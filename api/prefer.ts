/** Longest wait that is granted, s. */
export const LONGEST_WAIT = 30;

/** Seconds of `Prefer: wait=N` (RFC 7240), at most 30; 0 where none is asked for or it cannot be read. */
export function preferredWait(headers: Headers): number {
  const header = headers.get("prefer") ?? "";
  for (const part of header.split(/[,;]/)) {
    const wait = /^\s*wait\s*=\s*"?(\d{1,6})"?\s*$/i.exec(part)?.[1];
    if (wait !== undefined) return Math.min(Number(wait), LONGEST_WAIT);
  }
  return 0;
}
