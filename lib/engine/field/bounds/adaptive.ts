/**
 * The loop: solve, bracket, refine where the gap is, until the bracket is as narrow as asked or a cap is met.
 */

import { countFunctions, makeElements } from "../assembly/elements";
import type { MediumList } from "../assembly/medium";
import type { FieldMesh } from "../mesh/mesh";
import { SingularMatrixError } from "../solve/factor";
import { InterruptedError } from "../solve/interruption";
import { solvePair, type SolvedPair } from "../solve/pair";
import type { BoundaryReference } from "./displacement";
import { fieldEnergies, type FieldEnergies } from "./energies";
import { singularVertices, type SingularVertex } from "./exponents";
import { Goal, widthOf, type ReachedBounds } from "./goal";
import { applyPlan, type OrderedMesh } from "./grade";
import { planRefinement } from "./plan";

export interface AdaptiveLimits {
  /** Most unknowns of one problem, interior functions included. */
  readonly unknowns: number;
  readonly refinements: number;
  /** Asked before every step and within long ones; true ends the work with the bracket reached. */
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
  readonly medium: MediumList;
  readonly terminalCount: number;
  /** A body of revolution about x = 0; the medium then contains the factor 2πx. */
  readonly revolution?: boolean;
  /** Relative width of the bracket that is wanted. */
  readonly accuracy: number;
  readonly limits: AdaptiveLimits;
  /** Where the boundary of the outline is, to take its rounding into account. */
  readonly reference?: BoundaryReference;
  readonly startOrder?: number;
  readonly highestOrder?: number;
  readonly onProgress?: (progress: AdaptiveProgress) => void;
}

export interface AdaptiveResult {
  readonly status: "done" | "limited";
  /** Why the work ended before the accuracy was met. */
  readonly limit: "none" | "unknowns" | "refinements" | "stopped" | "rounding";
  readonly bounds: ReachedBounds;
  readonly unknowns: number;
  readonly triangles: number;
  readonly refinements: number;
  readonly pair: SolvedPair;
  readonly energies: FieldEnergies;
  readonly singular: readonly SingularVertex[];
}

/** Order of all elements in the first solution. */
const START_ORDER = 3;
const HIGHEST_ORDER = 8;

/** The refinement aims at this part of the accuracy, since its predictions scatter. */
const AIM = 0.6;

/** While the bracket is wider than this, local gaps say little: then they are not brought down further than so in a step. */
const VAGUE = 0.3;
const LEAST_FACTOR = 0.05;

/** Steps without a gain of a tenth after which rounding is taken to be in the way; more while the bracket is vague. */
const IDLE_STEPS = 3;
const VAGUE_IDLE_STEPS = 12;

/**
 * Throws `InterruptedError` or `SingularMatrixError` only if there is no bracket yet. A first mesh that is above the
 * cap even at the lowest order is solved all the same.
 */
