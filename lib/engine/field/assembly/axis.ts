/**
 * Bodies of revolution: what the axis asks of the stream function.
 *
 * With r = x, the problem on the half section is that of a sheet of conductance 2πrσ: ∫2πrσ|∇V|² for the potential,
 * ∫ρ|rot ψ|²/(2πr) for the stream function, which is the enclosed current. Near the axis ψ must behave like C + O(r²),
 * else its energy is infinite. In polynomials: ψ is C on the axis (it is an insulated run), and its derivative
 * across the axis vanishes there. On an edge that leaves the axis this fixes the function of order 2 by all
 * others; within a triangle that has an edge on the axis it fixes some interior functions.
 */

import type { ElementSet } from "./elements";

export interface AxisEdges {
  /** 1 for vertices on the axis. */
  readonly vertex: Uint8Array;
  /** For each edge with one end on the axis: 1 if that is the end with the smaller number, 2 if the larger; else 0. */
  readonly end: Uint8Array;
}

/** Edges that leave the axis x = 0, or null if the mesh has no vertex there. */
export function findAxisEdges(set: ElementSet): AxisEdges | null {
  const { xy } = set.mesh;
  const vertex = new Uint8Array(set.vertexCount);
  let any = false;
  for (let v = 0; v < set.vertexCount; v++) {
    if (xy[2 * v] !== 0) continue;
    vertex[v] = 1;
    any = true;
  }
  if (!any) return null;
  const end = new Uint8Array(set.edges.count);
  for (let e = 0; e < end.length; e++) {
    const low = vertex[set.edges.ends[2 * e]];
    const high = vertex[set.edges.ends[2 * e + 1]];
    if (low !== high) end[e] = low ? 1 : 2;
  }
  return { vertex, end };
}

/**
 * Size of the derivative of the edge function of order k at the ends of an edge, against the parameter that runs from
 * -1 to 1. It is (-1)^k times this at the lower end and the negative of it at the upper end.
 */
function slope(k: number): number {
  return Math.sqrt((2 * k - 1) / 2);
}

/**
 * The coefficient of the order-2 function of an edge that leaves the axis, as weights of the values at its lower and
 * upper end and of its functions of order 3 … p: the derivative along the edge vanishes at the axis.
 */
export function dependentWeights(end: number, order: number): { low: number; high: number; modes: number[] } {
  const modes: number[] = [];
  if (end === 1) {
    // (high - low)/2 + Σ (-1)^k slope_k c_k = 0 at the lower end.
    for (let k = 3; k <= order; k++) modes.push((k % 2 === 0 ? -slope(k) : slope(k)) / slope(2));
    return { low: 0.5 / slope(2), high: -0.5 / slope(2), modes };
  }
  // (high - low)/2 - Σ slope_k c_k = 0 at the upper end.
  for (let k = 3; k <= order; k++) modes.push(-slope(k) / slope(2));
  return { low: -0.5 / slope(2), high: 0.5 / slope(2), modes };
}

/** Local edge of triangle t that lies on the axis, or -1. */
export function axisEdgeOf(set: ElementSet, axis: AxisEdges, t: number): number {
  const { triangles } = set.mesh;
  for (let i = 0; i < 3; i++) {
    if (axis.vertex[triangles[3 * t + ((i + 1) % 3)]] && axis.vertex[triangles[3 * t + ((i + 2) % 3)]])
      return i;
  }
  return -1;
}

/** Local vertex of triangle t on the axis, the first if there are two; -1 if there is none. */
export function axisVertexOf(set: ElementSet, axis: AxisEdges, t: number): number {
  const { triangles } = set.mesh;
  for (let i = 0; i < 3; i++) if (axis.vertex[triangles[3 * t + i]]) return i;
  return -1;
}
