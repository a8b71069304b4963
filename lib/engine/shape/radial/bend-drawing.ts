/** The picture that bent round conductors share: the bend from above, and its section. */
import type { Drawing, DrawingDimension, DrawingPath, Point } from "../drawing";
import { arc, circle, polyline } from "../drawing";

export interface RoundBend {
  readonly bendRadius: number;
  /** Outer radius of the section. */
  readonly sectionRadius: number;
  /** Radius of the bore; 0 for a solid section. */
  readonly boreRadius: number;
  readonly angle: number;
}

export function drawRoundBend(
  bend: RoundBend,
  sectionDimensions: readonly DrawingDimension[],
  description: string,
): Drawing {
  const { bendRadius, sectionRadius, boreRadius, angle } = bend;
  const inside = bendRadius - sectionRadius;
  const outside = bendRadius + sectionRadius;
  const at = (radius: number, turn: number): Point => [radius * Math.cos(turn), radius * Math.sin(turn)];
  const plan: DrawingPath = {
    from: at(inside, 0),
    steps: [
      { to: at(outside, 0) },
      ...arc([0, 0], outside, 0, angle).steps,
      { to: at(inside, angle) },
      ...arc([0, 0], inside, angle, 0).steps,
    ],
    closed: true,
  };
  const bore = [-boreRadius, boreRadius].map((r) => ({
    ...arc([0, 0], bendRadius + r, 0, angle),
    style: "hidden" as const,
  }));
  const whole = angle >= 2 * Math.PI;
  return {
    views: [
      {
        title: "plan",
        conductor: [plan],
        lines: [
          { ...arc([0, 0], bendRadius, 0, angle), style: "axis" },
          ...(boreRadius > 0 ? bore : []),
          {
            ...polyline([
              [0, 0],
              [inside, 0],
            ]),
            style: "thin",
          },
        ],
        high: [polyline([at(inside, 0), at(outside, 0)])],
        low: [polyline([at(inside, angle), at(outside, angle)])],
        flow: [0.25, 0.7].map((part) => ({
          from: at(bendRadius, part * angle - 0.06 * angle),
          to: at(bendRadius, part * angle + 0.06 * angle),
        })),
        dimensions: [
          { name: "bendRadius", from: [0, 0], to: [bendRadius, 0], kind: "linear", offset: -1 },
          {
            name: "angle",
            from: at(whole ? inside / 2 : outside, 0),
            to: at(whole ? inside / 2 : outside, angle),
            kind: "angle",
            center: [0, 0],
          },
        ],
      },
      {
        title: "section",
        conductor: [circle([0, 0], sectionRadius), ...(boreRadius > 0 ? [circle([0, 0], boreRadius)] : [])],
        high: [],
        low: [],
        flow: [],
        dimensions: sectionDimensions,
      },
    ],
    description,
  };
}
