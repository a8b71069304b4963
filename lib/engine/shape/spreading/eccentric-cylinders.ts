import { exactDifference } from "../../numeric/exact-difference";
import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { circle, rectangle } from "../drawing";
import { exactFactor } from "../exact-factor";
import { bipolarSpan, insideEachOther, narrowestField, spanFromFoci } from "./bipolar";
import { radialArrows, segment } from "./circle-views";

interface Pipes {
  readonly innerDiameter: number;
  readonly outerDiameter: number;
  readonly offset: number;
  readonly gap: number;
}

function span({ innerDiameter, outerDiameter, offset, gap }: Pipes): number {
  return bipolarSpan(insideEachOther(innerDiameter / 2, outerDiameter / 2, gap, offset));
}

/** A remainder below rounding of the sizes that made it is 0: a gap given as the whole clearance means concentric. */
function remainder(clearance: number, given: number, size: number): number {
  const rest = clearance - given;
  return Math.abs(rest) <= 4e-16 * size ? 0 : rest;
}

/** One cylinder inside another with parallel axes: bipolar coordinates. */
export const eccentricCylinders = defineShape({
  id: "eccentric-cylinders",
  title: "Eccentric cylinders",
  family: "spreading",
  summary:
    "The space between two cylinders with parallel axes, one inside the other and out of centre, such as the insulation of an off-centre core; the current runs from the inner to the outer one.",
  dimensions: {
    innerDiameter: lengthDimension("Inner diameter", "d", "Diameter of the inner cylinder.", {
      radius: "innerRadius",
    }),
    outerDiameter: lengthDimension("Outer diameter", "D", "Inside diameter of the outer cylinder.", {
      radius: "outerRadius",
    }),
    offset: lengthDimension("Offset", "e", "Distance between the two axes; 0 is concentric.", { zero: true }),
    gap: lengthDimension(
      "Smallest gap",
      "g",
      "Smallest distance between the two surfaces; keeps its digits however small it is.",
    ),
    length: lengthDimension("Length", "L", "Length along the axes."),
  },
  alternatives: [
    {
      names: ["offset", "gap"],
      derive: {
        offset: ({ innerDiameter, outerDiameter, gap }) =>
          remainder(exactDifference(outerDiameter / 2, innerDiameter / 2), gap, outerDiameter),
        gap: ({ innerDiameter, outerDiameter, offset }) =>
          exactDifference(outerDiameter / 2, innerDiameter / 2, offset),
      },
    },
  ],
  constraints: [
    {
      names: ["outerDiameter", "innerDiameter"],
      text: "outer diameter greater than inner diameter",
      holds: ({ innerDiameter, outerDiameter }) => outerDiameter > innerDiameter,
    },
    {
      names: ["offset", "gap"],
      text: "offset less than the difference of the radii, so that the cylinders do not touch",
      holds: ({ gap }) => gap > 0,
    },
    {
      names: ["gap", "offset"],
      text: "smallest gap at most the difference of the radii",
      holds: ({ offset }) => offset >= 0,
    },
  ],
  coordinates: [],
  terminals: { high: "the inner cylinder", low: "the outer cylinder" },
  answer: {
    kind: "factor",
    factor: (d) => exactFactor(span(d) / (2 * Math.PI) / d.length),
    peak: (d) => {
      const { innerDiameter, outerDiameter, offset, gap } = d;
      const [a, b] = [innerDiameter / 2, outerDiameter / 2];
      const cothSquared = ((b - a + offset) / gap) * ((b + a - offset) / (b + a + offset));
      return {
        fieldPerVolt: narrowestField(a, span(d), cothSquared),
        position: "on the inner cylinder, where the gap is smallest",
      };
    },
    secondRoute: (d) => {
      const [a, b, e] = [d.innerDiameter / 2, d.outerDiameter / 2, d.offset];
      // The foci go to infinity for concentric cylinders, and the two terms then cancel; so they do for a thin wire
      // that nearly touches.
      if (e < 1e-4 * b || b - a < 1e-3 * b || a < 1e-4 * b) return null;
      const product = d.gap * (b - a + e) * (b + a - e) * (b + a + e);
      const c = Math.sqrt(product) / (2 * e);
      return { value: spanFromFoci(c, a, b, -1) / (2 * Math.PI) / d.length, tolerance: 1e-9 };
    },
  },
  formula:
    "R = \\frac{\\rho}{2\\pi L}\\,\\operatorname{arcosh}\\frac{a^2+b^2-e^2}{2ab},\\qquad a=\\frac d2,\\; b=\\frac D2",
  boundsBasis: "rounding",
  validity: ["Exact for long parallel cylinders: the flow at the two ends is taken as plane."],
  cautions: [INSULATION_CAUTION],
  assumptions: ["Each cylinder is at one potential; the medium between them is uniform; no end effects."],
  sources: [
    {
      title: "Incropera, DeWitt et al., Fundamentals of Heat and Mass Transfer, Table 4.1",
      detail: "eccentric circular cylinders, S = 2πL/arcosh((D²+d²−4z²)/(2Dd))",
      provenance: "from memory",
    },
    { title: "Bipolar coordinates", detail: "difference form in the gap", provenance: "derived here" },
  ],
  example: {
    dimensions: { innerDiameter: "6 mm", outerDiameter: "14 mm", gap: "2.5 mm", length: "100 m" },
    medium: { resistivity: "5e12 ohm m" },
  },
  drawing: drawEccentric,
});

function drawEccentric(d: Pipes & { readonly length: number }): Drawing {
  const [a, b, e] = [d.innerDiameter / 2, d.outerDiameter / 2, d.offset];
  return {
    views: [
      {
        title: "end view",
        conductor: [circle([0, 0], b), circle([e, 0], a)],
        lines: [
          { ...segment([-1.08 * b, 0], [1.08 * b, 0]), style: "axis" },
          { ...segment([0, -1.08 * b], [0, 1.08 * b]), style: "axis" },
          { ...segment([e, -1.3 * a], [e, 1.3 * a]), style: "axis" },
        ],
        high: [circle([e, 0], a)],
        low: [circle([0, 0], b)],
        flow: radialArrows([e, 0], a + 0.12 * (b - a - e), a + 0.7 * (b - a - e), [
          0.5 * Math.PI,
          Math.PI,
          1.5 * Math.PI,
        ]),
        dimensions: [
          { name: "innerDiameter", from: [e, -a], to: [e, a], kind: "linear", offset: 0 },
          { name: "outerDiameter", from: [-b, -b], to: [b, -b], kind: "linear", offset: -1 },
          { name: "offset", from: [0, b], to: [e, b], kind: "linear", offset: 1 },
          { name: "gap", from: [e + a, 0], to: [b, 0], kind: "linear", offset: 1 },
        ],
      },
      {
        title: "section along the axes",
        conductor: [rectangle(0, a, d.length, b - a - e), rectangle(0, -b - e, d.length, b + e - a)],
        high: [segment([0, a], [d.length, a]), segment([0, -a], [d.length, -a])],
        low: [segment([0, b - e], [d.length, b - e]), segment([0, -b - e], [d.length, -b - e])],
        flow: [{ from: [d.length / 2, a + 0.2 * (b - a - e)], to: [d.length / 2, a + 0.8 * (b - a - e)] }],
        dimensions: [{ name: "length", from: [0, b - e], to: [d.length, b - e], kind: "linear", offset: 1 }],
      },
    ],
    description:
      "Two cylinders, one inside the other and out of centre, in end view and along the axes; the current runs from the inner to the outer cylinder, most of it where the gap is smallest.",
  };
}
