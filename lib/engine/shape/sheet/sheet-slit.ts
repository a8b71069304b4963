import { AMPACITY_CAUTION } from "../caution";
import type { FactorPeak } from "../define-shape";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing, Point } from "../drawing";
import { rectangle } from "../drawing";
import { exactFactor } from "../exact-factor";
import {
  endTerminalByLongNome,
  endTerminalByShortNome,
  endTerminalSquares,
  type EndTerminal,
} from "./end-terminal-law";
import { along, edge } from "./sheet-drawing";

interface Strip {
  readonly length: number;
  readonly width: number;
  readonly opening: number;
  readonly kind: string;
}

/**
 * By symmetry the uncut width at mid-length is an equipotential: each half of the strip is a sheet with a partial end
 * terminal. A slit from one edge takes the half as it is; the other kinds are two such sheets of half the width.
 */
function halfSheet({ length, width, opening, kind }: Strip): { sheet: EndTerminal; factor: number } {
  const parts = kind === "edge" ? 1 : 2;
  return {
    sheet: { length: length / 2, width: width / parts, terminal: opening / parts },
    factor: 2 / parts,
  };
}

/** A strip with a thin cut across part of its width: exact by the partial end terminal. */
export const sheetSlit = defineShape({
  id: "sheet-slit",
  title: "Strip with a slit",
  family: "sheet",
  summary:
    "A strip of thin sheet with a thin insulating cut across it at mid-length, such as a laser trim: from one edge, inside, or from both edges; the current runs along the strip through what is left.",
  dimensions: {
    length: lengthDimension("Length", "L", "Distance between the two ends of the strip."),
    width: lengthDimension("Width", "W", "Width of the strip."),
    opening: lengthDimension(
      "Opening",
      "d",
      "Total width that is left uncut at the slit; at most that of the strip.",
    ),
    kind: {
      type: "choice",
      label: "Kind",
      symbol: "m",
      choices: [
        { value: "edge", label: "one slit from one edge" },
        { value: "centre", label: "one internal slit in the middle" },
        { value: "iris", label: "two equal slits from both edges" },
      ],
      help: "centre leaves half of the opening at each edge, iris all of it in the middle; both have the same resistance.",
    },
  },
  constraints: [
    {
      names: ["opening", "width"],
      text: "opening at most the width of the strip",
      holds: ({ opening, width }) => opening <= width,
    },
  ],
  coordinates: [],
  terminals: { high: "one whole end", low: "the other whole end" },
  answer: {
    kind: "factor",
    factor: (d) => {
      const { sheet, factor } = halfSheet(d);
      return exactFactor(factor * endTerminalSquares(sheet));
    },
    peak: ({ length, width, opening, kind }): FactorPeak =>
      opening < width
        ? {
            fieldPerVolt: null,
            position:
              kind === "edge" ? "unbounded at the tip of the slit" : "unbounded at the tips of the slits",
          }
        : { fieldPerVolt: 1 / length, position: "everywhere in the strip" },
    secondRoute: (d) => {
      const { sheet, factor } = halfSheet(d);
      const aspect = sheet.length / sheet.width;
      if (sheet.terminal >= sheet.width || aspect < 0.25 || aspect > 4) return null;
      const other = aspect >= 1 ? endTerminalByShortNome : endTerminalByLongNome;
      return { value: factor * other(sheet), tolerance: 1e-11 };
    },
  },
  formula:
    "R = 2\\,R_{\\mathrm{end}}\\!\\left(\\tfrac L2, W, d\\right)\\;\\text{(edge)},\\qquad R_{\\mathrm{end}}\\!\\left(\\tfrac L2,\\tfrac W2,\\tfrac d2\\right)\\;\\text{(centre, iris)};\\qquad L\\to\\infty:\\;\\frac{R}{R_\\square}=\\frac LW-\\frac{4}{m\\pi}\\ln\\sin\\frac{\\pi d}{2W},\\; m=1,\\,2",
  boundsBasis: "rounding",
  validity: [
    "Exact for a slit of no width at mid-length; a cut of finite width adds about its width over the opening.",
    "R_end is the law of the sheet with a partial end terminal.",
  ],
  cautions: [
    AMPACITY_CAUTION,
    "The current density at the tip of a slit is high; trimmed resistors drift and fail there first.",
  ],
  assumptions: [
    "The sheet is thin and uniform; each end is at one potential; the slit insulates and has no width.",
  ],
  sources: [
    {
      title: "Conformal map of a rectangle by elliptic functions",
      detail: "half the strip is a sheet with a partial end terminal",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "1.6 mm", width: "0.8 mm", opening: "0.35 mm", kind: "edge" },
    medium: { sheetResistance: "1 kohm/sq" },
  },
  drawing: drawSlit,
});

function drawSlit({ length, width, opening, kind }: Strip): Drawing {
  const middle = length / 2;
  const cut = width - opening;
  const at = (y1: number, y2: number): readonly [Point, Point] => [
    [middle, y1],
    [middle, y2],
  ];
  const slits =
    kind === "edge"
      ? [at(opening, width)]
      : kind === "centre"
        ? [at(opening / 2, width - opening / 2)]
        : [at(0, cut / 2), at(width - cut / 2, width)];
  const open =
    kind === "edge" ? at(0, opening) : kind === "centre" ? at(0, opening / 2) : at(cut / 2, width - cut / 2);
  const through = (open[0][1] + open[1][1]) / 2;
  return {
    views: [
      {
        title: "plan",
        conductor: [rectangle(0, 0, length, width)],
        lines: slits.map(([from, to]) => ({ ...edge(from, to), style: "thin" as const })),
        high: [edge([0, 0], [0, width])],
        low: [edge([length, 0], [length, width])],
        flow: [
          along(0.08 * length, 0.28 * length, width / 2),
          along(0.42 * length, 0.58 * length, through),
          along(0.72 * length, 0.92 * length, width / 2),
        ],
        dimensions: [
          { name: "length", from: [length, 0], to: [0, 0], kind: "linear", offset: 1 },
          { name: "width", from: [length, width], to: [length, 0], kind: "linear", offset: 1 },
          // An internal slit leaves the opening in two halves; the picture shows it beside the slit.
          kind === "centre"
            ? { name: "opening", from: slits[0][1], to: [middle, width], kind: "leader" }
            : { name: "opening", from: open[0], to: open[1], kind: "linear", offset: 1 },
        ],
      },
    ],
    description: `A strip of sheet in plan with a thin cut across it at mid-length, ${kind === "edge" ? "from one edge" : kind === "centre" ? "inside the strip" : "from both edges"}; the current runs along the strip and crowds through the uncut width.`,
  };
}
