/**
 * Corners that only the chords of an arc have. A curved outline is solved on polygons, at whose vertices the field is
 * singular a little; on the outline itself it is not, so the picture must not say that the current crowds there.
 */

import type { SingularVertex } from "../bounds/exponents";
import { arcDirection, arcNearest, arcPoint } from "../outline/arc";
import type { Ring } from "../outline/ring";

/** Chords turn by 45° at most (π/(π + π/4)); stronger corners are those of a terminal's end or of another medium. */
const WEAKEST_CHORD = 0.79;
/** Chords stray from their arc by no more than this, in units of the domain. */
const STRAY = 2e-3;
/** Vertices nearer than this are the outline's own. */
const SAME = 1e-9;
/** Interior angles beyond π by less than this share leave no corner: arcs that meet smoothly. */
const SMOOTH = 1e-3;

/** The singular vertices, parted by whether the field of the outline itself is singular there. */
export interface PartedVertices {
  readonly own: readonly SingularVertex[];
  readonly ofChords: readonly SingularVertex[];
}

/** @param xy Vertices of the mesh. */
export function partChordCorners(
  singular: readonly SingularVertex[],
  xy: Float64Array,
  rings: readonly Ring[],
): PartedVertices {
  const curved = rings.filter(({ arcs }) => arcs.some((arc) => arc !== null));
  const ofChords = singular.filter(({ vertex, exponent }) => {
    if (exponent < WEAKEST_CHORD || exponent >= 1) return false;
    return curved.some((ring) => isSmooth(ring, xy[2 * vertex], xy[2 * vertex + 1]));
  });
  const parted = new Set(ofChords);
  return { own: singular.filter((vertex) => !parted.has(vertex)), ofChords };
}

/** Whether the place lies on an arc of the ring and the outline does not turn into the conductor there. */
function isSmooth(ring: Ring, x: number, y: number): boolean {
  const count = ring.arcs.length;
  for (let k = 0; k < count; k++) {
    if (Math.hypot(ring.xy[2 * k] - x, ring.xy[2 * k + 1] - y) > SAME) continue;
    const before = (k + count - 1) % count;
    if (ring.arcs[before] === null && ring.arcs[k] === null) return false;
    return interiorAngle(ring, before, k) <= Math.PI * (1 + SMOOTH);
  }
  return ring.arcs.some((arc) => {
    if (arc === null) return false;
    const [px, py] = arcPoint(arc, arcNearest(arc, x, y));
    return Math.hypot(px - x, py - y) < STRAY;
  });
}

/** Angle of the conductor at the vertex between two edges, by their tangents. */
function interiorAngle(ring: Ring, before: number, after: number): number {
  const [ax, ay] = direction(ring, before, 1);
  const [bx, by] = direction(ring, after, 0);
  const turn = Math.atan2(ax * by - ay * bx, ax * bx + ay * by);
  // The conductor lies to the left of an outer ring that runs counter-clockwise, and of a hole that runs clockwise.
  const left = (ring.number === 0) === ring.area > 0;
  return Math.PI - (left ? turn : -turn);
}

function direction(ring: Ring, edge: number, t: number): readonly [number, number] {
  const arc = ring.arcs[edge];
  if (arc !== null) return arcDirection(arc, t);
  const { xy } = ring;
  const next = (edge + 1) % ring.arcs.length;
  return [xy[2 * next] - xy[2 * edge], xy[2 * next + 1] - xy[2 * edge + 1]];
}
