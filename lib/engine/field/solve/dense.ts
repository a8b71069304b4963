/**
 * Dense kernels of a front. All matrices are row-major; tiles of three by three dot products keep the accumulators in
 * registers, which is worth a factor of three over plain loops.
 */

/** Columns that are factorised together. */
const BLOCK = 16;

/**
 * Partial Cholesky of a front: `panel` holds, from `at`, n rows of k columns (of the first k rows only the lower
 * triangle counts) and is overwritten by the factor. Returns false if a pivot is not positive.
 */
export function factorPanel(panel: Float64Array, at: number, k: number, n: number): boolean {
  for (let from = 0; from < k; from += BLOCK) {
    const to = Math.min(k, from + BLOCK);
    if (from > 0) subtractProducts(panel, at, k, from, n, from, to);
    for (let i = from; i < to; i++) {
      const rowI = at + i * k;
      for (let j = from; j < i; j++) {
        const rowJ = at + j * k;
        let s = panel[rowI + j];
        for (let l = from; l < j; l++) s -= panel[rowI + l] * panel[rowJ + l];
        panel[rowI + j] = s / panel[rowJ + j];
      }
      let d = panel[rowI + i];
      for (let l = from; l < i; l++) d -= panel[rowI + l] * panel[rowI + l];
      if (!(d > 0)) return false;
      panel[rowI + i] = Math.sqrt(d);
    }
    solveRows(panel, at, k, to, n, from, to);
  }
  return true;
}

/** Rows first … n-1, columns from … to-1: divides by the transposed pivot block, three rows at a time. */
function solveRows(
  panel: Float64Array,
  at: number,
  k: number,
  first: number,
  n: number,
  from: number,
  to: number,
): void {
  let i = first;
  for (; i + 2 < n; i += 3) {
    const r0 = at + i * k;
    const r1 = r0 + k;
    const r2 = r1 + k;
    for (let j = from; j < to; j++) {
      const rowJ = at + j * k;
      let s0 = panel[r0 + j];
      let s1 = panel[r1 + j];
      let s2 = panel[r2 + j];
      for (let l = from; l < j; l++) {
        const y = panel[rowJ + l];
        s0 -= panel[r0 + l] * y;
        s1 -= panel[r1 + l] * y;
        s2 -= panel[r2 + l] * y;
      }
      const inverse = 1 / panel[rowJ + j];
      panel[r0 + j] = s0 * inverse;
      panel[r1 + j] = s1 * inverse;
      panel[r2 + j] = s2 * inverse;
    }
  }
  for (; i < n; i++) {
    const r0 = at + i * k;
    for (let j = from; j < to; j++) {
      const rowJ = at + j * k;
      let s = panel[r0 + j];
      for (let l = from; l < j; l++) s -= panel[r0 + l] * panel[rowJ + l];
      panel[r0 + j] = s / panel[rowJ + j];
    }
  }
}

/**
 * Rows first … n-1, columns from … to-1: subtracts the products of finished columns 0 … from-1. Of the pivot block
 * more than the lower triangle is touched, which does no harm.
 */
function subtractProducts(
  panel: Float64Array,
  at: number,
  k: number,
  first: number,
  n: number,
  from: number,
  to: number,
): void {
  for (let i = first; i < n; i += 3) {
    const rows = Math.min(3, n - i);
    for (let j = from; j < to; j += 3) {
      const columns = Math.min(3, to - j);
      if (rows === 3 && columns === 3) {
        tile(panel, at + i * k, at + j * k, k, from, panel, at + i * k + j, k);
      } else {
        corner(panel, at + i * k, at + j * k, k, from, rows, columns, panel, at + i * k + j, k);
      }
    }
  }
}

/**
 * border -= B·Bᵗ with B the rows k … n-1 of the panel; border is m by m with m = n-k, stride m, lower triangle.
 */
export function subtractBorder(
  panel: Float64Array,
  at: number,
  k: number,
  n: number,
  border: Float64Array,
  to: number,
): void {
  subtractSquare(panel, at + k * k, k, n - k, border, to);
}

/** target -= R·Rᵗ with R the m rows of k numbers from `base`; target has stride m, lower triangle. */
export function subtractSquare(
  rowsOf: Float64Array,
  base: number,
  k: number,
  m: number,
  target: Float64Array,
  to: number,
): void {
  for (let i = 0; i < m; i += 3) {
    const rows = Math.min(3, m - i);
    for (let j = 0; j <= i; j += 3) {
      const columns = Math.min(3, m - j);
      if (rows === 3 && columns === 3) {
        tile(rowsOf, base + i * k, base + j * k, k, k, target, to + i * m + j, m);
      } else {
        corner(rowsOf, base + i * k, base + j * k, k, k, rows, columns, target, to + i * m + j, m);
      }
    }
  }
}

/** target[3×3] -= X·Yᵗ, X and Y three rows of `a` from p and q with stride k, over `length` columns. */
function tile(
  a: Float64Array,
  p: number,
  q: number,
  k: number,
  length: number,
  target: Float64Array,
  at: number,
  stride: number,
): void {
  let p0 = p;
  let p1 = p + k;
  let p2 = p1 + k;
  let q0 = q;
  let q1 = q + k;
  let q2 = q1 + k;
  let c00 = 0;
  let c01 = 0;
  let c02 = 0;
  let c10 = 0;
  let c11 = 0;
  let c12 = 0;
  let c20 = 0;
  let c21 = 0;
  let c22 = 0;
  for (const end = p0 + length; p0 < end; p0++, p1++, p2++, q0++, q1++, q2++) {
    const x0 = a[p0];
    const x1 = a[p1];
    const x2 = a[p2];
    const y0 = a[q0];
    const y1 = a[q1];
    const y2 = a[q2];
    c00 += x0 * y0;
    c01 += x0 * y1;
    c02 += x0 * y2;
    c10 += x1 * y0;
    c11 += x1 * y1;
    c12 += x1 * y2;
    c20 += x2 * y0;
    c21 += x2 * y1;
    c22 += x2 * y2;
  }
  target[at] -= c00;
  target[at + 1] -= c01;
  target[at + 2] -= c02;
  const at1 = at + stride;
  target[at1] -= c10;
  target[at1 + 1] -= c11;
  target[at1 + 2] -= c12;
  const at2 = at1 + stride;
  target[at2] -= c20;
  target[at2 + 1] -= c21;
  target[at2 + 2] -= c22;
}

/** The same for what is left over at the edges. */
function corner(
  a: Float64Array,
  p: number,
  q: number,
  k: number,
  length: number,
  rows: number,
  columns: number,
  target: Float64Array,
  at: number,
  stride: number,
): void {
  for (let i = 0; i < rows; i++) {
    const x = p + i * k;
    for (let j = 0; j < columns; j++) {
      const y = q + j * k;
      let s = 0;
      for (let l = 0; l < length; l++) s += a[x + l] * a[y + l];
      target[at + i * stride + j] -= s;
    }
  }
}
