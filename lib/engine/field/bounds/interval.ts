/** Sums and products that keep track of their rounding errors. */

/** Half an ulp of 1: the largest relative error of one operation. */
export const ROUNDING = 2 ** -53;

/** A number and a bound of its absolute error. */
export interface Approximate {
  readonly value: number;
  readonly error: number;
}

/** Compensated sum of non-negative or mixed terms (Neumaier 1974), with an a priori bound of its error. */
export class Accumulator {
  private sum = 0;
  private carry = 0;
  private magnitude = 0;
  private count = 0;
  private errors = 0;

  /** Adds a term that is itself known to within `error`. */
  add(value: number, error = 0): void {
    const next = this.sum + value;
    if (Math.abs(this.sum) >= Math.abs(value)) this.carry += this.sum - next + value;
    else this.carry += value - next + this.sum;
    this.sum = next;
    this.magnitude += Math.abs(value);
    this.errors += error;
    this.count++;
  }

  result(): Approximate {
    const value = this.sum + this.carry;
    // Neumaier: error ≤ u|sum| + n²u²·Σ|terms| to first order; the sums of errors are themselves rounded.
    const own = 2 * ROUNDING * Math.abs(value) + (this.count * ROUNDING) ** 2 * 2 * this.magnitude;
    return { value, error: (own + this.errors) * (1 + 4 * this.count * ROUNDING) };
  }
}

/** The next double below a finite x, or a little less: a safe rounding down of a result that had one rounding. */
export function down(x: number): number {
  return x - Math.abs(x) * 2 * ROUNDING - Number.MIN_VALUE;
}

/** The same upwards. */
export function up(x: number): number {
  return x + Math.abs(x) * 2 * ROUNDING + Number.MIN_VALUE;
}
