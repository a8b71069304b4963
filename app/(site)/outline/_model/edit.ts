/** Changes of a sketch's rings. Terminals keep to their edges: their numbers and shares follow every change. */
import { centreOfBow, edgeLength, edgeOf, pointAt } from "./edges";
import {
  type ArcCentre,
  type Part,
  type Point,
  regionKey,
  type Ring,
  type RingKey,
  ringOf,
  type Sketch,
  tidy,
  type Vertex,
  withRing,
} from "./sketch";

/** Puts a vertex on an edge, by default in its middle. Its number is edge + 1. */
export function insertVertex(sketch: Sketch, key: RingKey, edge: number, t = 0.5, at?: Point): Sketch {
  const ring = ringOf(sketch, key);
  const whole = edgeOf(ring, edge);
  const [x, y] = at ?? pointAt(whole, t);
  const { arc } = whole.to;
  const vertex: Vertex = { x: arc ? x : tidy(x), y: arc ? y : tidy(y), ...(arc ? { arc } : {}) };
  const next = [...ring.slice(0, edge + 1), vertex, ...ring.slice(edge + 1)];
  const share = Math.min(1 - 1e-9, Math.max(1e-9, t));
  return withParts(withRing(sketch, key, next), (part) => {
    if (part.ring !== key || part.edge < edge) return [part];
    if (part.edge > edge) return [{ ...part, edge: part.edge + 1 }];
    const [from, to] = [Math.min(part.from, part.to), Math.max(part.from, part.to)];
    return [
      ...(from < share ? [{ ...part, from: from / share, to: Math.min(1, to / share) }] : []),
      ...(to > share
        ? [
            {
              ...part,
              edge: edge + 1,
              from: Math.max(0, (from - share) / (1 - share)),
              to: (to - share) / (1 - share),
            },
          ]
        : []),
    ];
  });
}

/** Moves a vertex; arcs on both of its sides keep the angle that they sweep. */
export function moveVertex(sketch: Sketch, key: RingKey, index: number, x: number, y: number): Sketch {
  const ring = ringOf(sketch, key);
  const n = ring.length;
  const before = ring[(index + n - 1) % n];
  const after = ring[(index + 1) % n];
  const old = ring[index];
  const moved = ring.map((vertex, i): Vertex => {
    if (n > 1 && i === (index + 1) % n && vertex.arc) {
      const arc = carried(vertex.arc, old, after, { x, y }, after);
      return i === index ? { ...vertex, x, y, arc } : { ...vertex, arc };
    }
    if (i !== index) return vertex;
    const { arc } = vertex;
    // A full circle keeps its centre; its radius changes.
    return {
      x,
      y,
      ...(arc ? { arc: n === 1 ? arc : carried(arc, before, old, before, { x, y }) } : {}),
    };
  });
  return withRing(sketch, key, moved);
}

/**
 * Gives vertices new places, from `index` on; places beyond the last vertex are appended with straight edges, and what
 * stood on the closing edge stays on it. Arcs whose ends move keep the angle that they sweep.
 */
export function placeVertices(sketch: Sketch, key: RingKey, index: number, points: readonly Point[]): Sketch {
  const old = ringOf(sketch, key);
  const n = old.length;
  const place = (i: number): Place => {
    const given = points[i - index];
    return given ? { x: given[0], y: given[1] } : old[i];
  };
  const appended = Math.max(0, index + points.length - n);
  const ring = Array.from({ length: n + appended }, (_, i): Vertex => {
    const { x, y } = place(i);
    const arc = old[i]?.arc;
    if (!arc || (i === 0 && appended > 0)) return { x, y };
    const before = (i + n - 1) % n;
    return { x, y, arc: n === 1 ? arc : carried(arc, old[before], old[i], place(before), { x, y }) };
  });
  return withParts(withRing(sketch, key, ring), (part) =>
    part.ring === key && part.edge === n - 1 ? [{ ...part, edge: n - 1 + appended }] : [part],
  );
}

interface Place {
  readonly x: number;
  readonly y: number;
}

/** The centre carried along with its chord by the turn and stretch that takes the old chord to the new one. */
function carried(arc: ArcCentre, a: Place, b: Place, newA: Place, newB: Place): ArcCentre {
  const [ux, uy] = [b.x - a.x, b.y - a.y];
  const [vx, vy] = [newB.x - newA.x, newB.y - newA.y];
  const squared = ux * ux + uy * uy;
  if (squared === 0 || (vx === 0 && vy === 0)) return arc;
  const re = (vx * ux + vy * uy) / squared;
  const im = (vy * ux - vx * uy) / squared;
  const [px, py] = [arc.x - a.x, arc.y - a.y];
  return {
    x: tidy(newA.x + re * px - im * py),
    y: tidy(newA.y + im * px + re * py),
    clockwise: arc.clockwise,
  };
}

/** Moves a whole ring. */
export function shiftRing(sketch: Sketch, key: RingKey, dx: number, dy: number): Sketch {
  return withRing(
    sketch,
    key,
    ringOf(sketch, key).map(({ x, y, arc }) => ({
      x: tidy(x + dx),
      y: tidy(y + dy),
      ...(arc ? { arc: { ...arc, x: tidy(arc.x + dx), y: tidy(arc.y + dy) } } : {}),
    })),
  );
}

