/** Fits one view with its dimension lines into a given width of paper. */
import type { DrawingPath, DrawingView, Point } from "@/lib/engine/shape/drawing";
import { type PlacedDimension, placeDimension, round } from "./dimension-line";
import { arcOf, boxOf, edgePoints, insideOf, mapView, outlinePoints, pathsOf, sides } from "./geometry";
import { type LabelText, type Obstacles, type Rect, union } from "./label";
import { readable } from "./readable";

/** Everything in paper coordinates (pixels, y down), to be moved by `shift` so that the ink starts at the origin. */
export interface ViewLayout {
  readonly title: string;
  readonly shift: Point;
  readonly width: number;
  readonly height: number;
  readonly conductor: string;
  readonly second: string;
  readonly lines: readonly { readonly path: string; readonly style: "axis" | "hidden" | "thin" | "ground" }[];
  /** Short slanting marks under each ground line. */
  readonly soil: readonly string[];
  readonly high: readonly string[];
  readonly low: readonly string[];
  readonly flow: readonly { readonly from: Point; readonly to: Point }[];
  readonly dimensions: readonly PlacedDimension[];
  readonly distorted: boolean;
  /** The larger extent of the body itself, without its dimension lines. */
  readonly bodySize: number;
}

const PADDING = 4;
/** Room that the body gets even where the labels ask for all of it, pixels. */
const SMALLEST_BODY = 48;
const SOIL_MARK = 6;
const SOIL_SPACING = 9;

/**
 * @param labels What to write at each dimension, by its name.
 * @param width Paper width, pixels.
 * @param maxHeight Height that the body itself may take, pixels.
 */
export function layoutView(
  view: DrawingView,
  labels: Readonly<Record<string, LabelText>>,
  width: number,
  maxHeight: number,
): ViewLayout {
  // Dimension lines stand outside the body, and how far is known only once they are placed: shrink until it fits.
  const room = width - 2 * PADDING;
  let inner = room;
  let laid = attempt(view, labels, inner, maxHeight);
  for (let tries = 0; tries < 16 && laid.ink.width > room && inner > SMALLEST_BODY; tries += 1) {
    // A label that changes its place may undo a small step.
    inner = Math.max(SMALLEST_BODY, inner - Math.max(6, laid.ink.width - room));
    laid = attempt(view, labels, inner, maxHeight);
  }
  const { ink, paper, dimensions, distorted } = laid;
  return {
    title: view.title,
    shift: [(width - ink.width) / 2 - ink.x, PADDING - ink.y],
    width,
    height: ink.height + 2 * PADDING,
    conductor: paper.conductor.map(svgPath).join(""),
    second: (paper.second ?? []).map(svgPath).join(""),
    lines: (paper.lines ?? []).map((line) => ({ path: svgPath(line), style: line.style })),
    soil: (paper.lines ?? []).filter(({ style }) => style === "ground").map(soilMarks),
    high: paper.high.map(svgPath),
    low: paper.low.map(svgPath),
    flow: paper.flow.map(({ from, to }) => visibleArrow(from, to)),
    dimensions,
    distorted,
    bodySize: laid.bodySize,
  };
}

interface Attempt {
  readonly paper: DrawingView;
  readonly dimensions: readonly PlacedDimension[];
  readonly ink: Rect;
  readonly distorted: boolean;
  readonly bodySize: number;
}

function attempt(
  view: DrawingView,
  labels: Readonly<Record<string, LabelText>>,
  width: number,
  height: number,
): Attempt {
  const fitted = readable(view, width, height);
  const flip = ([x, y]: Point): Point => [x, -y];
  const paper = mapView(fitted.view, flip, (path) => ({
    ...path,
    from: flip(path.from),
    steps: path.steps.map((step) => ({ to: flip(step.to), bulge: step.bulge && -step.bulge })),
  }));
  const bodies = [...paper.conductor, ...(paper.second ?? [])];
  const taken: Rect[] = [];
  const obstacles: Obstacles = {
    rects: taken,
    edges: [
      ...[...bodies, ...paper.high, ...paper.low].flatMap(edgePoints),
      ...paper.flow.flatMap(({ from, to }) => edgePoints({ from, steps: [{ to }] })),
    ],
    inBody: insideOf(bodies),
  };
  const dimensions: PlacedDimension[] = [];
  for (const dimension of paper.dimensions) {
    const label = labels[dimension.name];
    if (!label) continue;
    const placed = placeDimension(dimension, label, obstacles);
    dimensions.push(placed);
    taken.push(placed.box, ...placed.lines.map(({ from, to }) => rectOf([from, to])));
  }
  const all = outlinePoints(pathsOf(paper));
  const ink = union([
    rectOf(all, paper.lines?.some(({ style }) => style === "ground") ? SOIL_MARK : 3),
    ...paper.flow.map(({ from, to }) => rectOf([from, to], 3)),
    ...dimensions.flatMap((placed) => [
      placed.box,
      ...placed.lines.map(({ from, to }) => rectOf([from, to], 1)),
      ...placed.arrows.map(({ tip }) => rectOf([tip], 4)),
    ]),
  ]);
  const body = rectOf(all);
  return { paper, dimensions, ink, distorted: fitted.distorted, bodySize: Math.max(body.width, body.height) };
}

function rectOf(points: readonly Point[], margin = 0): Rect {
  const { left, right, bottom, top } = boxOf(points);
  return {
    x: left - margin,
    y: bottom - margin,
    width: right - left + 2 * margin,
    height: top - bottom + 2 * margin,
  };
}

function svgPath(path: DrawingPath): string {
  const at = (point: Point) => point.map(round).join(" ");
  const steps = sides(path).map(({ from, step }) => {
    const arc = arcOf(from, step);
    if (!arc) return `L${at(step.to)}`;
    const radius = round(arc.radius);
    const large = Math.abs(arc.sweep) > Math.PI ? 1 : 0;
    return `A${radius} ${radius} 0 ${large} ${arc.sweep > 0 ? 1 : 0} ${at(step.to)}`;
  });
  return `M${at(path.from)}${steps.join("")}${path.closed ? "Z" : ""}`;
}

function soilMarks(line: DrawingPath): string {
  const marks = sides(line).flatMap(({ from, step }) => {
    const length = Math.hypot(step.to[0] - from[0], step.to[1] - from[1]);
    const count = Math.floor(length / SOIL_SPACING);
    return Array.from({ length: count }, (_, index) => {
      const share = (index + 1) / (count + 1);
      const x = from[0] + share * (step.to[0] - from[0]);
      const y = from[1] + share * (step.to[1] - from[1]);
      return `M${round(x)} ${round(y)}l${-SOIL_MARK} ${SOIL_MARK}`;
    });
  });
  return marks.join("");
}

/** An arrow keeps a length at which its direction can be seen. */
function visibleArrow(from: Point, to: Point): { readonly from: Point; readonly to: Point } {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  if (length === 0 || length >= 14) return { from, to };
  const grow = (14 / length - 1) / 2;
  return {
    from: [from[0] - (to[0] - from[0]) * grow, from[1] - (to[1] - from[1]) * grow],
    to: [to[0] + (to[0] - from[0]) * grow, to[1] + (to[1] - from[1]) * grow],
  };
}
