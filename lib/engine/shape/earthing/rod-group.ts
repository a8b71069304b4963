/**
 * Equal vertical rods in a line, a ring or a square grid, joined together: mutual resistances by the average-potential
 * method, (ρ/2π)·M(2L, s), and equal potentials. Rods that the arrangement's symmetry makes alike share one unknown.
 */
import { solveSymmetric } from "../../numeric/cholesky";
import type { Point } from "../drawing";
import { parallelMean } from "./line-potential";

export type Arrangement = "line" | "ring" | "square";

interface Layout {
  /** Places in multiples of the spacing. */
  readonly places: readonly Point[];
  /** Orbit of each rod under the symmetry, and one rod of each orbit. */
  readonly orbit: Int32Array;
  readonly representatives: readonly number[];
  /** Distance of two rods as an index into a table of distances (0 is the rod itself), and that table. */
  readonly key: (i: number, j: number) => number;
  readonly distances: Float64Array;
}

/** Places of the rods in multiples of the spacing, the spacing being the distance of neighbours. */
export function groupPlaces(arrangement: Arrangement, count: number): readonly Point[] {
  return layout(arrangement, count).places;
}

export interface RodGroup {
  /** Resistance over resistivity, 1/m. */
  readonly value: number;
  /** Geometric mean of all distances, a rod's own being its radius, m. */
  readonly meanDistance: number;
  /** Mean over the rods of (Σ direction/distance)², 1/m²: the field of the neighbours. */
  readonly fieldSquare: number;
}

/**
 * The group's resistance.
 * @param count 1 … 400; for `square` a square number.
 */
export function rodGroup(
  length: number,
  radius: number,
  spacing: number,
  count: number,
  arrangement: Arrangement,
): RodGroup {
  const { places, orbit, representatives, key, distances } = layout(arrangement, count);
  const m = representatives.length;
  const table = Float64Array.from(distances, (d, k) =>
    parallelMean(2 * length, k === 0 ? radius : d * spacing),
  );
  const logs = Float64Array.from(distances, (d, k) => (k === 0 ? Math.log(radius) : Math.log(d * spacing)));
  const sizes = new Float64Array(m);
  for (const index of orbit) sizes[index] += 1;
  const matrix = new Float64Array(m * m);
  let logSum = 0;
  let fieldSquare = 0;
  representatives.forEach((i, o) => {
    let fieldX = 0;
    let fieldY = 0;
    for (let j = 0; j < count; j++) {
      const k = key(i, j);
      // Each row times its orbit's size keeps the matrix symmetric.
      matrix[o * m + orbit[j]] += sizes[o] * table[k];
      logSum += sizes[o] * logs[k];
      if (j === i) continue;
      const square = (distances[k] * spacing) ** 2;
      fieldX += ((places[i][0] - places[j][0]) * spacing) / square;
      fieldY += ((places[i][1] - places[j][1]) * spacing) / square;
    }
    fieldSquare += (sizes[o] / count) * (fieldX * fieldX + fieldY * fieldY);
  });
  const currents = solveSymmetric(matrix, sizes.slice());
  let total = 0;
  for (let o = 0; o < m; o++) total += sizes[o] * currents[o];
  return {
    value: 1 / (2 * Math.PI * total),
    meanDistance: Math.exp(logSum / count / count),
    fieldSquare,
  };
}

function layout(arrangement: Arrangement, count: number): Layout {
  if (arrangement === "line") return lineLayout(count);
  return arrangement === "ring" ? ringLayout(count) : squareLayout(count);
}

function lineLayout(count: number): Layout {
  const half = Math.ceil(count / 2);
  return {
    places: Array.from({ length: count }, (_, i): Point => [i, 0]),
    orbit: Int32Array.from({ length: count }, (_, i) => Math.min(i, count - 1 - i)),
    representatives: Array.from({ length: half }, (_, i) => i),
    key: (i, j) => Math.abs(i - j),
    distances: Float64Array.from({ length: count }, (_, i) => i),
  };
}

function ringLayout(count: number): Layout {
  const step = Math.PI / count;
  const chord = (d: number) => (count === 1 ? 0 : Math.sin(step * d) / Math.sin(step));
  const circumradius = count === 1 ? 0 : 0.5 / Math.sin(step);
  return {
    places: Array.from({ length: count }, (_, i): Point => [
      circumradius * Math.cos(2 * step * i),
      circumradius * Math.sin(2 * step * i),
    ]),
    orbit: new Int32Array(count),
    representatives: [0],
    key: (i, j) => Math.min(Math.abs(i - j), count - Math.abs(i - j)),
    distances: Float64Array.from({ length: Math.floor(count / 2) + 1 }, (_, d) => chord(d)),
  };
}

function squareLayout(count: number): Layout {
  const side = Math.round(Math.sqrt(count));
  const orbit = new Int32Array(count);
  const representatives: number[] = [];
  const seen = new Map<number, number>();
  for (let i = 0; i < count; i++) {
    const row = Math.floor(i / side);
    const column = i % side;
    const a = Math.min(row, side - 1 - row);
    const b = Math.min(column, side - 1 - column);
    const name = Math.min(a, b) * side + Math.max(a, b);
    let index = seen.get(name);
    if (index === undefined) {
      index = representatives.length;
      seen.set(name, index);
      representatives.push(i);
    }
    orbit[i] = index;
  }
  return {
    places: Array.from({ length: count }, (_, i): Point => [i % side, Math.floor(i / side)]),
    orbit,
    representatives,
    key: (i, j) => {
      const rows = Math.abs(Math.floor(i / side) - Math.floor(j / side));
      const columns = Math.abs((i % side) - (j % side));
      return rows * side + columns;
    },
    distances: Float64Array.from({ length: count }, (_, k) => Math.hypot(Math.floor(k / side), k % side)),
  };
}
