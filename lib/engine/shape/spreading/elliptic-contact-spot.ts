import { agm } from "../../numeric/agm";
import { carlsonRF } from "../../numeric/carlson";
import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension, sidesDimension } from "../dimension";
import { exactFactor } from "../exact-factor";
import { drawSpot } from "./spot-drawing";

/** Constriction at an elliptic spot between half-spaces: K(k)/(2πa) a side, as 1/(4·agm(a, b)). */
export const ellipticContactSpot = defineShape({
  id: "elliptic-contact-spot",
  title: "Elliptic contact spot",
  family: "spreading",
  summary:
    "An elliptic spot through which two large bodies touch, such as crossed or grooved cylinders pressed together; the current narrows to the spot and spreads again.",
  dimensions: {
    majorDiameter: lengthDimension("Major diameter", "d₁", "Longer axis of the conducting ellipse.", {
      radius: "majorRadius",
    }),
    minorDiameter: lengthDimension("Minor diameter", "d₂", "Shorter axis; at most the longer one.", {
      radius: "minorRadius",
    }),
    sides: sidesDimension("2: bodies on both sides of the spot; 1: an electrode on one body."),
  },
  constraints: [
    {
      names: ["minorDiameter", "majorDiameter"],
      text: "minor diameter at most the major diameter",
      holds: ({ minorDiameter, majorDiameter }) => minorDiameter <= majorDiameter,
    },
  ],
  coordinates: [],
  terminals: {
    high: "one body, far from the spot (with one side: the spot itself)",
    low: "the other body, far from the spot",
  },
  answer: {
    kind: "factor",
    factor: ({ majorDiameter, minorDiameter, sides }) =>
      exactFactor(sides / 2 / agm(majorDiameter, minorDiameter)),
    peak: () => ({ fieldPerVolt: null, position: "unbounded along the rim of the spot" }),
    secondRoute: ({ majorDiameter, minorDiameter, sides }) => {
      const ratio = minorDiameter / majorDiameter;
      // K(k) = R_F(0, 1−k², 1), 1−k² = (b/a)².
      const value = ((sides / Math.PI) * carlsonRF(0, ratio * ratio, 1)) / majorDiameter;
      return ratio > 1e-150 ? { value, tolerance: 1e-12 } : null;
    },
  },
  formula:
    "R = \\frac{n\\,\\rho}{2\\pi a}\\,K\\!\\left(\\sqrt{1-b^2/a^2}\\right)=\\frac{n\\,\\rho}{4\\,\\mathrm{agm}(a,b)},\\qquad a=\\frac{d_1}2,\\; b=\\frac{d_2}2,\\; n=\\text{sides}",
  boundsBasis: "rounding",
  validity: ["Exact for a spot that is small against the bodies."],
  cautions: [
    AMPACITY_CAUTION,
    "A real contact has many small spots and films between them; this is one clean spot of known size.",
  ],
  assumptions: ["The faces outside the spot are insulated; there is no film resistance in the spot."],
  sources: [
    { title: "R. Holm, Electric Contacts", detail: "elliptic contact face", provenance: "from memory" },
    {
      title: "Flat limit of the capacitance of an ellipsoid",
      detail: "K through the arithmetic–geometric mean",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { majorDiameter: "0.5 mm", minorDiameter: "0.12 mm", sides: 2 },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ majorDiameter, minorDiameter, sides }) => {
    const [a, b] = [majorDiameter / 2, minorDiameter / 2];
    return drawSpot(
      { halfWidth: a, halfHeight: b, reach: 3.5 * a, sides, bounded: false },
      [{ name: "majorDiameter", from: [-a, 0], to: [a, 0], kind: "linear", offset: 1 }],
      [
        { name: "majorDiameter", from: [-a, -b], to: [a, -b], kind: "linear", offset: -1 },
        { name: "minorDiameter", from: [a, -b], to: [a, b], kind: "linear", offset: -1 },
      ],
      "Two bodies that touch in a small elliptic spot, in section and plan; the current narrows towards the spot and spreads beyond it.",
    );
  },
});
