import type { EdgeIndex, BoundaryPoint } from "./edge-index";
import {
  showDomainPoint,
  showLength,
  showNumber,
  showPoint,
  toDomainX,
  toDomainY,
  type Frame,
} from "./frame";
import { edgeCount, edgeLength, nearestOnEdge, ringPoint, type Ring } from "./ring";
import type { OutlineError, Point, TerminalInput } from "./schema";

/** A stretch of a ring, as positions edge + t along it; `end` may exceed the number of edges when it passes vertex 0. */
export interface Stretch {
  readonly ring: number;
  readonly start: number;
  readonly end: number;
  readonly terminal: number;
  readonly pointer: string;
}

/** Every stretch of boundary that the terminals name, snapped to vertices, not yet compared with each other. */
export function readStretches(
  terminals: readonly TerminalInput[],
  rings: readonly Ring[],
  index: EdgeIndex,
  frame: Frame,
  errors: OutlineError[],
): Stretch[] {
  const stretches: Stretch[] = [];
  const add = (found: Stretch | OutlineError): void => {
    if ("detail" in found) errors.push(found);
    else stretches.push(found);
  };
  terminals.forEach((terminal, i) => {
    terminal.segments?.forEach((segment, k) => {
      add(readSegment(segment, i, `#/terminals/${i}/segments/${k}`, index, frame));
    });
    terminal.parts?.forEach((part, k) => {
      add(readPart(part, i, `#/terminals/${i}/parts/${k}`, rings, frame));
    });
  });
  return stretches;
}

type Part = NonNullable<TerminalInput["parts"]>[number];

function readPart(
  part: Part,
  terminal: number,
  pointer: string,
  rings: readonly Ring[],
  frame: Frame,
): Stretch | OutlineError {
  const ring = rings[part.ring];
  if (ring === undefined) {
    const allowed = rings.length === 1 ? "ring 0, the outer one" : `rings 0 to ${rings.length - 1}`;
    return {
      pointer: `${pointer}/ring`,
      detail: `There is no ring ${part.ring}; the outline has ${allowed}.`,
    };
  }
  const submittedEdges = ring.edgeOfSubmitted.length;
  if (part.edge >= submittedEdges) {
    return {
      pointer: `${pointer}/edge`,
      detail: `The ${ring.title} has no edge ${part.edge}; its edges are 0 to ${submittedEdges - 1}.`,
    };
  }
  const edge = ring.edgeOfSubmitted[part.edge];
  if (edge < 0)
    return { pointer: `${pointer}/edge`, detail: `Edge ${part.edge} of the ${ring.title} has no length.` };
  const low = Math.min(part.from, part.to);
  const high = Math.max(part.from, part.to);
  const t0 = snapAlong(ring, edge, submittedParameter(ring, edge, part.edge, low), frame.touch);
  const t1 = snapAlong(ring, edge, submittedParameter(ring, edge, part.edge, high), frame.touch);
  if (!((t1 - t0) * edgeLength(ring, edge) > frame.touch)) {
    return {
      pointer,
      detail: `The part has no length: it runs from ${showNumber(part.from)} to ${showNumber(part.to)} of edge ${part.edge}.`,
    };
  }
  return { ring: ring.number, start: edge + t0, end: edge + t1, terminal, pointer };
}

/** Where on the cleaned edge the share s of a submitted edge lies. */
function submittedParameter(ring: Ring, edge: number, submittedEdge: number, s: number): number {
  if (ring.arcs[edge] !== null) return s;
  const { submitted, edgeOfSubmitted, source } = ring;
  const n = edgeOfSubmitted.length;
  const a = submittedEdge;
  const b = (submittedEdge + 1) % n;
  // The ends of the cleaned edge are exact, whatever was left out between.
  if (s === 0 && source[edge] === a) return 0;
  if (s === 1 && source[(edge + 1) % source.length] === b) return 1;
  const x = submitted[2 * a] + s * (submitted[2 * b] - submitted[2 * a]);
  const y = submitted[2 * a + 1] + s * (submitted[2 * b + 1] - submitted[2 * a + 1]);
  return nearestOnEdge(ring, edge, x, y);
}

/** A position within `reach` of an end of its edge becomes that end. */
function snapAlong(ring: Ring, edge: number, t: number, reach: number): number {
  const share = Math.min(0.25, reach / edgeLength(ring, edge));
  if (t <= share) return 0;
  if (t >= 1 - share) return 1;
  return t;
}

