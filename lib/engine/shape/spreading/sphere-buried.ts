import { acosh1p } from "../../numeric/acosh1p";
import { alternatingSum } from "../../numeric/alternating-sum";
import { exactDifference } from "../../numeric/exact-difference";
import { ELECTRODE_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing } from "../drawing";
import { circle } from "../drawing";
import { exactFactor } from "../exact-factor";
import { sphereBelowSurface } from "./bispherical";
import { blockWithHoles, radialArrows, segment } from "./circle-views";

/** A sphere below an insulating surface, the other terminal far away: the alternating bispherical series, exact. */
export const sphereBuried = defineShape({
  id: "sphere-buried",
  title: "Buried sphere",
  family: "spreading",
  summary:
    "A sphere below the insulating surface of a half-space, such as an electrode in the ground or under water; the current spreads from it to infinity.",
  dimensions: {
    diameter: lengthDimension("Diameter", "d", "Diameter of the sphere.", { radius: "radius" }),
    depth: lengthDimension("Depth", "h", "Distance from the surface down to the centre."),
    cover: lengthDimension(
      "Cover",
      "g",
      "Thickness of the medium above the sphere; keeps its digits however small it is.",
    ),
  },
  alternatives: [
    {
      names: ["depth", "cover"],
      derive: {
        depth: ({ diameter, cover }) => diameter / 2 + cover,
        cover: ({ diameter, depth }) => exactDifference(depth, diameter / 2),
      },
    },
  ],
  constraints: [
    {
      names: ["depth", "cover"],
      text: "depth greater than half the diameter, so that the sphere is covered",
      holds: ({ cover }) => cover > 0,
    },
  ],
  coordinates: [],
  terminals: { high: "the sphere", low: "infinity" },
  answer: {
    kind: "factor",
    factor: ({ diameter, cover }) =>
      exactFactor(1 / (2 * Math.PI * diameter * sphereBelowSurface((2 * cover) / diameter))),
    peak: ({ diameter, cover }) => ({
      fieldPerVolt: farPole(diameter / 2, cover).field,
      position: "on the sphere, at the point farthest from the surface",
    }),
    secondRoute: ({ diameter, cover }) => ({
      value: 1 / (4 * Math.PI * farPole(diameter / 2, cover).charge),
      tolerance: 1e-11,
    }),
  },
  formula:
    "R = \\frac{\\rho}{4\\pi a\\,\\sinh\\mu\\;\\sum_{n=1}^{\\infty}\\dfrac{(-1)^{n+1}}{\\sinh n\\mu}},\\qquad \\cosh\\mu=\\frac ha,\\; a=\\frac d2",
  boundsBasis: "rounding",
  validity: ["Exact for a uniform half-space whose other electrode is far away against the depth."],
  cautions: [ELECTRODE_CAUTION],
  assumptions: [
    "The surface carries no current (ground or water against air); the sphere is at one potential.",
    "The medium is uniform and reaches far against the depth.",
  ],
  sources: [
    {
      title: "Bispherical coordinates: sphere and insulating plane, a converging series",
      detail: "with its Euler–Maclaurin expansion near the surface",
      provenance: "derived here",
    },
    {
      title: "Handbook form ρ/(4π)·(1/a + 1/(2h))",
      detail: "the limit of a great depth, kept as a comparison",
      provenance: "from memory",
    },
  ],
  example: {
    dimensions: { diameter: "400 mm", depth: "1.5 m" },
    medium: { resistivity: "80 ohm m" },
  },
  drawing: ({ diameter, depth, cover }) => drawBuried(diameter / 2, depth, cover),
});

/**
 * Charge of the sphere at one volt and the field at its lowest point, from the images q_n = ±a·sinh μ/sinh nμ at the
 * heights c·coth nμ above and below the surface, summed as an alternating series.
 */
function farPole(a: number, cover: number): { charge: number; field: number } {
  const x = cover / a;
  const mu = acosh1p(x);
  const part = (k: number) => {
    const n = k + 1;
    const share = n === 1 ? 1 : (Math.exp((1 - n) * mu) * Math.expm1(-2 * mu)) / Math.expm1(-2 * n * mu);
    return a * share;
  };
  const pole = 2 + x;
  // tanh of the half angle keeps the height of an image, in radii, finite and positive for any depth.
  const height = (k: number) => {
    const n = k + 1;
    return n === 1
      ? 1 + x
      : (Math.sqrt(x * (x + 2)) * (1 + Math.exp(-2 * n * mu))) / -Math.expm1(-2 * n * mu);
  };
  const field = alternatingSum((k) => {
    const z = height(k);
    return part(k) * ((pole - z) ** -2 + (pole + z) ** -2);
  });
  return { charge: alternatingSum(part), field: field / a / a };
}

function drawBuried(a: number, h: number, cover: number): Drawing {
  const wide = 1.2 * h + 2 * a;
  const bottom = -h - 2.4 * a;
  return {
    views: [
      {
        title: "section",
        conductor: blockWithHoles(-wide, bottom, wide, 0, [{ center: [0, -h], radius: a }]),
        lines: [
          { ...segment([-wide, 0], [wide, 0]), style: "ground" },
          { ...segment([0, 0.2 * a], [0, -h - 1.3 * a]), style: "axis" },
        ],
        high: [circle([0, -h], a)],
        low: [
          segment([-wide, 0], [-wide, bottom]),
          segment([-wide, bottom], [wide, bottom]),
          segment([wide, bottom], [wide, 0]),
        ],
        flow: radialArrows([0, -h], 1.15 * a, 2 * a, [
          0,
          -0.25 * Math.PI,
          -0.5 * Math.PI,
          -0.75 * Math.PI,
          Math.PI,
        ]),
        dimensions: [
          { name: "diameter", from: [-a, -h - a], to: [a, -h - a], kind: "linear", offset: -1 },
          { name: "depth", from: [wide, -h], to: [wide, 0], kind: "linear", offset: -1 },
          { name: "cover", from: [0, -cover], to: [0, 0], kind: "linear", offset: 1 },
        ],
      },
    ],
    description:
      "A sphere below the surface of a half-space in section; the current spreads from the sphere in all directions below the surface.",
  };
}
