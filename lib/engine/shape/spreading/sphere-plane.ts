import { acosh1p } from "../../numeric/acosh1p";
import { exactDifference } from "../../numeric/exact-difference";
import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { rectangle } from "../drawing";
import { ellipse } from "../drawing-curve";
import { exactFactor } from "../exact-factor";
import { sphereAbovePlane } from "./bispherical";
import { radialArrows, segment } from "./circle-views";
import { poleField, sphereImages, totalCharge } from "./sphere-images";

/** A sphere above a conducting plane: the bispherical series, exact. */
export const spherePlane = defineShape({
  id: "sphere-plane",
  title: "Sphere and plane",
  family: "spreading",
  summary:
    "A sphere above a plane electrode, in a medium that fills the space on its side; the current runs from the sphere to the plane.",
  dimensions: {
    diameter: lengthDimension("Diameter", "d", "Diameter of the sphere.", { radius: "radius" }),
    height: lengthDimension("Height", "h", "Distance from the centre to the plane."),
    gap: lengthDimension(
      "Gap",
      "g",
      "Smallest distance between the surface and the plane; keeps its digits however small it is.",
    ),
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
      text: "height greater than half the diameter, so that the sphere does not touch the plane",
      holds: ({ gap }) => gap > 0,
    },
  ],
  coordinates: [],
  terminals: { high: "the sphere", low: "the plane" },
  answer: {
    kind: "factor",
    factor: ({ diameter, gap }) =>
      exactFactor(1 / (2 * Math.PI * diameter * sphereAbovePlane((2 * gap) / diameter))),
    peak: ({ diameter, gap }) => ({
      fieldPerVolt: nearestField(diameter / 2, gap),
      position: "on the sphere, at the point nearest to the plane",
    }),
    secondRoute: ({ diameter, gap }) => {
      if (acosh1p((2 * gap) / diameter) < 0.05) return null;
      // The plane at zero is the plane of symmetry between the sphere and its mirror image at the opposite potential.
      const images = sphereImages(diameter / 2, diameter / 2, 2 * gap, 1, -1);
      return { value: 1 / (4 * Math.PI * totalCharge(images.first)), tolerance: 1e-11 };
    },
  },
  formula:
    "R = \\frac{\\rho}{4\\pi a\\,\\sinh\\mu\\;\\sum_{n=1}^{\\infty}\\dfrac{1}{\\sinh n\\mu}},\\qquad \\cosh\\mu=\\frac ha,\\; a=\\frac d2",
  boundsBasis: "rounding",
  validity: ["Exact for a plane and a medium that reach far against the height."],
  cautions: [INSULATION_CAUTION],
  assumptions: ["Sphere and plane are each at one potential; the medium is uniform."],
  sources: [
    {
      title: "Bispherical coordinates: sphere and plane, a converging series",
      detail: "with its Euler–Maclaurin expansion near touching",
      provenance: "derived here",
    },
    {
      title: "Incropera, DeWitt et al., Fundamentals of Heat and Mass Transfer, Table 4.1",
      detail: "gives the first image only, S = 2πD/(1 − D/4z): a comparison, not the value",
      provenance: "source at hand",
    },
  ],
  example: {
    dimensions: { diameter: "50 mm", gap: "4 mm" },
    medium: { resistivity: "1e10 ohm m" },
  },
  drawing: ({ diameter, height, gap }) => drawAbovePlane(diameter / 2, height, gap),
});

/** Field at the foot of the sphere at one volt, 1/m. */
function nearestField(a: number, gap: number): number {
  // The lubrication expansion leaves out (gap/a)², far below what a peak is used for.
  if (gap < 1e-4 * a) return (1 + (2 * gap) / (3 * a)) / gap;
  return poleField(sphereImages(a, a, 2 * gap, 1, -1), 2 * gap);
}

function drawAbovePlane(a: number, h: number, gap: number): Drawing {
  const wide = 1.4 * h + a;
  return {
    views: [
      {
        title: "section",
        conductor: [rectangle(-wide, 0, 2 * wide, h + 2.2 * a), ellipse([0, h], a, a)],
        lines: [{ ...segment([0, -0.1 * a], [0, h + 1.4 * a]), style: "axis" }],
        high: [ellipse([0, h], a, a)],
        low: [segment([-wide, 0], [wide, 0])],
        flow: radialArrows([0, h], a + 0.1 * gap, a + 0.8 * gap, [
          -0.5 * Math.PI,
          -0.7 * Math.PI,
          -0.3 * Math.PI,
        ]),
        dimensions: [
          { name: "diameter", from: [-a, h + a], to: [a, h + a], kind: "linear", offset: 1 },
          { name: "height", from: [wide, 0], to: [wide, h], kind: "linear", offset: -1 },
          { name: "gap", from: [0, 0], to: [0, gap], kind: "linear", offset: 1 },
        ],
      },
    ],
    description:
      "A sphere above a plane in section; the current runs from the sphere through the medium down to the plane.",
  };
}
