/**
 * The elements of a mesh: their orders, layouts and condensed matrices, shared by the potential and its conjugate.
 */

import { condense, fillStiffness, LARGEST_ELEMENT } from "../element/condense";
import { elementLayout, type ElementLayout } from "../element/layout";
import { edgeTable, type EdgeTable } from "../mesh/bisect";
import type { FieldMesh } from "../mesh/mesh";

export interface ElementSet {
  readonly mesh: FieldMesh;
  readonly triangleCount: number;
  readonly vertexCount: number;
  readonly edges: EdgeTable;
  /** Order of each edge: the highest order of the triangles that meet there. */
  readonly edgeOrder: Uint8Array;
  readonly layouts: readonly ElementLayout[];
  /** Bit i set: local edge i runs against its global direction (smaller to larger vertex). */
  readonly reversed: Uint8Array;
}

/**
 * Condensed matrices: lower triangles packed by rows, in the local order of the layout's outer unknowns, odd edge
 * functions already turned to the edge's global direction.
 */
export interface CondensedMatrices {
  readonly start: Int32Array;
  readonly values: Float64Array;
}

/** Gives every triangle its layout from the orders wanted (1 … MAX_ORDER, one a triangle). */
export function makeElements(mesh: FieldMesh, order: Uint8Array): ElementSet {
  const triangleCount = mesh.triangles.length / 3;
  const vertexCount = mesh.xy.length / 2;
  const edges = edgeTable(mesh.triangles, vertexCount);
  const edgeOrder = new Uint8Array(edges.count);
  for (let h = 0; h < edges.edgeOf.length; h++) {
    const p = order[(h / 3) | 0];
    if (p > edgeOrder[edges.edgeOf[h]]) edgeOrder[edges.edgeOf[h]] = p;
  }
  const layouts: ElementLayout[] = new Array<ElementLayout>(triangleCount);
  const reversed = new Uint8Array(triangleCount);
  const { edgeOf } = edges;
  const { triangles } = mesh;
  for (let t = 0; t < triangleCount; t++) {
    const h = 3 * t;
    layouts[t] = elementLayout(edgeOrder[edgeOf[h]], edgeOrder[edgeOf[h + 1]], edgeOrder[edgeOf[h + 2]]);
    const a = triangles[h];
    const b = triangles[h + 1];
    const c = triangles[h + 2];
    reversed[t] = (b > c ? 1 : 0) | (c > a ? 2 : 0) | (a > b ? 4 : 0);
  }
  return { mesh, triangleCount, vertexCount, edges, edgeOrder, layouts, reversed };
}

/** Unknowns of one problem, interior functions included, before boundary conditions: the size that is reported. */
export function countFunctions(set: ElementSet): number {
  let count = set.vertexCount;
  for (let e = 0; e < set.edges.count; e++) count += set.edgeOrder[e] - 1;
  for (let t = 0; t < set.triangleCount; t++) count += set.layouts[t].interior;
  return count;
}

/** Room for the condensed matrices of all elements. */
export function allocateCondensed(set: ElementSet): CondensedMatrices {
  const start = new Int32Array(set.triangleCount + 1);
  for (let t = 0; t < set.triangleCount; t++) {
    const n = set.layouts[t].outer;
    start[t + 1] = start[t] + (n * (n + 1)) / 2;
  }
  return { start, values: new Float64Array(start[set.triangleCount]) };
}

/** Condensed matrices of ∫grad·grad, conductivity 1. */
export function condenseElements(set: ElementSet): CondensedMatrices {
  const result = allocateCondensed(set);
  const work = new Float64Array(LARGEST_ELEMENT * LARGEST_ELEMENT);
  const { xy, triangles } = set.mesh;
  for (let t = 0; t < set.triangleCount; t++) {
    const a = 2 * triangles[3 * t];
    const b = 2 * triangles[3 * t + 1];
    const c = 2 * triangles[3 * t + 2];
    const layout = set.layouts[t];
    fillStiffness(layout, xy[b] - xy[a], xy[b + 1] - xy[a + 1], xy[c] - xy[a], xy[c + 1] - xy[a + 1], work);
    condense(layout.size, layout.interior, work, result.values, result.start[t]);
    turnEdges(layout, set.reversed[t], result.values, result.start[t]);
  }
  return result;
}

/** Changes the sign of the odd functions of reversed edges in a packed matrix. */
export function turnEdges(layout: ElementLayout, reversed: number, values: Float64Array, at: number): void {
  if (reversed === 0) return;
  const { outer, edgeStart, edgeOrder } = layout;
  for (let i = 0; i < 3; i++) {
    if (((reversed >> i) & 1) === 0) continue;
    // Orders 3, 5, … stand at odd places of the edge's list, which begins with order 2.
    for (let m = 1; m < edgeOrder[i] - 1; m += 2) {
      const r = edgeStart[i] + m;
      const row = at + (r * (r + 1)) / 2;
      for (let j = 0; j < r; j++) values[row + j] = -values[row + j];
      for (let k = r + 1; k < outer; k++) {
        const p = at + (k * (k + 1)) / 2 + r;
        values[p] = -values[p];
      }
    }
  }
}
