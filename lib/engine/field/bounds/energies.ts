/**
 * Energies of the discrete potentials and stream functions, and the gap between them, triangle by triangle.
 *
 * For constant conductivity in each triangle the energies are sums of squares of coefficients: exact but for rounding,
 * and the rounding is bounded along the way. The gap density η = ρ|σ∇V - rot ψ|² adds up to Gh - 1/Rh (for the ψ
 * that minimises ½∫ρ|rot ψ|² - I): it is both the width of the bracket and the indicator for refinement.
 */

import { ASK_AFTER } from "../assembly/medium";
import { Interruption } from "../solve/interruption";
import type { SolvedPair } from "../solve/pair";
import { ElementField } from "./element-field";
import { Accumulator, ROUNDING, type Approximate } from "./interval";
import { makeSampledEnergies, sampleEnergies } from "./sampled-energies";

export interface FieldEnergies {
  /** ∫σ∇V_a·∇V_b for all pairs of potentials, row-major. */
  readonly potential: readonly Approximate[];
  /** ∫ρ rot ψ_a·rot ψ_b for all pairs of stream functions. */
  readonly stream: readonly Approximate[];
  /** Share of each triangle in the gap, summed over the fields with their weights. */
  readonly gap: Float64Array;
  /** ∫∇V·rot ψ of each field: equals its current, since the terminal is at one volt. */
  readonly work: Float64Array;
  /** Factor by which the energy of the gradient's polynomials falls from one degree to the next, a triangle. */
  readonly decay: Float64Array;
}

/** Triangles in which the conductivity varies by more are bisected, not raised in order. */
const GREATEST_CONTRAST = 30;

/**
 * `fieldWeight` weighs the gaps of the fields in the indicator. `displacement` gives, for each triangle, a bound of the
 * relative change of its energy when its vertices move from where they are to where the outline has them, or null.
 * `shouldStop` is asked now and then where integrals are sampled; true raises `InterruptedError`.
 */
export function fieldEnergies(
  pair: SolvedPair,
  fieldWeight: readonly number[],
  displacement: Float64Array | null,
  shouldStop: () => boolean = () => false,
): FieldEnergies {
  const { set, potentialSystem, streamSystem, potentials, streams } = pair;
  const count = potentials.length;
  const v = potentials.map(() => new ElementField());
  const s = streams.map(() => new ElementField());
  const potentialSums = Array.from({ length: count * count }, () => new Accumulator());
  const streamSums = Array.from({ length: count * count }, () => new Accumulator());
  const gap = new Float64Array(set.triangleCount);
  const work = new Float64Array(count);
  const decay = new Float64Array(set.triangleCount);
  const byDegree = new Float64Array(32);
  const sampled = makeSampledEnergies(count);
  const elements = potentialSystem.sampled;
  const interruption = new Interruption(shouldStop, ASK_AFTER);
  for (let t = 0; t < set.triangleCount; t++) {
    const { modes, order } = set.layouts[t];
    byDegree.fill(0);
    for (let f = 0; f < count; f++) {
      v[f].load(potentialSystem, potentials[f], t);
      v[f].recover(potentialSystem, t);
      v[f].gradient(potentialSystem, t);
      s[f].load(streamSystem, streams[f], t);
      s[f].recover(streamSystem, t);
      s[f].gradient(streamSystem, t);
    }
    let rough = false;
    const moved = displacement ? displacement[t] : 0;
    if (elements?.functionOf[t]) {
      interruption.spend(1);
      sampleEnergies(set, elements, t, v, s, sampled);
      for (let f = 0; f < count; f++) {
        work[f] += compareFields(v[f], s[f], modes, Math.sqrt(sampled.sigma), fieldWeight[f], byDegree).work;
        gap[t] += fieldWeight[f] * sampled.gap[f];
      }
      const error =
        addSampled(sampled.potential, sampled.potentialLow, potentialSums, count, fieldWeight, moved) +
        addSampled(sampled.stream, sampled.streamLow, streamSums, count, fieldWeight, moved);
      // Where the integrals themselves are the trouble or the conductivity changes too much (a jump inside the triangle,
      // a steep slope), a higher order does not help. Towards an axis it falls to nothing as a matter of course.
      rough = error > gap[t] || (!elements.revolution && sampled.contrast > GREATEST_CONTRAST);
      gap[t] += error;
    } else {
      const root = Math.sqrt(potentialSystem.weight[t]);
      for (let f = 0; f < count; f++) {
        const compared = compareFields(v[f], s[f], modes, root, fieldWeight[f], byDegree);
        gap[t] += fieldWeight[f] * compared.gap;
        work[f] += compared.work;
      }
      addPairs(v, modes, potentialSystem.weight[t], potentialSums, moved);
      addPairs(s, modes, streamSystem.weight[t], streamSums, moved);
    }
    decay[t] = rough ? 1 : decayRate(byDegree, order);
  }
  return {
    potential: potentialSums.map((sum) => sum.result()),
    stream: streamSums.map((sum) => sum.result()),
    gap,
    work,
    decay,
  };
}

