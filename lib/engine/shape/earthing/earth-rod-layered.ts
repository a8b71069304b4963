import { InputError } from "../../failure";
import { defineShape, type Factor } from "../define-shape";
import { lengthDimension } from "../dimension";
import { polyline, rectangle } from "../drawing";
import { rodExcess } from "./average-potential-excess";
import {
  AVERAGE_POTENTIAL_SOURCE,
  CONTACT_ASSUMPTION,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
} from "./earthing-texts";
import { groundLine, line, rodAt, rodArrows } from "./ground-drawing";
import {
  equalSegments,
  gradedSegments,
  layeredRodResistance,
  type LayeredSoil,
  type RodSegments,
} from "./layered-rod";
import { resistanceByImages } from "./layered-rod-images";
import { rodCautions } from "./rod-validity";

interface Rod {
  readonly length: number;
  readonly diameter: number;
  readonly upperDepth: number;
}

/** A rod in a soil of two layers, within the upper one or through both. */
export const earthRodLayered = defineShape({
  id: "earth-rod-layered",
  title: "Earth rod in two layers",
  family: "earthing",
  summary:
    "A round rod driven from the surface of a soil of two horizontal layers; it may end in the upper layer or reach into the lower one.",
  dimensions: {
    length: lengthDimension("Length", "L", "Length of the rod in the soil."),
    diameter: lengthDimension("Diameter", "d", "Diameter of the rod, or of its conductive backfill.", {
      radius: "radius",
    }),
    upperDepth: lengthDimension(
      "Depth of the upper layer",
      "h",
      "Thickness of the upper layer, from the surface down.",
    ),
  },
  constraints: [
    {
      names: ["upperDepth", "diameter"],
      text: "upper layer deeper than half the rod's diameter",
      holds: ({ upperDepth, diameter }) => upperDepth > diameter / 2,
    },
  ],
  coordinates: [],
  terminals: { high: "the rod", low: REMOTE_EARTH },
  answer: {
    kind: "media",
    work: 100,
    media: [
      { name: "upper", label: "Upper layer" },
      { name: "lower", label: "Lower layer" },
    ],
    resistance: (rod, { upper, lower }) => layeredFactor(rod, { upper, lower, upperDepth: rod.upperDepth }),
    secondRoute: ({ length, diameter, upperDepth }, { upper, lower }) => {
      const value = resistanceByImages(
        diameter / 2,
        { upper, lower, upperDepth },
        equalSegments(length, upperDepth),
      );
      return value === null ? null : { value, tolerance: 1e-9 };
    },
  },
  formula:
    "R = \\frac{1}{\\sum_{ij}(A^{-1})_{ij}},\\quad A = \\overline{\\text{potential}}\\text{ of the parts in the upper and the lower layer, with all images, } K=\\frac{\\rho_2-\\rho_1}{\\rho_2+\\rho_1}",
  boundsBasis: "formula-accuracy",
  validity: [
    "For rods at least 10 diameters long; any ratio of the two resistivities.",
    "The current is taken as even along the part in each layer; the lower bound comes from many segments of their own currents.",
    "Near the boundary (the rod's end within about 10 radii of it) and over a well conducting lower layer the value can be several per cent high; the bounds show it.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [
    "Two uniform, horizontal layers, the lower one of infinite depth; the surface is flat and insulating; the other terminal is infinitely far away.",
    CONTACT_ASSUMPTION,
  ],
  sources: [
    AVERAGE_POTENTIAL_SOURCE,
    {
      title:
        "E. D. Sunde, Earth Conduction Effects in Transmission Systems (1949); G. F. Tagg, Earth Resistances (1964)",
      detail: "images in a soil of two layers",
      provenance: "from memory",
    },
    {
      title: "Sum of the images as an integral over exponentials",
      detail:
        "trapezoidal rule over the logarithm of the wave number, converges for every ratio of resistivities",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "3 m", diameter: "16 mm", upperDepth: "1 m" },
    media: { upper: { resistivity: "100 ohm m" }, lower: { resistivity: "300 ohm m" } },
  },
  drawing: ({ length, diameter, upperDepth }) => {
    const reach = Math.max(0.7 * length, 4 * diameter);
    const bottom = Math.max(1.25 * length, 1.25 * upperDepth);
    return {
      views: [
        {
          title: "section",
          conductor: [rodAt(0, length, diameter)],
          second: [rectangle(-reach, -bottom, 2 * reach, bottom - upperDepth)],
          lines: [
            groundLine(-reach, reach),
            line([-reach, -upperDepth], [reach, -upperDepth], "thin"),
            line([0, 0.05 * length], [0, -1.05 * length], "axis"),
          ],
          high: [
            polyline([
              [-diameter / 2, 0],
              [-diameter / 2, -length],
              [diameter / 2, -length],
              [diameter / 2, 0],
            ]),
          ],
          low: [],
          flow: rodArrows(0, length, diameter),
          dimensions: [
            {
              name: "length",
              from: [-diameter / 2, -length],
              to: [-diameter / 2, 0],
              kind: "linear",
              offset: 1,
            },
            { name: "diameter", from: [0, -length], to: [diameter / 2, -length], kind: "leader" },
            { name: "upperDepth", from: [reach, 0], to: [reach, -upperDepth], kind: "linear", offset: 1 },
          ],
        },
      ],
      description: `An earth rod in section through a soil of two layers; it ${length > upperDepth ? "reaches through the upper into the lower layer" : "ends in the upper layer"}, and the current spreads from it into the soil.`,
    };
  },
});

