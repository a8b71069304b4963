/**
 * Where the current crowds.
 *
 * At a vertex where the potential goes like r^α with α < 1 (re-entrant corners, ends of terminals) the density is
 * unbounded; then the value at a stated distance from the worst of them is given. Otherwise it is the greatest value
 * found.
 */

import { chordDensities } from "./chord-density";
import type { FieldMap } from "./field-map";
import { FieldSampler } from "./sampler";

export interface DensityPeak {
  /** The density grows without limit towards `position`. */
  readonly unbounded: boolean;
  /** In the outline's unit. */
  readonly position: [number, number];
  /** A/m (sheet) or A/m² (axisymmetric) for one volt: at `distanceM` from the position, or at it. */
  readonly density: number;
  readonly fieldVperM: number;
  /** How far off the density of an arc may be because it was read at chords, relatively; 0 elsewhere. */
  readonly spread: number;
  /** Distance in metres at which an unbounded peak was read; 0 for a bounded one. */
  readonly distanceM: number;
}

/** Exponents nearer to one than this are too weak to be told from none. */
const WEAKEST = 1e-3;

/** Distance from a corner as a part of the outline's extent, unless other corners are near. */
const DISTANCE = 0.005;

/** @param conductance Of the whole conductor, where it has but one: arcs are then read by the means of their chords. */
export function densityPeak(map: FieldMap, conductance: number | null): DensityPeak {
  const sampler = new FieldSampler(map);
  const unbounded: number[] = [];
  map.singularVertex.forEach((v, k) => {
    if (map.singularExponent[k] < 1 - WEAKEST) unbounded.push(v);
  });
  return (
    (unbounded.length > 0 && worstCorner(map, sampler, unbounded)) || greatest(map, sampler, conductance)
  );
}

function worstCorner(map: FieldMap, sampler: FieldSampler, corners: readonly number[]): DensityPeak | null {
  const { xy } = map;
  const distance = commonDistance(map, corners);
  let best: DensityPeak | null = null;
  for (const v of corners) {
    const found = aroundCorner(map, sampler, v, distance);
    if (!found || (best && found.density <= best.density)) continue;
    best = {
      unbounded: true,
      position: inOutline(map, xy[2 * v], xy[2 * v + 1]),
      distanceM: distance * map.unitM,
      spread: 0,
      ...found,
    };
  }
  return best;
}

/** One distance for all corners: a part of the extent, but no more than a quarter of the way to the next corner. */
function commonDistance(map: FieldMap, corners: readonly number[]): number {
  const { xy } = map;
  let nearest = DISTANCE * 4;
  const sorted = [...corners].sort((a, b) => xy[2 * a] - xy[2 * b]);
  for (let i = 0; i < sorted.length; i++) {
    const a = sorted[i];
    for (let j = i + 1; j < sorted.length && xy[2 * sorted[j]] - xy[2 * a] < nearest; j++) {
      const b = sorted[j];
      nearest = Math.min(nearest, Math.hypot(xy[2 * a] - xy[2 * b], xy[2 * a + 1] - xy[2 * b + 1]));
    }
  }
  return nearest / 4;
}

const DIRECTIONS = 72;

/** The greatest density on the circle of the given radius around a vertex, inside the conductor. */
function aroundCorner(
  map: FieldMap,
  sampler: FieldSampler,
  v: number,
  radius: number,
): { density: number; fieldVperM: number } | null {
  let best: { density: number; fieldVperM: number } | null = null;
  for (let k = 0; k < DIRECTIONS; k++) {
    const angle = (2 * Math.PI * k) / DIRECTIONS;
    const x = map.xy[2 * v] + radius * Math.cos(angle);
    const y = map.xy[2 * v + 1] + radius * Math.sin(angle);
    const values = sampler.atDomain(x, y);
    if (!values) continue;
    const density = Math.hypot(...values.density);
    if (!best || density > best.density) best = { density, fieldVperM: Math.hypot(...values.field) };
  }
  return best;
}

/**
 * The greatest density over all vertices and middles of the triangles. Vertices of chords have one of their own: at them
 * the means of the chords stand for the arc, or the middles of the sides where the medium varies.
 */
function greatest(map: FieldMap, sampler: FieldSampler, conductance: number | null): DensityPeak {
  const { xy, triangles } = map;
  const ofChords = new Set(map.chordVertex);
  let best: DensityPeak = {
    unbounded: false,
    position: inOutline(map, xy[0], xy[1]),
    density: 0,
    fieldVperM: 0,
    distanceM: 0,
    spread: 0,
  };
  for (const { x, y, density, fieldVperM, spread } of conductance === null
    ? []
    : chordDensities(map, conductance)) {
    if (density <= best.density) continue;
    best = { unbounded: false, position: inOutline(map, x, y), density, fieldVperM, distanceM: 0, spread };
  }
  for (let t = 0; t < triangles.length / 3; t++) {
    const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
    const corners = [a, b, c].filter((v) => !ofChords.has(v / 2));
    // In a uniform medium the greatest density is on the boundary, and the chords have theirs.
    if (corners.length < 3 && conductance !== null) continue;
    const points: [number, number][] = corners.map((v) => [xy[v], xy[v + 1]]);
    if (corners.length < 3) {
      for (const [p, q] of [
        [a, b],
        [b, c],
        [c, a],
      ]) {
        points.push([(xy[p] + xy[q]) / 2, (xy[p + 1] + xy[q + 1]) / 2]);
      }
    }
    points.push([(xy[a] + xy[b] + xy[c]) / 3, (xy[a + 1] + xy[b + 1] + xy[c + 1]) / 3]);
    for (const [x, y] of points) {
      if (map.axisymmetric && x === 0) continue;
      const values = sampler.inTriangle(t, x, y);
      const density = Math.hypot(...values.density);
      if (density <= best.density) continue;
      best = {
        unbounded: false,
        position: inOutline(map, x, y),
        density,
        fieldVperM: Math.hypot(...values.field),
        distanceM: 0,
        spread: 0,
      };
    }
  }
  return best;
}

function inOutline(map: FieldMap, x: number, y: number): [number, number] {
  return [x * map.scale + map.origin[0], y * map.scale + map.origin[1]];
}
