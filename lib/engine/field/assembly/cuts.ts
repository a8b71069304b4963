/**
 * Cuts that make the stream function single-valued.
 *
 * Around a ring out of which current flows (a hole with a terminal on it) the stream function grows by that current at
 * every turn. A cut is a path of mesh edges from such a ring to the root ring; across it the function jumps by the
 * ring's own net current, which is an unknown. Instead of doubling vertices, each triangle that meets a vertex of a cut
 * carries a whole-number offset: how many times the jump is added to the vertex's value there.
 */

import type { FieldMesh } from "../mesh/mesh";
import type { BoundaryRuns } from "./boundary-runs";

/** Triangles around each vertex, counter-clockwise; at a boundary vertex from the edge that leaves it onwards. */
export interface VertexFans {
  readonly start: Int32Array;
  /** Corner numbers 3t+i with the vertex at local place i. */
  readonly corners: Int32Array;
}

export function vertexFans(mesh: FieldMesh, next: Int32Array): VertexFans {
  const { triangles } = mesh;
  const vertexCount = mesh.xy.length / 2;
  const start = new Int32Array(vertexCount + 1);
  for (let h = 0; h < triangles.length; h++) start[triangles[h] + 1]++;
  for (let v = 0; v < vertexCount; v++) start[v + 1] += start[v];
  const corners = new Int32Array(triangles.length);
  const filled = start.slice(0, vertexCount);
  for (let h = 0; h < triangles.length; h++) corners[filled[triangles[h]]++] = h;
  for (let v = 0; v < vertexCount; v++) orderFan(triangles, corners, start[v], start[v + 1], next[v]);
  return { start, corners };
}

/** The vertex after that of corner h in its triangle, and the one after that. */
function following(triangles: Int32Array, h: number, step: number): number {
  return triangles[h - (h % 3) + ((h + step) % 3)];
}

function orderFan(triangles: Int32Array, corners: Int32Array, from: number, to: number, first: number): void {
  for (let k = from; k < to; k++) {
    const wanted = k === from ? first : following(triangles, corners[k - 1], 2);
    if (wanted < 0) continue;
    for (let m = k; m < to; m++) {
      if (following(triangles, corners[m], 1) !== wanted) continue;
      const swap = corners[m];
      corners[m] = corners[k];
      corners[k] = swap;
      break;
    }
  }
}

/**
 * Paths of interior mesh edges from each of the given rings to the root ring, as vertex lists. Each is a shortest one;
 * they may share edges.
 */
export function cutPaths(
  mesh: FieldMesh,
  runs: BoundaryRuns,
  fans: VertexFans,
  root: number,
  rings: readonly number[],
): Int32Array[] {
  const vertexCount = mesh.xy.length / 2;
  const ringOf = new Int32Array(vertexCount).fill(-1);
  for (const run of runs.runs) for (const v of run.vertices) ringOf[v] = run.ring;
  const parent = new Int32Array(vertexCount).fill(-2);
  const queue = new Int32Array(vertexCount);
  let tail = 0;
  for (let v = 0; v < vertexCount; v++) {
    if (ringOf[v] !== root) continue;
    parent[v] = -1;
    queue[tail++] = v;
  }
  const wanted = new Set(rings);
  const ends = new Map<number, number>();
  for (let head = 0; head < tail && ends.size < wanted.size; head++) {
    const v = queue[head];
    // The first edge of a fan lies on the boundary if the vertex does; all others are interior.
    const from = fans.start[v] + (runs.next[v] >= 0 ? 1 : 0);
    for (let k = from; k < fans.start[v + 1]; k++) {
      const w = following(mesh.triangles, fans.corners[k], 1);
      if (parent[w] !== -2) continue;
      parent[w] = v;
      queue[tail++] = w;
      const ring = ringOf[w];
      if (wanted.has(ring) && !ends.has(ring)) ends.set(ring, w);
    }
  }
  return rings.map((ring) => {
    const path: number[] = [];
    for (let v = ends.get(ring) ?? -1; v >= 0; v = parent[v]) path.push(v);
    if (path.length < 2) throw new Error(`ring ${ring} is not connected to ring ${root}`);
    return Int32Array.from(path);
  });
}

/** Whole-number offsets of one cut: corner numbers (3t+i) and the multiple of the jump that is added there. */
export type CutOffsets = Map<number, number>;

/**
 * Offsets of the cut along `path` for all corners at its vertices and, where it ends within an insulated run, for the
 * rest of that run, so that the run's constant stays one value.
 */
export function cutOffsets(
  mesh: FieldMesh,
  runs: BoundaryRuns,
  fans: VertexFans,
  path: Int32Array,
): CutOffsets {
  const offsets: CutOffsets = new Map();
  const onPath = new Map<number, number>();
  path.forEach((v, k) => onPath.set(v, k));
  /** What is added when the fan of v is crossed counter-clockwise over the edge towards w. */
  const crossing = (v: number, w: number): number => {
    const k = onPath.get(v);
    if (k === undefined) return 0;
    if (k + 1 < path.length && path[k + 1] === w) return 1;
    return k > 0 && path[k - 1] === w ? -1 : 0;
  };
  /** Fills the fan of v with the offset `first` in its first triangle; returns the offset in its last one. */
  const sweep = (v: number, first: number): number => {
    let value = first;
    for (let k = fans.start[v]; k < fans.start[v + 1]; k++) {
      const h = fans.corners[k];
      if (k > fans.start[v]) value += crossing(v, following(mesh.triangles, h, 1));
      if (value !== 0) offsets.set(h, value);
    }
    return value;
  };
  const total = (v: number): number => {
    let sum = 0;
    for (let k = fans.start[v] + 1; k < fans.start[v + 1]; k++) {
      sum += crossing(v, following(mesh.triangles, fans.corners[k], 1));
    }
    return sum;
  };
  const done = new Set<number>();
  for (const v of path) {
    const r = runs.insulatedRun[v];
    if (r < 0) {
      sweep(v, 0);
      continue;
    }
    if (done.has(r)) continue;
    done.add(r);
    // Along an insulated run the triangle at an edge gives both its ends the same offset.
    const { vertices, closed } = runs.runs[r];
    let offset = 0;
    const last = closed ? vertices.length - 1 : vertices.length;
    for (let k = 0; k < last; k++) {
      const w = vertices[k];
      // The edge that arrives lies in the fan's last triangle, the edge that leaves in its first.
      if (k > 0) offset -= total(w);
      if (offset !== 0 || onPath.has(w)) sweep(w, offset);
    }
  }
  return offsets;
}
