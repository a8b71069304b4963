/**
 * Symbolic part of the multifrontal factorisation: which unknowns each node of the dissection eliminates, and which
 * further ones its front holds.
 *
 * An entity is eliminated at the lowest node whose subtree contains all triangles that touch it. The front of a node
 * has its own unknowns first, then those of the border towards the rest of the mesh, in elimination order.
 */

import type { TriangleEntities } from "../assembly/unknowns";
import type { DissectionTree } from "./dissection";

export interface FrontStructure {
  readonly tree: DissectionTree;
  readonly unknowns: number;
  /** First unknown of each entity in elimination order; meaningless where the entity has none. */
  readonly entityFirst: Int32Array;
  readonly entitySize: Uint8Array;
  /** First unknown that node n eliminates; those of node n+1 follow. One entry more than nodes. */
  readonly ownFirst: Int32Array;
  /** Border unknowns of node n: border[borderStart[n]] … border[borderStart[n+1]-1], ascending. */
  readonly borderStart: Int32Array;
  readonly border: Int32Array;
  /** Place of each node's panel (own and border rows, own columns, row-major) in the factor. */
  readonly panelStart: Float64Array;
  readonly factorSize: number;
  /** Largest sum of border matrices that are alive at one time. */
  readonly stackSize: number;
  /** Multiplications and additions of the numerical factorisation. */
  readonly operations: number;
}

export function analyse(
  tree: DissectionTree,
  triangleEntities: TriangleEntities,
  entitySize: Uint8Array,
): FrontStructure {
  const { nodeCount, left, right, parent } = tree;
  const entityCount = entitySize.length;
  const nodeOf = homeNodes(tree, triangleEntities, entityCount);

  // Own entities by node, and the elimination order.
  const ownEntityStart = new Int32Array(nodeCount + 1);
  for (let e = 0; e < entityCount; e++) if (nodeOf[e] >= 0) ownEntityStart[nodeOf[e] + 1]++;
  for (let n = 0; n < nodeCount; n++) ownEntityStart[n + 1] += ownEntityStart[n];
  const ownEntities = new Int32Array(ownEntityStart[nodeCount]);
  const filled = ownEntityStart.slice();
  for (let e = 0; e < entityCount; e++) if (nodeOf[e] >= 0) ownEntities[filled[nodeOf[e]]++] = e;
  const ownFirst = new Int32Array(nodeCount + 1);
  const entityFirst = new Int32Array(entityCount);
  let unknowns = 0;
  for (let n = 0; n < nodeCount; n++) {
    ownFirst[n] = unknowns;
    for (let k = ownEntityStart[n]; k < ownEntityStart[n + 1]; k++) {
      entityFirst[ownEntities[k]] = unknowns;
      unknowns += entitySize[ownEntities[k]];
    }
  }
  ownFirst[nodeCount] = unknowns;

  // Border entities, bottom up; children's lists are merged. A child's list is needed only by its parent.
  const lists: (Int32Array | null)[] = new Array<Int32Array | null>(nodeCount).fill(null);
  const borderStart = new Int32Array(nodeCount + 1);
  const panelStart = new Float64Array(nodeCount + 1);
  let border = new Int32Array(Math.max(1024, 4 * unknowns));
  let alive = 0;
  let stackSize = 0;
  let operations = 0;
  const stamp = new Int32Array(entityCount).fill(-1);
  let scratch = new Int32Array(256);
  for (let n = 0; n < nodeCount; n++) {
    let length = 0;
    if (left[n] < 0) {
      for (let k = tree.first[n]; k < tree.last[n]; k++) {
        const t = tree.order[k];
        for (let i = triangleEntities.start[t]; i < triangleEntities.start[t + 1]; i++) {
          const e = triangleEntities.list[i];
          if (nodeOf[e] === n || stamp[e] === n) continue;
          stamp[e] = n;
          if (length === scratch.length) scratch = grown(scratch);
          scratch[length++] = e;
        }
      }
      sortByFirst(scratch, length, entityFirst);
    } else {
      const a = lists[left[n]] as Int32Array;
      const b = lists[right[n]] as Int32Array;
      if (a.length + b.length > scratch.length) scratch = new Int32Array(2 * (a.length + b.length));
      length = mergeWithout(a, b, entityFirst, nodeOf, n, scratch);
      lists[left[n]] = null;
      lists[right[n]] = null;
    }
    lists[n] = scratch.slice(0, length);
    let at = borderStart[n];
    for (let k = 0; k < length; k++) {
      const e = scratch[k];
      const size = entitySize[e];
      if (at + size > border.length) border = grown(border);
      for (let i = 0; i < size; i++) border[at++] = entityFirst[e] + i;
    }
    borderStart[n + 1] = at;
    const own = ownFirst[n + 1] - ownFirst[n];
    const rest = at - borderStart[n];
    panelStart[n + 1] = panelStart[n] + own * (own + rest);
    operations += own * own * (own / 3 + rest) + own * rest * rest;
    // A node's border matrix is built while those of its children are still there.
    alive += rest * rest;
    stackSize = Math.max(stackSize, alive);
    if (left[n] >= 0) {
      for (const c of [left[n], right[n]]) alive -= (borderStart[c + 1] - borderStart[c]) ** 2;
    }
    if (parent[n] < 0) alive = 0;
  }
  return {
    tree,
    unknowns,
    entityFirst,
    entitySize,
    ownFirst,
    borderStart,
    border: border.slice(0, borderStart[nodeCount]),
    panelStart,
    factorSize: panelStart[nodeCount],
    stackSize,
    operations,
  };
}

