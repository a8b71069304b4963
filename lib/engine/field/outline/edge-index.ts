import { BoxTree } from "../mesh/box-tree";
import { edgeBox, edgeCount, nearestOnEdge, ringPoint, type Ring } from "./ring";

/** A point of the boundary: parameter t on an edge of a ring. */
export interface BoundaryPoint {
  readonly ring: Ring;
  readonly edge: number;
  readonly t: number;
  readonly distance: number;
}

/** Finds edges near a point. Neighbours along a ring are neighbours in the plane, so no sorting is needed. */
export class EdgeIndex {
  private readonly rings: Ring[] = [];
  private readonly edges: number[] = [];
  private readonly tree: BoxTree;

  constructor(rings: readonly Ring[]) {
    for (const ring of rings) {
      for (let e = 0; e < edgeCount(ring); e++) {
        this.rings.push(ring);
        this.edges.push(e);
      }
    }
    this.tree = new BoxTree(this.edges.length, (i, box) => {
      const { minX, minY, maxX, maxY } = edgeBox(this.rings[i], this.edges[i]);
      box[0] = minX;
      box[1] = minY;
      box[2] = maxX;
      box[3] = maxY;
    });
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
    this.tree.search(x, y, reach, (i) => {
      const point = this.pointOn(i, x, y);
      if (point.distance <= reach) found.push(point);
      return reach;
    });
    return found.sort((p, q) => p.distance - q.distance);
  }

  /** The point of the boundary nearest to (x, y). */
  nearest(x: number, y: number): BoundaryPoint {
    let best = this.pointOn(0, x, y);
    this.tree.search(x, y, best.distance, (i) => {
      const point = this.pointOn(i, x, y);
      if (point.distance < best.distance) best = point;
      return best.distance;
    });
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
}
