/**
 * How far the mesh's boundary is from the outline's, and what that can do to an energy.
 *
 * Midpoints of slanting edges are rounded, so a refined mesh fills a polygon that differs from the domain by parts of
 * 1e-16, and so does the domain from the coordinates as submitted. Let T be the continuous, piecewise linear map that
 * moves the vertices to where they belong. Carrying a field over by T keeps it admissible and changes the energy of a
 * triangle by at most the factor ((1+ε)/(1-ε))² with ε = Σ (displacement of a vertex)/(its height in the triangle):
 * the singular values of the gradient of T lie in [1-ε, 1+ε].
 */

import { orient } from "../mesh/predicates";
import type { FieldMesh } from "../mesh/mesh";
import type { Domain } from "../outline/domain";
import { findBoundaryRuns } from "../assembly/boundary-runs";

/** Rounding of a coordinate when an outline is moved into its domain: 2^-53 of the extent in x and in y. */
const OF_FRAME = 2 ** -53 * Math.SQRT2;

/** Bound for midpoints that are not measured (borders of media): 64 halvings, each rounded by 2^-54 in x and y. */
const OF_MIDPOINTS = 64 * 2 ** -54 * Math.SQRT2;

export class BoundaryReference {
  /** Point of the domain at each vertex of the first mesh, or -1; refinement keeps the numbers of old vertices. */
  private readonly pointOf: Int32Array;

  constructor(
    private readonly domain: Domain,
    first: FieldMesh,
  ) {
    const byX = new Map<number, number[]>();
    for (let p = 0; p < domain.xy.length / 2; p++) {
      const list = byX.get(domain.xy[2 * p]);
      if (list) list.push(p);
      else byX.set(domain.xy[2 * p], [p]);
    }
    this.pointOf = new Int32Array(first.xy.length / 2).fill(-1);
    for (let v = 0; v < this.pointOf.length; v++) {
      const candidates = byX.get(first.xy[2 * v]);
      const p = candidates?.find((q) => domain.xy[2 * q + 1] === first.xy[2 * v + 1]);
      if (p !== undefined) this.pointOf[v] = p;
    }
  }

  /** For each triangle of a refined mesh a bound of the relative change of its energy. */
  displacements(mesh: FieldMesh): Float64Array {
    const offset = this.offsets(mesh);
    const { xy, triangles } = mesh;
    const result = new Float64Array(triangles.length / 3);
    for (let t = 0; t < result.length; t++) {
      const a = triangles[3 * t];
      const b = triangles[3 * t + 1];
      const c = triangles[3 * t + 2];
      if (offset[a] === 0 && offset[b] === 0 && offset[c] === 0) continue;
      const area2 = Math.abs(
        (xy[2 * b] - xy[2 * a]) * (xy[2 * c + 1] - xy[2 * a + 1]) -
          (xy[2 * c] - xy[2 * a]) * (xy[2 * b + 1] - xy[2 * a + 1]),
      );
      const epsilon =
        (offset[a] * distance(xy, b, c) + offset[b] * distance(xy, c, a) + offset[c] * distance(xy, a, b)) /
        area2;
      result[t] = epsilon < 0.1 ? ((1 + epsilon) / (1 - epsilon)) ** 2 - 1 : Infinity;
    }
    return result;
  }

  /** Distance of each vertex from where it belongs: zero inside one medium. */
  private offsets(mesh: FieldMesh): Float64Array {
    const { xy, triangles, region } = mesh;
    const offset = new Float64Array(xy.length / 2);
    const medium = new Int32Array(offset.length).fill(-1);
    for (let h = 0; h < triangles.length; h++) {
      const v = triangles[h];
      const r = region[(h / 3) | 0];
      if (medium[v] < 0) medium[v] = r;
      else if (medium[v] !== r) offset[v] = OF_FRAME + OF_MIDPOINTS;
    }
    const { next } = findBoundaryRuns(mesh);
    const point = (v: number): number => (v < this.pointOf.length ? this.pointOf[v] : -1);
    for (let v = 0; v < this.pointOf.length; v++) {
      if (next[v] < 0 || point(v) < 0) continue;
      offset[v] = OF_FRAME;
      let end = next[v];
      while (point(end) < 0) end = next[end];
      const { xy: at } = this.domain;
      const [ax, ay] = [at[2 * point(v)], at[2 * point(v) + 1]];
      const [bx, by] = [at[2 * point(end)], at[2 * point(end) + 1]];
      const length = Math.hypot(bx - ax, by - ay);
      for (let w = next[v]; w !== end; w = next[w]) {
        const off = Math.abs(orient(ax, ay, bx, by, xy[2 * w], xy[2 * w + 1])) / length;
        offset[w] = Math.max(offset[w], OF_FRAME + off * (1 + 1e-9));
      }
    }
    return offset;
  }
}

function distance(xy: Float64Array, a: number, b: number): number {
  return Math.hypot(xy[2 * a] - xy[2 * b], xy[2 * a + 1] - xy[2 * b + 1]);
}
