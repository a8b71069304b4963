import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { angleDimension, lengthDimension, sidesDimension } from "../dimension";
import type { Drawing, Point } from "../drawing";
import { polyline } from "../drawing";
import { joined, reversed, sampled } from "../drawing-curve";

interface Neck {
  readonly throatRadius: number;
  readonly openingAngle: number;
  readonly length: number;
  readonly sides: number;
}

/** A right angle is a hole in a plane; π/2 in floating point is as near to it as a double comes. */
function isPlane(openingAngle: number): boolean {
  return openingAngle >= Math.PI / 2;
}

/** cos β, exactly 0 for the right angle. */
function cosine(angle: number): number {
  return isPlane(angle) ? 0 : Math.cos(angle);
}

/**
 * first, 10·first, 100·first … below the end: the integrand falls with the square of the distance, and over many
 * decades at once an integration rule would see nothing of it.
 */
function decades(first: number, end: number): number[] {
  const places: number[] = [];
  for (let x = first; x < end; x *= 10) places.push(x);
  return places;
}

/** Flow through a hyperboloid of one sheet: oblate spheroidal coordinates with focal radius c = a/sin β. */
export const hyperbolicNeck = defineShape({
  id: "hyperbolic-neck",
  title: "Hyperbolic neck",
  family: "radial",
  summary:
    "A body whose wall is a hyperboloid round the axis, narrowest at the throat; the current runs along the axis between caps that are oblate spheroids confocal with the wall.",
  dimensions: {
    throatRadius: lengthDimension("Throat radius", "a", "Radius at the narrowest place.", {
      diameter: "throatDiameter",
    }),
    openingAngle: angleDimension(
      "Opening angle",
      "β",
      "Angle between the axis and the cone that the wall approaches; 90° is a hole in a thin insulating plane.",
      { max: Math.PI / 2 },
    ),
    length: lengthDimension(
      "Length of one side",
      "z",
      "Distance on the axis from the throat to the cap, one side.",
    ),
    sides: sidesDimension("2: the neck widens on both sides of the throat; 1: the throat is a terminal."),
  },
  coordinates: [
    {
      name: "level",
      role: "along",
      unit: "m",
      label: "Place on the axis, from the throat outwards; the second side mirrors it",
      start: "0",
      end: "length",
    },
  ],
  terminals: {
    high: "the cap at one end (with one side: the disc at the throat)",
    low: "the cap at the other end",
  },
  answer: {
    kind: "flow",
    flow: ({ throatRadius, openingAngle, length, sides }) => {
      const focal = throatRadius / Math.sin(openingAngle);
      const wall = cosine(openingAngle);
      const half = Math.sin(openingAngle / 2);
      return {
        along: {
          coordinate: "level",
          start: 0,
          extent: length,
          // Two sides in series: the same current sees twice the integral of one side.
          section: (x) => (4 * Math.PI * half * half * (focal * focal + x * x)) / sides,
          // Each side takes its share of the voltage; h_ξ/c on the wall, where the field is largest, but on the axis
          // where the wall is a plane, whose rim makes it unbounded.
          scale: (x) =>
            isPlane(openingAngle) ? sides : (sides * Math.hypot(x / focal, wall)) / Math.hypot(x / focal, 1),
          ...(isPlane(openingAngle) ? { unboundedAt: "unbounded at the rim of the hole" } : {}),
          breaks: decades(0.1 * focal, length),
          line: "on the wall, at the throat",
        },
        across: [],
      };
    },
    uniform: ({ throatRadius, openingAngle, length, sides }) =>
      (sides / (2 * Math.PI) / throatRadius / Math.tan(openingAngle / 2)) *
      Math.atan((length / throatRadius) * Math.sin(openingAngle)),
  },
  formula:
    "R = \\frac{n\\,\\rho}{2\\pi a}\\,\\cot\\frac{\\beta}{2}\\;\\arctan\\frac{z\\sin\\beta}{a},\\qquad n=\\text{sides}",
  boundsBasis: "rounding",
  validity: [
    "Exact where the caps are oblate spheroids confocal with the wall; far from the throat they are nearly spheres round its centre.",
    "With an opening angle of 90° and a long body it tends to the hole in a plane: ρ/(2a) for two sides.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The hyperbolic wall carries no current; each cap is at one potential."],
  sources: [
    {
      title: "Oblate spheroidal coordinates",
      detail: "R = n/(2πc(1−cos β))·∫ρ dξ/(1+ξ²), c = a/sin β, z = cξ",
      provenance: "derived here",
    },
    {
      title: "R. Holm, Electric Contacts",
      detail: "constriction resistance ρ/(2a) as the limit of a plane with a hole",
      provenance: "from memory",
    },
  ],
  example: {
    dimensions: { throatRadius: "0.5 mm", openingAngle: "60 deg", length: "4 mm", sides: 2 },
    medium: { material: "copper-annealed" },
  },
  drawing: drawNeck,
});

function drawNeck(d: Neck): Drawing {
  const { throatRadius, openingAngle, length, sides } = d;
  const focal = throatRadius / Math.sin(openingAngle);
  const eta = cosine(openingAngle);
  const top = length / focal;
  const at = (xi: number, cos: number, sign: number): Point => [
    focal * xi * cos,
    sign * focal * Math.sqrt(1 + xi * xi) * Math.sqrt(Math.max(0, 1 - cos * cos)),
  ];
  const start = sides === 2 ? -top : 0;
  const wall = (sign: number) => sampled((xi) => at(xi, eta, sign), start, top);
  const cap = (xi: number) =>
    sampled((angle) => at(xi, Math.cos(angle), Math.sign(angle) || 1), -Math.acos(eta), Math.acos(eta));
  const right = cap(top);
  const left = cap(start);
  const edge = at(0, eta, 1)[1];
  return {
    views: [
      {
        title: "section through the axis",
        conductor: [joined([wall(-1), right, reversed(wall(1)), reversed(left)])],
        lines: [{ ...polyline([at(start * 1.08, 1, 1), at(top * 1.08, 1, 1)]), style: "axis" }],
        high: [left],
        low: [right],
        flow: [
          ...(sides === 2 ? [{ from: [-0.6 * length, 0] as Point, to: [-0.3 * length, 0] as Point }] : []),
          { from: [0.3 * length, 0], to: [0.6 * length, 0] },
        ],
        dimensions: [
          { name: "throatRadius", from: [0, 0], to: [0, edge], kind: "linear", offset: 0.6 },
          { name: "length", from: [0, 0], to: [length, 0], kind: "linear", offset: -1 },
          {
            name: "openingAngle",
            from: [0.55 * length, 0],
            to: [0.55 * length * Math.cos(openingAngle), 0.55 * length * Math.sin(openingAngle)],
            kind: "angle",
            center: [0, 0],
          },
        ],
      },
    ],
    description: `A body that narrows to a throat along hyperbolas, in section; the current runs along the axis${sides === 2 ? " through the throat to the other side" : " from the throat to the cap"}.`,
  };
}
