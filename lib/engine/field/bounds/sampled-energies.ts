/**
 * Energies and gap of a triangle in which the conductivity varies, by quadrature.
 *
 * Two rules are used, that of the matrices and a higher one. The higher one counts; the difference is taken as the
 * error of the integrals. It is an estimate, not a bound: brackets that rest on it are not proved.
 */

import { cornerAndEdges, elementRule, sampleConductivity, type SampledElements } from "../assembly/medium";
import type { ElementSet } from "../assembly/elements";
import { sampleTable, type SampleTable } from "../element/sampled";
import type { ElementField } from "./element-field";

/** How much higher the degree of the second rule is. */
const EXTRA_DEGREE = 6;

export interface SampledEnergies {
  /** ∫σ∇V_a·∇V_b by the higher rule and by the lower one. */
  readonly potential: Float64Array;
  readonly potentialLow: Float64Array;
  readonly stream: Float64Array;
  readonly streamLow: Float64Array;
  /** ∫ρ|σ∇V - rot ψ|² of each field. */
  readonly gap: Float64Array;
  /** Mean conductivity at the points, for the look at the solution's smoothness. */
  sigma: number;
  /** Greatest conductivity over least at the points of the higher rule. */
  contrast: number;
  /** Room for the values at the points: conductivity, and both components of both functions for each field. */
  readonly samples: Float64Array;
  readonly values: readonly [Float64Array, Float64Array, Float64Array, Float64Array][];
}

/** Most points of a rule. */
const MOST_POINTS = 1024;

export function makeSampledEnergies(fields: number): SampledEnergies {
  const room = (): Float64Array => new Float64Array(MOST_POINTS);
  const square = (): Float64Array => new Float64Array(fields * fields);
  return {
    potential: square(),
    potentialLow: square(),
    stream: square(),
    streamLow: square(),
    gap: new Float64Array(fields),
    sigma: 1,
    contrast: 1,
    samples: new Float64Array(MOST_POINTS),
    values: Array.from({ length: fields }, () => [room(), room(), room(), room()]),
  };
}

/** Evaluates triangle t, whose conductivity varies, from the gradients in v and s; fills `out`. */
export function sampleEnergies(
  set: ElementSet,
  sampled: SampledElements,
  t: number,
  v: readonly ElementField[],
  s: readonly ElementField[],
  out: SampledEnergies,
): void {
  const { energyDegree, crowdedVertex } = elementRule(set, t, sampled.revolution, sampled.axis);
  const lower = sampleTable(energyDegree, crowdedVertex);
  integrate(set, sampled, t, lower, v, s, out.potentialLow, out.streamLow, null, out);
  out.gap.fill(0);
  const higher = sampleTable(energyDegree + EXTRA_DEGREE, crowdedVertex);
  integrate(set, sampled, t, higher, v, s, out.potential, out.stream, out.gap, out);
}

function integrate(
  set: ElementSet,
  sampled: SampledElements,
  t: number,
  table: SampleTable,
  v: readonly ElementField[],
  s: readonly ElementField[],
  potential: Float64Array,
  stream: Float64Array,
  gap: Float64Array | null,
  out: SampledEnergies,
): void {
  const sigma = sampled.functionOf[t];
  if (!sigma) throw new Error(`triangle ${t} has a constant conductivity`);
  const { modes } = set.layouts[t];
  const { count, weights, xi, eta } = table.rule;
  const { samples } = out;
  sampleConductivity(sigma, xi, eta, count, cornerAndEdges(set, t), samples);
  const fields = v.length;
  for (let a = 0; a < fields; a++) {
    const [vx, vy, jx, jy] = out.values[a];
    fillValues(v[a].p, modes, table.modes, count, vx);
    fillValues(v[a].q, modes, table.modes, count, vy);
    fillValues(s[a].q, modes, table.modes, count, jx);
    fillValues(s[a].p, modes, table.modes, count, jy);
  }
  let mean = 0;
  let least = Infinity;
  let greatest = 0;
  for (let q = 0; q < count; q++) {
    mean += 2 * weights[q] * samples[q];
    if (samples[q] < least) least = samples[q];
    if (samples[q] > greatest) greatest = samples[q];
  }
  out.sigma = mean;
  out.contrast = greatest / least;
  for (let a = 0; a < fields; a++) {
    const [vx, vy, jx, jy] = out.values[a];
    for (let b = 0; b < fields; b++) {
      const [ux, uy, kx, ky] = out.values[b];
      let ofV = 0;
      let ofJ = 0;
      for (let q = 0; q < count; q++) {
        ofV += weights[q] * samples[q] * (vx[q] * ux[q] + vy[q] * uy[q]);
        ofJ += (weights[q] / samples[q]) * (jx[q] * kx[q] + jy[q] * ky[q]);
      }
      potential[a * fields + b] = ofV;
      stream[a * fields + b] = ofJ;
    }
    if (!gap) continue;
    for (let q = 0; q < count; q++) {
      const dx = samples[q] * vx[q] - jx[q];
      const dy = samples[q] * vy[q] + jy[q];
      gap[a] += (weights[q] / samples[q]) * (dx * dx + dy * dy);
    }
  }
}

/** Values of Σ c_k ψ_k at the points of a table. */
function fillValues(
  coefficients: Float64Array,
  modes: number,
  table: Float64Array,
  count: number,
  out: Float64Array,
): void {
  out.fill(0, 0, count);
  for (let k = 0, at = 0; k < modes; k++) {
    const c = coefficients[k];
    for (let q = 0; q < count; q++, at++) out[q] += c * table[at];
  }
}
