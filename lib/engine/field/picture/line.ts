/** Potential and density along a straight line. */

import { FieldSampler } from "./sampler";
import type { FieldMap } from "./field-map";

export interface LineSamples {
  /** Distance from the start in metres. */
  readonly distanceM: number[];
  /** Points in the outline's unit. */
  readonly points: [number, number][];
  /** Volts for one volt between the terminals; null outside the conductor. */
  readonly potential: (number | null)[];
  /** Size of the density: A/m (sheet) or A/m² (axisymmetric), for one volt; null outside. */
  readonly density: (number | null)[];
  /** Component of the density along the line. */
  readonly densityAlong: (number | null)[];
}

/** Samples at `count` (2 … 10,000) equal steps between two points given in the outline's unit. */
export function sampleLine(
  map: FieldMap,
  from: readonly [number, number],
  to: readonly [number, number],
  count = 201,
): LineSamples {
  const sampler = new FieldSampler(map);
  const dx = to[0] - from[0];
  const dy = to[1] - from[1];
  const length = Math.hypot(dx, dy);
  const metres = map.unitM / map.scale;
  const result: LineSamples = { distanceM: [], points: [], potential: [], density: [], densityAlong: [] };
  for (let k = 0; k < count; k++) {
    const t = k / (count - 1);
    const point: [number, number] = [from[0] + t * dx, from[1] + t * dy];
    const values = sampler.at(...point);
    result.distanceM.push(t * length * metres);
    result.points.push(point);
    result.potential.push(values ? values.potential : null);
    result.density.push(values ? Math.hypot(...values.density) : null);
    result.densityAlong.push(
      values && length > 0 ? (values.density[0] * dx + values.density[1] * dy) / length : null,
    );
  }
  return result;
}
