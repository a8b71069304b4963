/** Current through the boundary, edge by edge, from the stream function: exact for the discrete current. */

import type { FieldMap } from "./field-map";
import { layoutOf } from "./field-map";

export interface EdgeFlux {
  /** Ends in the outline's unit, conductor on the left. */
  readonly from: [number, number];
  readonly to: [number, number];
  readonly ring: number;
  /** Index of the terminal; insulated edges are left out. */
  readonly terminal: number;
  /** Current that leaves the conductor there, in amperes for one volt between the terminals; negative if it enters. */
  readonly current: number;
}

/** The flux of every boundary edge that belongs to a terminal. */
export function boundaryFlux(map: FieldMap): EdgeFlux[] {
  const { xy, triangles, boundary, sides, origin, scale } = map;
  const cornerOf = new Map<number, number>();
  const next = new Map<number, number>();
  for (let k = 0; k < boundary.length; k += 3) next.set(boundary[k], boundary[k + 1]);
  for (let h = 0; h < triangles.length; h++) {
    const base = h - (h % 3);
    if (next.get(triangles[h]) === triangles[base + ((h + 1) % 3)]) cornerOf.set(triangles[h], h);
  }
  const point = (v: number): [number, number] => [
    xy[2 * v] * scale + origin[0],
    xy[2 * v + 1] * scale + origin[1],
  ];
  const result: EdgeFlux[] = [];
  for (let k = 0; k < boundary.length; k += 3) {
    const { ring, terminal } = sides[boundary[k + 2]];
    if (terminal < 0) continue;
    const h = cornerOf.get(boundary[k]);
    if (h === undefined) continue;
    const t = (h / 3) | 0;
    const first = map.start[t] + layoutOf(map, t).interior;
    const from = first + (h % 3);
    const to = first + ((h + 1) % 3);
    const current = map.stream[to] - map.stream[from];
    result.push({ from: point(boundary[k]), to: point(boundary[k + 1]), ring, terminal, current });
  }
  return result;
}
