import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { rectangle, polyline, type DrawingPath, type Point } from "../drawing";
import { proximityShift, rodExcess, starExcess } from "./average-potential-excess";
import {
  AVERAGE_POTENTIAL_SOURCE,
  CONTACT_ASSUMPTION,
  DWIGHT_SOURCE,
  EARTHING_CAUTIONS,
  REMOTE_EARTH,
  SOIL_ASSUMPTION,
} from "./earthing-texts";
import { downArrows, groundLine } from "./ground-drawing";
import { inclinedMean, parallelMean } from "./line-potential";
import { depthCaution, wireCautions } from "./rod-validity";

const ARM_COUNTS = [2, 3, 4, 6, 8];

/** Straight buried wires from one point: average potential over the arms, images included. */
export const earthStar = defineShape({
  id: "earth-star",
  title: "Buried star",
  family: "earthing",
  summary:
    "Equal straight bare wires laid horizontally in the ground from one common point; two arms stand at a right angle, more are spread evenly.",
  dimensions: {
    arms: {
      type: "integer",
      label: "Arms",
      symbol: "n",
      min: 2,
      max: 8,
      help: "Number of arms: 2 (at a right angle), 3, 4, 6 or 8.",
    },
    armLength: lengthDimension("Arm length", "L", "Length of each arm from the common point."),
    wireDiameter: lengthDimension(
      "Wire diameter",
      "d",
      "Diameter of the wire; for a strip take half its width.",
      {
        radius: "wireRadius",
      },
    ),
    depth: lengthDimension("Depth", "h", "Depth of the wires' axes below the surface."),
  },
  constraints: [
    { names: ["arms"], text: "2, 3, 4, 6 or 8 arms", holds: ({ arms }) => ARM_COUNTS.includes(arms) },
    {
      names: ["depth", "wireDiameter"],
      text: "depth greater than half the wire diameter: the wires lie below the surface",
      holds: ({ depth, wireDiameter }) => depth > wireDiameter / 2,
    },
  ],
  coordinates: [],
  terminals: { high: "the arms, joined at the common point", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ arms, armLength, wireDiameter, depth }) => {
      const a = wireDiameter / 2;
      const value = starFactor(arms, armLength, a, 2 * depth);
      const { least } = rodExcess(armLength / a);
      const shift = proximityShift(a, 1 / (2 * depth)) / (4 * Math.PI * armLength * arms);
      return {
        value,
        relativeError: 1e-13,
        lower: (value - Math.min(shift, value / 2)) / (1 + starExcess(arms, armLength / a)),
        upper: value / (1 + Math.min(least, -1e-12)),
        boundsBasis: "formula-accuracy",
        proved: false,
        method: "closed-form",
        accuracy:
          "The average-potential value lies above that of the equipotential star, since the inner parts of the arms shield each other: at 1000 wire radii by up to 1.2 % with 2 arms, 4 % with 4 and 12 % with 8, by comparison with arms of many segments.",
        cautions: [
          ...wireCautions(armLength, wireDiameter, depth, "arm"),
          ...depthCaution(depth, armLength, "the length of an arm"),
        ],
      };
    },
    secondRoute: ({ arms, armLength, wireDiameter, depth }) =>
      dwightStar(arms, armLength, wireDiameter / 2, 2 * depth),
  },
  formula:
    "R = \\frac{\\rho}{4\\pi n}\\sum_{j=0}^{n-1}\\left[N(\\varphi_j,a)+N(\\varphi_j,2h)\\right],\\qquad N(\\varphi,d)=\\frac{1}{L^2}\\int_0^L\\!\\!\\int_0^L\\frac{dx\\,dy}{\\sqrt{x^2+y^2-2xy\\cos\\varphi+d^2}}",
  boundsBasis: "formula-accuracy",
  validity: [
    "For arms at least 10 diameters long and at least 2 diameters deep, at any depth beyond.",
    "Dwight's series, used for comparison, agree to about 2e-4 for depths up to a tenth of an arm and to 3 % at half of it.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [
    SOIL_ASSUMPTION,
    CONTACT_ASSUMPTION,
    "The current is taken as even along the arms; the bounds allow for what that changes.",
  ],
  sources: [AVERAGE_POTENTIAL_SOURCE, DWIGHT_SOURCE],
  example: {
    dimensions: { arms: 3, armLength: "15.3 m", wireDiameter: "9.4 mm", depth: "0.8 m" },
    medium: { resistivity: "87 ohm m" },
  },
  drawing: ({ arms, armLength, wireDiameter, depth }) => {
    const paths = armAngles(arms).map((phi) => armPath(phi, armLength, wireDiameter));
    const wire = rectangle(0, -depth - wireDiameter / 2, armLength, wireDiameter);
    return {
      views: [
        {
          title: "plan",
          conductor: paths,
          high: paths,
          low: [],
          flow: [1, -1].map((side) => ({
            from: [0.85 * armLength, side * (0.6 * wireDiameter + 0.02 * armLength)],
            to: [0.85 * armLength, side * (0.6 * wireDiameter + 0.25 * armLength)],
          })),
          dimensions: [{ name: "armLength", from: [0, 0], to: [armLength, 0], kind: "linear", offset: -1 }],
        },
        {
          title: "section along an arm",
          conductor: [wire],
          lines: [groundLine(-0.1 * armLength, 1.1 * armLength)],
          high: [wire],
          low: [],
          flow: downArrows(0, armLength, -depth - wireDiameter / 2, 0.2 * armLength),
          dimensions: [
            { name: "depth", from: [armLength, 0], to: [armLength, -depth], kind: "linear", offset: 1 },
            {
              name: "wireDiameter",
              from: [armLength / 2, -depth],
              to: [armLength / 2, -depth - wireDiameter / 2],
              kind: "leader",
            },
          ],
        },
      ],
      description: `A star of ${arms} wires buried horizontally, in plan and in section along one arm; the current spreads from the arms into the soil below the surface.`,
    };
  },
});

