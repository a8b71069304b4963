import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { angleDimension, lengthDimension } from "../dimension";
import type { Drawing, DrawingPath, Point } from "../drawing";
import { arc, polyline } from "../drawing";

interface Cones {
  readonly innerRadius: number;
  readonly outerRadius: number;
  readonly wall: number;
  readonly innerHalfAngle: number;
  readonly outerHalfAngle: number;
}

/** Solid angle between the two cones, 2π(cos θ₁ − cos θ₂) without its cancellation. */
function solidAngle({ innerHalfAngle, outerHalfAngle }: Cones): number {
  const middle = innerHalfAngle / 2 + outerHalfAngle / 2;
  return 4 * Math.PI * Math.sin(middle) * Math.sin((outerHalfAngle - innerHalfAngle) / 2);
}

/** Radial flow between two spheres, inside the space between two coaxial cones with the spheres' centre as apex. */
export const conicalShell = defineShape({
  id: "conical-shell",
  title: "Conical shell, radial flow",
  family: "radial",
  summary:
    "The space between two coaxial cones with a common apex, cut off by two spheres round the apex; the current runs away from the apex, from the inner to the outer sphere.",
  dimensions: {
    innerRadius: lengthDimension(
      "Inner radius",
      "a",
      "Distance of the inner spherical face from the apex, along the cone.",
      {
        diameter: "innerDiameter",
      },
    ),
    outerRadius: lengthDimension(
      "Outer radius",
      "b",
      "Distance of the outer spherical face from the apex; or give the wall.",
      { diameter: "outerDiameter" },
    ),
    wall: lengthDimension(
      "Wall",
      "t",
      "Length along the cone, outer less inner radius; keeps its digits however short it is.",
    ),
    innerHalfAngle: angleDimension(
      "Inner half-angle",
      "θ₁",
      "Angle between the axis and the inner cone; 0 for a solid cone.",
      { zero: true, max: Math.PI },
    ),
    outerHalfAngle: angleDimension(
      "Outer half-angle",
      "θ₂",
      "Angle between the axis and the outer cone; beyond 90° it opens backwards.",
      { max: Math.PI },
    ),
  },
  alternatives: [
    {
      names: ["outerRadius", "wall"],
      derive: {
        outerRadius: ({ innerRadius, wall }) => innerRadius + wall,
        wall: ({ innerRadius, outerRadius }) => outerRadius - innerRadius,
      },
    },
  ],
  constraints: [
    {
      names: ["outerRadius", "innerRadius"],
      text: "outer radius greater than inner radius",
      holds: ({ wall }) => wall > 0,
    },
    {
      names: ["outerHalfAngle", "innerHalfAngle"],
      text: "outer half-angle greater than inner half-angle",
      holds: ({ innerHalfAngle, outerHalfAngle }) => outerHalfAngle > innerHalfAngle,
    },
  ],
  coordinates: [
    {
      name: "radius",
      role: "along",
      unit: "m",
      label: "Distance from the apex",
      start: "innerRadius",
      end: "outerRadius",
    },
    {
      name: "polarAngle",
      role: "across",
      unit: "rad",
      label: "Angle from the axis",
      start: "innerHalfAngle",
      end: "outerHalfAngle",
    },
  ],
  terminals: { high: "the inner spherical face", low: "the outer spherical face" },
  answer: {
    kind: "flow",
    flow: (d) => {
      const { innerRadius, outerRadius, wall, innerHalfAngle, outerHalfAngle } = d;
      const solid = solidAngle(d);
      const reach = (innerRadius / wall) * outerRadius;
      const fieldPerVolt = outerRadius / innerRadius / wall;
      return {
        along: {
          coordinate: "radius",
          start: innerRadius,
          extent: wall,
          section: (x) => solid * (innerRadius + x) * (innerRadius + x),
          line: "at the inner face",
        },
        across: [
          {
            coordinate: "polarAngle",
            start: innerHalfAngle,
            extent: outerHalfAngle - innerHalfAngle,
            tube: (x) => 2 * Math.PI * Math.sin(innerHalfAngle + x) * reach,
            fieldPerVolt: () => fieldPerVolt,
          },
        ],
      };
    },
    uniform: (d) => d.wall / d.innerRadius / d.outerRadius / solidAngle(d),
  },
  formula:
    "R = \\frac{\\rho\\,(b-a)}{4\\pi\\,\\sin\\frac{\\theta_1+\\theta_2}{2}\\,\\sin\\frac{\\theta_2-\\theta_1}{2}\\;ab}",
  boundsBasis: "rounding",
  validity: [
    "Exact where both end faces are parts of spheres round the apex; flat ends of a cone are the cone frustum.",
  ],
  cautions: [INSULATION_CAUTION],
  assumptions: ["Each spherical face is at one potential; the conical faces carry no current."],
  sources: [
    {
      title: "Radial flow in spherical coordinates",
      detail: "R = ∫ρ dr/(Ωr²), Ω = 2π(cos θ₁ − cos θ₂)",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: {
      innerRadius: "20 mm",
      outerRadius: "55 mm",
      innerHalfAngle: "18 deg",
      outerHalfAngle: "24 deg",
    },
    medium: { material: "copper-annealed" },
  },
  drawing: drawCones,
});

function drawCones(d: Cones): Drawing {
  const { innerRadius: a, outerRadius: b, innerHalfAngle: first, outerHalfAngle: second } = d;
  // The axis points to the right; θ is measured from it on both sides.
  const at = (radius: number, angle: number): Point => [radius * Math.cos(angle), radius * Math.sin(angle)];
  const sector = (from: number, to: number): DrawingPath => ({
    from: at(a, from),
    steps: [
      { to: at(b, from) },
      ...arc([0, 0], b, from, to).steps,
      { to: at(a, to) },
      ...arc([0, 0], a, to, from).steps,
    ],
    closed: true,
  });
  const halves: readonly (readonly [number, number])[] =
    first === 0
      ? [[-second, second]]
      : [
          [first, second],
          [-second, -first],
        ];
  const middle = (first + second) / 2;
  return {
    views: [
      {
        title: "section through the axis",
        conductor: halves.map(([from, to]) => sector(from, to)),
        lines: [{ ...polyline([at(0, 0), at(1.08 * b, 0)]), style: "axis" }],
        high: halves.map(([from, to]) => arc([0, 0], a, from, to)),
        low: halves.map(([from, to]) => arc([0, 0], b, from, to)),
        flow: [middle, -middle].map((angle) => ({
          from: at(a + 0.2 * (b - a), angle),
          to: at(a + 0.8 * (b - a), angle),
        })),
        dimensions: [
          { name: "innerRadius", from: [0, 0], to: at(a, -second), kind: "linear", offset: -1 },
          { name: "outerRadius", from: [0, 0], to: at(b, second), kind: "linear", offset: 1.8 },
          { name: "wall", from: at(a, -second), to: at(b, -second), kind: "linear", offset: -1 },
          ...(first > 0
            ? [
                {
                  name: "innerHalfAngle",
                  from: at(0.55 * a, 0),
                  to: at(0.55 * a, first),
                  kind: "angle" as const,
                  center: [0, 0] as Point,
                },
              ]
            : []),
          {
            name: "outerHalfAngle",
            from: at(0.85 * a, 0),
            to: at(0.85 * a, second),
            kind: "angle",
            center: [0, 0],
          },
        ],
      },
    ],
    description:
      "The space between two coaxial cones in section; the current runs along the cones, from the spherical face near the apex to the one far from it.",
  };
}
