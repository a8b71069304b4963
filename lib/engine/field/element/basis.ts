/**
 * Hierarchical shape functions on the reference triangle (0,0), (1,0), (0,1).
 *
 * With the barycentric coordinates L0 = 1-x-y, L1 = x, L2 = y the functions are, in this order,
 *   3 vertex functions           L0, L1, L2;
 *   edge functions, order k≥2    La Lb J_(k-2)(Lb-La) on edge i from vertex a=i+1 to b=i+2 (mod 3), where
 *                                J are Jacobi (1,1) polynomials: on the edge these are the integrated Legendre ones;
 *   interior functions, order n≥3  L0 L1 L2 Q with Q orthogonal of degree n-3 for the weight (L0 L1 L2)².
 * An edge function of odd order changes its sign with the direction of the edge, one of even order does not.
 */

import { jacobiStep, triangleRule } from "./quadrature";

/** Highest polynomial order of an element. */
export const MAX_ORDER = 10;

/** Functions of one edge up to the highest order. */
export const EDGE_MODES = MAX_ORDER - 1;

/** All functions of one triangle at the highest order. */
export const ALL_FUNCTIONS = ((MAX_ORDER + 1) * (MAX_ORDER + 2)) / 2;

/** Number of interior functions of order at most p. */
export function interiorCount(p: number): number {
  return p < 3 ? 0 : ((p - 1) * (p - 2)) / 2;
}

/** Place of edge function k (2 ≤ k ≤ MAX_ORDER) of local edge i in the list of all functions. */
export function edgeFunction(i: number, k: number): number {
  return 3 + i * EDGE_MODES + (k - 2);
}

/** Place of the first interior function; they follow by rising order. */
export const FIRST_INTERIOR = 3 + 3 * EDGE_MODES;

const jacobi11 = Array.from({ length: MAX_ORDER }, (_, k) => jacobiStep(k, 1, 1));
const jacobi22 = Array.from({ length: MAX_ORDER }, (_, k) => jacobiStep(k, 2, 2));
const jacobiUp = Array.from({ length: MAX_ORDER }, (_, i) =>
  Array.from({ length: MAX_ORDER }, (_, k) => jacobiStep(k, 2 * i + 5, 2)),
);

/** Brings the slopes of the functions along their edge to the same size. */
const edgeScale = Float64Array.from({ length: EDGE_MODES }, (_, m) => Math.sqrt(2 * (2 * m + 3)) / (m + 1));

/** Brings the gradients of the interior functions to unit size, so that the matrices stay well scaled. */
const interiorScale = new Float64Array(interiorCount(MAX_ORDER)).fill(1);

/** Factor by which function f is multiplied, the same in all elements; 1 for vertices. */
export function functionScale(f: number): number {
  if (f < 3) return 1;
  return f < FIRST_INTERIOR ? edgeScale[(f - 3) % EDGE_MODES] : interiorScale[f - FIRST_INTERIOR];
}

/**
 * Values and reference derivatives of all functions at (x, y), written into three arrays of ALL_FUNCTIONS numbers.
 */
export function evaluateBasis(
  x: number,
  y: number,
  value: Float64Array,
  dx: Float64Array,
  dy: Float64Array,
): void {
  const bary = [1 - x - y, x, y];
  const gx = [-1, 1, 0];
  const gy = [-1, 0, 1];
  for (let i = 0; i < 3; i++) {
    value[i] = bary[i];
    dx[i] = gx[i];
    dy[i] = gy[i];
  }
  for (let i = 0; i < 3; i++) {
    const a = (i + 1) % 3;
    const b = (i + 2) % 3;
    const s = bary[a] * bary[b];
    const sx = gx[a] * bary[b] + bary[a] * gx[b];
    const sy = gy[a] * bary[b] + bary[a] * gy[b];
    const t = bary[b] - bary[a];
    const tx = gx[b] - gx[a];
    const ty = gy[b] - gy[a];
    let before = 0;
    let slopeBefore = 0;
    let p = 1;
    let slope = 0;
    for (let m = 0; m < EDGE_MODES; m++) {
      const f = edgeFunction(i, m + 2);
      const scale = edgeScale[m];
      value[f] = scale * s * p;
      dx[f] = scale * (sx * p + s * slope * tx);
      dy[f] = scale * (sy * p + s * slope * ty);
      const [ca, cb, cc] = jacobi11[m];
      const next = (ca * t + cb) * p - cc * before;
      const nextSlope = (ca * t + cb) * slope + ca * p - cc * slopeBefore;
      before = p;
      slopeBefore = slope;
      p = next;
      slope = nextSlope;
    }
  }
  const b = bary[0] * bary[1] * bary[2];
  const bx = gx[0] * bary[1] * bary[2] + bary[0] * gx[1] * bary[2];
  const by = gy[0] * bary[1] * bary[2] + bary[0] * bary[1] * gy[2];
  // Across: scaled polynomials in s = L1-L0 and t = L1+L0 stay polynomials; up: in 2 L2 - 1.
  const s = bary[1] - bary[0];
  const t = bary[1] + bary[0];
  const z = 2 * y - 1;
  let q = 1;
  let qx = 0;
  let qy = 0;
  let qBefore = 0;
  let qxBefore = 0;
  let qyBefore = 0;
  for (let i = 0; i + 3 <= MAX_ORDER; i++) {
    let u = 1;
    let uSlope = 0;
    let uBefore = 0;
    let uSlopeBefore = 0;
    for (let j = 0; i + j + 3 <= MAX_ORDER; j++) {
      const f = FIRST_INTERIOR + interiorCount(i + j + 2) + j;
      const scale = interiorScale[f - FIRST_INTERIOR];
      value[f] = scale * b * q * u;
      dx[f] = scale * u * (bx * q + b * qx);
      dy[f] = scale * (u * (by * q + b * qy) + b * q * uSlope * 2);
      const [ca, cb, cc] = jacobiUp[i][j];
      const next = (ca * z + cb) * u - cc * uBefore;
      const nextSlope = (ca * z + cb) * uSlope + ca * u - cc * uSlopeBefore;
      uBefore = u;
      uSlopeBefore = uSlope;
      u = next;
      uSlope = nextSlope;
    }
    const [ca, cb, cc] = jacobi22[i];
    // s grows by 2 with x and by 1 with y; t falls by 1 with y.
    const next = (ca * s + cb * t) * q - cc * t * t * qBefore;
    const nextX = (ca * s + cb * t) * qx + 2 * ca * q - cc * t * t * qxBefore;
    const nextY = (ca * s + cb * t) * qy + (ca - cb) * q - cc * (t * t * qyBefore - 2 * t * qBefore);
    qBefore = q;
    qxBefore = qx;
    qyBefore = qy;
    q = next;
    qx = nextX;
    qy = nextY;
  }
}

function measureInterior(): void {
  const rule = triangleRule(2 * MAX_ORDER);
  const [value, dx, dy] = [0, 1, 2].map(() => new Float64Array(ALL_FUNCTIONS));
  const energy = new Float64Array(interiorScale.length);
  for (let q = 0; q < rule.count; q++) {
    evaluateBasis(rule.xi[q], rule.eta[q], value, dx, dy);
    for (let i = 0; i < energy.length; i++) {
      const f = FIRST_INTERIOR + i;
      energy[i] += rule.weights[q] * (dx[f] * dx[f] + dy[f] * dy[f]);
    }
  }
  for (let i = 0; i < energy.length; i++) interiorScale[i] = 1 / Math.sqrt(energy[i]);
}

measureInterior();
