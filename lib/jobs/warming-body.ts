/** What threads and the service itself warm up on, as bodies of `POST /fields`: a small bend, and a plate with holes. */

type Point = [number, number];

function warmingBody(outer: Point[], holes: Point[][], from: [Point, Point], to: [Point, Point]) {
  return {
    outline: { outer, holes },
    terminals: [
      { name: "a", segments: [from] },
      { name: "b", segments: [to] },
    ],
    medium: { sheetResistance: 1 },
  };
}

function polygon(x: number, y: number, radius: number, corners: number): Point[] {
  return Array.from({ length: corners }, (_, k) => {
    const angle = (2 * Math.PI * k) / corners;
    return [x + radius * Math.cos(angle), y + radius * Math.sin(angle)];
  });
}

export const WARMING_BEND = warmingBody(
  [
    [0, 0],
    [4, 0],
    [4, 1],
    [1, 1],
    [1, 4],
    [0, 4],
  ],
  [],
  [
    [4, 0],
    [4, 1],
  ],
  [
    [1, 4],
    [0, 4],
  ],
);

/** Takes every path that a bend does not: holes, many vertices, terminals on parts of edges. */
export const WARMING_PLATE = warmingBody(
  [
    [0, 0],
    [9, 0],
    [9, 5],
    [0, 5],
  ],
  [polygon(2.5, 2.5, 1, 24), polygon(6, 1.5, 0.7, 24)],
  [
    [0, 1],
    [0, 3],
  ],
  [
    [9, 2],
    [9, 4],
  ],
);
