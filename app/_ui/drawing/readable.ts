/**
 * Brings a view to paper size. Where true proportions would hide something (a wall of a hundredth of its radius, a bar
 * as long as a hall), distances are widened until they can be read, and the drawing says that it is not to scale.
 */
import type { DrawingPath, DrawingView, Point } from "@/lib/engine/shape/drawing";
import {
  type Arc,
  type Box,
  type PointMap,
  arcOf,
  boxOf,
  mapView,
  outlinePoints,
  pathsOf,
  sampleArc,
  sides,
} from "./geometry";
import { type Need, distinct, stretch } from "./stretch";

export interface ReadableView {
  /** In pixels, y up, lower left corner of the drawing near the origin. */
  readonly view: DrawingView;
  readonly box: Box;
  readonly distorted: boolean;
}

/** Pixels that must remain of a dimensioned distance, of a wall between two faces, of a whole body. */
const DIMENSION = 26;
const WALL = 20;
const BODY = 44;
/** An angle smaller than this (radians) is opened up to it. */
const ANGLE = 0.42;
/** With more slanting sides than this a view has curves made of short straight sides, which widening would dent. */
const SLANTING = 16;

export function readable(view: DrawingView, width: number, height: number): ReadableView {
  const box = boxOf([
    ...outlinePoints(pathsOf(view)),
    ...view.dimensions.flatMap(({ from, to, center }) => (center ? [from, to, center] : [from, to])),
  ]);
  const spanX = box.right - box.left;
  const spanY = box.top - box.bottom;
  const scale = Math.min(spanX > 0 ? width / spanX : Infinity, spanY > 0 ? height / spanY : Infinity);
  const arcs = [...view.conductor, ...view.high, ...view.low].flatMap((path) =>
    sides(path).flatMap(({ from, step }) => arcOf(from, step) ?? []),
  );
  const center = commonCenter(arcs, view);
  const mapped = center
    ? polar(view, arcs, center, scale, Math.min(width, height))
    : perAxis(view, arcs, box, scale, width, height);

  // What was widened may have outgrown the paper: a last uniform step brings it back.
  const now = boxOf([
    ...outlinePoints(pathsOf(mapped.view)),
    ...mapped.view.dimensions.flatMap(({ from, to }) => [from, to]),
  ]);
  const fit = Math.min(width / Math.max(now.right - now.left, 1), height / Math.max(now.top - now.bottom, 1));
  const move: PointMap = ([x, y]) => [(x - now.left) * fit, (y - now.bottom) * fit];
  const final = mapView(mapped.view, move, (path) => ({
    ...path,
    from: move(path.from),
    steps: path.steps.map((step) => ({ ...step, to: move(step.to) })),
  }));
  return {
    view: final,
    box: { left: 0, bottom: 0, right: (now.right - now.left) * fit, top: (now.top - now.bottom) * fit },
    distorted: mapped.distorted,
  };
}

interface Mapped {
  readonly view: DrawingView;
  readonly distorted: boolean;
}

/** The centre that all arcs share, if they do. */
function commonCenter(arcs: readonly Arc[], view: DrawingView): Point | null {
  if (arcs.length === 0) return null;
  const radius = Math.max(...arcs.map((arc) => arc.radius));
  const stated = view.dimensions.find((dimension) => dimension.center)?.center;
  const center =
    stated ?? arcs.reduce((best, arc) => (Math.abs(arc.sweep) > Math.abs(best.sweep) ? arc : best)).center;
  // A centre found from a nearly straight arc is uncertain by about 1e-16 of the radius over its sweep squared.
  const near = ({ center: [x, y], sweep }: Arc) =>
    Math.hypot(x - center[0], y - center[1]) <= radius * (1e-9 + 1e-15 / (sweep * sweep));
  return arcs.every(near) ? center : null;
}

function polar(view: DrawingView, arcs: readonly Arc[], center: Point, scale: number, paper: number): Mapped {
  const largest = Math.max(...arcs.map((arc) => arc.radius));
  const radii = distinct(
    arcs.map((arc) => arc.radius),
    1e-14 * largest,
  );
  const sector = sectorOf(arcs);
  const needs: Need[] = radii
    .slice(1)
    .map((radius, index) => ({ from: radii[index], to: radius, pixels: WALL }));
  const centerShown = view.dimensions.some(
    ({ from, to }) => radiusOf(from, center) < 1e-9 * largest || radiusOf(to, center) < 1e-9 * largest,
  );
  if (!sector || centerShown) needs.push({ from: 0, to: radii[0], pixels: WALL });
  for (const { kind, from, to } of view.dimensions) {
    const a = radiusOf(from, center);
    const b = radiusOf(to, center);
    if (kind === "linear" && Math.abs(a - b) > 1e-14 * largest)
      needs.push({ from: a, to: b, pixels: DIMENSION });
  }
  const radial = stretch(0, largest, scale, Math.max(largest * scale, paper / 2), needs);
  const opening = sector && sector.sweep < ANGLE ? ANGLE / sector.sweep : 1;

  const point: PointMap = (place) => {
    const radius = radial.map(radiusOf(place, center));
    const angle = Math.atan2(place[1] - center[1], place[0] - center[0]);
    const turned = sector ? sector.middle + wrap(angle - sector.middle) * opening : angle;
    return [radius * Math.cos(turned), radius * Math.sin(turned)];
  };
  const path = (source: DrawingPath): DrawingPath => ({
    ...source,
    from: point(source.from),
    steps: source.steps.map((step) => ({ to: point(step.to), bulge: step.bulge && step.bulge * opening })),
  });
  return { view: mapView(view, point, path), distorted: radial.distorted || opening > 1 };
}