function layeredFactor(rod: Rod, soil: LayeredSoil): Factor {
  const { length, diameter, upperDepth } = rod;
  const a = diameter / 2;
  const value = resolved(a, soil, equalSegments(length, upperDepth));
  const fine = resolved(a, soil, gradedSegments(length, a, upperDepth));
  const least = Math.min(value, withEndFace(fine, rod, soil)) / (1 + fineError(rod, soil));
  const excess = value / least - 1;
  const slenderness = length / a;
  // A stub of less than a few radii in the lower layer is a disc rather than a rod: the value can then be too low.
  const stub = length > upperDepth ? (length - upperDepth) / a : Infinity;
  const short = Math.min(rodExcess(slenderness).least, rodExcess(stub).least, -1e-12);
  return {
    value,
    relativeError: 1e-12,
    lower: least * (1 - 1e-12),
    upper: value / (1 + short),
    boundsBasis: "formula-accuracy",
    proved: false,
    method: "quadrature",
    accuracy:
      "The value takes the current as even along the part in each layer and lies above that of the equipotential rod; the lower bound is the same model with many short segments, which agrees with a solution of the whole cylinder to 0.2 %.",
    cautions: [
      ...rodCautions(length, diameter),
      ...(excess > 0.05
        ? [
            `Here the even current makes the value up to ${(100 * excess).toPrecision(2)} % too high: the true resistance lies near the lower bound.`,
          ]
        : []),
    ],
  };
}

/** The rod's resistance; refuses one with parts so unlike in size that a double cannot tell them apart. */
function resolved(radius: number, soil: LayeredSoil, segments: RodSegments): number {
  try {
    return layeredRodResistance(radius, soil, segments);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw new InputError([
      {
        pointer: "#/dimensions/upperDepth",
        detail:
          "leaves a part of the rod in one layer that is too small beside the rest to be resolved; choose a depth that differs more from the rod's length, or a rod of ordinary proportions.",
      },
    ]);
  }
}

/** What the finely divided rod itself can be wrong by. */
function fineError({ length, diameter, upperDepth }: Rod, { upper, lower }: LayeredSoil): number {
  const slenderness = (2 * length) / diameter;
  const thick = slenderness >= 20 ? 0.004 : slenderness >= 10 ? 0.02 : 0.06;
  const stub = (2 * (length - upperDepth)) / diameter;
  return thick + (stub > 0 && stub < 10 && lower < upper ? 0.06 : 0);
}

/**
 * A rod that ends less than a radius above a better conducting layer: its end face, which thin segments do not have,
 * is added as a conductor of its own, the gap and the spreading below it in series.
 */
function withEndFace(
  resistance: number,
  { length, diameter, upperDepth }: Rod,
  { upper, lower }: LayeredSoil,
): number {
  const a = diameter / 2;
  const gap = upperDepth - length;
  if (gap < 0 || gap >= a || lower >= upper) return resistance;
  const endFace = lower / (4 * a) + (upper * gap) / (Math.PI * a * a);
  return 1 / (1 / resistance + 1 / endFace);
}
