/**
 * What to refine next: layers towards singular vertices, a higher order where the field is smooth, bisection where it
 * is not, and of all that just as much as the tolerance asks for.
 *
 * The gap of each triangle is known exactly. What it becomes is predicted: a layer multiplies the gap of a star by
 * 2^(-2α); one order more multiplies the gap of a smooth element by the decay of its solution's own polynomial
 * coefficients; bisecting at order p divides it by 4^p at best.
 */

import type { FieldMesh } from "../mesh/mesh";
import type { SingularVertex } from "./exponents";

export interface RefinementPlan {
  readonly vertices: Int32Array;
  readonly layers: Int32Array;
  /** Order wanted in the innermost star and of the rings around it: index 0 is the outermost ring. */
  readonly ringOrders: readonly Uint8Array[];
  /** Bisection marks of the mesh as it is: 0, 1 (one edge) or 2 (three edges). */
  readonly marks: Uint8Array;
  readonly order: Uint8Array;
  /** The least gap that counts as a disappointment of a triangle that is raised in order; Infinity for the others. */
  readonly disappointment: Float64Array;
  /** Nothing is left that could be refined. */
  readonly empty: boolean;
}

export interface PlanInput {
  readonly mesh: FieldMesh;
  readonly order: Uint8Array;
  readonly gap: Float64Array;
  readonly decay: Float64Array;
  readonly singular: readonly SingularVertex[];
  /** Sum that the gaps should come down to. */
  readonly target: number;
  readonly highestOrder: number;
}

/** Part of the target that the stars of singular vertices may use up together. */
const SHARE_OF_STARS = 0.3;

/** Factor by which one order more reduces the gap in a ring of layers of ratio one half (measured: 1/25 to 1/30). */
const RING_DECAY = 1 / 24;

/** Gap of the outermost ring at order 2, as a part of the gap of the star at order 3 before it was layered. */
const RING_START = 0.04;

/** Order of the innermost star of a layered vertex. */
export const STAR_ORDER = 3;

/** A solution whose coefficients fall more slowly than this is bisected, not raised in order. */
const SLOW_DECAY = 0.42;

/** A raised element disappoints if its gap is this many times what was expected and hardly less than before. */
const FAR_ABOVE = 10;
const HARDLY_LESS = 0.5;

/** Order of the parts of an element that is bisected for its roughness. */
const ROUGH_ORDER = 3;

export function planRefinement(input: PlanInput): RefinementPlan {
  const { gap, singular } = input;
  const count = gap.length;
  const stars = starGaps(input);
  if (atTheEnd(input, stars)) return emptyPlan(input);
  // What cannot be reduced is no reason to drive the rest far below it.
  const target = Math.max(input.target, stars.fixedGap);
  const shareOfStar = chooseThreshold(stars.gaps, SHARE_OF_STARS * target);
  const elements = new Float64Array(count);
  for (let t = 0; t < count; t++) elements[t] = stars.kind[t] === STAR ? 0 : gap[t];
  const vertices: number[] = [];
  const layers: number[] = [];
  const ringOrders: Uint8Array[] = [];
  const order = Uint8Array.from(input.order);
  const marks = new Uint8Array(count);
  const disappointment = new Float64Array(count).fill(Infinity);
  const budget = (1 - SHARE_OF_STARS) * target;
  const shareOfElement = elementThreshold(input, stars.kind, elements, budget);
  const shareOfRing = Math.min(shareOfElement, budget / (2 * count + 100));
  let planned = 0;
  singular.forEach(({ vertex, exponent }, i) => {
    const g = stars.gaps[i];
    if (!(g > shareOfStar)) return;
    const feasible = Math.floor(Math.log2(stars.reach[i] / SMALLEST_REACH));
    const wanted = Math.min(feasible, Math.ceil(Math.log2(g / shareOfStar) / (2 * exponent)));
    const p0 = stars.orders[i];
    // The gap of a star falls with its order like p^(-4α): refer it to order 3.
    const reference = RING_START * g * (p0 / 3) ** (4 * exponent);
    const rings = new Uint8Array(wanted);
    for (let j = 0; j < wanted; j++) {
      const atTwo = (reference * 2 ** (-2 * exponent * j)) / stars.sizes[i];
      rings[j] = clampOrder(
        2 + Math.ceil(Math.log(atTwo / shareOfRing) / -Math.log(RING_DECAY)),
        input.highestOrder,
      );
    }
    vertices.push(vertex);
    layers.push(wanted);
    ringOrders.push(rings);
    planned++;
  });
  for (let t = 0; t < count; t++) {
    if (!(elements[t] > shareOfElement)) continue;
    const step = elementStep(input, stars.kind[t], t, elements[t], shareOfElement);
    order[t] = step.order;
    marks[t] = step.mark;
    if (step.order > input.order[t]) {
      disappointment[t] = Math.max(FAR_ABOVE * step.expected, HARDLY_LESS * elements[t]);
    }
    if (step.order !== input.order[t] || step.mark > 0) planned++;
  }
  return {
    vertices: Int32Array.from(vertices),
    layers: Int32Array.from(layers),
    ringOrders,
    marks,
    order,
    disappointment,
    empty: planned === 0,
  };
}

function emptyPlan({ order }: PlanInput): RefinementPlan {
  const none = new Int32Array(0);
  const marks = new Uint8Array(order.length);
  const disappointment = new Float64Array(order.length).fill(Infinity);
  return { vertices: none, layers: none, ringOrders: [], marks, order, disappointment, empty: true };
}

/**
 * The stars that cannot be layered any more hold more than the target whatever their order, and most of all that is
 * left: further work would not help.
 */
