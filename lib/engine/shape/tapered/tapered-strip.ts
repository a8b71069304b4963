import { log1pRatio, overAtan } from "../../numeric/stable-ratios";
import { defineShape } from "../define-shape";
import { rectangle } from "../drawing";
import { taperCautions, taperTexts, taperView } from "./taper";

/** A symmetric trapezoid between straight ends: ∫ρdx/(t·w) by conducting sheets, times T/atan T by insulating walls. */
export const taperedStrip = defineShape({
  id: "tapered-strip",
  title: "Tapered strip",
  family: "tapered",
  summary:
    "A strip whose width changes evenly and symmetrically between two straight ends, through which the current enters and leaves.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Distance between the two straight ends.",
    },
    startWidth: {
      type: "quantity",
      kind: "length",
      label: "Start width",
      symbol: "w₁",
      help: "Width at the high end.",
    },
    endWidth: {
      type: "quantity",
      kind: "length",
      label: "End width",
      symbol: "w₂",
      help: "Width at the low end.",
    },
    thickness: {
      type: "quantity",
      kind: "length",
      label: "Thickness",
      symbol: "t",
      help: "Thickness of the strip; a copper foil may be given by weight, such as 1 oz/ft^2.",
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
  terminals: { high: "the straight end of the start width", low: "the straight end of the end width" },
  answer: {
    kind: "flow",
    flow: ({ length, startWidth, endWidth, thickness }) => ({
      along: {
        coordinate: "length",
        start: 0,
        extent: length,
        section: (x) => thickness * (startWidth * (1 - x / length) + endWidth * (x / length)),
      },
      across: [],
    }),
    uniform: ({ length, startWidth, endWidth, thickness }) => {
      const narrow = Math.min(startWidth, endWidth);
      return (length / thickness / narrow) * log1pRatio(Math.abs(endWidth - startWidth) / narrow);
    },
    wallRatio,
    cautions: (d) => taperCautions(wallRatio(d)),
  },
  formula:
    "R_s = \\frac{\\rho L}{t}\\,\\frac{\\ln(w_2/w_1)}{w_2 - w_1} \\le R \\le R_s\\,\\frac{T}{\\arctan T},\\quad T = \\frac{|w_2 - w_1|}{2L}",
  boundsBasis: "rayleigh",
  validity: taperTexts.validity,
  cautions: [],
  assumptions: taperTexts.assumptions,
  sources: taperTexts.sources,
  example: {
    dimensions: { length: "17.2 mm", startWidth: "0.31 mm", endWidth: "2.6 mm", thickness: "35 um" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, startWidth, endWidth, thickness }) => ({
    views: [
      taperView({ length, startWidth, endWidth, names: ["startWidth", "endWidth"] }),
      {
        title: "section at the start",
        conductor: [rectangle(0, 0, startWidth, thickness)],
        high: [],
        low: [],
        flow: [],
        dimensions: [
          {
            name: "thickness",
            from: [startWidth, thickness],
            to: [startWidth, 0],
            kind: "linear",
            offset: 1,
          },
        ],
      },
    ],
    description:
      "A tapered strip in plan and in section; the current runs along it from one straight end to the other.",
  }),
});

/** Upper over lower bound: the walls follow the straight lines of the taper. */
function wallRatio(d: {
  readonly length: number;
  readonly startWidth: number;
  readonly endWidth: number;
}): number {
  return overAtan(Math.abs(d.endWidth - d.startWidth) / 2 / d.length);
}
