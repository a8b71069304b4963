/** Paths of rings and lines on the screen. */
import { edgeOf, polygonOf, stretch } from "../../_model/edges";
import type { Part, Point, Ring, Sketch } from "../../_model/sketch";
import { type Size, toScreen, type View } from "../../_model/view";

export interface Lens {
  readonly view: View;
  readonly size: Size;
}

function text(value: number): string {
  // Far outside the window digits do not matter, but a number that SVG cannot read does.
  return Math.max(-1e6, Math.min(1e6, value)).toFixed(1);
}

export function pathOf({ view, size }: Lens, points: readonly Point[], closed = false): string {
  if (points.length === 0) return "";
  const steps = points.map((point) => {
    const [x, y] = toScreen(view, size, point);
    return `${text(x)} ${text(y)}`;
  });
  return `M${steps.join("L")}${closed ? "Z" : ""}`;
}

export function ringPath(lens: Lens, ring: Ring): string {
  return ring.length < 2 && !ring[0]?.arc ? "" : pathOf(lens, polygonOf(ring), true);
}

/** Outer ring and holes as one path, to be filled by the even-odd rule. */
export function conductorPath(lens: Lens, rings: readonly Ring[]): string {
  return rings.map((ring) => ringPath(lens, ring)).join("");
}

/** Lines whose coordinates are interleaved, as the API gives them. */
export function linePath({ view, size }: Lens, line: readonly number[]): string {
  let d = "";
  for (let k = 0; k + 1 < line.length; k += 2) {
    const [x, y] = toScreen(view, size, [line[k], line[k + 1]]);
    d += `${k === 0 ? "M" : "L"}${text(x)} ${text(y)}`;
  }
  return d;
}

/** Points of a terminal's part; none where the edge is not there. */
export function partPoints(sketch: Sketch, { ring, edge, from, to }: Part): readonly Point[] {
  const vertices = sketch.rings[ring];
  if (!vertices || edge >= vertices.length || edge < 0) return [];
  return stretch(edgeOf(vertices, edge), from, to);
}
