/** The boundary of a field map as closed rings, and the pieces of it that are terminals. */
import type { FieldMap } from "./field-map";

export interface TerminalPiece {
  readonly terminal: number;
  /** Points in the outline's unit, x and y interleaved. */
  readonly line: number[];
}

export interface BoundaryRings {
  /** Closed rings in the outline's unit, x and y interleaved, without the repeated first point. */
  readonly rings: number[][];
  readonly pieces: TerminalPiece[];
}

/** Walks the boundary edges; each vertex of a boundary has one edge that leaves it. */
export function boundaryRings(map: FieldMap): BoundaryRings {
  const { boundary, sides } = map;
  const leaving = new Map<number, number>();
  for (let e = 0; e < boundary.length; e += 3) leaving.set(boundary[e], e);
  const rings: number[][] = [];
  const pieces: TerminalPiece[] = [];
  const seen = new Set<number>();
  for (let first = 0; first < boundary.length; first += 3) {
    if (seen.has(first)) continue;
    const edges = ringFrom(map, leaving, first, seen);
    rings.push(edges.flatMap((e) => pointOf(map, boundary[e])));
    const startAt = edges.findIndex((e, k) => sideOf(map, e) !== sideOf(map, edges.at(k - 1) ?? e));
    const turned = startAt > 0 ? [...edges.slice(startAt), ...edges.slice(0, startAt)] : edges;
    let current: TerminalPiece | undefined;
    let side = -1;
    for (const e of turned) {
      const { terminal } = sides[boundary[e + 2]];
      if (sideOf(map, e) !== side) {
        side = sideOf(map, e);
        current = terminal < 0 ? undefined : { terminal, line: pointOf(map, boundary[e]) };
        if (current) pieces.push(current);
      }
      current?.line.push(...pointOf(map, boundary[e + 1]));
    }
  }
  return { rings, pieces };
}

function ringFrom(map: FieldMap, leaving: Map<number, number>, first: number, seen: Set<number>): number[] {
  const edges: number[] = [];
  let e: number | undefined = first;
  while (e !== undefined && !seen.has(e)) {
    seen.add(e);
    edges.push(e);
    e = leaving.get(map.boundary[e + 1]);
  }
  return edges;
}

function sideOf({ boundary }: FieldMap, e: number): number {
  return boundary[e + 2];
}

function pointOf(map: FieldMap, v: number): number[] {
  return [map.origin[0] + map.xy[2 * v] * map.scale, map.origin[1] + map.xy[2 * v + 1] * map.scale];
}
