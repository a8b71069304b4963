/**
 * Tables of the basis at quadrature points, and element matrices for a conductivity that varies inside the element.
 */

import { subtractSquare } from "../solve/dense";
import { ALL_FUNCTIONS, evaluateBasis } from "./basis";
import type { ElementLayout } from "./layout";
import { ALL_MODES, evaluateModes } from "./modes";
import { triangleRule, type TriangleRule } from "./quadrature";

export interface SampleTable {
  readonly rule: TriangleRule;
  /** Reference derivatives by function and point: [f * count + q]. */
  readonly xi: Float64Array;
  readonly eta: Float64Array;
  /** Orthonormal polynomials by mode and point. */
  readonly modes: Float64Array;
}

const tables = new Map<number, SampleTable>();

/**
 * Table for a rule of at least this degree. The rule's points crowd at one vertex, 2 unless another is asked for: an
 * integrand that is homogeneous around that vertex is then integrated well, whether smooth there or not.
 */
export function sampleTable(degree: number, crowdedVertex = 2): SampleTable {
  const base = triangleRule(degree);
  const key = 3 * base.count + crowdedVertex;
  const known = tables.get(key);
  if (known) return known;
  const rule = turned(base, crowdedVertex);
  const { count } = rule;
  const table = {
    rule,
    xi: new Float64Array(ALL_FUNCTIONS * count),
    eta: new Float64Array(ALL_FUNCTIONS * count),
    modes: new Float64Array(ALL_MODES * count),
  };
  const [value, dx, dy] = [0, 1, 2].map(() => new Float64Array(ALL_FUNCTIONS));
  const modes = new Float64Array(ALL_MODES);
  for (let q = 0; q < count; q++) {
    evaluateBasis(rule.xi[q], rule.eta[q], value, dx, dy);
    evaluateModes(rule.xi[q], rule.eta[q], modes);
    for (let f = 0; f < ALL_FUNCTIONS; f++) {
      table.xi[f * count + q] = dx[f];
      table.eta[f * count + q] = dy[f];
    }
    for (let k = 0; k < ALL_MODES; k++) table.modes[k * count + q] = modes[k];
  }
  tables.set(key, table);
  return table;
}

/** The rule with its vertices renamed such that vertex 2 becomes `vertex`. */
function turned(rule: TriangleRule, vertex: number): TriangleRule {
  if (vertex === 2) return rule;
  const bary = [rule.xi.map((x, q) => 1 - x - rule.eta[q]), rule.xi, rule.eta];
  return { ...rule, xi: bary[(1 + 2 - vertex) % 3], eta: bary[(2 + 2 - vertex) % 3] };
}

/**
 * Fills `work` (row-major, stride layout.size, lower triangle) with the matrix of ∫s grad·grad, `s` holding the
 * weight's values at the table's points. `rows` is scratch space of size·2·count numbers.
 */
export function fillSampledStiffness(
  layout: ElementLayout,
  table: SampleTable,
  s: Float64Array,
  x1: number,
  y1: number,
  x2: number,
  y2: number,
  rows: Float64Array,
  work: Float64Array,
): void {
  const { size, functions } = layout;
  const { count, weights } = table.rule;
  const det = x1 * y2 - x2 * y1;
  const root = new Float64Array(count);
  for (let q = 0; q < count; q++) root[q] = Math.sqrt((weights[q] * s[q]) / det);
  for (let i = 0; i < size; i++) {
    const from = functions[i] * count;
    const to = i * 2 * count;
    for (let q = 0; q < count; q++) {
      const a = table.xi[from + q];
      const b = table.eta[from + q];
      rows[to + q] = root[q] * (y2 * a - y1 * b);
      rows[to + count + q] = root[q] * (x1 * b - x2 * a);
    }
  }
  for (let i = 0; i < size * size; i++) work[i] = 0;
  subtractSquare(rows, 0, 2 * count, size, work, 0);
  for (let i = 0; i < size; i++) for (let j = 0; j <= i; j++) work[i * size + j] = -work[i * size + j];
}

/**
 * After `condense` on `work`: the matrix that gives the interior values from the outer ones, row-major by interior
 * function, written to `out` from `at` (interior · outer numbers).
 */
export function interiorFromOuter(
  size: number,
  interior: number,
  work: Float64Array,
  out: Float64Array,
  at: number,
): void {
  const outer = size - interior;
  for (let j = 0; j < outer; j++) {
    const row = (interior + j) * size;
    // Solve Lᵀ r = (row of the factor); the sign is that of the Schur complement.
    for (let i = interior - 1; i >= 0; i--) {
      let v = -work[row + i];
      for (let k = i + 1; k < interior; k++) v -= work[k * size + i] * out[at + k * outer + j];
      out[at + i * outer + j] = v / work[i * size + i];
    }
  }
}
