const UNIT_MS: Readonly<Record<string, number>> = {
  s: 1_000,
  m: 60_000,
  h: 3_600_000,
  d: 86_400_000,
  w: 604_800_000,
};

/** Longest overlap of a rotation, ms. */
export const LONGEST_OVERLAP_MS = 90 * UNIT_MS.d;

/** Reads a duration such as `30m`, `36h`, `7d`, `2w` (or `0`) as ms; undefined for anything else. */
export function parseDuration(text: string): number | undefined {
  if (text === "0") return 0;
  const match = /^(\d{1,6})\s*([smhdw])$/.exec(text);
  return match ? Number(match[1]) * UNIT_MS[match[2]] : undefined;
}