export function solveAdaptively(input: AdaptiveInput): AdaptiveResult {
  const { limits, medium, terminalCount } = input;
  let current = firstOrders(input);
  let singular: readonly SingularVertex[] = [];
  let last: AdaptiveResult | null = null;
  const goal = new Goal();
  let narrowest = Infinity;
  let idle = 0;
  for (let refinements = 0; ; refinements++) {
    let pair: SolvedPair;
    let energies: FieldEnergies;
    try {
      const { revolution = false } = input;
      pair = solvePair({ ...current, medium, terminalCount, revolution, shouldStop: limits.shouldStop });
      const displacement = input.reference ? input.reference.displacements(current.mesh) : null;
      const weight = last ? fieldWeights(last.energies, terminalCount - 1) : pair.potentials.map(() => 1);
      energies = fieldEnergies(pair, weight, displacement, limits.shouldStop);
    } catch (error) {
      if (!last) throw error;
      if (error instanceof InterruptedError) return { ...last, limit: "stopped" };
      if (error instanceof SingularMatrixError) return { ...last, limit: "rounding" };
      throw error;
    }
    if (refinements === 0) {
      singular = singularVertices(current.mesh, pair.runs, representativeSigma(current.mesh, medium));
    }
    // Where a higher order brought hardly anything, the field is not smooth: the next step bisects.
    for (let t = 0; t < energies.gap.length; t++) {
      if (energies.gap[t] > current.disappointment[t]) energies.decay[t] = 1;
    }
    goal.update(pair, energies);
    const { resistance } = goal.reached;
    const triangles = current.order.length;
    const progress = { ...resistance, unknowns: countFunctions(pair.set), triangles, refinements };
    input.onProgress?.(progress);
    const result = { ...progress, bounds: goal.reached, pair, energies, singular };
    const width = widthOf(goal.reached);
    if (width <= input.accuracy) return { ...result, status: "done", limit: "none" };
    idle = width < 0.9 * narrowest ? 0 : idle + 1;
    narrowest = Math.min(narrowest, width);
    last = { ...result, status: "limited", limit: "rounding" };
    if (idle >= (width > VAGUE ? VAGUE_IDLE_STEPS : IDLE_STEPS)) return last;
    if (refinements >= limits.refinements) return { ...last, limit: "refinements" };
    if (limits.shouldStop()) return { ...last, limit: "stopped" };
    const factor = Math.max((AIM * input.accuracy) / width, width > VAGUE ? LEAST_FACTOR : 0);
    const next = refineWithin(input, current, energies, singular, factor);
    if (next === null) return { ...last, limit: "unknowns" };
    if (next === current) return last;
    current = next;
  }
}

/** The first order, or a lower one where the first mesh would otherwise be above the cap. */
function firstOrders({ mesh, startOrder = START_ORDER, revolution, limits }: AdaptiveInput): OrderedMesh {
  const count = mesh.triangles.length / 3;
  const least = revolution ? 2 : 1;
  const disappointment = new Float64Array(count).fill(Infinity);
  for (let p = startOrder; ; p--) {
    const order = new Uint8Array(count).fill(p);
    if (p <= least || countFunctions(makeElements(mesh, order)) <= limits.unknowns) {
      return { mesh, order, disappointment };
    }
  }
}

/** Weights that make the gaps of all fields relative ones. */
function fieldWeights(energies: FieldEnergies, fields: number): number[] {
  return Array.from({ length: fields }, (_, a) => 1 / energies.potential[a * fields + a].value);
}

/** One conductivity a triangle, for the exponents: a medium that varies counts as one medium. */
function representativeSigma(mesh: FieldMesh, medium: MediumList): Float64Array {
  const known = new Map<number, number>();
  return Float64Array.from(mesh.region, (k, t) => {
    const m = medium[k];
    if (typeof m === "number") return m;
    let value = known.get(k);
    if (value === undefined) {
      const [a, b, c] = [0, 1, 2].map((i) => 2 * mesh.triangles[3 * t + i]);
      value = m(
        (mesh.xy[a] + mesh.xy[b] + mesh.xy[c]) / 3,
        (mesh.xy[a + 1] + mesh.xy[b + 1] + mesh.xy[c + 1]) / 3,
      );
      known.set(k, value);
    }
    return value;
  });
}

/**
 * The next mesh for a sum of gaps reduced by `factor`, or for less if that would take too many unknowns; null if not
 * even the least step has room, and the mesh as it is if there is nothing to refine.
 */
function refineWithin(
  input: AdaptiveInput,
  current: OrderedMesh,
  energies: FieldEnergies,
  singular: readonly SingularVertex[],
  factor: number,
): OrderedMesh | null {
  let total = 0;
  for (const g of energies.gap) total += g;
  for (let target = factor * total; target < total; target *= 3) {
    const plan = planRefinement({
      ...current,
      gap: energies.gap,
      decay: energies.decay,
      singular,
      target,
      highestOrder: input.highestOrder ?? HIGHEST_ORDER,
    });
    if (plan.empty) return current;
    const next = applyPlan(current.mesh, plan);
    if (next.mesh === current.mesh && next.order.every((p, t) => p === current.order[t])) return current;
    if (countFunctions(makeElements(next.mesh, next.order)) <= input.limits.unknowns) return next;
  }
  return null;
}
