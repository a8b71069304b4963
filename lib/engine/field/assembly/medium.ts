/**
 * Conductivity on a mesh: one number a triangle where it is constant, samples at quadrature points where it varies.
 */

import { condenseAtAxis } from "../element/axis-interior";
import { condense, LARGEST_ELEMENT } from "../element/condense";
import { fillSampledStiffness, interiorFromOuter, sampleTable } from "../element/sampled";
import { Interruption } from "../solve/interruption";
import { axisEdgeOf, axisVertexOf, type AxisEdges } from "./axis";
import { allocateCondensed, turnEdges, type CondensedMatrices, type ElementSet } from "./elements";

/** Sampled triangles after which the caller is asked whether to go on: some milliseconds. */
export const ASK_AFTER = 200;

/** Conductivity as a function of the domain's coordinates. */
export type ConductivityFunction = (x: number, y: number) => number;

/** Conductivity of each medium of the mesh: index 0 the background, k the k-th region. */
export type MediumList = ReadonlyArray<number | ConductivityFunction>;

/** Raised where a conductivity function is not a positive number. */
export class ConductivityError extends Error {
  override readonly name = "ConductivityError";
  constructor(
    readonly x: number,
    readonly y: number,
    readonly value: number,
  ) {
    super(`conductivity ${value} at (${x}, ${y})`);
  }
}

/** What a system needs to know of triangles in which the conductivity varies. */
export interface SampledElements {
  /** Function of each triangle, or null where the conductivity is constant. */
  readonly functionOf: ReadonlyArray<ConductivityFunction | null>;
  /** Start of the matrix that gives the interior values from the outer ones. */
  readonly recoveryStart: Int32Array;
  readonly recovery: Float64Array;
  /** The body is one of revolution: the conductivity contains the factor 2πx. */
  readonly revolution: boolean;
  readonly axis: AxisEdges | null;
}

export interface SampledMatrices {
  readonly matrices: CondensedMatrices;
  readonly sampled: SampledElements;
}

/** Degree of the rule above that of the squared gradient, for the energies of a smooth conductivity. */
const EXTRA_DEGREE = 6;
/** The same for the matrices: their errors only enter the energies squared, since fields stay admissible. */
const EXTRA_DEGREE_OF_MATRICES = 3;
/** The same for 1/x, at most; near the axis. */
const MOST_EXTRA_DEGREE = 24;

export interface ElementRule {
  /** Degree for the element's matrices. */
  readonly matrixDegree: number;
  /** Degree of the lower of the two rules for its energies. */
  readonly energyDegree: number;
  readonly crowdedVertex: number;
}

/** The quadrature of triangle t. */
export function elementRule(
  set: ElementSet,
  t: number,
  revolution: boolean,
  axis: AxisEdges | null,
): ElementRule {
  const gradients = 2 * set.layouts[t].order - 2;
  if (!revolution) {
    return {
      matrixDegree: gradients + EXTRA_DEGREE_OF_MATRICES,
      energyDegree: gradients + EXTRA_DEGREE,
      crowdedVertex: 2,
    };
  }
  const { xy, triangles } = set.mesh;
  const [a, b, c] = [0, 1, 2].map((i) => xy[2 * triangles[3 * t + i]]);
  const near = Math.min(a, b, c);
  const far = Math.max(a, b, c);
  const touches = axis ? axisVertexOf(set, axis, t) : -1;
  const both = (degree: number): Omit<ElementRule, "crowdedVertex"> => ({
    matrixDegree: degree,
    energyDegree: degree,
  });
  if (near === 0) return { ...both(gradients + MOST_EXTRA_DEGREE / 2), crowdedVertex: Math.max(0, touches) };
  // Polynomials approach 1/x on [near, far] like rho^-n; 27.6 is the logarithm of 1e12.
  const kappa = (far + near) / (far - near);
  const rho = kappa + Math.sqrt(kappa * kappa - 1);
  const extra = Math.min(MOST_EXTRA_DEGREE, Math.max(EXTRA_DEGREE, Math.ceil(27.6 / Math.log(rho))));
  return { ...both(gradients + extra), crowdedVertex: 2 };
}

