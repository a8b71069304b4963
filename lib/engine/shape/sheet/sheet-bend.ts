import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { cornerModes, cornerSquares } from "./corner-law";
import { endingChange } from "./leg-modes";
import { FIELD_TAKES_OVER, longLegFactor } from "./long-leg-factor";
import { along, edge, outline, upwards } from "./sheet-drawing";

interface Bend {
  readonly legLength1: number;
  readonly legLength2: number;
  readonly width1: number;
  readonly width2: number;
}

/** A right-angle bend of two strips: the legs' squares and the corner's, by conformal mapping. */
export const sheetBend = defineShape({
  id: "sheet-bend",
  title: "Right-angle bend",
  family: "sheet",
  summary:
    "Two strips of a thin sheet that meet at a right angle with a full corner; the current enters across the end of one leg and leaves across the end of the other.",
  dimensions: {
    legLength1: lengthDimension(
      "First leg",
      "L₁",
      "Length of the first leg from the inner corner, corner excluded.",
    ),
    legLength2: lengthDimension(
      "Second leg",
      "L₂",
      "Length of the second leg from the inner corner, corner excluded.",
    ),
    width1: lengthDimension("First width", "w₁", "Width of the first leg."),
    width2: lengthDimension("Second width", "w₂", "Width of the second leg."),
  },
  coordinates: [],
  terminals: { high: "the end of the first leg", low: "the end of the second leg" },
  answer: {
    kind: "factor",
    planIsWhole: () => true,
    factor: ({ legLength1, legLength2, width1, width2 }) => {
      const corner = cornerSquares(width1, width2);
      const least = legLength1 / width1 + legLength2 / width2;
      const legs = () => [
        { modes: cornerModes(width1 / width2), aspect: legLength1 / width1 },
        { modes: cornerModes(width2 / width1), aspect: legLength2 / width2 },
      ];
      return longLegFactor({
        squares: least + corner,
        shortest: Math.min(legLength1 / width1, legLength2 / width2),
        change: () => ({ lowered: endingChange(legs(), corner) }),
        least,
      });
    },
    peak: () => ({ fieldPerVolt: null, position: "unbounded at the inner corner" }),
    secondRoute: ({ legLength1, legLength2, width1, width2 }) => {
      // P. M. Hall's form of the corner, for widths whose difference leaves it enough digits.
      const a = width1 / width2;
      if (a < 1e-3 || a > 1e3) return null;
      const square = a * a;
      const corner =
        1 / a -
        (2 / Math.PI) * Math.log((4 * a) / (square + 1)) +
        ((square - 1) / (Math.PI * a)) * Math.acos((square - 1) / (square + 1));
      return { value: legLength1 / width1 + legLength2 / width2 + corner, tolerance: 1e-10 };
    },
  },
  formula:
    "\\frac{R}{R_\\square} = \\frac{L_1}{w_1}+\\frac{L_2}{w_2}+\\frac1\\pi\\left[2r\\arctan\\frac1r+\\frac2r\\arctan r-\\ln\\frac{16r^2}{(1+r^2)^2}\\right],\\qquad r=\\frac{w_1}{w_2}",
  boundsBasis: "formula-accuracy",
  validity: [
    FIELD_TAKES_OVER,
    "Exact for legs that are long against their width; the true value lies below by at most the stated bound, about 0.055·exp(−2πL/w) squares for each leg of an equal bend.",
    "The corner counts 1 − (2/π)·ln 2 = 0.5587 squares for equal widths.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: [
    "The sheet is thin and uniform; the end of each leg is at one potential; the corners are sharp.",
  ],
  sources: [
    {
      title: "P. M. Hall, Resistance calculations for thin film patterns, Thin Solid Films 1 (1968) 277",
      detail: "corner of two strips",
      provenance: "from memory",
    },
    {
      title: "Schwarz–Christoffel map of the bend",
      detail: "modes of the legs and the bound for short ones",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { legLength1: "300 um", legLength2: "200 um", width1: "40 um", width2: "60 um" },
    medium: { sheetResistance: "50 ohm/sq" },
  },
  drawing: drawBend,
});

function drawBend({ legLength1, legLength2, width1, width2 }: Bend): Drawing {
  const [right, top] = [width2 + legLength1, width1 + legLength2];
  return {
    views: [
      {
        title: "plan",
        conductor: [outline([0, 0], [right, 0], [right, width1], [width2, width1], [width2, top], [0, top])],
        high: [edge([right, 0], [right, width1])],
        low: [edge([0, top], [width2, top])],
        flow: [
          along(width2 + 0.75 * legLength1, width2 + 0.35 * legLength1, width1 / 2),
          upwards(width1 + 0.35 * legLength2, width1 + 0.75 * legLength2, width2 / 2),
        ],
        dimensions: [
          { name: "legLength1", from: [width2, width1], to: [right, width1], kind: "linear", offset: 1 },
          { name: "legLength2", from: [width2, top], to: [width2, width1], kind: "linear", offset: 1 },
          { name: "width1", from: [right, width1], to: [right, 0], kind: "linear", offset: 1 },
          { name: "width2", from: [0, top], to: [width2, top], kind: "linear", offset: 1 },
        ],
      },
    ],
    description:
      "A strip of sheet that turns a right angle, in plan; the current runs in along one leg, round the inner corner and out along the other.",
  };
}
