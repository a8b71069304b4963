/**
 * All roots of a function on an interval, as far as a fine grid and a search for hidden extremes can see: sign changes
 * by Brent's method, and pairs of roots that a hill or a dip between grid points hides.
 */

export interface RootSearch {
  readonly roots: readonly number[];
  /** Smallest and largest value met, and where. */
  readonly low: { readonly x: number; readonly value: number };
  readonly high: { readonly x: number; readonly value: number };
  /** First and last place at which the function has a value; null where it has none at all. */
  readonly ends:
    | readonly [
        { readonly x: number; readonly value: number },
        { readonly x: number; readonly value: number },
      ]
    | null;
}

interface Point {
  readonly x: number;
  readonly value: number;
}

/**
 * @param f NaN where it is not defined.
 * @param grid increasing places to look at first, at least two.
 */
export function findRoots(f: (x: number) => number, grid: readonly number[]): RootSearch {
  const points = withEdges(f, grid);
  let low: Point = { x: Number.NaN, value: Infinity };
  let high: Point = { x: Number.NaN, value: -Infinity };
  const met = (point: Point): Point => {
    if (point.value < low.value) low = point;
    if (point.value > high.value) high = point;
    return point;
  };
  const roots: number[] = [];
  for (const [i, point] of points.entries()) {
    if (Number.isNaN(point.value)) continue;
    met(point);
    if (point.value === 0) roots.push(point.x);
    const next = points[i + 1];
    if (!next || Number.isNaN(next.value)) continue;
    if (point.value * next.value < 0) roots.push(brent(f, point, next));
  }
  for (let i = 1; i + 1 < points.length; i++) {
    const [left, middle, right] = [points[i - 1], points[i], points[i + 1]];
    if ([left, middle, right].some(({ value }) => Number.isNaN(value))) continue;
    const dip = middle.value > 0 && middle.value <= left.value && middle.value <= right.value;
    const hill = middle.value < 0 && middle.value >= left.value && middle.value >= right.value;
    if (!dip && !hill) continue;
    // A flat stretch is no extreme.
    if (middle.value === left.value && middle.value === right.value) continue;
    const turn = met(extreme(f, left.x, middle, right.x, dip ? 1 : -1));
    if (turn.value === 0) roots.push(turn.x);
    else if (turn.value * middle.value < 0) roots.push(brent(f, left, turn), brent(f, turn, right));
  }
  const defined = points.filter(({ value }) => !Number.isNaN(value));
  return {
    roots: apart(roots),
    low,
    high,
    ends: defined.length === 0 ? null : [defined[0], defined[defined.length - 1]],
  };
}

/** The grid's points with the places added where the function begins and ends to be defined, and a way up to them. */
function withEdges(f: (x: number) => number, grid: readonly number[]): Point[] {
  const points: Point[] = [];
  let before: Point | null = null;
  for (const x of grid) {
    const point: Point = { x, value: f(x) };
    if (before && Number.isNaN(before.value) !== Number.isNaN(point.value)) {
      const [inside, outside] = Number.isNaN(before.value) ? [point, before] : [before, point];
      const edge = edgeBetween(f, inside, outside.x);
      const way: Point[] = [];
      // Near its edge a function may run off to 0 or infinity: closer and closer steps follow it there.
      for (let k = 1; k <= 48; k++) {
        const at = edge.x + (inside.x - edge.x) * 2 ** -k;
        if (at === edge.x || at === inside.x) break;
        way.push({ x: at, value: f(at) });
      }
      way.push(edge);
      points.push(...(inside === point ? way.reverse() : way));
    }
    points.push(point);
    before = point;
  }
  return points;
}

/** The last place, seen from `inside`, at which the function still has a value. */
function edgeBetween(f: (x: number) => number, inside: Point, outside: number): Point {
  let good = inside;
  let bad = outside;
  for (let k = 0; k < 1100; k++) {
    const x = middleOf(good.x, bad);
    if (x === good.x || x === bad) break;
    const value = f(x);
    if (Number.isNaN(value)) bad = x;
    else good = { x, value };
  }
  return good;
}

/** The geometric mean while the ends are far apart, else the arithmetic one. */
function middleOf(a: number, b: number): number {
  if (a > 0 && b > 0 && (a > 4 * b || b > 4 * a)) return Math.sqrt(a) * Math.sqrt(b);
  return a + (b - a) / 2;
}

/** R. P. Brent, Algorithms for Minimization without Derivatives (1973), chapter 4: to the last bits of x. */
export function brent(f: (x: number) => number, from: Point, to: Point): number {
  let [a, fa] = [from.x, from.value];
  let [b, fb] = [to.x, to.value];
  if (fa === 0) return a;
  let [c, fc] = [a, fa];
  let d = b - a;
  let e = d;
  for (let k = 0; k < 300 && fb !== 0; k++) {
    if (fb * fc > 0) {
      [c, fc] = [a, fa];
      d = e = b - a;
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, fa] = [b, fb];
      [b, fb] = [c, fc];
      [c, fc] = [a, fa];
    }
    const tolerance = Number.EPSILON * Math.abs(b);
    const half = (c - b) / 2;
    if (Math.abs(half) <= tolerance) break;
    if (Math.abs(e) >= tolerance && Math.abs(fa) > Math.abs(fb)) {
      const s = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const r = fa / fc;
        const t = fb / fc;
        p = s * (2 * half * r * (r - t) - (b - a) * (t - 1));
        q = (r - 1) * (t - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      if (2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(e * q))) {
        e = d;
        d = p / q;
      } else d = e = half;
    } else d = e = half;
    [a, fa] = [b, fb];
    b += Math.abs(d) > tolerance ? d : half > 0 ? tolerance : -tolerance;
    const value = f(b);
    // Inside a bracket of defined values a hole in the domain ends the search at the last good place.
    if (Number.isNaN(value)) return a;
    fb = value;
  }
  return b;
}

/** The least (sign 1) or largest (sign −1) value between two places, by golden section from a middle that is better. */
function extreme(f: (x: number) => number, from: number, middle: Point, to: number, sign: 1 | -1): Point {
  const golden = (3 - Math.sqrt(5)) / 2;
  let [a, b] = [from, to];
  let best = middle;
  for (let k = 0; k < 120 && b - a > 4e-9 * Math.abs(best.x); k++) {
    const x = best.x - a > b - best.x ? best.x - golden * (best.x - a) : best.x + golden * (b - best.x);
    if (x === best.x) break;
    const value = f(x);
    if (Number.isNaN(value)) break;
    if (sign * value < sign * best.value) {
      if (x < best.x) b = best.x;
      else a = best.x;
      best = { x, value };
    } else if (x < best.x) a = x;
    else b = x;
    // Across zero there is nothing more to learn: both roots are bracketed.
    if (sign * best.value < 0) break;
  }
  return best;
}

/** The roots in order, each once. */
function apart(roots: readonly number[]): number[] {
  const sorted = [...roots].sort((a, b) => a - b);
  return sorted.filter((x, i) => i === 0 || x - sorted[i - 1] > 1e-12 * Math.abs(x));
}
