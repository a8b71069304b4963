import { makeArc, type Arc } from "./arc";
import { toDomainX, toDomainY, type Frame } from "./frame";
import type { RingElement } from "./schema";

/** What is left of a ring, in submitted order; edge k runs from `source[k]` to the next. */
export interface Chain {
  /** Submitted vertex of each vertex that is left. */
  readonly source: number[];
  readonly arcs: Array<Arc | null>;
}

/** Leaves out edges without length. The first of a group of equal vertices stays. */
export function dropRepeated(
  elements: readonly RingElement[],
  xy: Float64Array,
  frame: Frame,
  title: string,
  repairs: string[],
): Chain & { empty: Uint8Array } {
  const n = elements.length;
  const source: number[] = [];
  const arcs: Array<Arc | null> = [];
  const empty = new Uint8Array(n);
  const repeated: number[] = [];
  let closing = false;
  let anchor = 0;
  // Edge i ends in element i + 1; it is kept unless it is straight and shorter than the touching distance.
  for (let i = 0; i < n; i++) {
    const j = (i + 1) % n;
    const element = elements[j];
    const straight = Array.isArray(element);
    const from = anchor;
    const length = Math.hypot(xy[2 * j] - xy[2 * from], xy[2 * j + 1] - xy[2 * from + 1]);
    let arc: Arc | null = null;
    if (!straight) {
      const [cx, cy] = element.center;
      arc = makeArc(
        xy[2 * from],
        xy[2 * from + 1],
        xy[2 * j],
        xy[2 * j + 1],
        toDomainX(frame, cx),
        toDomainY(frame, cy),
        element.clockwise,
      );
      if (arc.radius * Math.abs(arc.sweep) > frame.touch) {
        source.push(from);
        arcs.push(arc);
        anchor = j;
        continue;
      }
    } else if (length > frame.touch) {
      source.push(from);
      arcs.push(null);
      anchor = j;
      continue;
    }
    empty[i] = 1;
    if (j === 0) closing = n > 1;
    else repeated.push(j);
  }
  // A tail of equal vertices before the first one: the last kept edge must end in the first vertex kept.
  if (source.length > 0 && source[0] === 0 && anchor !== 0 && arcs.length > 0) closeChain(xy, source, arcs);
  // An arc that closes the ring has to end in the first vertex; a vertex that does repeats it.
  if (closing && Array.isArray(elements[n - 1]))
    repairs.push(`The ${title} repeats its first vertex at the end; the repetition was left out.`);
  if (repeated.length > 0)
    repairs.push(
      `The ${title}: ${listIndices(repeated)} repeated the one before and ${repeated.length > 1 ? "were" : "was"} left out.`,
    );
  return { source, arcs, empty };
}

function closeChain(xy: Float64Array, source: number[], arcs: Array<Arc | null>): void {
  const last = arcs[arcs.length - 1];
  if (last === null) return;
  const [x, y] = [xy[2 * source[0]], xy[2 * source[0] + 1]];
  arcs[arcs.length - 1] = makeArc(last.x0, last.y0, x, y, last.cx, last.cy, last.sweep < 0);
}

/**
 * Leaves out vertices between two straight edges that lie within the rounding of the coordinates on the line between
 * the vertices that stay. The window of slopes through all points passed keeps the error from adding up.
 */
export function dropCollinear(xy: Float64Array, chain: Chain, frame: Frame): Chain {
  const { source, arcs } = chain;
  const n = source.length;
  let first = 0;
  for (let k = 1; k < n; k++) {
    const dx = xy[2 * source[k]] - xy[2 * source[first]];
    if (dx < 0 || (dx === 0 && xy[2 * source[k] + 1] < xy[2 * source[first] + 1])) first = k;
  }
  const keptSource: number[] = [];
  const keptArcs: Array<Arc | null> = [];
  let k = 0;
  while (k < n) {
    const from = (first + k) % n;
    const a = source[from];
    keptSource.push(a);
    keptArcs.push(arcs[from]);
    k++;
    if (arcs[from] !== null) continue;
    let passed = source[(from + 1) % n];
    let ux = xy[2 * passed] - xy[2 * a];
    let uy = xy[2 * passed + 1] - xy[2 * a + 1];
    const length = Math.hypot(ux, uy);
    ux /= length;
    uy /= length;
    let low = -Infinity;
    let high = Infinity;
    let along = length;
    let off = 0;
    while (k < n) {
      const at = (first + k) % n;
      if (arcs[at] !== null) break;
      const next = source[(at + 1) % n];
      low = Math.max(low, (off - frame.grain) / along);
      high = Math.min(high, (off + frame.grain) / along);
      const dx = xy[2 * next] - xy[2 * a];
      const dy = xy[2 * next + 1] - xy[2 * a + 1];
      const nextAlong = dx * ux + dy * uy;
      const nextOff = ux * dy - uy * dx;
      const slope = nextOff / nextAlong;
      if (!(nextAlong > along) || slope < low || slope > high) break;
      passed = next;
      along = nextAlong;
      off = nextOff;
      k++;
    }
  }
  // Back to the submitted order.
  let turn = 0;
  for (let i = 1; i < keptSource.length; i++) if (keptSource[i] < keptSource[turn]) turn = i;
  return {
    source: [...keptSource.slice(turn), ...keptSource.slice(0, turn)],
    arcs: [...keptArcs.slice(turn), ...keptArcs.slice(0, turn)],
  };
}

/** For each submitted edge the edge of the cleaned ring that covers it, or -1 where it has no length. */
export function mapEdges(n: number, source: number[], empty: Uint8Array): Int32Array {
  const edgeOf = new Int32Array(n).fill(-1);
  const startsAt = new Map<number, number>();
  source.forEach((i, k) => startsAt.set(i, k));
  const begin = source[0];
  let current = 0;
  for (let step = 0; step < n; step++) {
    const i = (begin + step) % n;
    current = startsAt.get(i) ?? current;
    edgeOf[i] = empty[i] === 1 ? -1 : current;
  }
  return edgeOf;
}

export function describeDropped(indices: number[], title: string): string {
  const verb =
    indices.length > 1
      ? "lie on straight lines between their neighbours and were"
      : "lies on a straight line between its neighbours and was";
  return `The ${title}: ${listIndices(indices)} ${verb} left out.`;
}

function listIndices(indices: number[]): string {
  const sorted = [...indices].sort((a, b) => a - b);
  if (sorted.length === 1) return `vertex ${sorted[0]}`;
  const shown = sorted.slice(0, 5).join(", ");
  return sorted.length > 5 ? `${sorted.length} vertices (${shown}, …)` : `vertices ${shown}`;
}
