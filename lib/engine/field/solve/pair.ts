/**
 * Both problems on one mesh: the potential and its conjugate, solved over one dissection.
 */

import { findBoundaryRuns, type BoundaryRuns } from "../assembly/boundary-runs";
import { condenseElements, makeElements, type CondensedMatrices, type ElementSet } from "../assembly/elements";
import { potentialUnknowns } from "../assembly/potential";
import { streamUnknowns, type CurrentForm } from "../assembly/stream";
import { listTriangleEntities, type UnknownMap } from "../assembly/unknowns";
import type { FieldMesh } from "../mesh/mesh";
import { loadPrescribed, type LinearSystem } from "./assemble";
import { dissect, type DissectionTree } from "./dissection";
import { factorise, substitute } from "./factor";
import { analyse } from "./symbolic";
import type { DiscreteField } from "../bounds/element-field";

/** A discrete solution of both problems; field a belongs to terminal a at one volt and all others at zero. */
export interface SolvedPair {
  readonly set: ElementSet;
  readonly runs: BoundaryRuns;
  readonly potentialSystem: LinearSystem;
  readonly potentials: readonly DiscreteField[];
  readonly streamSystem: LinearSystem;
  readonly streams: readonly DiscreteField[];
  readonly currents: readonly CurrentForm[];
  /** Multiplications and additions of both factorisations. */
  readonly operations: number;
}

export interface PairInput {
  readonly mesh: FieldMesh;
  /** Order wanted in each triangle. */
  readonly order: Uint8Array;
  /** Conductivity of each triangle. */
  readonly sigma: Float64Array;
  readonly terminalCount: number;
}

/** Solves for all terminals but the last, whose fields follow from the sum. */
export function solvePair(input: PairInput): SolvedPair {
  const set = makeElements(input.mesh, input.order);
  const runs = findBoundaryRuns(input.mesh);
  const matrices = condenseElements(set);
  const tree = dissect(set);
  const fields = input.terminalCount - 1;

  const potentialSystem = makeSystem(set, potentialUnknowns(set, runs, fields), tree, matrices, input.sigma);
  const potentials = solvePotentials(potentialSystem, fields);

  const { map, currents } = streamUnknowns(set, runs, input.terminalCount);
  const rho = input.sigma.map((sigma) => 1 / sigma);
  const streamSystem = makeSystem(set, map, tree, matrices, rho);
  const streams = solveStreams(streamSystem, currents.slice(0, fields));
  const operations = potentialSystem.structure.operations + streamSystem.structure.operations;
  return { set, runs, potentialSystem, potentials, streamSystem, streams, currents, operations };
}

function makeSystem(
  set: ElementSet,
  map: UnknownMap,
  tree: DissectionTree,
  matrices: CondensedMatrices,
  weight: Float64Array,
): LinearSystem {
  const entities = listTriangleEntities(map, set.mesh.triangles, set.edges.edgeOf);
  return { set, map, structure: analyse(tree, entities, map.entitySize), matrices, weight };
}

function solvePotentials(system: LinearSystem, fields: number): DiscreteField[] {
  const factor = factorise(system);
  return Array.from({ length: fields }, (_, a) => {
    const x = new Float64Array(system.structure.unknowns);
    loadPrescribed(system, a, x);
    substitute(factor, x);
    return { x, prescribed: Array.from({ length: fields }, (_, b) => (a === b ? 1 : 0)) };
  });
}

function solveStreams(system: LinearSystem, forms: readonly CurrentForm[]): DiscreteField[] {
  const factor = factorise(system);
  return forms.map((form) => {
    const x = new Float64Array(system.structure.unknowns);
    for (let k = 0; k < form.entity.length; k++) {
      x[system.structure.entityFirst[form.entity[k]]] += form.coefficient[k];
    }
    substitute(factor, x);
    return { x, prescribed: [] };
  });
}
