/**
 * Interior functions of a triangle with an edge on the axis of a body of revolution.
 *
 * The stream function's derivative across that edge must vanish. It is a polynomial of degree q-1 along the edge (q the
 * order of the interior) that vanishes at both ends already (see `assembly/axis`), so q-2 further points make it
 * zero; these conditions fix as many combinations of the interior functions. Here the remaining ones are found once
 * for every kind of element (orthogonal null space), and the energy is minimised over them.
 */

import { ALL_FUNCTIONS, evaluateBasis } from "./basis";
import type { ElementLayout } from "./layout";
import { gaussRule } from "./quadrature";

interface EdgeConditions {
  /** Number of free combinations. */
  readonly free: number;
  /** Interior values that meet the conditions, from the outer ones: interior × outer. */
  readonly particular: Float64Array;
  /** Columns are the free combinations: interior × free. */
  readonly nullSpace: Float64Array;
}

const known = new WeakMap<ElementLayout, (EdgeConditions | undefined)[]>();

/** Reference direction across local edge i. */
const ACROSS = [
  [-0.5, -0.5],
  [1, -0.5],
  [-0.5, 1],
] as const;

const VERTICES = [
  [0, 0],
  [1, 0],
  [0, 1],
] as const;

function edgeConditions(layout: ElementLayout, edge: number): EdgeConditions {
  const list = known.get(layout) ?? [];
  known.set(layout, list);
  return (list[edge] ??= makeConditions(layout, edge));
}

function makeConditions(layout: ElementLayout, edge: number): EdgeConditions {
  const { interior, outer, order, functions, size } = layout;
  const count = Math.max(0, order - 2);
  const [value, dx, dy] = [0, 1, 2].map(() => new Float64Array(ALL_FUNCTIONS));
  const a = VERTICES[(edge + 1) % 3];
  const b = VERTICES[(edge + 2) % 3];
  const rows = Array.from({ length: count }, (_, r) => {
    const t = (1 + gaussRule(count).nodes[r]) / 2;
    evaluateBasis(a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1]), value, dx, dy);
    return Float64Array.from({ length: size }, (_, f) => {
      const g = functions[f];
      return dx[g] * ACROSS[edge][0] + dy[g] * ACROSS[edge][1];
    });
  });
  // Gram–Schmidt (twice) on the conditions, then on the unit vectors for the rest.
  const basis: Float64Array[] = [];
  const orthogonal = (v: Float64Array): number => {
    for (let pass = 0; pass < 2; pass++) {
      for (const q of basis) {
        let s = 0;
        for (let i = 0; i < interior; i++) s += q[i] * v[i];
        for (let i = 0; i < interior; i++) v[i] -= s * q[i];
      }
    }
    return Math.hypot(...v);
  };
  const triangular = rows.map((row) => {
    const v = row.slice(0, interior);
    const before = row.slice(0, interior);
    const length = orthogonal(v);
    basis.push(v.map((x) => x / length));
    return basis.map((q) => q.reduce((s, x, i) => s + x * before[i], 0));
  });
  const particular = new Float64Array(interior * outer);
  for (let j = 0; j < outer; j++) {
    const y: number[] = [];
    for (let r = 0; r < count; r++) {
      let s = -rows[r][interior + j];
      for (let k = 0; k < r; k++) s -= triangular[r][k] * y[k];
      y.push(s / triangular[r][r]);
      for (let i = 0; i < interior; i++) particular[i * outer + j] += y[r] * basis[r][i];
    }
  }
  while (basis.length < interior) basis.push(widestDirection(basis, interior, orthogonal));
  const free = interior - count;
  const nullSpace = new Float64Array(interior * free);
  for (let k = 0; k < free; k++) {
    for (let i = 0; i < interior; i++) nullSpace[i * free + k] = basis[count + k][i];
  }
  return { free, particular, nullSpace };
}

/** The unit vector that keeps most of its length orthogonal to the basis, normalised. */
function widestDirection(
  basis: readonly Float64Array[],
  n: number,
  orthogonal: (v: Float64Array) => number,
): Float64Array {
  let best = 0;
  let bestLeft = -1;
  for (let i = 0; i < n; i++) {
    let left = 1;
    for (const q of basis) left -= q[i] * q[i];
    if (left > bestLeft) {
      bestLeft = left;
      best = i;
    }
  }
  const v = new Float64Array(n);
  v[best] = 1;
  const length = orthogonal(v);
  return v.map((x) => x / length);
}

