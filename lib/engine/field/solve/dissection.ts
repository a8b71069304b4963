/**
 * Nested dissection of a mesh: a binary tree of sets of triangles.
 *
 * Each set is halved across the longer side of its bounding box at the median of its triangles' weights; leaves hold a
 * handful of triangles. Unknowns that both halves share are eliminated at the node that joins them, so the tree alone
 * decides the elimination order, for every problem on the mesh (George 1973; here by geometry and in terms of
 * triangles, not of a vertex separator).
 */

import type { FieldMesh } from "../mesh/mesh";

export interface DissectionTree {
  readonly nodeCount: number;
  /** Children of each node, or -1 at leaves. Nodes are numbered so that children come before their parent. */
  readonly left: Int32Array;
  readonly right: Int32Array;
  readonly parent: Int32Array;
  /** Triangles of a leaf: order[first[n]] … order[last[n]-1]; also valid for inner nodes. */
  readonly first: Int32Array;
  readonly last: Int32Array;
  readonly order: Int32Array;
}

/** `weight` is the cost of each triangle, for instance its number of unknowns. */
export function dissect(mesh: FieldMesh, weight: Float64Array, leafWeight: number): DissectionTree {
  const { xy, triangles } = mesh;
  const count = triangles.length / 3;
  const cx = new Float64Array(count);
  const cy = new Float64Array(count);
  for (let t = 0; t < count; t++) {
    const a = 2 * triangles[3 * t];
    const b = 2 * triangles[3 * t + 1];
    const c = 2 * triangles[3 * t + 2];
    cx[t] = xy[a] + xy[b] + xy[c];
    cy[t] = xy[a + 1] + xy[b + 1] + xy[c + 1];
  }
  const order = new Int32Array(count);
  for (let t = 0; t < count; t++) order[t] = t;
  // Sets in the order in which they are found, parents before children.
  const from: number[] = [0];
  const to: number[] = [count];
  const childA: number[] = [];
  const childB: number[] = [];
  for (let n = 0; n < from.length; n++) {
    const middle = halve(order, from[n], to[n], cx, cy, weight, leafWeight);
    if (middle < 0) {
      childA.push(-1);
      childB.push(-1);
      continue;
    }
    childA.push(from.length);
    from.push(from[n]);
    to.push(middle);
    childB.push(from.length);
    from.push(middle);
    to.push(to[n]);
  }
  return numberBottomUp(order, from, to, childA, childB);
}

/** Splits order[from … to) in two and returns where, or -1 if the set is small enough. */
function halve(
  order: Int32Array,
  from: number,
  to: number,
  cx: Float64Array,
  cy: Float64Array,
  weight: Float64Array,
  leafWeight: number,
): number {
  let total = 0;
  let x0 = Infinity;
  let x1 = -Infinity;
  let y0 = Infinity;
  let y1 = -Infinity;
  for (let k = from; k < to; k++) {
    const t = order[k];
    total += weight[t];
    if (cx[t] < x0) x0 = cx[t];
    if (cx[t] > x1) x1 = cx[t];
    if (cy[t] < y0) y0 = cy[t];
    if (cy[t] > y1) y1 = cy[t];
  }
  if (total <= leafWeight || to - from < 2) return -1;
  return splitAtMedian(order, from, to, x1 - x0 > y1 - y0 ? cx : cy);
}

/** Quickselect (Hoare) of the middle triangle by its key. */
function splitAtMedian(order: Int32Array, from: number, to: number, key: Float64Array): number {
  const middle = (from + to) >> 1;
  let low = from;
  let high = to - 1;
  while (low < high) {
    const pivot = key[order[(low + high) >> 1]];
    let i = low;
    let j = high;
    while (i <= j) {
      while (key[order[i]] < pivot) i++;
      while (key[order[j]] > pivot) j--;
      if (i <= j) {
        const swap = order[i];
        order[i++] = order[j];
        order[j--] = swap;
      }
    }
    if (middle <= j) high = j;
    else if (middle >= i) low = i;
    else break;
  }
  return middle;
}

function numberBottomUp(
  order: Int32Array,
  from: number[],
  to: number[],
  childA: number[],
  childB: number[],
): DissectionTree {
  const nodeCount = from.length;
  const number = new Int32Array(nodeCount).fill(-1);
  const left = new Int32Array(nodeCount).fill(-1);
  const right = new Int32Array(nodeCount).fill(-1);
  const parent = new Int32Array(nodeCount).fill(-1);
  const first = new Int32Array(nodeCount);
  const last = new Int32Array(nodeCount);
  const stack = [0];
  let next = 0;
  // A node is numbered when both its children are: it stays on the stack until then.
  while (stack.length > 0) {
    const n = stack[stack.length - 1];
    const a = childA[n];
    if (a >= 0 && number[a] < 0) {
      stack.push(a);
      continue;
    }
    const b = childB[n];
    if (b >= 0 && number[b] < 0) {
      stack.push(b);
      continue;
    }
    stack.pop();
    const m = next++;
    number[n] = m;
    first[m] = from[n];
    last[m] = to[n];
    if (a >= 0) {
      left[m] = number[a];
      right[m] = number[b];
      parent[number[a]] = m;
      parent[number[b]] = m;
    }
  }
  return { nodeCount, left, right, parent, first, last, order };
}
