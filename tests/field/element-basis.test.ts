import Decimal from "decimal.js";
import { describe, expect, it } from "vitest";
import {
  ALL_FUNCTIONS,
  edgeFunction,
  evaluateBasis,
  FIRST_INTERIOR,
  functionScale,
  MAX_ORDER,
} from "@/lib/engine/field/element/basis";
import { fillStiffness, LARGEST_ELEMENT } from "@/lib/engine/field/element/condense";
import { elementLayout } from "@/lib/engine/field/element/layout";
import { ALL_MODES, evaluateModes, gradientModes } from "@/lib/engine/field/element/modes";
import { gaussRule, triangleRule } from "@/lib/engine/field/element/quadrature";
import { TABLE_ERROR } from "@/lib/engine/field/bounds/element-field";
import { exactGradients } from "./support/exact-gradients";

describe("quadrature", () => {
  it.each([1, 2, 5, 11, 20])("integrates powers on the line with %i points", (n) => {
    const { nodes, weights } = gaussRule(n);
    for (let k = 0; k < 2 * n; k++) {
      const sum = nodes.reduce((s, x, i) => s + weights[i] * x ** k, 0);
      expect(sum).toBeCloseTo(k % 2 === 0 ? 2 / (k + 1) : 0, 13);
    }
  });

  it.each([1, 4, 9, 16, 30])("integrates monomials on the triangle to degree %i", (degree) => {
    const rule = triangleRule(degree);
    const factorial = (n: number): number => (n < 2 ? 1 : n * factorial(n - 1));
    for (let a = 0; a <= degree; a++) {
      for (let b = 0; a + b <= degree; b++) {
        let sum = 0;
        for (let q = 0; q < rule.count; q++) sum += rule.weights[q] * rule.xi[q] ** a * rule.eta[q] ** b;
        // ∫ x^a y^b over the reference triangle = a! b!/(a+b+2)!
        const exact = (factorial(a) * factorial(b)) / factorial(a + b + 2);
        expect(Math.abs(sum - exact)).toBeLessThan(1e-14 * 0.5);
      }
    }
  });
});

describe("basis", () => {
  const arrays = (): [Float64Array, Float64Array, Float64Array] => [
    new Float64Array(ALL_FUNCTIONS),
    new Float64Array(ALL_FUNCTIONS),
    new Float64Array(ALL_FUNCTIONS),
  ];

  it("has derivatives that agree with differences", () => {
    const [v, dx, dy] = arrays();
    const [p, a, b] = arrays();
    const [m] = arrays();
    const h = 1e-6;
    for (const [x, y] of [
      [0.2, 0.3],
      [0.61, 0.11],
      [0.05, 0.9],
    ]) {
      evaluateBasis(x, y, v, dx, dy);
      evaluateBasis(x + h, y, p, a, b);
      evaluateBasis(x - h, y, m, a, b);
      for (let f = 0; f < ALL_FUNCTIONS; f++) expect(dx[f]).toBeCloseTo((p[f] - m[f]) / (2 * h), 5);
      evaluateBasis(x, y + h, p, a, b);
      evaluateBasis(x, y - h, m, a, b);
      for (let f = 0; f < ALL_FUNCTIONS; f++) expect(dy[f]).toBeCloseTo((p[f] - m[f]) / (2 * h), 5);
    }
  });

  it("vanishes where it must: edge functions on the other edges, interior functions on all", () => {
    const [v, dx, dy] = arrays();
    const corners = [
      [0, 0],
      [1, 0],
      [0, 1],
    ];
    for (let edge = 0; edge < 3; edge++) {
      const a = corners[(edge + 1) % 3];
      const b = corners[(edge + 2) % 3];
      for (const t of [0, 0.17, 0.5, 0.83, 1]) {
        evaluateBasis(a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1]), v, dx, dy);
        for (let k = 2; k <= MAX_ORDER; k++) {
          for (let other = 0; other < 3; other++) {
            if (other !== edge) expect(Math.abs(v[edgeFunction(other, k)])).toBeLessThan(1e-14);
          }
        }
        for (let f = FIRST_INTERIOR; f < ALL_FUNCTIONS; f++) expect(Math.abs(v[f])).toBeLessThan(1e-14);
      }
    }
  });

  it("turns odd edge functions with the edge and not the even ones", () => {
    const [v, dx, dy] = arrays();
    const [w] = arrays();
    // Edge 2 runs from (0,0) to (1,0).
    evaluateBasis(0.3, 0, v, dx, dy);
    evaluateBasis(0.7, 0, w, dx, dy);
    for (let k = 2; k <= MAX_ORDER; k++) {
      const sign = k % 2 === 0 ? 1 : -1;
      expect(w[edgeFunction(2, k)]).toBeCloseTo(sign * v[edgeFunction(2, k)], 13);
    }
  });

  it("has orthonormal modes", () => {
    const rule = triangleRule(2 * MAX_ORDER);
    const modes = new Float64Array(ALL_MODES);
    const gram = new Float64Array(ALL_MODES * ALL_MODES);
    for (let q = 0; q < rule.count; q++) {
      evaluateModes(rule.xi[q], rule.eta[q], modes);
      for (let a = 0; a < ALL_MODES; a++) {
        for (let b = 0; b < ALL_MODES; b++) gram[a * ALL_MODES + b] += rule.weights[q] * modes[a] * modes[b];
      }
    }
    for (let a = 0; a < ALL_MODES; a++) {
      for (let b = 0; b < ALL_MODES; b++) expect(gram[a * ALL_MODES + b]).toBeCloseTo(a === b ? 1 : 0, 12);
    }
  });

  it("knows all gradient coefficients within the error that the bounds assume (40 digits, decimal.js)", () => {
    // The functions are rebuilt at 40 digits from the definition in `basis`; the scale is a double, the same in all
    // elements, and so part of the definition.
    const D = Decimal.clone({ precision: 40 });
    const order = 8;
    const exact = exactGradients(D, order);
    for (const { f, xi, eta } of exact) {
      const column = (table: Float64Array): number[] => xi.map((_, k) => table[k * ALL_FUNCTIONS + f]);
      const own = [...column(gradientModes.xi), ...column(gradientModes.eta)];
      const ideal = [...xi, ...eta].map((d) => d.toNumber());
      const scale = functionScale(f);
      const norm = Math.hypot(...own);
      const error = Math.hypot(...own.map((x, i) => x - scale * ideal[i]));
      expect(error / norm).toBeLessThan(TABLE_ERROR / 2);
    }
  });
});

