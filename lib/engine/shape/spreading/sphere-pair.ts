import { exactDifference } from "../../numeric/exact-difference";
import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing, Point } from "../drawing";
import { circle } from "../drawing";
import { exactFactor } from "../exact-factor";
import { pairResistance, spherePair as pairCharges } from "./bispherical";
import { blockWithHoles, segment } from "./circle-views";
import { poleField, sphereImages, totalCharge } from "./sphere-images";

interface Pair {
  readonly diameter1: number;
  readonly diameter2: number;
  readonly gap: number;
}

/** Radii in rising order: the sums are written for the smaller sphere first. */
function ordered({ diameter1, diameter2 }: Pair): readonly [number, number] {
  return [Math.min(diameter1, diameter2) / 2, Math.max(diameter1, diameter2) / 2];
}

/** Two spheres in an unbounded medium: bispherical series, exact. */
export const spherePair = defineShape({
  id: "sphere-pair",
  title: "Two spheres",
  family: "spreading",
  summary:
    "Two spheres in a medium that reaches far on all sides; the current runs from one to the other, and none to infinity.",
  dimensions: {
    diameter1: lengthDimension("First diameter", "d₁", "Diameter of the first sphere.", {
      radius: "radius1",
    }),
    diameter2: lengthDimension("Second diameter", "d₂", "Diameter of the second sphere.", {
      radius: "radius2",
    }),
    spacing: lengthDimension("Spacing", "s", "Distance between the two centres."),
    gap: lengthDimension(
      "Gap",
      "g",
      "Smallest distance between the two surfaces; keeps its digits however small it is.",
    ),
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
      text: "spacing greater than the sum of the radii, so that the spheres do not touch",
      holds: ({ gap }) => gap > 0,
    },
  ],
  coordinates: [],
  terminals: { high: "the first sphere", low: "the second sphere" },
  answer: {
    kind: "factor",
    factor: (d) => {
      const [a, b] = ordered(d);
      return exactFactor(pairResistance(pairCharges(a, b, d.gap)) / (4 * Math.PI));
    },
    peak: (d) => ({
      fieldPerVolt: nearestField(d),
      position: `on ${d.diameter1 === d.diameter2 ? "either" : "the smaller"} sphere, at the point nearest to the other`,
    }),
    secondRoute: (d) => {
      const [a, b] = ordered(d);
      // Near touching the images fall off too slowly to be a cheap check.
      if (d.gap < 1e-3 * a) return null;
      const one = sphereImages(a, b, d.gap, 1, 0);
      const both = sphereImages(a, b, d.gap, 1, 1);
      if (!one.complete || !both.complete) return null;
      const charges = {
        self: totalCharge(one.first),
        smaller: totalCharge(both.first),
        larger: totalCharge(both.second),
      };
      return { value: pairResistance(charges) / (4 * Math.PI), tolerance: 1e-11 };
    },
  },
  formula:
    "R = \\frac{\\rho}{4\\pi}\\,\\frac{C_{11}+2C_{12}+C_{22}}{C_{11}C_{22}-C_{12}^2},\\quad C_{11}=c\\sum_{n\\ge 0}\\frac{1}{\\sinh(\\mu_1+nM)},\\; C_{12}=-c\\sum_{n\\ge 1}\\frac{1}{\\sinh nM}",
  boundsBasis: "rounding",
  validity: ["Exact for a medium whose boundaries are far away against the spacing."],
  cautions: [INSULATION_CAUTION],
  assumptions: [
    "Each sphere is at one potential; the medium is uniform and unbounded.",
    "The whole current of one sphere enters the other.",
  ],
  sources: [
    {
      title: "Bispherical coordinates: two spheres, converging series",
      detail: "with their Euler–Maclaurin expansions near touching; M = μ₁ + μ₂, sinh μᵢ = c/rᵢ",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { diameter1: "30 mm", diameter2: "30 mm", gap: "120 mm" },
    medium: { resistivity: "20 ohm m" },
  },
  drawing: drawPair,
});

/** Field between the nearest points at one volt and no current to infinity, on the smaller sphere, 1/m. */
function nearestField(d: Pair): number {
  const [a, b] = ordered(d);
  const { gap } = d;
  if (gap < 1e-4 * a) return (1 + (gap * (2 / a - 1 / b)) / 3) / gap;
  const { smaller, larger } = pairCharges(a, b, gap);
  const share = larger / (smaller + larger);
  return poleField(sphereImages(a, b, gap, share, share - 1), gap);
}

function drawPair(d: Pair & { readonly spacing: number }): Drawing {
  const [a, b, s] = [d.diameter1 / 2, d.diameter2 / 2, d.spacing];
  const around = 0.35 * (s + a + b);
  const large = Math.max(a, b);
  const [first, second]: [Point, Point] = [
    [0, 0],
    [s, 0],
  ];
  return {
    views: [
      {
        title: "section through the centres",
        conductor: blockWithHoles(-a - around, -large - around, s + b + around, large + around, [
          { center: first, radius: a },
          { center: second, radius: b },
        ]),
        lines: [{ ...segment([-1.3 * a, 0], [s + 1.3 * b, 0]), style: "axis" }],
        high: [circle(first, a)],
        low: [circle(second, b)],
        flow: [{ from: [a + 0.15 * d.gap, 0], to: [a + 0.85 * d.gap, 0] }],
        dimensions: [
          { name: "diameter1", from: [0, -a], to: [0, a], kind: "linear", offset: 1.6 },
          { name: "diameter2", from: [s, -b], to: [s, b], kind: "linear", offset: -1.6 },
          { name: "spacing", from: [0, -large], to: [s, -large], kind: "linear", offset: -1 },
          { name: "gap", from: [a, 0], to: [s - b, 0], kind: "linear", offset: 1.5 },
        ],
      },
    ],
    description:
      "Two spheres beside each other in section; the current runs through the medium from the first to the second.",
  };
}
