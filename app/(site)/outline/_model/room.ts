/** Where there is room for another ring. */
import { boxOf, edgeOf, nearestOn, polygonOf } from "./edges";
import { type Point, type Ring, tidy } from "./sketch";

export interface Room {
  readonly x: number;
  readonly y: number;
  /** Distance to the nearest edge of all rings. */
  readonly distance: number;
}

/** Places looked at along each side of the box. */
const LOOKS = 25;

/** The place inside the outer ring and outside of the holes that is farthest from all edges; null without one. */
export function roomiest(rings: readonly Ring[]): Room | null {
  const box = boxOf(rings.slice(0, 1));
  if (!box) return null;
  const polygons = rings.map(polygonOf);
  let best: Room | null = null;
  for (let i = 0; i < LOOKS; i++) {
    for (let j = 0; j < LOOKS; j++) {
      const x = tidy(box.minX + ((i + 0.5) / LOOKS) * (box.maxX - box.minX));
      const y = tidy(box.minY + ((j + 0.5) / LOOKS) * (box.maxY - box.minY));
      if (!polygons.reduce((odd, polygon) => odd !== isInside(polygon, x, y), false)) continue;
      const distance = clearance(rings, [x, y], best?.distance ?? 0);
      if (distance > (best?.distance ?? 0)) best = { x, y, distance };
    }
  }
  return best;
}

/** Distance to the nearest edge; anything up to `enough` where it is no more than that. */
function clearance(rings: readonly Ring[], at: Point, enough: number): number {
  let least = Infinity;
  for (const ring of rings) {
    for (let edge = 0; edge < ring.length; edge++) {
      least = Math.min(least, nearestOn(edgeOf(ring, edge), at).distance);
      if (least <= enough) return least;
    }
  }
  return least;
}

function isInside(polygon: readonly Point[], x: number, y: number): boolean {
  let inside = false;
  for (let k = 0; k < polygon.length; k++) {
    const [ax, ay] = polygon[k];
    const [bx, by] = polygon[(k + 1) % polygon.length];
    if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) inside = !inside;
  }
  return inside;
}
