import { constrain, type Obstacle, obstaclesBetween } from "../mesh/constrain";
import { FAR_VERTICES, insertPoints } from "../mesh/planar-graph";
import { orient } from "../mesh/predicates";
import { nextEdge, previousEdge, Triangulation } from "../mesh/triangulation";
import type { Domain } from "./domain";

/** Two segments of a drawing that meet where they must not. */
export interface Conflict {
  readonly kind: "cross" | "touch";
  /** Segments, the first with the smaller number. */
  readonly first: number;
  readonly second: number;
  readonly x: number;
  readonly y: number;
}

const MOST_CONFLICTS = 20;

/**
 * Finds segments that cross, or come nearer to each other than `touch` without being neighbours; all of them up to a
 * limit. The drawing is triangulated: a segment that cannot be inserted meets those in its way, and a vertex too near to
 * a segment makes a flat triangle. So it takes n log n time for any drawing. Answers the triangulation when all is well.
 */
export function findConflicts(domain: Domain, touch: number): { conflicts: Conflict[]; mesh: Triangulation } {
  return new Search(domain, touch).run();
}

class Search {
  private readonly mesh: Triangulation;
  private readonly conflicts: Conflict[] = [];
  private readonly seen = new Set<number>();
  /** Segments that others keep out of the triangulation. */
  private readonly blocked: number[] = [];
  /** Segments at each point: the start of its list in `incident`. */
  private readonly start: Int32Array;
  private readonly incident: Int32Array;

  constructor(
    private readonly domain: Domain,
    private readonly touch: number,
  ) {
    const points = domain.xy.length / 2;
    this.mesh = new Triangulation(points);
    this.start = new Int32Array(points + 1);
    for (const p of domain.segments) this.start[p + 1]++;
    for (let p = 0; p < points; p++) this.start[p + 1] += this.start[p];
    this.incident = new Int32Array(domain.segments.length);
    const cursor = this.start.slice();
    for (let i = 0; i < domain.segments.length; i++) this.incident[cursor[domain.segments[i]]++] = i >> 1;
  }

  run(): { conflicts: Conflict[]; mesh: Triangulation } {
    const { domain, mesh, conflicts } = this;
    const { segments } = domain;
    for (const [p, q] of insertPoints(mesh, domain.xy)) this.reportPoints(p, q);
    if (conflicts.length === 0) {
      const full = () => conflicts.length + this.blocked.length >= MOST_CONFLICTS;
      for (let s = 0; s < segments.length / 2 && !full(); s++) this.insert(s);
      this.reportBlocked();
    }
    if (conflicts.length === 0) this.findNear();
    conflicts.sort((p, q) => p.first - q.first || p.second - q.second);
    return { conflicts, mesh };
  }

  private insert(s: number): void {
    const { mesh, domain } = this;
    const a = domain.segments[2 * s] + FAR_VERTICES;
    const b = domain.segments[2 * s + 1] + FAR_VERTICES;
    const there = mesh.findEdge(a, b);
    if (there >= 0 && mesh.mark[there] !== 0) {
      this.report("touch", s, mesh.mark[there] - 1, mesh.xy[2 * a], mesh.xy[2 * a + 1]);
      return;
    }
    if (constrain(mesh, a, b, s + 1) !== null) this.blocked.push(s);
  }

  /** What the segments left out meet, once all others are in; and where they meet each other. */
  private reportBlocked(): void {
    const { mesh, blocked } = this;
    const { segments } = this.domain;
    for (const s of blocked) {
      const [a, b] = [segments[2 * s] + FAR_VERTICES, segments[2 * s + 1] + FAR_VERTICES];
      for (const obstacle of obstaclesBetween(mesh, a, b, MOST_CONFLICTS)) this.reportObstacle(s, obstacle);
    }
    blocked.forEach((s, k) => {
      for (const r of blocked.slice(k + 1)) {
        if (this.cross(s, r)) this.report("cross", s, r, ...this.meeting(s, r));
      }
    });
  }

  private reportObstacle(s: number, obstacle: Obstacle): void {
    const { mesh, domain } = this;
    if (obstacle.kind === "vertex") {
      const p = obstacle.vertex - FAR_VERTICES;
      this.report("touch", s, this.incident[this.start[p]], domain.xy[2 * p], domain.xy[2 * p + 1]);
    } else {
      const other = mesh.mark[obstacle.halfEdge] - 1;
      this.report("cross", s, other, ...this.meeting(s, other));
    }
  }

