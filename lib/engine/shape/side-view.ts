/** The view that straight conductors share: a rectangle between two end faces, with the current along it. */
import { polyline, rectangle, type DrawingDimension, type DrawingView } from "./drawing";

export interface SideView {
  readonly title?: string;
  readonly length: number;
  readonly height: number;
  /** Name of the dimension along the current. */
  readonly along: string;
  /** Name of the dimension across it, where this view shows one. */
  readonly across?: string;
  /** Heights of hidden edges, such as a bore's. */
  readonly hidden?: readonly number[];
  /** Whether it is a round body, with an axis. */
  readonly round?: boolean;
}

/** A straight conductor from the side, its high end on the left. */
export function sideView(view: SideView): DrawingView {
  const { title = "side view", length, height, along, across, hidden = [], round = false } = view;
  const dimensions: DrawingDimension[] = [
    { name: along, from: [length, 0], to: [0, 0], kind: "linear", offset: 1 },
  ];
  if (across !== undefined) {
    dimensions.push({ name: across, from: [length, height], to: [length, 0], kind: "linear", offset: 1 });
  }
  const line = (y: number, from: number, to: number) =>
    polyline([
      [from, y],
      [to, y],
    ]);
  return {
    title,
    conductor: [rectangle(0, 0, length, height)],
    lines: [
      ...hidden.map((y) => ({ ...line(y, 0, length), style: "hidden" as const })),
      ...(round ? [{ ...line(height / 2, -0.05 * length, 1.05 * length), style: "axis" as const }] : []),
    ],
    high: [
      polyline([
        [0, 0],
        [0, height],
      ]),
    ],
    low: [
      polyline([
        [length, 0],
        [length, height],
      ]),
    ],
    flow: [0.2, 0.6].map((part) => ({
      from: [length * part, height / 2] as const,
      to: [length * (part + 0.2), height / 2] as const,
    })),
    dimensions,
  };
}
