/**
 * A bar of width a with a stub of width b at a right angle, arms measured from the inner corners: squares beyond the
 * strips for current through the bar or from one arm into the stub, and the modes sent into the three arms.
 *
 * Half-plane map: dz/dζ ∝ √(ζ²−c²)/(ζ²−1), the bar's arms at ∓1, the stub at ∞, the inner corners at ∓c,
 * c² = 1 + q², q = 2a/b.
 */
import { binomialSeries, multiplySeries } from "../../numeric/power-series";
import { legModes, SERIES_LENGTH } from "./leg-modes";

export interface Tee {
  /** 2a/b. */
  readonly q: number;
  /** Squares with the current through the bar and the stub floating. */
  readonly through: number;
  /** Squares with the current from one arm into the stub and the other arm floating. */
  readonly branch: number;
}

/** Modes of one arm with unit current from left to right, from left to stub, and from right to stub. */
export interface ArmModes {
  readonly through: readonly number[];
  readonly fromLeft: readonly number[];
  readonly fromRight: readonly number[];
}

export function teeOf(barWidth: number, stubWidth: number): Tee {
  const q = (2 * barWidth) / stubWidth;
  const inverse = stubWidth / (2 * barWidth);
  const through = (2 / Math.PI) * (Math.log1p(inverse * inverse) + (2 * Math.atan(q)) / q);
  // 1.5·ln(1+q²) − 2·ln 2q, written so that neither a narrow nor a wide stub overflows.
  const logarithm =
    q > 1
      ? Math.log(q) + 1.5 * Math.log1p(inverse * inverse) - 2 * Math.LN2
      : 1.5 * Math.log1p(q * q) - 2 * Math.log(2 * q);
  const branch = ((2 * Math.atan(q)) / q + q * Math.atan(inverse) + logarithm) / Math.PI;
  return { q, through, branch };
}

/** The modes in the left arm of the bar (the right one's are its mirror image) and in the stub. */
export function teeModes({ q, through, branch }: Tee): { readonly left: ArmModes; readonly stub: ArmModes } {
  const c = Math.hypot(1, q);
  const inner = (q / (1 + c)) * q;
  // Arm: u = distance from its point of the half plane, in units of the nearer of inner corner and opposite arm.
  const scale = Math.min(inner, 2);
  const [corner, far, opposite] = [scale / inner, scale / (1 + c), scale / 2];
  const arm = {
    offset: Math.LN2 - (Math.PI / 2) * through - Math.log(scale),
    stretch: product(
      binomialSeries(-corner, 0.5, SERIES_LENGTH),
      binomialSeries(far, 0.5, SERIES_LENGTH),
      binomialSeries(opposite, -1, SERIES_LENGTH),
    ),
  };
  // 1/(1+u/2) and (u/2)/(1+u/2) = 1 − 1/(1+u/2).
  const away = binomialSeries(opposite, -1, SERIES_LENGTH);
  const armModes = (potential: (k: number) => number) =>
    legModes({ ...arm, potential: away.map((_, k) => potential(k) / Math.PI) });
  const one = (k: number) => (k === 0 ? 1 : 0);
  const left = {
    through: armModes((k) => away[k]),
    fromLeft: armModes(one),
    fromRight: armModes((k) => one(k) - away[k]),
  };
  // Stub: u = c/ζ, both inner corners at distance 1.
  const stub = {
    offset: -Math.PI * branch - Math.LN2 + (Math.PI / 2) * through + Math.log(c),
    stretch: product(
      binomialSeries(1, 0.5, SERIES_LENGTH),
      binomialSeries(-1, 0.5, SERIES_LENGTH),
      binomialSeries(1 / c, -1, SERIES_LENGTH),
      binomialSeries(-1 / c, -1, SERIES_LENGTH),
    ),
  };
  const plus = binomialSeries(1 / c, -1, SERIES_LENGTH);
  const minus = binomialSeries(-1 / c, -1, SERIES_LENGTH);
  const stubModes = (potential: (k: number) => number) =>
    legModes({ ...stub, potential: plus.map((_, k) => potential(k) / Math.PI) });
  return {
    left,
    stub: {
      // 2u/(1−u²) = 1/(1−u) − 1/(1+u).
      through: stubModes((k) => minus[k] - plus[k]),
      fromLeft: stubModes((k) => plus[k]),
      fromRight: stubModes((k) => minus[k]),
    },
  };
}

function product(...series: readonly (readonly number[])[]): readonly number[] {
  return series.reduce((so, far) => multiplySeries(so, far));
}
