/**
 * A thin equipotential disc of radius a at depth h below an insulating plane, both faces in the soil: Love's integral
 * equation with the sign of equal charges (E. R. Love, Quart. J. Mech. Appl. Math. 2 (1949) 428),
 *
 *   f(x) + (1/π)·∫₋₁¹ κ·f(t)/(κ²+(x−t)²) dt = 1,  κ = 2h/a,  R = ρ/(8a·g),  g = ½∫₋₁¹ f,
 *
 * by Nyström's method on Gauss–Legendre panels. f is even, so only x > 0 carries unknowns. For a shallow plate the panels
 * are graded towards the rim, where f changes over the distance κ, and the integral over a panel close to x, whose kernel
 * is a peak of width κ, is taken on pieces that shrink towards x.
 */
import { gaussLegendre } from "../../numeric/gauss-legendre";
import { solveInPlace } from "../../numeric/lu-solve";

/** Below this the first term of the expansion for a shallow plate is enough: the next is of the order (κ·ln κ)². */
const SHALLOW = 1e-6;

export interface PlateFactor {
  /** a·R/ρ, between 1/8 (deep) and 1/4 (at the surface). */
  readonly value: number;
  /** Relative error of it. */
  readonly error: number;
}

/** a·R/ρ of the plate with κ = 2·depth/radius > 0. */
export function buriedPlate(kappa: number): PlateFactor {
  if (kappa < SHALLOW) {
    // Edge correction of a thin gap; its constants found by, and agreeing to 1e-11 with, the panels below.
    const edge = (kappa / (2 * Math.PI)) * (1 + Math.log(Math.PI / kappa));
    return { value: 0.25 / (1 + edge), error: 1e-10 };
  }
  const mean = kappa >= 0.2 ? wholeInterval(kappa) : gradedPanels(kappa);
  return { value: 1 / (8 * mean), error: kappa >= 0.2 ? 1e-12 : 1e-10 };
}

function kernel(kappa: number, distance: number): number {
  return kappa / Math.PI / (kappa * kappa + distance * distance);
}

/** g by one Gauss rule over the interval, its two halves folded. */
function wholeInterval(kappa: number): number {
  const n = kappa >= 1 ? 24 : 72;
  const { nodes, weights } = gaussLegendre(n);
  const half = n / 2;
  const x = Float64Array.from({ length: half }, (_, i) => 2 * nodes[half + i] - 1);
  const w = Float64Array.from({ length: half }, (_, i) => 2 * weights[half + i]);
  const matrix = new Float64Array(half * half);
  for (let i = 0; i < half; i++) {
    for (let j = 0; j < half; j++) {
      matrix[i * half + j] = w[j] * (kernel(kappa, x[i] - x[j]) + kernel(kappa, x[i] + x[j]));
    }
    matrix[i * half + i] += 1;
  }
  const f = solveInPlace(matrix, new Float64Array(half).fill(1));
  return f.reduce((sum, value, i) => sum + w[i] * value, 0);
}

/** Unknowns a panel, and points of the rule that integrates a piece of it. */
const ORDER = 10;
const PIECE = gaussLegendre(14);
const PANEL = gaussLegendre(ORDER);

/** Barycentric weights of the panel's nodes. */
const BARYCENTRIC = Float64Array.from({ length: ORDER }, (_, i) => {
  let product = 1;
  for (let j = 0; j < ORDER; j++) if (j !== i) product *= PANEL.nodes[i] - PANEL.nodes[j];
  return 1 / product;
});

/** g on panels [0, 1], each half as long as the one before towards the rim at 1, down to about κ. */
function gradedPanels(kappa: number): number {
  // Distances from the rim, so that the smallest panels keep their digits.
  const ends = [1];
  while (ends[ends.length - 1] > kappa) ends.push(ends[ends.length - 1] / 2);
  ends.push(0);
  const panels = ends.length - 1;
  const n = panels * ORDER;
  const depth = new Float64Array(n);
  const weight = new Float64Array(n);
  for (let p = 0; p < panels; p++) {
    const width = ends[p] - ends[p + 1];
    for (let i = 0; i < ORDER; i++) {
      depth[p * ORDER + i] = ends[p + 1] + width * PANEL.nodes[i];
      weight[p * ORDER + i] = width * PANEL.weights[i];
    }
  }
  const matrix = new Float64Array(n * n);
  const share = new Float64Array(ORDER);
  for (let i = 0; i < n; i++) {
    for (let p = 0; p < panels; p++) {
      // The panel itself and its mirror image beyond the middle, in distances u from the rim at x = 1: x = 1 − u.
      share.fill(0);
      addPanel(share, kappa, depth[i], ends[p + 1], ends[p]);
      addPanel(share, kappa, 2 - depth[i], ends[p + 1], ends[p]);
      for (let j = 0; j < ORDER; j++) matrix[i * n + p * ORDER + j] = share[j];
    }
    matrix[i * n + i] += 1;
  }
  const f = solveInPlace(matrix, new Float64Array(n).fill(1));
  return f.reduce((sum, value, i) => sum + weight[i] * value, 0);
}

/**
 * Adds ∫ κ/(π(κ²+(u−t)²))·ℓⱼ(t) dt over the panel from..to to the share of each of its nodes. The panel is cut into
 * pieces no longer than their distance from u or than κ.
 */
function addPanel(share: Float64Array, kappa: number, u: number, from: number, to: number): void {
  const width = to - from;
  if (u - to > 2 * width || from - u > 2 * width) {
    for (let j = 0; j < ORDER; j++) {
      share[j] += width * PANEL.weights[j] * kernel(kappa, from + width * PANEL.nodes[j] - u);
    }
    return;
  }
  let start = from;
  while (start < to) {
    const near = start >= u ? start - u : 0;
    let length = Math.max(kappa, near);
    if (start < u) {
      // Pieces that approach u halve their distance to it, and the last ones before it are κ long.
      const ahead = u - start;
      length = Math.max(kappa, ahead / 2);
      if (start + length > u) length = Math.max(ahead, kappa / 2);
    }
    const end = start + length >= to - 1e-3 * length ? to : start + length;
    addPiece(share, kappa, u, start, end, from, width);
    start = end;
  }
}

const NUMERATORS = new Float64Array(ORDER);

function addPiece(
  share: Float64Array,
  kappa: number,
  u: number,
  start: number,
  end: number,
  from: number,
  width: number,
): void {
  for (let q = 0; q < PIECE.nodes.length; q++) {
    const t = start + (end - start) * PIECE.nodes[q];
    const weight = (end - start) * PIECE.weights[q] * kernel(kappa, t - u);
    const s = (t - from) / width;
    let sum = 0;
    let hit = -1;
    for (let j = 0; j < ORDER; j++) {
      const gap = s - PANEL.nodes[j];
      if (gap === 0) hit = j;
      NUMERATORS[j] = BARYCENTRIC[j] / gap;
      sum += NUMERATORS[j];
    }
    if (hit >= 0) share[hit] += weight;
    else for (let j = 0; j < ORDER; j++) share[j] += (weight * NUMERATORS[j]) / sum;
  }
}