function readSegment(
  segment: readonly [Point, Point],
  terminal: number,
  pointer: string,
  index: EdgeIndex,
  frame: Frame,
): Stretch | OutlineError {
  const ends = segment.map(([x, y]) => [toDomainX(frame, x), toDomainY(frame, y)] as const);
  const [[px, py], [qx, qy]] = ends;
  if (Math.hypot(qx - px, qy - py) <= frame.touch) {
    return { pointer, detail: `The segment at ${showPoint(...segment[0])} has no length.` };
  }
  const candidates = ends.map(([x, y]) => index.within(x, y, frame.snap));
  for (let i = 0; i < 2; i++) {
    if (candidates[i].length > 0) continue;
    const [x, y] = ends[i];
    return {
      pointer: `${pointer}/${i}`,
      detail: describeMiss(segment[i], index.nearest(x, y), index, x, y, frame),
    };
  }
  let best: Stretch | null = null;
  for (const p of candidates[0]) {
    for (const q of candidates[1]) {
      if (p.ring !== q.ring) continue;
      for (const [from, to] of [
        [p, q],
        [q, p],
      ]) {
        const stretch = follow(from, to, px, py, qx, qy, frame);
        if (stretch === null || !(stretch[1] > stretch[0])) continue;
        if (best !== null && stretch[1] - stretch[0] >= best.end - best.start) continue;
        best = { ring: p.ring.number, start: stretch[0], end: stretch[1], terminal, pointer };
      }
    }
  }
  if (best !== null) return best;
  const arc = [...candidates[0], ...candidates[1]].find((c) => c.ring.arcs[c.edge] !== null);
  const between = `The segment from ${showPoint(...segment[0])} to ${showPoint(...segment[1])}`;
  return {
    pointer,
    detail: arc
      ? `${between} leaves the boundary, which is an arc there; name arcs by ring and edge under parts.`
      : `${between} has its ends on the boundary but does not run along it; give one segment for each edge.`,
  };
}

/**
 * Walks the ring from one boundary point on to another, and answers the stretch if all of it keeps to the straight line p–q.
 */
function follow(
  from: BoundaryPoint,
  to: BoundaryPoint,
  px: number,
  py: number,
  qx: number,
  qy: number,
  frame: Frame,
): [number, number] | null {
  const { ring } = from;
  const n = edgeCount(ring);
  const t0 = snapEnd(from, frame);
  const t1 = snapEnd(to, frame);
  const length = Math.hypot(qx - px, qy - py);
  const isNear = (x: number, y: number): boolean => {
    const s = Math.min(1, Math.max(0, ((x - px) * (qx - px) + (y - py) * (qy - py)) / (length * length)));
    return Math.hypot(px + s * (qx - px) - x, py + s * (qy - py) - y) <= 2 * frame.snap;
  };
  if (from.edge === to.edge && t1 > t0) {
    return ring.arcs[from.edge] === null ? [from.edge + t0, from.edge + t1] : null;
  }
  let edge = from.edge;
  let position = edge;
  // A start at the very end of an edge is the start of the next, which may be straight where this one is an arc.
  if (ring.arcs[edge] !== null && t0 < 1) return null;
  for (let step = 0; step < n; step++) {
    edge = (edge + 1) % n;
    position++;
    const [x, y] = ringPoint(ring, edge, 0);
    if (!isNear(x, y)) return null;
    if (edge === to.edge) {
      if (ring.arcs[edge] !== null && t1 > 0) return null;
      return [from.edge + t0, position + t1];
    }
    if (ring.arcs[edge] !== null) return null;
  }
  return null;
}

/** Ends given as coordinates go to the vertex when they are as near to it as they may be off the boundary. */
function snapEnd(point: BoundaryPoint, frame: Frame): number {
  const length = edgeLength(point.ring, point.edge);
  const reach = length > 8 * frame.snap ? frame.snap : Math.min(frame.touch, length / 8);
  return snapAlong(point.ring, point.edge, point.t, reach);
}

function describeMiss(
  point: Point,
  nearest: BoundaryPoint,
  index: EdgeIndex,
  x: number,
  y: number,
  frame: Frame,
): string {
  const [nx, ny] = ringPoint(nearest.ring, nearest.edge, nearest.t);
  const place = index.isInside(x, y) ? "lies inside the conductor" : "lies outside the conductor";
  return (
    `The point ${showPoint(...point)} ${place}, ${showLength(frame, nearest.distance)} off the boundary; a terminal must lie on it ` +
    `(within 1e-9 of the outline's size). The nearest point of the boundary is ${showDomainPoint(frame, nx, ny)} ` +
    `on the ${nearest.ring.title}.`
  );
}