/**
 * For the full matrix in `work` (row-major, stride size, lower triangle): the interior values that minimise the energy
 * under the conditions, as a matrix interior × outer in `recovery` from `at`, and the condensed matrix, packed
 * by rows, in `out` from `to`.
 */
export function condenseAtAxis(
  layout: ElementLayout,
  edge: number,
  work: Float64Array,
  recovery: Float64Array,
  at: number,
  out: Float64Array,
  to: number,
): void {
  const { interior, outer, size } = layout;
  const { free, particular, nullSpace } = edgeConditions(layout, edge);
  const k = (i: number, j: number): number => (i >= j ? work[i * size + j] : work[j * size + i]);
  // Right-hand sides: K·(particular, one) for the interior rows, then projected onto the free combinations.
  const forced = new Float64Array(interior * outer);
  for (let i = 0; i < interior; i++) {
    for (let j = 0; j < outer; j++) {
      let s = k(i, interior + j);
      for (let l = 0; l < interior; l++) s += k(i, l) * particular[l * outer + j];
      forced[i * outer + j] = s;
    }
  }
  const y = solveFree(interior, outer, free, nullSpace, k, forced);
  for (let i = 0; i < interior; i++) {
    for (let j = 0; j < outer; j++) {
      let s = particular[i * outer + j];
      for (let c = 0; c < free; c++) s += nullSpace[i * free + c] * y[c * outer + j];
      recovery[at + i * outer + j] = s;
    }
  }
  for (let a = 0, p = to; a < outer; a++) {
    for (let b = 0; b <= a; b++, p++) {
      // Symmetric form of [R; 1]ᵀ K [R; 1].
      let s = k(interior + a, interior + b);
      for (let i = 0; i < interior; i++) {
        const ra = recovery[at + i * outer + a];
        const rb = recovery[at + i * outer + b];
        s += ra * k(i, interior + b) + rb * k(i, interior + a);
        let inner = 0;
        for (let l = 0; l < interior; l++) inner += k(i, l) * recovery[at + l * outer + b];
        s += ra * inner;
      }
      out[p] = s;
    }
  }
}

/** Solves (ZᵀKZ)·Y = -Zᵀ·forced by Cholesky; returns free × outer numbers. */
function solveFree(
  interior: number,
  outer: number,
  free: number,
  z: Float64Array,
  k: (i: number, j: number) => number,
  forced: Float64Array,
): Float64Array {
  const a = new Float64Array(free * free);
  const y = new Float64Array(free * outer);
  for (let c = 0; c < free; c++) {
    const kz = Float64Array.from({ length: interior }, (_, i) => {
      let s = 0;
      for (let l = 0; l < interior; l++) s += k(i, l) * z[l * free + c];
      return s;
    });
    for (let d = 0; d < free; d++) {
      for (let i = 0; i < interior; i++) a[d * free + c] += z[i * free + d] * kz[i];
    }
    for (let j = 0; j < outer; j++) {
      for (let i = 0; i < interior; i++) y[c * outer + j] -= z[i * free + c] * forced[i * outer + j];
    }
  }
  for (let c = 0; c < free; c++) {
    for (let d = c; d < free; d++) {
      let s = a[d * free + c];
      for (let l = 0; l < c; l++) s -= a[d * free + l] * a[c * free + l];
      a[d * free + c] = d === c ? Math.sqrt(s) : s / a[c * free + c];
    }
  }
  for (let j = 0; j < outer; j++) {
    for (let c = 0; c < free; c++) {
      for (let l = 0; l < c; l++) y[c * outer + j] -= a[c * free + l] * y[l * outer + j];
      y[c * outer + j] /= a[c * free + c];
    }
    for (let c = free - 1; c >= 0; c--) {
      for (let l = c + 1; l < free; l++) y[c * outer + j] -= a[l * free + c] * y[l * outer + j];
      y[c * outer + j] /= a[c * free + c];
    }
  }
  return y;
}
