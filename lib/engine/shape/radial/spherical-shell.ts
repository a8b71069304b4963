import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { arc, circle, polyline, type DrawingPath, type Point } from "../drawing";

/** The wall between two concentric spheres, or a cone of it, with radial flow: R = ρ(b − a)/(Ωab). */
export const sphericalShell = defineShape({
  id: "spherical-shell",
  title: "Spherical shell, radial flow",
  family: "radial",
  summary:
    "The wall between two concentric spheres, or the part of it inside a cone; the current runs radially from the inner to the outer surface.",
  dimensions: {
    innerRadius: {
      type: "quantity",
      kind: "length",
      label: "Inner radius",
      symbol: "a",
      diameter: "innerDiameter",
      help: "Radius of the inner surface.",
    },
    outerRadius: {
      type: "quantity",
      kind: "length",
      label: "Outer radius",
      symbol: "b",
      diameter: "outerDiameter",
      help: "Radius of the outer surface; or give the wall.",
    },
    wall: {
      type: "quantity",
      kind: "length",
      label: "Wall",
      symbol: "t",
      help: "Thickness of the wall, outer less inner radius; keeps its digits however thin it is.",
    },
    halfAngle: {
      type: "quantity",
      kind: "angle",
      label: "Half angle",
      symbol: "θ",
      default: Math.PI,
      max: Math.PI,
      help: "Half the opening angle of the cone that cuts the shell out: 180° the whole shell, 90° a hemisphere.",
    },
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
  ],
  coordinates: [
    {
      name: "radius",
      role: "along",
      unit: "m",
      label: "Distance from the centre",
      start: "innerRadius",
      end: "outerRadius",
    },
    {
      name: "polarAngle",
      role: "across",
      unit: "rad",
      label: "Angle from the axis",
      start: "0",
      end: "halfAngle",
    },
  ],
  terminals: { high: "the inner surface", low: "the outer surface" },
  answer: {
    kind: "flow",
    flow: ({ innerRadius, wall, halfAngle }) => {
      const solid = solidAngle(halfAngle);
      // ab/(b − a), the reciprocal of ∫dr/r².
      const reach = (innerRadius / wall) * (innerRadius + wall);
      return {
        along: {
          coordinate: "radius",
          start: innerRadius,
          extent: wall,
          section: (x) => solid * (innerRadius + x) * (innerRadius + x),
        },
        across: [
          {
            coordinate: "polarAngle",
            start: 0,
            extent: halfAngle,
            tube: (angle) => 2 * Math.PI * Math.sin(angle) * reach,
            fieldPerVolt: () => reach / innerRadius / innerRadius,
          },
        ],
      };
    },
    uniform: ({ innerRadius, wall, halfAngle }) =>
      wall / innerRadius / (innerRadius + wall) / solidAngle(halfAngle),
  },
  formula: "R = \\frac{\\rho\\,(b - a)}{\\Omega\\,a\\,b},\\quad \\Omega = 2\\pi(1 - \\cos\\theta)",
  boundsBasis: "rounding",
  validity: ["Exact for radial flow: the conical side of a part of the shell carries no current."],
  cautions: [INSULATION_CAUTION],
  assumptions: ["Each of the two spherical surfaces is at one potential."],
  sources: [
    {
      title: "Radial flow between concentric spheres",
      detail: "R = ∫ρ dr/(Ωr²)",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { innerRadius: "17.3 mm", wall: "9.1 mm", halfAngle: "90 deg" },
    medium: { resistivity: "0.62 ohm m" },
  },
  drawing: ({ innerRadius: a, outerRadius: b, halfAngle }) => {
    const whole = halfAngle >= Math.PI;
    // The cone opens upwards: polar angle 0 is the y axis.
    const at = (radius: number, polar: number): Point => [radius * Math.sin(polar), radius * Math.cos(polar)];
    const [from, to] = [Math.PI / 2 + halfAngle, Math.PI / 2 - halfAngle];
    const part: DrawingPath = {
      from: at(a, -halfAngle),
      steps: [
        { to: at(b, -halfAngle) },
        ...arc([0, 0], b, from, to).steps,
        { to: at(a, halfAngle) },
        ...arc([0, 0], a, to, from).steps,
      ],
      closed: true,
    };
    const arrows = whole
      ? [-0.75, -0.25, 0.25, 0.75].map((turn) => turn * Math.PI)
      : [-0.5, 0, 0.5].map((share) => share * halfAngle);
    return {
      views: [
        {
          title: "section through the axis",
          conductor: whole ? [circle([0, 0], b), circle([0, 0], a)] : [part],
          lines: [
            {
              ...polyline([
                [0, whole ? -1.1 * b : 0],
                [0, 1.1 * b],
              ]),
              style: "axis",
            },
          ],
          high: [whole ? circle([0, 0], a) : arc([0, 0], a, from, to)],
          low: [whole ? circle([0, 0], b) : arc([0, 0], b, from, to)],
          flow: arrows.map((polar) => ({
            from: at(a + (b - a) * 0.2, polar),
            to: at(a + (b - a) * 0.8, polar),
          })),
          dimensions: [
            { name: "innerRadius", from: [0, 0], to: at(a, halfAngle * 0.35), kind: "leader" },
            { name: "outerRadius", from: [0, 0], to: at(b, halfAngle * 0.65), kind: "leader" },
            { name: "wall", from: at(a, -halfAngle), to: at(b, -halfAngle), kind: "linear", offset: 1 },
            ...(whole
              ? []
              : [
                  {
                    name: "halfAngle",
                    from: at(b, halfAngle),
                    to: at(b, 0),
                    kind: "angle" as const,
                    center: [0, 0] as Point,
                  },
                ]),
          ],
        },
      ],
      description: `A spherical shell${whole ? "" : ", the part of it inside a cone,"} in section through its axis; the current runs outwards from the inner surface to the outer one.`,
    };
  },
});

/** 2π(1 − cos θ) without cancellation. */
function solidAngle(halfAngle: number): number {
  const sine = Math.sin(halfAngle / 2);
  return 4 * Math.PI * sine * sine;
}
