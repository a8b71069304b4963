/**
 * Dense systems of a few hundred unknowns by Gaussian elimination with partial pivoting (Golub and Van Loan, Matrix
 * Computations, 3.4), in place on one typed array.
 */

/**
 * Solves A·x = b.
 * @param matrix n·n values row by row; overwritten.
 * @param right n values; overwritten by the solution and returned.
 * @throws RangeError where the matrix is singular.
 */
export function solveInPlace(matrix: Float64Array, right: Float64Array): Float64Array {
  const n = right.length;
  if (matrix.length !== n * n) throw new RangeError("the matrix does not fit the right side");
  for (let k = 0; k < n; k++) {
    let pivot = k;
    for (let i = k + 1; i < n; i++) {
      if (Math.abs(matrix[i * n + k]) > Math.abs(matrix[pivot * n + k])) pivot = i;
    }
    const head = matrix[pivot * n + k];
    if (!(Math.abs(head) > 0)) throw new RangeError("the matrix is singular");
    if (pivot !== k) {
      for (let j = k; j < n; j++) {
        const kept = matrix[k * n + j];
        matrix[k * n + j] = matrix[pivot * n + j];
        matrix[pivot * n + j] = kept;
      }
      const kept = right[k];
      right[k] = right[pivot];
      right[pivot] = kept;
    }
    for (let i = k + 1; i < n; i++) {
      const factor = matrix[i * n + k] / head;
      if (factor === 0) continue;
      for (let j = k + 1; j < n; j++) matrix[i * n + j] -= factor * matrix[k * n + j];
      right[i] -= factor * right[k];
    }
  }
  for (let i = n - 1; i >= 0; i--) {
    let sum = right[i];
    for (let j = i + 1; j < n; j++) sum -= matrix[i * n + j] * right[j];
    right[i] = sum / matrix[i * n + i];
  }
  return right;
}
