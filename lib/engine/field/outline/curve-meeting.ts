import type { Arc } from "./arc";
import { edgeCount, nearestOnEdge, ringPoint, type Ring } from "./ring";

/** A common point this near to a shared vertex is that vertex. */
const AT_VERTEX = 1e-7;

/**
 * The point nearest to `near` in which two edges, at least one of them an arc, truly meet or come within `reach` of
 * touching; null if they keep clear of each other. The vertex that neighbours share does not count. Chords may meet where
 * their arcs do not.
 */
export function curvesMeet(
  first: Ring,
  edge: number,
  second: Ring,
  other: number,
  reach: number,
  near: { readonly x: number; readonly y: number },
): [number, number] | null {
  let found: [number, number] | null = null;
  let least = Infinity;
  for (const [x, y] of commonPoints(first, edge, second, other, reach)) {
    if (distance(first, edge, x, y) > reach || distance(second, other, x, y) > reach) continue;
    if (first === second && isShared(first, edge, other, x, y)) continue;
    const off = Math.hypot(x - near.x, y - near.y);
    if (off >= least) continue;
    least = off;
    found = [x, y];
  }
  return found;
}

function distance(ring: Ring, edge: number, x: number, y: number): number {
  const [px, py] = ringPoint(ring, edge, nearestOnEdge(ring, edge, x, y));
  return Math.hypot(px - x, py - y);
}

function isShared(ring: Ring, edge: number, other: number, x: number, y: number): boolean {
  const n = edgeCount(ring);
  const shared: number[] = [];
  if ((edge + 1) % n === other) shared.push(other);
  if ((other + 1) % n === edge) shared.push(edge);
  return shared.some((v) => Math.hypot(ring.xy[2 * v] - x, ring.xy[2 * v + 1] - y) <= AT_VERTEX);
}

/** Where the two circles, or the circle and the line, of two edges meet; nearly touching ones at their nearest point. */
function commonPoints(
  first: Ring,
  edge: number,
  second: Ring,
  other: number,
  reach: number,
): Array<[number, number]> {
  const a = first.arcs[edge];
  const b = second.arcs[other];
  if (a !== null && b !== null) return circlesMeet(a, b, reach);
  if (a !== null) return lineMeets(a, second, other, reach);
  return b !== null ? lineMeets(b, first, edge, reach) : [];
}

function circlesMeet(a: Arc, b: Arc, reach: number): Array<[number, number]> {
  const dx = b.cx - a.cx;
  const dy = b.cy - a.cy;
  const d = Math.hypot(dx, dy);
  if (d <= reach && Math.abs(a.radius - b.radius) <= reach) return overlapEnds(a, b);
  if (d > a.radius + b.radius + reach || d < Math.abs(a.radius - b.radius) - reach) return [];
  const along = (d * d + a.radius * a.radius - b.radius * b.radius) / (2 * d);
  const across = Math.sqrt(Math.max(0, a.radius * a.radius - along * along));
  const x = a.cx + (along * dx) / d;
  const y = a.cy + (along * dy) / d;
  return [
    [x - (across * dy) / d, y + (across * dx) / d],
    [x + (across * dy) / d, y - (across * dx) / d],
  ];
}

/** Arcs of one circle overlap where an end of the one lies on the other. */
function overlapEnds(a: Arc, b: Arc): Array<[number, number]> {
  return [
    [a.x0, a.y0],
    [a.x1, a.y1],
    [b.x0, b.y0],
    [b.x1, b.y1],
  ];
}

function lineMeets(arc: Arc, ring: Ring, edge: number, reach: number): Array<[number, number]> {
  const [ax, ay] = ringPoint(ring, edge, 0);
  const [bx, by] = ringPoint(ring, edge, 1);
  const length = Math.hypot(bx - ax, by - ay);
  const ux = (bx - ax) / length;
  const uy = (by - ay) / length;
  const along = (arc.cx - ax) * ux + (arc.cy - ay) * uy;
  const off = Math.abs((arc.cy - ay) * ux - (arc.cx - ax) * uy);
  if (off > arc.radius + reach) return [];
  const half = Math.sqrt(Math.max(0, arc.radius * arc.radius - off * off));
  return [along - half, along + half].map((t) => [ax + t * ux, ay + t * uy]);
}
