/**
 * Both problems on one mesh: the potential and its conjugate, solved over one dissection.
 */

import { findAxisEdges } from "../assembly/axis";
import { findBoundaryRuns, type BoundaryRuns } from "../assembly/boundary-runs";
import {
  condenseElements,
  makeElements,
  type CondensedMatrices,
  type ElementSet,
} from "../assembly/elements";
import { sampleElements, type MediumList, type SampledElements } from "../assembly/medium";
import { potentialUnknowns } from "../assembly/potential";
import { streamUnknowns, type CurrentForm } from "../assembly/stream";
import { listTriangleEntities, type UnknownMap } from "../assembly/unknowns";
import type { FieldMesh } from "../mesh/mesh";
import { loadPrescribed } from "./assemble";
import type { LinearSystem } from "./system";
import { dissect, type DissectionTree } from "./dissection";
import { factorise, substitute } from "./factor";
import { analyse } from "./symbolic";

/** One solution of a system. */
export interface DiscreteField {
  /** Unknowns in elimination order. */
  readonly x: Float64Array;
  /** Prescribed values by number. */
  readonly prescribed: readonly number[];
}

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
  readonly medium: MediumList;
  readonly terminalCount: number;
  /** A body of revolution about x = 0: the conductivity contains the factor 2πx. */
  readonly revolution: boolean;
  /** Asked now and then during the factorisations; true raises `InterruptedError`. */
  readonly shouldStop: () => boolean;
}

/** Solves for all terminals but the last, whose fields follow from the sum. */
export function solvePair(input: PairInput): SolvedPair {
  const { mesh, medium, terminalCount, revolution, shouldStop } = input;
  const set = makeElements(mesh, input.order);
  const runs = findBoundaryRuns(mesh);
  const shared = condenseElements(set);
  const tree = dissect(set);
  const fields = terminalCount - 1;
  const sigma = Float64Array.from(mesh.region, (k) => constantOf(medium[k]) ?? 1);
  const rho = sigma.map((value) => 1 / value);
  const axis = revolution ? findAxisEdges(set) : null;
  const sampled = medium.some((m) => typeof m === "function")
    ? sampleElements(
        set,
        shared,
        Array.from(mesh.region, (k) => functionOf(medium[k])),
        revolution,
        axis,
        shouldStop,
      )
    : null;

  const potentialMap = potentialUnknowns(set, runs, fields);
  const potentialSystem = makeSystem(
    set,
    potentialMap,
    tree,
    sampled?.potential.matrices ?? shared,
    sigma,
    sampled?.potential.sampled ?? null,
  );
  const potentials = solvePotentials(potentialSystem, fields, shouldStop);

  const { map, currents } = streamUnknowns(set, runs, terminalCount, axis);
  const streamSystem = makeSystem(
    set,
    map,
    tree,
    sampled?.stream.matrices ?? shared,
    rho,
    sampled?.stream.sampled ?? null,
  );
  const streams = solveStreams(streamSystem, currents.slice(0, fields), shouldStop);
  const operations = potentialSystem.structure.operations + streamSystem.structure.operations;
  return { set, runs, potentialSystem, potentials, streamSystem, streams, currents, operations };
}

function constantOf(medium: MediumList[number]): number | null {
  return typeof medium === "number" ? medium : null;
}

function functionOf(medium: MediumList[number]): Exclude<MediumList[number], number> | null {
  return typeof medium === "number" ? null : medium;
}

function makeSystem(
  set: ElementSet,
  map: UnknownMap,
  tree: DissectionTree,
  matrices: CondensedMatrices,
  weight: Float64Array,
  sampled: SampledElements | null,
): LinearSystem {
  const entities = listTriangleEntities(map, set.mesh.triangles, set.edges.edgeOf);
  return { set, map, structure: analyse(tree, entities, map.entitySize), matrices, weight, sampled };
}

function solvePotentials(system: LinearSystem, fields: number, shouldStop: () => boolean): DiscreteField[] {
  const factor = factorise(system, shouldStop);
  return Array.from({ length: fields }, (_, a) => {
    const x = new Float64Array(system.structure.unknowns);
    loadPrescribed(system, a, x);
    substitute(factor, x);
    return { x, prescribed: Array.from({ length: fields }, (_, b) => (a === b ? 1 : 0)) };
  });
}

function solveStreams(
  system: LinearSystem,
  forms: readonly CurrentForm[],
  shouldStop: () => boolean,
): DiscreteField[] {
  const factor = factorise(system, shouldStop);
  return forms.map((form) => {
    const x = new Float64Array(system.structure.unknowns);
    for (let k = 0; k < form.entity.length; k++) {
      x[system.structure.entityFirst[form.entity[k]]] += form.coefficient[k];
    }
    substitute(factor, x);
    return { x, prescribed: [] };
  });
}