describe("element matrices", () => {
  const layout = elementLayout(4, 6, 5);
  const work = new Float64Array(LARGEST_ELEMENT ** 2);

  it("has rows that add up to nothing over the vertices and does not change with the size", () => {
    const { size, interior } = layout;
    fillStiffness(layout, 0.7, 0.1, -0.2, 0.9, work);
    const first = work.slice(0, size * size);
    const entry = (i: number, j: number): number => (i >= j ? first[i * size + j] : first[j * size + i]);
    for (let i = 0; i < size; i++) {
      expect(Math.abs(entry(i, interior) + entry(i, interior + 1) + entry(i, interior + 2))).toBeLessThan(
        1e-13,
      );
    }
    fillStiffness(layout, 0.7e-5, 0.1e-5, -0.2e-5, 0.9e-5, work);
    for (let i = 0; i < size; i++) {
      for (let j = 0; j <= i; j++) expect(work[i * size + j]).toBeCloseTo(first[i * size + j], 10);
    }
  });

  it("agrees with quadrature", () => {
    const { size, functions } = layout;
    const [x1, y1, x2, y2] = [0.7, 0.1, -0.2, 0.9];
    fillStiffness(layout, x1, y1, x2, y2, work);
    const det = x1 * y2 - x2 * y1;
    const rule = triangleRule(12);
    const [v, dx, dy] = [0, 1, 2].map(() => new Float64Array(ALL_FUNCTIONS));
    const sum = new Float64Array(size * size);
    for (let q = 0; q < rule.count; q++) {
      evaluateBasis(rule.xi[q], rule.eta[q], v, dx, dy);
      const gradient = Array.from(functions, (f) => [
        (y2 * dx[f] - y1 * dy[f]) / det,
        (x1 * dy[f] - x2 * dx[f]) / det,
      ]);
      for (let i = 0; i < size; i++) {
        for (let j = 0; j <= i; j++) {
          const dot = gradient[i][0] * gradient[j][0] + gradient[i][1] * gradient[j][1];
          sum[i * size + j] += rule.weights[q] * det * dot;
        }
      }
    }
    for (let i = 0; i < size; i++) {
      for (let j = 0; j <= i; j++) expect(work[i * size + j]).toBeCloseTo(sum[i * size + j], 11);
    }
  });
});