/** Conductivity at the points of a rule in a triangle; throws if one is not positive. */
export function sampleConductivity(
  sigma: ConductivityFunction,
  xi: Float64Array,
  eta: Float64Array,
  count: number,
  corner: readonly [number, number, number, number, number, number],
  out: Float64Array,
): void {
  const [x0, y0, x1, y1, x2, y2] = corner;
  for (let q = 0; q < count; q++) {
    const x = x0 + xi[q] * x1 + eta[q] * x2;
    const y = y0 + xi[q] * y1 + eta[q] * y2;
    const value = sigma(x, y);
    if (!(value > 0 && value < Infinity)) throw new ConductivityError(x, y, value);
    out[q] = value;
  }
}

/** First corner and the two edges from it. */
export function cornerAndEdges(set: ElementSet, t: number): [number, number, number, number, number, number] {
  const { xy, triangles } = set.mesh;
  const a = 2 * triangles[3 * t];
  const b = 2 * triangles[3 * t + 1];
  const c = 2 * triangles[3 * t + 2];
  return [xy[a], xy[a + 1], xy[b] - xy[a], xy[b + 1] - xy[a + 1], xy[c] - xy[a], xy[c + 1] - xy[a + 1]];
}

/**
 * Matrices of both problems where some triangles have a varying conductivity: those triangles get matrices with their
 * weight built in, the others keep the shared ones.
 */
export function sampleElements(
  set: ElementSet,
  shared: CondensedMatrices,
  functionOf: ReadonlyArray<ConductivityFunction | null>,
  revolution: boolean,
  axis: AxisEdges | null,
  shouldStop: () => boolean,
): { potential: SampledMatrices; stream: SampledMatrices } {
  const recoveryStart = new Int32Array(set.triangleCount + 1);
  for (let t = 0; t < set.triangleCount; t++) {
    const { interior, outer } = set.layouts[t];
    recoveryStart[t + 1] = recoveryStart[t] + (functionOf[t] ? interior * outer : 0);
  }
  const make = (): SampledMatrices => {
    const matrices = allocateCondensed(set);
    matrices.values.set(shared.values);
    const recovery = new Float64Array(recoveryStart[set.triangleCount]);
    return { matrices, sampled: { functionOf, recoveryStart, recovery, revolution, axis } };
  };
  const result = { potential: make(), stream: make() };
  const work = new Float64Array(LARGEST_ELEMENT * LARGEST_ELEMENT);
  let rows = new Float64Array(0);
  const interruption = new Interruption(shouldStop, ASK_AFTER);
  for (let t = 0; t < set.triangleCount; t++) {
    const sigma = functionOf[t];
    if (!sigma) continue;
    interruption.spend(1);
    const layout = set.layouts[t];
    const rule = elementRule(set, t, revolution, axis);
    const table = sampleTable(rule.matrixDegree, rule.crowdedVertex);
    const { count, xi, eta } = table.rule;
    const samples = new Float64Array(count);
    const corner = cornerAndEdges(set, t);
    sampleConductivity(sigma, xi, eta, count, corner, samples);
    if (rows.length < layout.size * 2 * count) rows = new Float64Array(layout.size * 2 * count);
    for (const target of [result.potential, result.stream]) {
      fillSampledStiffness(layout, table, samples, corner[2], corner[3], corner[4], corner[5], rows, work);
      const { values, start } = target.matrices;
      const { recovery } = target.sampled;
      const edge = axis && target === result.stream ? axisEdgeOf(set, axis, t) : -1;
      if (edge >= 0) {
        condenseAtAxis(layout, edge, work, recovery, recoveryStart[t], values, start[t]);
      } else {
        condense(layout.size, layout.interior, work, values, start[t]);
        interiorFromOuter(layout.size, layout.interior, work, recovery, recoveryStart[t]);
      }
      turnEdges(layout, set.reversed[t], values, start[t]);
      for (let q = 0; q < count; q++) samples[q] = 1 / samples[q];
    }
  }
  return result;
}
