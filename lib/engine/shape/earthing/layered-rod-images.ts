/**
 * The same mutual resistances as in layered-rod.ts by summing the images one by one: the independent second route, for
 * reflections far enough from ±1 that the series ends soon.
 */
import { solveSymmetric } from "../../numeric/cholesky";
import type { LayeredSoil, RodSegments } from "./layered-rod";
import { inlineMean, parallelMean } from "./line-potential";

type Segment = readonly [number, number];

/** Largest |K| for which the series is summed; it then ends within 400 terms. */
export const LARGEST_REFLECTION = 0.9;

/** Resistance in ohms by the image series; null where |K| is too close to 1. */
export function resistanceByImages(radius: number, soil: LayeredSoil, segments: RodSegments): number | null {
  const { upper, lower } = soil;
  const reflection = (lower - upper) / (lower + upper);
  if (Math.abs(reflection) > LARGEST_REFLECTION) return null;
  const list = [...pairs(segments.above), ...pairs(segments.below)];
  const uppers = segments.above.length - 1;
  const n = list.length;
  const matrix = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    for (let j = i; j < n; j++) {
      const mean =
        j < uppers
          ? upper * bothAbove(list[i], list[j], radius, soil.upperDepth, reflection)
          : i < uppers
            ? (1 + reflection) * upper * across(list[i], list[j], radius, soil.upperDepth, reflection)
            : lower * bothBelow(list[i], list[j], radius, soil.upperDepth, reflection);
      matrix[i * n + j] = mean / (4 * Math.PI);
      matrix[j * n + i] = matrix[i * n + j];
    }
  }
  const currents = solveSymmetric(matrix, new Float64Array(n).fill(1));
  return 1 / currents.reduce((sum, current) => sum + current, 0);
}

function pairs(borders: readonly number[]): Segment[] {
  return borders.slice(1).map((end, i): Segment => [borders[i], end]);
}

/** Mean of f over |offset ± z ± b| with both signs given: +1 or −1 for the field's and the source's depth. */
function mean(a: Segment, b: Segment, radius: number, offset: number, signA: 1 | -1, signB: 1 | -1): number {
  const nearest = offset + (signA > 0 ? a[0] : -a[1]) + (signB > 0 ? b[0] : -b[1]);
  return inlineMean(Math.max(nearest, 0), a[1] - a[0], b[1] - b[0], radius);
}

function direct(a: Segment, b: Segment, radius: number): number {
  return a === b ? parallelMean(a[1] - a[0], radius) : mean(a, b, radius, 0, -1, 1);
}

/** Σ_{m≥first} Kᵐ·term(m), until the factor is below 1e-17. */
function series(reflection: number, first: number, term: (m: number) => number): number {
  let sum = 0;
  for (let m = first, factor = reflection ** first; Math.abs(factor) > 1e-17; m++, factor *= reflection) {
    sum += factor * term(m);
  }
  return sum;
}

function bothAbove(a: Segment, b: Segment, radius: number, h: number, reflection: number): number {
  const images = series(reflection, 1, (m) => {
    const shift = 2 * m * h;
    return (
      mean(a, b, radius, shift, 1, -1) +
      mean(a, b, radius, shift, -1, 1) +
      mean(a, b, radius, shift, 1, 1) +
      mean(a, b, radius, shift, -1, -1)
    );
  });
  return direct(a, b, radius) + mean(a, b, radius, 0, 1, 1) + images;
}

function across(a: Segment, b: Segment, radius: number, h: number, reflection: number): number {
  return series(
    reflection,
    0,
    (m) => mean(a, b, radius, 2 * m * h, -1, 1) + mean(a, b, radius, 2 * m * h, 1, 1),
  );
}

function bothBelow(a: Segment, b: Segment, radius: number, h: number, reflection: number): number {
  const images = series(reflection, 0, (m) => mean(a, b, radius, 2 * m * h, 1, 1));
  return (
    direct(a, b, radius) -
    reflection * mean(a, b, radius, -2 * h, 1, 1) +
    (1 - reflection) * (1 + reflection) * images
  );
}
