import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { arc } from "../drawing";
import { CONTACT_ASSUMPTION, EARTHING_CAUTIONS, REMOTE_EARTH, SOIL_ASSUMPTION } from "./earthing-texts";
import { groundLine, line } from "./ground-drawing";

/** A metal hemisphere flush with the ground: the one electrode with a simple exact law, R = ρ/(2πa). */
export const earthHemisphere = defineShape({
  id: "earth-hemisphere",
  title: "Hemisphere in the ground",
  family: "earthing",
  summary:
    "A metal hemisphere with its flat side flush with the ground; the current spreads radially into the soil. The model for a compact electrode.",
  dimensions: {
    diameter: lengthDimension("Diameter", "D", "Diameter of the hemisphere at the surface.", {
      radius: "radius",
    }),
  },
  coordinates: [],
  terminals: { high: "the hemisphere", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ diameter }) => ({
      value: 1 / diameter / Math.PI,
      relativeError: 1e-15,
      boundsBasis: "rounding",
      proved: true,
      method: "closed-form",
    }),
    peak: ({ diameter }) => ({ fieldPerVolt: 2 / diameter, position: "at the surface of the hemisphere" }),
  },
  formula: "R = \\frac{\\rho}{2\\pi a} = \\frac{\\rho}{\\pi D}",
  boundsBasis: "rounding",
  validity: ["Exact in a uniform soil with a flat surface."],
  cautions: EARTHING_CAUTIONS,
  assumptions: [SOIL_ASSUMPTION, CONTACT_ASSUMPTION],
  sources: [
    {
      title: "Radial flow into a half-space",
      detail: "R = ∫ρ dr/(2πr²) from the hemisphere to infinity",
      provenance: "derived here",
    },
  ],
  example: { dimensions: { diameter: "1.22 m" }, medium: { resistivity: "87 ohm m" } },
  drawing: ({ diameter }) => {
    const a = diameter / 2;
    const shell = arc([0, 0], a, Math.PI, 2 * Math.PI);
    const angles = [1.2, 1.5, 1.8].map((part) => part * Math.PI);
    return {
      views: [
        {
          title: "section",
          conductor: [{ ...shell, closed: true }],
          lines: [
            groundLine(-2.5 * a, 2.5 * a),
            line([0, 0.2 * a], [0, -1.2 * a], "axis"),
            ...[1.5, 2].map((k) => ({ ...arc([0, 0], k * a, Math.PI, 2 * Math.PI), style: "thin" as const })),
          ],
          high: [shell],
          low: [],
          flow: angles.map((phi) => ({
            from: [1.1 * a * Math.cos(phi), 1.1 * a * Math.sin(phi)],
            to: [1.9 * a * Math.cos(phi), 1.9 * a * Math.sin(phi)],
          })),
          dimensions: [{ name: "diameter", from: [-a, 0], to: [a, 0], kind: "linear", offset: 1 }],
        },
      ],
      description:
        "A hemisphere in the ground in section, its flat side in the surface; the current spreads radially into the soil.",
    };
  },
});
