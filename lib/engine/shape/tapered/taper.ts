/** What the tapered shapes share: the view from the side, the texts about their bracket, the caution of a steep taper. */
import type { Source } from "../define-shape";
import { polyline, type DrawingView } from "../drawing";

/** Width of the bracket from which on a taper counts as steep. */
const STEEP = 1.02;

/** A caution where the flow is far from straight and the bracket wide. */
export function taperCautions(wallRatio: number): readonly string[] {
  if (wallRatio <= STEEP) return [];
  const width = Number((100 * (wallRatio - 1)).toPrecision(2));
  return [
    `Steep taper: the proved bounds lie ${width} % apart and the value is their middle; a field solution on the outline narrows them.`,
  ];
}

export const taperTexts: {
  readonly validity: readonly string[];
  readonly assumptions: readonly string[];
  readonly sources: readonly Source[];
} = {
  validity: [
    "Proved bounds for flat end faces at any taper: conducting sheets across the flow give the lower, insulating walls along the straight lines of the taper the upper value.",
    "The value shown is the middle of the bounds; field and current density are means over each section.",
  ],
  assumptions: ["The whole of each flat end face is at one potential; the sides carry no current out."],
  sources: [
    {
      title: "Lord Rayleigh, On the theory of resonance, Phil. Trans. 161 (1871) 77",
      detail: "Perfectly conducting sheets can only lower, insulating walls only raise a resistance.",
      provenance: "from memory",
    },
    {
      title: "Straight-line walls of a taper",
      detail: "The ratio of the two bounds",
      provenance: "derived here",
    },
  ],
};

export interface TaperView {
  readonly length: number;
  readonly startWidth: number;
  readonly endWidth: number;
  /** Names of the dimensions at the start and at the end. */
  readonly names: readonly [string, string];
  readonly round?: boolean;
}

/** A symmetric taper seen from the side, its high end on the left. */
export function taperView({ length, startWidth, endWidth, names, round = false }: TaperView): DrawingView {
  const [a, b] = [startWidth / 2, endWidth / 2];
  const end = (x: number, half: number) =>
    polyline([
      [x, -half],
      [x, half],
    ]);
  return {
    title: round ? "side view" : "plan",
    conductor: [
      polyline(
        [
          [0, -a],
          [length, -b],
          [length, b],
          [0, a],
        ],
        true,
      ),
    ],
    lines: [
      {
        ...polyline([
          [-0.05 * length, 0],
          [1.05 * length, 0],
        ]),
        style: "axis",
      },
    ],
    high: [end(0, a)],
    low: [end(length, b)],
    flow: [0.2, 0.6].map((part) => ({
      from: [length * part, 0] as const,
      to: [length * (part + 0.2), 0] as const,
    })),
    dimensions: [
      { name: names[0], from: [0, -a], to: [0, a], kind: "linear", offset: 1 },
      { name: names[1], from: [length, b], to: [length, -b], kind: "linear", offset: 1 },
      {
        name: "length",
        from: [length, -Math.max(a, b)],
        to: [0, -Math.max(a, b)],
        kind: "linear",
        offset: 1,
      },
    ],
  };
}
