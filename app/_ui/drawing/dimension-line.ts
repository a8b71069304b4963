/**
 * Lays out dimension lines as engineering drawings have them: extension lines from the feature, a line with slender
 * arrowheads between them, the symbol upright to the reader. Paper coordinates, y down.
 */
import type { DrawingDimension, Point } from "@/lib/engine/shape/drawing";
import { type LabelText, type Obstacles, type Rect, FONT_SIZE, labelWidth, place, rectAround } from "./label";

/** Distance of a dimension line from the feature, for an offset of 1. */
export const STANDARD_GAP = 26;
const EXTENSION_START = 4;
const EXTENSION_OVERSHOOT = 5;
const ARROW = 9;
const LABEL_HEIGHT = FONT_SIZE + 4;

export interface Arrowhead {
  readonly tip: Point;
  /** Direction in which it points, radians, y down. */
  readonly angle: number;
}

export interface PlacedDimension {
  readonly name: string;
  readonly lines: readonly { readonly from: Point; readonly to: Point }[];
  /** SVG path of an angular dimension's arc. */
  readonly arc?: string;
  readonly arrows: readonly Arrowhead[];
  readonly label: LabelText;
  /** Box of the label; the text is centred in it. */
  readonly box: Rect;
}

export function placeDimension(
  dimension: DrawingDimension,
  label: LabelText,
  obstacles: Obstacles,
): PlacedDimension {
  if (dimension.kind === "angle" && dimension.center)
    return angular(dimension, dimension.center, label, obstacles);
  return dimension.kind === "leader"
    ? leader(dimension, label, obstacles)
    : linear(dimension, label, obstacles);
}

function linear(dimension: DrawingDimension, label: LabelText, obstacles: Obstacles): PlacedDimension {
  const { from, to, name, offset = 1 } = dimension;
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]) || 1;
  const along: Point = [(to[0] - from[0]) / length, (to[1] - from[1]) / length];
  // To the left of from→to as seen on paper.
  const left: Point = [along[1], -along[0]];
  const shift = offset * STANDARD_GAP;
  const at = (point: Point, distance: number): Point => [
    point[0] + left[0] * distance,
    point[1] + left[1] * distance,
  ];
  const start = at(from, shift);
  const end = at(to, shift);
  const side = Math.sign(shift);
  const extension = (point: Point) => ({
    from: at(point, side * EXTENSION_START),
    to: at(point, shift + side * EXTENSION_OVERSHOOT),
  });
  const lines = Math.abs(shift) > EXTENSION_START ? [extension(from), extension(to)] : [];

  const direction = Math.atan2(along[1], along[0]);
  const outside = length < 3 * ARROW;
  const beyond = (point: Point, distance: number): Point => [
    point[0] + along[0] * distance,
    point[1] + along[1] * distance,
  ];
  if (outside) {
    lines.push({ from: beyond(start, -2 * ARROW), to: start }, { from: end, to: beyond(end, 2 * ARROW) });
  }
  lines.push({ from: start, to: end });

  const width = labelWidth(label) + 6;
  const middle: Point = [(start[0] + end[0]) / 2, (start[1] + end[1]) / 2];
  const across = Math.abs(along[0]) * width + Math.abs(along[1]) * LABEL_HEIGHT;
  const normal = Math.abs(left[0]) * width + Math.abs(left[1]) * LABEL_HEIGHT;
  const away = side || 1;
  const candidates: { readonly box: Rect }[] = [];
  const candidate = (point: Point) =>
    candidates.push({ box: rectAround(point[0], point[1], width, LABEL_HEIGHT) });
  if (length > across + 3 * ARROW) candidate(middle);
  const step = normal / 2 + 3;
  candidate([middle[0] + left[0] * away * step, middle[1] + left[1] * away * step]);
  const reach = across / 2 + (outside ? 2 * ARROW : 0) + 4;
  candidate(beyond(end, reach));
  candidate(beyond(start, -reach));
  candidate([middle[0] - left[0] * away * step, middle[1] - left[1] * away * step]);

  return {
    name,
    lines,
    arrows: [
      { tip: start, angle: outside ? direction : direction + Math.PI },
      { tip: end, angle: outside ? direction + Math.PI : direction },
    ],
    label,
    ...place(candidates, obstacles),
  };
}

