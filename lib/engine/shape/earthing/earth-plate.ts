import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { circle, polyline } from "../drawing";
import { buriedPlate } from "./buried-plate";
import {
  CONTACT_ASSUMPTION,
  DWIGHT_SOURCE,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
  SOIL_ASSUMPTION,
} from "./earthing-texts";
import { downArrows, groundLine, line } from "./ground-drawing";

/** A thin round plate laid flat in the ground, both faces in the soil: Love's integral equation, solved to rounding. */
export const earthPlate = defineShape({
  id: "earth-plate",
  title: "Buried plate",
  family: "earthing",
  summary:
    "A thin round metal plate laid flat in the ground with both faces in the soil; the current leaves from both, mostly near the rim.",
  dimensions: {
    diameter: lengthDimension(
      "Diameter",
      "D",
      "Diameter of the plate; a square plate acts like a round one of the same area to about 2 %.",
      { radius: "radius" },
    ),
    depth: lengthDimension("Depth", "h", "Depth of the plate below the surface."),
  },
  coordinates: [],
  terminals: { high: "the plate, both faces", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ diameter, depth }) => {
      const { value, error } = buriedPlate((4 * depth) / diameter);
      return {
        value: (2 * value) / diameter,
        relativeError: error,
        boundsBasis: "quadrature",
        proved: false,
        method: "quadrature",
        accuracy:
          "The integral equation of the thin plate is solved numerically; its error was found by doubling the points.",
      };
    },
    peak: () => ({
      fieldPerVolt: null,
      position: "at the rim, where the field of a thin plate is unbounded",
    }),
    secondRoute: ({ diameter, depth }) => {
      const a = diameter / 2;
      if (depth < a) return null;
      const q = (a / (2 * depth)) ** 2;
      const image = (1 - (7 / 12) * q + (33 / 40) * q * q) / (8 * Math.PI * depth);
      // Dwight's formula is 0.7 % high where the depth is the radius, and better below.
      return { value: 1 / (8 * a) + image, tolerance: 0.009 };
    },
  },
  formula:
    "R = \\frac{\\rho}{8a\\,g},\\quad g=\\tfrac12\\int_{-1}^{1}f\\,dx,\\quad f(x)+\\frac1\\pi\\int_{-1}^{1}\\frac{\\kappa f(t)\\,dt}{\\kappa^2+(x-t)^2}=1,\\quad \\kappa=\\frac{2h}{a}",
  boundsBasis: "quadrature",
  validity: [
    "Exact in the model for a thin round plate at any depth; near ρ/8a when deep, ρ/4a at the surface.",
    "Dwight's formula, used for comparison, is 0.7 % high at a depth of one radius and 24 % high at half of it.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [
    SOIL_ASSUMPTION,
    CONTACT_ASSUMPTION,
    "The thickness of the plate is small against its diameter and its depth.",
  ],
  sources: [
    {
      title:
        "E. R. Love, The electrostatic field of two equal circular co-axial conducting disks, Quart. J. Mech. Appl. Math. 2 (1949) 428",
      detail: "with the sign of equal charges",
      provenance: "from memory",
    },
    DWIGHT_SOURCE,
  ],
  example: { dimensions: { diameter: "1.22 m", depth: "0.85 m" }, medium: { resistivity: "87 ohm m" } },
  drawing: ({ diameter, depth }) => {
    const a = diameter / 2;
    const plate = polyline([
      [-a, -depth],
      [a, -depth],
    ]);
    return {
      views: [
        {
          title: "section",
          conductor: [],
          lines: [groundLine(-2 * a, 2 * a), line([0, 0.1 * a], [0, -depth - 0.5 * a], "axis")],
          high: [plate],
          low: [],
          flow: [
            ...downArrows(-a, a, -depth, 0.8 * a),
            { from: [1.1 * a, -depth], to: [1.8 * a, -depth] },
            { from: [-1.1 * a, -depth], to: [-1.8 * a, -depth] },
          ],
          dimensions: [
            { name: "diameter", from: [a, -depth], to: [-a, -depth], kind: "linear", offset: 1 },
            { name: "depth", from: [a, 0], to: [a, -depth], kind: "linear", offset: 1 },
          ],
        },
        {
          title: "plan",
          conductor: [circle([0, 0], a)],
          high: [circle([0, 0], a)],
          low: [],
          flow: [],
          dimensions: [],
        },
      ],
      description:
        "A round plate laid flat in the ground, in section and in plan; the current spreads from both faces into the soil below the surface.",
    };
  },
});
