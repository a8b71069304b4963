/**
 * From elements to fronts: which unknown each local function is, and the addition of element matrices.
 */

import { EDGE_MODES } from "../element/basis";
import type { LinearSystem } from "./system";
import { addTerms, hasTerms } from "./terms";

/** Most functions on the border of an element. */
export const MOST_OUTER = 3 + 3 * EDGE_MODES;

/**
 * Unknown of each outer local function of triangle t: its number, -1 for a zero, or -2-k for prescribed value k.
 * Jumps and functions that depend on others are not part of it (see `terms`).
 */
export function localUnknowns(system: LinearSystem, t: number, out: Int32Array): number {
  const { set, map, structure } = system;
  const { entityFirst } = structure;
  const { triangles } = set.mesh;
  const { edgeOf } = set.edges;
  let n = 0;
  for (let i = 0; i < 3; i++) {
    const e = map.vertexEntity[triangles[3 * t + i]];
    out[n++] = e < 0 ? e : entityFirst[e];
  }
  const { edgeOrder } = set.layouts[t];
  for (let i = 0; i < 3; i++) {
    const e = map.firstEdge + edgeOf[3 * t + i];
    const size = map.entitySize[e];
    const first = entityFirst[e];
    const functions = edgeOrder[i] - 1;
    // On an edge that leaves the axis the first function depends on the others.
    const skipped = map.axis && map.axis.end[edgeOf[3 * t + i]] > 0 ? 1 : 0;
    for (let m = 0; m < functions; m++) out[n++] = size === 0 || m < skipped ? -1 : first + m - skipped;
  }
  return n;
}

/** Adds the matrix of triangle t to a front: its panel (k columns) and its border matrix (stride m). */
export function addElement(
  system: LinearSystem,
  t: number,
  frontPlace: Int32Array,
  local: Int32Array,
  panel: Float64Array,
  panelAt: number,
  k: number,
  border: Float64Array,
  borderAt: number,
  m: number,
): void {
  const { matrices, weight } = system;
  const n = localUnknowns(system, t, local);
  if (hasTerms(system, t)) {
    addTerms(system, t, n, frontPlace, local, panel, panelAt, k, border, borderAt, m);
    return;
  }
  for (let i = 0; i < n; i++) local[i] = local[i] < 0 ? -1 : frontPlace[local[i]];
  const w = weight[t];
  const { values } = matrices;
  let at = matrices.start[t];
  for (let i = 0; i < n; i++) {
    const r = local[i];
    if (r < 0) {
      at += i + 1;
      continue;
    }
    for (let j = 0; j <= i; j++, at++) {
      const c = local[j];
      if (c < 0) continue;
      // Two vertices on one shared value meet on its diagonal, once for each of the two places in the full matrix.
      const value = c === r && i !== j ? 2 * w * values[at] : w * values[at];
      const row = r > c ? r : c;
      const column = r > c ? c : r;
      if (column < k) panel[panelAt + row * k + column] += value;
      else border[borderAt + (row - k) * m + (column - k)] += value;
    }
  }
}

/**
 * Right-hand side from prescribed values: -K·g for the value number `which` set to one. Jumps never meet prescribed
 * values other than zero, since these belong to the potential, which has no cuts.
 */
export function loadPrescribed(system: LinearSystem, which: number, rhs: Float64Array): void {
  const { set, map, matrices, weight } = system;
  const { triangles } = set.mesh;
  const local = new Int32Array(MOST_OUTER);
  const code = -2 - which;
  for (let t = 0; t < set.triangleCount; t++) {
    const v0 = map.vertexEntity[triangles[3 * t]];
    const v1 = map.vertexEntity[triangles[3 * t + 1]];
    const v2 = map.vertexEntity[triangles[3 * t + 2]];
    if (v0 !== code && v1 !== code && v2 !== code) continue;
    const n = localUnknowns(system, t, local);
    const start = matrices.start[t];
    for (let i = 0; i < n; i++) {
      if (local[i] < 0) continue;
      let s = 0;
      for (let j = 0; j < 3; j++) {
        if (local[j] !== code) continue;
        s += matrices.values[start + (i >= j ? (i * (i + 1)) / 2 + j : (j * (j + 1)) / 2 + i)];
      }
      rhs[local[i]] -= weight[t] * s;
    }
  }
}
