import { defineShape } from "../define-shape";
import { rectangle } from "../drawing";
import { sideView } from "../side-view";

/** A straight bar of rectangular section: the field is the same everywhere, R = ρL/(wt). */
export const bar = defineShape({
  id: "bar",
  title: "Rectangular bar",
  family: "axial",
  summary:
    "A straight bar or strip of rectangular section; the current enters and leaves through the whole end faces.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Distance between the two end faces, along the current.",
    },
    width: {
      type: "quantity",
      kind: "length",
      label: "Width",
      symbol: "w",
      help: "Width of the section, across the current.",
    },
    thickness: {
      type: "quantity",
      kind: "length",
      label: "Thickness",
      symbol: "t",
      help: "Thickness of the section; a copper foil may be given by weight, such as 1 oz/ft^2.",
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
      name: "width",
      role: "across",
      unit: "m",
      label: "Distance across the width",
      start: "0",
      end: "width",
    },
    {
      name: "thickness",
      role: "across",
      unit: "m",
      label: "Distance through the thickness",
      start: "0",
      end: "thickness",
    },
  ],
  terminals: { high: "one end face", low: "the other end face" },
  answer: {
    kind: "flow",
    flow: ({ length, width, thickness }) => ({
      along: {
        coordinate: "length",
        start: 0,
        extent: length,
        section: () => width * thickness,
      },
      across: [
        {
          coordinate: "width",
          start: 0,
          extent: width,
          tube: () => thickness / length,
          fieldPerVolt: () => 1 / length,
        },
        {
          coordinate: "thickness",
          start: 0,
          extent: thickness,
          tube: () => width / length,
          fieldPerVolt: () => 1 / length,
        },
      ],
    }),
    uniform: ({ length, width, thickness }) => length / width / thickness,
  },
  formula: "R = \\frac{\\rho L}{w\\,t}",
  boundsBasis: "rounding",
  validity: ["Exact for terminals that cover the whole end faces as equipotentials."],
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
    dimensions: { length: "250 mm", width: "40 mm", thickness: "5 mm" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, width, thickness }) => ({
    views: [
      sideView({ length, height: width, along: "length", across: "width" }),
      {
        title: "section",
        conductor: [rectangle(0, 0, thickness, width)],
        high: [],
        low: [],
        flow: [],
        dimensions: [{ name: "thickness", from: [thickness, 0], to: [0, 0], kind: "linear", offset: 1 }],
      },
    ],
    description:
      "A rectangular bar seen from the side and in section; the current runs along its length from one end face to the other.",
  }),
});
