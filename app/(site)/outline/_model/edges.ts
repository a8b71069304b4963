/** Edges of a ring as curves: points on them, the nearest place, paths, boxes, and arcs by how far they bow. */
import { type Arc, arcBox, arcNearest, arcPoint, makeArc } from "@/lib/engine/field/outline/arc";
import type { ArcCentre, Point, Ring, Vertex } from "./sketch";

export interface Edge {
  readonly from: Vertex;
  readonly to: Vertex;
  readonly arc: Arc | null;
}

export function edgeOf(ring: Ring, edge: number): Edge {
  const from = ring[edge];
  const to = ring[(edge + 1) % ring.length];
  const { arc } = to;
  return {
    from,
    to,
    arc: arc ? makeArc(from.x, from.y, to.x, to.y, arc.x, arc.y, arc.clockwise) : null,
  };
}

/** Point of an edge, t from 0 at its start to 1 at its end. */
export function pointAt({ from, to, arc }: Edge, t: number): Point {
  if (arc) return arcPoint(arc, t);
  return [from.x + t * (to.x - from.x), from.y + t * (to.y - from.y)];
}

export function edgeLength({ from, to, arc }: Edge): number {
  return arc ? arc.radius * Math.abs(arc.sweep) : Math.hypot(to.x - from.x, to.y - from.y);
}

/** Place on an edge nearest to a point, with its distance. */
export function nearestOn(edge: Edge, [x, y]: Point): { readonly t: number; readonly distance: number } {
  const { from, to, arc } = edge;
  let t: number;
  if (arc) t = arcNearest(arc, x, y);
  else {
    const [dx, dy] = [to.x - from.x, to.y - from.y];
    const squared = dx * dx + dy * dy;
    t = squared > 0 ? Math.min(1, Math.max(0, ((x - from.x) * dx + (y - from.y) * dy) / squared)) : 0;
  }
  const [px, py] = pointAt(edge, t);
  return { t, distance: Math.hypot(px - x, py - y) };
}

/**
 * Points of the stretch of an edge from t0 to t1, both ends included; arcs in chords of at most 4°.
 */
export function stretch(edge: Edge, t0: number, t1: number): Point[] {
  const { arc } = edge;
  if (!arc) return [pointAt(edge, t0), pointAt(edge, t1)];
  const count = Math.max(1, Math.ceil((Math.abs(arc.sweep) * Math.abs(t1 - t0)) / (Math.PI / 45)));
  return Array.from({ length: count + 1 }, (_, k) => arcPoint(arc, t0 + ((t1 - t0) * k) / count));
}

/** All points of a ring as a polygon, arcs in chords; closed by its first point being left out at the end. */
export function polygonOf(ring: Ring): Point[] {
  return ring.flatMap((_, i) => stretch(edgeOf(ring, i), 0, 1).slice(0, -1));
}

export interface Box {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
}

/** Least box around rings, null without vertices. */
export function boxOf(rings: readonly Ring[]): Box | null {
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity];
  const grow = (x: number, y: number): void => {
    minX = Math.min(minX, x);
    minY = Math.min(minY, y);
    maxX = Math.max(maxX, x);
    maxY = Math.max(maxY, y);
  };
  for (const ring of rings) {
    ring.forEach((vertex, i) => {
      grow(vertex.x, vertex.y);
      const { arc } = edgeOf(ring, i);
      if (!arc) return;
      const box = arcBox(arc);
      grow(box.minX, box.minY);
      grow(box.maxX, box.maxY);
    });
  }
  return minX <= maxX ? { minX, minY, maxX, maxY } : null;
}

/**
 * Centre of the arc between two points with a given bow: the height of its middle over the chord, as a share of half
 * the chord (1 is a half circle); positive to the right of the way from a to b, so that the arc runs counter-clockwise.
 */
export function centreOfBow(a: Point, b: Point, bow: number): ArcCentre {
  const [mx, my] = [0.5 * (a[0] + b[0]), 0.5 * (a[1] + b[1])];
  const [hx, hy] = [0.5 * (b[0] - a[0]), 0.5 * (b[1] - a[1])];
  // Half chord 1, sagitta s: radius (1 + s²)/(2s), and the centre lies radius − s beyond the chord.
  const size = Math.abs(bow);
  const off = (1 - size * size) / (2 * size);
  const side = bow > 0 ? 1 : -1;
  return { x: mx - side * off * hy, y: my + side * off * hx, clockwise: bow < 0 };
}

/** The bow of an edge; 0 for a straight one. */
export function bowOf({ from, to, arc }: Edge): number {
  if (!arc || (from.x === to.x && from.y === to.y)) return 0;
  return Math.tan(arc.sweep / 4);
}

/** The bow of the arc from a to b through a third point, as it is dragged; null where the three lie on a line. */
export function bowThrough(a: Point, b: Point, [x, y]: Point): number | null {
  const [hx, hy] = [0.5 * (b[0] - a[0]), 0.5 * (b[1] - a[1])];
  const half = hx * hx + hy * hy;
  if (!(half > 0)) return null;
  const [px, py] = [x - 0.5 * (a[0] + b[0]), y - 0.5 * (a[1] + b[1])];
  // Heights to the right of the way from a to b, in half chords.
  const height = (px * hy - py * hx) / half;
  return Math.abs(height) < 1e-6 ? null : height;
}

/** The same arc with the same centre direction, given by its radius; the shorter or longer way stays as it is. */
export function centreOfRadius(edge: Edge, radius: number): ArcCentre | null {
  const { from, to, arc } = edge;
  const half = 0.5 * Math.hypot(to.x - from.x, to.y - from.y);
  if (!arc || !(radius >= half * (1 - 1e-12)) || half === 0) return null;
  const off = Math.sqrt(Math.max(0, radius * radius - half * half));
  const long = Math.abs(arc.sweep) > Math.PI;
  const sagitta = (long ? radius + off : radius - off) / half;
  return centreOfBow([from.x, from.y], [to.x, to.y], arc.sweep > 0 ? sagitta : -sagitta);
}
