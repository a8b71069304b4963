/** Outlines to begin with, written as bodies of the API. All parts are invented. */
import { readBody } from "./read-body";
import type { Sketch } from "./sketch";

export const EMPTY_SKETCH: Sketch = {
  unit: "mm",
  symmetry: "plan",
  rings: [[]],
  terminals: [],
  medium: { sheetResistance: "50 ohm/sq" },
  regions: [],
  accuracy: 1e-4,
  settings: {},
};

interface StartOutline {
  readonly id: string;
  readonly title: string;
  readonly body: object;
}

const circle = (x: number, y: number, radius: number) => [
  { arcTo: [x - radius, y], center: [x, y], clockwise: false },
  { arcTo: [x + radius, y], center: [x, y], clockwise: false },
];

export const START_OUTLINES: readonly StartOutline[] = [
  {
    id: "bend",
    title: "Bent track",
    body: {
      outline: {
        unit: "mm",
        outer: [
          [0, 0],
          [40, 0],
          [40, 10],
          [10, 10],
          [10, 40],
          [0, 40],
        ],
      },
      terminals: [
        { name: "in", parts: [{ ring: 0, edge: 1 }] },
        { name: "out", parts: [{ ring: 0, edge: 4 }] },
      ],
      medium: { sheetResistance: "50 ohm/sq" },
    },
  },
  {
    id: "plate",
    title: "Busbar with a hole",
    body: {
      outline: {
        unit: "mm",
        outer: [
          [0, 0],
          [80, 0],
          [80, 40],
          [0, 40],
        ],
        holes: [circle(40, 20, 9)],
      },
      terminals: [
        { name: "in", parts: [{ ring: 0, edge: 3 }] },
        { name: "out", parts: [{ ring: 0, edge: 1 }] },
      ],
      medium: { material: "copper-annealed", thickness: "5 mm" },
    },
  },
  {
    id: "meander",
    title: "Meander",
    body: {
      outline: {
        unit: "um",
        outer: [
          [0, 0],
          [10, 0],
          [10, 90],
          [30, 90],
          [30, 0],
          [80, 0],
          [80, 90],
          [100, 90],
          [100, 0],
          [110, 0],
          [110, 100],
          [70, 100],
          [70, 10],
          [40, 10],
          [40, 100],
          [0, 100],
        ],
      },
      terminals: [
        { name: "in", parts: [{ ring: 0, edge: 0 }] },
        { name: "out", parts: [{ ring: 0, edge: 8 }] },
      ],
      medium: { sheetResistance: "120 ohm/sq" },
    },
  },
  {
    id: "divider",
    title: "Strip with a tap",
    body: {
      outline: {
        unit: "mm",
        outer: [
          [0, 0],
          [30, 0],
          [30, 6],
          [20, 6],
          [20, 10],
          [18, 10],
          [18, 6],
          [0, 6],
        ],
      },
      terminals: [
        { name: "in", parts: [{ ring: 0, edge: 7 }] },
        { name: "out", parts: [{ ring: 0, edge: 1 }] },
        { name: "tap", parts: [{ ring: 0, edge: 4 }] },
      ],
      medium: { sheetResistance: "1 kohm/sq" },
    },
  },
  {
    id: "patch",
    title: "Track with a second film",
    body: {
      outline: {
        unit: "mm",
        outer: [
          [0, 0],
          [24, 0],
          [24, 8],
          [0, 8],
        ],
      },
      terminals: [
        { name: "in", parts: [{ ring: 0, edge: 3 }] },
        { name: "out", parts: [{ ring: 0, edge: 1 }] },
      ],
      medium: {
        sheetResistance: "50 ohm/sq",
        regions: [
          {
            ring: [
              [8, 2],
              [16, 2],
              [16, 8],
              [8, 8],
            ],
            medium: { sheetResistance: "5 ohm/sq" },
          },
        ],
      },
    },
  },
  {
    id: "sleeve",
    title: "Solid of revolution: flanged sleeve",
    body: {
      outline: {
        unit: "mm",
        symmetry: "axisymmetric",
        outer: [
          [4, 0],
          [14, 0],
          [14, 3],
          [7, 3],
          [7, 20],
          [4, 20],
        ],
      },
      terminals: [
        { name: "bore", parts: [{ ring: 0, edge: 5 }] },
        { name: "rim", parts: [{ ring: 0, edge: 1 }] },
      ],
      medium: { conductivity: "1 pS/m" },
    },
  },
];

/** The sketch of a start outline; the empty one where there is none of that id. */
export function startSketch(id: string): Sketch {
  const found = START_OUTLINES.find((start) => start.id === id);
  const reading = found && readBody(found.body, EMPTY_SKETCH);
  return reading?.ok ? reading.sketch : EMPTY_SKETCH;
}
