import { FROZEN } from "./channels";
import { orient } from "./predicates";
import { FAR_VERTICES } from "./planar-graph";
import { nextEdge, previousEdge, type Triangulation } from "./triangulation";

/** `capped`: the allowance of vertices was used up; the mesh is sound, some of its angles are smaller than asked. */
export type MeshStatus = "complete" | "capped";

export interface QualityOptions {
  /** Smallest angle asked for, in degrees; at most about 26. Smaller angles of the outline itself remain. */
  readonly minimumAngleDeg: number;
  /** Most vertices the mesh may have. */
  readonly maximumVertices: number;
}

const INPUT = -1;
const FREE = -2;
/** Edges are not split below this length; the domain's extent is 1. */
const SHORTEST = 2 ** -44;
/** Two segments that meet at less than this are split on common circles around their meeting point. */
const ACUTE_COSINE = 0.5;
const BUCKETS = 48;

/**
 * Refines a carved triangulation until no triangle has an angle below the one asked for, except where the outline
 * itself is that sharp. J. Ruppert, Journal of Algorithms 18 (1995) 548; off-centres after A. Üngör, LATIN 2004;
 * segments at sharp corners are split on concentric circles, and a triangle whose shortest edge joins two such
 * points of one circle is left alone (G. L. Miller, S. E. Pav, N. J. Walkington, 2003), so that it ends.
 * `segments` are the two points of each constraint, in the order of the marks; frozen triangles are left as they are.
 */
export function refineQuality(
  mesh: Triangulation,
  segments: Int32Array,
  options: QualityOptions,
): MeshStatus {
  return new Refiner(mesh, segments, options).run();
}

class Refiner {
  private readonly segments: Int32Array;
  /** Segment whose inside the vertex lies on, or INPUT, or FREE. */
  private vertexSegment: Int32Array;
  /** 2s and 2s+1: segment s makes a sharp corner at its first, second end. */
  private readonly sharp: Uint8Array;
  private readonly encroached: number[] = [];
  private readonly buckets: number[][] = [];
  private readonly heads = new Int32Array(BUCKETS);
  private worst = 0;
  private readonly cosineSquared: number;
  private readonly offCentre: number;
  private readonly limit: number;

  constructor(
    private readonly mesh: Triangulation,
    segments: Int32Array,
    options: QualityOptions,
  ) {
    this.segments = segments;
    this.sharp = new Uint8Array(segments.length);
    this.vertexSegment = new Int32Array(Math.max(64, 2 * mesh.vertexCount)).fill(INPUT, 0, mesh.vertexCount);
    const cosine = Math.cos((options.minimumAngleDeg * Math.PI) / 180);
    this.cosineSquared = cosine * cosine;
    this.offCentre = 0.475 * Math.sqrt((1 + cosine) / (1 - cosine));
    this.limit = options.maximumVertices;
    for (let i = 0; i < BUCKETS; i++) this.buckets.push([]);
  }

  run(): MeshStatus {
    this.findSharpCorners();
    const { mesh } = this;
    for (let t = 0; t < mesh.triangleSlots; t++) {
      if (!mesh.isLive(t)) continue;
      for (let h = 3 * t; h < 3 * t + 3; h++) this.checkEdge(h);
    }
    if (!this.splitEncroached()) return "capped";
    for (let t = 0; t < mesh.triangleSlots; t++) if (mesh.isLive(t)) this.checkTriangle(t);
    for (;;) {
      const t = this.popWorst();
      if (t < 0) return "complete";
      if (mesh.vertexCount >= this.limit) return "capped";
      const a = mesh.corner[3 * t];
      const b = mesh.corner[3 * t + 1];
      const c = mesh.corner[3 * t + 2];
      this.improve(t);
      if (this.encroached.length === 0) continue;
      if (!this.splitEncroached()) return "capped";
      const { corner } = mesh;
      if (corner[3 * t] === a && corner[3 * t + 1] === b && corner[3 * t + 2] === c) this.checkTriangle(t);
    }
  }

  /** Turns around each end of each segment to the next segment and compares directions. */
  private findSharpCorners(): void {
    const { mesh, segments, sharp } = this;
    const { corner, twin, mark, xy } = mesh;
    for (let h = 0; h < 3 * mesh.triangleSlots; h++) {
      if (corner[h] < 0 || mark[h] === 0) continue;
      const v = corner[h];
      let g = previousEdge(h);
      while (mark[g] === 0 && twin[g] >= 0) g = previousEdge(twin[g]);
      if (mark[g] === 0) continue;
      const p = corner[nextEdge(h)];
      const q = corner[g];
      if (p === q || mark[g] === mark[h]) continue;
      const px = xy[2 * p] - xy[2 * v];
      const py = xy[2 * p + 1] - xy[2 * v + 1];
      const qx = xy[2 * q] - xy[2 * v];
      const qy = xy[2 * q + 1] - xy[2 * v + 1];
      const dot = px * qx + py * qy;
      if (dot <= ACUTE_COSINE * Math.sqrt((px * px + py * py) * (qx * qx + qy * qy))) continue;
      if (orient(xy[2 * v], xy[2 * v + 1], xy[2 * p], xy[2 * p + 1], xy[2 * q], xy[2 * q + 1]) <= 0) continue;
      for (const m of [mark[h], mark[g]]) {
        if (segments[2 * (m - 1)] + FAR_VERTICES === v) sharp[2 * (m - 1)] = 1;
        if (segments[2 * (m - 1) + 1] + FAR_VERTICES === v) sharp[2 * (m - 1) + 1] = 1;
      }
    }
  }

