/** The size of the current density on a regular grid. */

import type { FieldMap } from "./field-map";
import { FieldSampler } from "./sampler";

export interface DensityRaster {
  /** Centre of the first cell (lower left) and the cell's size, in the outline's unit. */
  readonly origin: [number, number];
  readonly cell: number;
  readonly columns: number;
  readonly rows: number;
  /** Row by row from below; null outside the conductor. A/m (sheet) or A/m² (axisymmetric), for one volt. */
  readonly density: (number | null)[];
}

/** Raster whose longer side has `resolution` (8 … 1024) cells, sampled at the cells' centres. */
export function densityRaster(map: FieldMap, resolution = 160): DensityRaster {
  const { xy } = map;
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity];
  for (let v = 0; v < xy.length; v += 2) {
    minX = Math.min(minX, xy[v]);
    maxX = Math.max(maxX, xy[v]);
    minY = Math.min(minY, xy[v + 1]);
    maxY = Math.max(maxY, xy[v + 1]);
  }
  const cell = Math.max(maxX - minX, maxY - minY) / resolution;
  const columns = Math.max(1, Math.ceil((maxX - minX) / cell - 1e-9));
  const rows = Math.max(1, Math.ceil((maxY - minY) / cell - 1e-9));
  const density = new Array<number | null>(columns * rows).fill(null);
  const sampler = new FieldSampler(map);
  const fill = new CellFiller(map, minX, minY, cell, columns, rows);
  for (let t = 0; t < map.triangles.length / 3; t++) {
    fill.cells(t, (k, x, y) => {
      if (density[k] === null) density[k] = Math.hypot(...sampler.inTriangle(t, x, y).density);
    });
  }
  return {
    origin: [map.origin[0] + (minX + cell / 2) * map.scale, map.origin[1] + (minY + cell / 2) * map.scale],
    cell: cell * map.scale,
    columns,
    rows,
    density,
  };
}

/** Finds the cells whose centres lie in a triangle. */
class CellFiller {
  constructor(
    private readonly map: FieldMap,
    private readonly minX: number,
    private readonly minY: number,
    private readonly cell: number,
    private readonly columns: number,
    private readonly rows: number,
  ) {}

  cells(t: number, visit: (cell: number, x: number, y: number) => void): void {
    const { xy, triangles } = this.map;
    const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
    const { minX, minY, cell } = this;
    const column = (x: number): number => (x - minX) / cell - 0.5;
    const row = (y: number): number => (y - minY) / cell - 0.5;
    const i0 = Math.max(0, Math.ceil(column(Math.min(xy[a], xy[b], xy[c])) - 1e-9));
    const i1 = Math.min(this.columns - 1, Math.floor(column(Math.max(xy[a], xy[b], xy[c])) + 1e-9));
    const j0 = Math.max(0, Math.ceil(row(Math.min(xy[a + 1], xy[b + 1], xy[c + 1])) - 1e-9));
    const j1 = Math.min(this.rows - 1, Math.floor(row(Math.max(xy[a + 1], xy[b + 1], xy[c + 1])) + 1e-9));
    for (let j = j0; j <= j1; j++) {
      const y = minY + (j + 0.5) * cell;
      for (let i = i0; i <= i1; i++) {
        const x = minX + (i + 0.5) * cell;
        if (inside(xy, a, b, x, y) && inside(xy, b, c, x, y) && inside(xy, c, a, x, y)) {
          visit(j * this.columns + i, x, y);
        }
      }
    }
  }
}

function inside(xy: Float64Array, a: number, b: number, x: number, y: number): boolean {
  const cross = (xy[b] - xy[a]) * (y - xy[a + 1]) - (xy[b + 1] - xy[a + 1]) * (x - xy[a]);
  return cross >= -1e-14;
}
