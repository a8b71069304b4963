/**
 * Nested dissection of a mesh: a binary tree of sets of triangles.
 *
 * Unknowns that both halves of a set share are eliminated at the node that joins them, so the tree alone decides the
 * elimination order, for every problem on the mesh (George 1973, here in terms of triangles, not of a vertex
 * separator). A set is halved along one of three orders of its triangles: by x, by y, or by their distance in steps
 * from one end of the set; of all places near the middle the one is taken where the fewest unknowns are cut. Steps
 * find the short cuts across a winding strip, and the rings around a corner to which the mesh is graded.
 */

import type { ElementSet } from "../assembly/elements";

export interface DissectionTree {
  readonly nodeCount: number;
  /** Children of each node, or -1 at leaves. Nodes are numbered so that children come before their parent. */
  readonly left: Int32Array;
  readonly right: Int32Array;
  readonly parent: Int32Array;
  /** Triangles of a node: order[first[n]] … order[last[n]-1]. */
  readonly first: Int32Array;
  readonly last: Int32Array;
  readonly order: Int32Array;
}

/** Unknowns (condensed, one problem) that a leaf may have per triangle count: sets below this weight stay whole. */
const LEAF_WEIGHT = 50;

/** The smaller half has at least this part of the weight. */
const SMALLEST_HALF = 0.3;

export function dissect(set: ElementSet): DissectionTree {
  const work = new Dissector(set);
  const from: number[] = [0];
  const to: number[] = [set.triangleCount];
  const childA: number[] = [];
  const childB: number[] = [];
  // Sets in the order in which they are found, parents before children.
  for (let n = 0; n < from.length; n++) {
    const middle = work.halve(from[n], to[n]);
    childA.push(middle < 0 ? -1 : from.length);
    childB.push(middle < 0 ? -1 : from.length + 1);
    if (middle < 0) continue;
    from.push(from[n], middle);
    to.push(middle, to[n]);
  }
  return numberBottomUp(work.byX, from, to, childA, childB);
}

class Dissector {
  /** Triangles by x and by y; every set is the same range of both. */
  readonly byX: Int32Array;
  private readonly byY: Int32Array;
  private readonly bySteps: Int32Array;
  private readonly neighbour: Int32Array;
  private readonly cutWeight: Uint8Array;
  private readonly weight: Float64Array;
  /** Set to which a triangle belongs at present; triangles of the first half are marked by `side`. */
  private readonly owner: Int32Array;
  private readonly stamp: Int32Array;
  private readonly side: Uint8Array;
  private stamps = 0;
  private sets = 0;
  private bestScore = Infinity;
  private bestCount = 0;
  private bestOrder: Int32Array;

  constructor(set: ElementSet) {
    const { triangleCount: count, edges, mesh } = set;
    this.neighbour = new Int32Array(3 * count).fill(-1);
    this.cutWeight = new Uint8Array(3 * count);
    const seen = new Int32Array(edges.count).fill(-1);
    for (let h = 0; h < 3 * count; h++) {
      const e = edges.edgeOf[h];
      this.cutWeight[h] = set.edgeOrder[e];
      const other = seen[e];
      if (other < 0) {
        seen[e] = h;
        continue;
      }
      this.neighbour[h] = (other / 3) | 0;
      this.neighbour[other] = (h / 3) | 0;
    }
    this.weight = new Float64Array(count);
    for (let t = 0; t < count; t++) this.weight[t] = set.layouts[t].outer / 2;
    const { xy, triangles } = mesh;
    const cx = new Float64Array(count);
    const cy = new Float64Array(count);
    for (let h = 0; h < 3 * count; h++) {
      cx[(h / 3) | 0] += xy[2 * triangles[h]];
      cy[(h / 3) | 0] += xy[2 * triangles[h] + 1];
    }
    this.byX = sortedBy(cx);
    this.byY = sortedBy(cy);
    this.bySteps = new Int32Array(count);
    this.bestOrder = this.byX;
    this.owner = new Int32Array(count);
    this.stamp = new Int32Array(count);
    this.side = new Uint8Array(count);
  }

