import type { Box } from "./frame";
import { edgeBox, edgeCount, nearestOnEdge, ringPoint, type Ring } from "./ring";

const LEAF = 8;

/** A point of the boundary: parameter t on an edge of a ring. */
export interface BoundaryPoint {
  readonly ring: Ring;
  readonly edge: number;
  readonly t: number;
  readonly distance: number;
}

/**
 * Finds edges near a point. Boxes of eight consecutive edges are the leaves of an implicit binary tree; neighbours along a
 * ring are neighbours in the plane, so no sorting is needed.
 */
export class EdgeIndex {
  private readonly rings: Ring[] = [];
  private readonly edges: number[] = [];
  private readonly boxes: Float64Array;
  private readonly leafBase: number;

  constructor(rings: readonly Ring[]) {
    for (const ring of rings) {
      for (let e = 0; e < edgeCount(ring); e++) {
        this.rings.push(ring);
        this.edges.push(e);
      }
    }
    let leaves = 1;
    while (leaves * LEAF < this.edges.length) leaves *= 2;
    this.leafBase = leaves;
    this.boxes = new Float64Array(8 * leaves);
    for (let node = 0; node < 2 * leaves; node++)
      this.boxes.set([Infinity, Infinity, -Infinity, -Infinity], 4 * node);
    for (let i = 0; i < this.edges.length; i++) {
      this.grow(leaves + Math.floor(i / LEAF), edgeBox(this.rings[i], this.edges[i]));
    }
    for (let node = leaves - 1; node >= 1; node--) {
      for (const child of [2 * node, 2 * node + 1]) {
        const [minX, minY, maxX, maxY] = this.boxes.subarray(4 * child, 4 * child + 4);
        this.grow(node, { minX, minY, maxX, maxY });
      }
    }
  }

  private grow(node: number, box: Box): void {
    const { boxes } = this;
    boxes[4 * node] = Math.min(boxes[4 * node], box.minX);
    boxes[4 * node + 1] = Math.min(boxes[4 * node + 1], box.minY);
    boxes[4 * node + 2] = Math.max(boxes[4 * node + 2], box.maxX);
    boxes[4 * node + 3] = Math.max(boxes[4 * node + 3], box.maxY);
  }

  private boxDistance(node: number, x: number, y: number): number {
    const { boxes } = this;
    const dx = Math.max(0, boxes[4 * node] - x, x - boxes[4 * node + 2]);
    const dy = Math.max(0, boxes[4 * node + 1] - y, y - boxes[4 * node + 3]);
    return Math.hypot(dx, dy);
  }

  private pointOn(i: number, x: number, y: number): BoundaryPoint {
    const ring = this.rings[i];
    const edge = this.edges[i];
    const t = nearestOnEdge(ring, edge, x, y);
    const [px, py] = ringPoint(ring, edge, t);
    return { ring, edge, t, distance: Math.hypot(px - x, py - y) };
  }

  /** Every edge within `reach` of the point, nearest first. */
  within(x: number, y: number, reach: number): BoundaryPoint[] {
    const found: BoundaryPoint[] = [];
    this.visit(
      x,
      y,
      () => reach,
      (point) => {
        if (point.distance <= reach) found.push(point);
      },
    );
    return found.sort((p, q) => p.distance - q.distance);
  }

  /** The point of the boundary nearest to (x, y). */
  nearest(x: number, y: number): BoundaryPoint {
    let best: BoundaryPoint | null = null;
    this.visit(
      x,
      y,
      () => best?.distance ?? Infinity,
      (point) => {
        if (best === null || point.distance < best.distance) best = point;
      },
    );
    if (best === null) throw new Error("no edges");
    return best;
  }

  /** Whether (x, y) lies inside an odd number of rings. */
  isInside(x: number, y: number): boolean {
    let inside = false;
    for (let i = 0; i < this.edges.length; i++) {
      const ring = this.rings[i];
      const edge = this.edges[i];
      const [ax, ay] = ringPoint(ring, edge, 0);
      const [bx, by] = ringPoint(ring, edge, 1);
      if (ay > y !== by > y && x < ax + ((y - ay) * (bx - ax)) / (by - ay)) inside = !inside;
      const arc = ring.arcs[edge];
      if (arc === null || Math.hypot(x - arc.cx, y - arc.cy) >= arc.radius) continue;
      // Between the arc and its chord: inside the circle, on the arc's side of the chord.
      const left = (bx - ax) * (y - ay) - (by - ay) * (x - ax);
      const isWhole = ax === bx && ay === by;
      if (isWhole || left > 0 !== arc.sweep > 0) inside = !inside;
    }
    return inside;
  }

  private visit(x: number, y: number, reach: () => number, take: (point: BoundaryPoint) => void): void {
    const stack = [1];
    while (stack.length > 0) {
      const node = stack.pop() as number;
      if (this.boxDistance(node, x, y) > reach()) continue;
      if (node >= this.leafBase) {
        const first = (node - this.leafBase) * LEAF;
        const last = Math.min(first + LEAF, this.edges.length);
        for (let i = first; i < last; i++) take(this.pointOn(i, x, y));
        continue;
      }
      const near = this.boxDistance(2 * node, x, y) <= this.boxDistance(2 * node + 1, x, y) ? 0 : 1;
      stack.push(2 * node + 1 - near, 2 * node + near);
    }
  }
}
