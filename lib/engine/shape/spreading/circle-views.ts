/** Parts of the drawings of round electrodes. */
import type { DrawingPath, DrawingView, Point } from "../drawing";
import { arc, circle, polyline, rectangle } from "../drawing";

type Flow = DrawingView["flow"][number];

export function segment(from: Point, to: Point): DrawingPath {
  return polyline([from, to]);
}

/** Straight arrows between the points at two radii round a centre, one for each angle. */
export function radialArrows(
  center: Point,
  from: number,
  to: number,
  angles: readonly number[],
): readonly Flow[] {
  const at = (radius: number, angle: number): Point => [
    center[0] + radius * Math.cos(angle),
    center[1] + radius * Math.sin(angle),
  ];
  return angles.map((angle) => ({ from: at(from, angle), to: at(to, angle) }));
}

/** A round hole in a block of medium that reaches from `left` to `right` and `bottom` to `top`. */
export function blockWithHoles(
  left: number,
  bottom: number,
  right: number,
  top: number,
  holes: readonly { readonly center: Point; readonly radius: number }[],
): readonly DrawingPath[] {
  return [
    rectangle(left, bottom, right - left, top - bottom),
    ...holes.map(({ center, radius }) => circle(center, radius)),
  ];
}

/** The lower half of a circle, from left to right. */
export function lowerHalf(center: Point, radius: number): DrawingPath {
  return arc(center, radius, Math.PI, 2 * Math.PI);
}
