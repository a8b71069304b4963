import type { FieldMesh } from "./mesh";

/** A triangle flatter than this is not bisected; coordinates are rounded to 2^-54. */
const SMALLEST_HEIGHT = 2 ** -46;

/** Edges of a mesh: `edgeOf[3t + i]` is the edge opposite corner i of triangle t. */
export interface EdgeTable {
  readonly count: number;
  readonly edgeOf: Int32Array;
  /** Two vertices an edge, the smaller first. */
  readonly ends: Int32Array;
}

/** Numbers the edges of a mesh by sorting them under their smaller vertex. */
export function edgeTable(triangles: Int32Array, vertexCount: number): EdgeTable {
  const n = triangles.length;
  const first = new Int32Array(vertexCount + 1);
  const low = new Int32Array(n);
  const high = new Int32Array(n);
  for (let h = 0; h < n; h++) {
    const base = h - (h % 3);
    const a = triangles[base + ((h + 1) % 3)];
    const b = triangles[base + ((h + 2) % 3)];
    low[h] = a < b ? a : b;
    high[h] = a < b ? b : a;
    first[low[h] + 1]++;
  }
  for (let v = 0; v < vertexCount; v++) first[v + 1] += first[v];
  const slotHigh = new Int32Array(n);
  const slotEdge = new Int32Array(n);
  const filled = new Int32Array(vertexCount);
  const edgeOf = new Int32Array(n);
  const ends = new Int32Array(2 * n);
  let count = 0;
  for (let h = 0; h < n; h++) {
    const a = low[h];
    const start = first[a];
    const stop = start + filled[a];
    let s = start;
    while (s < stop && slotHigh[s] !== high[h]) s++;
    if (s === stop) {
      slotHigh[s] = high[h];
      slotEdge[s] = count;
      ends[2 * count] = a;
      ends[2 * count + 1] = high[h];
      count++;
      filled[a]++;
    }
    edgeOf[h] = slotEdge[s];
  }
  return { count, edgeOf, ends: ends.slice(0, 2 * count) };
}

/**
 * Newest-vertex bisection: each marked triangle is bisected at its refinement edge (mark 1) or at all three edges
 * (mark 2), and others as far as conformity demands (closure over edges as in S. Funken, D. Praetorius, P. Wissgott,
 * Comput. Methods Appl. Math. 11 (2011) 460). Region, boundary and sides are inherited. The old vertices keep their
 * numbers; the new ones are the midpoints. Marks on triangles flatter than 2^-46 are passed over.
 */
export function refine(mesh: FieldMesh, marked: Uint8Array): FieldMesh {
  const { triangles } = mesh;
  const oldVertices = mesh.xy.length / 2;
  const triangleCount = triangles.length / 3;
  const { count, edgeOf, ends } = edgeTable(triangles, oldVertices);
  const split = closure(withoutFlat(mesh, marked), triangleCount, count, edgeOf);
  const midpoint = new Int32Array(count).fill(-1);
  let vertices = oldVertices;
  for (let e = 0; e < count; e++) if (split[e] === 1) midpoint[e] = vertices++;
  if (vertices === oldVertices) return mesh;
  const xy = new Float64Array(2 * vertices);
  xy.set(mesh.xy);
  for (let e = 0; e < count; e++) {
    const m = midpoint[e];
    if (m < 0) continue;
    const a = ends[2 * e];
    const b = ends[2 * e + 1];
    xy[2 * m] = 0.5 * (xy[2 * a] + xy[2 * b]);
    xy[2 * m + 1] = 0.5 * (xy[2 * a + 1] + xy[2 * b + 1]);
  }
  const parts = bisectTriangles(mesh, edgeOf, midpoint);
  const boundary = splitBoundary(mesh, edgeOf, midpoint);
  return { xy, triangles: parts.triangles, region: parts.region, boundary, sides: mesh.sides };
}

/** The marks, less those on triangles so flat that rounding would turn their parts over. */
function withoutFlat(mesh: FieldMesh, marked: Uint8Array): Uint8Array {
  const { xy, triangles } = mesh;
  const kept = Uint8Array.from(marked);
  for (let t = 0; t < kept.length; t++) {
    if (kept[t] === 0) continue;
    const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
    const [ux, uy] = [xy[b] - xy[a], xy[b + 1] - xy[a + 1]];
    const [vx, vy] = [xy[c] - xy[a], xy[c + 1] - xy[a + 1]];
    const longest = Math.sqrt(
      Math.max(ux * ux + uy * uy, vx * vx + vy * vy, (vx - ux) ** 2 + (vy - uy) ** 2),
    );
    if (ux * vy - uy * vx < SMALLEST_HEIGHT * longest) kept[t] = 0;
  }
  return kept;
}

