/** What lies under the pointer. */
import { edgeOf, nearestOn } from "./edges";
import { type Point, type RingKey, ringKeys, ringOf, type Sketch } from "./sketch";
import { type Size, toPlane, toScreen, type View } from "./view";

export interface Hit {
  readonly kind: "vertex" | "edge";
  readonly ring: RingKey;
  readonly index: number;
  /** Place on the edge, 0 … 1. */
  readonly t: number;
}

/**
 * The vertex within reach of a point on the screen, else the edge; the nearest one of each.
 * @param reach In pixels.
 * @param keys Rings that can be hit; all of the sketch where they are left out.
 */
export function hitTest(
  sketch: Sketch,
  view: View,
  size: Size,
  at: Point,
  reach: number,
  keys: readonly RingKey[] = ringKeys(sketch),
): Hit | null {
  const vertex = hitVertex(sketch, view, size, at, reach, keys);
  return vertex ?? hitEdge(sketch, view, size, at, reach, keys);
}

export function hitVertex(
  sketch: Sketch,
  view: View,
  size: Size,
  at: Point,
  reach: number,
  keys: readonly RingKey[] = ringKeys(sketch),
): Hit | null {
  let [found, least]: [Hit | null, number] = [null, reach];
  for (const ring of keys) {
    ringOf(sketch, ring).forEach(({ x, y }, index) => {
      const [px, py] = toScreen(view, size, [x, y]);
      const distance = Math.hypot(px - at[0], py - at[1]);
      if (distance < least) [found, least] = [{ kind: "vertex", ring, index, t: 0 }, distance];
    });
  }
  return found;
}

export function hitEdge(
  sketch: Sketch,
  view: View,
  size: Size,
  at: Point,
  reach: number,
  keys: readonly RingKey[] = ringKeys(sketch),
): Hit | null {
  const place = toPlane(view, size, at);
  let [found, least]: [Hit | null, number] = [null, reach / view.scale];
  for (const ring of keys) {
    const vertices = ringOf(sketch, ring);
    for (let index = 0; index < vertices.length; index++) {
      const { t, distance } = nearestOn(edgeOf(vertices, index), place);
      if (distance < least) [found, least] = [{ kind: "edge", ring, index, t }, distance];
    }
  }
  return found;
}
