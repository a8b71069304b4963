import { acosh1p } from "../../numeric/acosh1p";
import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { circle, rectangle } from "../drawing";
import { exactFactor } from "../exact-factor";
import { narrowestField } from "./bipolar";
import { radialArrows, segment } from "./circle-views";
import { squareDuctCollocation, squareDuctSpan, type SquareDuct } from "./square-duct";

/** A round cylinder centred in a square duct: converged multipole series. */
export const cylinderInSquare = defineShape({
  id: "cylinder-in-square",
  title: "Cylinder in a square duct",
  family: "spreading",
  summary:
    "A round cylinder in the middle of a square duct, such as a conductor cast in a square block; the current runs from the cylinder to the four sides.",
  dimensions: {
    diameter: lengthDimension("Diameter", "d", "Diameter of the cylinder; less than the side.", {
      radius: "radius",
    }),
    side: lengthDimension("Side", "w", "Inside width of the square duct."),
    length: lengthDimension("Length", "L", "Length along the axis."),
  },
  constraints: [
    {
      names: ["diameter", "side"],
      text: "diameter less than the side",
      holds: ({ diameter, side }) => diameter < side,
    },
  ],
  coordinates: [],
  terminals: { high: "the cylinder", low: "the four sides of the duct" },
  answer: {
    kind: "factor",
    factor: (d) => exactFactor(squareDuctSpan(d) / (2 * Math.PI) / d.length),
    peak: (d) => ({
      fieldPerVolt: nearestField(d),
      position: "on the cylinder, at the four points nearest to a side",
    }),
    secondRoute: (d) => {
      const delta = d.diameter / d.side;
      if (delta > 0.8) return null;
      return { value: squareDuctCollocation(delta).span / (2 * Math.PI) / d.length, tolerance: 1e-9 };
    },
  },
  formula:
    "R = \\frac{\\rho}{2\\pi L}\\left[\\ln\\frac{1.0787\\,w}{d}-0.021819\\,\\delta^8-0.011135\\,\\delta^{16}-\\dots\\right],\\qquad \\delta=\\frac dw",
  boundsBasis: "rounding",
  validity: [
    "Exact for a long duct; the series is summed to rounding, and near touching replaced by the flow in the four gaps.",
  ],
  cautions: [INSULATION_CAUTION],
  assumptions: [
    "Cylinder and duct are each at one potential; the medium between them is uniform; no end effects.",
  ],
  sources: [
    {
      title: "Incropera, DeWitt et al., Fundamentals of Heat and Mass Transfer, Table 4.1",
      detail: "circular cylinder in a square solid, S = 2πL/ln(1.08w/D): the first term",
      provenance: "from memory",
    },
    {
      title: "Rayleigh's multipole method on a lattice of alternating cylinders",
      detail: "coefficients recomputed with 45 digits",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { diameter: "8 mm", side: "20 mm", length: "500 mm" },
    medium: { resistivity: "2e11 ohm m" },
  },
  drawing: drawDuct,
});

/** Field on the cylinder where a side is nearest, at one volt, 1/m. */
function nearestField(d: SquareDuct): number {
  const delta = d.diameter / d.side;
  if (delta <= 0.9) return squareDuctCollocation(delta).fieldTimesRadius / (d.diameter / 2);
  // In the narrow gap the field is that of a cylinder and a plane, to exp(−π²/μ).
  const x = (d.side - d.diameter) / d.diameter;
  return narrowestField(d.diameter / 2, acosh1p(x), (x + 2) / x);
}

function drawDuct({ diameter, side, length }: SquareDuct & { readonly length: number }): Drawing {
  const [a, w] = [diameter / 2, side / 2];
  return {
    views: [
      {
        title: "end view",
        conductor: [rectangle(-w, -w, side, side), circle([0, 0], a)],
        lines: [
          { ...segment([-1.1 * w, 0], [1.1 * w, 0]), style: "axis" },
          { ...segment([0, -1.1 * w], [0, 1.1 * w]), style: "axis" },
        ],
        high: [circle([0, 0], a)],
        low: [rectangle(-w, -w, side, side)],
        flow: radialArrows(
          [0, 0],
          a + 0.15 * (w - a),
          a + 0.85 * (w - a),
          [0.25, 0.75, 1.25, 1.75].map((turn) => turn * Math.PI),
        ),
        dimensions: [
          { name: "diameter", from: [-a, 0], to: [a, 0], kind: "linear", offset: 0 },
          { name: "side", from: [-w, -w], to: [w, -w], kind: "linear", offset: -1 },
        ],
      },
      {
        title: "section along the axis",
        conductor: [rectangle(0, a, length, w - a), rectangle(0, -w, length, w - a)],
        high: [segment([0, a], [length, a]), segment([0, -a], [length, -a])],
        low: [segment([0, w], [length, w]), segment([0, -w], [length, -w])],
        flow: [{ from: [length / 2, a + 0.2 * (w - a)], to: [length / 2, a + 0.8 * (w - a)] }],
        dimensions: [{ name: "length", from: [0, w], to: [length, w], kind: "linear", offset: 1 }],
      },
    ],
    description:
      "A round cylinder in the middle of a square duct, in end view and along the axis; the current runs from the cylinder to the four sides.",
  };
}
