/**
 * Carries out a refinement plan: bisection, layers, and the order of every new triangle.
 */

import { refine } from "../mesh/bisect";
import { refineTowards } from "../mesh/corner-layers";
import type { FieldMesh } from "../mesh/mesh";
import { STAR_ORDER, type RefinementPlan } from "./plan";

export interface OrderedMesh {
  readonly mesh: FieldMesh;
  readonly order: Uint8Array;
  /** Gap above which a triangle that was raised in order disappoints; Infinity for the others. */
  readonly disappointment: Float64Array;
}

export function applyPlan(mesh: FieldMesh, plan: RefinementPlan): OrderedMesh {
  const bisected = plan.marks.some((mark) => mark > 0) ? inherit(mesh, (m) => refine(m, plan.marks)) : null;
  const middle = bisected ? bisected.mesh : mesh;
  const order = Uint8Array.from(bisected ? bisected.parent.map((t) => plan.order[t]) : plan.order);
  let { disappointment } = plan;
  if (bisected) disappointment = carriedOver(disappointment, bisected.parent);
  if (plan.vertices.length === 0) return { mesh: middle, order, disappointment };
  const graded = inherit(middle, (m) => refineTowards(m, plan.vertices, plan.layers));
  return {
    mesh: graded.mesh,
    order: ringOrders(middle, order, graded.mesh, graded.parent, plan),
    disappointment: carriedOver(disappointment, graded.parent),
  };
}

/** Values of triangles that were not divided; Infinity for parts. */
function carriedOver(values: Float64Array, parent: Int32Array): Float64Array {
  const parts = new Int32Array(values.length);
  for (const t of parent) parts[t]++;
  return Float64Array.from(parent, (t) => (parts[t] === 1 ? values[t] : Infinity));
}

interface Inherited {
  readonly mesh: FieldMesh;
  readonly parent: Int32Array;
}

/** Refines while every triangle carries the number of its ancestor in place of its medium. */
function inherit(mesh: FieldMesh, change: (mesh: FieldMesh) => FieldMesh): Inherited {
  const numbers = Int32Array.from({ length: mesh.region.length }, (_, t) => t);
  const changed = change({ ...mesh, region: numbers });
  const parent = changed.region;
  return { mesh: { ...changed, region: parent.map((t) => mesh.region[t]) }, parent };
}

/** Orders after layering: by the ring in which a triangle lies, measured from the vertex against its ancestor. */
function ringOrders(
  before: FieldMesh,
  orderBefore: Uint8Array,
  after: FieldMesh,
  parent: Int32Array,
  plan: RefinementPlan,
): Uint8Array {
  const which = new Int32Array(before.xy.length / 2).fill(-1);
  plan.vertices.forEach((v, i) => (which[v] = i));
  const order = new Uint8Array(parent.length);
  for (let t = 0; t < parent.length; t++) {
    const ancestor = parent[t];
    let p = orderBefore[ancestor];
    for (let i = 0; i < 3; i++) {
      const v = before.triangles[3 * ancestor + i];
      const k = which[v];
      if (k < 0) continue;
      const whole = centroidDistance(before, ancestor, v);
      const here = centroidDistance(after, t, v);
      const rings = plan.ringOrders[k];
      const ring = Math.round(Math.log2(whole / here) + 0.15);
      // Triangles in the outermost ring keep at least what their ring needs; those further in need less.
      const wanted = ring >= rings.length ? STAR_ORDER : rings[Math.max(0, ring)];
      p = Math.min(p === orderBefore[ancestor] ? wanted : p, wanted);
    }
    order[t] = p;
  }
  return order;
}

function centroidDistance(mesh: FieldMesh, t: number, v: number): number {
  const { xy, triangles } = mesh;
  let x = 0;
  let y = 0;
  for (let i = 0; i < 3; i++) {
    x += xy[2 * triangles[3 * t + i]];
    y += xy[2 * triangles[3 * t + i] + 1];
  }
  return Math.hypot(x / 3 - xy[2 * v], y / 3 - xy[2 * v + 1]);
}
