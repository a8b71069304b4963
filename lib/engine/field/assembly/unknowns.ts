/**
 * How a problem's unknowns hang on the mesh.
 *
 * An entity is a block of unknowns that are eliminated together: a vertex (one), an edge (its functions) or a value
 * that many vertices share, such as the constant of the stream function on an insulated run. Entities are numbered:
 * vertices, then edges, then shared values.
 */

import type { AxisEdges } from "./axis";

export interface UnknownMap {
  readonly entityCount: number;
  /** Unknowns of each entity; 0 where it is prescribed or absent. */
  readonly entitySize: Uint8Array;
  /**
   * What the value at each vertex is: an entity (≥ 0), zero (-1), or the k-th prescribed value (-2-k).
   */
  readonly vertexEntity: Int32Array;
  /** Entity number of edge 0; that of edge e is firstEdge + e. */
  readonly firstEdge: number;
  /** Values added to a vertex within single triangles (jumps across cuts), or null where there are none. */
  readonly jumps: VertexJumps | null;
  /** Edges whose function of order 2 depends on the others (stream function of a body of revolution), or null. */
  readonly axis: AxisEdges | null;
}

/**
 * Within triangle t its local vertex i has the additional value Σ sign·entity over the entries of slot 3t+i,
 * `start[3t+i]` … `start[3t+i+1]`.
 */
export interface VertexJumps {
  readonly start: Int32Array;
  readonly entity: Int32Array;
  readonly sign: Int8Array;
}

/** Entities of each triangle as compressed rows; those without unknowns are left out, repetitions too. */
export interface TriangleEntities {
  readonly start: Int32Array;
  readonly list: Int32Array;
}

export function listTriangleEntities(
  map: UnknownMap,
  triangles: Int32Array,
  edgeOf: Int32Array,
): TriangleEntities {
  const count = triangles.length / 3;
  const start = new Int32Array(count + 1);
  const extra = map.jumps ? map.jumps.entity.length : 0;
  const list = new Int32Array(6 * count + extra);
  let n = 0;
  for (let t = 0; t < count; t++) {
    const from = n;
    for (let i = 0; i < 3; i++) {
      const v = map.vertexEntity[triangles[3 * t + i]];
      if (v >= 0 && map.entitySize[v] > 0 && !holds(list, from, n, v)) list[n++] = v;
    }
    for (let i = 0; i < 3; i++) {
      const e = map.firstEdge + edgeOf[3 * t + i];
      if (map.entitySize[e] > 0) list[n++] = e;
    }
    if (map.jumps) {
      const { start: at, entity } = map.jumps;
      for (let k = at[3 * t]; k < at[3 * t + 3]; k++) {
        if (!holds(list, from, n, entity[k])) list[n++] = entity[k];
      }
    }
    start[t + 1] = n;
  }
  return { start, list: list.subarray(0, n) };
}

function holds(list: Int32Array, from: number, to: number, entity: number): boolean {
  for (let k = from; k < to; k++) if (list[k] === entity) return true;
  return false;
}
