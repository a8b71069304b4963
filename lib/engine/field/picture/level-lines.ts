/**
 * Level lines on a sub-grid. A small triangle is (t, i, j, up): up has the corners (i,j), (i+1,j), (i,j+1), down has
 * (i+1,j+1), (i,j+1), (i+1,j); side k of either lies opposite corner k.
 */

import type { SubGrid } from "./subgrid";

/** A small triangle together with one of its sides. */
interface Gate {
  t: number;
  i: number;
  j: number;
  up: boolean;
  side: number;
}

/** A line in the domain's frame, x and y interleaved. */
export type Polyline = number[];

export class LevelTracer {
  private readonly stamp: Int32Array;
  private stamps = 0;

  constructor(
    private readonly grid: SubGrid,
    /** Lattice values of the function: `grid.potential` or `grid.stream`. */
    private readonly values: Float64Array,
  ) {
    this.stamp = new Int32Array((grid.map.triangles.length / 3) * grid.parts ** 2);
  }

  /** All lines of one level of a function that is continuous over the whole mesh. */
  linesAt(level: number): Polyline[] {
    const lines: Polyline[] = [];
    const visited = ++this.stamps;
    const m = this.grid.parts;
    for (let t = 0; t < this.grid.map.triangles.length / 3; t++) {
      if (!this.crosses(t, level)) continue;
      for (let j = 0; j < m; j++) {
        for (let i = 0; i + j < m; i++) {
          for (const up of i + j < m - 1 ? [true, false] : [true]) {
            const gate: Gate = { t, i, j, up, side: 0 };
            if (this.stamp[this.numberOf(gate)] === visited) continue;
            const sides = [0, 1, 2].filter((side) => this.crossed(gate, side, level));
            if (sides.length !== 2) continue;
            const forward = this.follow({ ...gate, side: sides[0] }, level, visited);
            const backward = this.follow({ ...gate, side: sides[1] }, level, visited);
            lines.push(joined(backward, forward));
          }
        }
      }
    }
    return lines;
  }

  /** The line that starts on a boundary edge: edge `edge` of triangle t, small side k along it. */
  lineFrom(t: number, edge: number, k: number, level: number): Polyline {
    return this.follow(this.atEdge(t, edge, k), level, ++this.stamps, true);
  }

  private crosses(t: number, level: number): boolean {
    const { pointsPerTriangle: n } = this.grid;
    let below = false;
    let above = false;
    for (let k = t * n; k < (t + 1) * n; k++) {
      if (this.values[k] >= level) above = true;
      else below = true;
    }
    return below && above;
  }

  private numberOf({ t, i, j, up }: Gate): number {
    const m = this.grid.parts;
    // Row j has 2(m-j)-1 small triangles, up and down in turn.
    return t * m * m + j * (2 * m - j) + 2 * i + (up ? 0 : 1);
  }

  private corner(gate: Gate, k: number): [number, number] {
    const { i, j, up } = gate;
    if (up) return k === 0 ? [i, j] : k === 1 ? [i + 1, j] : [i, j + 1];
    return k === 0 ? [i + 1, j + 1] : k === 1 ? [i, j + 1] : [i + 1, j];
  }

  private valueAt(t: number, [i, j]: readonly [number, number]): number {
    return this.values[t * this.grid.pointsPerTriangle + this.grid.lattice(i, j)];
  }

  private crossed(gate: Gate, side: number, level: number): boolean {
    const a = this.valueAt(gate.t, this.corner(gate, (side + 1) % 3)) >= level;
    const b = this.valueAt(gate.t, this.corner(gate, (side + 2) % 3)) >= level;
    return a !== b;
  }

  private pointOn(gate: Gate, side: number, level: number): [number, number] {
    const p = this.corner(gate, (side + 1) % 3);
    const q = this.corner(gate, (side + 2) % 3);
    const a = this.valueAt(gate.t, p);
    const b = this.valueAt(gate.t, q);
    const s = a === b ? 0.5 : Math.min(1, Math.max(0, (level - a) / (b - a)));
    return this.grid.place(gate.t, p[0] + s * (q[0] - p[0]), p[1] + s * (q[1] - p[1]));
  }

