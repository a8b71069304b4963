import { agm } from "../../numeric/agm";
import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { angleDimension, lengthDimension } from "../dimension";
import type { Drawing, Point } from "../drawing";
import { arc, circle } from "../drawing";
import { exactFactor } from "../exact-factor";

interface Disc {
  readonly diameter: number;
  readonly terminalAngle1: number;
  readonly terminalAngle2: number;
}

/**
 * K(κ')/K(κ) with κ' = cos((t₁+t₂)/4)/cos((t₁−t₂)/4), κ = √(sin(t₁/2)·sin(t₂/2))/cos((t₁−t₂)/4); the cosine of a
 * quarter of nearly the whole circle is the sine of what is left of it.
 */
function discSquares({ terminalAngle1: t1, terminalAngle2: t2 }: Disc): number {
  const between = Math.cos((t1 - t2) / 4);
  // 2π is not a double; its rounding error is added back where the arcs leave almost nothing free.
  const free = 2 * Math.PI - t1 - t2 + 2.4492935982947064e-16;
  const complement = t1 + t2 > Math.PI ? Math.sin(free / 4) : Math.cos((t1 + t2) / 4);
  const kappa = Math.sqrt(Math.sin(t1 / 2)) * (Math.sqrt(Math.sin(t2 / 2)) / between);
  return agm(1, complement / between) / agm(1, kappa);
}

/** A round sheet with two opposite arcs of its rim as terminals: exact by elliptic integrals. */
export const sheetDisc = defineShape({
  id: "sheet-disc",
  title: "Round sheet with rim terminals",
  family: "sheet",
  summary:
    "A round thin sheet with two terminals along its rim, centred opposite each other; the current runs across the disc from one arc to the other.",
  dimensions: {
    diameter: lengthDimension(
      "Diameter",
      "d",
      "Diameter of the disc; the resistance does not depend on it.",
      {
        radius: "radius",
      },
    ),
    terminalAngle1: angleDimension(
      "First terminal",
      "t₁",
      "Angle at the centre that the first terminal spans.",
      {
        max: 2 * Math.PI,
      },
    ),
    terminalAngle2: angleDimension(
      "Second terminal",
      "t₂",
      "Angle at the centre that the second terminal spans.",
      {
        max: 2 * Math.PI,
      },
    ),
  },
  constraints: [
    {
      names: ["terminalAngle1", "terminalAngle2"],
      text: "the two terminal angles together less than 360°",
      holds: ({ terminalAngle1, terminalAngle2 }) => 2 * Math.PI - terminalAngle1 - terminalAngle2 > 0,
    },
  ],
  coordinates: [],
  terminals: { high: "the first arc of the rim", low: "the opposite arc" },
  answer: {
    kind: "factor",
    factor: (d) => exactFactor(discSquares(d)),
    peak: () => ({ fieldPerVolt: null, position: "unbounded at the ends of both arcs" }),
    secondRoute: ({ terminalAngle1, terminalAngle2 }) => {
      // The half plane by the tangent of half the angle, then the elliptic sine: K'(k)/2K(k), k = tan(t₁/4)·tan(t₂/4).
      const k = Math.tan(terminalAngle1 / 4) * Math.tan(terminalAngle2 / 4);
      // Near a full circle the tangent loses the digits of the angle.
      if (1 - k < 1e-3 || Math.max(terminalAngle1, terminalAngle2) > 2 * Math.PI - 1e-3) return null;
      return { value: agm(1, Math.sqrt((1 - k) * (1 + k))) / (2 * agm(1, k)), tolerance: 1e-11 };
    },
  },
  formula:
    "\\frac{R}{R_\\square}=\\frac{\\mathrm{agm}(1,\\kappa')}{\\mathrm{agm}(1,\\kappa)},\\qquad \\kappa'=\\frac{\\cos\\frac{t_1+t_2}{4}}{\\cos\\frac{t_1-t_2}{4}},\\quad \\kappa=\\frac{\\sqrt{\\sin\\frac{t_1}{2}\\sin\\frac{t_2}{2}}}{\\cos\\frac{t_1-t_2}{4}}",
  boundsBasis: "rounding",
  validity: [
    "Exact for a thin round sheet whose rim is insulated between the arcs.",
    "Two arcs of 90° make exactly one square, whatever the diameter.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The sheet is thin and uniform; each arc is at one potential."],
  sources: [
    {
      title: "Conformal map of the disc to a rectangle",
      detail: "complete elliptic integrals through the arithmetic–geometric mean",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { diameter: "25 mm", terminalAngle1: "40 deg", terminalAngle2: "40 deg" },
    medium: { sheetResistance: "12 ohm/sq" },
  },
  drawing: drawDisc,
});

function drawDisc({ diameter, terminalAngle1: t1, terminalAngle2: t2 }: Disc): Drawing {
  const r = diameter / 2;
  const at = (turn: number): Point => [r * Math.cos(turn), r * Math.sin(turn)];
  const [left, right] = [Math.PI, 0];
  return {
    views: [
      {
        title: "plan",
        conductor: [circle([0, 0], r)],
        high: [arc([0, 0], r, left - t1 / 2, left + t1 / 2)],
        low: [arc([0, 0], r, right - t2 / 2, right + t2 / 2)],
        flow: [-0.45, 0, 0.45].map((part) => ({ from: [-0.35 * r, part * r], to: [0.35 * r, part * r] })),
        dimensions: [
          { name: "diameter", from: [0, -r], to: [0, r], kind: "linear", offset: 0 },
          {
            name: "terminalAngle1",
            from: at(left - t1 / 2),
            to: at(left + t1 / 2),
            kind: "angle",
            center: [0, 0],
          },
          {
            name: "terminalAngle2",
            from: at(right - t2 / 2),
            to: at(right + t2 / 2),
            kind: "angle",
            center: [0, 0],
          },
        ],
      },
    ],
    description:
      "A round sheet in plan with terminals along two opposite arcs of its rim; the current runs across the disc from one to the other.",
  };
}
