/**
 * What the elements of one kind have in common: a kind is given by the orders of the three edges.
 *
 * The interior order is the highest of them, so a triangle holds all polynomials of its own order and interior
 * functions cost nothing outside the element. Local order of the unknowns: interior functions first (they are
 * eliminated within the element), then the three vertices, then the functions of edge 0, 1, 2 by rising order.
 */

import { ALL_FUNCTIONS, FIRST_INTERIOR, MAX_ORDER, edgeFunction, interiorCount } from "./basis";
import { ALL_MODES, gradientModes, modeCount } from "./modes";

export interface ElementLayout {
  /** Order of each local edge, edge i opposite vertex i. */
  readonly edgeOrder: readonly [number, number, number];
  /** Order of the interior. */
  readonly order: number;
  readonly interior: number;
  /** Interior, vertices and edges together. */
  readonly size: number;
  /** Three vertices and the edge functions. */
  readonly outer: number;
  /** Place of each local function in the list of all functions. */
  readonly functions: Int16Array;
  /** Local place (in the outer part) of the first function of each edge. */
  readonly edgeStart: readonly [number, number, number];
  /** Number of gradient modes, order·(order+1)/2. */
  readonly modes: number;
  /** Gradient coefficients by mode and local function: [k * size + f]. */
  readonly modesXi: Float64Array;
  readonly modesEta: Float64Array;
  /** Reference matrices, lower triangles packed by rows; K = (|e2|² A - e1·e2 B + |e1|² C)/det. */
  readonly stiffA: Float64Array;
  readonly stiffB: Float64Array;
  readonly stiffC: Float64Array;
  /** Sum of the squares of all gradient coefficients but those of the vertices: bounds rounding errors. */
  readonly modesNorm: number;
}

/** The reference matrices over all functions, full squares. */
function referenceMatrices(): { a: Float64Array; b: Float64Array; c: Float64Array } {
  const n = ALL_FUNCTIONS;
  const [a, b, c] = [0, 1, 2].map(() => new Float64Array(n * n));
  const { xi, eta } = gradientModes;
  for (let k = 0; k < ALL_MODES; k++) {
    const row = k * n;
    for (let i = 0; i < n; i++) {
      const xiI = xi[row + i];
      const etaI = eta[row + i];
      if (xiI === 0 && etaI === 0) continue;
      for (let j = 0, at = i * n; j < n; j++, at++) {
        a[at] += xiI * xi[row + j];
        b[at] += xiI * eta[row + j] + etaI * xi[row + j];
        c[at] += etaI * eta[row + j];
      }
    }
  }
  return { a, b, c };
}

const reference = referenceMatrices();

const layouts = new Map<number, ElementLayout>();

/** The layout for three edge orders, each 1 … MAX_ORDER. */
export function elementLayout(order0: number, order1: number, order2: number): ElementLayout {
  const key = (order0 * 16 + order1) * 16 + order2;
  let layout = layouts.get(key);
  if (!layout) {
    layout = makeLayout([order0, order1, order2]);
    layouts.set(key, layout);
  }
  return layout;
}

function makeLayout(edgeOrder: [number, number, number]): ElementLayout {
  const order = Math.max(...edgeOrder);
  if (order > MAX_ORDER) throw new RangeError(`element order ${order} above ${MAX_ORDER}`);
  const interior = interiorCount(order);
  const list: number[] = [];
  for (let i = 0; i < interior; i++) list.push(FIRST_INTERIOR + i);
  list.push(0, 1, 2);
  const edgeStart: [number, number, number] = [0, 0, 0];
  for (let i = 0; i < 3; i++) {
    edgeStart[i] = list.length - interior;
    for (let k = 2; k <= edgeOrder[i]; k++) list.push(edgeFunction(i, k));
  }
  const functions = Int16Array.from(list);
  const size = functions.length;
  const modes = modeCount(order);
  const modesXi = new Float64Array(modes * size);
  const modesEta = new Float64Array(modes * size);
  let modesNorm = 0;
  for (let k = 0; k < modes; k++) {
    for (let f = 0; f < size; f++) {
      const from = k * ALL_FUNCTIONS + functions[f];
      modesXi[k * size + f] = gradientModes.xi[from];
      modesEta[k * size + f] = gradientModes.eta[from];
      if (functions[f] >= 3) modesNorm += gradientModes.xi[from] ** 2 + gradientModes.eta[from] ** 2;
    }
  }
  const packed = (size * (size + 1)) / 2;
  const stiffA = new Float64Array(packed);
  const stiffB = new Float64Array(packed);
  const stiffC = new Float64Array(packed);
  for (let i = 0, at = 0; i < size; i++) {
    for (let j = 0; j <= i; j++, at++) {
      const from = functions[i] * ALL_FUNCTIONS + functions[j];
      stiffA[at] = reference.a[from];
      stiffB[at] = reference.b[from];
      stiffC[at] = reference.c[from];
    }
  }
  return {
    edgeOrder,
    order,
    interior,
    size,
    outer: size - interior,
    functions,
    edgeStart,
    modes,
    modesXi,
    modesEta,
    stiffA,
    stiffB,
    stiffC,
    modesNorm,
  };
}
