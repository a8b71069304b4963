import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { circle, rectangle } from "../drawing";
import { dwightPair, pairBounds, pairFactor } from "./earth-rod-pair";
import {
  AVERAGE_POTENTIAL_SOURCE,
  CONTACT_ASSUMPTION,
  DWIGHT_SOURCE,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
  SOIL_ASSUMPTION,
} from "./earthing-texts";
import { downArrows, groundLine, line, wireArrows } from "./ground-drawing";
import { depthCaution, wireCautions } from "./rod-validity";

/** A straight horizontal wire in the ground: (ρ/4π)·[M(ℓ, a) + M(ℓ, 2h)], its image included. */
export const earthWire = defineShape({
  id: "earth-wire",
  title: "Buried wire",
  family: "earthing",
  summary:
    "A straight bare wire laid horizontally in the ground; the current spreads into the soil along it.",
  dimensions: {
    length: lengthDimension("Length", "ℓ", "Whole length of the wire, from end to end."),
    diameter: lengthDimension(
      "Wire diameter",
      "d",
      "Diameter of the wire; for a strip take half its width.",
      {
        radius: "radius",
      },
    ),
    depth: lengthDimension("Depth", "h", "Depth of the wire's axis below the surface."),
  },
  constraints: [
    {
      names: ["depth", "diameter"],
      text: "depth greater than half the diameter: the wire lies below the surface",
      holds: ({ depth, diameter }) => depth > diameter / 2,
    },
  ],
  coordinates: [],
  terminals: { high: "the wire", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ length, diameter, depth }) => {
      const half = length / 2;
      const value = pairFactor(half, diameter / 2, 2 * depth);
      return {
        value,
        relativeError: 4e-15,
        ...pairBounds(value, half, diameter / 2, 2 * depth),
        boundsBasis: "formula-accuracy",
        proved: false,
        method: "closed-form",
        accuracy:
          "The average-potential value lies above that of the equipotential wire; the lower bound follows from the comparison with wires of many segments, and a safe figure for the uneven flow around a wire near the surface.",
        cautions: [
          ...wireCautions(length, diameter, depth, "wire"),
          ...depthCaution(depth, length / 2, "half the length of the wire"),
        ],
      };
    },
    secondRoute: ({ length, diameter, depth }) =>
      2 * depth <= length / 2 ? dwightPair(length / 2, diameter / 2, 2 * depth) : null,
  },
  formula:
    "R = \\frac{\\rho}{4\\pi}\\left[M(\\ell,a)+M(\\ell,2h)\\right],\\qquad M(l,d)=\\frac{2}{l}\\left[\\operatorname{asinh}\\frac{l}{d}-\\sqrt{1+\\frac{d^2}{l^2}}+\\frac{d}{l}\\right]",
  boundsBasis: "formula-accuracy",
  validity: [
    "For wires much longer than thick (at least 10 diameters) and at least 2 diameters deep, at any depth beyond.",
    "Dwight's series, used for comparison, holds to 6e-5 for depths up to a quarter of the length; his L is half the length, his s twice the depth.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [SOIL_ASSUMPTION, CONTACT_ASSUMPTION],
  sources: [AVERAGE_POTENTIAL_SOURCE, DWIGHT_SOURCE],
  example: {
    dimensions: { length: "30.6 m", diameter: "9.4 mm", depth: "0.8 m" },
    medium: { resistivity: "87 ohm m" },
  },
  drawing: ({ length, diameter, depth }) => {
    const wire = rectangle(-length / 2, -depth - diameter / 2, length, diameter);
    return {
      views: [
        {
          title: "side view",
          conductor: [wire],
          lines: [
            groundLine(-0.65 * length, 0.65 * length),
            line([-0.55 * length, -depth], [0.55 * length, -depth], "axis"),
          ],
          high: [wire],
          low: [],
          flow: downArrows(-length / 2, length / 2, -depth - diameter / 2, 0.2 * length),
          dimensions: [
            {
              name: "length",
              from: [length / 2, -depth],
              to: [-length / 2, -depth],
              kind: "linear",
              offset: 1,
            },
            { name: "depth", from: [length / 2, 0], to: [length / 2, -depth], kind: "linear", offset: 1 },
          ],
        },
        {
          title: "section across the wire",
          conductor: [circle([0, -depth], diameter / 2)],
          lines: [groundLine(-depth, depth)],
          high: [circle([0, -depth], diameter / 2)],
          low: [],
          flow: wireArrows(0, -depth, diameter / 2, 0.6 * depth),
          dimensions: [
            { name: "diameter", from: [0, -depth], to: [0, -depth - diameter / 2], kind: "leader" },
          ],
        },
      ],
      description:
        "A straight wire buried horizontally, from the side and in section across it; the current spreads from it into the soil below the surface.",
    };
  },
});
