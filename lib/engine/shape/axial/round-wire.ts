import { defineShape } from "../define-shape";
import { circle } from "../drawing";
import { sideView } from "../side-view";

/** A straight wire of circular section: R = 4ρL/(πd²). */
export const roundWire = defineShape({
  id: "round-wire",
  title: "Round wire",
  family: "axial",
  summary:
    "A straight solid wire of circular section; the current enters and leaves through the whole end faces.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Length of the wire between the two terminals.",
    },
    diameter: {
      type: "quantity",
      kind: "length",
      label: "Diameter",
      symbol: "d",
      radius: "radius",
      help: "Diameter of the bare conductor; a gauge may be given, such as AWG 24.",
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
      name: "radius",
      role: "across",
      unit: "m",
      label: "Distance from the axis",
      start: "0",
      end: "diameter/2",
    },
    { name: "angle", role: "across", unit: "rad", label: "Angle around the axis", start: "0", end: "360°" },
  ],
  terminals: { high: "one end face", low: "the other end face" },
  answer: {
    kind: "flow",
    flow: ({ length, diameter }) => {
      const radius = diameter / 2;
      const area = Math.PI * radius * radius;
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
            start: 0,
            extent: radius,
            tube: (x) => (2 * Math.PI * x) / length,
            fieldPerVolt: () => 1 / length,
          },
          {
            coordinate: "angle",
            start: 0,
            extent: 2 * Math.PI,
            tube: () => ((radius / length) * radius) / 2,
            fieldPerVolt: () => 1 / length,
          },
        ],
      };
    },
    uniform: ({ length, diameter }) => (4 / Math.PI) * (length / diameter / diameter),
  },
  formula: "R = \\frac{4\\rho L}{\\pi d^2}",
  boundsBasis: "rounding",
  validity: [
    "Exact for a straight wire of constant diameter; a bend adds little where its radius is many diameters.",
  ],
  cautions: [],
  assumptions: [
    "The whole of each end face is at one potential; contact resistance is not included, and the length is that of the wire itself.",
  ],
  sources: [
    {
      title: "Uniform field between parallel equipotential faces",
      detail: "R = ρL/A",
      provenance: "derived here",
    },
    {
      title: "ASTM B258, diameters of the American wire gauge",
      detail: "d = 0.005 in · 92^((36 − n)/39)",
      provenance: "from memory",
    },
  ],
  example: {
    dimensions: { length: "12.5 m", diameter: "AWG 24" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, diameter }) => ({
    views: [
      sideView({ length, height: diameter, along: "length", round: true }),
      {
        title: "section",
        conductor: [circle([0, diameter / 2], diameter / 2)],
        high: [],
        low: [],
        flow: [],
        dimensions: [
          {
            name: "diameter",
            from: [diameter / 2, diameter],
            to: [diameter / 2, 0],
            kind: "linear",
            offset: 1,
          },
        ],
      },
    ],
    description:
      "A round wire seen from the side and in section; the current runs along it from one end face to the other.",
  }),
});
