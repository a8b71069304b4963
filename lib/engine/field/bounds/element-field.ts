/**
 * The gradient of a discrete solution in one element, as coefficients of orthonormal polynomials.
 *
 * Outer values come from the linear system, interior ones minimise the element's energy. With the coefficients a, b of
 * the reference derivatives the physical gradient times √det is
 *   (p_k, q_k) = ((y2 a_k - y1 b_k), (x1 b_k - x2 a_k))/√det,
 * and Σ p_k² + q_k² is ∫|grad|² over the triangle. The same numbers serve rot ψ = (q, -p).
 */

import { fillStiffness, LARGEST_ELEMENT, recoverInterior } from "../element/condense";
import { ALL_MODES } from "../element/modes";
import { localUnknowns, MOST_OUTER } from "../solve/assemble";
import type { LinearSystem } from "../solve/system";
import { dependentEdges, hasTerms } from "../solve/terms";
import type { DiscreteField } from "../solve/pair";
import { ROUNDING } from "./interval";

/** Bound of the error of the tabulated gradient coefficients, relative to the root of the sum of their squares. */
export const TABLE_ERROR = 64 * ROUNDING;

/** Scratch space for one evaluator of fields. */
export class ElementField {
  /** Local values in the layout's order: interior, vertices, edges (turned to the element's own direction). */
  readonly values = new Float64Array(LARGEST_ELEMENT);
  readonly p = new Float64Array(ALL_MODES);
  readonly q = new Float64Array(ALL_MODES);
  /** Bound of the error of the vector (p, q) in the Euclidean norm, set by `gradient`. */
  error = 0;
  private readonly work = new Float64Array(LARGEST_ELEMENT * LARGEST_ELEMENT);
  private readonly local = new Int32Array(MOST_OUTER);
  private vertexError = 0;

  /** Reads the outer values of triangle t. */
  load(system: LinearSystem, field: DiscreteField, t: number): void {
    const { set, map, structure } = system;
    const layout = set.layouts[t];
    const { interior, edgeStart, edgeOrder } = layout;
    const n = localUnknowns(system, t, this.local);
    for (let i = 0; i < n; i++) {
      const u = this.local[i];
      this.values[interior + i] = u >= 0 ? field.x[u] : u === -1 ? 0 : field.prescribed[-2 - u];
    }
    this.vertexError = 0;
    if (map.jumps) {
      const { start, entity, sign } = map.jumps;
      for (let i = 0; i < 3; i++) {
        for (let k = start[3 * t + i]; k < start[3 * t + i + 1]; k++) {
          const before = this.values[interior + i];
          const jump = sign[k] * field.x[structure.entityFirst[entity[k]]];
          this.values[interior + i] = before + jump;
          this.vertexError += 2 * ROUNDING * (Math.abs(before) + 2 * Math.abs(jump));
        }
      }
    }
    if (map.axis && hasTerms(system, t)) {
      for (const { place, low, high, weights } of dependentEdges(system, t)) {
        let sum = weights.low * this.values[interior + low] + weights.high * this.values[interior + high];
        weights.modes.forEach((w, m) => (sum += w * this.values[interior + place + 1 + m]));
        this.values[interior + place] = sum;
      }
    }
    const reversed = set.reversed[t];
    for (let i = 0; i < 3; i++) {
      if (((reversed >> i) & 1) === 0) continue;
      const from = interior + edgeStart[i];
      for (let m = 1; m < edgeOrder[i] - 1; m += 2) this.values[from + m] = -this.values[from + m];
    }
  }

  /** Finds the interior values, those that minimise the element's energy. */
  recover(system: LinearSystem, t: number): void {
    const layout = system.set.layouts[t];
    const { interior, outer } = layout;
    if (interior === 0) return;
    if (system.sampled?.functionOf[t]) {
      const { recovery, recoveryStart } = system.sampled;
      for (let i = 0, at = recoveryStart[t]; i < interior; i++) {
        let s = 0;
        for (let j = 0; j < outer; j++, at++) s += recovery[at] * this.values[interior + j];
        this.values[i] = s;
      }
      return;
    }
    const { xy, triangles } = system.set.mesh;
    const a = 2 * triangles[3 * t];
    const b = 2 * triangles[3 * t + 1];
    const c = 2 * triangles[3 * t + 2];
    fillStiffness(
      layout,
      xy[b] - xy[a],
      xy[b + 1] - xy[a + 1],
      xy[c] - xy[a],
      xy[c + 1] - xy[a + 1],
      this.work,
    );
    recoverInterior(layout.size, layout.interior, this.work, this.values);
  }

  /** Fills p, q and `error` from the local values. */
  gradient(system: LinearSystem, t: number): void {
    const layout = system.set.layouts[t];
    const { size, interior, modes, modesXi, modesEta } = layout;
    const { xy, triangles } = system.set.mesh;
    const ia = 2 * triangles[3 * t];
    const ib = 2 * triangles[3 * t + 1];
    const ic = 2 * triangles[3 * t + 2];
    const x1 = xy[ib] - xy[ia];
    const y1 = xy[ib + 1] - xy[ia + 1];
    const x2 = xy[ic] - xy[ia];
    const y2 = xy[ic + 1] - xy[ia + 1];
    const { values, p, q } = this;
    // Vertex values enter only by their differences, which lose nothing by cancellation.
    const d1 = values[interior + 1] - values[interior];
    const d2 = values[interior + 2] - values[interior];
    let square = 0;
    for (let f = 0; f < interior; f++) square += values[f] * values[f];
    for (let f = interior + 3; f < size; f++) square += values[f] * values[f];
    const det = x1 * y2 - x2 * y1;
    const scale = 1 / Math.sqrt(det);
    let length = 0;
    for (let k = 0, row = 0; k < modes; k++, row += size) {
      let a = 0;
      let b = 0;
      for (let f = 0; f < interior; f++) {
        a += modesXi[row + f] * values[f];
        b += modesEta[row + f] * values[f];
      }
      for (let f = interior + 3; f < size; f++) {
        a += modesXi[row + f] * values[f];
        b += modesEta[row + f] * values[f];
      }
      if (k === 0) {
        a += d1 * Math.SQRT1_2;
        b += d2 * Math.SQRT1_2;
      }
      length += a * a + b * b;
      p[k] = (y2 * a - y1 * b) * scale;
      q[k] = (x1 * b - x2 * a) * scale;
    }
    // Errors of the coefficients: table, dot products, differences; then those of the map to the plane.
    const ofModes =
      (TABLE_ERROR + 2 * (size + 4) * ROUNDING) * Math.sqrt(layout.modesNorm * square) +
      4 * ROUNDING * (Math.abs(d1) + Math.abs(d2)) +
      2 * this.vertexError;
    const spread = (Math.hypot(x1, y1) + Math.hypot(x2, y2)) * scale;
    const shape = (Math.abs(x1 * y2) + Math.abs(x2 * y1)) / det;
    this.error = spread * (ofModes + (12 + 4 * shape) * ROUNDING * Math.sqrt(length)) * (1 + 1e-6);
  }
}
