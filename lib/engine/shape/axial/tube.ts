import { defineShape } from "../define-shape";
import { circle } from "../drawing";
import { sideView } from "../side-view";

/** A straight round tube with the current along it: R = ρL/(π·t·(D − t)). */
export const tube = defineShape({
  id: "tube",
  title: "Round tube, axial flow",
  family: "axial",
  summary:
    "A straight round tube; the current runs along its wall and enters and leaves through the ring-shaped end faces.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Length of the tube between the two terminals.",
    },
    outerDiameter: {
      type: "quantity",
      kind: "length",
      label: "Outer diameter",
      symbol: "D",
      radius: "outerRadius",
      help: "Outer diameter of the tube.",
    },
    wall: {
      type: "quantity",
      kind: "length",
      label: "Wall",
      symbol: "t",
      help: "Thickness of the wall, less than half the outer diameter.",
    },
  },
  constraints: [
    {
      names: ["wall", "outerDiameter"],
      text: "wall less than half the outer diameter",
      holds: ({ wall, outerDiameter }) => 2 * wall < outerDiameter,
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
    {
      name: "radius",
      role: "across",
      unit: "m",
      label: "Distance from the axis",
      start: "outerDiameter/2 - wall",
      end: "outerDiameter/2",
    },
    { name: "angle", role: "across", unit: "rad", label: "Angle around the axis", start: "0", end: "360°" },
  ],
  terminals: { high: "one end face", low: "the other end face" },
  answer: {
    kind: "flow",
    flow: ({ length, outerDiameter, wall }) => {
      const start = outerDiameter / 2 - wall;
      const area = Math.PI * wall * (outerDiameter - wall);
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
            coordinate: "radius",
            start,
            extent: wall,
            tube: (x) => (2 * Math.PI * (start + x)) / length,
            fieldPerVolt: () => 1 / length,
          },
          {
            coordinate: "angle",
            start: 0,
            extent: 2 * Math.PI,
            tube: () => ((wall / length) * (outerDiameter - wall)) / 2,
            fieldPerVolt: () => 1 / length,
          },
        ],
      };
    },
    uniform: ({ length, outerDiameter, wall }) => length / wall / (outerDiameter - wall) / Math.PI,
  },
  formula: "R = \\frac{\\rho L}{\\pi\\,t\\,(D - t)}",
  boundsBasis: "rounding",
  validity: ["Exact for a straight tube of constant wall whose whole end faces are equipotentials."],
  cautions: [],
  assumptions: ["The whole of each end face is at one potential; contact resistance is not included."],
  sources: [
    {
      title: "Uniform field between parallel equipotential faces",
      detail: "R = ρL/A",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "1.2 m", outerDiameter: "22 mm", wall: "1.5 mm" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, outerDiameter, wall }) => ({
    views: [
      sideView({
        length,
        height: outerDiameter,
        along: "length",
        hidden: [wall, outerDiameter - wall],
        round: true,
      }),
      {
        title: "section",
        conductor: [
          circle([0, outerDiameter / 2], outerDiameter / 2),
          circle([0, outerDiameter / 2], outerDiameter / 2 - wall),
        ],
        high: [],
        low: [],
        flow: [],
        dimensions: [
          {
            name: "outerDiameter",
            from: [outerDiameter / 2, outerDiameter],
            to: [outerDiameter / 2, 0],
            kind: "linear",
            offset: 1,
          },
          { name: "wall", from: [0, 0], to: [0, wall], kind: "linear", offset: -1 },
        ],
      },
    ],
    description:
      "A round tube seen from the side and in section; the current runs along its wall from one end face to the other.",
  }),
});
