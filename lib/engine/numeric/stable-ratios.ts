/** Ratios that tend to 1 at 0 and keep their digits there. */

/** log1p(u)/u for u > −1. */
export function log1pRatio(u: number): number {
  return u === 0 ? 1 : Math.log1p(u) / u;
}

/** u/log1p(u) for u > −1: at least 1 for u ≥ 0. */
export function overLog1p(u: number): number {
  return u === 0 ? 1 : u / Math.log1p(u);
}

/** u/atan(u) for u ≥ 0: at least 1. */
export function overAtan(u: number): number {
  return u === 0 ? 1 : u / Math.atan(u);
}
