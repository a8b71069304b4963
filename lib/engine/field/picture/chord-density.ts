/**
 * The density along an arc, from a solution on its chords.
 *
 * Along a chord of length L between corners that turn by δ the density of the polygon is that of the arc times
 * |2 sin(πx/L)|^(-δ/π) (Schwarz–Christoffel, for many chords): without bound at the corners, 2^(-δ/π) at the middle. The
 * logarithm of that factor has the mean zero, so the mean over the chord is the arc's density but for terms in δ², and
 * differences of potential and stream function between the corners give it without any derivative. Beside a round hole
 * those terms come to 0.12·δ².
 */

import { layoutOf, type FieldMap } from "./field-map";

export interface ChordDensity {
  /** Middle of the chord, in the domain's frame. */
  readonly x: number;
  readonly y: number;
  /** A/m (sheet) or A/m² (axisymmetric) for one volt. */
  readonly density: number;
  readonly fieldVperM: number;
  /** How far off that may be, relatively. */
  readonly spread: number;
}

/** Part of the square of a corner's turn by which the density is taken to be uncertain. */
const SPREAD = 1 / 8;

/**
 * The mean density of every chord between two vertices that only chords make singular, and between three in a row the
 * greatest value of the parabola through them.
 * @param conductance Of the whole conductor: siemens per square, or S/m for a body of revolution.
 */
export function chordDensities(map: FieldMap, conductance: number): ChordDensity[] {
  const steps = boundarySteps(map);
  const ofChords = new Set(map.chordVertex);
  const chords = new Map<number, Chord>();
  for (const from of map.chordVertex) {
    const chord = chordFrom(map, steps, ofChords, from, conductance);
    if (chord) chords.set(from, chord);
  }
  const found: ChordDensity[] = [...chords.values()];
  for (const [, before] of chords) {
    const middle = chords.get(before.to);
    const after = middle && chords.get(middle.to);
    if (!middle || !after || middle.density < before.density || middle.density < after.density) continue;
    const bend = after.density - 2 * middle.density + before.density;
    if (!(bend < 0)) continue;
    const lift = 1 - (after.density - before.density) ** 2 / (8 * bend * middle.density);
    found.push({ ...middle, density: middle.density * lift, fieldVperM: middle.fieldVperM * lift });
  }
  return found;
}

interface Chord extends ChordDensity {
  readonly to: number;
}

/** The chord that leaves a vertex; null where the boundary turns before the next vertex of chords. */
function chordFrom(
  map: FieldMap,
  steps: ReadonlyMap<number, BoundaryStep>,
  ofChords: ReadonlySet<number>,
  from: number,
  conductance: number,
): Chord | null {
  const { xy, unitM } = map;
  const distance = (a: number, b: number) => Math.hypot(xy[2 * a] - xy[2 * b], xy[2 * a + 1] - xy[2 * b + 1]);
  let [to, walked, potential, stream] = [from, 0, 0, 0];
  // Refinement may have parted the chord.
  do {
    const step = steps.get(to);
    if (!step) return null;
    walked += distance(to, step.to);
    potential += step.potential;
    stream += step.stream;
    to = step.to;
  } while (to !== from && !ofChords.has(to));
  const straight = distance(from, to);
  if (!(walked <= straight * (1 + 1e-9))) return null;
  const x = (xy[2 * from] + xy[2 * to]) / 2;
  const y = (xy[2 * from + 1] + xy[2 * to + 1]) / 2;
  const length = straight * unitM;
  const around = map.axisymmetric ? 2 * Math.PI * x * unitM : 1;
  // Along an insulated chord the potential changes, along one of a terminal the stream function does.
  const density = Math.hypot((potential * conductance) / length, stream / (length * around));
  const turn = angleBetween(xy, from, to, steps.get(to)?.to ?? to);
  return { x, y, density, fieldVperM: density / conductance, spread: SPREAD * turn ** 2, to };
}

/** Angle by which the way from a to b turns towards c, in radians. */
function angleBetween(xy: Float64Array, a: number, b: number, c: number): number {
  const [ux, uy] = [xy[2 * b] - xy[2 * a], xy[2 * b + 1] - xy[2 * a + 1]];
  const [vx, vy] = [xy[2 * c] - xy[2 * b], xy[2 * c + 1] - xy[2 * b + 1]];
  return Math.atan2(ux * vy - uy * vx, ux * vx + uy * vy);
}

interface BoundaryStep {
  readonly to: number;
  /** Changes along the edge, read in its triangle: across a cut the stream function jumps. */
  readonly potential: number;
  readonly stream: number;
}

/** The boundary edge that leaves each vertex of the boundary. */
function boundarySteps(map: FieldMap): ReadonlyMap<number, BoundaryStep> {
  const { boundary, triangles } = map;
  const next = new Map<number, number>();
  for (let e = 0; e < boundary.length; e += 3) next.set(boundary[e], boundary[e + 1]);
  const steps = new Map<number, BoundaryStep>();
  for (let corner = 0; corner < triangles.length; corner++) {
    const t = (corner / 3) | 0;
    const other = 3 * t + ((corner + 1) % 3);
    if (next.get(triangles[corner]) !== triangles[other]) continue;
    const first = map.start[t] + layoutOf(map, t).interior;
    const [a, b] = [first + (corner % 3), first + (other % 3)];
    steps.set(triangles[corner], {
      to: triangles[other],
      potential: map.potential[b] - map.potential[a],
      stream: map.stream[b] - map.stream[a],
    });
  }
  return steps;
}