function closure(
  marked: Uint8Array,
  triangleCount: number,
  edgeCount: number,
  edgeOf: Int32Array,
): Uint8Array {
  const split = new Uint8Array(edgeCount);
  // Triangles on either side of an edge, to pass a mark on.
  const one = new Int32Array(edgeCount).fill(-1);
  const two = new Int32Array(edgeCount).fill(-1);
  for (let h = 0; h < edgeOf.length; h++) {
    const e = edgeOf[h];
    if (one[e] < 0) one[e] = h;
    else two[e] = h;
  }
  const stack: number[] = [];
  const mark = (e: number): void => {
    if (split[e] === 1) return;
    split[e] = 1;
    if (one[e] >= 0) stack.push(one[e]);
    if (two[e] >= 0) stack.push(two[e]);
  };
  for (let t = 0; t < triangleCount; t++) {
    if (marked[t] === 0) continue;
    mark(edgeOf[3 * t]);
    if (marked[t] < 2) continue;
    mark(edgeOf[3 * t + 1]);
    mark(edgeOf[3 * t + 2]);
  }
  while (stack.length > 0) {
    const h = stack.pop() as number;
    mark(edgeOf[h - (h % 3)]);
  }
  return split;
}

function bisectTriangles(
  mesh: FieldMesh,
  edgeOf: Int32Array,
  midpoint: Int32Array,
): { triangles: Int32Array; region: Int32Array } {
  const { triangles: old, region: oldRegion } = mesh;
  const count = old.length / 3;
  let total = count;
  for (let h = 0; h < old.length; h++) if (midpoint[edgeOf[h]] >= 0) total++;
  const triangles = new Int32Array(3 * total);
  const region = new Int32Array(total);
  let k = 0;
  let current = 0;
  const emit = (a: number, b: number, c: number): void => {
    triangles[3 * k] = a;
    triangles[3 * k + 1] = b;
    triangles[3 * k + 2] = c;
    region[k++] = current;
  };
  for (let t = 0; t < count; t++) {
    current = oldRegion[t];
    const a = old[3 * t];
    const b = old[3 * t + 1];
    const c = old[3 * t + 2];
    const m = midpoint[edgeOf[3 * t]];
    if (m < 0) {
      emit(a, b, c);
      continue;
    }
    const left = midpoint[edgeOf[3 * t + 2]];
    if (left < 0) emit(m, a, b);
    else {
      emit(left, m, a);
      emit(left, b, m);
    }
    const right = midpoint[edgeOf[3 * t + 1]];
    if (right < 0) emit(m, c, a);
    else {
      emit(right, m, c);
      emit(right, a, m);
    }
  }
  return { triangles, region };
}

function splitBoundary(mesh: FieldMesh, edgeOf: Int32Array, midpoint: Int32Array): Int32Array {
  const { boundary, triangles } = mesh;
  const edges = boundary.length / 3;
  const vertices = mesh.xy.length / 2;
  // A boundary vertex has one boundary edge that leaves it with the conductor on the left.
  const leaving = new Int32Array(vertices).fill(-1);
  for (let e = 0; e < edges; e++) leaving[boundary[3 * e]] = e;
  const middle = new Int32Array(edges).fill(-1);
  let extra = 0;
  for (let h = 0; h < triangles.length; h++) {
    const m = midpoint[edgeOf[h]];
    if (m < 0) continue;
    const base = h - (h % 3);
    const a = triangles[base + ((h + 1) % 3)];
    const b = triangles[base + ((h + 2) % 3)];
    const e = leaving[a];
    if (e < 0 || boundary[3 * e + 1] !== b) continue;
    middle[e] = m;
    extra++;
  }
  const split = new Int32Array(3 * (edges + extra));
  let k = 0;
  for (let e = 0; e < edges; e++) {
    const side = boundary[3 * e + 2];
    if (middle[e] >= 0) {
      split.set([boundary[3 * e], middle[e], side, middle[e], boundary[3 * e + 1], side], k);
      k += 6;
    } else {
      split.set([boundary[3 * e], boundary[3 * e + 1], side], k);
      k += 3;
    }
  }
  return split;
}
