import { arcBox, arcNearest, arcPoint, arcSegmentArea, type Arc } from "./arc";
import type { Box } from "./frame";

/**
 * A cleaned ring in the domain's frame, still in the direction in which it was submitted. Edge k runs from vertex k
 * to vertex k + 1 (cyclically).
 */
export interface Ring {
  /** 0 for the outer ring, 1… for the holes. */
  readonly number: number;
  /** Pointer of the ring's list of vertices in the request. */
  readonly pointer: string;
  readonly title: string;
  readonly xy: Float64Array;
  /** Submitted index of each vertex that is left. */
  readonly source: Int32Array;
  /** The arc of each edge, or null where it is straight. */
  readonly arcs: ReadonlyArray<Arc | null>;
  /** Edge of this ring on which each submitted edge lies, or -1 where that has no length. */
  readonly edgeOfSubmitted: Int32Array;
  /** Coordinates of the submitted vertices, interleaved. */
  readonly submitted: Float64Array;
  /** Signed area, positive when the ring runs counter-clockwise. */
  readonly area: number;
}

export function edgeCount(ring: Ring): number {
  return ring.arcs.length;
}

export function ringPoint(ring: Ring, edge: number, t: number): [number, number] {
  const arc = ring.arcs[edge];
  if (arc !== null) return arcPoint(arc, t);
  const { xy } = ring;
  const a = edge;
  const b = (edge + 1) % ring.arcs.length;
  if (t <= 0) return [xy[2 * a], xy[2 * a + 1]];
  if (t >= 1) return [xy[2 * b], xy[2 * b + 1]];
  return [xy[2 * a] + t * (xy[2 * b] - xy[2 * a]), xy[2 * a + 1] + t * (xy[2 * b + 1] - xy[2 * a + 1])];
}

/** Parameter of the point of an edge nearest to (x, y). */
export function nearestOnEdge(ring: Ring, edge: number, x: number, y: number): number {
  const arc = ring.arcs[edge];
  if (arc !== null) return arcNearest(arc, x, y);
  const { xy } = ring;
  const a = edge;
  const b = (edge + 1) % ring.arcs.length;
  const dx = xy[2 * b] - xy[2 * a];
  const dy = xy[2 * b + 1] - xy[2 * a + 1];
  const t = ((x - xy[2 * a]) * dx + (y - xy[2 * a + 1]) * dy) / (dx * dx + dy * dy);
  return Math.min(1, Math.max(0, t));
}

export function edgeLength(ring: Ring, edge: number): number {
  const arc = ring.arcs[edge];
  if (arc !== null) return arc.radius * Math.abs(arc.sweep);
  const { xy } = ring;
  const b = (edge + 1) % ring.arcs.length;
  return Math.hypot(xy[2 * b] - xy[2 * edge], xy[2 * b + 1] - xy[2 * edge + 1]);
}

export function edgeBox(ring: Ring, edge: number): Box {
  const arc = ring.arcs[edge];
  if (arc !== null) return arcBox(arc);
  const { xy } = ring;
  const b = (edge + 1) % ring.arcs.length;
  return {
    minX: Math.min(xy[2 * edge], xy[2 * b]),
    minY: Math.min(xy[2 * edge + 1], xy[2 * b + 1]),
    maxX: Math.max(xy[2 * edge], xy[2 * b]),
    maxY: Math.max(xy[2 * edge + 1], xy[2 * b + 1]),
  };
}

/** Signed area of a ring with these vertices and arcs. */
export function signedArea(xy: ArrayLike<number>, arcs: ReadonlyArray<Arc | null>): number {
  const n = arcs.length;
  let twice = 0;
  let bulges = 0;
  const ox = xy[0];
  const oy = xy[1];
  for (let k = 0; k < n; k++) {
    const b = (k + 1) % n;
    twice += (xy[2 * k] - ox) * (xy[2 * b + 1] - oy) - (xy[2 * b] - ox) * (xy[2 * k + 1] - oy);
    const arc = arcs[k];
    if (arc !== null) bulges += arcSegmentArea(arc);
  }
  return twice / 2 + bulges;
}
