/**
 * Gauss rules on an interval and on the reference triangle.
 *
 * Nodes by Newton's iteration on Jacobi polynomials with deflation (Karniadakis and Sherwin, *Spectral/hp Element
 * Methods*, appendix B). The triangle rule is the collapsed product of a Legendre and a Jacobi (1,0) rule: all weights
 * are positive and the points lie inside.
 */

export interface LineRule {
  /** Nodes in (-1, 1). */
  readonly nodes: Float64Array;
  /** Weights for the weight function (1-x)^alpha (1+x)^beta. */
  readonly weights: Float64Array;
}

export interface TriangleRule {
  readonly count: number;
  /** Reference coordinates of the points; the triangle is (0,0), (1,0), (0,1). */
  readonly xi: Float64Array;
  readonly eta: Float64Array;
  /** Weights; they add up to the triangle's area, one half. */
  readonly weights: Float64Array;
  /** Highest total degree that is integrated exactly. */
  readonly degree: number;
}

/** Value and derivative of the Jacobi polynomial P_n^(alpha,beta) at x. */
function jacobiWithSlope(n: number, alpha: number, beta: number, x: number): [number, number] {
  let before = 0;
  let slopeBefore = 0;
  let value = 1;
  let slope = 0;
  for (let k = 0; k < n; k++) {
    const [a, b, c] = jacobiStep(k, alpha, beta);
    const next = (a * x + b) * value - c * before;
    const nextSlope = (a * x + b) * slope + a * value - c * slopeBefore;
    before = value;
    slopeBefore = slope;
    value = next;
    slope = nextSlope;
  }
  return [value, slope];
}

/** Coefficients a, b, c of P_(k+1) = (a x + b) P_k - c P_(k-1) for Jacobi polynomials. */
export function jacobiStep(k: number, alpha: number, beta: number): [number, number, number] {
  const s = alpha + beta;
  if (k === 0) return [(s + 2) / 2, (alpha - beta) / 2, 0];
  const n = k + 1;
  const t = 2 * n + s;
  const d = 2 * n * (n + s) * (t - 2);
  return [
    ((t - 1) * t * (t - 2)) / d,
    ((t - 1) * (alpha * alpha - beta * beta)) / d,
    (2 * (n + alpha - 1) * (n + beta - 1) * t) / d,
  ];
}

const lineRules = new Map<string, LineRule>();

/**
 * Gauss–Jacobi rule with n points, exact for degree 2n-1 against the weight (1-x)^alpha (1+x)^beta.
 * alpha and beta are small non-negative integers.
 */
export function gaussRule(n: number, alpha = 0, beta = 0): LineRule {
  const key = `${n},${alpha},${beta}`;
  const known = lineRules.get(key);
  if (known) return known;
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  // The integral of the weight function fixes the scale of the weights.
  let total = 2 ** (alpha + beta + 1);
  for (let k = 1; k <= beta; k++) total *= k / (alpha + k);
  total /= alpha + beta + 1;
  let sum = 0;
  for (let i = 0; i < n; i++) {
    let x = -Math.cos((Math.PI * (2 * i + 1)) / (2 * n));
    if (i > 0) x = (x + nodes[i - 1]) / 2;
    for (let step = 0; step < 50; step++) {
      const [value, slope] = jacobiWithSlope(n, alpha, beta, x);
      let poles = 0;
      for (let j = 0; j < i; j++) poles += 1 / (x - nodes[j]);
      const move = -value / (slope - poles * value);
      x += move;
      if (Math.abs(move) < 1e-16) break;
    }
    nodes[i] = x;
    const slope = jacobiWithSlope(n, alpha, beta, x)[1];
    weights[i] = 1 / ((1 - x * x) * slope * slope);
    sum += weights[i];
  }
  for (let i = 0; i < n; i++) weights[i] *= total / sum;
  const rule = { nodes, weights };
  lineRules.set(key, rule);
  return rule;
}

const triangleRules = new Map<number, TriangleRule>();

/** Rule on the reference triangle, exact for polynomials of the given total degree. */
export function triangleRule(degree: number): TriangleRule {
  const n = Math.floor(degree / 2) + 1;
  const known = triangleRules.get(n);
  if (known) return known;
  const across = gaussRule(n);
  const up = gaussRule(n, 1, 0);
  const count = n * n;
  const xi = new Float64Array(count);
  const eta = new Float64Array(count);
  const weights = new Float64Array(count);
  for (let j = 0, q = 0; j < n; j++) {
    const y = (1 + up.nodes[j]) / 2;
    for (let i = 0; i < n; i++, q++) {
      xi[q] = ((1 + across.nodes[i]) / 2) * (1 - y);
      eta[q] = y;
      weights[q] = (across.weights[i] * up.weights[j]) / 8;
    }
  }
  const rule = { count, xi, eta, weights, degree: 2 * n - 1 };
  triangleRules.set(n, rule);
  return rule;
}
