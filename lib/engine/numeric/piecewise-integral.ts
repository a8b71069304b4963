/**
 * Integrals of f(piece, t) over many pieces at once. A table of thousands of intervals does not want an adaptive rule in
 * each: where the integrand varies little inside an interval, a Gauss rule of a few points is exact to rounding, and how
 * many points that takes follows from the ratio of the largest to the smallest value in it. Only the wild intervals are
 * left to the adaptive rule.
 */
import { CompensatedSum } from "./compensated-sum";
import { integrateSegments, type IntegrateOptions, type Integral, type Segments } from "./gauss-kronrod";
import { gaussLegendre } from "./gauss-legendre";

/** How an integrand varies inside one piece, as far as its owner knows. */
export type Smoothness = "reciprocal" | "cubic";

/** From so many segments on the Gauss rules pay off. */
export const MANY = 64;

/**
 * [largest ratio, points]: relative error below 1e-14 for 1/v and 1/v² of a linear or exponential v (`reciprocal`), or
 * for 1/v of a monotone cubic v (`cubic`), found by comparing with 30-digit arithmetic; a test repeats it.
 */
const POINTS: Readonly<Record<Smoothness, readonly (readonly [number, number])[]>> = {
  reciprocal: [
    [1.0008, 2],
    [1.0127, 3],
    [1.0528, 4],
    [1.1279, 5],
    [1.2372, 6],
    [1.5485, 8],
    [1.9706, 10],
    [2.4952, 12],
    [3.8378, 16],
    [5.5623, 20],
    [7.6642, 24],
    [12.9958, 32],
    [19.8277, 40],
  ],
  cubic: [
    [1.0005, 4],
    [1.0037, 5],
    [1.0082, 6],
    [1.0702, 8],
    [1.2147, 10],
    [1.4065, 12],
    [1.9443, 16],
    [2.6666, 20],
    [3.563, 24],
    [5.864, 32],
    [8.8371, 40],
  ],
};
const GAUSS_ERROR = 2e-14;

export interface PieceHints {
  /** Largest over smallest value of the integrand in a segment, or undefined where it is not known. */
  readonly spread?: (piece: number, start: number, width: number) => number;
  readonly smoothness?: Smoothness;
  /** Points added to each Gauss rule, for an independent second value. */
  readonly extraPoints?: number;
}

/** Number of Gauss points for that ratio; 0 where the adaptive rule is needed. */
export function gaussPoints(spread: number, smoothness: Smoothness): number {
  for (const [most, points] of POINTS[smoothness]) if (spread <= most) return points;
  return 0;
}

/** Integrates over all segments; `limit` where the tolerance was not reached. Throws whatever f throws. */
export function integratePieces(
  f: (piece: number, t: number) => number,
  segments: Segments,
  hints: PieceHints = {},
  options: IntegrateOptions = {},
): Integral {
  const { spread, smoothness = "reciprocal", extraPoints = 0 } = hints;
  const count = segments.piece.length;
  if (!spread || count <= MANY) return integrateSegments(f, segments, options);
  const total = new CompensatedSum();
  const wild: Segments = { piece: [], start: [], width: [] };
  let evaluations = 0;
  for (let i = 0; i < count; i++) {
    const piece = segments.piece[i];
    const start = segments.start[i];
    const width = segments.width[i];
    const points = gaussPoints(spread(piece, start, width), smoothness);
    if (points === 0) {
      wild.piece.push(piece);
      wild.start.push(start);
      wild.width.push(width);
      continue;
    }
    const { nodes, weights } = gaussLegendre(points + extraPoints);
    let sum = 0;
    for (let j = 0; j < nodes.length; j++) sum += weights[j] * f(piece, start + width * nodes[j]);
    evaluations += nodes.length;
    total.add(sum * width);
  }
  if (wild.piece.length === 0) {
    return {
      value: total.value,
      error: GAUSS_ERROR * Math.abs(total.value),
      evaluations,
      status: "converged",
    };
  }
  const smooth = total.value;
  // The wild part only has to be good against the whole.
  const absolute = (options.relative ?? 1e-12) * Math.abs(smooth);
  const rest = integrateSegments(f, wild, {
    ...options,
    absolute: Math.max(absolute, options.absolute ?? 0),
  });
  return {
    value: smooth + rest.value,
    error: GAUSS_ERROR * Math.abs(smooth) + rest.error,
    evaluations: evaluations + rest.evaluations,
    status: rest.status,
  };
}
