/**
 * A field map on a finer grid: every triangle is divided into m² equal ones, on which both functions count as linear.
 * Level lines follow from small triangle to small triangle and so never break or branch.
 */

import { ALL_FUNCTIONS, evaluateBasis } from "../element/basis";
import { edgeTable } from "../mesh/bisect";
import { layoutOf, type FieldMap } from "./field-map";

/** Small triangles in all, about. */
const ENOUGH = 200_000;
const MOST_PARTS = 8;

export class SubGrid {
  readonly parts: number;
  /** Lattice points of one triangle: (i, j) with i + j ≤ m, i to its second, j to its third vertex. */
  readonly pointsPerTriangle: number;
  readonly potential: Float64Array;
  readonly stream: Float64Array;
  /** Corner number 3t'+i' across edge i of triangle t (opposite its vertex i), or -1 at the boundary. */
  readonly across: Int32Array;
  /** First lattice number of row j. */
  private readonly rowStart: Int32Array;

  constructor(readonly map: FieldMap) {
    const count = map.triangles.length / 3;
    const m = Math.max(1, Math.min(MOST_PARTS, Math.floor(Math.sqrt(ENOUGH / count))));
    this.parts = m;
    this.pointsPerTriangle = ((m + 1) * (m + 2)) / 2;
    this.rowStart = new Int32Array(m + 2);
    for (let j = 0; j <= m; j++) this.rowStart[j + 1] = this.rowStart[j] + (m + 1 - j);
    this.potential = new Float64Array(count * this.pointsPerTriangle);
    this.stream = new Float64Array(count * this.pointsPerTriangle);
    this.across = neighbours(map);
    this.fill();
  }

  /** Number of lattice point (i, j) within a triangle. */
  lattice(i: number, j: number): number {
    return this.rowStart[j] + i;
  }

  private fill(): void {
    const { map, parts: m, pointsPerTriangle: points } = this;
    const basis = new Float64Array(points * ALL_FUNCTIONS);
    const [value, dx, dy] = [0, 1, 2].map(() => new Float64Array(ALL_FUNCTIONS));
    for (let j = 0; j <= m; j++) {
      for (let i = 0; i + j <= m; i++) {
        evaluateBasis(i / m, j / m, value, dx, dy);
        basis.set(value, this.lattice(i, j) * ALL_FUNCTIONS);
      }
    }
    for (let t = 0; t < map.triangles.length / 3; t++) {
      const { functions, size } = layoutOf(map, t);
      const start = map.start[t];
      for (let k = 0; k < points; k++) {
        let v = 0;
        let s = 0;
        const row = k * ALL_FUNCTIONS;
        for (let f = 0; f < size; f++) {
          v += map.potential[start + f] * basis[row + functions[f]];
          s += map.stream[start + f] * basis[row + functions[f]];
        }
        this.potential[t * points + k] = v;
        this.stream[t * points + k] = s;
      }
    }
  }

  /** Domain coordinates of the point at (i, j)/m of triangle t; i and j need not be whole. */
  place(t: number, i: number, j: number): [number, number] {
    const { xy, triangles } = this.map;
    const m = this.parts;
    const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
    const u = i / m;
    const v = j / m;
    return [
      xy[a] + u * (xy[b] - xy[a]) + v * (xy[c] - xy[a]),
      xy[a + 1] + u * (xy[b + 1] - xy[a + 1]) + v * (xy[c + 1] - xy[a + 1]),
    ];
  }
}

function neighbours(map: FieldMap): Int32Array {
  const { triangles, xy } = map;
  const { edgeOf, count } = edgeTable(triangles, xy.length / 2);
  const seen = new Int32Array(count).fill(-1);
  const across = new Int32Array(triangles.length).fill(-1);
  for (let h = 0; h < triangles.length; h++) {
    const other = seen[edgeOf[h]];
    if (other < 0) {
      seen[edgeOf[h]] = h;
      continue;
    }
    across[h] = other;
    across[other] = h;
  }
  return across;
}
