/**
 * The right-angle corner between two strips, its squares beyond the legs measured from the inner corner, and the modes
 * it sends into its legs. Half-plane map: dz/d ln ζ ∝ √((ζ+1)/(ζ−r²)), leg 1 at ∞, leg 2 at 0, r = w₁/w₂.
 */
import { binomialSeries, multiplySeries } from "../../numeric/power-series";
import { legModes, SERIES_LENGTH } from "./leg-modes";

/**
 * Squares of a corner between strips of two widths, r = w₁/w₂:
 * [2r·atan(1/r) + (2/r)·atan r − ln(16r²/(1+r²)²)]/π (P. M. Hall 1968; 1 − (2/π)ln 2 for r = 1).
 */
export function cornerSquares(width1: number, width2: number): number {
  // The law is the same for r and 1/r; with r ≤ 1 nothing overflows.
  const r = Math.min(width1, width2) / Math.max(width1, width2);
  const logarithm = 4 * Math.LN2 + 2 * Math.log(r) - 2 * Math.log1p(r * r);
  return (2 * r * Math.atan2(1, r) + 2 * (Math.atan(r) / r) - logarithm) / Math.PI;
}

/** Modes in the leg whose width over the other leg's width is `ratio`. */
export function cornerModes(ratio: number): number[] {
  const square = ratio * ratio;
  // The local coordinate is scaled so that the nearer of the two corners lies at distance 1: no power overflows.
  const [inner, outer] = ratio <= 1 ? [1, square] : [1 / square, 1];
  const stretch = multiplySeries(
    binomialSeries(inner, 0.5, SERIES_LENGTH),
    binomialSeries(-outer, -0.5, SERIES_LENGTH),
  );
  const potential = new Array<number>(SERIES_LENGTH).fill(0);
  potential[0] = 1 / Math.PI;
  const logarithm = Math.log1p(Math.min(square, 1 / square));
  const offset = 2 * Math.LN2 - 2 * (Math.atan(ratio) / ratio) - logarithm;
  return legModes({ offset, stretch, potential });
}
