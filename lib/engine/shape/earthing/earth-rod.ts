import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { rodExcess } from "./average-potential-excess";
import {
  AVERAGE_POTENTIAL_SOURCE,
  CONTACT_ASSUMPTION,
  DWIGHT_SOURCE,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
  SOIL_ASSUMPTION,
} from "./earthing-texts";
import { drawRods } from "./rod-drawing";
import { parallelMean } from "./line-potential";
import { rodCautions } from "./rod-validity";

/** A rod driven from the surface: average potential of an evenly distributed current, (ρ/2π)·M(2L, a). */
export const earthRod = defineShape({
  id: "earth-rod",
  title: "Earth rod",
  family: "earthing",
  summary:
    "A round metal rod driven straight down from the surface; the current spreads into the soil along its whole length.",
  dimensions: {
    length: lengthDimension("Length", "L", "Length of the rod in the soil."),
    diameter: lengthDimension("Diameter", "d", "Diameter of the rod, or of its conductive backfill.", {
      radius: "radius",
    }),
  },
  coordinates: [],
  terminals: { high: "the rod", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ length, diameter }) => {
      const value = rodFactor(length, diameter / 2);
      const { least, most } = rodExcess((2 * length) / diameter);
      return {
        value,
        relativeError: 4e-15,
        lower: value / (1 + Math.max(most, 1e-12)),
        upper: value / (1 + Math.min(least, -1e-12)),
        boundsBasis: "formula-accuracy",
        proved: false,
        method: "closed-form",
        accuracy:
          "The average-potential value lies above that of the equipotential rod: by 5.0 % at a length of 5 radii, 1.7 % at 100, 0.62 % at 1000, by comparison with a boundary element solution of the whole rod.",
        cautions: rodCautions(length, diameter),
      };
    },
    secondRoute: ({ length, diameter }) => {
      const a = diameter / 2;
      if (length < 10 * a) return null;
      const bracket = Math.log((4 * length) / a) - 1;
      // Dwight leaves out the terms in a/L; the first of them is a/2L of the bracket.
      return { value: bracket / (2 * Math.PI * length), tolerance: (0.6 * a) / length / bracket + 1e-9 };
    },
  },
  formula:
    "R = \\frac{\\rho}{2\\pi L}\\left[\\operatorname{asinh}\\frac{2L}{a}-\\sqrt{1+\\frac{a^2}{4L^2}}+\\frac{a}{2L}\\right]\\approx\\frac{\\rho}{2\\pi L}\\left(\\ln\\frac{4L}{a}-1\\right)",
  boundsBasis: "formula-accuracy",
  validity: [
    "For rods much longer than thick: length at least 10 diameters. Stouter rods are answered with wider bounds.",
    "The average-potential value is an upper one; the lower bound is that of the equipotential rod by comparison.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [SOIL_ASSUMPTION, CONTACT_ASSUMPTION, "The top of the rod is at the surface of the ground."],
  sources: [AVERAGE_POTENTIAL_SOURCE, DWIGHT_SOURCE],
  example: { dimensions: { length: "2.44 m", diameter: "15.8 mm" }, medium: { resistivity: "87 ohm m" } },
  drawing: ({ length, diameter }) =>
    drawRods(
      length,
      diameter,
      [0],
      [],
      "An earth rod in section, driven straight down from the surface; the current spreads from it into the soil.",
    ),
});

/** Resistance over resistivity of one rod, 1/m. */
export function rodFactor(length: number, radius: number): number {
  return parallelMean(2 * length, radius) / (2 * Math.PI);
}
