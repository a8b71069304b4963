import type { Drawing, DrawingDimension, Point } from "../drawing";
import { circle, polyline } from "../drawing";
import { groundLine, line, rodAt, rodArrows } from "./ground-drawing";

/**
 * One or more equal rods in section; `plan` gives the places of a group's rods in plan, none for no plan.
 */
export function drawRods(
  length: number,
  diameter: number,
  places: readonly number[],
  plan: readonly Point[],
  description: string,
): Drawing {
  const left = Math.min(...places);
  const right = Math.max(...places);
  // Half the length of the centre marks in plan.
  const mark =
    plan.length > 1 ? 0.3 * Math.hypot(plan[1][0] - plan[0][0], plan[1][1] - plan[0][1]) : diameter;
  const margin = Math.max(0.4 * length, 0.2 * (right - left));
  const spaced: DrawingDimension[] =
    places.length > 1
      ? [{ name: "spacing", from: [places[0], 0], to: [places[1], 0], kind: "linear", offset: 1 }]
      : [];
  return {
    views: [
      {
        title: "section",
        conductor: places.map((x) => rodAt(x, length, diameter)),
        lines: [
          groundLine(left - margin, right + margin),
          ...places.map((x) => line([x, 0.05 * length], [x, -1.05 * length], "axis")),
        ],
        high: places.map((x) =>
          polyline([
            [x - diameter / 2, 0],
            [x - diameter / 2, -length],
            [x + diameter / 2, -length],
            [x + diameter / 2, 0],
          ]),
        ),
        low: [],
        flow: rodArrows(right, length, diameter),
        dimensions: [
          {
            name: "length",
            from: [left - diameter / 2, -length],
            to: [left - diameter / 2, 0],
            kind: "linear",
            offset: 1,
          },
          { name: "diameter", from: [left, -length], to: [left + diameter / 2, -length], kind: "leader" },
          ...spaced,
        ],
      },
      ...(plan.length > 0
        ? [
            {
              title: "plan",
              conductor: plan.map((place) => circle(place, diameter / 2)),
              lines: plan.flatMap(([x, y]) => [
                line([x - mark, y], [x + mark, y], "axis"),
                line([x, y - mark], [x, y + mark], "axis"),
              ]),
              high: plan.map((place) => circle(place, diameter / 2)),
              low: [],
              flow: [],
              dimensions:
                plan.length > 1
                  ? [
                      {
                        name: "spacing",
                        from: plan[0],
                        to: plan[1],
                        kind: "linear" as const,
                        offset: 1,
                      },
                    ]
                  : [],
            },
          ]
        : []),
    ],
    description,
  };
}