/** Directions of the arms: two at a right angle, more spread evenly over the circle. */
export function armAngles(arms: number): readonly number[] {
  return Array.from({ length: arms }, (_, j) => (arms === 2 ? (Math.PI / 2) * j : (2 * Math.PI * j) / arms));
}

/**
 * Resistance over resistivity, 1/m: potential of one arm's surface in the evenly distributed current of all, with their
 * images at `twiceDepth`.
 */
export function starFactor(arms: number, armLength: number, radius: number, twiceDepth: number): number {
  let sum = parallelMean(armLength, radius) + parallelMean(armLength, twiceDepth);
  for (const angle of armAngles(arms).slice(1)) {
    const folded = Math.min(angle, 2 * Math.PI - angle);
    sum += inclinedMean(armLength, folded, radius) + inclinedMean(armLength, folded, twiceDepth);
  }
  return sum / (4 * Math.PI * arms);
}

/** Dwight's constants for ln(2L/a) + ln(2L/s) + c₀ + c₁·s/L + c₂·(s/L)² + c₄·(s/L)⁴, over 2n. */
const DWIGHT: Readonly<Record<number, readonly [number, number, number, number]>> = {
  2: [-0.2373, 0.2146, 0.1035, -0.0424],
  3: [1.071, -0.209, 0.238, -0.054],
  4: [2.912, -1.071, 0.645, -0.145],
  6: [6.851, -3.128, 1.758, -0.49],
  8: [10.98, -5.51, 3.26, -1.17],
};

function dwightStar(
  arms: number,
  armLength: number,
  radius: number,
  twiceDepth: number,
): { value: number; tolerance: number } | null {
  const q = twiceDepth / armLength;
  const thin = radius / armLength;
  if (q > 0.3 || thin > 0.01 || twiceDepth < 10 * radius) return null;
  const [c0, c1, c2, c4] = DWIGHT[arms];
  const bracket = Math.log(2 / thin) + Math.log(2 / q) + c0 + q * (c1 + q * (c2 + q * q * c4));
  return { value: bracket / (2 * arms * Math.PI * armLength), tolerance: 6e-4 + 0.4 * thin };
}

function armPath(angle: number, length: number, diameter: number): DrawingPath {
  const [c, s, half] = [Math.cos(angle), Math.sin(angle), diameter / 2];
  const at = (x: number, y: number): Point => [x * c - y * s, x * s + y * c];
  return polyline([at(0, -half), at(length, -half), at(length, half), at(0, half)], true);
}
