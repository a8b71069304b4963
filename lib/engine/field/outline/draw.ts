import type { BoundarySide } from "../mesh/mesh";
import { arcPolygon, chordCount, type Arc } from "./arc";
import type { Domain } from "./domain";
import type { Frame } from "./frame";
import type { Run } from "./merge-runs";
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
  /** Least number of chords of each edge of each ring, where the neighbourhood demands it. */
  readonly leastChords: readonly Int32Array[];
}

/** A domain that knows where its segments come from. */
export interface Drawing {
  readonly domain: Domain;
  /** Ring and edge of the cleaned outline of each segment. */
  readonly segmentRing: Int32Array;
  readonly segmentEdge: Int32Array;
}

const INSULATED = -1;
const AXIS = -2;

/** Draws an outline as straight segments; `chordTolerance` in units of the domain. */
export function drawOutline(outline: DrawnOutline, role: Role, chordTolerance: number): Drawing {
  const pen = new Pen();
  outline.rings.forEach((ring, r) => {
    const forward = ring.area > 0 === (ring.number === 0);
    pen.beginRing(ring.number);
    for (const { edge, from, to, terminal } of piecesOf(ring, outline.runs[r], forward)) {
      const arc = ring.arcs[edge];
      const onAxis = outline.axisymmetric && isOnAxis(ring, edge);
      pen.put(ringPoint(ring, edge, from), edge, terminal >= 0 ? terminal : onAxis ? AXIS : INSULATED);
      if (arc === null) continue;
      const chords = chordCount(arc, Math.abs(to - from), chordTolerance, outline.leastChords[r][edge]);
      const outside = goesOutsideArc(arc, forward, terminal >= 0, role);
      const corners = arcPolygon(arc, from, to, chords, outside);
      for (let k = 0; k < corners.length; k += 2) pen.put([corners[k], corners[k + 1]]);
    }
    pen.endRing();
  });
  return pen.finish(outline);
}

interface Piece {
  readonly edge: number;
  readonly from: number;
  readonly to: number;
  readonly terminal: number;
}

/** The edges of a ring cut where terminals begin and end, with the conductor on their left. */
function piecesOf(ring: Ring, runs: readonly Run[], forward: boolean): Piece[] {
  const pieces: Piece[] = [];
  let next = 0;
  for (let edge = 0; edge < edgeCount(ring); edge++) {
    let at = edge;
    while (at < edge + 1) {
      while (next < runs.length && runs[next].end <= at) next++;
      const run = next < runs.length ? runs[next] : null;
      const isTerminal = run !== null && run.start <= at;
      const border = run === null ? edge + 1 : isTerminal ? run.end : run.start;
      const stop = Math.min(edge + 1, border);
      pieces.push({ edge, from: at - edge, to: stop - edge, terminal: isTerminal ? run.terminal : -1 });
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

/** Collects points ring by ring and groups their segments into sides. */
class Pen {
  private readonly xy: number[] = [];
  private readonly segments: number[] = [];
  private readonly segmentSide: number[] = [];
  private readonly segmentRing: number[] = [];
  private readonly segmentEdge: number[] = [];
  private readonly sides: BoundarySide[] = [];
  private ring = 0;
  private first = 0;
  private kinds: number[] = [];
  private edges: number[] = [];

  beginRing(ring: number): void {
    this.ring = ring;
    this.first = this.xy.length / 2;
    this.kinds = [];
    this.edges = [];
  }

  /** A point, and what the segment that leaves it is; by default the same as before. */
  put(
    point: readonly [number, number],
    edge = this.edges[this.edges.length - 1],
    kind = this.kinds.at(-1),
  ): void {
    this.xy.push(point[0], point[1]);
    this.edges.push(edge);
    this.kinds.push(kind ?? INSULATED);
  }

  endRing(): void {
    const { kinds, edges, first, ring } = this;
    const n = kinds.length;
    let begin = 0;
    while (begin < n && kinds[begin] === kinds[(begin + n - 1) % n]) begin++;
    for (let step = 0; step < n; step++) {
      const k = (begin + step) % n;
      if (step === 0 || kinds[k] !== kinds[(k + n - 1) % n]) {
        const terminal = Math.max(INSULATED, kinds[k]);
        this.sides.push(kinds[k] === AXIS ? { ring, terminal, axis: true } : { ring, terminal });
      }
      this.segments.push(first + k, first + ((k + 1) % n));
      this.segmentSide.push(this.sides.length - 1);
      this.segmentRing.push(ring);
      this.segmentEdge.push(edges[k]);
    }
  }

  finish(outline: DrawnOutline): Drawing {
    const { frame } = outline;
    return {
      domain: {
        xy: Float64Array.from(this.xy),
        segments: Int32Array.from(this.segments),
        segmentSide: Int32Array.from(this.segmentSide),
        segmentRegion: new Int32Array(this.segments.length),
        sides: this.sides,
        unitM: frame.unitM,
        origin: [frame.originX, frame.originY],
        scale: frame.scale,
        axisymmetric: outline.axisymmetric,
      },
      segmentRing: Int32Array.from(this.segmentRing),
      segmentEdge: Int32Array.from(this.segmentEdge),
    };
  }
}
