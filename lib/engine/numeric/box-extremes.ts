/**
 * Smallest and largest value of a function on a box. Each input's direction is looked at along many lines through the
 * box; where the function rises or falls along all of them the extremes lie at that input's ends, in the others they are
 * searched on a grid and polished. A search proves nothing: `monotone` tells in which inputs it was needed.
 */
import { haltonPoint } from "./halton";

export interface BoxExtremes {
  readonly low: number;
  readonly high: number;
  /** For each input, whether the function rose or fell along every line looked at. */
  readonly monotone: readonly boolean[];
  /** Lines looked at for each input. */
  readonly lines: number;
}

/** The function had no value (NaN) at this point of the box. */
export class NoValue extends Error {
  constructor(readonly point: Float64Array) {
    super("the function has no value there");
  }
}

export interface BoxOptions {
  /** Relative change below which a difference is rounding. */
  readonly noise: number;
  /** Lines for each input beside those along the box's edges. */
  readonly lines: number;
  /** Points of the search in the inputs that need one. */
  readonly points: number;
  /** Called before each evaluation; may throw. */
  readonly step?: () => void;
}

const LEVELS = [0, 0.25, 0.5, 0.75, 1];
const MOST_CORNERS = 32;
const STARTS = 6;
const LAST_STEP = 1e-9;

/** @throws NoValue where f is NaN at a point that is met. */
export function boxExtremes(
  f: (x: Float64Array) => number,
  from: ArrayLike<number>,
  to: ArrayLike<number>,
  options: BoxOptions,
): BoxExtremes {
  const n = from.length;
  const point = new Float64Array(n);
  const seen = { low: Infinity, high: -Infinity };
  /** f at unit coordinates; every value met counts. */
  const at = (unit: ArrayLike<number>): number => {
    options.step?.();
    for (let i = 0; i < n; i++) {
      const u = unit[i];
      point[i] = u === 0 ? from[i] : u === 1 ? to[i] : from[i] + (to[i] - from[i]) * u;
    }
    const value = f(point);
    if (Number.isNaN(value)) throw new NoValue(point.slice());
    seen.low = Math.min(seen.low, value);
    seen.high = Math.max(seen.high, value);
    return value;
  };

  const bases = basePoints(n, options.lines);
  const rises = new Array<boolean>(n).fill(false);
  const falls = new Array<boolean>(n).fill(false);
  for (const base of bases) {
    for (let i = 0; i < n; i++) {
      const unit = Float64Array.from(base);
      let before = Number.NaN;
      for (const level of LEVELS) {
        unit[i] = level;
        const value = at(unit);
        const change = value - before;
        if (change > options.noise * Math.abs(value)) rises[i] = true;
        if (change < -options.noise * Math.abs(value)) falls[i] = true;
        before = value;
      }
    }
  }
  const searched: number[] = [];
  for (let i = 0; i < n; i++) if (rises[i] && falls[i]) searched.push(i);

  for (const sign of [-1, 1]) {
    const start = new Float64Array(n);
    for (let i = 0; i < n; i++) start[i] = rises[i] && falls[i] ? 0.5 : rises[i] === sign > 0 ? 1 : 0;
    const g = (unit: ArrayLike<number>): number => sign * at(unit);
    const starts = searched.length === 0 ? [start] : bestOfGrid(g, start, searched, options.points);
    // Every input takes part in the polish, so that a direction seen wrongly costs nothing where it shows.
    for (const unit of starts) climb(g, unit);
  }
  return {
    low: seen.low,
    high: seen.high,
    monotone: rises.map((rise, i) => !(rise && falls[i])),
    lines: bases.length,
  };
}

/** The centre, corners (all of them while they are few), and points spread through the box. */
function basePoints(n: number, spread: number): Float64Array[] {
  const bases: Float64Array[] = [new Float64Array(n).fill(0.5)];
  const corners = Math.min(2 ** Math.min(n, 6), MOST_CORNERS);
  for (let c = 0; c < corners; c++) {
    // With more inputs than five the corners are a spread of all of them: bits of a multiplied counter.
    const bits = n <= 5 ? c : Math.imul(c, 0x9e3779b1) >>> 0;
    bases.push(Float64Array.from({ length: n }, (_, i) => ((bits >>> (i % 32)) & 1) as number));
  }
  for (let k = 1; k <= spread; k++) bases.push(haltonPoint(k, n));
  return bases;
}

/** The best points of a grid in the inputs that are not monotone, the others held where they are. */
function bestOfGrid(
  g: (unit: ArrayLike<number>) => number,
  start: ArrayLike<number>,
  searched: readonly number[],
  points: number,
): Float64Array[] {
  const best: { readonly value: number; readonly unit: Float64Array }[] = [];
  const offer = (unit: Float64Array): void => {
    const value = g(unit);
    if (best.length === STARTS && value <= best[STARTS - 1].value) return;
    best.push({ value, unit: unit.slice() });
    best.sort((a, b) => b.value - a.value);
    if (best.length > STARTS) best.pop();
  };
  const m = searched.length;
  const levels = m === 1 ? Math.min(points, 257) : Math.floor(points ** (1 / m));
  const unit = new Float64Array(start);
  if (levels >= 5) {
    for (let k = 0; k < levels ** m; k++) {
      for (let j = 0, rest = k; j < m; j++, rest = Math.floor(rest / levels)) {
        unit[searched[j]] = (rest % levels) / (levels - 1);
      }
      offer(unit);
    }
  } else {
    for (let k = 1; k <= points; k++) {
      const spread = haltonPoint(k, m);
      for (let j = 0; j < m; j++) unit[searched[j]] = spread[j];
      offer(unit);
    }
  }
  return best.map((entry) => entry.unit);
}

/** Steps along each input while the value grows, then shorter ones. */
function climb(g: (unit: ArrayLike<number>) => number, unit: Float64Array): void {
  let value = g(unit);
  for (let step = 0.1; step > LAST_STEP;) {
    let moved = false;
    for (let i = 0; i < unit.length; i++) {
      for (const side of [step, -step]) {
        const before = unit[i];
        const next = Math.min(1, Math.max(0, before + side));
        if (next === before) continue;
        unit[i] = next;
        const found = g(unit);
        if (found > value) {
          value = found;
          moved = true;
          break;
        }
        unit[i] = before;
      }
    }
    if (!moved) step /= 4;
  }
}
