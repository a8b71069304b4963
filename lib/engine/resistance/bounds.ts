/** Bounds around a value: outward, never of zero width, and refused where a double cannot hold them. */

/** Relative rounding error that a closed form may have (3-engine: at most 1e-13 over the whole domain). */
export const CLOSED_FORM_ERROR = 1e-13;

/** Rounding of an integral beyond its own estimate: the medium's law, the section, the sum. */
export const QUADRATURE_FLOOR = 2e-14;

export interface Bounds {
  readonly value: number;
  readonly lower: number;
  readonly upper: number;
}

/** Smallest and largest value that keeps a double's full precision, with room for the bounds. */
const SMALLEST = 1e-300;
const LARGEST = 1e300;

/** Whether a double holds the value with its full precision. */
export function isRepresentable(value: number): boolean {
  return value >= SMALLEST && value <= LARGEST;
}

/** value·(1 ∓ relative), outward; `relative` is at least a few ulp. */
export function around(value: number, relative: number): Bounds {
  const part = Math.max(relative, 4 * Number.EPSILON);
  return { value, lower: value * (1 - part), upper: value * (1 + part) };
}

/** Bounds from a lower and an upper value, each widened outward by `relative`, with the value inside. */
export function between(value: number, lower: number, upper: number, relative: number): Bounds {
  const part = Math.max(relative, 4 * Number.EPSILON);
  return { value, lower: Math.min(value, lower) * (1 - part), upper: Math.max(value, upper) * (1 + part) };
}