  /** Queues half-edge h when it is constrained and the apex of its triangle lies inside its diametral circle. */
  private checkEdge(h: number): void {
    const { mark, corner, xy, label } = this.mesh;
    if (mark[h] === 0 || label[(h / 3) | 0] >= FROZEN) return;
    const a = corner[h];
    const b = corner[nextEdge(h)];
    const c = corner[previousEdge(h)];
    if (this.isInDiametralCircle(a, b, xy[2 * c], xy[2 * c + 1])) this.encroached.push(a, b);
  }

  private isInDiametralCircle(a: number, b: number, x: number, y: number): boolean {
    const { xy } = this.mesh;
    return (xy[2 * a] - x) * (xy[2 * b] - x) + (xy[2 * a + 1] - y) * (xy[2 * b + 1] - y) < 0;
  }

  private splitEncroached(): boolean {
    const { encroached, mesh } = this;
    while (encroached.length > 0) {
      const b = encroached.pop() as number;
      const a = encroached.pop() as number;
      const h = mesh.findEdge(a, b);
      if (h < 0) continue;
      if (mesh.vertexCount >= this.limit) return false;
      this.splitSegment(h);
    }
    return true;
  }

  private splitSegment(h: number): void {
    const { mesh } = this;
    const { corner, xy, mark } = mesh;
    const a = corner[h];
    const b = corner[nextEdge(h)];
    const segment = mark[h] - 1;
    const dx = xy[2 * b] - xy[2 * a];
    const dy = xy[2 * b + 1] - xy[2 * a + 1];
    const length = Math.sqrt(dx * dx + dy * dy);
    if (length < 2 * SHORTEST) return;
    const sharpA = this.isSharpEnd(segment, a);
    const sharpB = this.isSharpEnd(segment, b);
    let share = 0.5;
    if (sharpA || sharpB) {
      const shell = 2 ** Math.round(Math.log2(length / 2));
      share = shell / length;
      if (!sharpA) share = 1 - share;
    }
    const x = xy[2 * a] + share * dx;
    const y = xy[2 * a + 1] + share * dy;
    if (!mesh.openCavity(x, y, (h / 3) | 0, h)) return;
    const v = mesh.addVertex(x, y);
    this.noteVertex(v, segment);
    mesh.fill(v, a, b, segment + 1);
    this.inspectCreated();
  }

  /** Vertex v is an end of the whole segment at which it makes a sharp corner. */
  private isSharpEnd(segment: number, v: number): boolean {
    const { segments, sharp } = this;
    if (segments[2 * segment] + FAR_VERTICES === v) return sharp[2 * segment] === 1;
    return segments[2 * segment + 1] + FAR_VERTICES === v && sharp[2 * segment + 1] === 1;
  }

  private noteVertex(v: number, segment: number): void {
    if (v >= this.vertexSegment.length) {
      const grown = new Int32Array(2 * this.vertexSegment.length);
      grown.set(this.vertexSegment);
      this.vertexSegment = grown;
    }
    this.vertexSegment[v] = segment;
  }

  private inspectCreated(): void {
    const { created } = this.mesh;
    for (let i = 0; i < created.length; i++) {
      const h = 3 * created[i];
      this.checkEdge(h);
      this.checkEdge(h + 1);
      this.checkEdge(h + 2);
      this.checkTriangle(created[i]);
    }
  }

  /** Tries to insert a point that removes triangle t; queues the segments that this point would encroach upon. */
  private improve(t: number): void {
    const { mesh, encroached } = this;
    const point = this.betterPoint(t);
    if (point === null) return;
    const [x, y] = point;
    const found = mesh.locate(x, y, t, true);
    if (found < -1) {
      const h = -2 - found;
      encroached.push(mesh.corner[h], mesh.corner[nextEdge(h)]);
      return;
    }
    if (found < 0 || !mesh.openCavity(x, y, found, -1)) return;
    for (const h of mesh.rimEdges) {
      if (mesh.mark[h] === 0) continue;
      const a = mesh.corner[h];
      const b = mesh.corner[nextEdge(h)];
      if (this.isInDiametralCircle(a, b, x, y)) encroached.push(a, b);
    }
    if (encroached.length > 0) return;
    const v = mesh.addVertex(x, y);
    this.noteVertex(v, FREE);
    mesh.fill(v, -1, -1, 0);
    this.inspectCreated();
  }

