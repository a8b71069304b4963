import type { RegionFault } from "../mesh/planar-graph";
import type { Conflict } from "./conflicts";
import type { Drawing } from "./draw";
import { showDomainPoint, submittedPoint, type Frame } from "./frame";
import { regionPointer } from "./region-net";
import type { Ring } from "./ring";
import type { OutlineError } from "./schema";

/** Sentences about segments that meet, each with the place; one for each pair of edges and place. */
export function describeConflicts(
  conflicts: readonly Conflict[],
  drawing: Drawing,
  rings: readonly Ring[],
  frame: Frame,
): OutlineError[] {
  const { segmentRing } = drawing;
  const errors = new Map<string, OutlineError>();
  for (const conflict of conflicts) {
    let [s, r] = [conflict.first, conflict.second];
    if (segmentRing[s] > segmentRing[r]) [s, r] = [r, s];
    const describe = segmentRing[s] < 0 ? describeRegionConflict : describeRingConflict;
    const { pointer, detail } = describe(conflict, drawing, s, r, rings, frame);
    // The chords of one arc may meet another edge in the same place.
    errors.set(`${pointer} ${detail}`, {
      pointer,
      detail,
      at: submittedPoint(frame, conflict.x, conflict.y),
    });
  }
  return [...errors.values()];
}

/** Segments s and r are pieces of rings, s of the one with the smaller number. */
function describeRingConflict(
  { kind, x, y }: Conflict,
  { segmentRing, segmentEdge }: Drawing,
  s: number,
  r: number,
  rings: readonly Ring[],
  frame: Frame,
): OutlineError {
  const first = rings[segmentRing[s]];
  const second = rings[segmentRing[r]];
  const i = first.source[segmentEdge[s]];
  const j = second.source[segmentEdge[r]];
  const where = showDomainPoint(frame, x, y);
  if (first === second) {
    const [low, high] = [Math.min(i, j), Math.max(i, j)];
    return {
      pointer: `${first.pointer}/${high}`,
      detail:
        low === high
          ? `Edge ${low} of the ${first.title} touches itself at ${where}. A ring may not touch itself.`
          : `Edges ${low} and ${high} of the ${first.title} ${kind} at ${where}. ` +
            `A ring may neither cross nor touch itself; its edges meet only at the vertex they share.`,
    };
  }
  const rule =
    first.number === 0
      ? "A hole must lie inside the outer ring without touching it."
      : "Holes may neither overlap nor touch.";
  return {
    pointer: `${second.pointer}/${j}`,
    detail:
      `Edge ${j} of ${second.title} ${kind === "cross" ? "crosses" : "touches"} edge ${i} of ` +
      `${first.number === 0 ? "the outer ring" : first.title} at ${where}. ${rule}`,
  };
}

/** Segment s is the border of a region; r is another border, or a piece of a ring. */
function describeRegionConflict(
  conflict: Conflict,
  { segmentRing, segmentEdge }: Drawing,
  s: number,
  r: number,
  rings: readonly Ring[],
  frame: Frame,
): OutlineError {
  const region = -1 - segmentRing[s];
  const where = showDomainPoint(frame, conflict.x, conflict.y);
  const pointer = `${regionPointer(region)}/${segmentEdge[s]}`;
  const verb = conflict.kind === "cross" ? "crosses" : "touches";
  if (segmentRing[r] >= 0) {
    const ring = rings[segmentRing[r]];
    const detail =
      `Edge ${segmentEdge[s]} of region ${region} ${verb} edge ${ring.source[segmentEdge[r]]} of the ${ring.title} ` +
      `at ${where}. A region lies inside the conductor; it may touch the border but not stick out.`;
    return { pointer, detail };
  }
  const other = -1 - segmentRing[r];
  const detail =
    other === region
      ? `Edges ${segmentEdge[s]} and ${segmentEdge[r]} of region ${region} ${conflict.kind} at ${where}. ` +
        `The border of a region may neither cross nor touch itself.`
      : `Edge ${segmentEdge[s]} of region ${region} ${verb} edge ${segmentEdge[r]} of region ${other} at ${where}. ` +
        `Regions may touch, but not overlap.`;
  return { pointer, detail };
}

/** Complaints about regions that cover each other or reach outside; at most one for each region. */
export function describeRegionFaults(
  faults: readonly RegionFault[],
  overlaps: ReadonlyArray<readonly [number, number]>,
): OutlineError[] {
  const errors = new Map<number, OutlineError>();
  const overlap = (a: number, b: number): void => {
    const later = Math.max(a, b);
    const detail =
      a === b
        ? `Region ${a} runs along one line twice; its border must enclose an area.`
        : `Regions ${Math.min(a, b)} and ${later} overlap. Regions may touch, but not overlap.`;
    errors.set(later, { pointer: regionPointer(later), detail });
  };
  for (const [a, b] of overlaps) overlap(a, b);
  for (const { region, other } of faults) {
    if (other > 0) overlap(region - 1, other - 1);
    else {
      const detail = `Region ${region - 1} reaches outside the conductor; it may touch the border, but not stick out.`;
      errors.set(region - 1, { pointer: regionPointer(region - 1), detail });
    }
  }
  return [...errors.values()];
}

/** Complaints about holes that are not inside the outer ring alone. `around` as `nestRings` answers it. */
export function describeNesting(
  around: ReadonlyArray<readonly number[]>,
  rings: readonly Ring[],
  frame: Frame,
): OutlineError[] {
  const errors: OutlineError[] = [];
  for (let r = 1; r < rings.length; r++) {
    const ring = rings[r];
    const where = showDomainPoint(frame, ring.submitted[0], ring.submitted[1]);
    if (!around[r].includes(0)) {
      const how = around[0].includes(r) ? "surrounds the outer ring" : "lies outside the outer ring";
      errors.push({
        pointer: ring.pointer,
        detail: `${capital(ring.title)}, which begins at ${where}, ${how}. A hole must lie inside the outer ring.`,
      });
    } else if (around[r].length > 1) {
      const other = rings[around[r][around[r].length - 1]];
      errors.push({
        pointer: ring.pointer,
        detail: `${capital(ring.title)}, which begins at ${where}, lies inside ${other.title}. Holes may not overlap.`,
      });
    }
  }
  return errors;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
