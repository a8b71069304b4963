/** Equipotentials and stream lines of a field map. */

import type { FieldMap } from "./field-map";
import { LevelTracer, simplified, type Polyline } from "./level-lines";
import { SubGrid } from "./subgrid";

export interface Equipotential {
  /** Volts, for one volt between the terminals. */
  readonly potential: number;
  /** Lines in the outline's unit, x and y interleaved. */
  readonly lines: readonly Polyline[];
}

export interface FieldLines {
  readonly equipotentials: readonly Equipotential[];
  /** Stream lines; the same current passes between any two neighbours. */
  readonly streamlines: readonly Polyline[];
  /** That current, in amperes for one volt. */
  readonly currentBetweenLines: number;
}

/** Lines are simplified to this part of the outline's extent. */
const TOLERANCE = 2e-4;

/** Levels are moved off values that vertices have for reasons of symmetry. */
const OFF_VERTICES = 1.37e-10;

/** `equipotentials` − 1 lines between the terminals' potentials, and `streamlines` stream lines. */
export function fieldLines(map: FieldMap, equipotentials = 20, streamlines = 20): FieldLines {
  const grid = new SubGrid(map);
  const toOutline = (line: Polyline): Polyline =>
    simplified(line, TOLERANCE).map((value, k) => value * map.scale + map.origin[k % 2]);
  const tracer = new LevelTracer(grid, grid.potential);
  const levels = Array.from({ length: equipotentials - 1 }, (_, k) => (k + 1) / equipotentials);
  return {
    equipotentials: levels.map((potential) => ({
      potential,
      lines: tracer.linesAt(potential + OFF_VERTICES).map(toOutline),
    })),
    streamlines: traceStreamlines(grid, map.current / streamlines).map(toOutline),
    currentBetweenLines: map.current / streamlines,
  };
}

interface InletStep {
  readonly t: number;
  readonly edge: number;
  readonly k: number;
}

/** Lines start where current enters the conductor, half a share from the first edge of each inlet. */
function traceStreamlines(grid: SubGrid, share: number): Polyline[] {
  const tracer = new LevelTracer(grid, grid.stream);
  const lines: Polyline[] = [];
  let passed = share / 2;
  for (const { t, edge, k } of inletSteps(grid)) {
    const [from, to] = stepValues(grid, t, edge, k);
    // Current enters where the stream function falls along the boundary.
    const inflow = from - to;
    if (inflow <= 0) continue;
    while (passed < inflow) {
      lines.push(tracer.lineFrom(t, edge, k, from - passed + OFF_VERTICES * share));
      passed += share;
    }
    passed -= inflow;
  }
  return lines;
}

/** Small boundary steps of all terminals, in the order of the boundary. */
function inletSteps(grid: SubGrid): InletStep[] {
  const { map, across, parts } = grid;
  const { triangles, boundary, sides } = map;
  const edgeAt = new Map<number, number>();
  for (let h = 0; h < across.length; h++) {
    if (across[h] < 0) edgeAt.set(triangles[h - (h % 3) + ((h + 1) % 3)], h);
  }
  const steps: InletStep[] = [];
  for (let b = 0; b < boundary.length; b += 3) {
    if (sides[boundary[b + 2]].terminal < 0) continue;
    const h = edgeAt.get(boundary[b]);
    if (h === undefined) continue;
    for (let k = 0; k < parts; k++) steps.push({ t: (h / 3) | 0, edge: h % 3, k });
  }
  return steps;
}

/** Stream function at the two ends of step k of an edge, in the direction of the boundary. */
function stepValues(grid: SubGrid, t: number, edge: number, k: number): [number, number] {
  const m = grid.parts;
  const at = (n: number): number => {
    const [i, j] = edge === 0 ? [m - n, n] : edge === 1 ? [0, m - n] : [n, 0];
    return grid.stream[t * grid.pointsPerTriangle + grid.lattice(i, j)];
  };
  return [at(k), at(k + 1)];
}
