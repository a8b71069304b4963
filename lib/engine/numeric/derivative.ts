/**
 * A derivative by central differences, extrapolated to step zero (C. J. F. Ridders, Adv. Eng. Software 4 (1982) 75);
 * one-sided where the function ends at x.
 */
const SHRINK = 2;
const ROWS = 12;
/** The extrapolation stops once the error grows by this much: rounding has taken over. */
const SAFE = 2;
const MOST_HALVINGS = 60;
const MOST_SETTLING = 20;
const SETTLED = 0.3;

/**
 * f′(x) with an estimate of its error.
 * @param f NaN where it is not defined.
 * @param step first step, greater than 0; it is halved until f is defined on both sides of x.
 * @returns value NaN where f is defined on neither side.
 */
export function derivative(
  f: (x: number) => number,
  x: number,
  step: number,
): { readonly value: number; readonly error: number } {
  for (let h = step, k = 0; k < MOST_HALVINGS; k++, h /= 2) {
    if (x + h === x) break;
    const up = !Number.isNaN(f(x + h));
    const down = !Number.isNaN(f(x - h));
    if (up && down) {
      const quotient = (t: number): number => (f(x + t) - f(x - t)) / (2 * t);
      return extrapolate(quotient, settled(quotient, h), 2);
    }
    // A side that stays closed after some halvings is an end of the domain, not a step too large.
    if (k < 8 || (!up && !down)) continue;
    const side = up ? 1 : -1;
    const here = f(x);
    return extrapolate((t) => (side * (f(x + side * t) - here)) / t, h, 1);
  }
  return { value: Number.NaN, error: Number.NaN };
}

/** The first step, halved until the quotient changes little with it; the step itself where it never does. */
function settled(quotient: (t: number) => number, first: number): number {
  let here = quotient(first);
  for (let t = first, k = 0; k < MOST_SETTLING; k++) {
    const next = quotient(t / 2);
    if (next !== 0 && Math.abs(next - here) <= SETTLED * Math.abs(next)) return t;
    here = next;
    t /= 2;
  }
  return first;
}

/** Richardson's extrapolation of a quotient whose error goes like t^order, t^(2·order), … */
function extrapolate(
  quotient: (t: number) => number,
  first: number,
  order: 1 | 2,
): { readonly value: number; readonly error: number } {
  let before = [quotient(first)];
  let best = before[0];
  let error = Infinity;
  for (let row = 1, t = first / SHRINK; row < ROWS; row++, t /= SHRINK) {
    const now = [quotient(t)];
    for (let k = 1; k <= row; k++) {
      const factor = SHRINK ** (order * k);
      now.push((now[k - 1] * factor - before[k - 1]) / (factor - 1));
      const doubt = Math.max(Math.abs(now[k] - now[k - 1]), Math.abs(now[k] - before[k - 1]));
      if (doubt <= error) {
        error = doubt;
        best = now[k];
      }
    }
    if (Math.abs(now[row] - before[row - 1]) >= SAFE * error && row > 4) break;
    before = now;
  }
  return { value: best, error };
}
