/**
 * A vertical rod from the surface of a soil of two layers: mutual resistances of its segments by the average-potential
 * method, with the images of both boundaries.
 *
 * Upper layer of depth h and resistivity ρ₁, lower one ρ₂, K = (ρ₂−ρ₁)/(ρ₂+ρ₁), f(t) = 1/√(t²+a²), source depth b, field
 * depth z (Sunde, Earth Conduction Effects in Transmission Systems; rederived):
 *
 *   both above       ρ₁/4π·{ f(z−b) + f(z+b) + Σ_{m≥1} Kᵐ [f(z−b±2mh) + f(z+b±2mh)] }
 *   above and below  (1+K)·ρ₁/4π·Σ_{m≥0} Kᵐ [f(v−u+2mh) + f(v+u+2mh)]
 *   both below       ρ₂/4π·{ f(z−b) − K·f(z+b−2h) + (1−K²)·Σ_{m≥0} Kᵐ f(z+b+2mh) }
 *
 * The images that a segment can touch are averaged in closed form. The rest of each series, all of which carry
 * K·e^(−2kh)/(1−K·e^(−2kh)) in f(t) = ∫₀^∞ e^(−kt)·J₀(ka) dk, is that integral by the trapezoidal rule over ln k: the
 * averages over segments are exponentials there, nothing cancels, and it converges alike for every K from −1 to 1, where
 * the series itself would need 1e4 terms and more. The nearest singularities of the integrand lie π/2 off the real axis
 * of ln k, so a step of 1/4 leaves e^(−4π²) ≈ 1e-17.
 */
import { besselJ0 } from "../../numeric/bessel-j0";
import { solveSymmetric } from "../../numeric/cholesky";
import { inlineMean, parallelMean } from "./line-potential";

export interface LayeredSoil {
  /** Resistivities, ohm m, and depth of the upper layer, m. */
  readonly upper: number;
  readonly lower: number;
  readonly upperDepth: number;
}

/** Borders of segments by depth, increasing; the rod is cut at the boundary of the layers. */
export interface RodSegments {
  readonly above: readonly number[];
  /** Empty where the rod stays in the upper layer. */
  readonly below: readonly number[];
}

/** One segment a layer, or `count` equal ones. */
export function equalSegments(length: number, upperDepth: number, count = 1): RodSegments {
  const end = Math.min(length, upperDepth);
  const above = Array.from({ length: count + 1 }, (_, i) => (end * i) / count);
  if (length <= upperDepth) return { above, below: [] };
  // The first and last border are exact, so that thin remainders keep their length.
  const below = Array.from({ length: count + 1 }, (_, i) =>
    i === count ? length : upperDepth + ((length - upperDepth) * i) / count,
  );
  return { above, below };
}

/** Shortest segment in radii: with it a thin rod agrees with the whole cylinder to about 0.1 %. */
const FINEST = 1.25;
/** Each segment is so many times the one before; steps of 1.3 in its place change the result by 0.06 % at most. */
const GROWTH = 3;

/** Segments that are short, about a radius, at the rod's end and at the boundary, and grow away from them. */
export function gradedSegments(length: number, radius: number, upperDepth: number): RodSegments {
  const finest = FINEST * radius;
  if (length <= upperDepth)
    return {
      above: gradedTowards(length, finest)
        .map((d) => length - d)
        .reverse(),
      below: [],
    };
  const above = gradedTowards(upperDepth, finest)
    .map((d) => upperDepth - d)
    .reverse();
  const rest = length - upperDepth;
  const half = gradedTowards(rest / 2, finest);
  const below = [
    ...half.map((d) => upperDepth + d),
    ...half
      .slice(0, -1)
      .map((d) => length - d)
      .reverse(),
  ];
  return { above, below };
}

/** 0, finest, … , length: steps that grow by a constant ratio; the last one takes what is left. */
function gradedTowards(length: number, finest: number): number[] {
  const borders = [0];
  let step = finest;
  let at = 0;
  while (at + 1.5 * step < length) {
    at += step;
    borders.push(at);
    step *= GROWTH;
  }
  borders.push(length);
  return borders;
}

/** Resistance in ohms of the rod with these segments at one potential. */
export function layeredRodResistance(radius: number, soil: LayeredSoil, segments: RodSegments): number {
  const matrix = segmentMatrix(radius, soil, segments);
  const currents = solveSymmetric(matrix, new Float64Array(Math.sqrt(matrix.length)).fill(1));
  let total = 0;
  for (const current of currents) total += current;
  return 1 / total;
}

