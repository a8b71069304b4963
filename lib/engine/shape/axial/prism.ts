import { defineShape } from "../define-shape";
import { polyline, type Point } from "../drawing";
import { sideView } from "../side-view";

/** A straight conductor of any constant section: R = ρL/S. */
export const prism = defineShape({
  id: "prism",
  title: "Prism of any section",
  family: "axial",
  summary:
    "A straight conductor of any constant section, known by its area; the current enters and leaves through the whole end faces.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Distance between the two end faces, along the current.",
    },
    area: {
      type: "quantity",
      kind: "area",
      label: "Area of the section",
      symbol: "S",
      help: "Area of the conductor's section, such as 95 mm^2.",
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
  ],
  terminals: { high: "one end face", low: "the other end face" },
  answer: {
    kind: "flow",
    flow: ({ length, area }) => ({
      along: {
        coordinate: "length",
        start: 0,
        extent: length,
        section: () => area,
        line: "anywhere in the section",
      },
      across: [],
    }),
    uniform: ({ length, area }) => length / area,
  },
  formula: "R = \\frac{\\rho L}{S}",
  boundsBasis: "rounding",
  validity: ["Exact for a straight conductor of constant section whose whole end faces are equipotentials."],
  cautions: [
    "The nominal section of a cable is a name: its resistance is fixed by the limits of its standard, not by this area.",
  ],
  assumptions: ["The whole of each end face is at one potential; contact resistance is not included."],
  sources: [
    {
      title: "Uniform field between parallel equipotential faces",
      detail: "R = ρL/S",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "2.4 m", area: "95 mm^2" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, area }) => {
    // The section is drawn as a regular hexagon of that area: it stands for any figure.
    const side = Math.sqrt((2 * area) / (3 * Math.sqrt(3)));
    const height = Math.sqrt(3) * side;
    const corners = Array.from({ length: 6 }, (_, i): Point => {
      const angle = (i * Math.PI) / 3;
      return [side * Math.cos(angle), height / 2 + side * Math.sin(angle)];
    });
    return {
      views: [
        sideView({ length, height, along: "length" }),
        {
          title: "section",
          conductor: [polyline(corners, true)],
          high: [],
          low: [],
          flow: [],
          dimensions: [{ name: "area", from: [0, height / 2], to: [side / 2, height], kind: "leader" }],
        },
      ],
      description:
        "A straight prism seen from the side and in section, drawn as a hexagon that stands for any figure of this area; the current runs along its length.",
    };
  },
});
