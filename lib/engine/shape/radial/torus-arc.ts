import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { angleDimension, lengthDimension } from "../dimension";
import { drawRoundBend } from "./bend-drawing";

interface Bend {
  readonly bendRadius: number;
  readonly diameter: number;
}

/** R₀ + √(R₀² − r²), by which R₀ − √(R₀² − r²) = r²/(…) keeps its digits for a slender ring. */
function rootSum({ bendRadius, diameter }: Bend): number {
  const radius = diameter / 2;
  return bendRadius + Math.sqrt(bendRadius - radius) * Math.sqrt(bendRadius + radius);
}

/** A round bar bent to a circle, with circumferential flow: E = V/(rφ) is exact everywhere in it. */
export const torusArc = defineShape({
  id: "torus-arc",
  title: "Bent round bar",
  family: "radial",
  summary:
    "A round bar bent to an arc of a circle, a part of a torus; the current enters and leaves through the cut end faces and runs round the bend.",
  dimensions: {
    bendRadius: lengthDimension(
      "Bend radius",
      "R₀",
      "Radius of the centre line of the bar; greater than half its diameter.",
      { diameter: "bendDiameter" },
    ),
    diameter: lengthDimension("Diameter", "d", "Diameter of the bar.", { radius: "radius" }),
    angle: angleDimension("Bend angle", "φ", "Angle of the bend between its two end faces.", {
      max: 2 * Math.PI,
    }),
  },
  constraints: [
    {
      names: ["diameter", "bendRadius"],
      text: "diameter less than twice the bend radius",
      holds: ({ diameter, bendRadius }) => diameter / 2 < bendRadius,
    },
  ],
  coordinates: [
    {
      name: "angle",
      role: "along",
      unit: "rad",
      label: "Angle round the bend from the high end",
      start: "0",
      end: "angle",
    },
    {
      name: "radius",
      role: "across",
      unit: "m",
      label: "Distance from the axis of the bend",
      start: "bendRadius − diameter/2",
      end: "bendRadius + diameter/2",
    },
  ],
  terminals: { high: "one cut end face", low: "the other cut end face" },
  answer: {
    kind: "flow",
    flow: (d) => {
      const { bendRadius, diameter, angle } = d;
      const inside = bendRadius - diameter / 2;
      const section = (Math.PI * diameter * diameter) / 2 / rootSum(d);
      return {
        along: {
          coordinate: "angle",
          start: 0,
          extent: angle,
          section: () => section,
          scale: () => inside,
          line: "at the inside of the bend",
        },
        across: [
          {
            coordinate: "radius",
            start: inside,
            extent: diameter,
            // Height of the section at that distance over the length of the arc there.
            tube: (x) => (2 * Math.sqrt(x) * Math.sqrt(Math.max(0, diameter - x))) / ((inside + x) * angle),
            fieldPerVolt: (x) => 1 / ((inside + x) * angle),
          },
        ],
      };
    },
    uniform: (d) => ((2 * d.angle) / Math.PI) * (rootSum(d) / d.diameter / d.diameter),
  },
  formula: "R = \\frac{\\rho\\,\\varphi}{2\\pi\\left(R_0-\\sqrt{R_0^2-r^2}\\right)},\\qquad r=\\frac d2",
  boundsBasis: "rounding",
  validity: [
    "Exact for end faces that are plane sections through the axis of the bend and equipotentials.",
    "Straight ends that follow the bend make the flow near it slightly different.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The section stays round in the bend; the whole of each end face is at one potential."],
  sources: [
    {
      title: "Circumferential flow, E = V/(rφ)",
      detail: "G = (1/ρφ)∬dA/r over a disc at distance R₀ from the axis",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { bendRadius: "40 mm", diameter: "12 mm", angle: "180 deg" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ bendRadius, diameter, angle }) =>
    drawRoundBend(
      { bendRadius, sectionRadius: diameter / 2, boreRadius: 0, angle },
      [{ name: "diameter", from: [-diameter / 2, 0], to: [diameter / 2, 0], kind: "linear", offset: -1.8 }],
      "A bent round bar from above and in section; the current runs round the bend from one cut face to the other.",
    ),
});