/** Mutual resistances of the segments, ohms, row by row, the upper ones first. */
export function segmentMatrix(
  radius: number,
  soil: LayeredSoil,
  { above, below }: RodSegments,
): Float64Array {
  const { upper, lower, upperDepth: h } = soil;
  const [over, under] = upper > lower ? [1, lower / upper] : [upper / lower, 1];
  const reflection = (under - over) / (under + over);
  // 1 − K and 1 + K without subtraction.
  const least = (2 * over) / (over + under);
  const most = (2 * under) / (over + under);
  const uppers = above.length - 1;
  const n = uppers + Math.max(below.length - 1, 0);
  const start = Float64Array.from({ length: n }, (_, i) => (i < uppers ? above[i] : below[i - uppers]));
  const end = Float64Array.from({ length: n }, (_, i) => (i < uppers ? above[i + 1] : below[i - uppers + 1]));
  const matrix = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    const own = end[i] - start[i];
    for (let j = i; j < n; j++) {
      const other = end[j] - start[j];
      const direct = i === j ? parallelMean(own, radius) : inlineMean(start[j] - end[i], own, other, radius);
      const mirrored = inlineMean(start[i] + start[j], own, other, radius);
      let value: number;
      if (j < uppers) {
        const reflected = inlineMean(h - end[i] + (h - end[j]), own, other, radius);
        value = upper * (direct + mirrored + reflection * reflected);
      } else if (i < uppers) value = most * upper * (direct + mirrored);
      else {
        const reflected = inlineMean(start[i] - h + (start[j] - h), own, other, radius);
        value = lower * (direct - reflection * reflected + least * most * mirrored);
      }
      matrix[i * n + j] = value / (4 * Math.PI);
    }
  }
  addFarImages(matrix, radius, soil, { start, end, uppers }, { reflection, least, most });
  for (let i = 0; i < n; i++) for (let j = 0; j < i; j++) matrix[i * n + j] = matrix[j * n + i];
  return matrix;
}

interface Borders {
  readonly start: Float64Array;
  readonly end: Float64Array;
  readonly uppers: number;
}

/** Adds the images that no segment touches to the upper triangle of the matrix. */
function addFarImages(
  matrix: Float64Array,
  radius: number,
  { upper, lower, upperDepth: h }: LayeredSoil,
  { start, end, uppers }: Borders,
  { reflection, least, most }: { readonly reflection: number; readonly least: number; readonly most: number },
): void {
  if (reflection === 0) return;
  const n = start.length;
  // J₀(ka) grows off the real axis and takes some of the strip where the boundary is close to the rod's radius.
  const step = 0.25 * (2 / Math.PI) * Math.atan(h / radius);
  const lowest = Math.log(Math.max(1e-17 * least, 1e-300) / Math.max(end[n - 1], h));
  const highest = Math.log(45 / h);
  const near = new Float64Array(n);
  const far = new Float64Array(n);
  for (let t = lowest; t < highest; t += step) {
    const k = Math.exp(t);
    const once = Math.exp(-k * h);
    const twice = once * once;
    const denominator = reflection > 0 ? least - reflection * Math.expm1(-2 * k * h) : 1 - reflection * twice;
    const weight = (step * k * besselJ0(k * radius) * reflection) / denominator / (4 * Math.PI);
    for (let i = 0; i < n; i++) {
      const spread = meanDecay(k * (end[i] - start[i]));
      // e^(−kz), and e^(−k·distance to the boundary), averaged over the segment.
      far[i] = Math.exp(-k * start[i]) * spread;
      near[i] = (i < uppers ? Math.exp(-k * (h - end[i])) : Math.exp(-k * (start[i] - h))) * spread;
    }
    for (let i = 0; i < uppers; i++) {
      for (let j = i; j < uppers; j++) {
        matrix[i * n + j] +=
          upper *
          weight *
          (twice * far[i] * far[j] +
            once * (near[i] * far[j] + far[i] * near[j]) +
            reflection * twice * near[i] * near[j]);
      }
      for (let j = uppers; j < n; j++) {
        matrix[i * n + j] += most * upper * weight * near[j] * twice * (near[i] + once * far[i]);
      }
    }
    for (let i = uppers; i < n; i++) {
      for (let j = i; j < n; j++) {
        matrix[i * n + j] += lower * least * most * weight * twice * twice * near[i] * near[j];
      }
    }
  }
}

/** (1 − e^(−x))/x. */
function meanDecay(x: number): number {
  return x < 1e-8 ? 1 - x / 2 : -Math.expm1(-x) / x;
}
