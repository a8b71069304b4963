import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension, sidesDimension } from "../dimension";
import { exactFactor } from "../exact-factor";
import { drawSpot } from "./spot-drawing";

/** Constriction at a round spot between half-spaces: Holm's ρ/(4a) a side, exact. */
export const contactSpot = defineShape({
  id: "contact-spot",
  title: "Round contact spot",
  family: "spreading",
  summary:
    "A round spot through which two large bodies touch, or a round electrode on one; the current narrows to the spot and spreads again.",
  dimensions: {
    spotDiameter: lengthDimension("Spot diameter", "d", "Diameter of the conducting spot.", {
      radius: "spotRadius",
    }),
    sides: sidesDimension("2: bodies on both sides of the spot; 1: an electrode on one body."),
  },
  coordinates: [],
  terminals: {
    high: "one body, far from the spot (with one side: the spot itself)",
    low: "the other body, far from the spot",
  },
  answer: {
    kind: "factor",
    factor: ({ spotDiameter, sides }) => exactFactor(sides / 2 / spotDiameter),
    peak: () => ({ fieldPerVolt: null, position: "unbounded along the rim of the spot" }),
  },
  formula: "R = \\frac{n\\,\\rho}{4a},\\qquad a=\\frac d2,\\; n=\\text{sides}",
  boundsBasis: "rounding",
  validity: [
    "Exact for a spot that is small against the bodies; in a cylinder of comparable diameter use the spot in a cylinder.",
    "Bodies of unlike material: add one side of each.",
  ],
  cautions: [
    AMPACITY_CAUTION,
    "A real contact has many small spots and films between them; this is one clean spot of known size.",
  ],
  assumptions: ["The faces outside the spot are insulated; there is no film resistance in the spot."],
  sources: [
    {
      title: "R. Holm, Electric Contacts",
      detail: "constriction resistance ρ/(4a) a side",
      provenance: "from memory",
    },
    {
      title: "Incropera, DeWitt et al., Fundamentals of Heat and Mass Transfer, Table 4.1",
      detail: "disc on a semi-infinite medium, S = 2D",
      provenance: "source at hand",
    },
  ],
  example: {
    dimensions: { spotDiameter: "0.2 mm", sides: 2 },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ spotDiameter, sides }) => {
    const a = spotDiameter / 2;
    return drawSpot(
      { halfWidth: a, halfHeight: a, reach: 4 * a, sides, bounded: false },
      [{ name: "spotDiameter", from: [-a, 0], to: [a, 0], kind: "linear", offset: 1 }],
      [{ name: "spotDiameter", from: [-a, -a], to: [a, -a], kind: "linear", offset: -1 }],
      "Two bodies that touch in a small round spot, in section and plan; the current narrows towards the spot and spreads beyond it.",
    );
  },
});
