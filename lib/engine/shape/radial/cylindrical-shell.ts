import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { arc, circle, polyline, rectangle, type Drawing, type DrawingPath, type Point } from "../drawing";

/** The wall between two coaxial cylinders, or a sector of it, with radial flow: R = ρ ln(b/a)/(φL). */
export const cylindricalShell = defineShape({
  id: "cylindrical-shell",
  title: "Cylindrical shell, radial flow",
  family: "radial",
  summary:
    "The wall between two coaxial cylinders, or a sector of it; the current runs radially from the inner to the outer surface.",
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
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Length along the axis.",
    },
    angle: {
      type: "quantity",
      kind: "angle",
      label: "Angle",
      symbol: "φ",
      default: 2 * Math.PI,
      max: 2 * Math.PI,
      help: "Angle of the sector around the axis; the whole shell is 360°.",
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
      label: "Distance from the axis",
      start: "innerRadius",
      end: "outerRadius",
    },
    { name: "angle", role: "across", unit: "rad", label: "Angle around the axis", start: "0", end: "angle" },
    {
      name: "length",
      role: "across",
      unit: "m",
      label: "Distance along the axis",
      start: "0",
      end: "length",
    },
  ],
  terminals: { high: "the inner surface", low: "the outer surface" },
  answer: {
    kind: "flow",
    flow: ({ innerRadius, wall, length, angle }) => {
      const logarithm = Math.log1p(wall / innerRadius);
      const fieldPerVolt = 1 / (innerRadius * logarithm);
      return {
        along: {
          coordinate: "radius",
          start: innerRadius,
          extent: wall,
          section: (x) => angle * length * (innerRadius + x),
        },
        across: [
          {
            coordinate: "angle",
            start: 0,
            extent: angle,
            tube: () => length / logarithm,
            fieldPerVolt: () => fieldPerVolt,
          },
          {
            coordinate: "length",
            start: 0,
            extent: length,
            tube: () => angle / logarithm,
            fieldPerVolt: () => fieldPerVolt,
          },
        ],
      };
    },
    uniform: ({ innerRadius, wall, length, angle }) => Math.log1p(wall / innerRadius) / angle / length,
  },
  formula: "R = \\frac{\\rho}{\\varphi L}\\,\\ln\\frac{b}{a}",
  boundsBasis: "rounding",
  validity: ["Exact for radial flow: the end faces, and the side faces of a sector, carry no current."],
  cautions: [INSULATION_CAUTION],
  assumptions: [
    "Each of the two cylindrical surfaces is at one potential; nothing leaks through the end faces.",
  ],
  sources: [
    { title: "Radial flow between coaxial cylinders", detail: "R = ∫ρ dr/(φrL)", provenance: "derived here" },
  ],
  example: {
    dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
    medium: { conductivity: 1e-12 },
  },
  drawing: (d) => drawShell(d),
});

function drawShell(d: {
  readonly innerRadius: number;
  readonly outerRadius: number;
  readonly length: number;
  readonly angle: number;
}): Drawing {
  const { innerRadius: a, outerRadius: b, length, angle } = d;
  const whole = angle >= 2 * Math.PI;
  const at = (radius: number, phi: number): Point => [radius * Math.cos(phi), radius * Math.sin(phi)];
  const middle = whole ? Math.PI / 4 : angle / 2;
  const sector: DrawingPath = {
    from: at(a, 0),
    steps: [
      { to: at(b, 0) },
      ...arc([0, 0], b, 0, angle).steps,
      { to: at(a, angle) },
      ...arc([0, 0], a, angle, 0).steps,
    ],
    closed: true,
  };
  const arrows = whole
    ? [0.25, 0.75, 1.25, 1.75].map((turn) => turn * Math.PI)
    : [angle / 4, (3 * angle) / 4];
  return {
    views: [
      {
        title: "end view",
        conductor: whole ? [circle([0, 0], b), circle([0, 0], a)] : [sector],
        high: [whole ? circle([0, 0], a) : arc([0, 0], a, 0, angle)],
        low: [whole ? circle([0, 0], b) : arc([0, 0], b, 0, angle)],
        flow: arrows.map((phi) => ({ from: at(a + (b - a) * 0.2, phi), to: at(a + (b - a) * 0.8, phi) })),
        dimensions: [
          { name: "innerRadius", from: [0, 0], to: at(a, middle / 2), kind: "leader" },
          { name: "outerRadius", from: [0, 0], to: at(b, middle * 1.5), kind: "leader" },
          { name: "wall", from: at(a, 0), to: at(b, 0), kind: "linear", offset: -1 },
          ...(whole
            ? []
            : [
                {
                  name: "angle",
                  from: at(b, 0),
                  to: at(b, angle),
                  kind: "angle" as const,
                  center: [0, 0] as Point,
                },
              ]),
        ],
      },
      {
        title: "section along the axis",
        conductor: [rectangle(0, a, length, b - a), ...(whole ? [rectangle(0, -b, length, b - a)] : [])],
        lines: [
          {
            ...polyline([
              [-0.05 * length, 0],
              [1.05 * length, 0],
            ]),
            style: "axis",
          },
        ],
        high: [
          polyline([
            [0, a],
            [length, a],
          ]),
          ...(whole
            ? [
                polyline([
                  [0, -a],
                  [length, -a],
                ]),
              ]
            : []),
        ],
        low: [
          polyline([
            [0, b],
            [length, b],
          ]),
          ...(whole
            ? [
                polyline([
                  [0, -b],
                  [length, -b],
                ]),
              ]
            : []),
        ],
        flow: [0.3, 0.7].map((part) => ({
          from: [part * length, a + (b - a) * 0.2],
          to: [part * length, a + (b - a) * 0.8],
        })),
        dimensions: [{ name: "length", from: [0, b], to: [length, b], kind: "linear", offset: 1 }],
      },
    ],
    description: `A cylindrical shell${whole ? "" : ", a sector of it,"} seen along its axis and in section; the current runs outwards from the inner surface to the outer one.`,
  };
}
