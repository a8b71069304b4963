/**
 * Unknowns of the potential: V is prescribed on the terminals and free elsewhere (no flux is the natural condition).
 */

import { findBoundaryRuns, type BoundaryRuns } from "./boundary-runs";
import type { ElementSet } from "./elements";
import type { UnknownMap } from "./unknowns";

/**
 * The prescribed values are the terminals' potentials, terminal k as value k; `zero` names the terminal held at zero.
 */
export function potentialUnknowns(
  set: ElementSet,
  runs: BoundaryRuns = findBoundaryRuns(set.mesh),
  zero = -1,
): UnknownMap {
  const { vertexCount, edges } = set;
  const vertexEntity = new Int32Array(vertexCount);
  const entitySize = new Uint8Array(vertexCount + edges.count);
  for (let v = 0; v < vertexCount; v++) {
    const k = runs.terminalOf[v];
    if (k < 0) {
      vertexEntity[v] = v;
      entitySize[v] = 1;
    } else {
      vertexEntity[v] = k === zero ? -1 : -2 - k;
    }
  }
  for (let e = 0; e < edges.count; e++) entitySize[vertexCount + e] = set.edgeOrder[e] - 1;
  clearBoundaryEdges(set, runs, (terminal) => terminal >= 0, entitySize);
  return {
    entityCount: entitySize.length,
    entitySize,
    vertexEntity,
    firstEdge: vertexCount,
    jumps: null,
    axis: null,
  };
}

/** Takes away the unknowns of boundary edges whose run is selected: there the function is constant. */
export function clearBoundaryEdges(
  set: ElementSet,
  runs: BoundaryRuns,
  selected: (terminal: number) => boolean,
  entitySize: Uint8Array,
): void {
  const { triangles } = set.mesh;
  for (let h = 0; h < triangles.length; h++) {
    const t = h - (h % 3);
    const a = triangles[t + ((h + 1) % 3)];
    if (runs.next[a] !== triangles[t + ((h + 2) % 3)]) continue;
    if (selected(runs.terminalAfter[a])) entitySize[set.vertexCount + set.edges.edgeOf[h]] = 0;
  }
}