  /** Whether each of two segments has its ends strictly on both sides of the other. */
  private cross(s: number, r: number): boolean {
    const { xy, segments } = this.domain;
    const turn = (line: number, p: number) => {
      const [a, b] = [segments[2 * line], segments[2 * line + 1]];
      return Math.sign(orient(xy[2 * a], xy[2 * a + 1], xy[2 * b], xy[2 * b + 1], xy[2 * p], xy[2 * p + 1]));
    };
    return (
      turn(s, segments[2 * r]) * turn(s, segments[2 * r + 1]) < 0 &&
      turn(r, segments[2 * s]) * turn(r, segments[2 * s + 1]) < 0
    );
  }

  /** Intersection of the lines of two segments. */
  private meeting(s: number, r: number): [number, number] {
    const { xy, segments } = this.domain;
    const [a, b, c, d] = [segments[2 * s], segments[2 * s + 1], segments[2 * r], segments[2 * r + 1]];
    const ux = xy[2 * b] - xy[2 * a];
    const uy = xy[2 * b + 1] - xy[2 * a + 1];
    const vx = xy[2 * d] - xy[2 * c];
    const vy = xy[2 * d + 1] - xy[2 * c + 1];
    const wx = xy[2 * c] - xy[2 * a];
    const wy = xy[2 * c + 1] - xy[2 * a + 1];
    const t = (wx * vy - wy * vx) / (ux * vy - uy * vx);
    return Number.isFinite(t) ? [xy[2 * a] + t * ux, xy[2 * a + 1] + t * uy] : [xy[2 * c], xy[2 * c + 1]];
  }

  private reportPoints(p: number, q: number): void {
    const { xy } = this.domain;
    this.report(
      "touch",
      this.incident[this.start[p]],
      this.incident[this.start[q]],
      xy[2 * p],
      xy[2 * p + 1],
    );
  }

  private report(kind: "cross" | "touch", s: number, r: number, x: number, y: number): void {
    const first = Math.min(s, r);
    const second = Math.max(s, r);
    const key = first * (this.domain.segmentSide.length + 1) + second;
    if (this.seen.has(key) || this.conflicts.length >= MOST_CONFLICTS) return;
    this.seen.add(key);
    this.conflicts.push({ kind, first, second, x, y });
  }

  /** Looks behind every flat triangle for a segment that is too near to one of its corners. */
  private findNear(): void {
    const { mesh, touch } = this;
    const { corner, xy } = mesh;
    for (let t = 0; t < mesh.triangleSlots; t++) {
      if (corner[3 * t] < 0) continue;
      const a = corner[3 * t];
      const b = corner[3 * t + 1];
      const c = corner[3 * t + 2];
      const ux = xy[2 * b] - xy[2 * a];
      const uy = xy[2 * b + 1] - xy[2 * a + 1];
      const vx = xy[2 * c] - xy[2 * a];
      const vy = xy[2 * c + 1] - xy[2 * a + 1];
      const wx = vx - ux;
      const wy = vy - uy;
      const longest = Math.sqrt(Math.max(ux * ux + uy * uy, vx * vx + vy * vy, wx * wx + wy * wy));
      if (ux * vy - uy * vx > touch * longest) continue;
      for (let h = 3 * t; h < 3 * t + 3; h++)
        if (corner[h] >= FAR_VERTICES) this.lookBehind(corner[h], nextEdge(h));
      if (this.conflicts.length >= MOST_CONFLICTS) return;
    }
  }

  /** From vertex v across half-edge h of its triangle, and on through every edge within reach. */
  private lookBehind(v: number, h: number): void {
    const { mesh, touch, domain } = this;
    const { corner, twin, mark } = mesh;
    const stack = [h];
    const visited = new Set<number>();
    while (stack.length > 0) {
      const g = stack.pop() as number;
      if (this.distance(v, corner[g], corner[nextEdge(g)]) > touch) continue;
      if (mark[g] !== 0) {
        const s = mark[g] - 1;
        const p = v - FAR_VERTICES;
        if (domain.segments[2 * s] === p || domain.segments[2 * s + 1] === p) continue;
        this.report("touch", this.incident[this.start[p]], s, domain.xy[2 * p], domain.xy[2 * p + 1]);
        continue;
      }
      const w = twin[g];
      if (w < 0 || visited.has(w)) continue;
      visited.add(w);
      visited.add(g);
      stack.push(nextEdge(w), previousEdge(w));
    }
  }

  private distance(v: number, a: number, b: number): number {
    const { xy } = this.mesh;
    const ux = xy[2 * b] - xy[2 * a];
    const uy = xy[2 * b + 1] - xy[2 * a + 1];
    const wx = xy[2 * v] - xy[2 * a];
    const wy = xy[2 * v + 1] - xy[2 * a + 1];
    const t = Math.min(1, Math.max(0, (wx * ux + wy * uy) / (ux * ux + uy * uy)));
    return Math.hypot(wx - t * ux, wy - t * uy);
  }
}
