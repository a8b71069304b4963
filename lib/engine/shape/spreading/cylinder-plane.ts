import { exactDifference } from "../../numeric/exact-difference";
import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { rectangle } from "../drawing";
import { ellipse } from "../drawing-curve";
import { exactFactor } from "../exact-factor";
import { bipolarSpan, narrowestField } from "./bipolar";
import { radialArrows, segment } from "./circle-views";

function span({ diameter, gap }: { readonly diameter: number; readonly gap: number }): number {
  return bipolarSpan((2 * gap) / diameter);
}

/** A cylinder parallel to a conducting plane: half of two equal cylinders, by reflection. */
export const cylinderPlane = defineShape({
  id: "cylinder-plane",
  title: "Cylinder and plane",
  family: "spreading",
  summary:
    "A long cylinder parallel to a plane electrode, in a medium that fills the space on its side; the current runs from the cylinder to the plane.",
  dimensions: {
    diameter: lengthDimension("Diameter", "d", "Diameter of the cylinder.", { radius: "radius" }),
    height: lengthDimension("Height", "h", "Distance from the axis to the plane."),
    gap: lengthDimension(
      "Gap",
      "g",
      "Smallest distance between the surface and the plane; keeps its digits however small it is.",
    ),
    length: lengthDimension("Length", "L", "Length along the axis."),
  },
  alternatives: [
    {
      names: ["height", "gap"],
      derive: {
        height: ({ diameter, gap }) => diameter / 2 + gap,
        gap: ({ diameter, height }) => exactDifference(height, diameter / 2),
      },
    },
  ],
  constraints: [
    {
      names: ["height", "gap"],
      text: "height greater than half the diameter, so that the cylinder does not touch the plane",
      holds: ({ gap }) => gap > 0,
    },
  ],
  coordinates: [],
  terminals: { high: "the cylinder", low: "the plane" },
  answer: {
    kind: "factor",
    factor: (d) => exactFactor(span(d) / (2 * Math.PI) / d.length),
    peak: (d) => ({
      fieldPerVolt: narrowestField(d.diameter / 2, span(d), (d.gap + d.diameter) / d.gap),
      position: "on the cylinder, at the point nearest to the plane",
    }),
    secondRoute: (d) => ({
      // acosh(1+x) = 2·asinh(√(x/2)).
      value: Math.asinh(Math.sqrt(d.gap / d.diameter)) / Math.PI / d.length,
      tolerance: 1e-12,
    }),
  },
  formula: "R = \\frac{\\rho}{2\\pi L}\\,\\operatorname{arcosh}\\frac{h}{a},\\qquad a=\\frac d2",
  boundsBasis: "rounding",
  validity: [
    "Exact for a cylinder that is long against its height, above a plane that reaches far on both sides.",
  ],
  cautions: [INSULATION_CAUTION],
  assumptions: ["Cylinder and plane are each at one potential; the medium is uniform; no end effects."],
  sources: [
    {
      title: "Incropera, DeWitt et al., Fundamentals of Heat and Mass Transfer, Table 4.1",
      detail: "horizontal cylinder in a semi-infinite medium, S = 2πL/arcosh(2z/D)",
      provenance: "source at hand",
    },
    { title: "Bipolar coordinates", detail: "difference form in the gap", provenance: "derived here" },
  ],
  example: {
    dimensions: { diameter: "12 mm", height: "40 mm", length: "3 m" },
    medium: { resistivity: "1e9 ohm m" },
  },
  drawing: drawAbovePlane,
});

function drawAbovePlane(d: {
  readonly diameter: number;
  readonly height: number;
  readonly gap: number;
  readonly length: number;
}): Drawing {
  const { height: h, gap, length } = d;
  const a = d.diameter / 2;
  const wide = 1.4 * h + a;
  return {
    views: [
      {
        title: "end view",
        conductor: [rectangle(-wide, 0, 2 * wide, h + 2.2 * a), ellipse([0, h], a, a)],
        lines: [{ ...segment([0, -0.1 * a], [0, h + 1.4 * a]), style: "axis" }],
        high: [ellipse([0, h], a, a)],
        low: [segment([-wide, 0], [wide, 0])],
        flow: radialArrows([0, h], a + 0.1 * gap, a + 0.8 * gap, [
          -0.5 * Math.PI,
          -0.75 * Math.PI,
          -0.25 * Math.PI,
        ]),
        dimensions: [
          { name: "diameter", from: [-a, h + a], to: [a, h + a], kind: "linear", offset: 1 },
          { name: "height", from: [wide, 0], to: [wide, h], kind: "linear", offset: -1 },
          { name: "gap", from: [0, 0], to: [0, gap], kind: "linear", offset: 1 },
        ],
      },
      {
        title: "side view",
        conductor: [rectangle(0, 0, length, gap)],
        high: [segment([0, gap], [length, gap])],
        low: [segment([0, 0], [length, 0])],
        flow: [{ from: [length / 2, 0.85 * gap], to: [length / 2, 0.15 * gap] }],
        dimensions: [{ name: "length", from: [0, gap], to: [length, gap], kind: "linear", offset: 1 }],
      },
    ],
    description:
      "A cylinder above a plane in end view and from the side; the current runs from the cylinder down to the plane.",
  };
}
