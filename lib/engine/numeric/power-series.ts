/** Truncated power series as coefficient arrays: what the composition of two maps near a point needs. */

/** Product of two series, as long as the shorter one. */
export function multiplySeries(a: readonly number[], b: readonly number[]): number[] {
  const length = Math.min(a.length, b.length);
  const product = new Array<number>(length).fill(0);
  for (let i = 0; i < length; i++) {
    for (let j = 0; i + j < length; j++) product[i + j] += a[i] * b[j];
  }
  return product;
}

/** (1 + x·u)^power to `length` terms, the binomial series. */
export function binomialSeries(x: number, power: number, length: number): number[] {
  const series = [1];
  for (let k = 1; k < length; k++) series.push((series[k - 1] * x * (power - k + 1)) / k);
  return series;
}

/** exp of a series without constant term, by the recurrence k·eₖ = Σ j·aⱼ·e₍ₖ₋ⱼ₎; the constant term given is ignored. */
export function exponentialSeries(a: readonly number[]): number[] {
  const series = [1];
  for (let k = 1; k < a.length; k++) {
    let sum = 0;
    for (let j = 1; j <= k; j++) sum += j * a[j] * series[k - j];
    series.push(sum / k);
  }
  return series;
}
