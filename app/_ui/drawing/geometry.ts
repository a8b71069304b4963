/** Plane geometry of drawing paths: arcs from their bulge, bounding boxes, mapping. */
import type { DrawingPath, DrawingView, PathStep, Point } from "@/lib/engine/shape/drawing";

export interface Box {
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly top: number;
}

export interface Arc {
  readonly center: Point;
  readonly radius: number;
  /** Polar angle of the first point and the signed sweep, radians. */
  readonly start: number;
  readonly sweep: number;
}

/** The circle of a bulged step; null for a straight one. */
export function arcOf(from: Point, step: PathStep): Arc | null {
  const sweep = step.bulge ?? 0;
  const dx = step.to[0] - from[0];
  const dy = step.to[1] - from[1];
  const chord = Math.hypot(dx, dy);
  if (sweep === 0 || chord === 0) return null;
  // Distance from the chord's middle to the centre, to the left of the direction of travel.
  const height = chord / 2 / Math.tan(sweep / 2);
  const center: Point = [from[0] + dx / 2 - (dy / chord) * height, from[1] + dy / 2 + (dx / chord) * height];
  return {
    center,
    radius: Math.abs(chord / 2 / Math.sin(sweep / 2)),
    start: Math.atan2(from[1] - center[1], from[0] - center[0]),
    sweep,
  };
}

/** Every step with the point it starts from; a closed path gets its last side. */
export function sides(path: DrawingPath): { readonly from: Point; readonly step: PathStep }[] {
  const list: { from: Point; step: PathStep }[] = [];
  let from = path.from;
  for (const step of path.steps) {
    list.push({ from, step });
    from = step.to;
  }
  if (path.closed && (from[0] !== path.from[0] || from[1] !== path.from[1])) {
    list.push({ from, step: { to: path.from } });
  }
  return list;
}

/** Points on an arc, its end included and its start not. */
export function sampleArc(arc: Arc, count: number): Point[] {
  return Array.from({ length: count }, (_, index): Point => {
    const angle = arc.start + (arc.sweep * (index + 1)) / count;
    return [arc.center[0] + arc.radius * Math.cos(angle), arc.center[1] + arc.radius * Math.sin(angle)];
  });
}

/** All paths of a view, terminals and thin lines included. */
export function pathsOf(view: DrawingView): readonly DrawingPath[] {
  return [...view.conductor, ...(view.second ?? []), ...(view.lines ?? []), ...view.high, ...view.low];
}

/** Vertices of paths and enough points of their arcs to bound them. */
export function outlinePoints(paths: readonly DrawingPath[]): Point[] {
  return paths.flatMap((path) => [
    path.from,
    ...sides(path).flatMap(({ from, step }) => {
      const arc = arcOf(from, step);
      return arc ? sampleArc(arc, 16) : [step.to];
    }),
  ]);
}

/** Points along a path, about four units apart. */
export function edgePoints(path: DrawingPath): Point[] {
  return sides(path).flatMap(({ from, step }) => {
    const arc = arcOf(from, step);
    if (arc)
      return sampleArc(arc, Math.max(2, Math.min(400, Math.ceil((arc.radius * Math.abs(arc.sweep)) / 4))));
    const length = Math.hypot(step.to[0] - from[0], step.to[1] - from[1]);
    const count = Math.max(1, Math.min(400, Math.ceil(length / 4)));
    return Array.from({ length: count }, (_, index): Point => {
      const share = (index + 1) / count;
      return [from[0] + share * (step.to[0] - from[0]), from[1] + share * (step.to[1] - from[1])];
    });
  });
}

/** Whether a place lies inside closed paths, by the even-odd rule. */
export function insideOf(paths: readonly DrawingPath[]): (x: number, y: number) => boolean {
  const rings = paths.map((path) => outlinePoints([path]));
  return (x, y) =>
    rings.reduce((inside, ring) => {
      let crossings = 0;
      for (let index = 0; index < ring.length; index += 1) {
        const [x1, y1] = ring[index];
        const [x2, y2] = ring[(index + 1) % ring.length];
        if (y1 > y !== y2 > y && x < x1 + ((y - y1) * (x2 - x1)) / (y2 - y1)) crossings += 1;
      }
      return crossings % 2 === 1 ? !inside : inside;
    }, false);
}

export function boxOf(points: readonly Point[]): Box {
  const xs = points.map((point) => point[0]);
  const ys = points.map((point) => point[1]);
  return { left: Math.min(...xs), right: Math.max(...xs), bottom: Math.min(...ys), top: Math.max(...ys) };
}

export type PointMap = (point: Point) => Point;

/** Moves a whole view; `path` says what becomes of an arc. */
export function mapView(
  view: DrawingView,
  point: PointMap,
  path: (path: DrawingPath) => DrawingPath,
): DrawingView {
  return {
    title: view.title,
    conductor: view.conductor.map(path),
    second: view.second?.map(path),
    lines: view.lines?.map((line) => ({ ...path(line), style: line.style })),
    high: view.high.map(path),
    low: view.low.map(path),
    flow: view.flow.map(({ from, to }) => ({ from: point(from), to: point(to) })),
    dimensions: view.dimensions.map((dimension) => ({
      ...dimension,
      from: point(dimension.from),
      to: point(dimension.to),
      center: dimension.center && point(dimension.center),
    })),
  };
}
