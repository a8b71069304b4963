/** Parts of the plans of sheet patterns. */
import type { DrawingPath, Point } from "../drawing";
import { polyline } from "../drawing";

/** A closed outline through points. */
export function outline(...points: readonly Point[]): DrawingPath {
  return polyline(points, true);
}

export function edge(from: Point, to: Point): DrawingPath {
  return polyline([from, to]);
}

/** An arrow along x from x₁ to x₂ at height y. */
export function along(x1: number, x2: number, y: number): { readonly from: Point; readonly to: Point } {
  return { from: [x1, y], to: [x2, y] };
}

/** An arrow along y from y₁ to y₂ at x. */
export function upwards(y1: number, y2: number, x: number): { readonly from: Point; readonly to: Point } {
  return { from: [x, y1], to: [x, y2] };
}
