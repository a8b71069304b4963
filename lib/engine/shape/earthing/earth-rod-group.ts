import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Point } from "../drawing";
import { parallelRodsExcess, rodExcess } from "./average-potential-excess";
import { dwightPair } from "./earth-rod-pair";
import {
  AVERAGE_POTENTIAL_SOURCE,
  CONTACT_ASSUMPTION,
  DWIGHT_SOURCE,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
  SOIL_ASSUMPTION,
} from "./earthing-texts";
import { drawRods } from "./rod-drawing";
import { groupPlaces, rodGroup, type Arrangement } from "./rod-group";
import { rodCautions, spacingCautions } from "./rod-validity";

const MOST_RODS = 400;

/** Several equal rods joined together; the inner ones carry less, since they stand in the others' potential. */
export const earthRodGroup = defineShape({
  id: "earth-rod-group",
  title: "Group of earth rods",
  family: "earthing",
  summary:
    "Equal rods driven from the surface in a line, a ring or a square grid and joined together, taken as one terminal.",
  dimensions: {
    length: lengthDimension("Length", "L", "Length of each rod in the soil."),
    diameter: lengthDimension("Diameter", "d", "Diameter of each rod.", { radius: "radius" }),
    spacing: lengthDimension(
      "Spacing",
      "s",
      "Distance between the axes of neighbouring rods; in a ring straight across, not along the circle.",
    ),
    count: {
      type: "integer",
      label: "Number of rods",
      symbol: "n",
      min: 1,
      max: MOST_RODS,
      help: "How many rods; for a square grid a square number such as 4, 9 or 16.",
    },
    arrangement: {
      type: "choice",
      label: "Arrangement",
      symbol: "",
      default: "line",
      choices: [
        { value: "line", label: "straight line" },
        { value: "ring", label: "ring" },
        { value: "square", label: "filled square grid" },
      ],
      help: "How the rods stand: in a straight line, evenly on a ring, or in a square grid of equal rows.",
    },
  },
  constraints: [
    {
      names: ["spacing", "diameter"],
      text: "spacing at least the diameter: the rods must not overlap",
      holds: ({ spacing, diameter, count }) => count === 1 || spacing >= diameter,
    },
    {
      names: ["count", "arrangement"],
      text: "a square number of rods for a square grid (1, 4, 9, 16 …)",
      holds: ({ count, arrangement }) =>
        arrangement !== "square" || Math.round(Math.sqrt(count)) ** 2 === count,
    },
  ],
  coordinates: [],
  terminals: { high: "the rods, joined", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ length, diameter, spacing, count, arrangement }) => {
      const a = diameter / 2;
      const group = rodGroup(length, a, spacing, count, arrangement);
      const { value } = group;
      const single = rodExcess(length / a);
      const most =
        count === 1 ? single.most : parallelRodsExcess(length, a, spacing, group.meanDistance, count === 2);
      // The factor 1.3 covers what a field that is not uniform over a rod adds.
      const shift = (1.3 * a * a * group.fieldSquare) / (2 * Math.PI * length * count);
      return {
        value,
        relativeError: 1e-13,
        lower: (value - Math.min(shift, value / 2)) / (1 + Math.max(most, 1e-12)),
        upper: value / (1 + Math.min(single.least, -1e-12)),
        boundsBasis: "formula-accuracy",
        proved: false,
        method: "closed-form",
        accuracy:
          "The average-potential value lies above that of equipotential rods: as far as a single rod's where the rods are farther apart than long, up to 6 % where they are dense, by comparison with rods of many segments.",
        cautions: [
          ...rodCautions(length, diameter),
          ...(count > 1 ? spacingCautions(spacing, length, diameter) : []),
        ],
      };
    },
    secondRoute: ({ length, diameter, spacing, count }) =>
      count === 2 ? dwightPair(length, diameter / 2, spacing) : null,
  },
  formula:
    "R = \\frac{1}{\\sum_{ij}(A^{-1})_{ij}},\\quad A_{ii} = \\frac{\\rho}{2\\pi}M(2L,a),\\quad A_{ij} = \\frac{\\rho}{2\\pi}M(2L,s_{ij}),\\quad M(l,d)=\\frac{2}{l}\\left[\\operatorname{asinh}\\frac{l}{d}-\\sqrt{1+\\frac{d^2}{l^2}}+\\frac{d}{l}\\right]",
  boundsBasis: "formula-accuracy",
  validity: [
    "For rods at least 10 diameters long and at least 4 diameters apart.",
    "Each rod's current is taken as even along it; the bounds allow for what that changes.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [
    SOIL_ASSUMPTION,
    CONTACT_ASSUMPTION,
    "The conductors that join the rods are insulated from the soil; bare ones lower the resistance.",
  ],
  sources: [
    AVERAGE_POTENTIAL_SOURCE,
    DWIGHT_SOURCE,
    {
      title: "BS 7430, factors for rods in parallel",
      detail: "compared for rods in a line, 1 + λρ/(2πRs) over n",
      provenance: "from memory",
    },
  ],
  example: {
    dimensions: { length: "3 m", diameter: "16 mm", spacing: "6 m", count: 3, arrangement: "line" },
    medium: { resistivity: "100 ohm m" },
  },
  drawing: ({ length, diameter, spacing, count, arrangement }) => {
    const plan = groupPlaces(arrangement, count).map(([x, y]): Point => [x * spacing, y * spacing]);
    const section = shownInSection(arrangement, count).map((i) => i * spacing);
    const words: Readonly<Record<Arrangement, string>> = {
      line: "a straight line",
      ring: "a ring",
      square: "a square grid",
    };
    return drawRods(
      length,
      diameter,
      section,
      plan,
      `A group of ${count} earth rods in ${words[arrangement]}, in section and in plan, joined above ground; the current spreads from all of them into the soil.`,
    );
  },
});

/** Places in multiples of the spacing of the rods seen in section: one row, at most eight of it. */
function shownInSection(arrangement: Arrangement, count: number): number[] {
  const row =
    arrangement === "square"
      ? Math.round(Math.sqrt(count))
      : arrangement === "ring"
        ? Math.min(count, 2)
        : count;
  return Array.from({ length: Math.min(row, 8) }, (_, i) => i);
}
