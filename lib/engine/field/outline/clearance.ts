import { carveDomain } from "../mesh/planar-graph";
import { chordCount } from "./arc";
import { describeConflicts, describeNesting, describeRegionFaults } from "./complain";
import { findConflicts, type Conflict } from "./conflicts";
import { curvesMeet } from "./curve-meeting";
import { affordableTolerance, drawOutline, type DrawnOutline, type Drawing, type Role } from "./draw";
import { nestRings } from "./nesting";
import type { OutlineError } from "./schema";

/** An arc gets no more chords than this to tell it from its neighbours. */
const MOST_CHORDS = 8192;

/**
 * Draws the outline for a role and makes sure that no segments meet and that every hole lies inside. Where the chords of an
 * arc come into conflict, the arc gets more of them (kept in `leastChords`) before anything is said against it.
 */
export function drawClear(
  outline: DrawnOutline,
  role: Role,
  chordTolerance: number,
): { drawing: Drawing; errors: OutlineError[] } {
  for (;;) {
    const drawing = drawOutline(outline, role, affordableTolerance(outline, chordTolerance));
    const { conflicts, mesh } = findConflicts(drawing.domain, outline.frame.touch);
    if (conflicts.length > 0) {
      const genuine = trueMeetings(outline, drawing, conflicts);
      if (genuine.length > 0) {
        return { drawing, errors: describeConflicts(genuine, drawing, outline.rings, outline.frame) };
      }
      if (refineArcs(outline, drawing, conflicts, chordTolerance)) continue;
      return { drawing, errors: describeConflicts(conflicts, drawing, outline.rings, outline.frame) };
    }
    const errors: OutlineError[] = [];
    if (outline.rings.length > 1) {
      const around = nestRings(mesh, drawing, outline.rings.length);
      errors.push(...describeNesting(around, outline.rings, outline.frame));
    }
    if (outline.regions.borders.length > 0 && errors.length === 0) {
      errors.push(...describeRegionFaults(carveDomain(mesh, drawing.domain), drawing.overlaps));
    }
    // A small hole, or a region, may lie between an arc and its chord.
    if (errors.length > 0 && refineAll(outline, chordTolerance)) continue;
    return { drawing, errors };
  }
}

/** The conflicts in which the edges themselves meet, not only the chords of their arcs. */
function trueMeetings(outline: DrawnOutline, drawing: Drawing, conflicts: readonly Conflict[]): Conflict[] {
  const { rings, frame } = outline;
  const { segmentRing, segmentEdge } = drawing;
  const bowed = (s: number) => segmentRing[s] >= 0 && rings[segmentRing[s]].arcs[segmentEdge[s]] !== null;
  return conflicts.flatMap((conflict) => {
    const { first, second } = conflict;
    if (!bowed(first) && !bowed(second)) return [conflict];
    if (segmentRing[first] < 0 || segmentRing[second] < 0) return [];
    const a = rings[segmentRing[first]];
    const b = rings[segmentRing[second]];
    const point = curvesMeet(a, segmentEdge[first], b, segmentEdge[second], frame.touch, conflict);
    return point === null ? [] : [{ ...conflict, x: point[0], y: point[1] }];
  });
}

function refineArcs(
  outline: DrawnOutline,
  drawing: Drawing,
  conflicts: readonly Conflict[],
  chordTolerance: number,
): boolean {
  let refined = false;
  const done = new Set<string>();
  for (const { first, second } of conflicts) {
    for (const s of [first, second]) {
      const ring = drawing.segmentRing[s];
      const edge = drawing.segmentEdge[s];
      if (done.has(`${ring} ${edge}`)) continue;
      done.add(`${ring} ${edge}`);
      refined = refineArc(outline, ring, edge, chordTolerance) || refined;
    }
  }
  return refined;
}

function refineAll(outline: DrawnOutline, chordTolerance: number): boolean {
  let refined = false;
  outline.rings.forEach((ring, r) => {
    for (let e = 0; e < ring.arcs.length; e++) {
      if (outline.leastChords[r][e] <= 256) refined = refineArc(outline, r, e, chordTolerance) || refined;
    }
  });
  return refined;
}

function refineArc(outline: DrawnOutline, r: number, edge: number, chordTolerance: number): boolean {
  if (r < 0) return false;
  const arc = outline.rings[r].arcs[edge];
  if (arc === null) return false;
  const least = outline.leastChords[r];
  const now = chordCount(arc, 1, chordTolerance, least[edge]);
  if (now >= MOST_CHORDS) return false;
  least[edge] = 2 * now;
  return true;
}
