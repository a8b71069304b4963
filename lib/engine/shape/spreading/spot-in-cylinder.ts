import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension, sidesDimension } from "../dimension";
import { segment } from "./circle-views";
import { drawSpot } from "./spot-drawing";
import { SPOT_ACCURACY, spotConstriction, spotConstrictionByPolynomial } from "./spot-in-cylinder-law";

/** Constriction at a round spot between two equal round bars: the excess over the bars' own resistance. */
export const spotInCylinder = defineShape({
  id: "spot-in-cylinder",
  title: "Contact spot in a cylinder",
  family: "spreading",
  summary:
    "A round spot in the middle of the end faces through which two equal round bars touch; the resistance is what the narrowing to the spot adds to the bars' own.",
  dimensions: {
    spotDiameter: lengthDimension(
      "Spot diameter",
      "d",
      "Diameter of the conducting spot; less than that of the bar.",
      {
        radius: "spotRadius",
      },
    ),
    cylinderDiameter: lengthDimension("Bar diameter", "D", "Diameter of the round bar.", {
      radius: "cylinderRadius",
    }),
    sides: sidesDimension("2: bars on both sides of the spot; 1: an electrode on the end of one bar."),
  },
  constraints: [
    {
      names: ["spotDiameter", "cylinderDiameter"],
      text: "spot diameter less than the bar diameter",
      holds: ({ spotDiameter, cylinderDiameter }) => spotDiameter < cylinderDiameter,
    },
  ],
  coordinates: [],
  terminals: {
    high: "one bar, far from the spot (with one side: the spot itself)",
    low: "the other bar, far from the spot",
  },
  answer: {
    kind: "factor",
    factor: (d) => ({
      value: (d.sides / 2 / d.spotDiameter) * spotConstriction(d),
      relativeError: SPOT_ACCURACY,
      boundsBasis: "formula-accuracy",
      proved: false,
      method: "closed-form",
      accuracy:
        "The expansions of ψ agree with solutions of the exact integral equation within a relative 2e-15; the bounds state 1e-13.",
    }),
    peak: () => ({ fieldPerVolt: null, position: "unbounded along the rim of the spot" }),
    secondRoute: (d) => {
      const ratio = d.spotDiameter / d.cylinderDiameter;
      if (ratio < 0.0005 || ratio > 0.994) return null;
      return { value: (d.sides / 2 / d.spotDiameter) * spotConstrictionByPolynomial(ratio), tolerance: 5e-9 };
    },
  },
  formula:
    "R = \\frac{n\\,\\rho}{4a}\\,\\psi(\\varepsilon),\\qquad \\psi = 1-1.40925\\,\\varepsilon+0.33818\\,\\varepsilon^3+\\dots,\\quad \\varepsilon=\\frac dD,\\; a=\\frac d2,\\; n=\\text{sides}",
  boundsBasis: "formula-accuracy",
  validity: [
    "Exact for bars that are long against their diameter: the excess over ρL/(πD²/4) of the bars, which is to be added.",
    "Tends to the spot between half-spaces for a small spot, and to nothing as the spot fills the end face.",
  ],
  cautions: [
    AMPACITY_CAUTION,
    "A real contact has many small spots and films between them; this is one clean spot of known size.",
  ],
  assumptions: [
    "The end faces outside the spot and the sides of the bars are insulated; there is no film resistance in the spot.",
    "The spot is at one potential.",
  ],
  sources: [
    {
      title: "Fredholm equation of the dual Dini series, solved to 33 digits",
      detail: "Chebyshev and logarithmic expansions of ψ",
      provenance: "derived here",
    },
    {
      title: "A. M. Rosenfeld and R. S. Timsit, Quarterly of Applied Mathematics 39 (1981) 405",
      detail: "polynomial for ψ, good to 4e-4 up to ε = 0.5: a comparison",
      provenance: "from memory",
    },
    {
      title: "R. Holm, Electric Contacts",
      detail: "Roess's series: a comparison",
      provenance: "from memory",
    },
  ],
  example: {
    dimensions: { spotDiameter: "1.2 mm", cylinderDiameter: "8 mm", sides: 2 },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ spotDiameter, cylinderDiameter, sides }) => {
    const [a, b] = [spotDiameter / 2, cylinderDiameter / 2];
    const { views, description } = drawSpot(
      { halfWidth: a, halfHeight: a, reach: b, sides, bounded: true },
      [
        { name: "spotDiameter", from: [-a, 0], to: [a, 0], kind: "linear", offset: 1 },
        { name: "cylinderDiameter", from: [-b, -1.3 * b], to: [b, -1.3 * b], kind: "linear", offset: -1 },
      ],
      [{ name: "spotDiameter", from: [-a, 0], to: [a, 0], kind: "linear", offset: 0 }],
      "Two round bars whose end faces touch in a round spot, in section and plan; the current narrows towards the spot and spreads beyond it.",
    );
    const [section, plan] = views;
    return {
      views: [
        section,
        { ...plan, lines: [...(plan.lines ?? []), { ...segment([0, -b], [0, b]), style: "axis" }] },
      ],
      description,
    };
  },
});
