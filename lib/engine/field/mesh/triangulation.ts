import { inCircle, orient } from "./predicates";

/** The half-edge after h in its triangle. */
export function nextEdge(h: number): number {
  return h % 3 === 2 ? h - 2 : h + 1;
}

/** The half-edge before h in its triangle. */
export function previousEdge(h: number): number {
  return h % 3 === 0 ? h + 2 : h - 1;
}

const FAR = 4;

/**
 * A constrained Delaunay triangulation that grows by one vertex at a time.
 *
 * Half-edge h = 3t + i runs from `corner[h]` to `corner[nextEdge(h)]` with its triangle t on the left; `twin[h]` is the
 * same edge seen from the other triangle, or -1 at the border; `mark[h]` is 0 for a free edge and otherwise one more
 * than the index of the constraint it is a piece of (the same on both half-edges). `corner[3t]` is -1 for a slot
 * that is not in use. Vertices are inserted by emptying the cavity of triangles whose circles contain the new point
 * (A. Bowyer, D. F. Watson, The Computer Journal 24 (1981) 162 and 167), never across a constraint.
 */
export class Triangulation {
  xy: Float64Array;
  vertexCount = 0;
  corner: Int32Array;
  twin: Int32Array;
  mark: Int32Array;
  /** Free for the owner: which medium, or whether outside. A new triangle inherits it from the one it replaces. */
  label: Int32Array;
  /** Number of slots ever used; some may be free. */
  triangleSlots = 0;
  /** A half-edge that starts at the vertex. */
  vertexEdge: Int32Array;

  private free: number[] = [];
  private stamp: Int32Array;
  private stampNow = 0;
  private link: Int32Array;
  /** Triangles of the last cavity, and its rim: half-edges on the inside of the rim. */
  private cavity: number[] = [];
  private rim: number[] = [];
  private rimFrom: number[] = [];
  private rimTo: number[] = [];
  private rimTwin: number[] = [];
  private rimMark: number[] = [];
  private rimLabel: number[] = [];
  /** Triangles made by the last `insert`. */
  readonly created: number[] = [];
  private hint = 0;
  private seed = 1;

  /** An empty triangulation of a square far around [-1, 1]²; its four corners are the vertices 0 to 3. */
  constructor(expectedVertices: number) {
    const vertices = Math.max(16, expectedVertices + 8);
    const triangles = 2 * vertices + 8;
    this.xy = new Float64Array(2 * vertices);
    this.vertexEdge = new Int32Array(vertices).fill(-1);
    this.link = new Int32Array(vertices).fill(-1);
    this.corner = new Int32Array(3 * triangles);
    this.twin = new Int32Array(3 * triangles);
    this.mark = new Int32Array(3 * triangles);
    this.label = new Int32Array(triangles);
    this.stamp = new Int32Array(triangles);
    for (const [x, y] of [
      [-FAR, -FAR],
      [FAR, -FAR],
      [FAR, FAR],
      [-FAR, FAR],
    ])
      this.addVertex(x, y);
    this.corner.set([0, 1, 2, 0, 2, 3]);
    this.twin.set([-1, -1, 3, 2, -1, -1]);
    this.triangleSlots = 2;
    this.vertexEdge.set([0, 1, 2, 5]);
  }

  /** Stores a point without connecting it. */
  addVertex(x: number, y: number): number {
    const v = this.vertexCount++;
    if (2 * v >= this.xy.length) {
      this.xy = grownFloats(this.xy);
      this.vertexEdge = grownInts(this.vertexEdge, -1);
      this.link = grownInts(this.link, -1);
    }
    this.xy[2 * v] = x;
    this.xy[2 * v + 1] = y;
    return v;
  }

  /** Takes back the vertex added last, which must not have been connected. */
  dropVertex(): void {
    this.vertexCount--;
  }

  /** The triangle t is in use. */
  isLive(t: number): boolean {
    return this.corner[3 * t] >= 0;
  }

  /** Takes out all triangles with a negative label; the edges they shared become border edges. */
  carve(): void {
    const { corner, twin, label, vertexEdge } = this;
    vertexEdge.fill(-1);
    for (let t = 0; t < this.triangleSlots; t++) {
      if (corner[3 * t] < 0) continue;
      const gone = label[t] < 0;
      for (let h = 3 * t; h < 3 * t + 3; h++) {
        if (gone) {
          if (twin[h] >= 0) twin[twin[h]] = -1;
        } else vertexEdge[corner[h]] = h;
      }
      if (!gone) continue;
      corner[3 * t] = corner[3 * t + 1] = corner[3 * t + 2] = -1;
      this.free.push(t);
    }
  }

