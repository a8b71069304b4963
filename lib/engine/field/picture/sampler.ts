/**
 * Values of a field map at points.
 *
 * Plan: the field is in V/m and the density the sheet's, in A/m. Axisymmetric: the density is in A/m². Both are for one
 * volt between the terminals of the picture.
 */

import { ALL_FUNCTIONS, evaluateBasis } from "../element/basis";
import type { ElementLayout } from "../element/layout";
import { TriangleIndex } from "../mesh/locate";
import { layoutOf, type FieldMap } from "./field-map";

export interface PointValues {
  /** Volts. */
  readonly potential: number;
  /** Amperes between this point and the zero of the stream function. */
  readonly stream: number;
  /** Components of E in V/m. */
  readonly field: readonly [number, number];
  /** Components of J: A/m for a sheet, A/m² for a body of revolution. */
  readonly density: readonly [number, number];
}

export class FieldSampler {
  private readonly value = new Float64Array(ALL_FUNCTIONS);
  private readonly dx = new Float64Array(ALL_FUNCTIONS);
  private readonly dy = new Float64Array(ALL_FUNCTIONS);
  private index: TriangleIndex | null = null;
  private readonly layouts: (ElementLayout | undefined)[] = [];

  constructor(readonly map: FieldMap) {}

  /** Triangle at a point of the domain's frame, or -1 outside. */
  triangleAt(x: number, y: number): number {
    const { map } = this;
    this.index ??= new TriangleIndex(map);
    return this.index.find(x, y);
  }

  /** Values at a point of the outline, in its own unit; null outside the conductor. */
  at(x: number, y: number): PointValues | null {
    const { origin, scale } = this.map;
    return this.atDomain((x - origin[0]) / scale, (y - origin[1]) / scale);
  }

  /** Values at a point of the domain's frame; null outside the conductor. */
  atDomain(x: number, y: number): PointValues | null {
    const t = this.triangleAt(x, y);
    return t < 0 ? null : this.inTriangle(t, x, y);
  }

  /** Values in triangle t at a point of the domain's frame. */
  inTriangle(t: number, x: number, y: number): PointValues {
    const { map } = this;
    const { xy, triangles, unitM } = map;
    const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
    const x1 = xy[b] - xy[a];
    const y1 = xy[b + 1] - xy[a + 1];
    const x2 = xy[c] - xy[a];
    const y2 = xy[c + 1] - xy[a + 1];
    const det = x1 * y2 - x2 * y1;
    const xi = ((x - xy[a]) * y2 - (y - xy[a + 1]) * x2) / det;
    const eta = ((y - xy[a + 1]) * x1 - (x - xy[a]) * y1) / det;
    const v = this.evaluate(map.potential, t, xi, eta);
    const s = this.evaluate(map.stream, t, xi, eta);
    // Physical derivatives in domain units, then per metre.
    const scale = 1 / (det * unitM);
    const vx = (y2 * v.dx - y1 * v.dy) * scale;
    const vy = (x1 * v.dy - x2 * v.dx) * scale;
    const sx = (y2 * s.dx - y1 * s.dy) * scale;
    const sy = (x1 * s.dy - x2 * s.dx) * scale;
    const turn = map.axisymmetric ? 1 / (2 * Math.PI * Math.max(x, 1e-300) * unitM) : 1;
    return {
      potential: v.value,
      stream: s.value,
      field: [-vx, -vy],
      density: [sy * turn, -sx * turn],
    };
  }

  /** Potential and stream function at reference coordinates of triangle t. */
  potentialAndStream(t: number, xi: number, eta: number): [number, number] {
    const v = this.evaluate(this.map.potential, t, xi, eta).value;
    return [v, this.evaluate(this.map.stream, t, xi, eta).value];
  }

  private evaluate(coefficients: Float64Array, t: number, xi: number, eta: number) {
    const layout = (this.layouts[t] ??= layoutOf(this.map, t));
    const { size, functions } = layout;
    evaluateBasis(xi, eta, this.value, this.dx, this.dy);
    const start = this.map.start[t];
    let value = 0;
    let dx = 0;
    let dy = 0;
    for (let i = 0; i < size; i++) {
      const f = functions[i];
      const c = coefficients[start + i];
      value += c * this.value[f];
      dx += c * this.dx[f];
      dy += c * this.dy[f];
    }
    return { value, dx, dy };
  }
}
