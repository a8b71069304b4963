/** Small dense systems, by Gaussian elimination with partial pivoting. */

/**
 * Solves A·x = b for a square A given by rows; both arguments are left as they are.
 * @returns x; entries are NaN or infinite where the matrix is singular in floating point.
 */
export function solveDense(rows: readonly (readonly number[])[], right: readonly number[]): number[] {
  const size = right.length;
  const a = rows.map((row, i) => [...row, right[i]]);
  for (let k = 0; k < size; k++) {
    let pivot = k;
    for (let i = k + 1; i < size; i++) if (Math.abs(a[i][k]) > Math.abs(a[pivot][k])) pivot = i;
    [a[k], a[pivot]] = [a[pivot], a[k]];
    for (let i = k + 1; i < size; i++) {
      const factor = a[i][k] / a[k][k];
      if (factor === 0) continue;
      for (let j = k; j <= size; j++) a[i][j] -= factor * a[k][j];
    }
  }
  const x = new Array<number>(size).fill(0);
  for (let i = size - 1; i >= 0; i--) {
    let sum = a[i][size];
    for (let j = i + 1; j < size; j++) sum -= a[i][j] * x[j];
    x[i] = sum / a[i][i];
  }
  return x;
}
