import { inCircle, orient } from "./predicates";
import { nextEdge, previousEdge, type Triangulation } from "./triangulation";

/** What stood in the way of a constraint. */
export type Obstacle =
  /** The constraint runs through this vertex. */
  | { readonly kind: "vertex"; readonly vertex: number }
  /** The constraint crosses this half-edge, which is constrained itself. */
  | { readonly kind: "edge"; readonly halfEdge: number };

/**
 * Makes the edge a–b part of the triangulation and marks it. Edges in the way are flipped until none crosses
 * (S. W. Sloan, Computers & Structures 47 (1993) 441), then the Delaunay property is restored around it.
 * Answers null, or the first obstacle seen from a; the triangulation is then unchanged.
 */
export function constrain(mesh: Triangulation, a: number, b: number, mark: number): Obstacle | null {
  const existing = mesh.findEdge(a, b);
  if (existing >= 0) {
    if (mesh.mark[existing] === 0) setMark(mesh, existing, mark);
    return null;
  }
  const crossing: number[] = [];
  const obstacle = collectCrossings(mesh, a, b, crossing);
  if (obstacle !== null) return obstacle;
  const fresh = flipAway(mesh, a, b, crossing);
  setMark(mesh, mesh.findEdge(a, b), mark);
  restore(mesh, fresh);
  return null;
}

/** Marks a half-edge and its twin. */
export function setMark(mesh: Triangulation, h: number, mark: number): void {
  mesh.mark[h] = mark;
  if (mesh.twin[h] >= 0) mesh.mark[mesh.twin[h]] = mark;
}

function side(mesh: Triangulation, a: number, b: number, v: number): number {
  const { xy } = mesh;
  return orient(xy[2 * a], xy[2 * a + 1], xy[2 * b], xy[2 * b + 1], xy[2 * v], xy[2 * v + 1]);
}

function ahead(mesh: Triangulation, a: number, b: number, v: number): boolean {
  const { xy } = mesh;
  const dx = xy[2 * b] - xy[2 * a];
  const dy = xy[2 * b + 1] - xy[2 * a + 1];
  return dx * (xy[2 * v] - xy[2 * a]) + dy * (xy[2 * v + 1] - xy[2 * a + 1]) > 0;
}

/**
 * Everything constrained that stands between a and b, seen from a; vertices on the way count as well.
 * @param most answers this many at most.
 */
export function obstaclesBetween(mesh: Triangulation, a: number, b: number, most: number): Obstacle[] {
  const { mark } = mesh;
  const obstacles: Obstacle[] = [];
  let from = a;
  while (obstacles.length < most && mesh.findEdge(from, b) < 0) {
    let next: number | VertexObstacle | null = firstAcross(mesh, from, b);
    while (typeof next === "number" && obstacles.length < most) {
      if (mark[next] !== 0) obstacles.push({ kind: "edge", halfEdge: next });
      next = nextAcross(mesh, from, b, next);
    }
    if (next === null || typeof next === "number") break;
    obstacles.push(next);
    from = next.vertex;
  }
  return obstacles;
}

type VertexObstacle = Extract<Obstacle, { kind: "vertex" }>;

/** The edges that a→b crosses, as vertex pairs (right of it, left of it). */
function collectCrossings(mesh: Triangulation, a: number, b: number, crossing: number[]): Obstacle | null {
  const { corner, mark } = mesh;
  let across: number | VertexObstacle | null = firstAcross(mesh, a, b);
  while (typeof across === "number") {
    if (mark[across] !== 0) return { kind: "edge", halfEdge: across };
    crossing.push(corner[across], corner[nextEdge(across)]);
    across = nextAcross(mesh, a, b, across);
  }
  return across;
}

/** The first half-edge that a→b crosses, or the vertex that it meets before. */
function firstAcross(mesh: Triangulation, a: number, b: number): number | VertexObstacle {
  const { corner, twin } = mesh;
  let start = mesh.vertexEdge[a];
  // At a border the turn begins at the half-edge that has nothing on its right.
  for (let g = start; twin[g] >= 0;) {
    g = nextEdge(twin[g]);
    if (g === start) break;
    if (twin[g] < 0) start = g;
  }
  let h = start;
  do {
    const right = corner[nextEdge(h)];
    const left = corner[previousEdge(h)];
    const sideOfRight = side(mesh, a, b, right);
    if (sideOfRight === 0 && ahead(mesh, a, b, right)) return { kind: "vertex", vertex: right };
    const sideOfLeft = side(mesh, a, b, left);
    if (sideOfLeft === 0 && ahead(mesh, a, b, left)) return { kind: "vertex", vertex: left };
    if (sideOfRight < 0 && sideOfLeft > 0) return nextEdge(h);
    h = twin[previousEdge(h)];
  } while (h >= 0 && h !== start);
  throw new Error("constraint leaves the triangulated area");
}

