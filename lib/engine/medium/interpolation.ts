/**
 * Interpolation between increasing positions: linear, linear in the logarithm, or monotone cubic (Fritsch and Carlson,
 * SIAM J. Numer. Anal. 17 (1980) 238; slopes limited so that no interval overshoots).
 */

export type Interpolation = "linear" | "log" | "monotone-cubic";

/** Value at `t` past the start of interval `i` (0 … n − 2); also a little outside of it. */
export type IntervalLaw = (i: number, t: number) => number;

/** The law of each interval. Positions increase strictly; `log` needs values greater than 0. */
export function intervalLaw(
  positions: ArrayLike<number>,
  values: ArrayLike<number>,
  interpolation: Interpolation,
): IntervalLaw {
  const n = positions.length;
  if (interpolation === "monotone-cubic") return monotoneCubic(positions, values);
  const slopes = new Float64Array(n - 1);
  if (interpolation === "log") {
    for (let i = 0; i < n - 1; i++) {
      slopes[i] = logRatio(values[i], values[i + 1]) / (positions[i + 1] - positions[i]);
    }
    return (i, t) => values[i] * Math.exp(slopes[i] * t);
  }
  const widths = new Float64Array(n - 1);
  for (let i = 0; i < n - 1; i++) {
    widths[i] = positions[i + 1] - positions[i];
    slopes[i] = (values[i + 1] - values[i]) / widths[i];
  }
  // Measured from the nearer end, so that a value close to zero at the far end keeps its digits.
  return (i, t) =>
    2 * t <= widths[i] ? values[i] + slopes[i] * t : values[i + 1] - slopes[i] * (widths[i] - t);
}

/** ln(b/a) that keeps its digits where b is close to a. */
export function logRatio(a: number, b: number): number {
  const relative = (b - a) / a;
  return Math.abs(relative) < 0.5 ? Math.log1p(relative) : Math.log(b) - Math.log(a);
}

function monotoneCubic(positions: ArrayLike<number>, values: ArrayLike<number>): IntervalLaw {
  const n = positions.length;
  const secant = new Float64Array(n - 1);
  for (let i = 0; i < n - 1; i++) secant[i] = (values[i + 1] - values[i]) / (positions[i + 1] - positions[i]);
  const tangent = new Float64Array(n);
  tangent[0] = secant[0];
  tangent[n - 1] = secant[n - 2];
  for (let i = 1; i < n - 1; i++) {
    tangent[i] = secant[i - 1] * secant[i] <= 0 ? 0 : (secant[i - 1] + secant[i]) / 2;
  }
  for (let i = 0; i < n - 1; i++) {
    if (secant[i] === 0) {
      tangent[i] = 0;
      tangent[i + 1] = 0;
      continue;
    }
    const a = tangent[i] / secant[i];
    const b = tangent[i + 1] / secant[i];
    const size = Math.hypot(a, b);
    if (size > 3) {
      tangent[i] = (3 * a * secant[i]) / size;
      tangent[i + 1] = (3 * b * secant[i]) / size;
    }
  }
  const quadratic = new Float64Array(n - 1);
  const cubic = new Float64Array(n - 1);
  for (let i = 0; i < n - 1; i++) {
    const width = positions[i + 1] - positions[i];
    quadratic[i] = (3 * secant[i] - 2 * tangent[i] - tangent[i + 1]) / width;
    cubic[i] = (tangent[i] + tangent[i + 1] - 2 * secant[i]) / (width * width);
  }
  return (i, t) => values[i] + t * (tangent[i] + t * (quadratic[i] + t * cubic[i]));
}

/** The interval (0 … n − 2) that holds x; the first or last one outside the range. */
export function findInterval(positions: ArrayLike<number>, x: number): number {
  let low = 0;
  let high = positions.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (positions[middle] <= x) low = middle;
    else high = middle;
  }
  return low;
}

/** The interpolated value at any x; outside the range the end intervals go on. */
export function tableInterpolator(
  positions: ArrayLike<number>,
  values: ArrayLike<number>,
  interpolation: Interpolation,
): (x: number) => number {
  const law = intervalLaw(positions, values, interpolation);
  return (x) => {
    const i = findInterval(positions, x);
    return law(i, x - positions[i]);
  };
}
