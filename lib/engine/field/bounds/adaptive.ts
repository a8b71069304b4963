/**
 * The loop: solve, bracket, refine where the gap is, until the bracket is as narrow as asked or a cap is met.
 */

import { countFunctions } from "../assembly/elements";
import type { FieldMesh } from "../mesh/mesh";
import { solvePair, type SolvedPair } from "../solve/pair";
import { currentOf, lowerBound, upperBound } from "./bracket";
import { fieldEnergies, type FieldEnergies } from "./energies";
import { singularVertices } from "./exponents";
import { applyPlan } from "./grade";
import { planRefinement } from "./plan";

export interface AdaptiveLimits {
  /** Most unknowns of one problem, interior functions included. */
  readonly unknowns: number;
  readonly refinements: number;
  /** Asked before every step; true ends the work with the bracket reached. */
  readonly shouldStop: () => boolean;
}

export interface AdaptiveProgress {
  readonly lower: number;
  readonly upper: number;
  readonly unknowns: number;
  readonly triangles: number;
  readonly refinements: number;
}

export interface AdaptiveInput {
  readonly mesh: FieldMesh;
  /** Conductivity of each medium: index 0 the background, k the k-th region. */
  readonly sigma: readonly number[];
  readonly terminalCount: number;
  /** Relative width of the bracket that is wanted. */
  readonly accuracy: number;
  readonly startOrder: number;
  readonly highestOrder: number;
  readonly limits: AdaptiveLimits;
  readonly onProgress?: (progress: AdaptiveProgress) => void;
}

export interface AdaptiveResult extends AdaptiveProgress {
  readonly status: "done" | "limited";
  readonly pair: SolvedPair;
  readonly energies: FieldEnergies;
}

export function solveAdaptively(input: AdaptiveInput): AdaptiveResult {
  let mesh = input.mesh;
  let order: Uint8Array = new Uint8Array(mesh.triangles.length / 3).fill(input.startOrder);
  let lower = 0;
  let upper = Infinity;
  for (let refinements = 0; ; refinements++) {
    const sigma = Float64Array.from(mesh.region, (k) => input.sigma[k]);
    const pair = solvePair({ mesh, order, sigma, terminalCount: input.terminalCount });
    const energies = fieldEnergies(
      pair.potentialSystem,
      pair.potentials,
      pair.streamSystem,
      pair.streams,
      pair.potentials.map(() => 1),
      null,
    );
    lower = Math.max(lower, lowerBound(energies.potential[0]));
    upper = Math.min(
      upper,
      upperBound(energies.stream[0], currentOf(pair.streamSystem, pair.streams[0], pair.currents[0])),
    );
    const unknowns = countFunctions(pair.set);
    const progress = { lower, upper, unknowns, triangles: order.length, refinements };
    input.onProgress?.(progress);
    const done = upper - lower <= input.accuracy * lower;
    const result = { ...progress, pair, energies };
    if (done) return { ...result, status: "done" };
    if (refinements >= input.limits.refinements || input.limits.shouldStop()) return { ...result, status: "limited" };
    const plan = planRefinement({
      mesh,
      order,
      gap: energies.gap,
      decay: energies.decay,
      singular: singularVertices(mesh, pair.runs, sigma),
      target: 0.6 * input.accuracy * energies.potential[0].value,
      highestOrder: input.highestOrder,
    });
    if (plan.empty) return { ...result, status: "limited" };
    const next = applyPlan(mesh, plan);
    mesh = next.mesh;
    order = next.order;
  }
}
