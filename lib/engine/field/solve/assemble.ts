/**
 * From elements to fronts: which unknown each local function is, and the addition of element matrices.
 */

import type { CondensedMatrices, ElementSet } from "../assembly/elements";
import type { SampledElements } from "../assembly/medium";
import type { UnknownMap } from "../assembly/unknowns";
import { EDGE_MODES } from "../element/basis";
import type { FrontStructure } from "./symbolic";

/** One linear system on a mesh: structure, matrices and their weights (conductivity or resistivity of a triangle). */
export interface LinearSystem {
  readonly set: ElementSet;
  readonly map: UnknownMap;
  readonly structure: FrontStructure;
  readonly matrices: CondensedMatrices;
  readonly weight: Float64Array;
  /** Triangles whose weight varies and is part of their matrix (their entry of `weight` is one); null for none. */
  readonly sampled: SampledElements | null;
}

/** Most functions on the border of an element. */
export const MOST_OUTER = 3 + 3 * EDGE_MODES;

/**
 * Unknown of each outer local function of triangle t: its number, -1 for a zero, or -2-k for prescribed value k.
 * Jumps are not part of it.
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
    for (let m = 0; m < functions; m++) out[n++] = size === 0 ? -1 : first + m;
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
  const { map, matrices, weight } = system;
  const n = localUnknowns(system, t, local);
  if (map.jumps && map.jumps.start[3 * t + 3] > map.jumps.start[3 * t]) {
    addWithJumps(system, t, n, frontPlace, local, panel, panelAt, k, border, borderAt, m);
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

/** The terms of a triangle's outer values: local function, unknown and sign, jumps included. */
export interface LocalTerms {
  readonly count: number;
  readonly local: number[];
  readonly unknown: number[];
  readonly sign: number[];
}

export function localTerms(system: LinearSystem, t: number, n: number, unknowns: Int32Array): LocalTerms {
  const local: number[] = [];
  const unknown: number[] = [];
  const sign: number[] = [];
  for (let i = 0; i < n; i++) {
    if (unknowns[i] < 0) continue;
    local.push(i);
    unknown.push(unknowns[i]);
    sign.push(1);
  }
  const { jumps } = system.map;
  if (jumps) {
    for (let i = 0; i < 3; i++) {
      for (let p = jumps.start[3 * t + i]; p < jumps.start[3 * t + i + 1]; p++) {
        local.push(i);
        unknown.push(system.structure.entityFirst[jumps.entity[p]]);
        sign.push(jumps.sign[p]);
      }
    }
  }
  return { count: local.length, local, unknown, sign };
}

function addWithJumps(
  system: LinearSystem,
  t: number,
  n: number,
  frontPlace: Int32Array,
  unknowns: Int32Array,
  panel: Float64Array,
  panelAt: number,
  k: number,
  border: Float64Array,
  borderAt: number,
  m: number,
): void {
  const { matrices, weight } = system;
  const terms = localTerms(system, t, n, unknowns);
  const start = matrices.start[t];
  for (let p = 0; p < terms.count; p++) {
    const row = frontPlace[terms.unknown[p]];
    for (let q = 0; q < terms.count; q++) {
      const column = frontPlace[terms.unknown[q]];
      if (column > row) continue;
      const i = Math.max(terms.local[p], terms.local[q]);
      const j = Math.min(terms.local[p], terms.local[q]);
      const value =
        weight[t] * terms.sign[p] * terms.sign[q] * matrices.values[start + (i * (i + 1)) / 2 + j];
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
