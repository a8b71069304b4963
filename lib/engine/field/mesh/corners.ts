import type { FieldMesh } from "./mesh";

/** The boundary's vertices, one entry each, in the order of the boundary's edges. */
export interface CornerAngles {
  readonly vertex: Int32Array;
  /** Angle inside the conductor, in radians, in (0, 2π). */
  readonly angle: Float64Array;
  /** Side of the boundary edge that ends in the vertex, and of the one that starts there. */
  readonly sideBefore: Int32Array;
  readonly sideAfter: Int32Array;
}

/**
 * The conductor's angle at every boundary vertex and the two sides that meet there. Where one is insulated and the other a
 * terminal the field behaves like r^(π/2ω), otherwise like r^(π/ω).
 */
export function cornerAngles(mesh: FieldMesh): CornerAngles {
  const { xy, boundary } = mesh;
  const count = boundary.length / 3;
  const arriving = new Int32Array(xy.length / 2).fill(-1);
  for (let e = 0; e < count; e++) arriving[boundary[3 * e + 1]] = e;
  const vertex = new Int32Array(count);
  const angle = new Float64Array(count);
  const sideBefore = new Int32Array(count);
  const sideAfter = new Int32Array(count);
  for (let e = 0; e < count; e++) {
    const v = boundary[3 * e];
    const next = boundary[3 * e + 1];
    const into = arriving[v];
    const previous = boundary[3 * into];
    const ax = xy[2 * next] - xy[2 * v];
    const ay = xy[2 * next + 1] - xy[2 * v + 1];
    const bx = xy[2 * previous] - xy[2 * v];
    const by = xy[2 * previous + 1] - xy[2 * v + 1];
    const turn = Math.atan2(ax * by - ay * bx, ax * bx + ay * by);
    vertex[e] = v;
    angle[e] = turn > 0 ? turn : turn + 2 * Math.PI;
    sideBefore[e] = boundary[3 * into + 2];
    sideAfter[e] = boundary[3 * e + 2];
  }
  return { vertex, angle, sideBefore, sideAfter };
}
