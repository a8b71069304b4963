import { agm } from "../../numeric/agm";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { circle } from "../drawing";
import { proximityShift } from "./average-potential-excess";
import {
  AVERAGE_POTENTIAL_SOURCE,
  CONTACT_ASSUMPTION,
  DWIGHT_SOURCE,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
  SOIL_ASSUMPTION,
} from "./earthing-texts";
import { groundLine, line, wireArrows } from "./ground-drawing";
import { depthCaution, shallowCautions } from "./rod-validity";

/** A closed ring of wire in the ground: exact potential of the thin ring by the arithmetic–geometric mean. */
export const earthRing = defineShape({
  id: "earth-ring",
  title: "Buried ring",
  family: "earthing",
  summary:
    "A closed ring of bare round wire laid horizontally in the ground, such as a foundation's ring electrode.",
  dimensions: {
    ringDiameter: lengthDimension("Ring diameter", "D", "Diameter of the ring at the centre of the wire.", {
      radius: "ringRadius",
    }),
    wireDiameter: lengthDimension(
      "Wire diameter",
      "d",
      "Diameter of the wire; for a strip take half its width.",
      {
        radius: "wireRadius",
      },
    ),
    depth: lengthDimension("Depth", "h", "Depth of the ring below the surface, to the centre of the wire."),
  },
  constraints: [
    {
      names: ["wireDiameter", "ringDiameter"],
      text: "wire diameter less than ring diameter",
      holds: ({ wireDiameter, ringDiameter }) => wireDiameter < ringDiameter,
    },
    {
      names: ["depth", "wireDiameter"],
      text: "depth greater than half the wire diameter: the ring lies below the surface",
      holds: ({ depth, wireDiameter }) => depth > wireDiameter / 2,
    },
  ],
  coordinates: [],
  terminals: { high: "the ring", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ ringDiameter, wireDiameter, depth }) => {
      const a = wireDiameter / 2;
      const value = (ringMean(ringDiameter, a) + ringMean(ringDiameter, 2 * depth)) / (4 * Math.PI);
      const q = wireDiameter / ringDiameter;
      // The bending of the ring shifts the charge within the wire's section, and so does its image.
      const bending = 0.5 * q * q * (1 + Math.log(1 / q));
      const shift = proximityShift(a, 1 / (2 * depth)) / (Math.PI * Math.PI * ringDiameter);
      return {
        value,
        relativeError: 4e-15,
        lower: (value - Math.min(shift, value / 2)) / (1 + Math.max(bending, 1e-12)),
        upper: value * (1 + 1e-12),
        boundsBasis: "formula-accuracy",
        proved: false,
        method: "closed-form",
        accuracy:
          "The thin ring's value is an upper one; the lower bound allows for the uneven charge around the wire, by comparison with the exact torus (0.6 % at a wire of a tenth of the ring's diameter) and with parallel cylinders for the image.",
        cautions: [
          ...(wireDiameter > 0.1 * ringDiameter
            ? [
                "The wire is thicker than a tenth of the ring's diameter; the formula is meant for thin rings, and its bounds are wider here.",
              ]
            : []),
          ...shallowCautions(wireDiameter, depth),
          ...depthCaution(depth, ringDiameter / 2, "the ring's radius"),
        ],
      };
    },
    secondRoute: ({ ringDiameter, wireDiameter, depth }) => {
      const [thin, deep] = [wireDiameter / ringDiameter, depth / ringDiameter];
      if (thin > 0.01 || deep > 0.2) return null;
      const bracket = Math.log(8 / thin) + Math.log(2 / deep);
      // 0.05 % at h/D = 0.05 and 0.43 % at 0.2 against the ring's exact potential.
      return {
        value: bracket / (2 * Math.PI ** 2 * ringDiameter),
        tolerance: 2e-4 + 0.15 * deep * deep + thin,
      };
    },
  },
  formula:
    "R = \\frac{\\rho}{4\\pi}\\left[\\frac{1}{\\operatorname{agm}(\\sqrt{D^2+a^2},a)}+\\frac{1}{\\operatorname{agm}(\\sqrt{D^2+4h^2},2h)}\\right]",
  boundsBasis: "formula-accuracy",
  validity: [
    "For wires thinner than a tenth of the ring's diameter, at least 2 wire diameters deep.",
    "Dwight's formula, used for comparison, holds to 0.05 % at a depth of D/20 and to 0.43 % at D/5.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [SOIL_ASSUMPTION, CONTACT_ASSUMPTION, "The ring is closed and its wire round."],
  sources: [
    AVERAGE_POTENTIAL_SOURCE,
    DWIGHT_SOURCE,
    {
      title: "Torus in free space by toroidal harmonics",
      detail: "exact, for comparison",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { ringDiameter: "12.7 m", wireDiameter: "9.4 mm", depth: "0.8 m" },
    medium: { resistivity: "87 ohm m" },
  },
  drawing: ({ ringDiameter, wireDiameter, depth }) => {
    const [radius, a] = [ringDiameter / 2, wireDiameter / 2];
    const cuts = [circle([-radius, -depth], a), circle([radius, -depth], a)];
    return {
      views: [
        {
          title: "plan",
          conductor: [circle([0, 0], radius + a), circle([0, 0], radius - a)],
          high: [circle([0, 0], radius + a), circle([0, 0], radius - a)],
          low: [],
          flow: [0.25, 0.75, 1.25, 1.75].map((turn) => ({
            from: [1.05 * radius * Math.cos(turn * Math.PI), 1.05 * radius * Math.sin(turn * Math.PI)],
            to: [1.35 * radius * Math.cos(turn * Math.PI), 1.35 * radius * Math.sin(turn * Math.PI)],
          })),
          dimensions: [
            { name: "ringDiameter", from: [-radius, 0], to: [radius, 0], kind: "linear", offset: 0 },
          ],
        },
        {
          title: "section",
          conductor: cuts,
          lines: [
            groundLine(-1.4 * radius, 1.4 * radius),
            line([0, 0.1 * radius], [0, -depth - 0.3 * radius], "axis"),
          ],
          high: cuts,
          low: [],
          flow: [-radius, radius].flatMap((x) => wireArrows(x, -depth, a, 0.3 * radius)),
          dimensions: [
            { name: "depth", from: [radius, 0], to: [radius, -depth], kind: "linear", offset: 1 },
            { name: "wireDiameter", from: [-radius, -depth], to: [-radius, -depth - a], kind: "leader" },
          ],
        },
      ],
      description:
        "A ring of wire buried horizontally, in plan and in section; the current spreads from it into the soil below the surface.",
    };
  },
});

/** Mean of 1/distance from a point of the ring, at height d above it, to the ring: 1/agm(√(D²+d²), d). */
function ringMean(ringDiameter: number, distance: number): number {
  return 1 / agm(Math.hypot(ringDiameter, distance), distance);
}
