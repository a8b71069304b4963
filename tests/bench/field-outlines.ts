/** The outlines of the field bench, as bodies of `POST /fields`; lengths in mm, sheet resistance 1 ohm/sq where none is said. */

type Point = [number, number];

export interface FieldBody {
  readonly outline: { readonly unit: "mm"; readonly outer: Point[]; readonly holes?: Point[][] };
  readonly terminals: ReadonlyArray<{ readonly name: string; readonly segments: Array<[Point, Point]> }>;
  readonly medium: object;
}

const SHEET = { sheetResistance: 1 };

function terminals(first: [Point, Point], second: [Point, Point]): FieldBody["terminals"] {
  return [
    { name: "in", segments: [first] },
    { name: "out", segments: [second] },
  ];
}

/** Two legs of length 4 at a right angle, width 1. */
export function bend(medium: object = SHEET): FieldBody {
  const outer: Point[] = [
    [0, 0],
    [5, 0],
    [5, 1],
    [1, 1],
    [1, 5],
    [0, 5],
  ];
  return {
    outline: { unit: "mm", outer },
    terminals: terminals(
      [
        [5, 0],
        [5, 1],
      ],
      [
        [1, 5],
        [0, 5],
      ],
    ),
    medium,
  };
}

/** σ = e^(−2x)(1 + 0.5 sin 3y) with x and y in mm. */
export function gradedBend(): FieldBody {
  return bend({
    expression: "exp(-2000*x)*(1+0.5*sin(3000*y))",
    quantity: "conductivity",
    thickness: "1 mm",
  });
}

function polygon(x: number, y: number, radius: number, corners: number): Point[] {
  return Array.from({ length: corners }, (_, k) => {
    const angle = (2 * Math.PI * k) / corners;
    return [x + radius * Math.cos(angle), y + radius * Math.sin(angle)];
  });
}

/** A plate of 10 by 6 with three holes of 48 corners each, and terminals on parts of its short sides. */
export function plate(): FieldBody {
  return {
    outline: {
      unit: "mm",
      outer: [
        [0, 0],
        [10, 0],
        [10, 6],
        [0, 6],
      ],
      holes: [polygon(3, 3, 1, 48), polygon(6, 1.8, 0.8, 48), polygon(6.5, 4.3, 0.9, 48)],
    },
    terminals: terminals(
      [
        [0, 1],
        [0, 3],
      ],
      [
        [10, 2.5],
        [10, 5],
      ],
    ),
    medium: SHEET,
  };
}

/** A track of width 1 that goes up and down twelve times, gap 1, height 10. */
export function meander(): FieldBody {
  const last = 10;
  const outside: Point[] = [];
  const inside: Point[] = [];
  for (let leg = 0; leg <= last; leg += 2) {
    const x = 2 * leg;
    outside.push([x, 10], [x + 3, 10]);
    inside.push([x + 1, 9], [x + 2, 9]);
    if (leg === last) continue;
    outside.push([x + 3, 1], [x + 4, 1]);
    inside.push([x + 2, 0], [x + 5, 0]);
  }
  const outer: Point[] = [[0, 0], ...outside, [23, 0], [22, 0], ...inside.reverse(), [1, 0]];
  return {
    outline: { unit: "mm", outer },
    terminals: terminals(
      [
        [0, 0],
        [1, 0],
      ],
      [
        [22, 0],
        [23, 0],
      ],
    ),
    medium: SHEET,
  };
}

/** A plate with a hundred round holes in ten rows, current from side to side. */
export function sieve(): FieldBody {
  const holes = Array.from({ length: 100 }, (_, k) =>
    polygon(1 + 2 * (k % 10), 1 + 2 * Math.floor(k / 10), 0.5 + 0.02 * (k % 7), 24),
  );
  return {
    outline: {
      unit: "mm",
      outer: [
        [0, 0],
        [20, 0],
        [20, 20],
        [0, 20],
      ],
      holes,
    },
    terminals: terminals(
      [
        [0, 0],
        [0, 20],
      ],
      [
        [20, 0],
        [20, 20],
      ],
    ),
    medium: SHEET,
  };
}
