import { arcBox, makeArc } from "./arc";
import { describeDropped, dropCollinear, dropRepeated, mapEdges } from "./clean-ring";
import { showNumber, showPoint, toDomainX, toDomainY, type Box, type Frame } from "./frame";
import { checkSpikes } from "./spikes";
import { signedArea, type Ring } from "./ring";
import type { OutlineError, Point, RingElement } from "./schema";

/** Largest relative difference between the two radii of an arc. */
const RADIUS_TOLERANCE = 1e-9;

export function elementPoint(element: RingElement): Point {
  return Array.isArray(element) ? element : element.arcTo;
}

/** Adds what a submitted ring covers, arcs included, to a box in the outline's unit. */
export function growBox(box: Box, elements: readonly RingElement[]): void {
  for (let i = 0; i < elements.length; i++) {
    const element = elements[i];
    const [x, y] = elementPoint(element);
    box.minX = Math.min(box.minX, x);
    box.maxX = Math.max(box.maxX, x);
    box.minY = Math.min(box.minY, y);
    box.maxY = Math.max(box.maxY, y);
    if (Array.isArray(element)) continue;
    const [px, py] = elementPoint(elements[(i + elements.length - 1) % elements.length]);
    const [cx, cy] = element.center;
    const around = arcBox(makeArc(px, py, x, y, cx, cy, element.clockwise));
    box.minX = Math.min(box.minX, around.minX);
    box.maxX = Math.max(box.maxX, around.maxX);
    box.minY = Math.min(box.minY, around.minY);
    box.maxY = Math.max(box.maxY, around.maxY);
  }
}

/** Complaints about arcs whose two ends are not at one distance from the centre. */
export function checkArcs(elements: readonly RingElement[], pointer: string): OutlineError[] {
  const errors: OutlineError[] = [];
  for (let i = 0; i < elements.length; i++) {
    const element = elements[i];
    if (Array.isArray(element)) continue;
    const [px, py] = elementPoint(elements[(i + elements.length - 1) % elements.length]);
    const [x, y] = element.arcTo;
    const [cx, cy] = element.center;
    const before = Math.hypot(px - cx, py - cy);
    const after = Math.hypot(x - cx, y - cy);
    const larger = Math.max(before, after);
    // Coordinates far from the origin carry less: their own rounding is allowed as well.
    const rounding =
      4 *
      2 ** -52 *
      Math.max(Math.abs(px), Math.abs(py), Math.abs(x), Math.abs(y), Math.abs(cx), Math.abs(cy));
    if (
      larger > 0 &&
      Math.min(before, after) > 0 &&
      Math.abs(before - after) <= RADIUS_TOLERANCE * larger + rounding
    ) {
      continue;
    }
    errors.push({
      pointer: `${pointer}/${i}`,
      detail:
        larger === 0 || Math.min(before, after) === 0
          ? `The arc to ${showPoint(x, y)} has no radius: its centre ${showPoint(cx, cy)} is one of its ends.`
          : `The arc from ${showPoint(px, py)} to ${showPoint(x, y)} has radius ${showNumber(before)} at its start and ` +
            `${showNumber(after)} at its end; they may differ by 1e-9 of the radius.`,
    });
  }
  return errors;
}

/**
 * Reads and repairs one ring: drops repeated vertices and vertices on a straight line between their neighbours, and
 * says so in `repairs`. Answers null with the reasons in `errors` when no area is left or an edge folds back on
 * the one before.
 */
export function readRing(
  elements: readonly RingElement[],
  number: number,
  pointer: string,
  frame: Frame,
  axisymmetric: boolean,
  errors: OutlineError[],
  repairs: string[],
): Ring | null {
  const title = number === 0 ? "outer ring" : `hole ${number - 1}`;
  const n = elements.length;
  const submitted = new Float64Array(2 * n);
  for (let i = 0; i < n; i++) {
    const [x, y] = elementPoint(elements[i]);
    submitted[2 * i] = toDomainX(frame, x);
    submitted[2 * i + 1] = toDomainY(frame, y);
    // On the axis means exactly on it.
    if (axisymmetric && Math.abs(submitted[2 * i]) <= frame.touch) submitted[2 * i] = 0;
  }
  const distinct = dropRepeated(elements, submitted, frame, title, repairs);
  const hasArc = distinct.arcs.some((arc) => arc !== null);
  if (distinct.source.length < (hasArc ? 1 : 3)) {
    errors.push({
      pointer,
      detail: `The ${title} has ${describeCount(distinct.source.length)}; a ring needs at least three, or an arc.`,
    });
    return null;
  }
  const kept = dropCollinear(submitted, distinct, frame);
  if (kept.source.length < distinct.source.length) {
    const left = new Set(kept.source);
    const dropped = distinct.source.filter((i) => !left.has(i));
    if (kept.source.length >= 3 || hasArc) repairs.push(describeDropped(dropped, title));
  }
  const xy = new Float64Array(2 * kept.source.length);
  kept.source.forEach((i, k) => {
    xy[2 * k] = submitted[2 * i];
    xy[2 * k + 1] = submitted[2 * i + 1];
  });
  const area = signedArea(xy, kept.arcs);
  if (
    kept.source.length < (hasArc ? 1 : 3) ||
    (!hasArc && isFlat(xy, frame.touch)) ||
    (hasArc && area === 0)
  ) {
    errors.push({ pointer, detail: `The ${title} encloses no area: its points lie on one line.` });
    return null;
  }
  const spikes = checkSpikes(xy, kept, frame, pointer, title);
  errors.push(...spikes);
  if (spikes.length > 0) return null;
  return {
    number,
    pointer,
    title,
    xy,
    source: Int32Array.from(kept.source),
    arcs: kept.arcs,
    edgeOfSubmitted: mapEdges(n, kept.source, distinct.empty),
    submitted,
    area,
  };
}

function describeCount(n: number): string {
  return n === 1 ? "one distinct point" : `${n} distinct points`;
}

/** Whether all points lie within `reach` of the line through the first point and the one farthest from it. */
function isFlat(xy: Float64Array, reach: number): boolean {
  let dx = 0;
  let dy = 0;
  for (let k = 2; k < xy.length; k += 2) {
    if (Math.hypot(xy[k] - xy[0], xy[k + 1] - xy[1]) <= Math.hypot(dx, dy)) continue;
    dx = xy[k] - xy[0];
    dy = xy[k + 1] - xy[1];
  }
  const length = Math.hypot(dx, dy);
  for (let k = 2; k < xy.length; k += 2) {
    if (Math.abs(dx * (xy[k + 1] - xy[1]) - dy * (xy[k] - xy[0])) > reach * length) return false;
  }
  return true;
}
