/**
 * The boundary of a mesh as runs: maximal stretches of a ring that belong to one terminal or are insulated.
 */

import type { FieldMesh } from "../mesh/mesh";

export interface BoundaryRun {
  readonly ring: number;
  /** Index of the terminal, or -1 for insulation. */
  readonly terminal: number;
  /** Vertices in the direction of the boundary (conductor on the left). A closed run repeats its first at the end. */
  readonly vertices: Int32Array;
  /** The run is a whole ring. */
  readonly closed: boolean;
}

export interface BoundaryRuns {
  readonly runs: readonly BoundaryRun[];
  /** Insulated run on which each vertex lies, ends included, or -1. */
  readonly insulatedRun: Int32Array;
  /** Terminal on which each vertex lies, ends included, or -1. */
  readonly terminalOf: Int32Array;
  /** Number of rings. */
  readonly rings: number;
  /** Next vertex along the boundary, or -1 inside the mesh. */
  readonly next: Int32Array;
  /** Terminal of the boundary edge that leaves a vertex, -1 if it is insulated; meaningless inside the mesh. */
  readonly terminalAfter: Int32Array;
}

/** Finds the runs of every ring; two neighbouring sides of the same kind are one run. */
export function findBoundaryRuns(mesh: FieldMesh): BoundaryRuns {
  const { boundary, sides } = mesh;
  const vertexCount = mesh.xy.length / 2;
  const edgeCount = boundary.length / 3;
  const next = new Int32Array(vertexCount).fill(-1);
  const before = new Int32Array(vertexCount).fill(-1);
  const sideAfter = new Int32Array(vertexCount).fill(-1);
  for (let e = 0; e < edgeCount; e++) {
    const a = boundary[3 * e];
    const b = boundary[3 * e + 1];
    next[a] = b;
    before[b] = a;
    sideAfter[a] = boundary[3 * e + 2];
  }
  const insulatedRun = new Int32Array(vertexCount).fill(-1);
  const terminalOf = new Int32Array(vertexCount).fill(-1);
  const terminalAfter = new Int32Array(vertexCount).fill(-1);
  for (let v = 0; v < vertexCount; v++)
    if (sideAfter[v] >= 0) terminalAfter[v] = sides[sideAfter[v]].terminal;
  const visited = new Uint8Array(vertexCount);
  const runs: BoundaryRun[] = [];
  let rings = 0;
  for (let e = 0; e < edgeCount; e++) {
    let start = boundary[3 * e];
    if (visited[start]) continue;
    rings = Math.max(rings, sides[sideAfter[start]].ring + 1);
    // Move the start to where a run begins, if the ring has more than one.
    const first = start;
    while (terminalAfter[before[start]] === terminalAfter[start]) {
      start = next[start];
      if (start === first) break;
    }
    let v = start;
    do {
      const kind = terminalAfter[v];
      const list = [v];
      do {
        visited[v] = 1;
        v = next[v];
        list.push(v);
      } while (v !== start && terminalAfter[v] === kind);
      for (const w of list) {
        if (kind >= 0) terminalOf[w] = kind;
        else insulatedRun[w] = runs.length;
      }
      runs.push({
        ring: sides[sideAfter[list[0]]].ring,
        terminal: kind,
        vertices: Int32Array.from(list),
        closed: list[0] === v,
      });
    } while (v !== start);
  }
  return { runs, insulatedRun, terminalOf, rings, next, terminalAfter };
}
