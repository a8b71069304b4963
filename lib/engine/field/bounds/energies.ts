/**
 * Energies of the discrete potentials and stream functions, and the gap between them, triangle by triangle.
 *
 * For constant conductivity in each triangle the energies are sums of squares of coefficients: exact but for rounding,
 * and the rounding is bounded along the way. The gap density η = ρ|σ∇V - rot ψ|² adds up to Gh - 1/Rh (for the ψ
 * that minimises ½∫ρ|rot ψ|² - I): it is both the width of the bracket and the indicator for refinement.
 */

import type { LinearSystem } from "../solve/assemble";
import { ElementField, type DiscreteField } from "./element-field";
import { Accumulator, type Approximate } from "./interval";

export interface FieldEnergies {
  /** ∫σ∇V_a·∇V_b for all pairs of potentials, row-major. */
  readonly potential: readonly Approximate[];
  /** ∫ρ rot ψ_a·rot ψ_b for all pairs of stream functions. */
  readonly stream: readonly Approximate[];
  /** Share of each triangle in the gap, summed over the fields with their weights. */
  readonly gap: Float64Array;
  /** Share of each triangle in the power (mean of both solutions), likewise. */
  readonly power: Float64Array;
  /** Factor by which the energy of the gradient's polynomials falls from one degree to the next, a triangle. */
  readonly decay: Float64Array;
}

/**
 * The fields of both systems, in the same order; `fieldWeight` weighs their gaps in the indicator. `displacement`
 * gives, for each triangle, a bound of the relative change of its energy when its vertices move from where they are
 * to where the outline has them; null for none.
 */
export function fieldEnergies(
  potentialSystem: LinearSystem,
  potentials: readonly DiscreteField[],
  streamSystem: LinearSystem,
  streams: readonly DiscreteField[],
  fieldWeight: readonly number[],
  displacement: Float64Array | null,
): FieldEnergies {
  const { set } = potentialSystem;
  const count = potentials.length;
  const v = potentials.map(() => new ElementField());
  const s = streams.map(() => new ElementField());
  const potentialSums = Array.from({ length: count * count }, () => new Accumulator());
  const streamSums = Array.from({ length: count * count }, () => new Accumulator());
  const gap = new Float64Array(set.triangleCount);
  const power = new Float64Array(set.triangleCount);
  const decay = new Float64Array(set.triangleCount);
  const byDegree = new Float64Array(32);
  for (let t = 0; t < set.triangleCount; t++) {
    const { modes, order } = set.layouts[t];
    const rootSigma = Math.sqrt(potentialSystem.weight[t]);
    const rootRho = Math.sqrt(streamSystem.weight[t]);
    byDegree.fill(0);
    let localGap = 0;
    let localPower = 0;
    for (let f = 0; f < count; f++) {
      v[f].load(potentialSystem, potentials[f], t);
      v[f].recover(potentialSystem, t);
      v[f].gradient(potentialSystem, t);
      s[f].load(streamSystem, streams[f], t);
      s[f].recover(streamSystem, t);
      s[f].gradient(streamSystem, t);
      const { p, q } = v[f];
      const sp = s[f].p;
      const sq = s[f].q;
      let sum = 0;
      let total = 0;
      for (let k = 0, degree = 0, next = 1; k < modes; k++) {
        if (k === next) next += ++degree + 1;
        const vx = rootSigma * p[k];
        const vy = rootSigma * q[k];
        const jx = rootRho * sq[k];
        const jy = -rootRho * sp[k];
        sum += (vx - jx) * (vx - jx) + (vy - jy) * (vy - jy);
        const size = (vx + jx) * (vx + jx) + (vy + jy) * (vy + jy);
        total += size;
        byDegree[degree] += fieldWeight[f] * size;
      }
      localGap += fieldWeight[f] * sum;
      localPower += 0.25 * fieldWeight[f] * total;
    }
    gap[t] = localGap;
    power[t] = localPower;
    decay[t] = decayRate(byDegree, order);
    const moved = displacement ? displacement[t] : 0;
    addPairs(v, modes, potentialSystem.weight[t], potentialSums, moved);
    addPairs(s, modes, streamSystem.weight[t], streamSums, moved);
  }
  return {
    potential: potentialSums.map((sum) => sum.result()),
    stream: streamSums.map((sum) => sum.result()),
    gap,
    power,
    decay,
  };
}

function addPairs(
  fields: readonly ElementField[],
  modes: number,
  weight: number,
  sums: readonly Accumulator[],
  moved: number,
): void {
  const count = fields.length;
  const norms = fields.map(({ p, q }) => {
    let sum = 0;
    for (let k = 0; k < modes; k++) sum += p[k] * p[k] + q[k] * q[k];
    return Math.sqrt(sum);
  });
  for (let a = 0; a < count; a++) {
    for (let b = 0; b < count; b++) {
      const fa = fields[a];
      const fb = fields[b];
      let sum = norms[a] * norms[a];
      if (a !== b) {
        sum = 0;
        for (let k = 0; k < modes; k++) sum += fa.p[k] * fb.p[k] + fa.q[k] * fb.q[k];
      }
      const size = norms[a] * norms[b];
      const error =
        fa.error * norms[b] + norms[a] * fb.error + fa.error * fb.error + (4 * modes * 2 ** -53 + moved) * size;
      sums[a * count + b].add(weight * sum, weight * error * (1 + 1e-6));
    }
  }
}

/** Mean factor from one degree to the next, from the slope of the logarithms over the upper degrees. */
function decayRate(byDegree: Float64Array, order: number): number {
  if (order < 3) return 0.25;
  // Degrees 1 … order-1; two neighbours are taken together, so that odd and even functions do not upset the slope.
  const top = byDegree[order - 1] + byDegree[order - 2];
  const low = order >= 5 ? byDegree[order - 3] + byDegree[order - 4] : byDegree[order - 3] + byDegree[order - 2];
  if (!(low > 0)) return 0.05;
  const steps = order >= 5 ? 2 : 1;
  return Math.min(1, Math.max(1e-4, (top / low) ** (1 / steps)));
}
