/**
 * A strip that changes its width on one side: squares beyond the two strips, measured from the step, and the modes it
 * sends into both. Half-plane map: dz/d ln ζ ∝ √((ζ+α²)/(ζ+1)), the narrow strip at 0, the wide one at ∞,
 * α = narrow/wide. A step on both sides is two of them side by side, in half widths.
 */
import { binomialSeries, multiplySeries } from "../../numeric/power-series";
import { legModes, SERIES_LENGTH } from "./leg-modes";

/** 1 − α without its cancellation, beside α. */
export interface Step {
  readonly ratio: number;
  readonly complement: number;
}

export function stepOf(narrow: number, wide: number): Step {
  return { ratio: narrow / wide, complement: (wide - narrow) / wide };
}

/** (1/π)·{((1−α)²/α)·ln((1+α)/(1−α)) + 2·ln(1 + (1−α)²/(4α))}; 0 for α = 1. */
export function stepSquares({ ratio, complement }: Step): number {
  if (complement === 0) return 0;
  const square = complement * complement;
  const first = (square / ratio) * Math.log1p((2 * ratio) / complement);
  return (first + 2 * Math.log1p(square / ratio / 4)) / Math.PI;
}

/** Modes in the narrow strip, x measured from the step. */
export function narrowModes({ ratio, complement }: Step): number[] {
  const logarithm = complement === 0 ? 0 : (complement / ratio) * Math.log(complement);
  return modes(1, ratio * ratio, 2 * Math.LN2 - (1 + 1 / ratio) * Math.log1p(ratio) + logarithm);
}

/** Modes in the wide strip. */
export function wideModes({ ratio, complement }: Step): number[] {
  const logarithm = complement === 0 ? 0 : complement * Math.log(complement);
  return modes(ratio * ratio, 1, 2 * Math.LN2 - (1 + ratio) * Math.log1p(ratio) - logarithm);
}

/** −u·dZ/du = √((1+reentrant·u)/(1+convex·u)). */
function modes(reentrant: number, convex: number, offset: number): number[] {
  const stretch = multiplySeries(
    binomialSeries(reentrant, 0.5, SERIES_LENGTH),
    binomialSeries(convex, -0.5, SERIES_LENGTH),
  );
  const potential = new Array<number>(SERIES_LENGTH).fill(0);
  potential[0] = 1 / Math.PI;
  return legModes({ offset, stretch, potential });
}
