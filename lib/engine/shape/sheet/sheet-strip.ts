import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { rectangle } from "../drawing";
import { exactFactor } from "../exact-factor";
import { along, edge } from "./sheet-drawing";

/** A strip of sheet with terminals across both ends: L/w squares. */
export const sheetStrip = defineShape({
  id: "sheet-strip",
  title: "Sheet strip",
  family: "sheet",
  summary: "A straight strip of a thin sheet; the current enters and leaves across its whole ends.",
  dimensions: {
    length: lengthDimension("Length", "L", "Distance between the two ends."),
    width: lengthDimension("Width", "w", "Width of the strip."),
  },
  coordinates: [],
  terminals: { high: "one whole end", low: "the other whole end" },
  answer: {
    kind: "factor",
    factor: ({ length, width }) => exactFactor(length / width),
    peak: ({ length }) => ({ fieldPerVolt: 1 / length, position: "everywhere in the strip" }),
  },
  formula: "R = R_\\square\\,\\frac{L}{w}",
  boundsBasis: "rounding",
  validity: ["Exact for terminals that cover the whole ends; a strip graded along or across it is a bar."],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The sheet is thin and uniform; each end is at one potential."],
  sources: [
    {
      title: "Uniform field between parallel edges",
      detail: "squares in series",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "2 mm", width: "50 um" },
    medium: { sheetResistance: "100 ohm/sq" },
  },
  drawing: ({ length, width }) => ({
    views: [
      {
        title: "plan",
        conductor: [rectangle(0, 0, length, width)],
        high: [edge([0, 0], [0, width])],
        low: [edge([length, 0], [length, width])],
        flow: [along(0.2 * length, 0.4 * length, width / 2), along(0.6 * length, 0.8 * length, width / 2)],
        dimensions: [
          { name: "length", from: [length, 0], to: [0, 0], kind: "linear", offset: 1 },
          { name: "width", from: [length, width], to: [length, 0], kind: "linear", offset: 1 },
        ],
      },
    ],
    description: "A straight strip of sheet in plan; the current runs along it from one end to the other.",
  }),
});