  /**
   * Walks from triangle `from` to the one that holds (x, y). Answers the triangle; or -2 - h when half-edge h, a
   * constraint or the border, stands in the way and `stopAtMarks` is set (the border always stops).
   */
  locate(x: number, y: number, from: number, stopAtMarks: boolean): number {
    const { corner, twin, mark, xy } = this;
    let t = from >= 0 && from < this.triangleSlots && corner[3 * from] >= 0 ? from : this.anyTriangle();
    let entered = -1;
    const limit = 3 * this.triangleSlots + 16;
    for (let step = 0; step < limit; step++) {
      // A start that changes from step to step keeps the walk from circling where edges are constrained.
      this.seed = (Math.imul(this.seed, 1103515245) + 12345) & 0x7fffffff;
      const first = (this.seed >> 16) % 3;
      let moved = false;
      for (let k = 0; k < 3; k++) {
        const h = 3 * t + ((first + k) % 3);
        if (h === entered) continue;
        const a = corner[h];
        const b = corner[nextEdge(h)];
        if (orient(xy[2 * a], xy[2 * a + 1], xy[2 * b], xy[2 * b + 1], x, y) >= 0) continue;
        const w = twin[h];
        if (w < 0 || (stopAtMarks && mark[h] !== 0)) return -2 - h;
        entered = w;
        t = (w / 3) | 0;
        moved = true;
        break;
      }
      if (!moved) return t;
    }
    return this.scanFor(x, y);
  }

  private anyTriangle(): number {
    if (this.hint < this.triangleSlots && this.isLive(this.hint)) return this.hint;
    for (let t = 0; t < this.triangleSlots; t++) if (this.isLive(t)) return (this.hint = t);
    return 0;
  }

  private scanFor(x: number, y: number): number {
    const { corner, xy } = this;
    for (let t = 0; t < this.triangleSlots; t++) {
      if (corner[3 * t] < 0) continue;
      let inside = true;
      for (let h = 3 * t; h < 3 * t + 3 && inside; h++) {
        const a = corner[h];
        const b = corner[nextEdge(h)];
        inside = orient(xy[2 * a], xy[2 * a + 1], xy[2 * b], xy[2 * b + 1], x, y) >= 0;
      }
      if (inside) return t;
    }
    return -1;
  }

  /**
   * Finds the cavity of the point (x, y) that lies in triangle t, or on the constrained half-edge `split` of t.
   * False when the cavity cannot be seen whole from the point (possible only at the limit of rounding).
   * The rim can be inspected with `rimEdges` before `fill` is called.
   */
  openCavity(x: number, y: number, t: number, split: number): boolean {
    const twinOfSplit = split >= 0 ? this.twin[split] : -1;
    this.collect(x, y, t, twinOfSplit, true);
    this.readRim(split, twinOfSplit);
    const missing = split >= 0 && twinOfSplit < 0 ? 1 : 2;
    // A vertex inside the cavity would be lost; then the rim is shorter than its triangles demand.
    if (this.rim.length === this.cavity.length + missing && this.rimIsVisible(x, y)) return true;
    this.collect(x, y, t, twinOfSplit, false);
    this.readRim(split, twinOfSplit);
    return this.rimIsVisible(x, y);
  }

  private collect(x: number, y: number, t: number, twinOfSplit: number, grow: boolean): void {
    const { corner, twin, mark, stamp, xy, cavity } = this;
    const now = ++this.stampNow;
    cavity.length = 0;
    cavity.push(t);
    stamp[t] = now;
    if (twinOfSplit >= 0) {
      const other = (twinOfSplit / 3) | 0;
      cavity.push(other);
      stamp[other] = now;
    }
    if (!grow) return;
    for (let i = 0; i < cavity.length; i++) {
      const base = 3 * cavity[i];
      for (let h = base; h < base + 3; h++) {
        const w = twin[h];
        if (w < 0 || mark[h] !== 0) continue;
        const n = (w / 3) | 0;
        if (stamp[n] === now) continue;
        const a = corner[3 * n];
        const b = corner[3 * n + 1];
        const c = corner[3 * n + 2];
        const ax = xy[2 * a];
        const ay = xy[2 * a + 1];
        const inside = inCircle(ax, ay, xy[2 * b], xy[2 * b + 1], xy[2 * c], xy[2 * c + 1], x, y) > 0;
        if (!inside) continue;
        stamp[n] = now;
        cavity.push(n);
      }
    }
  }

  private readRim(split: number, twinOfSplit: number): void {
    const { corner, twin, mark, stamp, cavity, rim } = this;
    const now = this.stampNow;
    rim.length = this.rimFrom.length = this.rimTo.length = this.rimTwin.length = 0;
    this.rimMark.length = this.rimLabel.length = 0;
    for (let i = 0; i < cavity.length; i++) {
      const t = cavity[i];
      for (let h = 3 * t; h < 3 * t + 3; h++) {
        if (h === split || h === twinOfSplit) continue;
        const w = twin[h];
        if (w >= 0 && mark[h] === 0 && stamp[(w / 3) | 0] === now) continue;
        rim.push(h);
        this.rimFrom.push(corner[h]);
        this.rimTo.push(corner[nextEdge(h)]);
        this.rimTwin.push(w);
        this.rimMark.push(mark[h]);
        this.rimLabel.push(this.label[t]);
      }
    }
  }

