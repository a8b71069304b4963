import { BoxTree } from "./box-tree";
import { hilbertIndex } from "./insertion-order";
import type { FieldMesh } from "./mesh";

/** A point this far outside all triangles still counts as on the boundary; the domain's extent is 1. */
const OUTSIDE = 1e-12;

/** Finds the triangle at a point, in logarithmic time, for any mesh: graded, with holes, not convex. */
export class TriangleIndex {
  private readonly tree: BoxTree;
  private readonly order: Int32Array;

  constructor(private readonly mesh: FieldMesh) {
    const { xy, triangles } = mesh;
    const count = triangles.length / 3;
    const keys = new Float64Array(count);
    for (let t = 0; t < count; t++) {
      const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
      const key = hilbertIndex((xy[a] + xy[b] + xy[c]) / 3, (xy[a + 1] + xy[b + 1] + xy[c + 1]) / 3);
      keys[t] = key * 0x1000000 + t;
    }
    keys.sort();
    this.order = new Int32Array(count);
    for (let k = 0; k < count; k++) this.order[k] = keys[k] % 0x1000000;
    this.tree = new BoxTree(count, (item, box) => {
      const t = this.order[item];
      const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
      box[0] = Math.min(xy[a], xy[b], xy[c]);
      box[1] = Math.min(xy[a + 1], xy[b + 1], xy[c + 1]);
      box[2] = Math.max(xy[a], xy[b], xy[c]);
      box[3] = Math.max(xy[a + 1], xy[b + 1], xy[c + 1]);
    });
  }

  /** The triangle that holds (x, y), in the domain's frame; -1 outside the conductor. */
  find(x: number, y: number): number {
    let best = -1;
    let depth = -OUTSIDE;
    this.tree.search(x, y, OUTSIDE, (item) => {
      const inside = this.depth(this.order[item], x, y);
      if (inside >= depth) {
        depth = inside;
        best = this.order[item];
      }
      return depth >= 0 ? -1 : OUTSIDE;
    });
    return best;
  }

  /** Least distance of the point from the edges of triangle t, negative outside. */
  private depth(t: number, x: number, y: number): number {
    const { xy, triangles } = this.mesh;
    let least = Infinity;
    for (let i = 0; i < 3; i++) {
      const a = 2 * triangles[3 * t + i];
      const b = 2 * triangles[3 * t + ((i + 1) % 3)];
      const dx = xy[b] - xy[a];
      const dy = xy[b + 1] - xy[a + 1];
      least = Math.min(least, (dx * (y - xy[a + 1]) - dy * (x - xy[a])) / Math.hypot(dx, dy));
    }
    return least;
  }
}

const indices = new WeakMap<FieldMesh, TriangleIndex>();

/** The triangle of the mesh that holds (x, y), in the domain's frame; -1 outside the conductor. */
export function locate(mesh: FieldMesh, x: number, y: number): number {
  let index = indices.get(mesh);
  if (index === undefined) {
    index = new TriangleIndex(mesh);
    indices.set(mesh, index);
  }
  return index.find(x, y);
}
