import type { Triangulation } from "../mesh/triangulation";
import type { Drawing } from "./draw";

/**
 * For each ring the rings that lie around it, from the outermost inwards. The triangulation holds all segments of the drawing,
 * and none of them meet, so that crossing a segment of a ring either enters that ring or leaves the innermost one.
 */
export function nestRings(mesh: Triangulation, drawing: Drawing, rings: number): number[][] {
  const { corner, twin, mark } = mesh;
  const { segmentRing } = drawing;
  const around: number[][] = Array.from({ length: rings }, () => []);
  const found = new Uint8Array(rings);
  // Each place is told by the innermost ring around it, and each ring by the one around it.
  const parent = new Int32Array(rings).fill(-1);
  const place = new Int32Array(mesh.triangleSlots).fill(-2);
  const start = (mesh.vertexEdge[0] / 3) | 0;
  place[start] = -1;
  const stack = [start];
  while (stack.length > 0) {
    const t = stack.pop() as number;
    for (let h = 3 * t; h < 3 * t + 3; h++) {
      if (twin[h] < 0) continue;
      const n = (twin[h] / 3) | 0;
      if (place[n] !== -2 || corner[3 * n] < 0) continue;
      place[n] = place[t];
      const ring = mark[h] === 0 ? -1 : segmentRing[mark[h] - 1];
      if (ring >= 0) {
        if (place[t] === ring) place[n] = parent[ring];
        else {
          if (found[ring] === 0) {
            found[ring] = 1;
            parent[ring] = place[t];
          }
          place[n] = ring;
        }
      }
      stack.push(n);
    }
  }
  for (let r = 0; r < rings; r++) {
    for (let p = parent[r]; p >= 0; p = parent[p]) around[r].unshift(p);
  }
  return around;
}