/** Points at a curve from outside, or from the centre where the label finds room inside. */
function leader(dimension: DrawingDimension, label: LabelText, obstacles: Obstacles): PlacedDimension {
  const { from, to, name, offset = 1 } = dimension;
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const outward: Point =
    length > 0 ? [(to[0] - from[0]) / length, (to[1] - from[1]) / length] : [0.7071, -0.7071];
  const reach = Math.max(1, Math.abs(offset)) * STANDARD_GAP;
  const width = labelWidth(label) + 6;
  const outside = [0, 0.6, -0.6, 1.1, -1.1].map((turn) => {
    const cos = Math.cos(turn);
    const sin = Math.sin(turn);
    const direction: Point = [outward[0] * cos - outward[1] * sin, outward[0] * sin + outward[1] * cos];
    const knee: Point = [to[0] + direction[0] * reach, to[1] + direction[1] * reach];
    const shelf: Point = [knee[0] + (direction[0] >= 0 ? 8 : -8), knee[1]];
    const center = shelf[0] + (direction[0] >= 0 ? width / 2 : -width / 2);
    return {
      angle: Math.atan2(-direction[1], -direction[0]),
      lines: [
        { from: to, to: knee },
        { from: knee, to: shelf },
      ],
      box: rectAround(center, knee[1], width, LABEL_HEIGHT),
    };
  });
  const inside = {
    angle: Math.atan2(outward[1], outward[0]),
    lines: [{ from, to }],
    box: rectAround(
      from[0] - outward[0] * (width / 2) * Math.abs(outward[0]),
      from[1] - outward[1] * LABEL_HEIGHT * 0.7,
      width,
      LABEL_HEIGHT,
    ),
  };
  const { angle, lines, box } = place(length > 20 ? [...outside, inside] : outside, obstacles);
  return { name, lines, arrows: [{ tip: to, angle }], label, box };
}

function angular(
  dimension: DrawingDimension,
  center: Point,
  label: LabelText,
  obstacles: Obstacles,
): PlacedDimension {
  const { from, to, name, offset = 1 } = dimension;
  const angleOf = (point: Point) => Math.atan2(point[1] - center[1], point[0] - center[0]);
  const first = angleOf(from);
  let sweep = angleOf(to) - first;
  // The angle runs counter-clockwise as seen on paper, which is towards smaller values here.
  while (sweep > -1e-6) sweep -= 2 * Math.PI;
  const outer = Math.max(
    Math.hypot(from[0] - center[0], from[1] - center[1]),
    Math.hypot(to[0] - center[0], to[1] - center[1]),
  );
  const radius = Math.max(outer + offset * STANDARD_GAP, 12);
  const at = (angle: number, distance: number): Point => [
    center[0] + distance * Math.cos(angle),
    center[1] + distance * Math.sin(angle),
  ];
  const last = first + sweep;
  const start = at(first, radius);
  const end = at(last, radius);
  const lines = [first, last].map((angle) => ({
    from: at(angle, outer + Math.sign(offset) * EXTENSION_START),
    to: at(angle, radius + Math.sign(offset) * EXTENSION_OVERSHOOT),
  }));
  const width = labelWidth(label) + 6;
  const outside = Math.abs(sweep) * radius < 3 * ARROW;
  const middle = first + sweep / 2;
  const candidates = [radius, radius + 16, radius + 30].map((distance) => {
    const [x, y] = at(
      middle,
      distance + (width / 2) * Math.abs(Math.cos(middle)) * (distance === radius ? 0 : 1),
    );
    return { box: rectAround(x, y, width, LABEL_HEIGHT) };
  });
  const large = Math.abs(sweep) > Math.PI ? 1 : 0;
  return {
    name,
    lines,
    arc: `M${round(start[0])} ${round(start[1])}A${round(radius)} ${round(radius)} 0 ${large} 0 ${round(end[0])} ${round(end[1])}`,
    arrows: [
      { tip: start, angle: first + (outside ? -Math.PI / 2 : Math.PI / 2) },
      { tip: end, angle: last + (outside ? Math.PI / 2 : -Math.PI / 2) },
    ],
    label,
    ...place(Math.abs(sweep) * radius > width + 4 * ARROW ? candidates : candidates.slice(1), obstacles),
  };
}

export function round(value: number): number {
  return Math.round(value * 100) / 100;
}
