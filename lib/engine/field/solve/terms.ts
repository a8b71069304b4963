/**
 * Triangles whose local values are not simply unknowns: at cuts of the stream function, where jumps are added, and at
 * the axis of a body of revolution, where some functions depend on others. There each local value is a sum of terms
 * coefficient · unknown.
 */

import { dependentWeights } from "../assembly/axis";
import type { LinearSystem } from "./system";

export interface LocalTerms {
  readonly local: number[];
  readonly unknown: number[];
  readonly coefficient: number[];
}

export function hasTerms(system: LinearSystem, t: number): boolean {
  const { jumps, axis } = system.map;
  if (jumps && jumps.start[3 * t + 3] > jumps.start[3 * t]) return true;
  if (!axis) return false;
  const { triangles } = system.set.mesh;
  return (
    (axis.vertex[triangles[3 * t]] |
      axis.vertex[triangles[3 * t + 1]] |
      axis.vertex[triangles[3 * t + 2]]) ===
    1
  );
}

/** An edge of a triangle whose function of order 2 depends on the others. */
export interface DependentEdge {
  /** Local place of its function of order 2; those of higher order follow. */
  readonly place: number;
  /** Local vertices with the smaller and the larger number. */
  readonly low: number;
  readonly high: number;
  readonly weights: { readonly low: number; readonly high: number; readonly modes: readonly number[] };
}

export function dependentEdges(system: LinearSystem, t: number): DependentEdge[] {
  const { set, map } = system;
  const { axis } = map;
  if (!axis) return [];
  const { triangles } = set.mesh;
  const { edgeOrder, edgeStart } = set.layouts[t];
  const result: DependentEdge[] = [];
  for (let i = 0; i < 3; i++) {
    const e = set.edges.edgeOf[3 * t + i];
    const order = edgeOrder[i];
    // An edge without unknowns of order 3 and above is insulated: constant, unless its order is 2.
    if (axis.end[e] === 0 || (map.entitySize[map.firstEdge + e] === 0 && order > 2)) continue;
    const a = (i + 1) % 3;
    const b = (i + 2) % 3;
    const forward = triangles[3 * t + a] < triangles[3 * t + b];
    result.push({
      place: edgeStart[i],
      low: forward ? a : b,
      high: forward ? b : a,
      weights: dependentWeights(axis.end[e], order),
    });
  }
  return result;
}

/** All terms of a triangle's outer values; `unknowns` as filled by `localUnknowns`. Prescribed values are left out. */
export function localTerms(system: LinearSystem, t: number, n: number, unknowns: Int32Array): LocalTerms {
  const terms: LocalTerms = { local: [], unknown: [], coefficient: [] };
  const add = (local: number, unknown: number, coefficient: number): void => {
    terms.local.push(local);
    terms.unknown.push(unknown);
    terms.coefficient.push(coefficient);
  };
  for (let i = 0; i < n; i++) if (unknowns[i] >= 0) add(i, unknowns[i], 1);
  const { jumps } = system.map;
  const { entityFirst } = system.structure;
  const addVertex = (local: number, vertex: number, coefficient: number): void => {
    if (unknowns[vertex] >= 0 && local !== vertex) add(local, unknowns[vertex], coefficient);
    for (let p = jumps?.start[3 * t + vertex] ?? 0; jumps && p < jumps.start[3 * t + vertex + 1]; p++) {
      add(local, entityFirst[jumps.entity[p]], coefficient * jumps.sign[p]);
    }
  };
  for (let i = 0; i < 3; i++) addVertex(i, i, 1);
  for (const { place, low, high, weights } of dependentEdges(system, t)) {
    addVertex(place, low, weights.low);
    addVertex(place, high, weights.high);
    weights.modes.forEach((w, m) => {
      if (unknowns[place + 1 + m] >= 0) add(place, unknowns[place + 1 + m], w);
    });
  }
  return terms;
}

/** Adds the matrix of such a triangle to a front. */
export function addTerms(
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
  const { local, unknown, coefficient } = localTerms(system, t, n, unknowns);
  const start = matrices.start[t];
  for (let p = 0; p < local.length; p++) {
    const row = frontPlace[unknown[p]];
    for (let q = 0; q < local.length; q++) {
      const column = frontPlace[unknown[q]];
      if (column > row) continue;
      const i = Math.max(local[p], local[q]);
      const j = Math.min(local[p], local[q]);
      const value =
        weight[t] * coefficient[p] * coefficient[q] * matrices.values[start + (i * (i + 1)) / 2 + j];
      if (column < k) panel[panelAt + row * k + column] += value;
      else border[borderAt + (row - k) * m + (column - k)] += value;
    }
  }
}
