/**
 * Multifrontal Cholesky factorisation (Duff and Reid 1983) and substitution.
 *
 * Nodes are visited bottom-up. A front is assembled from the node's triangles or from its children's border matrices,
 * its own unknowns are eliminated, and the remaining border matrix waits on a stack for the parent.
 */

import { MOST_OUTER, addElement } from "./assemble";
import type { LinearSystem } from "./system";
import { factorPanel, subtractBorder } from "./dense";
import { Interruption } from "./interruption";
import type { FrontStructure } from "./symbolic";

export interface Factor {
  readonly structure: FrontStructure;
  readonly panels: Float64Array;
}

/** Raised when a pivot is not positive: the matrix is numerically singular. */
export class SingularMatrixError extends Error {
  override readonly name = "SingularMatrixError";
}

/** Operations after which the caller is asked whether to go on: some milliseconds. */
const ASK_AFTER = 3e7;

export function factorise(system: LinearSystem, shouldStop: () => boolean = () => false): Factor {
  const { structure } = system;
  const { tree, ownFirst, borderStart, border, panelStart } = structure;
  const panels = new Float64Array(structure.factorSize);
  const stack = new Float64Array(structure.stackSize);
  const frontPlace = new Int32Array(structure.unknowns);
  const local = new Int32Array(MOST_OUTER);
  let top = 0;
  const interruption = new Interruption(shouldStop, ASK_AFTER);
  for (let node = 0; node < tree.nodeCount; node++) {
    const own = ownFirst[node + 1] - ownFirst[node];
    const rest = borderStart[node + 1] - borderStart[node];
    const at = panelStart[node];
    const a = tree.left[node];
    const b = tree.right[node];
    for (let i = 0; i < own; i++) frontPlace[ownFirst[node] + i] = i;
    for (let i = 0; i < rest; i++) frontPlace[border[borderStart[node] + i]] = own + i;
    const place = top;
    const size = rest * rest;
    stack.fill(0, place, place + size);
    let target = place;
    if (a < 0) {
      for (let k = tree.first[node]; k < tree.last[node]; k++) {
        addElement(system, tree.order[k], frontPlace, local, panels, at, own, stack, place, rest);
      }
    } else {
      const sizeA = (borderStart[a + 1] - borderStart[a]) ** 2;
      const sizeB = (borderStart[b + 1] - borderStart[b]) ** 2;
      target = place - sizeA - sizeB;
      extendAdd(structure, a, stack, target, frontPlace, panels, at, own, place, rest);
      extendAdd(structure, b, stack, target + sizeA, frontPlace, panels, at, own, place, rest);
    }
    interruption.spend((own + 3) * (own + rest) ** 2);
    if (own > 0) {
      if (!factorPanel(panels, at, own, own + rest)) throw new SingularMatrixError("pivot not positive");
      if (rest > 0) subtractBorder(panels, at, own, own + rest, stack, place);
    }
    if (target !== place) stack.copyWithin(target, place, place + size);
    top = target + size;
  }
  return { structure, panels };
}

/** Adds the border matrix of a child to the front of its parent. */
function extendAdd(
  structure: FrontStructure,
  child: number,
  stack: Float64Array,
  from: number,
  frontPlace: Int32Array,
  panels: Float64Array,
  at: number,
  own: number,
  place: number,
  rest: number,
): void {
  const start = structure.borderStart[child];
  const m = structure.borderStart[child + 1] - start;
  const { border } = structure;
  // Both lists ascend, so the child's unknowns that the parent eliminates come first.
  let inner = 0;
  while (inner < m && frontPlace[border[start + inner]] < own) inner++;
  for (let i = 0; i < m; i++) {
    const row = frontPlace[border[start + i]];
    const source = from + i * m;
    if (i < inner) {
      const to = at + row * own;
      for (let j = 0; j <= i; j++) panels[to + frontPlace[border[start + j]]] += stack[source + j];
    } else {
      const to = at + row * own;
      for (let j = 0; j < inner; j++) panels[to + frontPlace[border[start + j]]] += stack[source + j];
      const toBorder = place + (row - own) * rest - own;
      for (let j = inner; j <= i; j++) stack[toBorder + frontPlace[border[start + j]]] += stack[source + j];
    }
  }
}

/** Solves in place: `x` holds the right-hand side and then the solution, in elimination order. */
export function substitute(factor: Factor, x: Float64Array): void {
  const { panels, structure } = factor;
  const { tree, ownFirst, borderStart, border, panelStart } = structure;
  for (let node = 0; node < tree.nodeCount; node++) {
    const first = ownFirst[node];
    const own = ownFirst[node + 1] - first;
    if (own === 0) continue;
    let row = panelStart[node];
    for (let i = 0; i < own; i++, row += own) {
      let s = x[first + i];
      for (let j = 0; j < i; j++) s -= panels[row + j] * x[first + j];
      x[first + i] = s / panels[row + i];
    }
    for (let k = borderStart[node]; k < borderStart[node + 1]; k++, row += own) {
      let s = 0;
      for (let j = 0; j < own; j++) s += panels[row + j] * x[first + j];
      x[border[k]] -= s;
    }
  }
  for (let node = tree.nodeCount - 1; node >= 0; node--) {
    const first = ownFirst[node];
    const own = ownFirst[node + 1] - first;
    if (own === 0) continue;
    let row = panelStart[node] + own * own;
    for (let k = borderStart[node]; k < borderStart[node + 1]; k++, row += own) {
      const value = x[border[k]];
      if (value === 0) continue;
      for (let j = 0; j < own; j++) x[first + j] -= panels[row + j] * value;
    }
    for (let i = own - 1; i >= 0; i--) {
      const at = panelStart[node] + i * own;
      const value = x[first + i] / panels[at + i];
      x[first + i] = value;
      for (let j = 0; j < i; j++) x[first + j] -= panels[at + j] * value;
    }
  }
}