  /** The off-centre of triangle t over its shortest edge, or the circumcentre when that is nearer. */
  private betterPoint(t: number): [number, number] | null {
    const { corner, xy } = this.mesh;
    let h = 3 * t;
    let shortest = Infinity;
    for (let g = 3 * t; g < 3 * t + 3; g++) {
      const length = squaredLength(xy, corner[g], corner[nextEdge(g)]);
      if (length < shortest) {
        shortest = length;
        h = g;
      }
    }
    if (shortest < SHORTEST * SHORTEST) return null;
    const p = corner[h];
    const q = corner[nextEdge(h)];
    const r = corner[previousEdge(h)];
    const qx = xy[2 * q] - xy[2 * p];
    const qy = xy[2 * q + 1] - xy[2 * p + 1];
    const rx = xy[2 * r] - xy[2 * p];
    const ry = xy[2 * r + 1] - xy[2 * p + 1];
    const area = orient(xy[2 * p], xy[2 * p + 1], xy[2 * q], xy[2 * q + 1], xy[2 * r], xy[2 * r + 1]);
    const rr = rx * rx + ry * ry;
    let cx = (ry * shortest - qy * rr) / (2 * area);
    let cy = (qx * rr - rx * shortest) / (2 * area);
    const ox = 0.5 * qx - this.offCentre * qy;
    const oy = 0.5 * qy + this.offCentre * qx;
    if (!(ox * ox + oy * oy >= cx * cx + cy * cy)) {
      cx = ox;
      cy = oy;
    }
    return [xy[2 * p] + cx, xy[2 * p + 1] + cy];
  }

  /** Queues triangle t when an angle of it is too small and may be improved. */
  private checkTriangle(t: number): void {
    const { corner, xy, label } = this.mesh;
    if (label[t] >= FROZEN) return;
    const a = corner[3 * t];
    const b = corner[3 * t + 1];
    const c = corner[3 * t + 2];
    const ab = squaredLength(xy, a, b);
    const bc = squaredLength(xy, b, c);
    const ca = squaredLength(xy, c, a);
    let p = a;
    let q = b;
    let shortest = ab;
    let other = bc * ca;
    if (bc < shortest) {
      p = b;
      q = c;
      shortest = bc;
      other = ab * ca;
    }
    if (ca < shortest) {
      p = c;
      q = a;
      shortest = ca;
      other = ab * bc;
    }
    const dot = 0.5 * (ab + bc + ca - 2 * shortest);
    const cosineSquared = (dot * dot) / other;
    if (!(cosineSquared > this.cosineSquared)) return;
    if (this.joinsOneCircle(p, q)) return;
    const excess = 1 - cosineSquared;
    const bucket = excess <= 0 ? BUCKETS - 1 : Math.min(BUCKETS - 1, Math.floor(-Math.log2(excess)));
    this.buckets[bucket].push(t, a, b, c);
    if (bucket > this.worst) this.worst = bucket;
  }

  /** The edge p–q joins two segments that meet, at equal distances from their meeting point. */
  private joinsOneCircle(p: number, q: number): boolean {
    const s = this.vertexSegment[p];
    const r = this.vertexSegment[q];
    if (s < 0 || r < 0 || s === r) return false;
    const { segments, mesh } = this;
    for (let i = 0; i < 2; i++) {
      for (let j = 0; j < 2; j++) {
        if (segments[2 * s + i] !== segments[2 * r + j]) continue;
        const v = segments[2 * s + i] + FAR_VERTICES;
        const ratio = squaredLength(mesh.xy, p, v) / squaredLength(mesh.xy, q, v);
        if (ratio > 0.998 && ratio < 1.002) return true;
      }
    }
    return false;
  }

  private popWorst(): number {
    const { buckets, heads, mesh } = this;
    const { corner } = mesh;
    while (this.worst >= 0) {
      const list = buckets[this.worst];
      let head = heads[this.worst];
      while (head < list.length) {
        const t = list[head];
        head += 4;
        const alive = corner[3 * t] === list[head - 3] && corner[3 * t + 1] === list[head - 2];
        if (alive && corner[3 * t + 2] === list[head - 1]) {
          heads[this.worst] = head;
          return t;
        }
      }
      list.length = 0;
      heads[this.worst] = 0;
      this.worst--;
    }
    this.worst = 0;
    return -1;
  }
}

function squaredLength(xy: Float64Array, a: number, b: number): number {
  const dx = xy[2 * b] - xy[2 * a];
  const dy = xy[2 * b + 1] - xy[2 * a + 1];
  return dx * dx + dy * dy;
}