  private rimIsVisible(x: number, y: number): boolean {
    const { xy, rimFrom, rimTo } = this;
    for (let i = 0; i < rimFrom.length; i++) {
      const a = rimFrom[i];
      const b = rimTo[i];
      if (orient(xy[2 * a], xy[2 * a + 1], xy[2 * b], xy[2 * b + 1], x, y) <= 0) return false;
    }
    return true;
  }

  /** Half-edges on the inside of the rim of the open cavity. */
  get rimEdges(): readonly number[] {
    return this.rim;
  }

  /**
   * Fills the open cavity with triangles around vertex v. When v splits a constraint, its ends a and b and its mark are
   * given, so that both halves carry it on. The new triangles are listed in `created`.
   */
  fill(v: number, a: number, b: number, splitMark: number): void {
    const { cavity, rimFrom, rimTo, rimTwin, rimMark, rimLabel, created, free } = this;
    const count = rimFrom.length;
    for (let i = 0; i < cavity.length; i++) {
      this.corner[3 * cavity[i]] = -1;
      free.push(cavity[i]);
    }
    created.length = 0;
    for (let i = 0; i < count; i++) created.push(free.length > 0 ? (free.pop() as number) : this.addSlot());
    const { corner, twin, mark, label, link, vertexEdge } = this;
    for (let i = 0; i < count; i++) link[rimTo[i]] = -1;
    for (let i = 0; i < count; i++) {
      const h = 3 * created[i];
      const from = rimFrom[i];
      const to = rimTo[i];
      corner[h] = v;
      corner[h + 1] = from;
      corner[h + 2] = to;
      twin[h] = -1;
      twin[h + 1] = rimTwin[i];
      twin[h + 2] = -1;
      if (rimTwin[i] >= 0) twin[rimTwin[i]] = h + 1;
      mark[h] = splitMark !== 0 && (from === a || from === b) ? splitMark : 0;
      mark[h + 1] = rimMark[i];
      mark[h + 2] = splitMark !== 0 && (to === a || to === b) ? splitMark : 0;
      label[created[i]] = rimLabel[i];
      link[from] = h;
      vertexEdge[to] = h + 2;
    }
    for (let i = 0; i < count; i++) {
      const h = 3 * created[i] + 2;
      const other = link[rimTo[i]];
      if (other >= 0) {
        twin[h] = other;
        twin[other] = h;
      }
      vertexEdge[rimFrom[i]] = h - 1;
    }
    for (let i = 0; i < count; i++) link[rimFrom[i]] = -1;
    vertexEdge[v] = 3 * created[0];
  }

  private addSlot(): number {
    const t = this.triangleSlots++;
    if (t >= this.label.length) {
      this.corner = grownInts(this.corner, -1);
      this.twin = grownInts(this.twin, -1);
      this.mark = grownInts(this.mark, 0);
      this.label = grownInts(this.label, 0);
      this.stamp = grownInts(this.stamp, 0);
    }
    return t;
  }

  /**
   * The half-edge from a to b, or -1. Turns around both ends by turns, so that it costs the smaller of their degrees: some
   * vertices have thousands of neighbours.
   */
  findEdge(a: number, b: number): number {
    const { corner, twin, vertexEdge } = this;
    const startA = vertexEdge[a];
    const startB = vertexEdge[b];
    if (startA < 0 || startB < 0) return -1;
    let h = startA;
    let g = startB;
    let forward = true;
    let forwardB = true;
    for (;;) {
      if (corner[nextEdge(h)] === b) return h;
      if (g >= 0 && corner[nextEdge(g)] === a) return twin[g];
      let next = forward ? twin[previousEdge(h)] : twin[h] < 0 ? -1 : nextEdge(twin[h]);
      if (next === startA) return -1;
      if (next < 0) {
        // At a border: back to the start, and round the other way.
        if (!forward || twin[startA] < 0) return -1;
        forward = false;
        next = nextEdge(twin[startA]);
      }
      h = next;
      if (g < 0) continue;
      let nextB = forwardB ? twin[previousEdge(g)] : twin[g] < 0 ? -1 : nextEdge(twin[g]);
      if (nextB < 0 && forwardB && twin[startB] >= 0) {
        forwardB = false;
        nextB = nextEdge(twin[startB]);
      }
      g = nextB === startB ? -1 : nextB;
    }
  }
}

function grownInts(old: Int32Array, fill: number): Int32Array {
  const grown = new Int32Array(2 * old.length).fill(fill, old.length);
  grown.set(old);
  return grown;
}

function grownFloats(old: Float64Array): Float64Array {
  const grown = new Float64Array(2 * old.length);
  grown.set(old);
  return grown;
}
