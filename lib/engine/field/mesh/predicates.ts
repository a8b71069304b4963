import { incircle, orient2d } from "robust-predicates";

/**
 * The one sign convention of all geometry here: y points up, counter-clockwise is positive.
 *
 * Both predicates are exact in sign (adaptive arithmetic; J. R. Shewchuk, Discrete & Computational Geometry 18
 * (1997) 305). The package counts orientation with y down, its in-circle test with y up; this file is the only
 * place that knows.
 */

/** Twice the signed area of a, b, c with an exact sign: positive when c lies to the left of a→b. */
export function orient(ax: number, ay: number, bx: number, by: number, cx: number, cy: number): number {
  return -orient2d(ax, ay, bx, by, cx, cy);
}

/** Positive when d lies strictly inside the circle through a, b, c, which run counter-clockwise. */
export { incircle as inCircle };
