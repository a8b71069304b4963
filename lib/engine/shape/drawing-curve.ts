/** Curves that are no circular arcs, as chains of short chords for drawings. */
import type { DrawingPath, Point } from "./drawing";
import { polyline } from "./drawing";

/** A curve through `count` + 1 points of equal steps of its parameter. */
export function sampled(at: (parameter: number) => Point, from: number, to: number, count = 48): DrawingPath {
  return polyline(Array.from({ length: count + 1 }, (_, i) => at(from + ((to - from) * i) / count)));
}

/** An ellipse with its axes along x and y, closed. */
export function ellipse(center: Point, halfWidth: number, halfHeight: number, count = 72): DrawingPath {
  const points = Array.from({ length: count }, (_, i): Point => {
    const turn = (2 * Math.PI * i) / count;
    return [center[0] + halfWidth * Math.cos(turn), center[1] + halfHeight * Math.sin(turn)];
  });
  return polyline(points, true);
}

/** The paths one after the other as one closed outline; each begins where the one before ends. */
export function joined(paths: readonly DrawingPath[]): DrawingPath {
  const [first, ...rest] = paths;
  return {
    from: first.from,
    steps: [...first.steps, ...rest.flatMap((path) => [{ to: path.from }, ...path.steps])],
    closed: true,
  };
}

/** The same path run backwards. */
export function reversed(path: DrawingPath): DrawingPath {
  const points = [path.from, ...path.steps.map(({ to }) => to)];
  const steps = path.steps.map((step, i) => ({
    to: points[i],
    ...(step.bulge === undefined ? {} : { bulge: -step.bulge }),
  }));
  return { from: points[points.length - 1], steps: steps.reverse(), closed: path.closed };
}
