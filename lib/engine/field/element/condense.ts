/**
 * Element matrices and the elimination of interior functions.
 *
 * For constant conductivity the matrix for conductivity s is s times the matrix for 1, and so is its condensed form:
 * the potential (weight σ) and the stream function (weight 1/σ) share both.
 */

import type { ElementLayout } from "./layout";

/** The largest element: 66 functions at order 10. */
export const LARGEST_ELEMENT = 66;

/**
 * Fills `work` (row-major, stride layout.size, lower triangle) with the matrix of ∫grad·grad on the triangle whose
 * edges from its first vertex are (x1, y1) and (x2, y2).
 */
export function fillStiffness(
  layout: ElementLayout,
  x1: number,
  y1: number,
  x2: number,
  y2: number,
  work: Float64Array,
): void {
  const { size, stiffA, stiffB, stiffC } = layout;
  const det = x1 * y2 - x2 * y1;
  const a = (x2 * x2 + y2 * y2) / det;
  const b = -(x1 * x2 + y1 * y2) / det;
  const c = (x1 * x1 + y1 * y1) / det;
  for (let i = 0, from = 0; i < size; i++) {
    for (let j = 0, to = i * size; j <= i; j++, from++, to++) {
      work[to] = a * stiffA[from] + b * stiffB[from] + c * stiffC[from];
    }
  }
}

/**
 * Eliminates the interior functions of the matrix in `work` (Cholesky in place: the first `interior` columns then
 * hold the factor) and writes the lower triangle of what remains, packed by rows, to `out` from `at`.
 */
export function condense(
  size: number,
  interior: number,
  work: Float64Array,
  out: Float64Array,
  at: number,
): void {
  eliminate(size, size, interior, work);
  for (let i = interior, to = at; i < size; i++) {
    for (let j = interior; j <= i; j++, to++) {
      let s = work[i * size + j];
      for (let k = 0, p = i * size, q = j * size; k < interior; k++, p++, q++) s -= work[p] * work[q];
      out[to] = s;
    }
  }
}

/** Cholesky on the first `interior` columns of the first `rows` rows. */
export function eliminate(size: number, rows: number, interior: number, work: Float64Array): void {
  for (let j = 0; j < interior; j++) {
    const rowJ = j * size;
    let d = work[rowJ + j];
    for (let k = rowJ; k < rowJ + j; k++) d -= work[k] * work[k];
    d = Math.sqrt(d);
    work[rowJ + j] = d;
    const inverse = 1 / d;
    for (let i = j + 1; i < rows; i++) {
      const rowI = i * size;
      let s = work[rowI + j];
      for (let k = 0; k < j; k++) s -= work[rowI + k] * work[rowJ + k];
      work[rowI + j] = s * inverse;
    }
  }
}

/**
 * Values of the interior functions that minimise the energy for given outer values: `values` holds `size` numbers,
 * the outer ones from `interior` on; the interior ones are filled in. `work` holds the full matrix (lower triangle)
 * and is overwritten in its interior block.
 */
export function recoverInterior(
  size: number,
  interior: number,
  work: Float64Array,
  values: Float64Array,
): void {
  if (interior === 0) return;
  for (let i = 0; i < interior; i++) values[i] = 0;
  for (let i = interior; i < size; i++) {
    const v = values[i];
    if (v === 0) continue;
    for (let k = 0, p = i * size; k < interior; k++, p++) values[k] -= work[p] * v;
  }
  eliminate(size, interior, interior, work);
  for (let i = 0; i < interior; i++) {
    let s = values[i];
    for (let k = 0; k < i; k++) s -= work[i * size + k] * values[k];
    values[i] = s / work[i * size + i];
  }
  for (let i = interior - 1; i >= 0; i--) {
    let s = values[i];
    for (let k = i + 1; k < interior; k++) s -= work[k * size + i] * values[k];
    values[i] = s / work[i * size + i];
  }
}