/** Takes a vertex out; its two edges become one. A ring that is left without area goes with it. */
export function removeVertex(sketch: Sketch, key: RingKey, index: number): Sketch {
  const ring = ringOf(sketch, key);
  const n = ring.length;
  const left = ring.filter((_, i) => i !== index);
  const next = (index + 1) % n;
  const [into, out] = [ring[index].arc, ring[next].arc];
  const same = into && out && into.x === out.x && into.y === out.y && into.clockwise === out.clockwise;
  const joined = left.map((vertex) =>
    vertex === ring[next] && !same ? { x: vertex.x, y: vertex.y } : vertex,
  );
  if (joined.length < 3 && !joined.some(({ arc }) => arc)) return removeRing(sketch, key);
  const previous = (index + n - 1) % n;
  const merged = index === 0 ? n - 2 : index - 1;
  const [first, second] = [edgeLength(edgeOf(ring, previous)), edgeLength(edgeOf(ring, index))];
  const total = first + second;
  return withParts(withRing(sketch, key, joined), (part) => {
    if (part.ring !== key) return [part];
    if (part.edge === previous || part.edge === index) {
      // A terminal on the whole of one of the two stays on the whole of what becomes of it.
      if (part.from === 0 && part.to === 1) return [{ ...part, edge: merged }];
      const offset = part.edge === previous ? 0 : first;
      const length = part.edge === previous ? first : second;
      const at = (t: number) => (total > 0 ? (offset + t * length) / total : t);
      return [{ ...part, edge: merged, from: at(part.from), to: at(part.to) }];
    }
    return [{ ...part, edge: part.edge > index ? part.edge - 1 : part.edge - (index === 0 ? 1 : 0) }];
  });
}

/** Takes a ring away with the terminals on it; the outer ring stays as an empty one. */
export function removeRing(sketch: Sketch, key: RingKey): Sketch {
  if (key < 0) {
    return { ...sketch, regions: sketch.regions.filter((_, k) => regionKey(k) !== key) };
  }
  const rings =
    key === 0
      ? sketch.rings.map((ring, k) => (k === 0 ? [] : ring))
      : sketch.rings.filter((_, k) => k !== key);
  return withParts({ ...sketch, rings }, (part) => {
    if (part.ring === key) return [];
    return [key > 0 && part.ring > key ? { ...part, ring: part.ring - 1 } : part];
  });
}

/** Makes the edge an arc around a centre, or straight again. */
export function setArc(sketch: Sketch, key: RingKey, edge: number, arc: ArcCentre | null): Sketch {
  const ring = ringOf(sketch, key);
  const end = (edge + 1) % ring.length;
  return withRing(
    sketch,
    key,
    ring.map(({ x, y, ...rest }, i) => (i === end ? { x, y, ...(arc ? { arc } : {}) } : { x, y, ...rest })),
  );
}

/** Bows an edge; see `centreOfBow`. The centre is kept to twelve digits. */
export function bowEdge(sketch: Sketch, key: RingKey, edge: number, bow: number): Sketch {
  const { from, to } = edgeOf(ringOf(sketch, key), edge);
  const { x, y, clockwise } = centreOfBow([from.x, from.y], [to.x, to.y], bow);
  return setArc(sketch, key, edge, { x: tidy(x), y: tidy(y), clockwise });
}

/** A quarter circle: what an edge becomes first. */
export const QUARTER_BOW = Math.tan(Math.PI / 8);

/** Adds a hole, or the outer ring where there is none yet. */
export function addRing(sketch: Sketch, ring: Ring): Sketch {
  if (sketch.rings[0].length === 0) return withRing(sketch, 0, ring);
  return { ...sketch, rings: [...sketch.rings, ring] };
}

/** A region starts with the medium around it; where that is an expression, with a plain conductivity. */
export function addRegion(sketch: Sketch, ring: Ring): Sketch {
  const { expression, quantity: _, ...plain } = sketch.medium;
  const medium = expression === undefined ? sketch.medium : { ...plain, conductivity: "58 MS/m" };
  return { ...sketch, regions: [...sketch.regions, { ring, medium }] };
}

/** All coordinates in another unit: converted, not read anew. `ratio` is old unit over new. */
export function rescale(sketch: Sketch, ratio: number): Sketch {
  // More digits than are shown, so that there and back is the same number; what rounding alone keeps from a plain
  // decimal is that decimal, however many units it has been through.
  const digits = (value: number) => {
    const plain = tidy(value);
    return Math.abs(plain - value) <= 4e-15 * Math.abs(value) ? plain : Number(value.toPrecision(15));
  };
  const scale = (ring: Ring): Ring =>
    ring.map(({ x, y, arc }) => ({
      x: digits(x * ratio),
      y: digits(y * ratio),
      ...(arc ? { arc: { ...arc, x: digits(arc.x * ratio), y: digits(arc.y * ratio) } } : {}),
    }));
  return {
    ...sketch,
    rings: sketch.rings.map(scale),
    regions: sketch.regions.map((region) => ({ ...region, ring: scale(region.ring) })),
    terminals: sketch.terminals.map((terminal) => ({
      ...terminal,
      segments: terminal.segments.map(([a, b]) => [
        [digits(a[0] * ratio), digits(a[1] * ratio)],
        [digits(b[0] * ratio), digits(b[1] * ratio)],
      ]),
    })),
  };
}

function withParts(sketch: Sketch, map: (part: Part) => readonly Part[]): Sketch {
  return {
    ...sketch,
    terminals: sketch.terminals.map((terminal) => ({
      ...terminal,
      parts: mergeParts(terminal.parts.flatMap(map)),
    })),
  };
}

/** Joins stretches of one edge that overlap or meet. */
function mergeParts(parts: readonly Part[]): readonly Part[] {
  const merged: Part[] = [];
  for (const part of parts) {
    const k = merged.findIndex(
      ({ ring, edge, from, to }) =>
        ring === part.ring && edge === part.edge && part.from <= to + 1e-12 && part.to >= from - 1e-12,
    );
    if (k < 0) merged.push(part);
    else {
      merged[k] = {
        ...part,
        from: Math.min(merged[k].from, part.from),
        to: Math.max(merged[k].to, part.to),
      };
    }
  }
  return merged;
}