  /**
   * Points from the entry side on until the boundary or a triangle that was visited (unless `again`, for a line of
   * its own). Across a cut the function jumps; the level goes with it.
   */
  private follow(start: Gate, level: number, visited: number, again = false): Polyline {
    const line: Polyline = [...this.pointOn(start, start.side, level)];
    let gate = start;
    let c = level;
    let first = true;
    for (;;) {
      const id = this.numberOf(gate);
      if (!first && this.stamp[id] === visited) return line;
      this.stamp[id] = visited;
      const exit = [0, 1, 2].find((side) => side !== gate.side && this.crossed(gate, side, c));
      if (exit === undefined || (first && !again && !this.crossed(gate, gate.side, c))) return line;
      line.push(...this.pointOn(gate, exit, c));
      const next = this.through(gate, exit);
      if (!next) return line;
      if (next.t !== gate.t) c += this.jump(gate, exit, next);
      if (!this.crossed(next, next.side, c)) return line;
      gate = next;
      first = false;
    }
  }

  /** What is added to the level when the line goes from one mesh triangle into the next. */
  private jump(gate: Gate, exit: number, next: Gate): number {
    const here = this.valueAt(gate.t, this.corner(gate, (exit + 1) % 3));
    const there = this.valueAt(next.t, this.corner(next, (next.side + 2) % 3));
    return there - here;
  }

  /** The small triangle on the other side, or null at the boundary. */
  private through(gate: Gate, side: number): Gate | null {
    const { t, i, j, up } = gate;
    const m = this.grid.parts;
    if (!up) {
      if (side === 0) return { t, i, j, up: true, side: 0 };
      if (side === 1) return { t, i: i + 1, j, up: true, side: 1 };
      return { t, i, j: j + 1, up: true, side: 2 };
    }
    if (side === 0 && i + j < m - 1) return { t, i, j, up: false, side: 0 };
    if (side === 1 && i > 0) return { t, i: i - 1, j, up: false, side: 1 };
    if (side === 2 && j > 0) return { t, i, j: j - 1, up: false, side: 2 };
    const other = this.grid.across[3 * t + side];
    if (other < 0) return null;
    // Steps along the edge, counter-clockwise here, run backwards in the neighbour.
    const along = side === 0 ? j : side === 1 ? m - 1 - j : i;
    return this.atEdge((other / 3) | 0, other % 3, m - 1 - along);
  }

  /** The small triangle at step k of an edge of a mesh triangle, entered through that edge. */
  private atEdge(t: number, edge: number, k: number): Gate {
    const m = this.grid.parts;
    if (edge === 0) return { t, i: m - 1 - k, j: k, up: true, side: 0 };
    if (edge === 1) return { t, i: 0, j: m - 1 - k, up: true, side: 1 };
    return { t, i: k, j: 0, up: true, side: 2 };
  }
}

/** Two half lines that start on two sides of the same small triangle, made one. */
function joined(backward: Polyline, forward: Polyline): Polyline {
  // Both hold the two points of the first triangle, in opposite order.
  const line: Polyline = [];
  for (let k = backward.length - 2; k >= 2; k -= 2) line.push(backward[k], backward[k + 1]);
  return line.concat(forward.length > 2 && line.length >= 2 ? forward.slice(2) : forward);
}

/** Leaves out points that lie within `tolerance` of the chord between their neighbours that are kept. */
export function simplified(line: Polyline, tolerance: number): Polyline {
  const n = line.length / 2;
  if (n <= 2) return line;
  const kept = [line[0], line[1]];
  let last = 0;
  for (let k = 2; k < n; k++) {
    if (staysNear(line, last, k, tolerance)) continue;
    last = k - 1;
    kept.push(line[2 * last], line[2 * last + 1]);
  }
  kept.push(line[2 * n - 2], line[2 * n - 1]);
  return kept;
}

/** Whether all points between two of a line lie within the tolerance of the chord; long stretches are cut. */
function staysNear(line: Polyline, from: number, to: number, tolerance: number): boolean {
  if (to - from > 64) return false;
  const dx = line[2 * to] - line[2 * from];
  const dy = line[2 * to + 1] - line[2 * from + 1];
  const length = Math.hypot(dx, dy);
  if (length === 0) return false;
  for (let k = from + 1; k < to; k++) {
    const off = dx * (line[2 * k + 1] - line[2 * from + 1]) - dy * (line[2 * k] - line[2 * from]);
    if (Math.abs(off) > tolerance * length) return false;
  }
  return true;
}
