import { INSULATION_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing, Point } from "../drawing";
import { polyline, rectangle } from "../drawing";
import { ellipse } from "../drawing-curve";

interface Ellipses {
  readonly innerMajor: number;
  readonly innerMinor: number;
  readonly wall: number;
}

/** Semi-minor axis of the confocal ellipse whose semi-major axis is `innerMajor` + x: b² = b₁² + x(2a₁+x). */
function minorAt({ innerMajor, innerMinor }: Ellipses, x: number): number {
  return Math.hypot(innerMinor, Math.sqrt(x) * Math.sqrt(2 * innerMajor + x));
}

/** ln((a₂+b₂)/(a₁+b₁)) with b₂−b₁ = wall·(a₁+a₂)/(b₁+b₂), so that a thin wall keeps its digits. */
function logarithm(d: Ellipses): number {
  const { innerMajor, innerMinor, wall } = d;
  const growth = wall * (1 + (2 * innerMajor + wall) / (innerMinor + minorAt(d, wall)));
  return Math.log1p(growth / (innerMajor + innerMinor));
}

/** Between two confocal elliptic cylinders: elliptic coordinates, x = c·cosh u·cos v, level = c·cosh u. */
export const confocalShell = defineShape({
  id: "confocal-shell",
  title: "Confocal elliptic shell",
  family: "radial",
  summary:
    "The wall between two elliptic cylinders with common foci, such as the insulation of a flattened conductor; the current runs from the inner to the outer surface along hyperbolas.",
  dimensions: {
    innerMajor: lengthDimension("Inner semi-major axis", "a₁", "Half the larger axis of the inner ellipse."),
    innerMinor: lengthDimension(
      "Inner semi-minor axis",
      "b₁",
      "Half the smaller axis of the inner ellipse; at most the semi-major axis.",
    ),
    outerMajor: lengthDimension(
      "Outer semi-major axis",
      "a₂",
      "Half the larger axis of the outer ellipse; its smaller axis follows from the common foci. Or give the wall.",
    ),
    wall: lengthDimension(
      "Wall on the major axis",
      "t",
      "Difference of the two semi-major axes; keeps its digits however thin it is.",
    ),
    length: lengthDimension("Length", "L", "Length along the cylinders."),
  },
  alternatives: [
    {
      names: ["outerMajor", "wall"],
      derive: {
        outerMajor: ({ innerMajor, wall }) => innerMajor + wall,
        wall: ({ innerMajor, outerMajor }) => outerMajor - innerMajor,
      },
    },
  ],
  constraints: [
    {
      names: ["innerMinor", "innerMajor"],
      text: "inner semi-minor axis at most the inner semi-major axis",
      holds: ({ innerMajor, innerMinor }) => innerMinor <= innerMajor,
    },
    {
      names: ["outerMajor", "innerMajor"],
      text: "outer semi-major axis greater than the inner semi-major axis",
      holds: ({ wall }) => wall > 0,
    },
  ],
  coordinates: [
    {
      name: "level",
      role: "along",
      unit: "m",
      label: "Semi-major axis of the confocal ellipse",
      start: "innerMajor",
      end: "outerMajor",
    },
  ],
  terminals: { high: "the inner surface", low: "the outer surface" },
  answer: {
    kind: "flow",
    flow: (d) => ({
      along: {
        coordinate: "level",
        start: d.innerMajor,
        extent: d.wall,
        section: (x) => 2 * Math.PI * d.length * minorAt(d, x),
        // A flat inner ellipse makes the section grow like √x at first.
        breaks: nearBreaks((d.innerMinor / d.innerMajor) * d.innerMinor, d.wall),
        line: "on the major axis, at the inner surface",
      },
      across: [],
    }),
    uniform: (d) => logarithm(d) / (2 * Math.PI) / d.length,
  },
  formula: "R = \\frac{\\rho}{2\\pi L}\\,\\ln\\frac{a_2+b_2}{a_1+b_1},\\qquad b_2=\\sqrt{a_2^2-a_1^2+b_1^2}",
  boundsBasis: "rounding",
  validity: [
    "Exact where the two ellipses have common foci and the end faces carry no current.",
    "A wall of constant thickness round an ellipse is not confocal: the confocal wall is thinner on the major axis.",
  ],
  cautions: [INSULATION_CAUTION],
  assumptions: ["Each surface is at one potential; nothing leaks through the end faces."],
  sources: [
    {
      title: "Elliptic cylinder coordinates",
      detail: "h_u = h_v, so R = ∫ρ da/(2πL·b(a)) over the confocal semi-major axis",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { innerMajor: "6 mm", innerMinor: "2 mm", wall: "0.8 mm", length: "10 m" },
    medium: { resistivity: "1e13 ohm m" },
  },
  drawing: (d) => drawConfocal(d, d.outerMajor, d.length),
});

/** Points at a few decades above the scale on which something changes, inside the range. */
function nearBreaks(scale: number, extent: number): number[] {
  const breaks: number[] = [];
  for (let x = scale; x < extent && breaks.length < 16; x *= 10) {
    if (x > 0) breaks.push(x);
  }
  return breaks;
}

function drawConfocal(d: Ellipses, outerMajor: number, length: number): Drawing {
  const inner: Point = [d.innerMajor, d.innerMinor];
  const outer: Point = [outerMajor, minorAt(d, d.wall)];
  const arrows = [0.15, 0.35, 0.65, 0.85].map((half) => {
    const v = Math.PI * half;
    // Along one hyperbola v is the same on every confocal ellipse.
    const at = (part: number): Point => [
      (d.innerMajor + part * d.wall) * Math.cos(v),
      minorAt(d, part * d.wall) * Math.sin(v),
    ];
    return { from: at(0.15), to: at(0.85) };
  });
  return {
    views: [
      {
        title: "end view",
        conductor: [ellipse([0, 0], outer[0], outer[1]), ellipse([0, 0], inner[0], inner[1])],
        lines: [
          {
            ...polyline([
              [-1.05 * outer[0], 0],
              [1.05 * outer[0], 0],
            ]),
            style: "axis",
          },
          {
            ...polyline([
              [0, -1.1 * outer[1]],
              [0, 1.1 * outer[1]],
            ]),
            style: "axis",
          },
        ],
        high: [ellipse([0, 0], inner[0], inner[1])],
        low: [ellipse([0, 0], outer[0], outer[1])],
        flow: arrows,
        dimensions: [
          { name: "innerMajor", from: [-inner[0], 0], to: [0, 0], kind: "linear", offset: -1 },
          { name: "innerMinor", from: [0, 0], to: [0, inner[1]], kind: "linear", offset: 1 },
          { name: "outerMajor", from: [0, -outer[1]], to: [outer[0], -outer[1]], kind: "linear", offset: -1 },
          { name: "wall", from: [inner[0], 0], to: [outer[0], 0], kind: "linear", offset: 1 },
        ],
      },
      {
        title: "section along the axis",
        conductor: [
          rectangle(0, inner[1], length, outer[1] - inner[1]),
          rectangle(0, -outer[1], length, outer[1] - inner[1]),
        ],
        high: [
          polyline([
            [0, inner[1]],
            [length, inner[1]],
          ]),
          polyline([
            [0, -inner[1]],
            [length, -inner[1]],
          ]),
        ],
        low: [
          polyline([
            [0, outer[1]],
            [length, outer[1]],
          ]),
          polyline([
            [0, -outer[1]],
            [length, -outer[1]],
          ]),
        ],
        flow: [
          {
            from: [length / 2, inner[1] + 0.15 * (outer[1] - inner[1])],
            to: [length / 2, inner[1] + 0.85 * (outer[1] - inner[1])],
          },
        ],
        dimensions: [
          { name: "length", from: [0, outer[1]], to: [length, outer[1]], kind: "linear", offset: 1 },
        ],
      },
    ],
    description:
      "Two elliptic cylinders with common foci, seen along the axis and in section; the current runs outwards through the wall between them.",
  };
}
