import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { angleDimension, lengthDimension } from "../dimension";
import { drawRoundBend } from "./bend-drawing";

interface Bend {
  readonly bendRadius: number;
  readonly outerDiameter: number;
  readonly wall: number;
}

/** √(R₀²−a²) + √(R₀²−b²) for the radii a of the bore and b outside, and b² − a². */
function roots({ bendRadius, outerDiameter, wall }: Bend): { sum: number; ring: number } {
  const outer = outerDiameter / 2;
  // Distances of the two circles' inner points from the axis: the wall is added there, where it keeps its digits.
  const inside = bendRadius - outer;
  const outerRoot = Math.sqrt(inside) * Math.sqrt(bendRadius + outer);
  const boreRoot = Math.sqrt(inside + wall) * Math.sqrt(bendRadius + (outer - wall));
  return { sum: boreRoot + outerRoot, ring: wall * (outerDiameter - wall) };
}

/** A round tube bent to a circle, with circumferential flow: the difference of two torus laws in conductance. */
export const bentTube = defineShape({
  id: "bent-tube",
  title: "Bent tube",
  family: "radial",
  summary:
    "A round tube bent to an arc of a circle; the current enters and leaves through the cut end faces and runs round the bend.",
  dimensions: {
    bendRadius: lengthDimension(
      "Bend radius",
      "R₀",
      "Radius of the centre line of the tube; greater than half the outer diameter.",
      { diameter: "bendDiameter" },
    ),
    outerDiameter: lengthDimension("Outer diameter", "D", "Outer diameter of the tube.", {
      radius: "outerRadius",
    }),
    wall: lengthDimension("Wall", "t", "Thickness of the wall; less than half the outer diameter."),
    angle: angleDimension("Bend angle", "φ", "Angle of the bend between its two end faces.", {
      max: 2 * Math.PI,
    }),
  },
  constraints: [
    {
      names: ["wall", "outerDiameter"],
      text: "wall less than half the outer diameter",
      holds: ({ wall, outerDiameter }) => wall < outerDiameter / 2,
    },
    {
      names: ["outerDiameter", "bendRadius"],
      text: "outer diameter less than twice the bend radius",
      holds: ({ outerDiameter, bendRadius }) => outerDiameter / 2 < bendRadius,
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
  ],
  terminals: { high: "one cut end face", low: "the other cut end face" },
  answer: {
    kind: "flow",
    flow: (d) => {
      const { sum, ring } = roots(d);
      const inside = d.bendRadius - d.outerDiameter / 2;
      return {
        along: {
          coordinate: "angle",
          start: 0,
          extent: d.angle,
          section: () => (2 * Math.PI * ring) / sum,
          scale: () => inside,
          line: "at the inside of the bend",
        },
        across: [],
      };
    },
    uniform: (d) => {
      const { sum, ring } = roots(d);
      return ((d.angle / (2 * Math.PI)) * sum) / ring;
    },
  },
  formula:
    "R = \\frac{\\rho\\,\\varphi\\left(\\sqrt{R_0^2-a^2}+\\sqrt{R_0^2-b^2}\\right)}{2\\pi\\,t\\,(D-t)},\\qquad b=\\frac D2,\\; a=b-t",
  boundsBasis: "rounding",
  validity: [
    "Exact for end faces that are plane sections through the axis of the bend and equipotentials.",
    "Straight tube ends that follow the bend make the flow near it slightly different.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: [
    "The wall has the same thickness all round; real bends are thinner outside and thicker inside.",
    "The whole of each end face is at one potential.",
  ],
  sources: [
    {
      title: "Circumferential flow, E = V/(rφ)",
      detail: "G = (1/ρφ)∬dA/r over the section; over a disc 2π(R₀ − √(R₀²−r²))",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { bendRadius: "80 mm", outerDiameter: "22 mm", wall: "1.5 mm", angle: "90 deg" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ bendRadius, outerDiameter, wall, angle }) =>
    drawRoundBend(
      { bendRadius, sectionRadius: outerDiameter / 2, boreRadius: outerDiameter / 2 - wall, angle },
      [
        {
          name: "outerDiameter",
          from: [-outerDiameter / 2, 0],
          to: [outerDiameter / 2, 0],
          kind: "linear",
          offset: -1.8,
        },
        {
          name: "wall",
          from: [outerDiameter / 2 - wall, 0],
          to: [outerDiameter / 2, 0],
          kind: "linear",
          offset: 1,
        },
      ],
      "A bent round tube from above and in section; the current runs round the bend from one cut face to the other.",
    ),
});
