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

/** Arrows into the soil from the sides of a rod and from its end. */
export function rodArrows(x: number, length: number, diameter: number): DrawingView["flow"] {
  const reach = 0.3 * length;
  const half = diameter / 2;
  const sides = [-1, 1].flatMap((side) =>
    [0.35, 0.7].map((part) => ({
      from: [x + side * (half + 0.1 * reach), -part * length] as const,
      to: [x + side * (half + reach), -part * length] as const,
    })),
  );
  return [...sides, { from: [x, -length - 0.1 * reach], to: [x, -length - 0.8 * reach] }];
}

/** Arrows into the soil from a round wire seen in section: down and to both sides. */
export function wireArrows(x: number, y: number, radius: number, reach: number): DrawingView["flow"] {
  const directions: readonly Point[] = [
    [-1, 0],
    [1, 0],
    [0, -1],
  ];
  return directions.map(([dx, dy]) => ({
    from: [x + 1.2 * radius * dx, y + 1.2 * radius * dy],
    to: [x + (1.2 * radius + reach) * dx, y + (1.2 * radius + reach) * dy],
  }));
}

/** Arrows down from a straight horizontal conductor, at these parts of its length. */
export function downArrows(left: number, right: number, y: number, reach: number): DrawingView["flow"] {
  return [0.2, 0.5, 0.8].map((part) => {
    const x = left + part * (right - left);
    return { from: [x, y - 0.15 * reach], to: [x, y - reach] };
  });
}
