/**
 * Gradients of the shape functions, expanded in an orthonormal polynomial basis of the reference triangle.
 *
 * The reference derivatives of a function of order p are polynomials of degree p-1. Written in orthonormal polynomials
 * (Dubiner 1991) with rising degree, integrals over a triangle with constant conductivity become sums of squares of
 * the coefficients, without quadrature:
 *   ∫|grad u|² = (1/det) Σ_k (y2 a_k - y1 b_k)² + (x1 b_k - x2 a_k)²,
 * a_k, b_k the coefficients of du/dξ, du/dη, (x1,y1) and (x2,y2) the two edges from the first vertex, det their cross
 * product.
 */

import { ALL_FUNCTIONS, MAX_ORDER, evaluateBasis } from "./basis";
import { jacobiStep, triangleRule } from "./quadrature";

/** Number of orthonormal polynomials of degree below p. */
export function modeCount(p: number): number {
  return (p * (p + 1)) / 2;
}

/** Orthonormal polynomials of the highest gradient, degree MAX_ORDER - 1. */
export const ALL_MODES = modeCount(MAX_ORDER);

/** Coefficients of the reference derivatives: entry [k * ALL_FUNCTIONS + f] of mode k, function f. */
export interface GradientModes {
  readonly xi: Float64Array;
  readonly eta: Float64Array;
}

const across = Array.from({ length: MAX_ORDER }, (_, k) => jacobiStep(k, 0, 0));
const up = Array.from({ length: MAX_ORDER }, (_, i) =>
  Array.from({ length: MAX_ORDER }, (_, k) => jacobiStep(k, 2 * i + 1, 0)),
);

/** Values of the orthonormal polynomials at (x, y), ordered by total degree. */
export function evaluateModes(x: number, y: number, out: Float64Array): void {
  const s = 2 * x + y - 1;
  const t = 1 - y;
  const z = 2 * y - 1;
  let q = 1;
  let qBefore = 0;
  for (let i = 0; i < MAX_ORDER; i++) {
    let u = 1;
    let uBefore = 0;
    for (let j = 0; i + j < MAX_ORDER; j++) {
      out[modeCount(i + j) + j] = q * u * Math.sqrt((2 * i + 1) * (2 * i + 2 * j + 2));
      const [a, b, c] = up[i][j];
      const next = (a * z + b) * u - c * uBefore;
      uBefore = u;
      u = next;
    }
    const [a, , c] = across[i];
    const next = a * s * q - c * t * t * qBefore;
    qBefore = q;
    q = next;
  }
}

function expandGradients(): GradientModes {
  const xi = new Float64Array(ALL_MODES * ALL_FUNCTIONS);
  const eta = new Float64Array(ALL_MODES * ALL_FUNCTIONS);
  const rule = triangleRule(2 * MAX_ORDER);
  const [value, dx, dy] = [0, 1, 2].map(() => new Float64Array(ALL_FUNCTIONS));
  const modes = new Float64Array(ALL_MODES);
  for (let q = 0; q < rule.count; q++) {
    evaluateBasis(rule.xi[q], rule.eta[q], value, dx, dy);
    evaluateModes(rule.xi[q], rule.eta[q], modes);
    for (let k = 0; k < ALL_MODES; k++) {
      const w = rule.weights[q] * modes[k];
      for (let f = 0, at = k * ALL_FUNCTIONS; f < ALL_FUNCTIONS; f++, at++) {
        xi[at] += w * dx[f];
        eta[at] += w * dy[f];
      }
    }
  }
  // Coefficients that vanish by orthogonality come out as rounding noise; an exact zero is the better value.
  for (let at = 0; at < xi.length; at++) {
    if (Math.abs(xi[at]) < 1e-13) xi[at] = 0;
    if (Math.abs(eta[at]) < 1e-13) eta[at] = 0;
  }
  return { xi, eta };
}

export const gradientModes: GradientModes = expandGradients();
