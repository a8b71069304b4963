import type { FieldMesh } from "./mesh";

/** Layers end when the star of the vertex has shrunk to this size; below it coordinates lose their digits. */
const SMALLEST_STAR = 2 ** -42;
/** They end, too, when a triangle of the star has become this flat. Coordinates are rounded to 2^-54. */
const SMALLEST_HEIGHT = 2 ** -46;

/**
 * Grades the mesh towards single vertices. A layer halves the edges at the vertex v: each triangle (v, a, b) of its star
 * becomes (v, a', b') and two that fill the strip a', a, b, b', so that the mesh stays conforming by itself, its
 * angles stay bounded, and a layer costs two triangles for each triangle of the star. Old vertices keep their
 * numbers. `layers[i]` belongs to `vertices[i]`; a vertex gets fewer when its star would become smaller than 2^-42 of
 * the domain.
 */
export function refineTowards(mesh: FieldMesh, vertices: Int32Array, layers: Int32Array): FieldMesh {
  const grading = new Grading(mesh);
  for (let i = 0; i < vertices.length; i++) grading.gradeTowards(vertices[i], layers[i]);
  return grading.finish();
}

class Grading {
  private readonly xy: number[];
  private readonly triangles: number[];
  private readonly region: number[];
  /** Boundary edges as a linked list, so that one can be split in place. */
  private readonly edgeFrom: number[] = [];
  private readonly edgeTo: number[] = [];
  private readonly edgeSide: number[] = [];
  private readonly edgeNext: number[] = [];
  private readonly leaving = new Map<number, number>();
  private readonly arriving = new Map<number, number>();
  /** Triangles at each vertex of the mesh as it came, and those that grading added. */
  private readonly starStart: Int32Array;
  private readonly starList: Int32Array;
  private readonly added = new Map<number, number[]>();

  constructor(private readonly mesh: FieldMesh) {
    this.xy = Array.from(mesh.xy);
    this.triangles = Array.from(mesh.triangles);
    this.region = Array.from(mesh.region);
    const vertexCount = mesh.xy.length / 2;
    this.starStart = new Int32Array(vertexCount + 1);
    for (const v of mesh.triangles) this.starStart[v + 1]++;
    for (let v = 0; v < vertexCount; v++) this.starStart[v + 1] += this.starStart[v];
    this.starList = new Int32Array(mesh.triangles.length);
    const cursor = this.starStart.slice();
    for (let h = 0; h < mesh.triangles.length; h++) this.starList[cursor[mesh.triangles[h]]++] = (h / 3) | 0;
    const { boundary } = mesh;
    for (let e = 0; e < boundary.length / 3; e++) {
      this.edgeFrom.push(boundary[3 * e]);
      this.edgeTo.push(boundary[3 * e + 1]);
      this.edgeSide.push(boundary[3 * e + 2]);
      this.edgeNext.push(e + 1);
      this.leaving.set(boundary[3 * e], e);
      this.arriving.set(boundary[3 * e + 1], e);
    }
    if (this.edgeNext.length > 0) this.edgeNext[this.edgeNext.length - 1] = -1;
  }

  gradeTowards(v: number, layers: number): void {
    const star = this.starOf(v);
    for (let layer = 0; layer < layers; layer++) {
      if (!this.canHalve(v, star)) return;
      this.halve(v, star);
    }
  }

  private starOf(v: number): number[] {
    const candidates = Array.from(this.starList.subarray(this.starStart[v], this.starStart[v + 1]));
    candidates.push(...(this.added.get(v) ?? []));
    const { triangles } = this;
    return candidates.filter(
      (t) => triangles[3 * t] === v || triangles[3 * t + 1] === v || triangles[3 * t + 2] === v,
    );
  }

