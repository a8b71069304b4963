/** Parts that the drawings of earth electrodes have in common: the surface of the ground, rods and wires in it. */
import { polyline, rectangle, type DrawingPath, type DrawingView, type Point } from "../drawing";

type Line = NonNullable<DrawingView["lines"]>[number];

/** The surface of the ground from left to right at height 0. */
export function groundLine(left: number, right: number): Line {
  return {
    ...polyline([
      [left, 0],
      [right, 0],
    ]),
    style: "ground",
  };
}

/** A straight line of a style between two points. */
export function line(from: Point, to: Point, style: Line["style"]): Line {
  return { ...polyline([from, to]), style };
}

/** A rod driven from the surface straight down, its axis at x. */
export function rodAt(x: number, length: number, diameter: number): DrawingPath {
  return rectangle(x - diameter / 2, -length, diameter, length);
}

/** Arrows from an electrode into the soil, around a middle point: left, right and down. */
export function spreadingArrows(x: number, y: number, reach: number): DrawingView["flow"] {
  const directions: readonly Point[] = [
    [-1, 0],
    [1, 0],
    [0, -1],
  ];
  return directions.map(([dx, dy]) => ({
    from: [x + 0.25 * reach * dx, y + 0.25 * reach * dy],
    to: [x + reach * dx, y + reach * dy],
  }));
}