function atTheEnd({ gap, order, target, highestOrder }: PlanInput, { kind, fixedGap }: Stars): boolean {
  if (fixedGap < 2 * target) return false;
  let least = 0;
  let others = 0;
  for (let t = 0; t < gap.length; t++) {
    if (kind[t] === FIXED) least += (gap[t] * order[t]) / highestOrder;
    else others += gap[t];
  }
  return least > 2 * target && others < fixedGap;
}

function clampOrder(p: number, highest: number): number {
  return Math.max(2, Math.min(highest, p));
}

interface Stars {
  readonly gaps: Float64Array;
  readonly sizes: Int32Array;
  /** Mean order in the star. */
  readonly orders: Float64Array;
  /** ELEMENT, STAR or FIXED. */
  readonly kind: Int8Array;
  /** Shortest edge at the vertex. */
  readonly reach: Float64Array;
  /** Sum of the gaps of stars that cannot be layered any more. */
  readonly fixedGap: number;
}

/** A triangle away from singular vertices, one at a singular vertex, and one there that cannot be layered any more. */
const ELEMENT = 0;
const STAR = 1;
const FIXED = 2;

/** Stars with an edge shorter than twice this are not layered (`refineTowards` keeps to 2^-42). */
const SMALLEST_REACH = 2 ** -41;

function starGaps({ mesh, gap, order, singular }: PlanInput): Stars {
  const { triangles } = mesh;
  const count = gap.length;
  const number = new Int32Array(mesh.xy.length / 2).fill(-1);
  singular.forEach(({ vertex }, i) => (number[vertex] = i));
  const reach = shortestEdges(mesh, number, singular.length);
  const kind = new Int8Array(count);
  const gaps = new Float64Array(singular.length);
  const sizes = new Int32Array(singular.length);
  const orders = new Float64Array(singular.length);
  let fixedGap = 0;
  for (let t = 0; t < count; t++) {
    let weights = 0;
    for (let i = 0; i < 3; i++) {
      const s = number[triangles[3 * t + i]];
      if (s < 0) continue;
      if (reach[s] >= 2 * SMALLEST_REACH) weights += 4 ** -singular[s].exponent;
      else if (kind[t] === ELEMENT) kind[t] = FIXED;
    }
    if (weights === 0) {
      if (kind[t] === FIXED) fixedGap += gap[t];
      continue;
    }
    kind[t] = STAR;
    // The gap of a triangle between singular vertices goes to all of them, more of it to the stronger.
    for (let i = 0; i < 3; i++) {
      const s = number[triangles[3 * t + i]];
      if (s < 0 || reach[s] < 2 * SMALLEST_REACH) continue;
      gaps[s] += (gap[t] * 4 ** -singular[s].exponent) / weights;
      orders[s] += order[t];
      sizes[s]++;
    }
  }
  for (let i = 0; i < orders.length; i++) if (sizes[i] > 0) orders[i] /= sizes[i];
  return { gaps, sizes, orders, kind, reach, fixedGap };
}

function shortestEdges({ xy, triangles }: FieldMesh, number: Int32Array, count: number): Float64Array {
  const shortest = new Float64Array(count).fill(Infinity);
  for (let h = 0; h < triangles.length; h++) {
    const base = h - (h % 3);
    const a = triangles[h];
    const b = triangles[base + ((h + 1) % 3)];
    if (number[a] < 0 && number[b] < 0) continue;
    const length = Math.hypot(xy[2 * a] - xy[2 * b], xy[2 * a + 1] - xy[2 * b + 1]);
    for (const s of [number[a], number[b]]) if (s >= 0 && length < shortest[s]) shortest[s] = length;
  }
  return shortest;
}

/** The largest cap such that values cut down to it add up to at most `budget`. */
function chooseThreshold(values: Float64Array, budget: number): number {
  const sorted = Float64Array.from(values).sort();
  let below = 0;
  for (let k = 0; k < sorted.length; k++) {
    const cap = (budget - below) / (sorted.length - k);
    if (sorted[k] >= cap) return Math.max(cap, 0);
    below += sorted[k];
  }
  return Infinity;
}

interface Step {
  readonly order: number;
  readonly mark: number;
  /** Gap that is expected afterwards. */
  readonly expected: number;
}

function elementStep(input: PlanInput, kind: number, t: number, gap: number, share: number): Step {
  const p = input.order[t];
  if (kind === FIXED) {
    const order = Math.min(input.highestOrder, p + 2);
    return { order, mark: 0, expected: (gap * p) / order };
  }
  const decay = Math.max(0.02, input.decay[t]);
  if (decay < SLOW_DECAY && p < input.highestOrder) {
    const wanted = Math.max(1, Math.ceil(Math.log(gap / share) / -Math.log(decay)));
    const order = Math.min(input.highestOrder, p + Math.min(wanted, 3));
    return { order, mark: 0, expected: gap * decay ** (order - p) };
  }
  const order = input.decay[t] < 1 ? p : Math.min(p, ROUGH_ORDER);
  return { order, mark: 2, expected: gap * 4 ** -Math.min(p, 3) };
}

/** The largest threshold for which the expected sum is within the budget. */
function elementThreshold(input: PlanInput, kind: Int8Array, elements: Float64Array, budget: number): number {
  let high = 0;
  let total = 0;
  for (const g of elements) {
    total += g;
    if (g > high) high = g;
  }
  if (total <= budget) return Infinity;
  let low = (0.1 * budget) / elements.length;
  for (let k = 0; k < 40 && high > 1.05 * low; k++) {
    const middle = Math.sqrt(low * high);
    let sum = 0;
    for (let t = 0; t < elements.length; t++) {
      sum +=
        elements[t] > middle ? elementStep(input, kind[t], t, elements[t], middle).expected : elements[t];
    }
    if (sum <= budget) low = middle;
    else high = middle;
  }
  return low;
}