/** The angular range of arcs that do not close to circles. */
function sectorOf(arcs: readonly Arc[]): { readonly middle: number; readonly sweep: number } | null {
  const reference = arcs[0].start + arcs[0].sweep / 2;
  let low = Infinity;
  let high = -Infinity;
  for (const { start, sweep } of arcs) {
    const middle = wrap(start + sweep / 2 - reference);
    low = Math.min(low, middle - Math.abs(sweep) / 2);
    high = Math.max(high, middle + Math.abs(sweep) / 2);
  }
  return high - low > 2 * Math.PI - 1e-6 ? null : { middle: reference + (low + high) / 2, sweep: high - low };
}

function perAxis(
  view: DrawingView,
  arcs: readonly Arc[],
  box: Box,
  scale: number,
  width: number,
  height: number,
): Mapped {
  const needs = isCurved(view) ? [[], []] : [axisNeeds(view, arcs, 0), axisNeeds(view, arcs, 1)];
  // A circle keeps its shape only where both axes ask for the same.
  const pixels = arcs.some(({ sweep }) => Math.abs(sweep) > 3) ? DIMENSION : BODY;
  const whole = (low: number, high: number): Need[] => (high > low ? [{ from: low, to: high, pixels }] : []);
  const x = stretch(box.left, box.right, scale, width, [...needs[0], ...whole(box.left, box.right)]);
  const y = stretch(box.bottom, box.top, scale, height, [...needs[1], ...whole(box.bottom, box.top)]);
  const distorted = x.distorted || y.distorted;
  const point: PointMap = (place) => [x.map(place[0]), y.map(place[1])];
  const path = (source: DrawingPath): DrawingPath => ({
    ...source,
    from: point(source.from),
    steps: sides(source).flatMap(({ from, step }) => {
      const arc = arcOf(from, step);
      if (!arc) return [{ to: point(step.to) }];
      // Under unequal scales an arc is no arc any more.
      if (distorted) return sampleArc(arc, 24).map((place) => ({ to: point(place) }));
      return [{ to: point(step.to), bulge: step.bulge }];
    }),
  });
  return { view: mapView(view, point, path), distorted };
}

function isCurved(view: DrawingView): boolean {
  const slanting = [...view.conductor, ...(view.second ?? []), ...view.high, ...view.low].flatMap((path) =>
    sides(path).filter(({ from, step }) => !step.bulge && from[0] !== step.to[0] && from[1] !== step.to[1]),
  );
  return slanting.length > SLANTING;
}

/** What has to stay apart along one axis: dimensioned distances, parallel faces, circles. */
function axisNeeds(view: DrawingView, arcs: readonly Arc[], axis: 0 | 1): Need[] {
  const needs: Need[] = [];
  const other = axis === 0 ? 1 : 0;
  for (const { kind, from, to } of view.dimensions) {
    const along = Math.abs(to[axis] - from[axis]);
    if (kind === "linear" && along > 0 && along > 0.3 * Math.abs(to[other] - from[other])) {
      needs.push({ from: from[axis], to: to[axis], pixels: DIMENSION });
    }
  }
  const faces: number[] = [];
  for (const path of [...view.conductor, ...(view.second ?? []), ...view.high, ...view.low]) {
    for (const { from, step } of sides(path)) {
      if (!step.bulge && from[axis] === step.to[axis] && from[other] !== step.to[other])
        faces.push(from[axis]);
    }
  }
  const apart = distinct(faces, 1e-14 * Math.max(0, ...faces.map(Math.abs)));
  for (let index = 1; index < apart.length; index += 1) {
    needs.push({ from: apart[index - 1], to: apart[index], pixels: WALL });
  }
  for (const { center, radius, sweep } of arcs) {
    if (Math.abs(sweep) > 3)
      needs.push({ from: center[axis] - radius, to: center[axis] + radius, pixels: DIMENSION });
  }
  return needs;
}

function radiusOf(point: Point, center: Point): number {
  return Math.hypot(point[0] - center[0], point[1] - center[1]);
}

/** An angle brought into −π…π. */
function wrap(angle: number): number {
  return angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI));
}
