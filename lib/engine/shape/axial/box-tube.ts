import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { polyline, rectangle } from "../drawing";

/** A hollow rectangular bar of even wall: R = ρL/(2·wall·(W+H−2·wall)). */
export const boxTube = defineShape({
  id: "box-tube",
  title: "Rectangular tube",
  family: "axial",
  summary:
    "A straight hollow bar of rectangular section with an even wall and square corners; the current runs along it.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Distance between the two end faces, along the current.",
    },
    outerWidth: {
      type: "quantity",
      kind: "length",
      label: "Outer width",
      symbol: "W",
      help: "Outer width of the section.",
    },
    outerHeight: {
      type: "quantity",
      kind: "length",
      label: "Outer height",
      symbol: "H",
      help: "Outer height of the section.",
    },
    wall: {
      type: "quantity",
      kind: "length",
      label: "Wall",
      symbol: "t",
      help: "Thickness of the wall, the same on all four sides.",
    },
  },
  constraints: [
    {
      names: ["wall", "outerWidth", "outerHeight"],
      text: "twice the wall less than the outer width and the outer height",
      holds: ({ wall, outerWidth, outerHeight }) => 2 * wall < outerWidth && 2 * wall < outerHeight,
    },
  ],
  coordinates: [
    {
      name: "length",
      role: "along",
      unit: "m",
      label: "Distance from the high end",
      start: "0",
      end: "length",
    },
  ],
  terminals: { high: "one end face", low: "the other end face" },
  answer: {
    kind: "flow",
    flow: ({ length, outerWidth, outerHeight, wall }) => {
      const area = 2 * wall * midline(outerWidth, outerHeight, wall);
      return {
        along: {
          coordinate: "length",
          start: 0,
          extent: length,
          section: () => area,
          line: "anywhere in the wall",
        },
        across: [],
      };
    },
    uniform: ({ length, outerWidth, outerHeight, wall }) =>
      length / wall / midline(outerWidth, outerHeight, wall) / 2,
  },
  formula: "R = \\frac{\\rho L}{2\\,t\\,(W+H-2t)}",
  boundsBasis: "rounding",
  validity: ["Exact for square corners inside and outside and terminals that cover the whole end faces."],
  cautions: [AMPACITY_CAUTION],
  assumptions: [
    "Corner radii are not included: each outer radius r takes 0.215·r² from the section, each inner one adds as much.",
    "The whole of each end face is at one potential; contact resistance is not included.",
  ],
  sources: [
    {
      title: "Uniform field between parallel equipotential faces",
      detail: "R = ρL/A",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "4.7 m", outerWidth: "80 mm", outerHeight: "60 mm", wall: "5 mm" },
    medium: { material: "aluminium-electrical" },
  },
  drawing: ({ length, outerWidth, outerHeight, wall }) => ({
    views: [
      {
        title: "side view",
        conductor: [rectangle(0, 0, length, outerHeight)],
        lines: [wall, outerHeight - wall].map((y) => ({
          ...polyline([
            [0, y],
            [length, y],
          ]),
          style: "hidden" as const,
        })),
        high: [
          polyline([
            [0, 0],
            [0, outerHeight],
          ]),
        ],
        low: [
          polyline([
            [length, 0],
            [length, outerHeight],
          ]),
        ],
        flow: [0.2, 0.6].map((part) => ({
          from: [length * part, outerHeight - wall / 2],
          to: [length * (part + 0.2), outerHeight - wall / 2],
        })),
        dimensions: [
          { name: "length", from: [length, 0], to: [0, 0], kind: "linear", offset: 1 },
          { name: "outerHeight", from: [length, outerHeight], to: [length, 0], kind: "linear", offset: 1 },
        ],
      },
      {
        title: "section",
        conductor: [
          rectangle(0, 0, outerWidth, outerHeight),
          rectangle(wall, wall, outerWidth - 2 * wall, outerHeight - 2 * wall),
        ],
        high: [],
        low: [],
        flow: [],
        dimensions: [
          { name: "outerWidth", from: [outerWidth, 0], to: [0, 0], kind: "linear", offset: 1 },
          {
            name: "wall",
            from: [outerWidth - wall, outerHeight / 2],
            to: [outerWidth, outerHeight / 2],
            kind: "linear",
            offset: 0,
          },
        ],
      },
    ],
    description:
      "A rectangular tube seen from the side and in section; the current runs along its wall from one end face to the other.",
  }),
});

/** Half the length of the wall's middle line, W+H−2t; neither difference loses digits, since 2t is less than both. */
function midline(outerWidth: number, outerHeight: number, wall: number): number {
  return outerWidth - wall + (outerHeight - wall);
}
