import { exactDifference } from "../../numeric/exact-difference";
import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing, Point } from "../drawing";
import { circle, rectangle } from "../drawing";
import { exactFactor } from "../exact-factor";
import { besideEachOther, bipolarSpan, narrowestField, spanFromFoci } from "./bipolar";
import { blockWithHoles, segment } from "./circle-views";

interface Pair {
  readonly diameter1: number;
  readonly diameter2: number;
  readonly gap: number;
}

function span({ diameter1, diameter2, gap }: Pair): number {
  return bipolarSpan(besideEachOther(diameter1 / 2, diameter2 / 2, gap));
}

/** Two cylinders beside each other in an unbounded medium: bipolar coordinates. */
export const parallelCylinders = defineShape({
  id: "parallel-cylinders",
  title: "Parallel cylinders",
  family: "spreading",
  summary:
    "Two long cylinders beside each other in a medium that reaches far on all sides; the current runs from one to the other.",
  dimensions: {
    diameter1: lengthDimension("First diameter", "d₁", "Diameter of the first cylinder.", {
      radius: "radius1",
    }),
    diameter2: lengthDimension("Second diameter", "d₂", "Diameter of the second cylinder.", {
      radius: "radius2",
    }),
    spacing: lengthDimension("Spacing", "s", "Distance between the two axes."),
    gap: lengthDimension(
      "Gap",
      "g",
      "Smallest distance between the two surfaces; keeps its digits however small it is.",
    ),
    length: lengthDimension("Length", "L", "Length along the axes."),
  },
  alternatives: [
    {
      names: ["spacing", "gap"],
      derive: {
        spacing: ({ diameter1, diameter2, gap }) => diameter1 / 2 + diameter2 / 2 + gap,
        gap: ({ diameter1, diameter2, spacing }) => exactDifference(spacing, diameter1 / 2, diameter2 / 2),
      },
    },
  ],
  constraints: [
    {
      names: ["spacing", "gap"],
      text: "spacing greater than the sum of the radii, so that the cylinders do not touch",
      holds: ({ gap }) => gap > 0,
    },
  ],
  coordinates: [],
  terminals: { high: "the first cylinder", low: "the second cylinder" },
  answer: {
    kind: "factor",
    factor: (d) => exactFactor(span(d) / (2 * Math.PI) / d.length),
    peak: (d) => {
      const a = Math.min(d.diameter1, d.diameter2) / 2;
      const b = Math.max(d.diameter1, d.diameter2) / 2;
      const cothSquared = ((2 * a + d.gap) / d.gap) * ((2 * a + 2 * b + d.gap) / (2 * b + d.gap));
      return {
        fieldPerVolt: narrowestField(a, span(d), cothSquared),
        position: `on ${d.diameter1 === d.diameter2 ? "either" : "the thinner"} cylinder, at the point nearest to the other`,
      };
    },
    secondRoute: (d) => {
      const [a, b, g, s] = [d.diameter1 / 2, d.diameter2 / 2, d.gap, d.spacing];
      const c = Math.sqrt((g / s) * ((g + 2 * a) / s) * (g + 2 * b) * (g + 2 * a + 2 * b)) / 2;
      return { value: spanFromFoci(c, a, b, 1) / (2 * Math.PI) / d.length, tolerance: 1e-12 };
    },
  },
  formula:
    "R = \\frac{\\rho}{2\\pi L}\\,\\operatorname{arcosh}\\frac{s^2-a^2-b^2}{2ab},\\qquad a=\\frac{d_1}2,\\; b=\\frac{d_2}2",
  boundsBasis: "rounding",
  validity: [
    "Exact for cylinders that are long against their spacing, in a medium whose boundaries are far away against the spacing.",
  ],
  cautions: [INSULATION_CAUTION],
  assumptions: ["Each cylinder is at one potential; the medium is uniform and unbounded; no end effects."],
  sources: [
    {
      title: "Incropera, DeWitt et al., Fundamentals of Heat and Mass Transfer, Table 4.1",
      detail: "two cylinders in an infinite medium, S = 2πL/arcosh((4w²−D₁²−D₂²)/(2D₁D₂))",
      provenance: "source at hand",
    },
    { title: "Bipolar coordinates", detail: "difference form in the gap", provenance: "derived here" },
  ],
  example: {
    dimensions: { diameter1: "20 mm", diameter2: "20 mm", spacing: "300 mm", length: "2 m" },
    medium: { resistivity: "25 ohm m" },
  },
  drawing: drawPair,
});

function drawPair(d: Pair & { readonly spacing: number; readonly length: number }): Drawing {
  const [a, b, s] = [d.diameter1 / 2, d.diameter2 / 2, d.spacing];
  const around = 0.35 * (s + a + b);
  const large = Math.max(a, b);
  const first: Point = [0, 0];
  const second: Point = [s, 0];
  const [from, to] = [a + 0.15 * d.gap, a + 0.85 * d.gap];
  return {
    views: [
      {
        title: "end view",
        conductor: blockWithHoles(-a - around, -large - around, s + b + around, large + around, [
          { center: first, radius: a },
          { center: second, radius: b },
        ]),
        lines: [{ ...segment([-1.3 * a, 0], [s + 1.3 * b, 0]), style: "axis" }],
        high: [circle(first, a)],
        low: [circle(second, b)],
        flow: [{ from: [from, 0], to: [to, 0] }],
        dimensions: [
          { name: "diameter1", from: [0, -a], to: [0, a], kind: "linear", offset: 1.6 },
          { name: "diameter2", from: [s, -b], to: [s, b], kind: "linear", offset: -1.6 },
          { name: "spacing", from: [0, -large], to: [s, -large], kind: "linear", offset: -1 },
          { name: "gap", from: [a, 0], to: [s - b, 0], kind: "linear", offset: 1.5 },
        ],
      },
      {
        title: "plan",
        conductor: [rectangle(a, 0, d.gap, d.length)],
        high: [segment([a, 0], [a, d.length])],
        low: [segment([s - b, 0], [s - b, d.length])],
        flow: [{ from: [from, d.length / 2], to: [to, d.length / 2] }],
        dimensions: [{ name: "length", from: [a, 0], to: [a, d.length], kind: "linear", offset: 1 }],
      },
    ],
    description:
      "Two cylinders beside each other in end view and from above; the current runs through the medium from the first to the second.",
  };
}
