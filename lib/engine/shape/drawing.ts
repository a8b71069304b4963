/**
 * What a shape says about its picture: plain geometry in metres (y up), computed from the dimensions. One component
 * of the pages turns it into an engineering drawing; nothing here knows pixels or colours.
 */

export type Point = readonly [number, number];

/** A path step: straight to a point, or along a circular arc to it (`bulge` as the signed included angle in radians, counter-clockwise positive). */
export interface PathStep {
  readonly to: Point;
  readonly bulge?: number;
}

export interface DrawingPath {
  readonly from: Point;
  readonly steps: readonly PathStep[];
  readonly closed?: boolean;
}

/** A dimension line: between two points, along an arc for an angle, or a leader to a diameter. */
export interface DrawingDimension {
  /** Name of the dimension it shows, as in the request. */
  readonly name: string;
  readonly from: Point;
  readonly to: Point;
  /** `linear` is drawn parallel to from→to; `angle` around `center`; `leader` points at `to` from outside. */
  readonly kind: "linear" | "angle" | "leader";
  readonly center?: Point;
  /** Distance of the dimension line from the points, in multiples of the drawing's standard gap, to the left of from→to. */
  readonly offset?: number;
}

export interface DrawingView {
  /** In the words of the trade: "plan", "section", "side view". */
  readonly title: string;
  /** Filled conductor; inner closed paths are holes (even-odd rule). */
  readonly conductor: readonly DrawingPath[];
  /** Second medium (cladding, lower layer), drawn with another hatch. */
  readonly second?: readonly DrawingPath[];
  /** Thin lines: axes, hidden edges, the ground surface. */
  readonly lines?: readonly (DrawingPath & { readonly style: "axis" | "hidden" | "thin" | "ground" })[];
  readonly high: readonly DrawingPath[];
  readonly low: readonly DrawingPath[];
  /** Current arrows, tail to head. */
  readonly flow: readonly { readonly from: Point; readonly to: Point }[];
  readonly dimensions: readonly DrawingDimension[];
}

/** One view, or two side by side (for instance side view and cross section). */
export interface Drawing {
  readonly views: readonly DrawingView[];
  /** What the picture shows, in one sentence, for readers who do not see it. */
  readonly description: string;
}

/** A straight path through points. */
export function polyline(points: readonly Point[], closed = false): DrawingPath {
  return { from: points[0], steps: points.slice(1).map((to) => ({ to })), closed };
}

/** A rectangle from its lower left corner. */
export function rectangle(x: number, y: number, width: number, height: number): DrawingPath {
  return polyline(
    [
      [x, y],
      [x + width, y],
      [x + width, y + height],
      [x, y + height],
    ],
    true,
  );
}

/** A full circle as two half arcs. */
export function circle(center: Point, radius: number): DrawingPath {
  const [x, y] = center;
  return {
    from: [x + radius, y],
    steps: [
      { to: [x - radius, y], bulge: Math.PI },
      { to: [x + radius, y], bulge: Math.PI },
    ],
    closed: true,
  };
}

/** The arc of a circle from one polar angle to another (radians, counter-clockwise). */
export function arc(center: Point, radius: number, start: number, end: number): DrawingPath {
  const at = (angle: number): Point => [
    center[0] + radius * Math.cos(angle),
    center[1] + radius * Math.sin(angle),
  ];
  const middle = (start + end) / 2;
  return {
    from: at(start),
    steps: [
      { to: at(middle), bulge: middle - start },
      { to: at(end), bulge: end - middle },
    ],
  };
}
