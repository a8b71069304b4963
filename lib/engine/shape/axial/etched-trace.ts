import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { polyline, rectangle } from "../drawing";

/** A trace whose sides are sloped by etching: trapezoidal section, the same along its length, R = ρL/(t(b+c)/2). */
export const etchedTrace = defineShape({
  id: "etched-trace",
  title: "Etched trace",
  family: "axial",
  summary:
    "A straight board trace with the trapezoidal section that etching leaves; the current enters and leaves through the whole end faces.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Distance between the two end faces, along the current.",
    },
    baseWidth: {
      type: "quantity",
      kind: "length",
      label: "Base width",
      symbol: "b",
      help: "Width of the foot of the section, on the laminate. With an etch factor F the top is narrower by 2t/F.",
    },
    topWidth: {
      type: "quantity",
      kind: "length",
      label: "Top width",
      symbol: "c",
      help: "Width of the section at its top; it may also be the wider one (undercut).",
    },
    thickness: {
      type: "quantity",
      kind: "length",
      label: "Thickness",
      symbol: "t",
      help: "Height of the section: foil and plating together. A foil may be given by weight, such as 1 oz/ft^2.",
    },
  },
  coordinates: [
    {
      name: "length",
      role: "along",
      unit: "m",
      label: "Distance from the high end",
      start: "0",
      end: "length",
    },
    {
      name: "thickness",
      role: "across",
      unit: "m",
      label: "Height above the base",
      start: "0",
      end: "thickness",
    },
  ],
  terminals: { high: "one end face", low: "the other end face" },
  answer: {
    kind: "flow",
    flow: ({ length, baseWidth, topWidth, thickness }) => {
      const area = thickness * meanWidth(baseWidth, topWidth);
      return {
        along: {
          coordinate: "length",
          start: 0,
          extent: length,
          section: () => area,
          line: "anywhere in the section",
        },
        across: [
          {
            coordinate: "thickness",
            start: 0,
            extent: thickness,
            // A weighted mean of the two widths: never negative, whichever is the wider one.
            tube: (x) => (baseWidth * (1 - x / thickness) + topWidth * (x / thickness)) / length,
            fieldPerVolt: () => 1 / length,
          },
        ],
      };
    },
    uniform: ({ length, baseWidth, topWidth, thickness }) =>
      length / thickness / meanWidth(baseWidth, topWidth),
  },
  formula: "R = \\frac{2\\rho L}{t\\,(b+c)}",
  boundsBasis: "rounding",
  validity: ["Exact for a straight trace of constant section whose whole end faces are equipotentials."],
  cautions: [AMPACITY_CAUTION],
  assumptions: [
    "The sides are straight from base to top; roughness of the foil and contact resistance are not included.",
  ],
  sources: [
    {
      title: "Uniform field between parallel equipotential faces",
      detail: "R = ρL/A",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "53.1 mm", baseWidth: "0.2 mm", topWidth: "0.165 mm", thickness: "1 oz/ft^2" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, baseWidth, topWidth, thickness }) => {
    const wide = Math.max(baseWidth, topWidth);
    const [baseLeft, topLeft] = [(wide - baseWidth) / 2, (wide - topWidth) / 2];
    return {
      views: [
        {
          title: "plan",
          conductor: [rectangle(0, 0, length, wide)],
          lines: [topLeft, baseLeft].flatMap((y) =>
            y > 0
              ? [y, wide - y].map((at) => ({
                  ...polyline([
                    [0, at],
                    [length, at],
                  ]),
                  style: "thin" as const,
                }))
              : [],
          ),
          high: [
            polyline([
              [0, 0],
              [0, wide],
            ]),
          ],
          low: [
            polyline([
              [length, 0],
              [length, wide],
            ]),
          ],
          flow: [0.2, 0.6].map((part) => ({
            from: [length * part, wide / 2],
            to: [length * (part + 0.2), wide / 2],
          })),
          dimensions: [{ name: "length", from: [length, 0], to: [0, 0], kind: "linear", offset: 1 }],
        },
        {
          title: "section",
          conductor: [
            polyline(
              [
                [baseLeft, 0],
                [baseLeft + baseWidth, 0],
                [topLeft + topWidth, thickness],
                [topLeft, thickness],
              ],
              true,
            ),
          ],
          high: [],
          low: [],
          flow: [],
          dimensions: [
            {
              name: "baseWidth",
              from: [baseLeft + baseWidth, 0],
              to: [baseLeft, 0],
              kind: "linear",
              offset: 1,
            },
            {
              name: "topWidth",
              from: [topLeft, thickness],
              to: [topLeft + topWidth, thickness],
              kind: "linear",
              offset: 1,
            },
            { name: "thickness", from: [wide, thickness], to: [wide, 0], kind: "linear", offset: 1 },
          ],
        },
      ],
      description:
        "An etched trace in plan and in section: a trapezoid, base width below and top width above; the current runs along its length.",
    };
  },
});

/** Half the sum, halved first so that it stays finite. */
function meanWidth(baseWidth: number, topWidth: number): number {
  return baseWidth / 2 + topWidth / 2;
}
