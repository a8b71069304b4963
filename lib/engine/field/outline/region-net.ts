import type { EdgeIndex } from "./edge-index";
import { showPoint, toDomainX, toDomainY, type Box, type Frame } from "./frame";
import type { Run } from "./merge-runs";
import { edgeBox, edgeCount, edgeLength, ringPoint, type Ring } from "./ring";
import type { OutlineError, Point } from "./schema";

/** A corner of a region border, or a point of the boundary or of another border that lies on one. */
export interface RegionNode {
  readonly x: number;
  readonly y: number;
  /** Ring and position (edge + t) when the node lies on the boundary; otherwise ring is -1. */
  readonly ring: number;
  readonly position: number;
}

/** Borders of all regions, their common points shared. */
export interface RegionNet {
  readonly nodes: readonly RegionNode[];
  /** Nodes of each region's border, counter-clockwise. */
  readonly borders: ReadonlyArray<readonly number[]>;
  /** Submitted edge of each border's edge from that node to the next. */
  readonly edges: ReadonlyArray<readonly number[]>;
}

export const NO_REGIONS: RegionNet = { nodes: [], borders: [], edges: [] };

/** Pointer of the ring of region k in the request. */
export function regionPointer(k: number): string {
  return `#/medium/regions/${k}/ring`;
}

/**
 * Reads the rings of the regions. A corner within 1e-9 of the outline's size of the boundary, or of another border, is put
 * exactly onto it, and every border is cut where such a point lies on it; then borders that touch share their points,
 * and whatever meets otherwise is a mistake that shows when the drawing is triangulated.
 */
export function readRegions(
  regions: ReadonlyArray<readonly Point[]>,
  rings: readonly Ring[],
  runs: ReadonlyArray<readonly Run[]>,
  index: EdgeIndex,
  frame: Frame,
  errors: OutlineError[],
): RegionNet {
  if (regions.length === 0) return NO_REGIONS;
  const net = new Net(rings, runs, index, frame);
  regions.forEach((ring, k) => net.addRegion(ring, k, errors));
  return net.finish();
}