/** The lowest node whose subtree holds all triangles of an entity, or -1 for an entity that no triangle has. */
function homeNodes(tree: DissectionTree, list: TriangleEntities, entityCount: number): Int32Array {
  const firstLeaf = new Int32Array(entityCount).fill(-1);
  const lastLeaf = new Int32Array(entityCount).fill(-1);
  for (let n = 0; n < tree.nodeCount; n++) {
    if (tree.left[n] >= 0) continue;
    for (let k = tree.first[n]; k < tree.last[n]; k++) {
      const t = tree.order[k];
      for (let i = list.start[t]; i < list.start[t + 1]; i++) {
        const e = list.list[i];
        if (firstLeaf[e] < 0) firstLeaf[e] = n;
        lastLeaf[e] = n;
      }
    }
  }
  // Children have smaller numbers than their parent: the smaller one climbs until both meet.
  for (let e = 0; e < entityCount; e++) {
    let a = firstLeaf[e];
    let b = lastLeaf[e];
    while (a !== b) {
      if (a < b) a = tree.parent[a];
      else b = tree.parent[b];
    }
    firstLeaf[e] = a;
  }
  return firstLeaf;
}

function grown(list: Int32Array): Int32Array<ArrayBuffer> {
  const longer = new Int32Array(2 * list.length);
  longer.set(list);
  return longer;
}

/** Insertion sort: the lists of leaves are short. */
function sortByFirst(list: Int32Array, length: number, first: Int32Array): void {
  for (let i = 1; i < length; i++) {
    const e = list[i];
    const key = first[e];
    let j = i - 1;
    while (j >= 0 && first[list[j]] > key) {
      list[j + 1] = list[j];
      j--;
    }
    list[j + 1] = e;
  }
}

/** Merges two ascending lists, leaving out what node n eliminates. */
function mergeWithout(
  a: Int32Array,
  b: Int32Array,
  first: Int32Array,
  nodeOf: Int32Array,
  n: number,
  out: Int32Array,
): number {
  let i = 0;
  let j = 0;
  let length = 0;
  while (i < a.length || j < b.length) {
    let e: number;
    if (j >= b.length) e = a[i++];
    else if (i >= a.length) e = b[j++];
    else if (a[i] === b[j]) {
      e = a[i++];
      j++;
    } else e = first[a[i]] < first[b[j]] ? a[i++] : b[j++];
    if (nodeOf[e] !== n) out[length++] = e;
  }
  return length;
}
