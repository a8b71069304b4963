/** The whole numbers at which a function meets zero, or between which it passes it. */

export interface WholeSearch {
  /** Numbers of a solution, and whether it meets zero there (else its neighbour is the other side). */
  readonly found: readonly { readonly n: number; readonly exact: boolean }[];
  /** First and last number at which the function has a value; null where it has none at all. */
  readonly ends: readonly [Place, Place] | null;
  /** Smallest and largest value met, and where. */
  readonly low: Place;
  readonly high: Place;
}

interface Place {
  readonly x: number;
  readonly value: number;
}

const EVERY = 200;
const GROWTH = 1.05;

/**
 * Looks at every number up to some hundred past `from`, then at steps of 5 % with a bisection where the sign changes.
 * @param f NaN where it is not defined.
 * @param meets whether a value counts as zero.
 */
export function findWholeNumbers(
  f: (n: number) => number,
  from: number,
  to: number,
  meets: (n: number, value: number) => boolean,
): WholeSearch {
  const places: Place[] = [];
  for (let n = from; n <= to; n = n < from + EVERY ? n + 1 : Math.max(n + 1, Math.ceil(n * GROWTH))) {
    places.push({ x: n, value: f(n) });
  }
  const last = places[places.length - 1];
  if (last && last.x < to) places.push({ x: to, value: f(to) });
  const defined = places.filter(({ value }) => !Number.isNaN(value));
  const found = new Map<number, boolean>();
  for (const { x, value } of defined) if (meets(x, value)) found.set(x, true);
  for (let i = 1; i < defined.length; i++) {
    let [a, b] = [defined[i - 1], defined[i]];
    if (a.value * b.value >= 0) continue;
    while (b.x - a.x > 1) {
      const x = Math.floor((a.x + b.x) / 2);
      const middle = { x, value: f(x) };
      if (a.value * middle.value <= 0) b = middle;
      else a = middle;
    }
    const exact = [a, b].filter(({ x, value }) => meets(x, value));
    if (exact.length > 0) for (const { x } of exact) found.set(x, true);
    else for (const { x } of [a, b]) if (!found.has(x)) found.set(x, false);
  }
  return {
    found: [...found].map(([n, exact]) => ({ n, exact })).sort((a, b) => a.n - b.n),
    ends: defined.length === 0 ? null : [defined[0], defined[defined.length - 1]],
    low: defined.reduce((least, place) => (place.value < least.value ? place : least), defined[0]),
    high: defined.reduce((most, place) => (place.value > most.value ? place : most), defined[0]),
  };
}
