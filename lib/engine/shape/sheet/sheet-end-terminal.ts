import { AMPACITY_CAUTION } from "../caution";
import type { FactorPeak } from "../define-shape";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { rectangle } from "../drawing";
import { exactFactor } from "../exact-factor";
import {
  endTerminalByLongNome,
  endTerminalByShortNome,
  endTerminalSquares,
  type EndTerminal,
} from "./end-terminal-law";
import { along, edge } from "./sheet-drawing";

interface Sheet {
  readonly length: number;
  readonly width: number;
  readonly terminalWidth: number;
  readonly position: string;
}

/** The sheet to which the law of an edge terminal applies, and how many of them lie side by side. */
function edgeSheet({ length, width, terminalWidth, position }: Sheet): { sheet: EndTerminal; parts: number } {
  const parts = position === "centre" ? 2 : 1;
  return { sheet: { length, width: width / parts, terminal: terminalWidth / parts }, parts };
}

/** A rectangular sheet with one whole end and one partial terminal: exact by elliptic integrals. */
export const sheetEndTerminal = defineShape({
  id: "sheet-end-terminal",
  title: "Sheet with a partial end terminal",
  family: "sheet",
  summary:
    "A rectangular sheet with one whole end as a terminal and the other end covered in part only, in its middle or from one edge on; the current crowds towards the partial terminal.",
  dimensions: {
    length: lengthDimension("Length", "L", "Distance between the two ends."),
    width: lengthDimension("Width", "W", "Width of the sheet."),
    terminalWidth: lengthDimension(
      "Terminal width",
      "c",
      "Width of the partial terminal; at most that of the sheet.",
    ),
    position: {
      type: "choice",
      label: "Position",
      symbol: "m",
      choices: [
        { value: "centre", label: "in the middle of the end" },
        { value: "edge", label: "from one edge of the sheet on" },
      ],
      help: "Where the partial terminal lies on its end.",
    },
  },
  constraints: [
    {
      names: ["terminalWidth", "width"],
      text: "terminal width at most the width of the sheet",
      holds: ({ terminalWidth, width }) => terminalWidth <= width,
    },
  ],
  coordinates: [],
  terminals: { high: "the partial terminal", low: "the whole opposite end" },
  answer: {
    kind: "factor",
    factor: (d) => {
      const { sheet, parts } = edgeSheet(d);
      return exactFactor(endTerminalSquares(sheet) / parts);
    },
    peak: ({ length, width, terminalWidth }): FactorPeak =>
      terminalWidth < width
        ? { fieldPerVolt: null, position: "unbounded where the partial terminal ends" }
        : { fieldPerVolt: 1 / length, position: "everywhere in the sheet" },
    secondRoute: (d) => {
      const { sheet, parts } = edgeSheet(d);
      const aspect = sheet.length / sheet.width;
      if (sheet.terminal >= sheet.width || aspect < 0.25 || aspect > 4) return null;
      const other = aspect >= 1 ? endTerminalByShortNome : endTerminalByLongNome;
      return { value: other(sheet) / parts, tolerance: 1e-11 };
    },
  },
  formula:
    "\\frac{R}{R_\\square}=\\frac{\\mathrm{agm}(1,\\kappa')}{\\mathrm{agm}(1,\\kappa)},\\quad \\kappa=\\frac{\\theta_2\\,\\theta_1(v)}{\\theta_3\\,\\theta_4(v)},\\;\\kappa'=\\frac{\\theta_4\\,\\theta_3(v)}{\\theta_3\\,\\theta_4(v)},\\; v=\\frac{\\pi c}{2W},\\; q=e^{-\\pi L/W}\\;\\text{(edge; centre: half of it with } W/2,\\,c/2)",
  boundsBasis: "rounding",
  validity: [
    "Exact for any length; a long sheet adds −(2/π)·ln sin(πc/2W) squares for an edge terminal, half of it for a centred one.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The sheet is thin and uniform; each terminal is at one potential."],
  sources: [
    {
      title: "Conformal map of a rectangle by elliptic functions",
      detail: "theta functions in both nomes, so that short and long sheets converge alike",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "1.3 mm", width: "1 mm", terminalWidth: "0.3 mm", position: "centre" },
    medium: { sheetResistance: "40 ohm/sq" },
  },
  drawing: drawSheet,
});

function drawSheet({ length, width, terminalWidth, position }: Sheet): Drawing {
  const bottom = position === "centre" ? (width - terminalWidth) / 2 : 0;
  const top = bottom + terminalWidth;
  const middle = (bottom + top) / 2;
  return {
    views: [
      {
        title: "plan",
        conductor: [rectangle(0, 0, length, width)],
        high: [edge([0, bottom], [0, top])],
        low: [edge([length, 0], [length, width])],
        flow: [
          along(0.08 * length, 0.28 * length, middle),
          along(0.6 * length, 0.9 * length, 0.3 * width),
          along(0.6 * length, 0.9 * length, 0.7 * width),
        ],
        dimensions: [
          { name: "length", from: [length, 0], to: [0, 0], kind: "linear", offset: 1 },
          { name: "width", from: [length, width], to: [length, 0], kind: "linear", offset: 1 },
          { name: "terminalWidth", from: [0, bottom], to: [0, top], kind: "linear", offset: 1 },
        ],
      },
    ],
    description: `A rectangular sheet in plan with a terminal over part of one end, ${position === "centre" ? "in its middle" : "from one edge on"}; the current spreads from it over the whole width to the opposite end.`,
  };
}
