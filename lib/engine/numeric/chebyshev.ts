/** Chebyshev expansions on an interval, summed by Clenshaw's recurrence. */

export interface ChebyshevSeries {
  readonly from: number;
  readonly to: number;
  /** Coefficients of T₀, T₁, …; the first is not halved. */
  readonly coefficients: readonly number[];
}

/** Σ cⱼ·Tⱼ(t), t = (2x − from − to)/(to − from), for x within the interval. */
export function sumChebyshev({ from, to, coefficients }: ChebyshevSeries, x: number): number {
  const t = (2 * x - from - to) / (to - from);
  let next = 0;
  let afterNext = 0;
  for (let j = coefficients.length - 1; j >= 1; j--) {
    const current = coefficients[j] + 2 * t * next - afterNext;
    afterNext = next;
    next = current;
  }
  return coefficients[0] + t * next - afterNext;
}
