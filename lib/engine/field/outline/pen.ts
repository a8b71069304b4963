import type { BoundarySide } from "../mesh/mesh";
import type { DrawnOutline, Drawing } from "./draw";
import type { RegionNode } from "./region-net";

export const INSULATED = -1;
export const AXIS = -2;

/** Collects points ring by ring and groups their segments into sides. */
export class Pen {
  private readonly xy: number[] = [];
  private readonly segments: number[] = [];
  private readonly segmentSide: number[] = [];
  private readonly segmentRing: number[] = [];
  private readonly segmentEdge: number[] = [];
  private readonly sides: BoundarySide[] = [];
  private ring = 0;
  private first = 0;
  private kinds: number[] = [];
  private edges: number[] = [];
  private positions: Array<Map<number, number>> = [];
  private readonly segmentRegion: number[] = [];
  private readonly segmentOf = new Map<number, number>();
  private readonly overlaps: Array<[number, number]> = [];

  beginRing(ring: number): void {
    this.ring = ring;
    this.first = this.xy.length / 2;
    this.kinds = [];
    this.edges = [];
    this.positions[ring] = new Map();
  }

  /** The next point lies at this position of the ring. */
  notePosition(position: number): void {
    this.positions[this.ring].set(position, this.xy.length / 2);
  }

  /** A point, and what the segment that leaves it is; by default the same as before. */
  put(
    point: readonly [number, number],
    edge = this.edges[this.edges.length - 1],
    kind = this.kinds.at(-1),
  ): void {
    this.xy.push(point[0], point[1]);
    this.edges.push(edge);
    this.kinds.push(kind ?? INSULATED);
  }

  endRing(ringEdges: number): void {
    const at = this.positions[this.ring];
    // The end of the last edge is the start of the first.
    const atEnd = at.get(ringEdges);
    if (atEnd !== undefined) at.set(0, atEnd);
    const { kinds, edges, first, ring } = this;
    const n = kinds.length;
    let begin = 0;
    while (begin < n && kinds[begin] === kinds[(begin + n - 1) % n]) begin++;
    for (let step = 0; step < n; step++) {
      const k = (begin + step) % n;
      if (step === 0 || kinds[k] !== kinds[(k + n - 1) % n]) {
        const terminal = Math.max(INSULATED, kinds[k]);
        this.sides.push(kinds[k] === AXIS ? { ring, terminal, axis: true } : { ring, terminal });
      }
      this.addSegment(first + k, first + ((k + 1) % n), this.sides.length - 1, ring, edges[k]);
    }
  }

  private addSegment(a: number, b: number, side: number, ring: number, edge: number): number {
    const s = this.segmentSide.length;
    this.segments.push(a, b);
    this.segmentSide.push(side);
    this.segmentRing.push(ring);
    this.segmentEdge.push(edge);
    this.segmentRegion.push(0, 0);
    return s;
  }

  /** Point of a region's node; a node off the boundary becomes a point of its own. */
  pointOf(node: RegionNode): number {
    if (node.ring >= 0) {
      const point = this.positions[node.ring].get(node.position);
      if (point === undefined) throw new Error("a region's node is not a point of its ring");
      return point;
    }
    this.xy.push(node.x, node.y);
    return this.xy.length / 2 - 1;
  }

  /** The border of region k, counter-clockwise. Where it runs along a segment that is there, that one is shared. */
  addBorder(points: readonly number[], edges: readonly number[], k: number): void {
    this.indexSegments();
    points.forEach((a, i) => {
      const b = points[(i + 1) % points.length];
      const there = this.segmentOf.get(pairKey(a, b));
      const s = there ?? this.addSegment(a, b, -1, -1 - k, edges[i]);
      if (there === undefined) this.segmentOf.set(pairKey(a, b), s);
      const place = 2 * s + (this.segments[2 * s] === a ? 0 : 1);
      const other = this.segmentRegion[place];
      if (other !== 0) this.overlaps.push([other - 1, k]);
      this.segmentRegion[place] = k + 1;
    });
  }

  private indexSegments(): void {
    const { segmentOf, segments } = this;
    if (segmentOf.size > 0) return;
    for (let s = 0; s < segments.length / 2; s++)
      segmentOf.set(pairKey(segments[2 * s], segments[2 * s + 1]), s);
  }

  finish(outline: DrawnOutline): Drawing {
    const { frame } = outline;
    return {
      domain: {
        xy: Float64Array.from(this.xy),
        segments: Int32Array.from(this.segments),
        segmentSide: Int32Array.from(this.segmentSide),
        segmentRegion: Int32Array.from(this.segmentRegion),
        sides: this.sides,
        unitM: frame.unitM,
        origin: [frame.originX, frame.originY],
        scale: frame.scale,
        axisymmetric: outline.axisymmetric,
      },
      segmentRing: Int32Array.from(this.segmentRing),
      segmentEdge: Int32Array.from(this.segmentEdge),
      overlaps: this.overlaps,
    };
  }
}

/** One number for an unordered pair of points; there are fewer than 2^26 points. */
function pairKey(a: number, b: number): number {
  return a < b ? a * 67108864 + b : b * 67108864 + a;
}
