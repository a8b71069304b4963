/**
 * Summation with a running correction (Neumaier 1974): the error of a sum of n terms of one sign stays near one
 * rounding of the sum instead of growing with n.
 */
export class CompensatedSum {
  private sum = 0;
  private correction = 0;

  add(term: number): void {
    const next = this.sum + term;
    this.correction += Math.abs(this.sum) >= Math.abs(term) ? this.sum - next + term : term - next + this.sum;
    this.sum = next;
  }

  /** The sum so far; an overflow shows as ±Infinity. */
  get value(): number {
    return Number.isFinite(this.sum) ? this.sum + this.correction : this.sum;
  }
}