  /** Whether halving the star gives triangles that rounding does not distort. */
  private canHalve(v: number, star: number[]): boolean {
    const { triangles, xy } = this;
    for (const t of star) {
      const k = triangles[3 * t] === v ? 0 : triangles[3 * t + 1] === v ? 1 : 2;
      const a = triangles[3 * t + ((k + 1) % 3)];
      const b = triangles[3 * t + ((k + 2) % 3)];
      const [x, y] = [xy[2 * v], xy[2 * v + 1]];
      const [ax, ay, bx, by] = [xy[2 * a] - x, xy[2 * a + 1] - y, xy[2 * b] - x, xy[2 * b + 1] - y];
      const longer = Math.max(Math.hypot(ax, ay), Math.hypot(bx, by));
      // The least height of the triangle, or what is left of its edges.
      const height = (ax * by - ay * bx) / Math.max(longer, Math.hypot(bx - ax, by - ay));
      if (!(height >= SMALLEST_HEIGHT) || longer < 2 * SMALLEST_STAR) return false;
    }
    return star.length > 0;
  }

  private halve(v: number, star: number[]): void {
    const { triangles } = this;
    const halfway = new Map<number, number>();
    for (const t of star) {
      const k = triangles[3 * t] === v ? 0 : triangles[3 * t + 1] === v ? 1 : 2;
      const a = triangles[3 * t + ((k + 1) % 3)];
      const b = triangles[3 * t + ((k + 2) % 3)];
      const p = this.midpoint(v, a, halfway);
      const q = this.midpoint(v, b, halfway);
      // The similar triangle at v keeps its refinement edge where it was.
      triangles[3 * t + ((k + 1) % 3)] = p;
      triangles[3 * t + ((k + 2) % 3)] = q;
      // The strip p, a, b, q is divided by its shorter diagonal.
      if (this.distance(p, b) <= this.distance(q, a)) {
        this.addTriangle(p, a, b, this.region[t]);
        this.addTriangle(p, b, q, this.region[t]);
      } else {
        this.addTriangle(p, a, q, this.region[t]);
        this.addTriangle(a, b, q, this.region[t]);
      }
    }
  }

  private midpoint(v: number, a: number, halfway: Map<number, number>): number {
    const known = halfway.get(a);
    if (known !== undefined) return known;
    const { xy } = this;
    const m = xy.length / 2;
    xy.push(0.5 * (xy[2 * v] + xy[2 * a]), 0.5 * (xy[2 * v + 1] + xy[2 * a + 1]));
    halfway.set(a, m);
    const out = this.leaving.get(v);
    if (out !== undefined && this.edgeTo[out] === a) this.splitEdge(out, m);
    const into = this.arriving.get(v);
    if (into !== undefined && this.edgeFrom[into] === a) this.splitEdge(into, m);
    return m;
  }

  private splitEdge(e: number, m: number): void {
    const fresh = this.edgeFrom.length;
    const to = this.edgeTo[e];
    this.edgeFrom.push(m);
    this.edgeTo.push(to);
    this.edgeSide.push(this.edgeSide[e]);
    this.edgeNext.push(this.edgeNext[e]);
    this.edgeNext[e] = fresh;
    this.edgeTo[e] = m;
    this.arriving.set(m, e);
    this.leaving.set(m, fresh);
    this.arriving.set(to, fresh);
  }

  private distance(a: number, b: number): number {
    return Math.hypot(this.xy[2 * a] - this.xy[2 * b], this.xy[2 * a + 1] - this.xy[2 * b + 1]);
  }

  /** Stores a triangle with the corner opposite its longest edge first. */
  private addTriangle(a: number, b: number, c: number, region: number): void {
    const ab = this.distance(a, b);
    const bc = this.distance(b, c);
    const ca = this.distance(c, a);
    const t = this.triangles.length / 3;
    if (bc >= ab && bc >= ca) this.triangles.push(a, b, c);
    else if (ca >= ab) this.triangles.push(b, c, a);
    else this.triangles.push(c, a, b);
    this.region.push(region);
    for (const v of [a, b, c]) {
      const list = this.added.get(v);
      if (list) list.push(t);
      else this.added.set(v, [t]);
    }
  }

  finish(): FieldMesh {
    const boundary: number[] = [];
    for (let e = this.edgeFrom.length > 0 ? 0 : -1; e >= 0; e = this.edgeNext[e]) {
      boundary.push(this.edgeFrom[e], this.edgeTo[e], this.edgeSide[e]);
    }
    return {
      xy: Float64Array.from(this.xy),
      triangles: Int32Array.from(this.triangles),
      region: Int32Array.from(this.region),
      boundary: Int32Array.from(boundary),
      sides: this.mesh.sides,
    };
  }
}
