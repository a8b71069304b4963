/**
 * Unknowns of the stream function ψ, the conjugate of the potential: J = rot ψ = (∂ψ/∂y, -∂ψ/∂x).
 *
 * ψ is constant on every insulated run of the boundary (one unknown a run, one of them zero) and free on the terminals.
 * The current out of a terminal is the growth of ψ along its pieces, in the direction of the boundary. If current can
 * leave through more than one ring, ψ jumps across cuts by the net current of a ring (see `cuts`).
 *
 * All these currents are free unknowns. For potentials φ_t on the terminals the discrete problem is to minimise
 * ½∫ρ|rot ψ|² - Σ φ_t I_t(ψ), a symmetric positive definite system for any number of terminals, pieces and rings.
 */

import type { AxisEdges } from "./axis";
import type { BoundaryRuns } from "./boundary-runs";
import { cutOffsets, cutPaths, vertexFans, type CutOffsets } from "./cuts";
import type { ElementSet } from "./elements";
import { clearBoundaryEdges } from "./potential";
import type { UnknownMap, VertexJumps } from "./unknowns";

/** The current out of a terminal as a linear form of the shared unknowns. */
export interface CurrentForm {
  readonly entity: Int32Array;
  readonly coefficient: Int32Array;
}

export interface StreamUnknowns {
  readonly map: UnknownMap;
  /** One form a terminal; their sum is zero. */
  readonly currents: readonly CurrentForm[];
}

/** `axis` is given for a body of revolution that reaches its axis. */
export function streamUnknowns(
  set: ElementSet,
  runs: BoundaryRuns,
  terminalCount: number,
  axis: AxisEdges | null = null,
): StreamUnknowns {
  const { vertexCount, edges } = set;
  const firstShared = vertexCount + edges.count;
  // Shared entities: one a run (used by the insulated ones), then one a ring (used by rings with a cut).
  const entityCount = firstShared + runs.runs.length + runs.rings;
  const entitySize = new Uint8Array(entityCount);
  const vertexEntity = new Int32Array(vertexCount);
  for (let v = 0; v < vertexCount; v++) {
    const r = runs.insulatedRun[v];
    vertexEntity[v] = r < 0 ? v : firstShared + r;
    if (r < 0) entitySize[v] = 1;
  }
  for (let e = 0; e < edges.count; e++) entitySize[vertexCount + e] = set.edgeOrder[e] - 1;
  clearBoundaryEdges(set, runs, (terminal) => terminal < 0, entitySize);
  for (let e = 0; axis && e < edges.count; e++) {
    if (axis.end[e] > 0 && entitySize[vertexCount + e] > 0) entitySize[vertexCount + e]--;
  }

  const active = activeRings(runs);
  const root = chooseRoot(runs, active);
  runs.runs.forEach((run, r) => {
    if (run.terminal < 0) entitySize[firstShared + r] = 1;
  });
  // ψ is fixed up to a constant: one insulated run of the root ring is zero, or else any vertex.
  const ground = runs.runs.findIndex((run) => run.ring === root && run.terminal < 0);
  if (ground >= 0) {
    entitySize[firstShared + ground] = 0;
    for (const v of runs.runs[ground].vertices) vertexEntity[v] = -1;
  } else {
    const v = vertexEntity.findIndex((entity, w) => entity === w);
    vertexEntity[v] = -1;
    entitySize[v] = 0;
  }
  const firstRing = firstShared + runs.runs.length;
  const cutRings = active.filter((ring) => ring !== root);
  const offsets = new Map<number, CutOffsets>();
  if (cutRings.length > 0) {
    const fans = vertexFans(set.mesh, runs.next);
    const paths = cutPaths(set.mesh, runs, fans, root, cutRings);
    cutRings.forEach((ring, k) => {
      entitySize[firstRing + ring] = 1;
      offsets.set(firstRing + ring, cutOffsets(set.mesh, runs, fans, paths[k]));
    });
  }
  const map: UnknownMap = {
    entityCount,
    entitySize,
    vertexEntity,
    firstEdge: vertexCount,
    jumps: cutRings.length > 0 ? collectJumps(set.triangleCount, offsets) : null,
    axis,
  };
  return { map, currents: currentForms(set, runs, map, offsets, terminalCount) };
}

/** Rings through which current can pass. */
function activeRings(runs: BoundaryRuns): number[] {
  const rings = new Set<number>();
  for (const run of runs.runs) if (run.terminal >= 0) rings.add(run.ring);
  return [...rings].sort((a, b) => a - b);
}

/** The ring that all cuts lead to: one that has an insulated run if there is any. */
function chooseRoot(runs: BoundaryRuns, active: readonly number[]): number {
  const found = active.find((ring) => runs.runs.some((run) => run.ring === ring && run.terminal < 0));
  return found ?? active[0];
}

function collectJumps(triangleCount: number, offsets: Map<number, CutOffsets>): VertexJumps {
  const start = new Int32Array(3 * triangleCount + 1);
  for (const corners of offsets.values()) for (const h of corners.keys()) start[h + 1]++;
  for (let h = 0; h < 3 * triangleCount; h++) start[h + 1] += start[h];
  const entity = new Int32Array(start[3 * triangleCount]);
  const sign = new Int8Array(entity.length);
  const filled = start.slice();
  for (const [ring, corners] of offsets) {
    for (const [h, value] of corners) {
      entity[filled[h]] = ring;
      sign[filled[h]++] = value;
    }
  }
  return { start, entity, sign };
}

/** Growth of ψ along the pieces of each terminal: the values at free vertices cancel. */
function currentForms(
  set: ElementSet,
  runs: BoundaryRuns,
  map: UnknownMap,
  offsets: Map<number, CutOffsets>,
  terminalCount: number,
): CurrentForm[] {
  const sums = Array.from({ length: terminalCount }, () => new Map<number, number>());
  const add = (terminal: number, entity: number, amount: number): void => {
    if (entity < 0 || map.entitySize[entity] === 0 || amount === 0) return;
    sums[terminal].set(entity, (sums[terminal].get(entity) ?? 0) + amount);
  };
  for (const run of runs.runs) {
    if (run.terminal < 0 || run.closed) continue;
    add(run.terminal, map.vertexEntity[run.vertices[run.vertices.length - 1]], 1);
    add(run.terminal, map.vertexEntity[run.vertices[0]], -1);
  }
  if (offsets.size > 0) {
    const { triangles } = set.mesh;
    for (let h = 0; h < triangles.length; h++) {
      const base = h - (h % 3);
      const from = base + ((h + 1) % 3);
      const to = base + ((h + 2) % 3);
      const a = triangles[from];
      if (runs.next[a] !== triangles[to]) continue;
      const terminal = runs.terminalAfter[a];
      if (terminal < 0) continue;
      for (const [ring, corners] of offsets) {
        add(terminal, ring, (corners.get(to) ?? 0) - (corners.get(from) ?? 0));
      }
    }
  }
  return sums.map((sum) => {
    const entries = [...sum].filter(([, amount]) => amount !== 0);
    return {
      entity: Int32Array.from(entries, ([entity]) => entity),
      coefficient: Int32Array.from(entries, ([, amount]) => amount),
    };
  });
}
