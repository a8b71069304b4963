import { arcPolygon, chordCount, type Arc } from "./arc";
import type { Domain } from "./domain";
import type { Frame } from "./frame";
import type { Run } from "./merge-runs";
import type { RegionNet } from "./region-net";
import { AXIS, INSULATED, Pen } from "./pen";
import { edgeCount, ringPoint, type Ring } from "./ring";

/**
 * How arcs are replaced by chords. "upper" makes the resistance no smaller: insulated boundary moves into the conductor,
 * terminals move away from it; "lower" does the opposite; "nominal" puts all corners on the arcs. By monotonicity
 * of the resistance (Rayleigh) the first two bracket that of the true outline.
 */
export type Role = "nominal" | "upper" | "lower";

/** A cleaned outline with its terminals, ready to be drawn as a domain. */
export interface DrawnOutline {
  readonly frame: Frame;
  readonly axisymmetric: boolean;
  readonly rings: readonly Ring[];
  /** Terminal runs of each ring. */
  readonly runs: ReadonlyArray<readonly Run[]>;
  readonly regions: RegionNet;
  /** Least number of chords of each edge of each ring, where the neighbourhood demands it. */
  readonly leastChords: readonly Int32Array[];
}

/** A domain that knows where its segments come from. */
export interface Drawing {
  readonly domain: Domain;
  /** Ring and edge of the cleaned outline of each segment; for the border of region k, -1 - k and the submitted edge. */
  readonly segmentRing: Int32Array;
  readonly segmentEdge: Int32Array;
  /** Pairs of regions that claim the same side of one segment. */
  readonly overlaps: ReadonlyArray<readonly [number, number]>;
}

/** Most points of a drawing; chords are made coarser rather than more. */
const MOST_POINTS = 400_000;

/** The chord tolerance itself, or the next coarser one by powers of four with which the drawing has not too many points. */
export function affordableTolerance(outline: DrawnOutline, chordTolerance: number): number {
  for (let tolerance = chordTolerance; ; tolerance *= 4) {
    let points = 0;
    outline.rings.forEach((ring, r) => {
      ring.arcs.forEach((arc, edge) => {
        points += arc === null ? 1 : chordCount(arc, 1, tolerance, outline.leastChords[r][edge]);
      });
    });
    if (points <= MOST_POINTS || tolerance > 1) return tolerance;
  }
}

/** Draws an outline as straight segments; `chordTolerance` in units of the domain. */
export function drawOutline(outline: DrawnOutline, role: Role, chordTolerance: number): Drawing {
  const pen = new Pen();
  const { nodes, borders, edges } = outline.regions;
  outline.rings.forEach((ring, r) => {
    const cuts = nodes.filter((node) => node.ring === r).map((node) => node.position);
    const forward = ring.area > 0 === (ring.number === 0);
    pen.beginRing(ring.number);
    for (const { edge, from, to, terminal } of piecesOf(ring, outline.runs[r], cuts, forward)) {
      const arc = ring.arcs[edge];
      const onAxis = outline.axisymmetric && isOnAxis(ring, edge);
      pen.notePosition(edge + from);
      pen.put(ringPoint(ring, edge, from), edge, terminal >= 0 ? terminal : onAxis ? AXIS : INSULATED);
      if (arc === null) continue;
      const chords = chordCount(arc, Math.abs(to - from), chordTolerance, outline.leastChords[r][edge]);
      const outside = goesOutsideArc(arc, forward, terminal >= 0, role);
      const corners = arcPolygon(arc, from, to, chords, outside);
      for (let k = 0; k < corners.length; k += 2) pen.put([corners[k], corners[k + 1]]);
    }
    pen.endRing(edgeCount(ring));
  });
  const points = nodes.map((node) => pen.pointOf(node));
  borders.forEach((border, k) =>
    pen.addBorder(
      border.map((n) => points[n]),
      edges[k],
      k,
    ),
  );
  return pen.finish(outline);
}

interface Piece {
  readonly edge: number;
  readonly from: number;
  readonly to: number;
  readonly terminal: number;
}

/** The edges of a ring cut where terminals begin and end and regions touch, with the conductor on their left. */
function piecesOf(ring: Ring, runs: readonly Run[], cuts: readonly number[], forward: boolean): Piece[] {
  const pieces: Piece[] = [];
  const stops = [...runs.flatMap((run) => [run.start, run.end]), ...cuts].sort((p, q) => p - q);
  let nextRun = 0;
  let nextStop = 0;
  for (let edge = 0; edge < edgeCount(ring); edge++) {
    let at = edge;
    while (at < edge + 1) {
      while (nextRun < runs.length && runs[nextRun].end <= at) nextRun++;
      while (nextStop < stops.length && stops[nextStop] <= at) nextStop++;
      const isTerminal = nextRun < runs.length && runs[nextRun].start <= at;
      const stop = Math.min(edge + 1, nextStop < stops.length ? stops[nextStop] : Infinity);
      pieces.push({
        edge,
        from: at - edge,
        to: stop - edge,
        terminal: isTerminal ? runs[nextRun].terminal : -1,
      });
      at = stop;
    }
  }
  if (forward) return pieces;
  return pieces.reverse().map((p) => ({ ...p, from: p.to, to: p.from }));
}

function isOnAxis(ring: Ring, edge: number): boolean {
  const next = (edge + 1) % edgeCount(ring);
  return ring.arcs[edge] === null && ring.xy[2 * edge] === 0 && ring.xy[2 * next] === 0;
}

/** Whether a stretch of an arc is replaced by its tangents instead of its chords. */
function goesOutsideArc(arc: Arc, forward: boolean, isTerminal: boolean, role: Role): boolean {
  if (role === "nominal") return false;
  const conductorGrows = (role === "upper") === isTerminal;
  // With the conductor on the left, an arc that turns left bulges out of it, and its tangents enlarge it.
  const bulgesOut = arc.sweep > 0 === forward;
  return conductorGrows === bulgesOut;
}
