/** The picture of a spot through which two bodies touch, or one body meets a face. */
import type { Drawing, DrawingDimension, DrawingView, Point } from "../drawing";
import { circle, rectangle } from "../drawing";
import { ellipse } from "../drawing-curve";
import { segment } from "./circle-views";

export interface Spot {
  readonly halfWidth: number;
  /** Half the other axis of the spot, seen in plan. */
  readonly halfHeight: number;
  /** Half the width of the bodies as drawn. */
  readonly reach: number;
  readonly sides: number;
  /** Whether the bodies end at `reach` (a cylinder) or go on. */
  readonly bounded: boolean;
}

export function drawSpot(
  spot: Spot,
  sideDimensions: readonly DrawingDimension[],
  planDimensions: readonly DrawingDimension[],
  description: string,
): Drawing {
  const { halfWidth: a, reach, sides, bounded } = spot;
  const deep = 1.3 * reach;
  const far = (y: number) => segment([-reach, y], [reach, y]);
  const insulated = [segment([-reach, 0], [-a, 0]), segment([a, 0], [reach, 0])];
  const arrows = (sign: number, outwards: boolean): DrawingView["flow"] =>
    [-0.6, 0, 0.6].map((slope) => {
      const near: Point = [slope * 0.6 * a, sign * 0.25 * deep];
      const away: Point = [slope * 0.7 * reach, sign * 0.8 * deep];
      return outwards ? { from: near, to: away } : { from: away, to: near };
    });
  return {
    views: [
      {
        title: "section",
        conductor: [
          rectangle(-reach, -deep, 2 * reach, deep),
          ...(sides === 2 ? [rectangle(-reach, 0, 2 * reach, deep)] : []),
        ],
        lines: [
          ...insulated.map((path) => ({ ...path, style: "thin" as const })),
          { ...segment([0, -1.05 * deep], [0, sides === 2 ? 1.05 * deep : 0.1 * deep]), style: "axis" },
        ],
        high: [sides === 2 ? far(deep) : segment([-a, 0], [a, 0])],
        low: [far(-deep)],
        flow: [...(sides === 2 ? arrows(1, false) : []), ...arrows(-1, true)],
        dimensions: sideDimensions,
      },
      {
        title: "plan of the spot",
        conductor: [bounded ? circle([0, 0], reach) : rectangle(-reach, -reach, 2 * reach, 2 * reach)],
        lines: [{ ...ellipse([0, 0], a, spot.halfHeight), style: "thin" }],
        high: [],
        low: [],
        flow: [],
        dimensions: planDimensions,
      },
    ],
    description,
  };
}
