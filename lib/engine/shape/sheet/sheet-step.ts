import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { endingChange } from "./leg-modes";
import { FIELD_TAKES_OVER, longLegFactor } from "./long-leg-factor";
import { along, edge, outline } from "./sheet-drawing";
import { narrowModes, stepOf, stepSquares, wideModes } from "./step-law";

interface Strips {
  readonly length1: number;
  readonly width1: number;
  readonly length2: number;
  readonly width2: number;
  readonly alignment: string;
}

/** A strip that changes its width abruptly: the strips' squares and the step's, by conformal mapping. */
export const sheetStep = defineShape({
  id: "sheet-step",
  title: "Step in width",
  family: "sheet",
  summary:
    "A strip of a thin sheet that changes its width abruptly, on one side or on both; the current runs along it between its two whole ends.",
  dimensions: {
    length1: lengthDimension("First length", "L₁", "Length of the first part, from its end to the step."),
    width1: lengthDimension("First width", "w₁", "Width of the first part."),
    length2: lengthDimension("Second length", "L₂", "Length of the second part, from the step to its end."),
    width2: lengthDimension("Second width", "w₂", "Width of the second part."),
    alignment: {
      type: "choice",
      label: "Alignment",
      symbol: "m",
      choices: [
        { value: "edge", label: "one edge runs straight through" },
        { value: "centre", label: "both parts have the same centre line" },
      ],
      help: "edge: the step is on one side; centre: half of it on each side.",
    },
  },
  coordinates: [],
  terminals: { high: "the end of the first part", low: "the end of the second part" },
  answer: {
    kind: "factor",
    planIsWhole: () => true,
    factor: (d) => {
      const { length1, width1, length2, width2 } = d;
      const least = length1 / width1 + length2 / width2;
      const step = stepOf(Math.min(width1, width2), Math.max(width1, width2));
      const firstIsNarrow = width1 <= width2;
      // The two halves of a centred step are edge steps of half the width, side by side.
      const parts = d.alignment === "centre" ? 2 : 1;
      const excess = stepSquares(step);
      const legs = () => [
        {
          modes: firstIsNarrow ? narrowModes(step) : wideModes(step),
          aspect: (parts * length1) / width1,
        },
        {
          modes: firstIsNarrow ? wideModes(step) : narrowModes(step),
          aspect: (parts * length2) / width2,
        },
      ];
      return longLegFactor({
        squares: least + excess / parts,
        shortest: parts * Math.min(length1 / width1, length2 / width2),
        change: () => ({ lowered: endingChange(legs(), excess) / parts }),
        least,
      });
    },
    peak: ({ length1, length2, width1, width2 }) =>
      width1 === width2
        ? { fieldPerVolt: 1 / (length1 + length2), position: "everywhere in the strip" }
        : { fieldPerVolt: null, position: "unbounded at the re-entrant corner of the step" },
    secondRoute: ({ length1, width1, length2, width2, alignment }) => {
      const alpha = Math.min(width1, width2) / Math.max(width1, width2);
      if (alpha > 0.999 || alpha < 1e-6) return null;
      const square = alpha * alpha;
      const excess =
        (((square + 1) / alpha) * Math.log((1 + alpha) / (1 - alpha)) -
          2 * Math.log((4 * alpha) / (1 - square))) /
        Math.PI;
      const parts = alignment === "centre" ? 2 : 1;
      return { value: length1 / width1 + length2 / width2 + excess / parts, tolerance: 1e-10 };
    },
  },
  formula:
    "\\frac{R}{R_\\square} = \\frac{L_1}{w_1}+\\frac{L_2}{w_2}+\\frac{1}{m\\pi}\\left[\\frac{(1-\\alpha)^2}{\\alpha}\\ln\\frac{1+\\alpha}{1-\\alpha}+2\\ln\\!\\left(1+\\frac{(1-\\alpha)^2}{4\\alpha}\\right)\\right],\\quad \\alpha=\\frac{w_{\\min}}{w_{\\max}},\\; m=1\\text{ (edge)},\\,2\\text{ (centre)}",
  boundsBasis: "formula-accuracy",
  validity: [
    FIELD_TAKES_OVER,
    "Exact for parts that are long against their width; the true value lies below by at most the stated bound.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The sheet is thin and uniform; each end is at one potential; the corners are sharp."],
  sources: [
    {
      title: "P. M. Hall, Resistance calculations for thin film patterns, Thin Solid Films 1 (1968) 277",
      detail: "abrupt change of width",
      provenance: "from memory",
    },
    {
      title: "Schwarz–Christoffel map of the step",
      detail: "modes of both parts and the bound for short ones",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length1: "150 um", width1: "20 um", length2: "200 um", width2: "80 um", alignment: "edge" },
    medium: { sheetResistance: "25 ohm/sq" },
  },
  drawing: drawStep,
});

function drawStep({ length1, width1, length2, width2, alignment }: Strips): Drawing {
  const [half1, half2] = [width1 / 2, width2 / 2];
  // Lower edges: at 0 for both where one edge is straight, symmetric about the centre line otherwise.
  const [bottom1, bottom2] = alignment === "edge" ? [0, 0] : [-half1, -half2];
  const [top1, top2] = [bottom1 + width1, bottom2 + width2];
  const right = length1 + length2;
  return {
    views: [
      {
        title: "plan",
        conductor: [
          outline(
            [0, bottom1],
            [length1, bottom1],
            [length1, bottom2],
            [right, bottom2],
            [right, top2],
            [length1, top2],
            [length1, top1],
            [0, top1],
          ),
        ],
        high: [edge([0, bottom1], [0, top1])],
        low: [edge([right, bottom2], [right, top2])],
        flow: [
          along(0.25 * length1, 0.65 * length1, (bottom1 + top1) / 2),
          along(length1 + 0.35 * length2, length1 + 0.75 * length2, (bottom2 + top2) / 2),
        ],
        dimensions: [
          { name: "length1", from: [length1, bottom1], to: [0, bottom1], kind: "linear", offset: 1 },
          { name: "length2", from: [right, bottom2], to: [length1, bottom2], kind: "linear", offset: 1 },
          { name: "width1", from: [0, bottom1], to: [0, top1], kind: "linear", offset: 1 },
          { name: "width2", from: [right, top2], to: [right, bottom2], kind: "linear", offset: 1 },
        ],
      },
    ],
    description: `A strip of sheet that changes its width abruptly ${alignment === "edge" ? "on one side" : "on both sides"}, in plan; the current runs along it from one end to the other.`,
  };
}