/** What a→b meets after the half-edge `across`: another one, a vertex, or b itself: null. */
function nextAcross(
  mesh: Triangulation,
  a: number,
  b: number,
  across: number,
): number | VertexObstacle | null {
  const w = mesh.twin[across];
  const apex = mesh.corner[previousEdge(w)];
  if (apex === b) return null;
  const s = side(mesh, a, b, apex);
  if (s === 0) return { kind: "vertex", vertex: apex };
  // w runs from the left end to the right end; the next edge starts at the right end.
  return s > 0 ? nextEdge(w) : previousEdge(w);
}

/** Replaces the diagonal h of its two triangles by the other one. The quadrilateral must be strictly convex. */
export function flip(mesh: Triangulation, h: number): void {
  const { corner, twin, mark, vertexEdge, label } = mesh;
  const w = twin[h];
  const h1 = nextEdge(h);
  const h2 = previousEdge(h);
  const w1 = nextEdge(w);
  const w2 = previousEdge(w);
  const a = corner[h];
  const b = corner[w];
  const c = corner[h2];
  const d = corner[w2];
  // Triangle of h becomes (d, b, c) and that of w becomes (c, a, d), the new diagonal being c–d.
  const outer = [twin[w2], mark[w2], twin[h1], mark[h1], twin[h2], mark[h2], twin[w1], mark[w1]];
  const t = 3 * ((h / 3) | 0);
  const s = 3 * ((w / 3) | 0);
  place(mesh, t, d, b, outer[0], outer[1]);
  place(mesh, t + 1, b, c, outer[2], outer[3]);
  place(mesh, s, c, a, outer[4], outer[5]);
  place(mesh, s + 1, a, d, outer[6], outer[7]);
  corner[t + 2] = c;
  corner[s + 2] = d;
  twin[t + 2] = s + 2;
  twin[s + 2] = t + 2;
  mark[t + 2] = mark[s + 2] = 0;
  vertexEdge[a] = s + 1;
  vertexEdge[b] = t + 1;
  vertexEdge[c] = t + 2;
  vertexEdge[d] = s + 2;
  label[(s / 3) | 0] = label[(t / 3) | 0];
}

function place(mesh: Triangulation, h: number, from: number, to: number, twin: number, mark: number): void {
  mesh.corner[h] = from;
  mesh.twin[h] = twin;
  mesh.mark[h] = mark;
  if (twin >= 0) mesh.twin[twin] = h;
  mesh.vertexEdge[to] = nextEdge(h);
}

function flipAway(mesh: Triangulation, a: number, b: number, crossing: number[]): number[] {
  const { corner, twin } = mesh;
  const fresh: number[] = [];
  let queue = crossing;
  while (queue.length > 0) {
    const later: number[] = [];
    for (let i = 0; i < queue.length; i += 2) {
      const h = mesh.findEdge(queue[i], queue[i + 1]);
      const p = corner[h];
      const q = corner[twin[h]];
      const c = corner[previousEdge(h)];
      const d = corner[previousEdge(twin[h])];
      if (side(mesh, d, q, c) <= 0 || side(mesh, c, p, d) <= 0) {
        later.push(queue[i], queue[i + 1]);
        continue;
      }
      flip(mesh, h);
      // The new edge c–d still crosses a→b only when its ends lie strictly on both sides of it.
      const crosses =
        c !== a && c !== b && d !== a && d !== b && side(mesh, a, b, c) > 0 !== side(mesh, a, b, d) > 0;
      (crosses ? later : fresh).push(c, d);
    }
    queue = later;
  }
  return fresh;
}

/** Flips the given edges (vertex pairs), and what they upset, until each is locally Delaunay or constrained. */
function restore(mesh: Triangulation, edges: number[]): void {
  const { corner, twin, mark, xy } = mesh;
  // Three numbers each: the ends, and the half-edge where they were seen last.
  const stack: number[] = [];
  for (let i = 0; i < edges.length; i += 2) stack.push(edges[i], edges[i + 1], -1);
  // Lawson's flips end by themselves; the limit only guards against a broken structure.
  let budget = 64 * edges.length + 1000;
  while (stack.length > 0 && budget-- > 0) {
    let h = stack.pop() as number;
    const b = stack.pop() as number;
    const a = stack.pop() as number;
    if (h < 0 || corner[h] !== a || corner[nextEdge(h)] !== b) h = mesh.findEdge(a, b);
    if (h < 0 || mark[h] !== 0 || twin[h] < 0) continue;
    const c = corner[previousEdge(h)];
    const d = corner[previousEdge(twin[h])];
    const ax = xy[2 * a];
    const ay = xy[2 * a + 1];
    const bx = xy[2 * b];
    const by = xy[2 * b + 1];
    if (!(inCircle(ax, ay, bx, by, xy[2 * c], xy[2 * c + 1], xy[2 * d], xy[2 * d + 1]) > 0)) continue;
    const t = h - (h % 3);
    const s = twin[h] - (twin[h] % 3);
    flip(mesh, h);
    stack.push(d, b, t, b, c, t + 1, c, a, s, a, d, s + 1);
  }
}
