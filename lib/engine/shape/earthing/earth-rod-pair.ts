import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { parallelRodsExcess, proximityShift, rodExcess } from "./average-potential-excess";
import {
  AVERAGE_POTENTIAL_SOURCE,
  CONTACT_ASSUMPTION,
  DWIGHT_SOURCE,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
  SOIL_ASSUMPTION,
} from "./earthing-texts";
import { parallelMean } from "./line-potential";
import { drawRods } from "./rod-drawing";
import { rodCautions, spacingCautions } from "./rod-validity";

/** Two equal rods joined together: (ρ/4π)·[M(2L, a) + M(2L, s)] for every spacing. */
export const earthRodPair = defineShape({
  id: "earth-rod-pair",
  title: "Two earth rods",
  family: "earthing",
  summary:
    "Two equal rods driven from the surface and joined together, taken as one terminal; valid for every spacing.",
  dimensions: {
    length: lengthDimension("Length", "L", "Length of each rod in the soil."),
    diameter: lengthDimension("Diameter", "d", "Diameter of each rod.", { radius: "radius" }),
    spacing: lengthDimension("Spacing", "s", "Distance between the axes of the two rods."),
  },
  constraints: [
    {
      names: ["spacing", "diameter"],
      text: "spacing at least the diameter: the rods must not overlap",
      holds: ({ spacing, diameter }) => spacing >= diameter,
    },
  ],
  coordinates: [],
  terminals: { high: "the two rods, joined", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ length, diameter, spacing }) => {
      const a = diameter / 2;
      const value = pairFactor(length, a, spacing);
      return {
        value,
        relativeError: 4e-15,
        ...pairBounds(value, length, a, spacing),
        boundsBasis: "formula-accuracy",
        proved: false,
        method: "closed-form",
        accuracy:
          "The average-potential value lies above that of equipotential rods; the lower bound follows from the same comparison as a single rod's, with the pair as one thicker rod where it is close together, and a safe figure for the uneven flow around close rods.",
        cautions: [...rodCautions(length, diameter), ...spacingCautions(spacing, length, diameter)],
      };
    },
    secondRoute: ({ length, diameter, spacing }) => dwightPair(length, diameter / 2, spacing),
  },
  formula:
    "R = \\frac{\\rho}{4\\pi}\\left[M(2L,a)+M(2L,s)\\right],\\qquad M(l,d)=\\frac{2}{l}\\left[\\operatorname{asinh}\\frac{l}{d}-\\sqrt{1+\\frac{d^2}{l^2}}+\\frac{d}{l}\\right]",
  boundsBasis: "formula-accuracy",
  validity: [
    "For rods at least 10 diameters long, at any spacing; the published near and far formulas agree with it in their own ranges.",
    "Rods closer together than about 4 diameters act like one thick rod; the bounds allow for it.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [
    SOIL_ASSUMPTION,
    CONTACT_ASSUMPTION,
    "The conductor that joins the rods is insulated from the soil; the tops of the rods are at the surface.",
  ],
  sources: [AVERAGE_POTENTIAL_SOURCE, DWIGHT_SOURCE],
  example: {
    dimensions: { length: "2.44 m", diameter: "15.8 mm", spacing: "5.1 m" },
    medium: { resistivity: "87 ohm m" },
  },
  drawing: ({ length, diameter, spacing }) =>
    drawRods(
      length,
      diameter,
      [0, spacing],
      [],
      "Two earth rods in section, driven straight down a spacing apart and joined above ground; the current spreads from both into the soil.",
    ),
});

/** Resistance over resistivity of two rods, or of a straight wire of twice the length with its image at `spacing`; 1/m. */
export function pairFactor(length: number, radius: number, spacing: number): number {
  return (parallelMean(2 * length, radius) + parallelMean(2 * length, spacing)) / (4 * Math.PI);
}

/** Lower and upper bound of that value, 1/m. */
export function pairBounds(
  value: number,
  length: number,
  radius: number,
  spacing: number,
): { lower: number; upper: number } {
  const excess = parallelRodsExcess(length, radius, spacing, Math.sqrt(radius) * Math.sqrt(spacing), true);
  // Two rods: half of the shift of each, (1/4)·2 of ρ/2πL.
  const shift = proximityShift(radius, 1 / spacing) / (4 * Math.PI * length);
  const { least } = rodExcess(length / radius);
  return {
    lower: (value - Math.min(shift, value / 2)) / (1 + Math.max(excess, 1e-12)),
    upper: value / (1 + Math.min(least, -1e-12)),
  };
}

/** Dwight's two series, each in its own range of spacings; null between them. */
export function dwightPair(
  length: number,
  radius: number,
  spacing: number,
): { value: number; tolerance: number } | null {
  if (length < 10 * radius || spacing < 4 * radius) return null;
  const slender = (0.6 * radius) / length / (Math.log((4 * length) / radius) - 1);
  if (spacing <= 1.6 * length) {
    const q = spacing / length;
    const bracket =
      Math.log((4 * length) / radius) + Math.log(4 / q) - 2 + q / 2 - (q * q) / 16 + (q * q * q * q) / 512;
    return { value: bracket / (4 * Math.PI * length), tolerance: 4e-4 + 2 * slender };
  }
  if (spacing < 2 * length) return null;
  const q = (length / spacing) ** 2;
  const own = (Math.log((4 * length) / radius) - 1) / (4 * Math.PI * length);
  const mutual = (1 - q / 3 + (2 / 5) * q * q) / (4 * Math.PI * spacing);
  return { value: own + mutual, tolerance: 5e-4 + 2 * slender };
}