interface Comparison {
  gap: number;
  work: number;
}

const comparison: Comparison = { gap: 0, work: 0 };

/**
 * ∫ρ|σ∇V - rot ψ|² for constant σ and ∫∇V·rot ψ (for any σ); adds the energy of the mean of both fields by degree. The
 * result is overwritten by the next call.
 */
function compareFields(
  v: ElementField,
  s: ElementField,
  modes: number,
  rootSigma: number,
  weight: number,
  byDegree: Float64Array,
): Comparison {
  const rootRho = 1 / rootSigma;
  let sum = 0;
  let work = 0;
  for (let k = 0, degree = 0, next = 1; k < modes; k++) {
    if (k === next) next += ++degree + 1;
    const vx = rootSigma * v.p[k];
    const vy = rootSigma * v.q[k];
    const jx = rootRho * s.q[k];
    const jy = -rootRho * s.p[k];
    sum += (vx - jx) * (vx - jx) + (vy - jy) * (vy - jy);
    work += vx * jx + vy * jy;
    byDegree[degree] += weight * ((vx + jx) * (vx + jx) + (vy + jy) * (vy + jy));
  }
  comparison.gap = sum;
  comparison.work = work;
  return comparison;
}

function addPairs(
  fields: readonly ElementField[],
  modes: number,
  weight: number,
  sums: readonly Accumulator[],
  moved: number,
): void {
  const count = fields.length;
  const rounding = 4 * modes * ROUNDING + moved;
  for (let a = 0; a < count; a++) {
    const fa = fields[a];
    const normA = norm(fa, modes);
    for (let b = 0; b < count; b++) {
      const fb = fields[b];
      const normB = a === b ? normA : norm(fb, modes);
      let sum = normA * normA;
      if (a !== b) {
        sum = 0;
        for (let k = 0; k < modes; k++) sum += fa.p[k] * fb.p[k] + fa.q[k] * fb.q[k];
      }
      const error = fa.error * normB + normA * fb.error + fa.error * fb.error + rounding * normA * normB;
      sums[a * count + b].add(weight * sum, weight * error * (1 + 1e-6));
    }
  }
}

function norm({ p, q }: ElementField, modes: number): number {
  let sum = 0;
  for (let k = 0; k < modes; k++) sum += p[k] * p[k] + q[k] * q[k];
  return Math.sqrt(sum);
}

/** Adds integrals with the difference of two rules as their error; returns the weighted error of the diagonal. */
function addSampled(
  high: Float64Array,
  low: Float64Array,
  sums: readonly Accumulator[],
  count: number,
  weight: readonly number[],
  moved: number,
): number {
  let total = 0;
  for (let a = 0; a < count; a++) {
    for (let b = 0; b < count; b++) {
      const i = a * count + b;
      const size = Math.sqrt(high[a * count + a] * high[b * count + b]);
      const error = Math.abs(high[i] - low[i]) + (moved + 256 * ROUNDING) * size;
      sums[i].add(high[i], error);
      if (a === b) total += weight[a] * error;
    }
  }
  return total;
}

/** Mean factor from one degree to the next, from the slope of the logarithms over the upper degrees. */
function decayRate(byDegree: Float64Array, order: number): number {
  if (order < 3) return 0.25;
  // Degrees 1 … order-1; two neighbours are taken together, so that odd and even functions do not upset the slope.
  const top = byDegree[order - 1] + byDegree[order - 2];
  const low =
    order >= 5 ? byDegree[order - 3] + byDegree[order - 4] : byDegree[order - 3] + byDegree[order - 2];
  if (!(low > 0)) return 0.05;
  const steps = order >= 5 ? 2 : 1;
  return Math.min(1, Math.max(1e-4, (top / low) ** (1 / steps)));
}