  /** Splits the set at [from, to) in two and returns where, or -1 if it is small enough. */
  halve(from: number, to: number): number {
    let total = 0;
    for (let k = from; k < to; k++) total += this.weight[this.byX[k]];
    if (total <= LEAF_WEIGHT || to - from < 2) return -1;
    const id = ++this.sets;
    for (let k = from; k < to; k++) this.owner[this.byX[k]] = id;
    this.bestScore = Infinity;
    this.tryOrder(this.byX, from, to, total, id);
    this.tryOrder(this.byY, from, to, total, id);
    this.walk(from, to, id, this.byX[from]);
    this.walk(from, to, id, this.bySteps[to - 1]);
    this.tryOrder(this.bySteps, from, to, total, id);
    const middle = from + this.bestCount;
    for (let k = from; k < to; k++) this.side[this.bestOrder[k]] = k < middle ? 0 : 1;
    this.divide(this.byX, from, to);
    this.divide(this.byY, from, to);
    return middle;
  }

  /** Looks for the cheapest place to cut an order near its middle. */
  private tryOrder(order: Int32Array, from: number, to: number, total: number, id: number): void {
    const { neighbour, cutWeight, weight, owner, stamp } = this;
    const passed = ++this.stamps;
    let cut = 0;
    let sum = 0;
    for (let k = from; k < to - 1; k++) {
      const t = order[k];
      sum += weight[t];
      for (let h = 3 * t; h < 3 * t + 3; h++) {
        const n = neighbour[h];
        if (n < 0 || owner[n] !== id) continue;
        if (stamp[n] === passed) cut -= cutWeight[h];
        else cut += cutWeight[h];
      }
      stamp[t] = passed;
      const part = Math.min(sum, total - sum) / total;
      if (part < SMALLEST_HALF && to - from > 3) continue;
      // The cost of a node grows faster than its cut; an even division keeps the tree shallow.
      const score = (cut + 1) * (1 + 3 * (0.5 - part) ** 2);
      if (score < this.bestScore) {
        this.bestScore = score;
        this.bestCount = k + 1 - from;
        this.bestOrder = order;
      }
    }
  }

  /** Breadth-first order of a set from a triangle; further components follow. */
  private walk(from: number, to: number, id: number, start: number): void {
    const { bySteps, neighbour, owner, stamp, byX } = this;
    const passed = ++this.stamps;
    let tail = from;
    let next = from;
    bySteps[tail++] = start;
    stamp[start] = passed;
    for (let head = from; head < to; head++) {
      if (head === tail) {
        while (stamp[byX[next]] === passed) next++;
        bySteps[tail++] = byX[next];
        stamp[byX[next]] = passed;
      }
      const t = bySteps[head];
      for (let h = 3 * t; h < 3 * t + 3; h++) {
        const n = neighbour[h];
        if (n < 0 || owner[n] !== id || stamp[n] === passed) continue;
        stamp[n] = passed;
        bySteps[tail++] = n;
      }
    }
  }

  /** Stable partition of an order by side. */
  private divide(order: Int32Array, from: number, to: number): void {
    const { side, bySteps } = this;
    // The walk order is not needed any more; its room takes the second half.
    let low = from;
    let high = from;
    for (let k = from; k < to; k++) {
      const t = order[k];
      if (side[t] === 0) order[low++] = t;
      else bySteps[high++] = t;
    }
    for (let k = from; k < high; k++) order[low++] = bySteps[k];
  }
}

function sortedBy(key: Float64Array): Int32Array {
  const order = new Int32Array(key.length);
  for (let t = 0; t < key.length; t++) order[t] = t;
  return order.sort((a, b) => key[a] - key[b]);
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
    const b = childB[n];
    if (a >= 0 && number[a] < 0) {
      stack.push(a);
      continue;
    }
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