class Net {
  private readonly nodes: RegionNode[] = [];
  private readonly borders: number[][] = [];
  private readonly edges: number[][] = [];
  /** Points of the boundary where it is cut anyway: vertices and ends of terminals. */
  private readonly fixed: RegionNode[] = [];
  private readonly box: Box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity };
  private readonly nodeAt = new Map<string, number>();

  constructor(
    private readonly rings: readonly Ring[],
    runs: ReadonlyArray<readonly Run[]>,
    private readonly index: EdgeIndex,
    private readonly frame: Frame,
  ) {
    rings.forEach((ring, r) => {
      for (let e = 0; e < edgeCount(ring); e++) {
        const { minX, minY, maxX, maxY } = edgeBox(ring, e);
        this.box.minX = Math.min(this.box.minX, minX);
        this.box.minY = Math.min(this.box.minY, minY);
        this.box.maxX = Math.max(this.box.maxX, maxX);
        this.box.maxY = Math.max(this.box.maxY, maxY);
      }
      for (let v = 0; v < edgeCount(ring); v++) this.addFixed(r, v);
      for (const { start, end } of runs[r]) {
        this.addFixed(r, start);
        this.addFixed(r, end);
      }
    });
  }

  private addFixed(r: number, position: number): void {
    const ring = this.rings[r];
    const edge = Math.floor(position) % edgeCount(ring);
    const t = position - Math.floor(position);
    const [x, y] = ringPoint(ring, edge, t);
    this.fixed.push({ x, y, ring: r, position: edge + t });
  }

  private node(at: RegionNode): number {
    const key = at.ring >= 0 ? `${at.ring} ${at.position}` : `${at.x},${at.y}`;
    const known = this.nodeAt.get(key);
    if (known !== undefined) return known;
    this.nodes.push(at);
    this.nodeAt.set(key, this.nodes.length - 1);
    return this.nodes.length - 1;
  }

  addRegion(points: readonly Point[], k: number, errors: OutlineError[]): void {
    const border: number[] = [];
    const edges: number[] = [];
    const far = points.findIndex((point) => !this.isWithinReach(point));
    if (far >= 0) {
      const detail =
        `The point ${showPoint(...points[far])} of region ${k} lies outside the outline. ` +
        `A region lies inside the conductor; it may touch the border but not stick out.`;
      errors.push({ pointer: `${regionPointer(k)}/${far}`, detail });
    }
    points.forEach(([px, py], i) => {
      if (far >= 0) return;
      const node = this.place(toDomainX(this.frame, px), toDomainY(this.frame, py));
      if (border.at(-1) === node) edges[edges.length - 1] = i;
      else {
        border.push(node);
        edges.push(i);
      }
    });
    if (border.length > 1 && border[0] === border.at(-1)) {
      border.pop();
      edges.pop();
    }
    this.borders.push(border);
    this.edges.push(edges);
    const area = this.area(border);
    const pointer = regionPointer(k);
    const repeated = border.findIndex((node, i) => border.indexOf(node) !== i);
    if (far >= 0) return;
    if (border.length < 3 || area === 0) {
      errors.push({
        pointer,
        detail: `Region ${k} encloses no area; its ring needs at least three points off one line.`,
      });
    } else if (repeated >= 0) {
      const i = edges[repeated];
      const detail = `Region ${k} comes to the point ${showPoint(...points[i])} twice; a region may not touch itself.`;
      errors.push({ pointer: `${pointer}/${i}`, detail });
    }
    if (area < 0) {
      border.reverse();
      // Edge i of the reversed list is edge n − 2 − i of the old one, and the last stays the last.
      const last = edges.pop() as number;
      edges.reverse().push(last);
    }
  }

  /** Whether a point lies in the box around the outline, which reaches from -1 to 1 at most. */
  private isWithinReach([px, py]: Point): boolean {
    const { box, frame } = this;
    const x = toDomainX(frame, px);
    const y = toDomainY(frame, py);
    const { snap } = frame;
    return x >= box.minX - snap && x <= box.maxX + snap && y >= box.minY - snap && y <= box.maxY + snap;
  }

  /** The node at a point: on the boundary or on an earlier border when it is near enough to be meant to lie on it. */
  private place(x: number, y: number): number {
    const { snap } = this.frame;
    const onBoundary = this.index.within(x, y, snap);
    if (onBoundary.length > 0) {
      const near = nearestOf(this.fixed, x, y, snap);
      if (near !== null) return this.node(near);
      const { ring, edge, t } = onBoundary[0];
      const share = Math.min(0.25, snap / edgeLength(ring, edge));
      const snapped = t <= share ? 0 : t >= 1 - share ? 1 : t;
      const [nx, ny] = ringPoint(ring, edge, snapped);
      const position = (edge + snapped) % edgeCount(ring);
      return this.node({ x: nx, y: ny, ring: ring.number, position });
    }
    const earlier = nearestOf(this.nodes, x, y, snap);
    return earlier !== null ? this.node(earlier) : this.node({ x, y, ring: -1, position: 0 });
  }

  private area(border: readonly number[]): number {
    let twice = 0;
    border.forEach((p, i) => {
      const a = this.nodes[p];
      const b = this.nodes[border[(i + 1) % border.length]];
      twice += a.x * b.y - b.x * a.y;
    });
    return twice / 2;
  }

  finish(): RegionNet {
    const candidates = [...this.fixed, ...this.nodes];
    for (let k = 0; k < this.borders.length; k++) this.cutBorder(k, candidates);
    return { nodes: this.nodes, borders: this.borders, edges: this.edges };
  }

  /** Inserts into border k every point of the boundary and of other borders that lies on one of its edges. */
  private cutBorder(k: number, candidates: readonly RegionNode[]): void {
    const { snap } = this.frame;
    const border: number[] = [];
    const edges: number[] = [];
    const old = this.borders[k];
    old.forEach((p, i) => {
      const q = old[(i + 1) % old.length];
      const a = this.nodes[p];
      const b = this.nodes[q];
      const dx = b.x - a.x;
      const dy = b.y - a.y;
      const squared = dx * dx + dy * dy;
      const length = Math.sqrt(squared);
      const on: Array<{ t: number; node: RegionNode }> = [];
      for (const c of candidates) {
        const along = (c.x - a.x) * dx + (c.y - a.y) * dy;
        if (along <= 0 || along >= squared) continue;
        if (Math.abs((c.x - a.x) * dy - (c.y - a.y) * dx) > snap * length) continue;
        on.push({ t: along / squared, node: c });
      }
      on.sort((c, d) => c.t - d.t);
      border.push(p);
      edges.push(this.edges[k][i]);
      for (const { node } of on) {
        const n = this.node(node);
        if (n === border.at(-1) || n === q) continue;
        border.push(n);
        edges.push(this.edges[k][i]);
      }
    });
    this.borders[k] = border;
    this.edges[k] = edges;
  }
}

function nearestOf(nodes: readonly RegionNode[], x: number, y: number, reach: number): RegionNode | null {
  let best: RegionNode | null = null;
  let least = reach;
  for (const node of nodes) {
    const distance = Math.hypot(node.x - x, node.y - y);
    if (distance > least) continue;
    least = distance;
    best = node;
  }
  return best;
}
