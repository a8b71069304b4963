/** Where media meet inside the conductor, as segments of the mesh. */
import type { FieldMap } from "./field-map";

/** Ends of the segments in the outline's unit, x0, y0, x1, y1 each. */
export function regionBorders({ xy, triangles, region, origin, scale }: FieldMap): readonly number[][] {
  const count = xy.length / 2;
  /** Region of the first triangle met at each edge. */
  const first = new Map<number, number>();
  const segments: number[][] = [];
  for (let t = 0; t < triangles.length / 3; t++) {
    for (let i = 0; i < 3; i++) {
      const [a, b] = [triangles[3 * t + i], triangles[3 * t + ((i + 1) % 3)]];
      const key = Math.min(a, b) * count + Math.max(a, b);
      const other = first.get(key);
      if (other === undefined) first.set(key, region[t]);
      else if (other !== region[t]) {
        segments.push(
          [a, b].flatMap((v) => [origin[0] + xy[2 * v] * scale, origin[1] + xy[2 * v + 1] * scale]),
        );
      }
    }
  }
  return segments;
}
