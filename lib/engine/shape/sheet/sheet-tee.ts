import { AMPACITY_CAUTION } from "../caution";
import type { Factor } from "../define-shape";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { cornerSquares } from "./corner-law";
import { endingChange } from "./leg-modes";
import { FIELD_TAKES_OVER, longLegFactor } from "./long-leg-factor";
import { along, edge, outline, upwards } from "./sheet-drawing";
import { teeModes, teeOf } from "./tee-law";

interface Junction {
  readonly barWidth: number;
  readonly stubWidth: number;
  readonly leftLength: number;
  readonly rightLength: number;
  readonly stubLength: number;
}

/** A T junction of two strips: current through the bar, from one arm into the stub, or from both arms. */
export const sheetTee = defineShape({
  id: "sheet-tee",
  title: "T junction",
  family: "sheet",
  summary:
    "A straight bar of thin sheet with a stub at a right angle; the current runs through the bar, from its left arm into the stub, or from both arms together into the stub.",
  dimensions: {
    barWidth: lengthDimension("Bar width", "a", "Width of the bar that runs straight through."),
    stubWidth: lengthDimension("Stub width", "b", "Width of the stub."),
    leftLength: lengthDimension(
      "Left arm",
      "L₁",
      "Length of the bar's left arm, from the inner corner to its end.",
    ),
    rightLength: lengthDimension(
      "Right arm",
      "L₂",
      "Length of the bar's right arm, from the inner corner to its end.",
    ),
    stubLength: lengthDimension("Stub", "L₃", "Length of the stub, from the inner corners to its end."),
    path: {
      type: "choice",
      label: "Path",
      symbol: "p",
      choices: [
        { value: "through", label: "from the left arm to the right arm, the stub floating" },
        { value: "branch", label: "from the left arm into the stub, the right arm floating" },
        { value: "both", label: "from both arms, joined, into the stub" },
      ],
      help: "Which ends are terminals; the end of a floating arm is an insulated edge.",
    },
  },
  coordinates: [],
  terminals: {
    high: "the end of the left arm (path both: the ends of both arms)",
    low: "the end of the right arm (path through) or of the stub",
  },
  answer: {
    kind: "factor",
    work: 10,
    planIsWhole: () => true,
    factor: (d) => laws[d.path](d),
    peak: () => ({ fieldPerVolt: null, position: "unbounded at the inner corners" }),
  },
  formula:
    "\\frac{R}{R_\\square}=\\frac{L_1}{a}+\\frac{L_2}{a}+T\\;\\text{(through)},\\quad \\frac{L_1}{a}+\\frac{L_3}{b}+B\\;\\text{(branch)},\\qquad T=\\tfrac2\\pi\\!\\left[\\ln\\!\\left(1+\\tfrac1{q^2}\\right)+\\tfrac2q\\arctan q\\right],\\; B=\\tfrac1\\pi\\!\\left[\\tfrac2q\\arctan q+q\\arctan\\tfrac1q+\\tfrac32\\ln(1+q^2)-2\\ln 2q\\right],\\; q=\\tfrac{2a}{b}",
  boundsBasis: "formula-accuracy",
  validity: [
    FIELD_TAKES_OVER,
    "Exact for arms that are long against their width; the true value lies within the stated bounds.",
    "Short terminal arms lower the resistance, a short floating arm raises it.",
    "Path both: the exact star of T/2 for each arm and B − T/2 for the stub.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The sheet is thin and uniform; each terminal is at one potential; the corners are sharp."],
  sources: [
    {
      title: "Schwarz–Christoffel map of the T junction",
      detail: "squares of the junction, modes of its arms and the bounds for short ones",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: {
      barWidth: "40 um",
      stubWidth: "30 um",
      leftLength: "120 um",
      rightLength: "120 um",
      stubLength: "90 um",
      path: "branch",
    },
    medium: { sheetResistance: "50 ohm/sq" },
  },
  drawing: drawTee,
});

const laws: Readonly<Record<"through" | "branch" | "both", (d: Junction) => Factor>> = {
  through: ({ barWidth, stubWidth, leftLength, rightLength, stubLength }) => {
    const tee = teeOf(barWidth, stubWidth);
    const { through } = tee;
    const [l1, l2, l3] = [leftLength / barWidth, rightLength / barWidth, stubLength / stubWidth];
    return longLegFactor({
      squares: l1 + l2 + through,
      shortest: Math.min(l1, l2, l3),
      change: () => {
        const { left, stub } = teeModes(tee);
        const arms = [l1, l2].map((aspect) => ({ modes: left.through, aspect }));
        const floating = [{ modes: stub.through, aspect: l3 }];
        return {
          lowered: endingChange(arms, through, floating),
          raised: endingChange(floating, through, arms),
        };
      },
      least: l1 + l2,
      // A wall across the mouth of the stub leaves the plain bar.
      most: l1 + l2 + stubWidth / barWidth,
    });
  },
  branch: ({ barWidth, stubWidth, leftLength, rightLength, stubLength }) => {
    const tee = teeOf(barWidth, stubWidth);
    const { branch } = tee;
    const [l1, l2, l3] = [leftLength / barWidth, rightLength / barWidth, stubLength / stubWidth];
    return longLegFactor({
      squares: l1 + l3 + branch,
      shortest: Math.min(l1, l2, l3),
      change: () => {
        const { left, stub } = teeModes(tee);
        const arms = [
          { modes: left.fromLeft, aspect: l1 },
          { modes: stub.fromLeft, aspect: l3 },
        ];
        const floating = [{ modes: left.fromRight, aspect: l2 }];
        return {
          lowered: endingChange(arms, branch, floating),
          raised: endingChange(floating, branch, arms),
        };
      },
      least: l1 + l3,
      // A wall across the mouth of the right arm leaves a bend.
      most: l1 + l3 + cornerSquares(barWidth, stubWidth),
    });
  },
  both: ({ barWidth, stubWidth, leftLength, rightLength, stubLength }) => {
    const tee = teeOf(barWidth, stubWidth);
    const [l1, l2, l3] = [leftLength / barWidth, rightLength / barWidth, stubLength / stubWidth];
    const half = tee.through / 2;
    // The left arm's share of the current, and of the squares of both arms side by side.
    const share = (half + l2) / (2 * half + l1 + l2);
    const rest = 1 - share;
    return longLegFactor({
      squares: (half + l1) * share + (tee.branch - half) + l3,
      shortest: Math.min(l1, l2, l3),
      change: () => {
        const { left, stub } = teeModes(tee);
        const excess = share * share * half + rest * rest * half + tee.branch - half;
        const mixed = (own: readonly number[], other: readonly number[], part: number) =>
          own.map((mode, k) => part * mode + (1 - part) * other[k]);
        const arms = [
          { modes: mixed(left.fromLeft, left.fromRight, share), aspect: l1 },
          { modes: mixed(left.fromLeft, left.fromRight, rest), aspect: l2 },
          { modes: mixed(stub.fromLeft, stub.fromRight, share), aspect: l3 },
        ];
        return { lowered: endingChange(arms, excess) };
      },
      least: l3 + l1 * (l2 / (l1 + l2)),
    });
  },
};

function drawTee(d: Junction & { readonly path: string }): Drawing {
  const { barWidth: a, stubWidth: b, leftLength, rightLength, stubLength, path } = d;
  const [right, far, top] = [leftLength + b, leftLength + b + rightLength, a + stubLength];
  const ends = {
    left: edge([0, 0], [0, a]),
    right: edge([far, 0], [far, a]),
    stub: edge([leftLength, top], [right, top]),
  };
  return {
    views: [
      {
        title: "plan",
        conductor: [
          outline(
            [0, 0],
            [far, 0],
            [far, a],
            [right, a],
            [right, top],
            [leftLength, top],
            [leftLength, a],
            [0, a],
          ),
        ],
        high: path === "both" ? [ends.left, ends.right] : [ends.left],
        low: [path === "through" ? ends.right : ends.stub],
        flow: [
          along(0.25 * leftLength, 0.7 * leftLength, a / 2),
          ...(path === "through"
            ? [along(right + 0.3 * rightLength, right + 0.75 * rightLength, a / 2)]
            : []),
          ...(path === "both" ? [along(right + 0.75 * rightLength, right + 0.3 * rightLength, a / 2)] : []),
          ...(path === "through"
            ? []
            : [upwards(a + 0.3 * stubLength, a + 0.75 * stubLength, leftLength + b / 2)]),
        ],
        dimensions: [
          { name: "barWidth", from: [0, 0], to: [0, a], kind: "linear", offset: 1 },
          { name: "leftLength", from: [0, a], to: [leftLength, a], kind: "linear", offset: 1 },
          { name: "rightLength", from: [right, a], to: [far, a], kind: "linear", offset: 1 },
          { name: "stubLength", from: [right, top], to: [right, a], kind: "linear", offset: 1 },
          { name: "stubWidth", from: [leftLength, top], to: [right, top], kind: "linear", offset: 1 },
        ],
      },
    ],
    description: `A bar of sheet with a stub at a right angle, in plan; the current runs ${path === "through" ? "through the bar from left to right" : path === "branch" ? "from the left arm into the stub" : "from both arms into the stub"}.`,
  };
}
